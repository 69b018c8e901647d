package org.modestead.host.bench.folders;

import org.modestead.engine.Fault;

/** A file lies where the bench may not look. */
public final class FolderFault extends Fault {
    private static final long serialVersionUID = 1L;

    /** See {@link Fault#Fault(String, String, String)}. */
    public FolderFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }
}
