package org.modestead.nodes.render;

import java.util.stream.DoubleStream;
import org.modestead.nodes.figure.Figure;

/**
 * What part of an axis a picture shows.
 *
 * @param low smallest value
 * @param high largest value, above {@code low}
 */
record Range(double low, double high) {
    private static final double MARGIN = 0.05;
    /** A narrower logarithmic range is widened to whole decades, for only they carry labels. */
    private static final double LABELLED_DECADES = 2.5;
    private static final double LITTLE = 0.03;
    private static final double NARROWEST = 0.02;

    static Range x(Figure figure) {
        return covering(figure.layers().stream().flatMapToDouble(Range::xs), figure.x(),
                figure.kind() == Figure.Kind.TIME_SERIES ? 0.01 : MARGIN, narrowest(figure));
    }

    static Range y(Figure figure) {
        return covering(figure.layers().stream().flatMapToDouble(Range::ys), figure.y(), MARGIN, narrowest(figure));
    }

    /** A frequency that stays to the sixth digit is to look level: no picture of rates or curves shows less than this share of them. */
    private static double narrowest(Figure figure) {
        return figure.kind() == Figure.Kind.CURVES || figure.kind() == Figure.Kind.COMPLEX_PLANE ? NARROWEST : 0;
    }

    /** The range of the right axis. */
    static Range right(Figure figure, Figure.Axis axis) {
        return covering(figure.layers().stream().filter(Figure.Backdrop.class::isInstance)
                .flatMapToDouble(layer -> DoubleStream.of(((Figure.Backdrop) layer).y())), axis, MARGIN, 0);
    }

    private static Range covering(DoubleStream values, Figure.Axis axis, double margin, double narrowest) {
        double[] drawn = values.filter(v -> drawable(v, axis)).sorted().toArray();
        if (drawn.length == 0) {
            return axis.logarithmic() ? new Range(0.1, 10) : new Range(0, 1);
        }
        double low = drawn[0];
        double high = drawn[drawn.length - 1];
        return axis.logarithmic() ? logarithmic(low, high) : linear(low, high, margin, narrowest);
    }

    private static Range linear(double low, double high, double margin, double narrowest) {
        double lacking = narrowest * Math.max(Math.abs(low), Math.abs(high)) - (high - low);
        if (lacking > 0) {
            return linear(low - lacking / 2, high + lacking / 2, margin, 0);
        }
        double spread = high > low ? high - low : low == 0 ? 1 : Math.abs(low) * 0.2;
        return new Range(low - margin * spread, high + margin * spread);
    }

    private static Range logarithmic(double low, double high) {
        double from = Math.log10(low);
        double to = Math.log10(high);
        if (to - from > LABELLED_DECADES) {
            double pad = MARGIN * (to - from);
            return new Range(Math.pow(10, from - pad), Math.pow(10, to + pad));
        }
        double below = Math.floor(from - LITTLE);
        return new Range(0.9 * Math.pow(10, below), 1.1 * Math.pow(10, Math.max(below + 1, Math.ceil(to + LITTLE))));
    }

    static boolean drawable(double value, Figure.Axis axis) {
        return Double.isFinite(value) && (!axis.logarithmic() || value > 0);
    }

    private static DoubleStream xs(Figure.Layer layer) {
        if (layer instanceof Figure.Line line) {
            return DoubleStream.of(line.x());
        }
        if (layer instanceof Figure.Points points) {
            return DoubleStream.of(points.x());
        }
        if (layer instanceof Figure.Band band) {
            return DoubleStream.of(band.x());
        }
        if (layer instanceof Figure.Backdrop backdrop) {
            return DoubleStream.of(backdrop.x());
        }
        return layer instanceof Figure.Rule rule && rule.vertical() ? DoubleStream.of(rule.at()) : DoubleStream.empty();
    }

    private static DoubleStream ys(Figure.Layer layer) {
        if (layer instanceof Figure.Line line) {
            return DoubleStream.of(line.y());
        }
        if (layer instanceof Figure.Points points) {
            return DoubleStream.of(points.y());
        }
        if (layer instanceof Figure.Band band) {
            return DoubleStream.concat(DoubleStream.of(band.low()), DoubleStream.of(band.high()));
        }
        if (layer instanceof Figure.Bars bars) {
            return DoubleStream.concat(DoubleStream.of(0), DoubleStream.of(bars.heights()));
        }
        return layer instanceof Figure.Rule rule && !rule.vertical() ? DoubleStream.of(rule.at()) : DoubleStream.empty();
    }
}
