package org.modestead.nodes.render;

import java.awt.BasicStroke;
import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.Shape;
import java.awt.font.FontRenderContext;
import java.awt.font.TextLayout;
import java.awt.geom.AffineTransform;
import java.awt.geom.Line2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import org.modestead.nodes.figure.Figure;

/**
 * Rules and point labels, painted over a chart that has been drawn. A label that would cover another one is left out:
 * the table beside the figure has them all.
 */
record Overlay(Figure figure, Range x, Range y, DoubleUnaryOperator screenX, DoubleUnaryOperator screenY, TimeTicks times) {
    private static final Font SMALL = new Font(Font.SANS_SERIF, Font.PLAIN, 11);
    private static final BasicStroke RULE = new BasicStroke(1.2f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_MITER, 10,
            new float[] {5, 4}, 0);
    private static final BasicStroke HALO = new BasicStroke(3f, BasicStroke.CAP_ROUND, BasicStroke.JOIN_ROUND);
    private static final FontRenderContext METRICS = new FontRenderContext(null, true, true);
    private static final double GAP = 8;

    void paint(Graphics2D graphics) {
        graphics.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        List<Rectangle2D> taken = new ArrayList<>();
        for (Figure.Layer layer : figure.layers()) {
            if (layer instanceof Figure.Rule rule) {
                rule(graphics, rule, taken);
            }
        }
        for (Figure.Layer layer : figure.layers()) {
            if (layer instanceof Figure.Points points) {
                labels(graphics, points, taken);
            }
        }
    }

    private void rule(Graphics2D graphics, Figure.Rule rule, List<Rectangle2D> taken) {
        graphics.setColor(Palette.QUIET_INK);
        graphics.setStroke(RULE);
        double right = left(x.high());
        if (rule.vertical()) {
            double at = left(rule.at());
            graphics.draw(new Line2D.Double(at, top(y.low()), at, top(y.high())));
            boolean room = at + GAP + width(rule.name()) < right;
            text(graphics, rule.name(), room ? at + GAP / 2 : at - GAP / 2 - width(rule.name()), top(y.high()) + 14, taken);
        } else {
            double at = top(rule.at());
            graphics.draw(new Line2D.Double(left(x.low()), at, right, at));
            text(graphics, rule.name(), right - width(rule.name()) - GAP / 2, at - 4, taken);
        }
    }

    private void labels(Graphics2D graphics, Figure.Points points, List<Rectangle2D> taken) {
        for (int i = 0; i < points.x().length; i++) {
            if (Double.isFinite(points.x()[i]) && Range.drawable(points.y()[i], figure.y())) {
                label(graphics, points.labels().get(i), left(points.x()[i]), top(points.y()[i]), taken);
            }
        }
    }

    /** Above and right of the mark where there is room, else above and left, else below and right. */
    private void label(Graphics2D graphics, String label, double at, double height, List<Rectangle2D> taken) {
        boolean room = at + GAP + width(label) < left(x.high());
        if (room && text(graphics, label, at + GAP, height - 5, taken)) {
            return;
        }
        if (!text(graphics, label, at - GAP - width(label), height - 5, taken) && room) {
            text(graphics, label, at + GAP, height + 14, taken);
        }
    }

    private double left(double value) {
        return screenX.applyAsDouble(times.axis(value));
    }

    private double top(double value) {
        return screenY.applyAsDouble(value);
    }

    private static double width(String text) {
        return text.isEmpty() ? 0 : new TextLayout(text, SMALL, METRICS).getAdvance();
    }

    /** Returns whether there was nothing in the way. */
    private static boolean text(Graphics2D graphics, String text, double left, double baseline, List<Rectangle2D> taken) {
        if (text.isEmpty()) {
            return true;
        }
        Shape outline = new TextLayout(text, SMALL, METRICS)
                .getOutline(AffineTransform.getTranslateInstance(left, baseline));
        Rectangle2D bounds = outline.getBounds2D();
        if (taken.stream().anyMatch(bounds::intersects)) {
            return false;
        }
        taken.add(bounds);
        halo(graphics, outline);
        graphics.setColor(Palette.INK);
        graphics.fill(outline);
        return true;
    }

    private static void halo(Graphics2D graphics, Shape outline) {
        graphics.setColor(Palette.PAPER);
        graphics.setStroke(HALO);
        graphics.draw(outline);
    }
}
