package org.modestead.engine.recording;

/** What happens where a run pauses: where a time step is longer than the gap factor times the run's median step. */
public enum GapPolicy {
    /** The run becomes several runs; nothing is ever interpolated across the pause. */
    SPLIT,
    /** The pause is filled by interpolation, evenly at about the median step, or by the resampling grid. */
    INTERPOLATE,
    /** The recording is refused with the place of the first pause. */
    REFUSE
}
