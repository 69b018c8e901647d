package org.modestead.engine.recording;

import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Objects;

/**
 * How recorded times become the engine's numbers and back.
 *
 * <p>Numbers stay as they are. A date becomes days since 1970-01-01 (unit {@code d}); a date-time becomes seconds
 * since 1970-01-01T00:00 (unit {@code s}) read as UTC. Rates are then per {@code unit}, frequencies in cycles per
 * {@code unit}.
 *
 * @param kind what the recorded times are
 * @param unit unit of the engine's time, for example {@code s}, {@code d}, {@code year}; empty when unknown
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

    /**
     * Writes an engine time as it was recorded: a plain number, {@code 2015-06-30} or {@code 2015-06-30T12:00:00}.
     *
     * @param time in {@code unit}, finite
     * @return never null
     */
    public String format(double time) {
        return switch (kind) {
            case NUMBER -> Double.toString(time);
            case DATE -> LocalDate.ofEpochDay(Math.round(time)).toString();
            case DATE_TIME -> dateTime(time).format(DateTimeFormatter.ISO_LOCAL_DATE_TIME);
        };
    }

    /** Returns the date-time of an engine time, to the microsecond. */
    public static LocalDateTime dateTime(double time) {
        double whole = Math.floor(time);
        long micros = Math.round((time - whole) * 1e6);
        return LocalDateTime.ofEpochSecond((long) whole, 0, ZoneOffset.UTC).plusNanos(micros * 1000);
    }
}
