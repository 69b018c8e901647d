package org.modestead.nodes.render;

import java.util.List;

/**
 * A matrix to be drawn as a map of colours.
 *
 * @param id lower case with dashes
 * @param title one line
 * @param caption what it shows and how to read it; also the text alternative
 * @param rows downwards
 * @param columns to the right
 * @param low least of all entries; NaN when there is none
 * @param high largest of all entries; NaN when there is none
 * @param diverging whether the sign of an entry matters: the colours then part at zero, in equal steps to both sides
 * @param values by row and column; those not finite are left blank; not modified
 */
public record ColourMap(String id, String title, String caption, Side rows, Side columns, double low, double high, boolean diverging, double[][] values) {

    /**
     * One side of a map.
     *
     * @param title what is counted
     * @param labels name of each row or column
     */
    public record Side(String title, List<String> labels) {

        /** Takes an immutable copy. */
        public Side {
            labels = List.copyOf(labels);
        }
    }

    /** Checks that labels and entries agree. */
    public ColourMap {
        for (double[] row : values) {
            if (row.length != columns.labels().size()) {
                throw new IllegalArgumentException("map " + id + ": " + columns.labels().size() + " names for " + row.length + " columns");
            }
        }
        if (values.length != rows.labels().size()) {
            throw new IllegalArgumentException("map " + id + ": " + rows.labels().size() + " names for " + values.length + " rows");
        }
    }

    /** Returns the value that has the first colour of the scale. */
    double first() {
        return diverging ? -largest() : Math.min(0, Double.isNaN(low) ? 0 : low);
    }

    /** Returns the value that has the last colour of the scale, above {@link #first()}. */
    double last() {
        return diverging ? largest() : high > first() ? high : first() + 1;
    }

    private double largest() {
        double most = Math.max(Math.abs(low), Math.abs(high));
        return most > 0 ? most : 1;
    }
}
