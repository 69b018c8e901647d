package org.modestead.engine.checks;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.function.UnaryOperator;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.hipparchus.ode.ExpandableODE;
import org.hipparchus.ode.ODEState;
import org.hipparchus.ode.OrdinaryDifferentialEquation;
import org.hipparchus.ode.nonstiff.DormandPrince853Integrator;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.ModalExpansion;

/**
 * A recorded motion and what a delay fit reads off it. A periodic signal is a sum of harmonics, so delays that reach over
 * half a period hold all of them that are above rounding.
 *
 * @param step of the samples
 * @param states recorded, one a sample
 */
record Orbit(double step, double[][] states) {

    /** Of the integrator, relative to the state: some fifty roundings. */
    private static final double LOCAL_ERROR = 1e-14;

    /** Integrates x' = f(x) independently of the engine: from a start, over a time in which it settles, then recorded. */
    static Orbit of(UnaryOperator<double[]> field, double[] start, double settle, double step, int samples) {
        double[][] out = new double[samples][];
        double[] state = settle == 0 ? start : advance(field, start, settle);
        for (int k = 0; k < samples; k++) {
            out[k] = state;
            state = advance(field, state, step);
        }
        return new Orbit(step, out);
    }

    private static double[] advance(UnaryOperator<double[]> field, double[] state, double time) {
        OrdinaryDifferentialEquation equation = new OrdinaryDifferentialEquation() {
            @Override
            public int getDimension() {
                return state.length;
            }

            @Override
            public double[] computeDerivatives(double t, double[] x) {
                return field.apply(x);
            }
        };
        return new DormandPrince853Integrator(1e-12, 10, LOCAL_ERROR, LOCAL_ERROR)
                .integrate(new ExpandableODE(equation), new ODEState(0, state), time).getPrimaryState();
    }

    /** The strongest oscillation in a number of the state. */
    Oscillation cycle(int depth, ListedFunctions.StateFunction signal) {
        Sum sum = sum(depth, signal);
        int strongest = IntStream.range(0, sum.rates().size()).boxed().filter(j -> sum.rates().get(j).im() > 0)
                .max(Comparator.comparingDouble(j -> sum.parts().get(j).abs())).orElseThrow();
        return new Oscillation(sum.rates().get(strongest), 2 * sum.parts().get(strongest).abs());
    }

    /** Every oscillation in a number of the state whose amplitude is above a limit, by rising frequency. */
    List<Oscillation> oscillations(int depth, ListedFunctions.StateFunction signal, double limit) {
        Sum sum = sum(depth, signal);
        return IntStream.range(0, sum.rates().size()).filter(j -> sum.rates().get(j).im() > 0)
                .mapToObj(j -> new Oscillation(sum.rates().get(j), 2 * sum.parts().get(j).abs()))
                .filter(part -> part.amplitude() > limit)
                .sorted(Comparator.comparingDouble(part -> part.rate().im())).toList();
    }

    /**
     * A conjugate pair.
     *
     * @param rate of positive imaginary part
     * @param amplitude peak value
     */
    record Oscillation(Complex rate, double amplitude) {
        double period() {
            return 2 * Math.PI / rate.im();
        }
    }

    /** The largest rate below zero in a number of the state; rates nearer to zero than 0.01 are its limit. */
    double slowestDecay(int depth, ListedFunctions.StateFunction signal) {
        return sum(depth, signal).rates().stream().mapToDouble(Complex::re).filter(rate -> rate < -0.01).max()
                .orElseThrow();
    }

    /** The mean over a period of a number of the state: its part of rate 0, with its sign. */
    double mean(int depth, ListedFunctions.StateFunction signal) {
        Sum sum = sum(depth, signal);
        int constant = IntStream.range(0, sum.rates().size()).boxed()
                .min(Comparator.comparingDouble(j -> sum.rates().get(j).abs())).orElseThrow();
        return sum.parts().get(constant).re();
    }

    /** The largest value of a number of the state between the samples, where its modes are evaluated at any time. */
    double peak(int depth, ListedFunctions.StateFunction signal) {
        Sum sum = sum(depth, signal);
        int first = depth - 1;
        int top = IntStream.range(first + 1, states.length - 1).boxed()
                .max(Comparator.comparingDouble(k -> signal.of(states[k]))).orElseThrow();
        double low = (top - 1 - first) * step;
        double high = (top + 1 - first) * step;
        // by thirds down to 1e-7, where a flat top is known to 1e-14
        while (high - low > 1e-7) {
            double third = (high - low) / 3;
            boolean left = sum.at(low + third) > sum.at(high - third);
            low = left ? low : low + third;
            high = left ? high - third : high;
        }
        return sum.at((low + high) / 2);
    }

    /** Delay fit at the rank of all directions that are more than rounding. */
    private Sum sum(int depth, ListedFunctions.StateFunction signal) {
        double[] values = Arrays.stream(states).mapToDouble(signal::of).toArray();
        double[] times = IntStream.range(0, values.length).mapToDouble(k -> k * step).toArray();
        Snapshots snapshots = Fits.snapshots(step, depth, List.of(new Run("orbit", times, Fits.column(values))));
        ModalExpansion expansion = ModalExpansion.of(
                new LinearEstimator().compress(snapshots, Progress.NONE).whiten(Integer.MAX_VALUE));
        DMatrixRMaj embedded = snapshots.states(Snapshots.Part.TRAINING).get(0).states();
        var start = expansion.eigenfunctions(new DMatrixRMaj(1, depth, true, embedded.data));
        return new Sum(expansion.rates(), IntStream.range(0, expansion.rank())
                .mapToObj(j -> ComplexMatrices.entry(start, 0, j).times(ComplexMatrices.entry(expansion.joint(), j, 0)))
                .toList());
    }

    /** The signal as a sum of exponentials in time, counted from the first state that has all its delays. */
    private record Sum(List<Complex> rates, List<Complex> parts) {
        double at(double time) {
            return IntStream.range(0, rates.size()).mapToDouble(j -> parts.get(j).times(rates.get(j).times(time).exp()).re())
                    .sum();
        }
    }
}
