package org.modestead.engine.spectrum;

/**
 * Where a figure may lie.
 *
 * @param low lower end; NaN where there is none
 * @param high upper end; NaN where there is none
 */
public record Interval(double low, double high) {

    /** Not known. */
    public static final Interval UNKNOWN = new Interval(Double.NaN, Double.NaN);

    /** Returns whether a value lies inside; an end that is not there excludes nothing. */
    public boolean holds(double value) {
        return !(value < low) && !(value > high);
    }
}
