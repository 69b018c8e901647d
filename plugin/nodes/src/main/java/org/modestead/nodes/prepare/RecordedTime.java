package org.modestead.nodes.prepare;

import java.time.DateTimeException;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Optional;
import java.util.OptionalDouble;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.RowCursor;

/**
 * Turns the cells of a time column into numbers of the engine's time unit. Dates and date-times may also stand in a
 * column of text; what the first cell is decides for the column.
 */
final class RecordedTime {

    private static final int DATE_LENGTH = 10;
    private final CellType type;
    private final int column;
    private final TimeAxis axis;

    private RecordedTime(CellType type, int column, TimeAxis axis) {
        this.type = type;
        this.column = column;
        this.axis = axis;
    }

    /**
     * @param type of the column
     * @param column its position
     * @param first text of the first cell that is not missing; read only for a column of text
     * @param unit asked for; empty for days (dates) or seconds (date-times)
     */
    static RecordedTime of(CellType type, int column, String first, String unit) {
        return new RecordedTime(type, column, axis(type, first, unit));
    }

    /** Returns the time axis of a column; the parameters are those of {@link #of}. */
    static TimeAxis axis(CellType type, String first, String unit) {
        TimeAxis.Kind kind = kind(type, first);
        String base = kind == TimeAxis.Kind.DATE ? "d" : kind == TimeAxis.Kind.DATE_TIME ? "s" : "";
        return new TimeAxis(kind, unit.isEmpty() ? base : unit);
    }

    /** Returns what a column of a type holds; for text that is known from its first cell only. */
    static TimeAxis.Kind kind(CellType type, String first) {
        return switch (type) {
            case DATE -> TimeAxis.Kind.DATE;
            case DATE_TIME, ZONED_DATE_TIME -> TimeAxis.Kind.DATE_TIME;
            case TEXT -> first.strip().length() > DATE_LENGTH ? TimeAxis.Kind.DATE_TIME : TimeAxis.Kind.DATE;
            default -> TimeAxis.Kind.NUMBER;
        };
    }

    TimeAxis axis() {
        return axis;
    }

    /** Returns the time of the current row, which is not missing; empty when it cannot be read. */
    OptionalDouble read(RowCursor cursor) {
        return switch (type) {
            case DATE -> days(cursor.date(column));
            case DATE_TIME, ZONED_DATE_TIME -> seconds(cursor.dateTime(column));
            case TEXT -> parse(cursor.text(column).strip());
            default -> OptionalDouble.of(cursor.number(column));
        };
    }

    /** Returns what a cell of this column should look like, for messages. */
    String wanted() {
        return switch (axis.kind()) {
            case NUMBER -> "a number";
            case DATE -> "a date such as 2015-06-30";
            case DATE_TIME -> "a date-time such as 2015-06-30T12:00:00";
        };
    }

    private OptionalDouble parse(String text) {
        if (axis.kind() == TimeAxis.Kind.DATE) {
            return parseDate(text).map(this::days).orElseGet(OptionalDouble::empty);
        }
        return parseDateTime(text).map(this::seconds).orElseGet(OptionalDouble::empty);
    }

    private OptionalDouble days(LocalDate date) {
        return OptionalDouble.of(TimeAxis.ofDate(date) / axis.calendarUnitsPerUnit());
    }

    private OptionalDouble seconds(LocalDateTime time) {
        return OptionalDouble.of(TimeAxis.ofDateTime(time) / axis.calendarUnitsPerUnit());
    }

    private static Optional<LocalDate> parseDate(String text) {
        try {
            return Optional.of(LocalDate.parse(text));
        } catch (DateTimeException notADate) {
            return Optional.empty();
        }
    }

    private static Optional<LocalDateTime> parseDateTime(String text) {
        if (text.length() == DATE_LENGTH) {
            return parseDate(text).map(LocalDate::atStartOfDay);
        }
        String iso = text.length() > DATE_LENGTH && text.charAt(DATE_LENGTH) == ' '
                ? text.substring(0, DATE_LENGTH) + 'T' + text.substring(DATE_LENGTH + 1) : text;
        try {
            var parsed = DateTimeFormatter.ISO_DATE_TIME.parseBest(iso, OffsetDateTime::from, LocalDateTime::from);
            return Optional.of(parsed instanceof OffsetDateTime zoned
                    ? zoned.withOffsetSameInstant(ZoneOffset.UTC).toLocalDateTime() : (LocalDateTime) parsed);
        } catch (DateTimeException notADateTime) {
            return Optional.empty();
        }
    }
}
