package org.modestead.engine.watch;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;

/**
 * Two oscillations, 1 and 2.6 cycles a time unit with damping ratios of 1.5 and 1 %, pushed by independent noise each step, seen by four
 * gauges that measure with noise.
 *
 * @param noise deviation of the measurement noise over that of the signal
 * @param estimator which fits
 * @param depth of the delays
 */
record WatchedStations(double noise, Estimator estimator, int depth) {

    static final double STEP = 0.1;
    static final double[] FREQUENCIES = {1, 2.6};
    static final double[] DAMPING = {0.015, 0.01};
    static final double[][] SHAPES = {{1, 0.1, 0.3, -0.2}, {0.6, -0.2, -0.8, 0.3}, {-0.3, 0.1, 0.5, 0.6}, {0.2, 0.7, 0.3, -0.1}};
    private static final int BURN_IN = 400;

    /** What changes at a sample: factors on the frequency and the damping of the first oscillation, what its second gauge sees, its push. */
    record Change(int at, double frequency, double damping, double secondGauge, double push) {
        static final Change NONE = new Change(Integer.MAX_VALUE, 1, 1, 1, 1);

        static Change ofFrequency(int at, double factor) {
            return new Change(at, factor, 1, 1, 1);
        }
    }

    Run run(String id, double start, int samples, Change change, Random random) {
        double[] x = new double[4];
        DMatrixRMaj values = new DMatrixRMaj(samples, SHAPES.length);
        double[] times = new double[samples];
        for (int t = -BURN_IN; t < samples; t++) {
            boolean changed = t >= change.at();
            if (t >= 0) {
                times[t] = start + t * STEP;
                for (int c = 0; c < SHAPES.length; c++) {
                    values.set(t, c, seen(c, x, changed ? change.secondGauge() : 1) + noise * random.nextGaussian());
                }
            }
            x = moved(x, changed ? change : Change.NONE, random);
        }
        return new Run(id, times, values);
    }

    private static double seen(int channel, double[] x, double secondGauge) {
        double sum = 0;
        for (int i = 0; i < x.length; i++) {
            sum += SHAPES[channel][i] * x[i] * (channel == 1 && i < 2 ? secondGauge : 1);
        }
        return sum;
    }

    private static double[] moved(double[] x, Change change, Random random) {
        double[] y = new double[x.length];
        for (int j = 0; j < 2; j++) {
            double natural = 2 * Math.PI * FREQUENCIES[j] * (j == 0 ? change.frequency() : 1);
            double damping = DAMPING[j] * (j == 0 ? change.damping() : 1);
            Complex multiplier = new Complex(-damping * natural, natural).times(STEP).exp();
            // a push that leaves both oscillations of about deviation 1
            double push = Math.sqrt(2 * DAMPING[j] * 2 * Math.PI * FREQUENCIES[j] * STEP) * (j == 0 ? change.push() : 1);
            y[2 * j] = multiplier.re() * x[2 * j] - multiplier.im() * x[2 * j + 1] + push * random.nextGaussian();
            y[2 * j + 1] = multiplier.im() * x[2 * j] + multiplier.re() * x[2 * j + 1] + push * random.nextGaussian();
        }
        return y;
    }

    Snapshots snapshots(List<Run> runs) {
        return Motions.snapshots(STEP, depth, runs, List.of());
    }

    /** A model of one run, whose modes all stand. */
    Model model(int samples, Random random) {
        return model(snapshots(List.of(run("known", 0, samples, Change.NONE, random))), Grade.STANDS);
    }

    Model model(Snapshots snapshots, Grade grade) {
        return model(snapshots, estimator, 4, grade);
    }

    static Model model(Snapshots snapshots, Estimator estimator, int rank, Grade grade) {
        FittedOperator operator = Motions.fit(snapshots, estimator, rank);
        Spectrum spectrum = SpectrumExtractor.extract(operator, Progress.NONE);
        List<ModeVerdict> verdicts = new ArrayList<>();
        spectrum.modes().forEach(mode -> verdicts.add(new ModeVerdict(mode.number(), grade, List.of(), true, "")));
        return new Model("", "", operator, spectrum, new Verdict(new ModeVerdict(0, grade, List.of(), true, ""), verdicts, List.of(), List.of(),
                List.of()));
    }
}
