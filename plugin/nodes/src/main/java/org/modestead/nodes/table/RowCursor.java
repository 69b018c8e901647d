package org.modestead.nodes.table;

import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.time.ZonedDateTime;
import java.util.Optional;

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
    default boolean isMissing(int column) {
        return cell(column).isEmpty();
    }

    /** Returns the number in a column of type DOUBLE or LONG; NaN when missing. */
    double number(int column);

    /**
     * Returns the numbers of a cell in a column of lists of numbers, NaN where an entry is missing; empty when the cell is. They may be
     * written over when the cursor moves on.
     */
    default Optional<double[]> numbers(int column) {
        return cell(column).map(list -> ((ListCell) list).numbers());
    }

    /** Returns the cell written as text whatever its type; empty when missing. */
    default String text(int column) {
        return cell(column).map(Object::toString).orElse("");
    }

    /** Returns the date in a column of type DATE. */
    default LocalDate date(int column) {
        return (LocalDate) present(column);
    }

    /** Returns the date-time in a column of type DATE_TIME or ZONED_DATE_TIME (at UTC then). */
    default LocalDateTime dateTime(int column) {
        Object cell = present(column);
        return cell instanceof ZonedDateTime zoned ? zoned.withZoneSameInstant(ZoneOffset.UTC).toLocalDateTime()
                : (LocalDateTime) cell;
    }

    /**
     * Returns the cell as the Java type that {@link CellType} names, empty when missing.
     */
    Optional<Object> cell(int column);

    private Object present(int column) {
        return cell(column).orElseThrow(() -> new IllegalStateException("row " + row() + ": the cell is missing"));
    }

    @Override
    void close();
}
