package org.modestead.engine.spectrum;

/** In what units shapes of two recordings are compared. */
public enum ShapeScaling {
    /** In recorded units: right where all channels measure the same quantity. */
    RECORDED,
    /**
     * In recorded units divided, channel by channel, by the geometric mean of the scales with which the two recordings were prepared:
     * right where channels measure different quantities.
     */
    PREPARED
}
