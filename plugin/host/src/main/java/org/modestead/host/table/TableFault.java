package org.modestead.host.table;

import java.util.Optional;
import org.modestead.engine.Fault;

/** A table cannot be read, queried or written: the file, a row, a cell or the query is wrong. */
public final class TableFault extends Fault {
    private static final long serialVersionUID = 1L;

    private final String misfit;

    /** See {@link Fault#Fault(String, String, String)}. */
    public TableFault(String where, String seen, String wanted) {
        this(where, seen, wanted, "");
    }

    /**
     * A cell does not fit its column.
     *
     * @param misfit the whole text of the cell
     */
    public TableFault(String where, String seen, String wanted, String misfit) {
        super(where, seen, wanted);
        this.misfit = misfit;
    }

    /** Returns the text of the cell that does not fit its column; empty when another thing is wrong. */
    public Optional<String> misfit() {
        return Optional.of(misfit).filter(text -> !text.isEmpty());
    }
}
