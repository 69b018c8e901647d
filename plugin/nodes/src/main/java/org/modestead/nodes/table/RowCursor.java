package org.modestead.nodes.table;

import java.time.LocalDate;
import java.time.LocalDateTime;

/**
 * Steps through the rows of a table. Before the first {@link #next()} there is no current row.
 *
 * <p>The typed readers may be called only for a column of a fitting type; {@link #isMissing(int)} is asked first.
 */
public interface RowCursor extends AutoCloseable {

    /** Moves on by one row; returns false after the last one. */
    boolean next();

    /** Returns the 1-based number of the current data row, not counting a header. */
    long row();

    /** Returns whether the cell is missing. */
    boolean isMissing(int column);

    /** Returns the number in a column of type DOUBLE or LONG; NaN when missing. */
    double number(int column);

    /** Returns the cell written as text whatever its type; empty when missing. */
    String text(int column);

    /** Returns the date in a column of type DATE. */
    LocalDate date(int column);

    /** Returns the date-time in a column of type DATE_TIME or ZONED_DATE_TIME (at UTC then). */
    LocalDateTime dateTime(int column);

    /**
     * Returns the cell as the Java type that {@link CellType} names, empty when missing.
     */
    java.util.Optional<Object> cell(int column);

    @Override
    void close();
}
