package org.modestead.engine.recording;

import java.util.Arrays;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import org.ejml.data.DMatrixRMaj;

/** Sampled curves and how well they are interpolated, for the tests of {@link MonotoneCubic}. */
final class Curves {
    private Curves() {}

    /** The interpolated values of one column. */
    static double[] evaluate(double[] times, double[] values, double[] targets) {
        DMatrixRMaj out = new DMatrixRMaj(targets.length, 1);
        new MonotoneCubic(times, new DMatrixRMaj(times.length, 1, true, values), 0, times.length)
                .evaluate(targets, 0, targets.length, out);
        return out.data;
    }

    /** A signal at some times. */
    static double[] sampled(double[] times, DoubleUnaryOperator signal) {
        return Arrays.stream(times).map(signal).toArray();
    }

    /** Even times from one end to the other. */
    static double[] fine(double from, double to, int count) {
        double[] times = new double[count];
        for (int k = 0; k < count; k++) {
            times[k] = from + (to - from) * k / (count - 1);
        }
        return times;
    }

    /** Times whose steps lie between 0.4 and 1.6 of the even step. */
    static double[] uneven(int count, double length, Random random) {
        double[] times = fine(0, length, count);
        for (int k = 1; k < count - 1; k++) {
            times[k] += (random.nextDouble() - 0.5) * 0.6 * length / (count - 1);
        }
        return times;
    }

    /** Largest error against the signal that was sampled. */
    static double worstError(double[] times, DoubleUnaryOperator signal, double from, double to) {
        double[] targets = fine(from, to, 4001);
        double[] found = evaluate(times, sampled(times, signal), targets);
        double worst = 0;
        for (int k = 0; k < targets.length; k++) {
            worst = Math.max(worst, Math.abs(found[k] - signal.applyAsDouble(targets[k])));
        }
        return worst;
    }
}
