package org.modestead.engine.recording;

import java.math.BigDecimal;
import java.math.MathContext;

/**
 * How numbers and times of a recording are written in sentences: times as they were recorded, other numbers with six
 * digits, samples counted from 1.
 *
 * @param axis time axis of the recording
 */
record Wording(TimeAxis axis) {
    private static final MathContext DIGITS = new MathContext(6);

    /** Returns a time as it was recorded, with the unit when it is a plain number. */
    String time(double time) {
        return axis.kind() == TimeAxis.Kind.NUMBER ? withUnit(axis.format(time)) : axis.format(time);
    }

    /** Returns a length of time with its unit. */
    String span(double length) {
        return withUnit(number(length));
    }

    /** Returns the place of a sample, for example {@code run A, sample 17 (time 1.6 s)}. */
    String sample(Run run, int row) {
        return "run " + run.id() + ", sample " + (row + 1) + " (time " + time(run.times()[row]) + ")";
    }

    /** Returns a number with six digits. */
    static String number(double value) {
        if (!Double.isFinite(value)) {
            return Double.toString(value);
        }
        BigDecimal rounded = new BigDecimal(value).round(DIGITS).stripTrailingZeros();
        double size = Math.abs(value);
        return size == 0 || size >= 1e-4 && size < 1e9 ? rounded.toPlainString() : rounded.toString();
    }

    /** Returns {@code 1 sample} or {@code n samples}. */
    static String count(long count, String noun) {
        return count + " " + noun + (count == 1 ? "" : "s");
    }

    private String withUnit(String text) {
        return axis.unit().isEmpty() ? text : text + " " + axis.unit();
    }
}
