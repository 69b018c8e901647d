package org.modestead.nodes.render;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.Shape;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import org.knowm.xchart.style.markers.Marker;
import org.modestead.nodes.figure.Figure;

/** The shapes of points; open ones are filled with paper, so that lines beneath do not show through. */
final class Marks {
    static final int SIZE = 9;
    private static final BasicStroke OUTLINE = new BasicStroke(1.8f, BasicStroke.CAP_ROUND, BasicStroke.JOIN_ROUND);
    private static final BasicStroke CROSSED = new BasicStroke(2.2f, BasicStroke.CAP_ROUND, BasicStroke.JOIN_ROUND);

    private Marks() {}

    static Marker of(Figure.Mark mark) {
        return new Drawn(mark);
    }

    private static final class Drawn extends Marker {
        private final Figure.Mark mark;

        Drawn(Figure.Mark mark) {
            this.mark = mark;
        }

        @Override
        public void paint(Graphics2D graphics, double x, double y, int size) {
            double half = size / 2.0;
            switch (mark) {
                case DISC -> graphics.fill(new Ellipse2D.Double(x - half, y - half, size, size));
                case SQUARE -> graphics.fill(new Rectangle2D.Double(x - half * 0.9, y - half * 0.9, size * 0.9,
                        size * 0.9));
                case RING -> open(graphics, new Ellipse2D.Double(x - half, y - half, size, size));
                case TRIANGLE -> open(graphics, triangle(x, y, half));
                case CROSS -> cross(graphics, x, y, half * 0.85);
            }
        }

        private static void open(Graphics2D graphics, Shape shape) {
            Color colour = graphics.getColor();
            graphics.setColor(Palette.PAPER);
            graphics.fill(shape);
            graphics.setColor(colour);
            graphics.setStroke(OUTLINE);
            graphics.draw(shape);
        }

        private static Shape triangle(double x, double y, double half) {
            Path2D path = new Path2D.Double();
            path.moveTo(x, y - half * 1.1);
            path.lineTo(x + half * 1.1, y + half * 0.85);
            path.lineTo(x - half * 1.1, y + half * 0.85);
            path.closePath();
            return path;
        }

        private static void cross(Graphics2D graphics, double x, double y, double half) {
            Path2D path = new Path2D.Double();
            path.moveTo(x - half, y - half);
            path.lineTo(x + half, y + half);
            path.moveTo(x - half, y + half);
            path.lineTo(x + half, y - half);
            graphics.setStroke(CROSSED);
            graphics.draw(path);
        }
    }
}
