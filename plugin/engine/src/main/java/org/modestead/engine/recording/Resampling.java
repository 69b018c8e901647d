package org.modestead.engine.recording;

/** Which sample times a fit reads. */
public enum Resampling {
    /** The recorded times; a step map then needs them even, a generator does not. */
    KEEP,
    /** Even times from the first sample of each run on, with one step for all runs. */
    UNIFORM
}
