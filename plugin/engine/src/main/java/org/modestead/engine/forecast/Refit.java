package org.modestead.engine.forecast;

/** When the operator of a backtest is fitted. */
public enum Refit {
    /** Once, to the training part: how well the operator at hand does. */
    NEVER,
    /** Before every origin, to the training part and the run up to the origin: how well the way of fitting does. */
    EVERY_ORIGIN
}
