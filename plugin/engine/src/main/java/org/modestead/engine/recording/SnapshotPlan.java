package org.modestead.engine.recording;

import java.util.Objects;
import java.util.OptionalDouble;

/**
 * How a recording becomes snapshots.
 *
 * @param gapPolicy what happens where a run pauses
 * @param gapFactor a step is a gap when it is longer than this many median steps of its run, above 1; empty = 1.5
 * @param resampling which sample times are read
 * @param step time step of {@link Resampling#UNIFORM} in time units, positive; empty = median step of all runs
 * @param missing what happens to cells without a number
 * @param detrend what is subtracted from every channel
 * @param scaling what every channel is divided by
 * @param delay delay coordinates
 * @param holdout what only judges
 * @param calibration what only sets the width of forecast bands, taken from what the holdout leaves
 * @param weighting how much the samples of each training run count in a fit
 * @param smoothing whether noise is smoothed away
 */
public record SnapshotPlan(
        GapPolicy gapPolicy,
        OptionalDouble gapFactor,
        Resampling resampling,
        OptionalDouble step,
        MissingPolicy missing,
        Detrend detrend,
        Scaling scaling,
        DelayEmbedding delay,
        Split holdout,
        Split calibration,
        RunWeighting weighting,
        SmoothingRule smoothing) {

    /** Gap factor of a plan that names none. */
    public static final double DEFAULT_GAP_FACTOR = 1.5;

    /** Gaps split, recorded times and values kept, missing cells interpolated, no delays, everything trains. */
    public static final SnapshotPlan DEFAULT = new SnapshotPlan(GapPolicy.SPLIT, OptionalDouble.empty(), Resampling.KEEP,
            OptionalDouble.empty(), MissingPolicy.INTERPOLATE, Detrend.NONE, Scaling.NONE, DelayEmbedding.NONE,
            new Split.None(), new Split.None(), RunWeighting.EQUAL_SAMPLES, SmoothingRule.NONE);

    /** Checks the ranges. */
    public SnapshotPlan {
        Objects.requireNonNull(gapPolicy);
        Objects.requireNonNull(resampling);
        Objects.requireNonNull(missing);
        Objects.requireNonNull(detrend);
        Objects.requireNonNull(scaling);
        Objects.requireNonNull(delay);
        Objects.requireNonNull(holdout);
        Objects.requireNonNull(calibration);
        Objects.requireNonNull(weighting);
        Objects.requireNonNull(smoothing);
        if (gapFactor.isPresent() && !(gapFactor.getAsDouble() > 1)) {
            throw new IllegalArgumentException("a gap factor of " + gapFactor.getAsDouble() + " must be above 1");
        }
        if (step.isPresent() && !(step.getAsDouble() > 0 && Double.isFinite(step.getAsDouble()))) {
            throw new IllegalArgumentException("a step of " + step.getAsDouble() + " must be positive and finite");
        }
    }

    /** Returns the gap factor asked for, or the default. */
    public double gapFactorOrDefault() {
        return gapFactor.orElse(DEFAULT_GAP_FACTOR);
    }

    /** Returns how many samples two neighbouring states need: {@code reach + 2}. */
    public int samplesNeeded() {
        return delay.reach() + 2;
    }

    /** The same plan with other weights of runs. */
    public SnapshotPlan withWeighting(RunWeighting rule) {
        return new SnapshotPlan(gapPolicy, gapFactor, resampling, step, missing, detrend, scaling, delay, holdout, calibration, rule, smoothing);
    }

    /** The same plan with another way with gaps. */
    public SnapshotPlan withGaps(GapPolicy policy, double factor) {
        return new SnapshotPlan(policy, OptionalDouble.of(factor), resampling, step, missing, detrend, scaling, delay,
                holdout, calibration, weighting, smoothing);
    }

    /** The same plan, resampled to the median step of all runs. */
    public SnapshotPlan withUniformStep() {
        return new SnapshotPlan(gapPolicy, gapFactor, Resampling.UNIFORM, OptionalDouble.empty(), missing, detrend, scaling,
                delay, holdout, calibration, weighting, smoothing);
    }

    /** The same plan, resampled to a step in time units. */
    public SnapshotPlan withUniformStep(double uniform) {
        return new SnapshotPlan(gapPolicy, gapFactor, Resampling.UNIFORM, OptionalDouble.of(uniform), missing, detrend,
                scaling, delay, holdout, calibration, weighting, smoothing);
    }

    /** The same plan with another way with missing cells. */
    public SnapshotPlan withMissing(MissingPolicy policy) {
        return new SnapshotPlan(gapPolicy, gapFactor, resampling, step, policy, detrend, scaling, delay, holdout,
                calibration, weighting, smoothing);
    }

    /** The same plan with other detrending and scaling. */
    public SnapshotPlan withPreparation(Detrend trend, Scaling scale) {
        return new SnapshotPlan(gapPolicy, gapFactor, resampling, step, missing, trend, scale, delay, holdout, calibration, weighting, smoothing);
    }

    /** The same plan with other delay coordinates. */
    public SnapshotPlan withDelay(int depth, int spacing) {
        return new SnapshotPlan(gapPolicy, gapFactor, resampling, step, missing, detrend, scaling,
                new DelayEmbedding(depth, spacing), holdout, calibration, weighting, smoothing);
    }

    /** The same plan with another holdout. */
    public SnapshotPlan withHoldout(Split split) {
        return new SnapshotPlan(gapPolicy, gapFactor, resampling, step, missing, detrend, scaling, delay, split,
                calibration, weighting, smoothing);
    }

    /** The same plan with another calibration part. */
    public SnapshotPlan withCalibration(Split split) {
        return new SnapshotPlan(gapPolicy, gapFactor, resampling, step, missing, detrend, scaling, delay, holdout, split, weighting, smoothing);
    }

    /** The same plan with another way with noise. */
    public SnapshotPlan withSmoothing(SmoothingRule rule) {
        return new SnapshotPlan(gapPolicy, gapFactor, resampling, step, missing, detrend, scaling, delay, holdout, calibration, weighting, rule);
    }
}
