package org.modestead.engine.recording;

/** What every channel is divided by, taken from the training samples only; inputs are never scaled. */
public enum Scaling {
    /** Nothing: recorded units are kept. */
    NONE,
    /** The channel's own standard deviation after detrending. */
    STD,
    /**
     * The pooled standard deviation (root of the mean variance) of all channels that share a unit, so that their
     * relative sizes stay; a channel without a unit stands alone.
     */
    UNIT_GROUP
}
