package org.modestead.host.table;

import java.sql.SQLException;
import java.util.Collections;
import org.modestead.engine.Cancelled;

/**
 * Makes sure that streamed rows are all rows. DuckDB's driver tells of a failure that comes while rows are handed over, a cell that does not fit
 * or a line that breaks off, by no more rows: as if they were over. So one last row is asked for, which only a complete result has;
 * DuckDB keeps the order of UNION ALL.
 */
final class CompleteRows {

    private CompleteRows() {}

    /**
     * Returns the SELECT with one column more, true in a last row only.
     *
     * @param columns of the SELECT
     */
    static String marked(String select, int columns) {
        return "SELECT *, false FROM (" + select + ") UNION ALL SELECT " + String.join(", ", Collections.nCopies(columns, "NULL")) + ", true";
    }

    /**
     * Finds why the rows ended without the last one, by counting cells, which tells of failures.
     *
     * @param row number of rows that came
     * @throws Cancelled if the thread is interrupted
     */
    static TableFault reason(Database database, String select, DuckDbTable table, long row) {
        Cancelled.ifInterrupted();
        try {
            return database.one("SELECT count(COLUMNS(*)) FROM (" + select + ")", counted -> new TableFault(table.origin(),
                    "the rows ended after row " + row + " although there are more", "leave the file as it is until the run is over"));
        } catch (SQLException failure) {
            Cancelled.ifInterrupted();
            return table.explainer().explain(failure);
        }
    }
}
