package org.modestead.host.table;

import java.sql.SQLException;
import java.util.Optional;

/** Turns DuckDB's refusal while rows are made into a sentence. */
interface Explainer {

    /** Returns the fault if the refusal is surely about this table, empty when it may be about another one. */
    Optional<TableFault> claim(DuckDbMessage message);

    /** Returns the fault when the refusal can be about nothing else. */
    TableFault explain(DuckDbMessage message);

    /** Returns the fault when the refusal can be about nothing else. */
    default TableFault explain(SQLException failure) {
        return explain(DuckDbMessage.of(failure));
    }
}
