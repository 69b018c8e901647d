package org.modestead.engine.forecast;

/** Where the forecast table starts. */
public enum Origin {
    /** From the last state of every run, whichever part it lies in: the future. */
    RECORDING_END,
    /** From the last state before the holdout of every run, so that it can be held against what was observed. */
    BEFORE_HOLDOUT
}
