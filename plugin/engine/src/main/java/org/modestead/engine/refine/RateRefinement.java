package org.modestead.engine.refine;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.ejml.dense.row.NormOps_DDRM;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.recording.Run;
import org.modestead.engine.refine.RefinedRates.Convergence;

/**
 * The optimised fit: the rates α and weights B with the smallest {@code Σ ‖Y - Φ(α) B‖²_F} over all runs, which share the
 * rates and have weights of their own. The times are free: uneven ones are as good as even ones. For every α the best B
 * follows by linear least squares, so the search runs over α alone (variable projection), by damped steps.
 *
 * <p>Noise in the samples biases the rates far less than it biases a fit of steps; the price is a search that finds the
 * minimum next to its start, so start from the rates of a fitted operator.
 *
 * <p>Golub and Pereyra, SIAM J. Numer. Anal. 10:413, 1973; Askham and Kutz, SIAM J. Appl. Dyn. Syst. 17:380, 2018.
 */
public final class RateRefinement {

    private static final int MOST_ITERATIONS = 300;
    private static final double FIRST_DAMPING = 1e-3;
    private static final double FACTOR = 10;
    private static final double LARGEST_DAMPING = 1e16;
    /** Rates are then within this share of their standard errors. */
    private static final double REMOVABLE = 1e-8;
    /** Below this share a step gains less than the rounding of the residual sum. */
    private static final double BELOW_ROUNDING = 1e-6;
    private static final double ROUNDINGS = 10;

    private RateRefinement() {}

    /**
     * @param start model at the start values
     * @param runs of the same channels, at any times; time 0 is where the weights hold
     * @param progress polled for cancel
     * @return never null; look at its convergence
     * @throws FitFault if nothing is free, a sample is not finite, samples are too few or a start rate is out of range
     */
    public static RefinedRates refine(RateModel start, List<Run> runs, Progress progress) {
        requireFit(start, runs);
        ProjectedFit fit = ProjectedFit.of(start, runs);
        double rounding = ROUNDINGS * Math.ulp(1.0) * size(runs);
        double damping = FIRST_DAMPING;
        for (int iteration = 0; iteration < MOST_ITERATIONS; iteration++) {
            progress.checkCancelled();
            LinearisedFit linear = LinearisedFit.of(fit.jacobian(true), fit.stacked());
            if (linear.removable() <= Math.max(REMOVABLE * linear.norm(), rounding)) {
                return result(fit, iteration, Convergence.CONVERGED);
            }
            Optional<Step> step = descend(fit, linear, damping);
            if (step.isEmpty()) {
                return result(fit, iteration, linear.removable() < BELOW_ROUNDING * linear.norm() ? Convergence.CONVERGED
                        : Convergence.STALLED);
            }
            fit = step.get().fit();
            damping = step.get().damping();
        }
        return result(fit, MOST_ITERATIONS, Convergence.UNFINISHED);
    }

    private record Step(ProjectedFit fit, double damping) {}

    /** Tries ever more cautious steps until one makes the residual smaller. */
    private static Optional<Step> descend(ProjectedFit fit, LinearisedFit linear, double damping) {
        double[] now = fit.model().free().stream().mapToDouble(FreeRate::value).toArray();
        double sum = fit.residualSum();
        for (double tried = damping; tried < LARGEST_DAMPING; tried *= FACTOR) {
            double[] next = linear.step(tried);
            for (int k = 0; k < next.length; k++) {
                next[k] += now[k];
            }
            RateModel model = fit.model().at(next);
            if (!Arrays.equals(now, next) && representable(model, fit.runs())) {
                ProjectedFit candidate = ProjectedFit.of(model, fit.runs());
                if (candidate.residualSum() < sum) {
                    return Optional.of(new Step(candidate, Math.max(tried / FACTOR, Double.MIN_NORMAL)));
                }
            }
        }
        return Optional.empty();
    }

    private static void requireFit(RateModel start, List<Run> runs) {
        if (start.free().isEmpty()) {
            throw new FitFault("optimised fit", "no rate is free", "leave at least one rate free");
        }
        for (Run run : runs) {
            if (!Arrays.stream(run.values().data, 0, run.values().getNumElements()).allMatch(Double::isFinite)) {
                throw new FitFault("optimised fit, run " + run.id(), "a sample is missing or not finite",
                        "leave such samples out");
            }
        }
        int freedom = degreesOfFreedom(start, runs);
        if (freedom < 1) {
            throw new FitFault("optimised fit", "the samples leave " + freedom
                    + " degrees of freedom beyond rates and weights",
                    "use fewer rates or more samples");
        }
        if (!representable(start, runs)) {
            throw new FitFault("optimised fit", "the start rates leave the range of numbers between the times " + earliest(runs)
                    + " and " + latest(runs), "start from smaller rates, or count time from the start of the recording");
        }
    }

    private static boolean representable(RateModel model, List<Run> runs) {
        return model.representable(earliest(runs), latest(runs));
    }

    private static double earliest(List<Run> runs) {
        return runs.stream().mapToDouble(run -> run.times()[0]).min().orElse(0);
    }

    private static double latest(List<Run> runs) {
        return runs.stream().mapToDouble(run -> run.times()[run.samples() - 1]).max().orElse(0);
    }

    private static int degreesOfFreedom(RateModel model, List<Run> runs) {
        int left = -model.free().size();
        for (Run run : runs) {
            left += (run.samples() - Math.min(run.samples(), model.weights())) * run.values().numCols;
        }
        return left;
    }

    private static double size(List<Run> runs) {
        return Math.sqrt(runs.stream().mapToDouble(run -> NormOps_DDRM.normF(run.values())).map(norm -> norm * norm).sum());
    }

    private static RefinedRates result(ProjectedFit fit, int iterations, Convergence convergence) {
        int freedom = degreesOfFreedom(fit.model(), fit.runs());
        double deviation = Math.sqrt(fit.residualSum() / freedom);
        LinearisedFit linear = LinearisedFit.of(fit.jacobian(false), fit.stacked());
        List<FreeRate> free = fit.model().free();
        double[] spreads = linear.spreads();
        double[] growth = new double[fit.model().terms().size()];
        double[] angular = new double[growth.length];
        double[] cross = new double[growth.length];
        double[] neighbours = linear.neighbours();
        for (int k = 0; k < neighbours.length; k++) {
            if (free.get(k).term() == free.get(k + 1).term()) {
                cross[free.get(k).term()] = deviation * deviation * neighbours[k];
            }
        }
        for (int k = 0; k < spreads.length; k++) {
            double[] part = free.get(k).part() == FreeRate.Part.GROWTH ? growth : angular;
            part[free.get(k).term()] = deviation * spreads[k];
        }
        double offset = linear.removable() / Math.sqrt(free.size()) / deviation;
        return new RefinedRates(fit.model(), growth, angular, cross, fit.weights(), fit.residualSum(), freedom, iterations,
                convergence, offset);
    }
}
