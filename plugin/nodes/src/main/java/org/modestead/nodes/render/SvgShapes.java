package org.modestead.nodes.render;

import java.awt.Shape;
import java.awt.geom.Ellipse2D;
import java.awt.geom.PathIterator;
import java.awt.geom.Rectangle2D;
import java.awt.geom.RoundRectangle2D;

/** Shapes of Java 2D as elements of SVG, coordinates to a hundredth of a pixel. */
final class SvgShapes {

    private static final int MOST_COORDINATES = 6;

    private SvgShapes() {}

    /** @param style of the element, empty for none */
    static void write(StringBuilder out, Shape shape, String style) {
        if (shape instanceof Rectangle2D box) {
            open(out, "rect", "height", box.getHeight());
            style(out, style);
            attribute(out, "width", box.getWidth());
            attribute(out, "x", box.getX());
            attribute(out, "y", box.getY());
            out.append("></rect>");
        } else if (shape instanceof RoundRectangle2D box) {
            open(out, "rect", "height", box.getHeight());
            attribute(out, "rx", box.getArcWidth() / 2);
            attribute(out, "ry", box.getArcHeight() / 2);
            style(out, style);
            attribute(out, "width", box.getWidth());
            attribute(out, "x", box.getX());
            attribute(out, "y", box.getY());
            out.append("></rect>");
        } else if (shape instanceof Ellipse2D round) {
            open(out, "ellipse", "cx", round.getCenterX());
            attribute(out, "cy", round.getCenterY());
            attribute(out, "rx", round.getWidth() / 2);
            attribute(out, "ry", round.getHeight() / 2);
            style(out, style);
            out.append("></ellipse>");
        } else {
            out.append("\n<path d=\"");
            path(out, shape.getPathIterator(null));
            out.append('"');
            style(out, style);
            out.append("></path>");
        }
    }

    private static void open(StringBuilder out, String element, String name, double value) {
        out.append("\n<").append(element);
        attribute(out, name, value);
    }

    private static void attribute(StringBuilder out, String name, double value) {
        out.append(' ').append(name).append("=\"").append(Hundredths.of(value)).append('"');
    }

    private static void style(StringBuilder out, String style) {
        if (!style.isEmpty()) {
            out.append(" style=\"").append(style).append('"');
        }
    }

    private static void path(StringBuilder out, PathIterator path) {
        double[] at = new double[MOST_COORDINATES];
        for (boolean first = true; !path.isDone(); path.next(), first = false) {
            out.append(first ? "" : " ");
            switch (path.currentSegment(at)) {
                case PathIterator.SEG_MOVETO -> points(out, 'M', at, 1);
                case PathIterator.SEG_LINETO -> points(out, 'L', at, 1);
                case PathIterator.SEG_QUADTO -> points(out, 'Q', at, 2);
                case PathIterator.SEG_CUBICTO -> points(out, 'C', at, 3);
                default -> out.append('Z');
            }
        }
    }

    private static void points(StringBuilder out, char segment, double[] at, int count) {
        for (int i = 0; i < count; i++) {
            out.append(i == 0 ? segment : ' ').append(Hundredths.of(at[2 * i])).append(',').append(Hundredths.of(at[2 * i + 1]));
        }
    }
}
