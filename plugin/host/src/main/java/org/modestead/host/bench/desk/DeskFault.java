package org.modestead.host.bench.desk;

import org.modestead.engine.Fault;

/** A desk cannot be opened, kept or saved. */
public final class DeskFault extends Fault {
    private static final long serialVersionUID = 1L;

    /** See {@link Fault#Fault(String, String, String)}. */
    public DeskFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }
}
