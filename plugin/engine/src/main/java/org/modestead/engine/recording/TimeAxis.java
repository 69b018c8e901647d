package org.modestead.engine.recording;

import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.List;
import java.util.Objects;
import java.util.OptionalDouble;

/**
 * How recorded times become the engine's numbers and back.
 *
 * <p>Numbers stay as they are. A date becomes days since 1970-01-01 (unit {@code d}); a date-time becomes seconds
 * since 1970-01-01T00:00 (unit {@code s}) read as UTC. Either may be counted in a longer unit of {@link #unitsOf}
 * instead. Rates are then per {@code unit}, frequencies in cycles per {@code unit}.
 *
 * @param kind what the recorded times are
 * @param unit unit of the engine's time, for example {@code s}, {@code d}, {@code year}; empty when unknown, which for a
 *     date means {@code d} and for a date-time {@code s}
 */
public record TimeAxis(Kind kind, String unit) {

    /** What the recorded times are. */
    public enum Kind {
        /** A number in {@code unit}. */
        NUMBER,
        /** An ISO date. */
        DATE,
        /** An ISO date-time. */
        DATE_TIME
    }

    private static final double SECONDS_TO_NANOS = 1e9;
    private static final double SECONDS_A_DAY = 86400;

    /** Checks that both parts are there. */
    public TimeAxis {
        Objects.requireNonNull(kind);
        Objects.requireNonNull(unit);
    }

    /** Returns the engine's number for a date: days since 1970-01-01. */
    public static double ofDate(LocalDate date) {
        return date.toEpochDay();
    }

    /** Returns the engine's number for a date-time: seconds since 1970-01-01T00:00, read as UTC. */
    public static double ofDateTime(LocalDateTime time) {
        return time.toEpochSecond(ZoneOffset.UTC) + time.getNano() / SECONDS_TO_NANOS;
    }

    /** Returns the units in which times of a kind can be counted; empty for numbers, whose unit is only a label. */
    public static List<String> unitsOf(Kind kind) {
        return switch (kind) {
            case NUMBER -> List.of();
            case DATE -> List.of("d", "week", "year");
            case DATE_TIME -> List.of("s", "min", "h", "d", "week", "year");
        };
    }

    /** Returns the length of a unit in seconds; the year is the Julian one of 365.25 days. Empty for other units. */
    public static OptionalDouble seconds(String unit) {
        return switch (unit) {
            case "s" -> OptionalDouble.of(1);
            case "min" -> OptionalDouble.of(60);
            case "h" -> OptionalDouble.of(3600);
            case "d" -> OptionalDouble.of(SECONDS_A_DAY);
            case "week" -> OptionalDouble.of(7 * SECONDS_A_DAY);
            case "year" -> OptionalDouble.of(365.25 * SECONDS_A_DAY);
            default -> OptionalDouble.empty();
        };
    }

    /**
     * Returns how many days (of a date) or seconds (of a date-time) one {@code unit} holds; 1 for numbers and for an
     * unknown unit.
     */
    public double calendarUnitsPerUnit() {
        double base = switch (kind) {
            case NUMBER -> Double.NaN;
            case DATE -> SECONDS_A_DAY;
            case DATE_TIME -> 1;
        };
        return Double.isNaN(base) ? 1 : seconds(unit).orElse(base) / base;
    }

    /**
     * Writes an engine time as it was recorded: a plain number, {@code 2015-06-30} or {@code 2015-06-30T12:00:00}.
     *
     * @param time in {@code unit}, finite
     * @return never null
     */
    public String format(double time) {
        return switch (kind) {
            case NUMBER -> Double.toString(time);
            case DATE -> toDate(time).toString();
            case DATE_TIME -> toDateTime(time).format(DateTimeFormatter.ISO_LOCAL_DATE_TIME);
        };
    }

    /** Returns the date nearest to an engine time of a {@link Kind#DATE} axis. */
    public LocalDate toDate(double time) {
        return LocalDate.ofEpochDay(Math.round(time * calendarUnitsPerUnit()));
    }

    /** Returns the date-time of an engine time of a {@link Kind#DATE_TIME} axis, to the microsecond. */
    public LocalDateTime toDateTime(double time) {
        return dateTime(time * calendarUnitsPerUnit());
    }

    /** Returns the date-time that lies some seconds after 1970-01-01T00:00, to the microsecond. */
    public static LocalDateTime dateTime(double seconds) {
        double whole = Math.floor(seconds);
        long micros = Math.round((seconds - whole) * 1e6);
        return LocalDateTime.ofEpochSecond((long) whole, 0, ZoneOffset.UTC).plusNanos(micros * 1000);
    }
}
