package org.modestead.nodes.render;

import java.awt.geom.Line2D;
import java.awt.geom.Point2D;

/** Line segments that touch, in drawing order and in one style: one path. */
final class SvgLines {

    private final StringBuilder path = new StringBuilder();
    private String style = "";
    private String end = "";

    /** Whether a line goes on where the last one ends. */
    boolean continuedBy(Line2D line, String lineStyle) {
        return style.equals(lineStyle) && end.equals(point(line.getP1()));
    }

    /** Adds a line that continues, or the first one. */
    void add(Line2D line, String lineStyle) {
        if (path.isEmpty()) {
            style = lineStyle;
            path.append('M').append(point(line.getP1()));
        }
        end = point(line.getP2());
        path.append(" L").append(end);
    }

    /** Writes them, where there are any, and begins anew. */
    void writeTo(StringBuilder out) {
        if (!path.isEmpty()) {
            out.append("\n<path d=\"").append(path).append("\" style=\"").append(style).append("\"/>");
            path.setLength(0);
            style = "";
            end = "";
        }
    }

    private static String point(Point2D point) {
        return Hundredths.of(point.getX()) + "," + Hundredths.of(point.getY());
    }
}
