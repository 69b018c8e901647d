package org.modestead.engine.recording;

/** What is subtracted from every channel; fitted once per channel over all training samples, never on inputs. */
public enum Detrend {
    /** Nothing. */
    NONE,
    /** The mean. */
    MEAN,
    /** The straight line of least squares against time. */
    LINEAR
}
