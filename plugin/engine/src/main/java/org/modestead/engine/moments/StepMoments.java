package org.modestead.engine.moments;

/**
 * The even steps of a recording: their mean is the step of the fit, which takes off the rounding of single times as
 * the fit in memory does.
 *
 * @param nominal usual step, from which the excess is counted
 * @param count of steps
 * @param excess sum of step less nominal one
 */
public record StepMoments(double nominal, long count, CompensatedSums excess) {

    static StepMoments none(double nominal) {
        return new StepMoments(nominal, 0, CompensatedSums.zero(1, 1));
    }

    /** Returns those of both together. */
    public StepMoments plus(StepMoments other) {
        return new StepMoments(nominal, count + other.count, excess.plus(other.excess));
    }

    /** Returns the mean step. */
    double mean() {
        return count == 0 ? nominal : nominal + excess.value().get(0, 0) / count;
    }
}
