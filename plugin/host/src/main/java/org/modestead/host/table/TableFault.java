package org.modestead.host.table;

import org.modestead.engine.Fault;

/** A table cannot be read, queried or written: the file, a row, a cell or the query is wrong. */
public final class TableFault extends Fault {
    private static final long serialVersionUID = 1L;

    /** See {@link Fault#Fault(String, String, String)}. */
    public TableFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }
}
