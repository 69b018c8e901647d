package org.modestead.engine.recording;

/** How much the samples of each run count in a fit, against those of other runs. */
public enum RunWeighting {

    /** Every sample alike, so that long runs count more. */
    EQUAL_SAMPLES,

    /** Every run alike, however long. */
    EQUAL_RUNS,

    /** By the inverse of the noise variance that each run shows, see {@link NoiseLevel}: least squares is then best. */
    NOISE,

    /** As the recording gives it, see {@link Run#weight()}. */
    GIVEN
}
