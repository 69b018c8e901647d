package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.forecast.ForecastResult;
import org.modestead.engine.forecast.ForecastRow;
import org.modestead.engine.forecast.ReconstructionRow;
import org.modestead.engine.forecast.Route;
import org.modestead.engine.forecast.ScoreRow;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeIntervals;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Finding;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.LadderRow;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.NoiseEffect;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** An invented pump house: what the other nodes would hand to a report, small and the same at every call. */
public final class ReportFixture {
    public static final TimeAxis SECONDS = new TimeAxis(TimeAxis.Kind.NUMBER, "s");
    private static final List<Channel> CHANNELS = List.of(new Channel("pressure", "bar"), new Channel("flow", "m³/h"));
    private static final int SAMPLES = 600;
    private static final int HELD_OUT = 100;
    private static final double STEP = 0.05;

    private ReportFixture() {}

    /** Modes: 1.52 Hz with 1.8 % damping, a decay, the constant, a weak mode far out, one that is gone at once. */
    public static Spectrum spectrum() {
        return spectrum(CHANNELS);
    }

    public static Spectrum spectrum(List<Channel> channels) {
        List<Mode> modes = List.of(mode(1, -0.1719, 9.55, 0.7, false), mode(2, -0.5, 0, 0.2, false),
                mode(3, 0, 0, 0.0999, true),
                mode(4, -900, 12, 1e-5, false), mode(5, Double.NEGATIVE_INFINITY, 0, 0, false));
        List<Complex> rates = modes.stream().map(Mode::rate).toList();
        ZMatrixRMaj none = new ZMatrixRMaj(1, 1);
        return new Spectrum(rates, rates, none, none, none, modes, channels, DelayEmbedding.NONE,
                Preparation.identity(channels.size()), "s",
                List.of(new Doubt("aliasing", "frequencies above 10 Hz appear folded")));
    }

    /** The same with 90 % intervals at mode 1. */
    public static Spectrum withIntervals() {
        Spectrum plain = spectrum();
        List<Mode> modes = new ArrayList<>(plain.modes());
        modes.set(0, modes.get(0).with(new ModeIntervals(0.9, new Interval(-0.25, -0.1),
                new Interval(2 * Math.PI * 1.5, 2 * Math.PI * 1.54), new Interval(0.01, 0.026), new Interval(0.9, 1.1))));
        return plain.with(modes, List.of());
    }

    private static Mode mode(int number, double growth, double turn, double share, boolean constant) {
        return new Mode(number, List.of(number), new Complex(growth, turn), 1.0 / number, share, 0.02,
                List.of(new Complex(0.5, 0), new Complex(0, number)), constant, 0);
    }

    /** Mode 1 as given, mode 2 drifts, the others are undecided; a ladder of three rungs. */
    public static Verdict verdict(Grade first) {
        List<ModeVerdict> modes = List.of(
                new ModeVerdict(1, first, List.of("settling"), true, "the rate moved by 0.4 %"),
                new ModeVerdict(2, Grade.DRIFTS, List.of("settling"), true, "the weight doubled"),
                new ModeVerdict(4, Grade.UNDECIDED, List.of(), false, "too weak"));
        List<Finding> findings = List.of(new Finding(0, "symmetry-defect", 0.83, Double.NaN, true, "far from self-adjoint"),
                new Finding(1, "settling", 0.004, 0.05, true, "the rate moved by 0.4 %"),
                new Finding(2, "settling", 0.7, 0.05, false, "the weight doubled"));
        List<LadderRow> ladder = new ArrayList<>();
        for (int rank : new int[] {8, 4, 6}) {
            ladder.add(new LadderRow(rank, 1, new Complex(-0.17, 9.55), 1, 1, 1.1, 0.1 / rank, 0.1 / rank, 0, 0, NoiseEffect.NONE));
            ladder.add(new LadderRow(rank, 2, new Complex(-0.5, 0), 1, rank, Double.NaN, 0, 0, 0, 0, NoiseEffect.NONE));
        }
        return new Verdict(modes.get(first.compareTo(Grade.DRIFTS) > 0 ? 0 : 1), modes, findings, ladder,
                List.of(new Doubt("few-runs", "only one run was recorded")));
    }

    public static Snapshots snapshots() {
        return snapshots(CHANNELS, SECONDS, 0, STEP);
    }

    /** One run whose end was held out: two damped cosines with a little noise from a fixed seed. */
    public static Snapshots snapshots(List<Channel> channels, TimeAxis time, double start, double step) {
        Random noise = new Random(7);
        double[] times = new double[SAMPLES];
        DMatrixRMaj values = new DMatrixRMaj(SAMPLES, channels.size());
        for (int i = 0; i < SAMPLES; i++) {
            times[i] = start + step * i;
            for (int c = 0; c < channels.size(); c++) {
                values.set(i, c, Math.exp(-0.0086 * i) * Math.cos(0.4775 * i + c) + 0.02 * noise.nextGaussian());
            }
        }
        Run training = part(times, values, 0, SAMPLES - HELD_OUT);
        Run holdout = part(times, values, SAMPLES - HELD_OUT, SAMPLES);
        return new Snapshots(channels, List.of(), time, List.of(training), List.of(), List.of(holdout),
                OptionalDouble.of(step),
                DelayEmbedding.NONE, Preparation.identity(channels.size()), List.of(new Snapshots.Fact("missing"
                + " cells", "17 of 1200")),
                List.of(new Doubt("gaps", "17 cells were interpolated")));
    }

    private static Run part(double[] times, DMatrixRMaj values, int from, int to) {
        DMatrixRMaj own = new DMatrixRMaj(to - from, values.numCols);
        System.arraycopy(values.data, from * values.numCols, own.data, 0, own.data.length);
        return new Run("night", Arrays.copyOfRange(times, from, to), own);
    }

    /** A forecast of the held-out part with bands, a reconstruction of the rest, and scores that beat persistence. */
    public static ForecastResult forecast(Snapshots snapshots) {
        List<ForecastRow> forecast = new ArrayList<>();
        List<ReconstructionRow> reconstruction = new ArrayList<>();
        Run holdout = snapshots.holdout().get(0);
        Run training = snapshots.training().get(0);
        for (int c = 0; c < snapshots.channels().size(); c++) {
            for (int i = 0; i < holdout.samples(); i++) {
                double value = 0.9 * holdout.values().get(i, c);
                forecast.add(new ForecastRow("night", holdout.times()[i], c, value, value - 0.1, value + 0.1));
            }
            for (int i = 0; i < training.samples(); i++) {
                double value = training.values().get(i, c);
                reconstruction.add(new ReconstructionRow("night", training.times()[i], c, value, 0.97 * value));
            }
        }
        List<ScoreRow> scores = List.of(score("modal", 0.5, 0.1), score("modal", 2, 0.4), score("persistence", 0.5, 0.2),
                score("persistence", 2, 0.3));
        return new ForecastResult(forecast, reconstruction, scores, Route.MODAL, List.of(), List.of());
    }

    private static ScoreRow score(String method, double horizon, double rmse) {
        return new ScoreRow(method, horizon, rmse, 0.8 * rmse, 0.5, 0.91, 0.3);
    }

    public static Table forecastTable(ForecastResult result, Snapshots snapshots) {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("run"), Column.number("time"),
                Column.text("channel"),
                Column.number("value"), Column.number("low"), Column.number("high"), Column.text("route")), "forecast");
        result.forecast().forEach(row -> rows.row(row.run(), row.time(), snapshots.channels().get(row.channel()).name(),
                row.value(),
                row.low(), row.high(), result.routeUsed().word()));
        return rows.build();
    }

    public static Table scoreTable(ForecastResult result) {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("method"), Column.number("horizon"),
                Column.number("rmse"), Column.number("mae"), Column.number("mase"), Column.number("coverage"),
                Column.number("interval_score")), "scores");
        result.scores().forEach(row -> rows.row(row.method(), row.horizon(), row.rmse(), row.mae(), row.mase(),
                row.coverage(),
                row.intervalScore()));
        return rows.build();
    }
}
