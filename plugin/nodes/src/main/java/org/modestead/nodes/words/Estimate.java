package org.modestead.nodes.words;

import org.modestead.engine.spectrum.Interval;

/**
 * A figure in words with the interval in which it may lie, both with as many digits as it takes to see the interval:
 * {@code 1.52 Hz (1.50 to 1.54)}, {@code 2.00 % (1.99 % to 2.01 %)}.
 *
 * @param value the figure
 * @param interval where it may lie; an end that is not known is NaN and written {@code –}
 */
public record Estimate(double value, Interval interval) {

    /** More digits help no reader. */
    private static final int MOST_DIGITS = 6;
    /** An interval can be seen when it spans more units than this of the last digit: 1.99 to 2.01, not 2.0 to 2.0. */
    private static final int LEAST_UNITS = 2;

    /** Returns it without a unit. */
    public String figure() {
        return told(Digits.FIGURE, "", "");
    }

    /** Returns it with its unit, which the ends share. */
    public String figure(String unit) {
        return told(Digits.FIGURE, " " + unit, "");
    }

    /** Returns it as a length of time, each end with its unit. */
    public String span(String unit) {
        return told(Digits.FIGURE, " " + unit, " " + unit);
    }

    /** Returns a share as per cent. */
    public String percent() {
        return new Estimate(100 * value, new Interval(100 * interval.low(), 100 * interval.high())).told(Digits.RATIO, " %", " %");
    }

    private String told(int usual, String unit, String unitOfEnds) {
        if (Double.isNaN(interval.low()) && Double.isNaN(interval.high())) {
            return Digits.significant(value, usual) + unit;
        }
        if (!Double.isFinite(interval.low()) || !Double.isFinite(interval.high())) {
            return written(usual, unit, unitOfEnds);
        }
        int digits = digits(usual);
        return digits > MOST_DIGITS ? Digits.significant(value, usual) + unit + " (to all digits shown)" : written(digits, unit, unitOfEnds);
    }

    private String written(int digits, String unit, String unitOfEnds) {
        return Digits.significant(value, digits) + unit + " (" + Digits.significant(interval.low(), digits) + unitOfEnds + " to "
                + Digits.significant(interval.high(), digits) + unitOfEnds + ")";
    }

    /** Returns the fewest digits, from the usual ones on, at which the interval can be seen; beyond the most where none does. */
    private int digits(int usual) {
        double width = interval.high() - interval.low();
        double leading = Math.floor(Math.log10(Math.max(Math.abs(interval.low()), Math.abs(interval.high()))));
        int digits = usual;
        while (digits <= MOST_DIGITS && width <= LEAST_UNITS * Math.pow(10, leading - digits + 1)) {
            digits++;
        }
        return digits;
    }
}
