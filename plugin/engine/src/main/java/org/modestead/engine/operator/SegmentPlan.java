package org.modestead.engine.operator;

/**
 * How runs are cut into the segments that become occupation functions.
 *
 * @param samples sampling steps a segment, 0 = the whole run is one segment
 * @param endSmoothing samples in the cubic that reads the state at a segment's ends, below 5 = the sample itself
 */
public record SegmentPlan(int samples, int endSmoothing) {

    /** Whole runs, ends as sampled. */
    public static final SegmentPlan WHOLE_RUNS = new SegmentPlan(0, 0);

    /** Checks the ranges. */
    public SegmentPlan {
        if (samples < 0 || samples == 1 || endSmoothing < 0) {
            throw new IllegalArgumentException("segments of " + samples + " steps, end smoothing over " + endSmoothing);
        }
    }
}
