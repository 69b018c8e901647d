package org.modestead.nodes.data;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.modestead.engine.Progress;
import org.modestead.engine.recording.Channel;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/**
 * Recordings of an invented water pumping station whose modes are known exactly: a lightly damped surge of the rising
 * main, the slow return of the sump level, a bearing resonance, and a rotor whirl that grows, in a few runs only.
 *
 * <p>One linear system explains every run: a run without the whirl merely does not excite it. Random numbers come from
 * {@link Random}, whose algorithm is part of its contract, so a seed gives the same bytes on every machine.
 *
 * @param runs number of runs, at least 1
 * @param duration mean length of a run in seconds; each run's own length lies within 15 % of it
 * @param rate samples a second
 * @param jitter largest shift of a sample time, as a share of the step, below 0.5
 * @param noise standard deviation of the measurement noise, as a share of each channel's usual swing
 * @param unstableRuns number of runs in which the whirl grows
 * @param gaps number of runs in which nothing was logged for a while
 * @param dropouts number of times a run in which one sensor says nothing for a few samples
 * @param seed of all random numbers
 */
record PumpHouse(
        int runs, double duration, double rate, double jitter, double noise, int unstableRuns, int gaps, int dropouts,
        long seed) {

    static final List<Channel> CHANNELS = List.of(new Channel("suction_pressure", "bar"),
            new Channel("discharge_pressure", "bar"), new Channel("flow", "m3/h"), new Channel("sump_level", "m"),
            new Channel("motor_current", "A"), new Channel("bearing_vibration", "mm/s"),
            new Channel("casing_vibration", "mm/s"), new Channel("bearing_temperature", "degC"));

    private static final TrueMode SURGE = TrueMode.oscillation("surge", 0.62, 0.02);
    private static final TrueMode DRAINING = TrueMode.decay("draining", 25);
    private static final TrueMode RESONANCE = TrueMode.oscillation("bearing-resonance", 2.9, 0.012);
    private static final TrueMode WHIRL = TrueMode.oscillation("rotor-whirl", 1.37, -0.006);

    private static final ModalSum STATION = new ModalSum(
            new double[] {0.55, 4.2, 310, 2.1, 118, 2.4, 1.6, 46},
            List.of(SURGE, DRAINING, RESONANCE, WHIRL),
            new double[][] {
                {0.12, 0.35, 18, 0.01, 2.2, 0.25, 0.15, 0.02},
                {0.10, 0.05, 6, 0.35, 0.8, 0.05, 0.04, 0.9},
                {0.004, 0.02, 0.6, 0.0005, 0.3, 1.1, 0.7, 0},
                {0.01, 0.03, 1.2, 0.001, 0.5, 0.35, 0.6, 0.02}},
            radians(new double[][] {
                {0, -160, -75, 90, -95, -60, -40, 30},
                {0, 180, 0, 0, 180, 0, 0, 180},
                {10, 60, 120, 0, 20, 0, 170, 0},
                {0, 80, -30, 20, 140, 0, 90, 60}}));

    /** Standard deviation of each channel in ordinary running, in its unit: the measure of the noise. */
    private static final double[] SWING = {0.055, 0.075, 4.8, 0.17, 0.6, 0.13, 0.11, 0.45};
    /** Digits after the point that each instrument writes. */
    private static final int[] DIGITS = {4, 4, 2, 4, 3, 4, 4, 3};
    private static final int TIME_DIGITS = 4;

    private static final double LENGTH_SPREAD = 0.15;
    private static final double GAP_SECONDS = 2;
    private static final int DROPOUT_MIN = 2;
    private static final int DROPOUT_SPREAD = 3;
    private static final double WHIRL_AT_START = 0.04;

    /** Returns the modes that the recordings are made of; the whirl only if some run excites it. */
    List<TrueMode> truth() {
        return STATION.modes().stream().filter(mode -> mode != WHIRL || unstableRuns > 0).toList();
    }

    /** Returns the columns: run, time in seconds, one a channel. */
    static TableSchema schema() {
        List<Column> columns = new ArrayList<>(List.of(new Column("run", CellType.TEXT),
                new Column("time", CellType.DOUBLE)));
        CHANNELS.forEach(channel -> columns.add(new Column(channel.label(), CellType.DOUBLE)));
        return new TableSchema(columns);
    }

    /** Makes the recordings. */
    Table table(Progress progress) {
        MemoryTable.Builder table = MemoryTable.builder(schema(), "signal generator, pump house, seed " + seed);
        Random random = new Random(seed);
        for (int run = 0; run < runs; run++) {
            progress.checkCancelled();
            progress.report((double) run / runs, "run " + (run + 1) + " of " + runs);
            addRun(run, random, table);
        }
        return table.build();
    }

    private void addRun(int run, Random random, MemoryTable.Builder table) {
        String id = String.format(Locale.ROOT, "run-%02d", run + 1);
        ModalSum.Excitation excitation = excitation(run, random);
        int samples = (int) (rate * duration * (1 + LENGTH_SPREAD * spread(random)));
        boolean[][] silent = silentCells(samples, random);
        int gapFrom = isChosen(run, gaps, 0.25) ? (int) (samples * (0.3 + 0.4 * random.nextDouble())) : samples;
        double gapTo = gapFrom + GAP_SECONDS * rate;
        for (int k = 0; k < samples; k++) {
            double time = Math.max(0, round((k + jitter * spread(random)) / rate, TIME_DIGITS));
            double[] values = measured(STATION.at(time, excitation), random);
            if (k < gapFrom || k >= gapTo) {
                table.row(cells(id, time, values, silent[k]));
            }
        }
    }

    /** Draws how the run starts; the draining alternates in sign, so that its mean over the runs is nearly zero. */
    private ModalSum.Excitation excitation(int run, Random random) {
        double sign = run % 2 == 0 ? 1 : -1;
        double[] amplitude = {1 + 0.4 * spread(random), sign * (1 + 0.5 * spread(random)), 0.85 + 0.45 * spread(random),
            isChosen(run, unstableRuns, 0.5) ? WHIRL_AT_START : 0};
        double[] phase = {Math.PI * spread(random), 0, Math.PI * spread(random), Math.PI * spread(random)};
        return new ModalSum.Excitation(amplitude, phase);
    }

    /** Returns whether the run is one of {@code count} runs spread evenly over all, starting at a share of the spacing. */
    private boolean isChosen(int run, int count, double start) {
        for (int i = 0; i < count; i++) {
            if (run == (int) ((i + start) * runs / count)) {
                return true;
            }
        }
        return false;
    }

    private boolean[][] silentCells(int samples, Random random) {
        boolean[][] silent = new boolean[samples][CHANNELS.size()];
        for (int i = 0; i < dropouts; i++) {
            int channel = random.nextInt(CHANNELS.size());
            int length = DROPOUT_MIN + random.nextInt(DROPOUT_SPREAD);
            int from = random.nextInt(samples);
            for (int k = from; k < Math.min(samples, from + length); k++) {
                silent[k][channel] = true;
            }
        }
        return silent;
    }

    private double[] measured(double[] exact, Random random) {
        for (int c = 0; c < exact.length; c++) {
            exact[c] = round(exact[c] + noise * SWING[c] * random.nextGaussian(), DIGITS[c]);
        }
        return exact;
    }

    private static Object[] cells(String run, double time, double[] values, boolean[] silent) {
        Object[] cells = new Object[2 + values.length];
        cells[0] = run;
        cells[1] = time;
        for (int c = 0; c < values.length; c++) {
            cells[2 + c] = silent[c] ? null : values[c];
        }
        return cells;
    }

    /** Returns a number drawn evenly from [-1, 1). */
    private static double spread(Random random) {
        return 2 * random.nextDouble() - 1;
    }

    private static double round(double value, int digits) {
        double unit = StrictMath.pow(10, digits);
        return Math.rint(value * unit) / unit;
    }

    private static double[][] radians(double[][] degrees) {
        double[][] out = new double[degrees.length][];
        for (int m = 0; m < degrees.length; m++) {
            out[m] = Arrays.stream(degrees[m]).map(Math::toRadians).toArray();
        }
        return out;
    }
}
