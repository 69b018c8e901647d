package org.modestead.host.bench.desk;

import org.modestead.engine.Fault;

/** An edit cannot be done; nothing was changed. */
public final class EditFault extends Fault {
    private static final long serialVersionUID = 1L;

    /** See {@link Fault#Fault(String, String, String)}. */
    public EditFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }
}
