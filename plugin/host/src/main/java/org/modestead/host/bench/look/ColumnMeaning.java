package org.modestead.host.bench.look;

import org.modestead.nodes.words.TimeUnit;

/**
 * What the numbers of a column of a node's table are: the nodes name their columns alike everywhere.
 *
 * @param unit of the numbers, empty for none
 * @param kind {@code rate}, {@code frequency}, {@code time}, {@code share} (of 1), {@code angle} (in radians) or empty
 */
public record ColumnMeaning(String unit, String kind) {
    private static final ColumnMeaning NONE = new ColumnMeaning("", "");

    /**
     * Returns what a column holds, from its name; the ends of an interval are what its middle is.
     *
     * @param column of a table that a node made
     * @param time unit of the recording
     */
    public static ColumnMeaning of(String column, TimeUnit time) {
        String base = column.replaceAll("_(low|high|a|b|spread)$", "");
        return switch (base) {
            case "lambda_real", "lambda_imag", "growth_rate" -> new ColumnMeaning(time.rate(), "rate");
            case "frequency" -> new ColumnMeaning(time.frequency(), "frequency");
            case "period", "doubling_time", "horizon", "time", "step" -> new ColumnMeaning(time.name(), "time");
            case "damping_ratio", "energy_share", "captured_share", "damping", "coverage", "frequency_change" -> new ColumnMeaning("", "share");
            case "phase" -> new ColumnMeaning("rad", "angle");
            default -> NONE;
        };
    }
}
