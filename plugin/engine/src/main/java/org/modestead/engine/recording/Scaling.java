package org.modestead.engine.recording;

/** What every channel is divided by, taken from the training samples only; inputs are never scaled. */
public enum Scaling {
    /** Nothing: recorded units are kept. */
    NONE("none"),
    /** The channel's own standard deviation after detrending. */
    STD("standard deviation"),
    /**
     * The pooled standard deviation (root of the mean variance) of all channels that share a unit, so that their
     * relative sizes stay; a channel without a unit stands alone.
     */
    UNIT_GROUP("standard deviation of the unit");

    private final String words;

    Scaling(String words) {
        this.words = words;
    }

    /** Returns what it divides by, for people. */
    public String words() {
        return words;
    }
}
