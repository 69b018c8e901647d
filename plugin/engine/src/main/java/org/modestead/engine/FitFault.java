package org.modestead.engine;

/** The data are sound but the fit asked for is impossible: rank above what they hold, a factor that breaks down. */
public final class FitFault extends Fault {
    private static final long serialVersionUID = 1L;

    /** See {@link Fault#Fault(String, String, String)}. */
    public FitFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }
}
