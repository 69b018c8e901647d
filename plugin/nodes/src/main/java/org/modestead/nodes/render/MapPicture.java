package org.modestead.nodes.render;

import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.font.FontRenderContext;
import java.awt.font.TextLayout;
import java.awt.geom.AffineTransform;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.List;
import org.knowm.xchart.internal.chartpart.IChart;

/** A map of colours: title above, rows named on the left, columns below, the scale of the colours at the foot. */
final class MapPicture implements IChart {

    private static final FontRenderContext METRICS = new FontRenderContext(null, true, true);
    private static final Font PLAIN = new Font(Font.SANS_SERIF, Font.PLAIN, 12);
    private static final Font SMALL = new Font(Font.SANS_SERIF, Font.PLAIN, 11);
    private static final Font BOLD = new Font(Font.SANS_SERIF, Font.BOLD, 14);
    private static final double SIDE = 460;
    private static final double LARGEST_CELL = 40;
    private static final int ROOM = 14;
    private static final int TITLE = 44;
    private static final int SCALE_HEIGHT = 52;
    private static final int SCALE_WIDTH = 220;
    private static final int LINE = 16;
    private static final int GAP = 10;
    private static final int LONGEST = 22;

    private final ColourMap map;
    private final double cell;
    private final double left;
    private final SlantedLabels below;

    MapPicture(ColourMap map) {
        this.map = map;
        this.cell = Math.min(LARGEST_CELL, SIDE / Math.max(map.rows().labels().size(), map.columns().labels().size()));
        this.left = ROOM + LINE + map.rows().labels().stream().mapToDouble(MapPicture::advance).max().orElse(0) + 8;
        this.below = new SlantedLabels(map.columns().labels(), map.columns().title(), column -> left + (column + 0.5) * cell);
    }

    private static double advance(String label) {
        return text(cut(label), SMALL).getAdvance();
    }

    private static String cut(String label) {
        return label.length() <= LONGEST ? label : label.substring(0, LONGEST - 1) + "…";
    }

    private static TextLayout text(String words, Font font) {
        return new TextLayout(words.isEmpty() ? " " : words, font, METRICS);
    }

    private double across() {
        return cell * map.columns().labels().size();
    }

    private double down() {
        return cell * map.rows().labels().size();
    }

    @Override
    public int getWidth() {
        double needed = Math.max(Math.max(left + across(), left + SCALE_WIDTH + 120), 2.0 * ROOM + text(map.title(), BOLD).getAdvance());
        return (int) Math.ceil(needed + ROOM);
    }

    @Override
    public int getHeight() {
        return (int) Math.ceil(TITLE + down() + GAP + below.height() + SCALE_HEIGHT);
    }

    @Override
    public String getTitle() {
        return map.title();
    }

    @Override
    public void paint(Graphics2D graphics, int width, int height) {
        graphics.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        graphics.setColor(Palette.PAPER);
        graphics.fill(new Rectangle2D.Double(0, 0, width, height));
        graphics.setColor(Palette.INK);
        write(graphics, map.title(), BOLD, ROOM, TITLE - 18.0);
        cells(graphics);
        rows(graphics);
        below.paint(graphics, width, (int) Math.round(TITLE + down()) + GAP);
        scale(graphics, TITLE + down() + GAP + below.height());
    }

    private static void write(Graphics2D graphics, String words, Font font, double x, double y) {
        graphics.fill(text(words, font).getOutline(AffineTransform.getTranslateInstance(x, y)));
    }

    /** One shape a colour, of runs of entries that share it: a file of some hundred kilobytes for the largest map. */
    private void cells(Graphics2D graphics) {
        Path2D[] shapes = new Path2D[ColourScale.STEPS];
        for (int i = 0; i < map.values().length; i++) {
            double[] row = map.values()[i];
            int from = 0;
            for (int j = 1; j <= row.length; j++) {
                if (j == row.length || step(row[j]) != step(row[from])) {
                    if (step(row[from]) >= 0) {
                        Path2D shape = shapes[step(row[from])] == null ? new Path2D.Double() : shapes[step(row[from])];
                        shape.append(new Rectangle2D.Double(left + from * cell, TITLE + i * cell, (j - from) * cell, cell), false);
                        shapes[step(row[from])] = shape;
                    }
                    from = j;
                }
            }
        }
        graphics.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_OFF);
        for (int step = 0; step < shapes.length; step++) {
            if (shapes[step] != null) {
                graphics.setColor(colours().colour(step));
                graphics.fill(shapes[step]);
            }
        }
        graphics.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        graphics.setColor(Palette.FRAME);
        graphics.draw(new Rectangle2D.Double(left, TITLE, across(), down()));
    }

    /** Returns -1 where there is nothing to be drawn. */
    private int step(double value) {
        return Double.isFinite(value) ? ColourScale.step((value - map.first()) / (map.last() - map.first())) : -1;
    }

    private ColourScale colours() {
        return map.diverging() ? ColourScale.APART : ColourScale.SEQUENCE;
    }

    private void rows(Graphics2D graphics) {
        List<String> names = map.rows().labels();
        int every = (int) Math.max(1, Math.ceil(LINE / cell));
        graphics.setColor(Palette.QUIET_INK);
        for (int i = 0; i < names.size(); i += every) {
            write(graphics, cut(names.get(i)), SMALL, left - 6 - advance(names.get(i)), TITLE + (i + 0.5) * cell + 4);
        }
        graphics.setColor(Palette.INK);
        AffineTransform upright = AffineTransform.getTranslateInstance(ROOM + LINE / 2.0, TITLE + down() / 2 + text(map.rows().title(), PLAIN).getAdvance() / 2);
        upright.rotate(-Math.PI / 2);
        graphics.fill(text(map.rows().title(), PLAIN).getOutline(upright));
    }

    private void scale(Graphics2D graphics, double top) {
        double width = (double) SCALE_WIDTH / ColourScale.STEPS;
        for (int step = 0; step < ColourScale.STEPS; step++) {
            graphics.setColor(colours().colour(step));
            graphics.fill(new Rectangle2D.Double(left + step * width, top + 8, width + 0.5, 12));
        }
        graphics.setColor(Palette.FRAME);
        graphics.draw(new Rectangle2D.Double(left, top + 8, SCALE_WIDTH, 12));
        graphics.setColor(Palette.INK);
        String last = HouseStyle.tick(shown(map.last()));
        write(graphics, HouseStyle.tick(shown(map.first())), SMALL, left, top + 36);
        write(graphics, last, SMALL, left + SCALE_WIDTH - advance(last), top + 36);
    }

    /** Four digits are enough for the ends of a scale. */
    private static double shown(double value) {
        return new java.math.BigDecimal(value).round(new java.math.MathContext(4)).doubleValue();
    }
}
