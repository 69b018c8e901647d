package org.modestead.engine.recording;

import java.util.Arrays;
import java.util.List;

/**
 * The usual time step of some runs and whether all steps agree with it.
 *
 * <p>The typical step is the median step, refined to the mean of all steps that equal it up to rounding: seconds since
 * 1970 carry a rounding error of 2e-7 s, which would otherwise show in every frequency. Two steps are equal when they
 * differ by at most 1e-6 of the typical step plus 4 units in the last place of the largest time.
 *
 * @param typical in time units, positive; NaN when there is no step at all
 * @param shortest in time units
 * @param longest in time units
 * @param tolerance largest deviation that still counts as equal, in time units
 */
record StepEstimate(double typical, double shortest, double longest, double tolerance) {
    private static final double RELATIVE_TOLERANCE = 1e-6;
    private static final int ROUNDING_ULPS = 4;

    /** Looks at one run. */
    static StepEstimate of(double[] times) {
        return of(List.of(times));
    }

    /**
     * Looks at the steps of several runs together; the pauses between runs are no steps.
     *
     * @param runs rising times of each
     */
    static StepEstimate of(List<double[]> runs) {
        int count = 0;
        double largest = 0;
        for (double[] times : runs) {
            count += Math.max(0, times.length - 1);
            if (times.length > 0) {
                largest = Math.max(largest, Math.max(Math.abs(times[0]), Math.abs(times[times.length - 1])));
            }
        }
        double[] steps = new double[count];
        int at = 0;
        for (double[] times : runs) {
            for (int i = 1; i < times.length; i++) {
                steps[at++] = times[i] - times[i - 1];
            }
        }
        return ofSteps(steps, largest);
    }

    private static StepEstimate ofSteps(double[] steps, double largestTime) {
        if (steps.length == 0) {
            return new StepEstimate(Double.NaN, Double.NaN, Double.NaN, 0);
        }
        double shortest = steps[0];
        double longest = steps[0];
        for (double step : steps) {
            shortest = Math.min(shortest, step);
            longest = Math.max(longest, step);
        }
        double median = longest - shortest <= RELATIVE_TOLERANCE * shortest ? shortest : median(steps);
        double tolerance = RELATIVE_TOLERANCE * median + ROUNDING_ULPS * Math.ulp(largestTime);
        double excess = 0;
        int equal = 0;
        for (double step : steps) {
            if (Math.abs(step - median) <= tolerance) {
                excess += step - median;
                equal++;
            }
        }
        return new StepEstimate(median + excess / equal, shortest, longest, tolerance);
    }

    private static double median(double[] steps) {
        Arrays.sort(steps);
        return steps[steps.length / 2];
    }

    /** Returns whether all steps equal the typical one. */
    boolean uniform() {
        return agreesWith(typical);
    }

    /** Returns whether all steps equal a given one; true when there is no step at all. */
    boolean agreesWith(double step) {
        return Double.isNaN(typical) || longest - step <= tolerance && step - shortest <= tolerance;
    }
}
