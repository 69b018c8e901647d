package org.modestead.engine.forecast;

import org.modestead.engine.Fault;

/** The operator is sound but the forecast asked for is impossible: no time ahead, no run long enough, a season too long. */
public final class ForecastFault extends Fault {
    private static final long serialVersionUID = 1L;

    /** See {@link Fault#Fault(String, String, String)}. */
    public ForecastFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }
}
