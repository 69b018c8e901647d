package org.modestead.nodes.render;

import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.font.FontRenderContext;
import java.awt.font.TextLayout;
import java.awt.geom.AffineTransform;
import java.util.List;
import java.util.function.DoubleUnaryOperator;

/**
 * Names of categories that do not fit side by side: slanted below the plot, each ending at its place on the axis. Of
 * very many names every second, third, ... is written.
 *
 * @param names of the categories, empty to draw nothing
 * @param title of the axis
 * @param screenX place of a category in pixels, once the chart has been drawn
 */
record SlantedLabels(List<String> names, String title, DoubleUnaryOperator screenX) {
    static final SlantedLabels NONE = new SlantedLabels(List.of(), "", position -> position);
    private static final Font SMALL = new Font(Font.SANS_SERIF, Font.PLAIN, 11);
    private static final Font PLAIN = new Font(Font.SANS_SERIF, Font.PLAIN, 12);
    private static final FontRenderContext METRICS = new FontRenderContext(null, true, true);
    private static final double ANGLE = Math.toRadians(-35);
    private static final int MOST = 30;
    private static final int LONGEST = 22;
    private static final int TITLE = 22;

    private double longest() {
        return names.stream().mapToDouble(name -> layout(name).getAdvance()).max().orElse(0);
    }

    int height() {
        return names.isEmpty() ? 0 : (int) Math.ceil(longest() * Math.sin(-ANGLE)) + TITLE + 6;
    }

    void paint(Graphics2D graphics, int width, int top) {
        if (names.isEmpty()) {
            return;
        }
        graphics.setColor(Palette.QUIET_INK);
        int every = (names.size() + MOST - 1) / MOST;
        for (int i = 0; i < names.size(); i += every) {
            TextLayout text = layout(names.get(i));
            AffineTransform place = AffineTransform.getTranslateInstance(screenX.applyAsDouble(i) + 3, top + 2);
            place.rotate(ANGLE);
            place.translate(-text.getAdvance(), 0);
            graphics.fill(text.getOutline(place));
        }
        TextLayout axis = new TextLayout(title, PLAIN, METRICS);
        graphics.setColor(Palette.INK);
        double middle = (screenX.applyAsDouble(0) + screenX.applyAsDouble(names.size() - 1.0)) / 2;
        graphics.fill(axis.getOutline(AffineTransform.getTranslateInstance(middle - axis.getAdvance() / 2,
                top + height() - 6.0)));
    }

    private static TextLayout layout(String name) {
        String shown = name.length() <= LONGEST ? name : name.substring(0, LONGEST - 1) + "…";
        return new TextLayout(shown.isEmpty() ? " " : shown, SMALL, METRICS);
    }
}
