package org.modestead.engine.recording;

/** What happens to a sample of which a channel or an input has no number. */
public enum MissingPolicy {
    /** The cell is interpolated in its own column; samples before the first or after the last number are dropped. */
    INTERPOLATE,
    /** The sample is dropped and the run split there. */
    SPLIT,
    /** The recording is refused with the place of the first missing cell. */
    REFUSE
}
