package org.modestead.nodes.render;

import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.font.FontRenderContext;
import java.awt.font.TextLayout;
import java.awt.geom.AffineTransform;
import java.awt.geom.Line2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.nodes.figure.Figure;

/**
 * The names of layers with what each looks like, in rows below the plot, so that they never cover data. Drawn here
 * because the chart library's legend neither wraps nor keeps a name closer to its own sign than to the next one.
 *
 * @param rows from top to bottom, each from left to right
 * @param styles of the figure
 * @param marked whether lines carry marks
 */
record Legend(List<List<Entry>> rows, LayerStyles styles, boolean marked) {
    private static final Font PLAIN = new Font(Font.SANS_SERIF, Font.PLAIN, 12);
    private static final FontRenderContext METRICS = new FontRenderContext(null, true, true);
    private static final int ROW = 20;
    private static final int SIGN = 30;
    private static final int GAP = 6;
    private static final int BETWEEN = 22;
    private static final int EDGE = 16;

    /** One name. */
    record Entry(Figure.Layer layer, TextLayout text) {
        double width() {
            return SIGN + GAP + text.getAdvance();
        }
    }

    static Legend of(Figure figure, int width, boolean marked) {
        Map<String, Figure.Layer> named = new LinkedHashMap<>();
        figure.layers().stream().filter(layer -> !layer.name().isEmpty() && !(layer instanceof Figure.Rule))
                .forEach(layer -> named.putIfAbsent(layer.name(), layer));
        List<List<Entry>> rows = new ArrayList<>();
        double used = width;
        for (Figure.Layer layer : named.values()) {
            Entry entry = new Entry(layer, new TextLayout(layer.name(), PLAIN, METRICS));
            if (used + BETWEEN + entry.width() > width - 2 * EDGE) {
                rows.add(new ArrayList<>());
                used = -BETWEEN;
            }
            rows.get(rows.size() - 1).add(entry);
            used += BETWEEN + entry.width();
        }
        return new Legend(rows, new LayerStyles(figure), marked);
    }

    int height() {
        return rows.isEmpty() ? 0 : rows.size() * ROW + GAP;
    }

    void paint(Graphics2D graphics, int width, int top) {
        double middle = top + ROW / 2.0 - 2;
        for (List<Entry> row : rows) {
            double length = row.stream().mapToDouble(Entry::width).sum() + BETWEEN * (row.size() - 1);
            double left = (width - length) / 2;
            for (Entry entry : row) {
                sign(graphics, entry.layer(), left, middle);
                graphics.setColor(Palette.INK);
                graphics.fill(entry.text().getOutline(AffineTransform.getTranslateInstance(left + SIGN + GAP, middle + 4)));
                left += entry.width() + BETWEEN;
            }
            middle += ROW;
        }
    }

    private void sign(Graphics2D graphics, Figure.Layer layer, double left, double middle) {
        graphics.setColor(styles.colour(layer));
        double centre = left + SIGN / 2.0;
        if (layer instanceof Figure.Line line) {
            graphics.setStroke(styles.stroke(line));
            graphics.draw(new Line2D.Double(left, middle, left + SIGN, middle));
            if (marked) {
                Marks.of(styles.curveMark(line)).paint(graphics, centre, middle, Marks.SIZE);
            }
        } else if (layer instanceof Figure.Backdrop) {
            graphics.setStroke(LayerStyles.backdrop());
            graphics.draw(new Line2D.Double(left, middle, left + SIGN, middle));
        } else if (layer instanceof Figure.Points points) {
            Marks.of(points.mark()).paint(graphics, left + SIGN - Marks.SIZE / 2.0 - 2, middle, Marks.SIZE);
        } else {
            graphics.fill(new Rectangle2D.Double(left + SIGN - 20, middle - 6, 20, 12));
        }
    }
}
