package org.modestead.nodes.contract;

import org.modestead.engine.Fault;

/** The nodes found at start cannot be offered: two claim the same id, or one cannot be made. */
public final class CatalogFault extends Fault {
    private static final long serialVersionUID = 1L;

    /** See {@link Fault#Fault(String, String, String)}. */
    public CatalogFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }
}
