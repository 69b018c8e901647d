package org.modestead.nodes.render;

import java.awt.BasicStroke;
import java.awt.Color;
import java.util.List;
import org.modestead.nodes.figure.Figure;

/**
 * Which colour and stroke each layer of one figure gets: layers of one name share a colour, a band takes that of the
 * strong line it surrounds, and over time a strong line is broad and dark, so that the thin grey context drawn over it
 * leaves both in sight.
 */
record LayerStyles(Figure figure, List<String> names) {
    private static final float[][] DASHES = {{}, {9, 4}, {3, 3}, {12, 4, 3, 4}, {6, 3}, {2, 4}};

    LayerStyles(Figure figure) {
        this(figure, figure.layers().stream().filter(layer -> !(layer instanceof Figure.Rule)
                && !(layer instanceof Figure.Band) && !(layer instanceof Figure.Backdrop)
                && !(figure.kind() == Figure.Kind.MARKS && layer instanceof Figure.Points))
                .map(LayerStyles::key).distinct().toList());
    }

    private static String key(Figure.Layer layer) {
        return layer.name().isEmpty() ? layer.selection() : layer.name();
    }

    int index(Figure.Layer layer) {
        return Math.max(0, names.indexOf(key(layer)));
    }

    Color colour(Figure.Layer layer) {
        if (layer instanceof Figure.Line line) {
            return colour(line, line.emphasis());
        }
        if (layer instanceof Figure.Points points) {
            return figure.kind() == Figure.Kind.MARKS ? ink(points.emphasis()) : colour(points, points.emphasis());
        }
        if (layer instanceof Figure.Backdrop) {
            return Palette.CONTEXT;
        }
        if (layer instanceof Figure.Band) {
            return Palette.band(strongColour());
        }
        return layer instanceof Figure.Rule ? Palette.QUIET_INK : Palette.line(index(layer));
    }

    private Color colour(Figure.Layer layer, Figure.Emphasis emphasis) {
        if (emphasis == Figure.Emphasis.FAINT) {
            return Palette.FAINT;
        }
        if (overTimeWithStrongLine()) {
            return emphasis == Figure.Emphasis.STRONG ? strongColour() : Palette.CONTEXT;
        }
        return Palette.line(index(layer));
    }

    /** Where shapes tell, colour tells nothing but how much a mark matters. */
    private static Color ink(Figure.Emphasis emphasis) {
        return switch (emphasis) {
            case STRONG -> Palette.INK;
            case NORMAL -> Palette.QUIET_INK;
            case FAINT -> Palette.FAINT;
        };
    }

    private Color strongColour() {
        return overTimeWithStrongLine() ? Palette.line(0)
                : figure.layers().stream().filter(LayerStyles::isStrong).findFirst()
                .map(strong -> Palette.line(index(strong))).orElse(Palette.line(0));
    }

    private boolean overTimeWithStrongLine() {
        return figure.kind() == Figure.Kind.TIME_SERIES && figure.layers().stream().anyMatch(LayerStyles::isStrong);
    }

    private static boolean isStrong(Figure.Layer layer) {
        return layer instanceof Figure.Line line && line.emphasis() == Figure.Emphasis.STRONG;
    }

    BasicStroke stroke(Figure.Line line) {
        float width = switch (line.emphasis()) {
            case STRONG -> overTimeWithStrongLine() ? 3.4f : 2.4f;
            case NORMAL -> overTimeWithStrongLine() ? 1.1f : 1.5f;
            case FAINT -> 1f;
        };
        boolean dashed = figure.kind() == Figure.Kind.CURVES || figure.kind() == Figure.Kind.MARKS;
        float[] dash = dashed ? DASHES[index(line) % DASHES.length] : DASHES[0];
        return dash.length == 0 ? new BasicStroke(width, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND)
                : new BasicStroke(width, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 10, dash, 0);
    }

    /** The stroke of a line behind all else. */
    static BasicStroke backdrop() {
        return new BasicStroke(1.3f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND);
    }

    Figure.Mark curveMark(Figure.Line line) {
        Figure.Mark[] marks = Figure.Mark.values();
        return marks[index(line) % marks.length];
    }
}
