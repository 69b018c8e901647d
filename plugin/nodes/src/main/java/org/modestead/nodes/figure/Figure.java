package org.modestead.nodes.figure;

import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * A picture as plain data. One renderer draws it for files, report and views; a page draws the same data for
 * interaction. No picture is defined twice.
 *
 * @param id unique within a node's result, lower case with dashes
 * @param kind how marks are meant to be read; decides aspect and helper lines only
 * @param title one line
 * @param caption one or two sentences: what it shows and how to read it (also the text alternative)
 * @param x horizontal axis
 * @param y vertical axis
 * @param right a second vertical axis on the right, for a {@link Backdrop}; empty for none
 * @param layers drawn in order
 */
public record Figure(String id, Kind kind, String title, String caption, Axis x, Axis y, Optional<Axis> right, List<Layer> layers) {

    /** How marks are meant to be read. */
    public enum Kind {
        /** Values over time. */
        TIME_SERIES,
        /** Points of the complex plane, with the imaginary axis (growth | decay) marked and equal scales avoided. */
        COMPLEX_PLANE,
        /** A quantity over rank or order. */
        CURVES,
        /** Magnitude and phase by channel. */
        SHAPES,
        /** Bars by category. */
        BARS,
        /** Separate marks, whose shape and filling tell what they are; lines beneath are context. */
        MARKS
    }

    /**
     * @param label with unit in brackets
     * @param logarithmic base 10; values must be positive
     * @param categories tick labels at 0, 1, 2, ...; empty for a numeric axis
     * @param time how numbers are shown: {@code ""} plain, {@code "whole"} plain and only where they are whole, {@code "date"}
     *     days since 1970, {@code "date-time"} seconds since 1970
     */
    public record Axis(String label, boolean logarithmic, List<String> categories, String time) {
        /** A linear numeric axis. */
        public static Axis linear(String label) {
            return new Axis(label, false, List.of(), "");
        }

        /** A linear axis of whole numbers. */
        public static Axis whole(String label) {
            return new Axis(label, false, List.of(), "whole");
        }

        /** A logarithmic axis. */
        public static Axis log(String label) {
            return new Axis(label, true, List.of(), "");
        }

        /** An axis of named categories. */
        public static Axis categories(String label, List<String> names) {
            return new Axis(label, false, List.copyOf(names), "");
        }
    }

    /** One drawn thing. */
    public sealed interface Layer {
        /** Returns the name in the legend, empty for none; layers of one name share a legend entry and a colour. */
        String name();

        /** Returns what is selected with it, for example {@code mode:3}; empty when nothing is. */
        String selection();
    }

    /** A line through points; NaN breaks it. */
    public record Line(String name, String selection, double[] x, double[] y, Emphasis emphasis) implements Layer {}

    /** A faint line behind all else, read against the right axis; NaN breaks it. */
    public record Backdrop(String name, String selection, double[] x, double[] y) implements Layer {}

    /** The area between two curves; NaN breaks it. */
    public record Band(String name, String selection, double[] x, double[] low, double[] high) implements Layer {}

    /** Separate points with a label each (may be empty texts). */
    public record Points(String name, String selection, double[] x, double[] y, List<String> labels, Emphasis emphasis,
            Mark mark)
            implements Layer {

        /** Points drawn as discs. */
        public Points(String name, String selection, double[] x, double[] y, List<String> labels, Emphasis emphasis) {
            this(name, selection, x, y, labels, emphasis, Mark.DISC);
        }
    }

    /** What a point looks like: shape and filling carry meaning where colour alone must not. */
    public enum Mark {
        /** A filled circle. */
        DISC,
        /** A filled square. */
        SQUARE,
        /** A circle with an open middle. */
        RING,
        /** A triangle with an open middle. */
        TRIANGLE,
        /** Two crossed strokes. */
        CROSS
    }

    /** Bars of equal width at the category positions 0, 1, 2, ... */
    public record Bars(String name, String selection, double[] heights) implements Layer {}

    /** A straight line across the picture at one value. */
    public record Rule(String name, String selection, boolean vertical, double at) implements Layer {}

    /** How strongly a layer is drawn. */
    public enum Emphasis {
        /** What the picture is about. */
        STRONG,
        /** Context. */
        NORMAL,
        /** Background. */
        FAINT
    }

    /** A figure with one vertical axis. */
    public Figure(String id, Kind kind, String title, String caption, Axis x, Axis y, List<Layer> layers) {
        this(id, kind, title, caption, x, y, Optional.empty(), layers);
    }

    /** The same figure under another id. */
    public Figure named(String other) {
        return new Figure(other, kind, title, caption, x, y, right, layers);
    }

    /** Takes an immutable copy. */
    public Figure {
        Objects.requireNonNull(kind);
        Objects.requireNonNull(right);
        layers = List.copyOf(layers);
    }
}
