package org.modestead.nodes.render;

import org.modestead.nodes.figure.Figure;

/**
 * Draws figures with Java 2D, without a screen: vector text for pages and print, pixels for files and views.
 *
 * <p>The same figure gives the same bytes on the same machine; letters are drawn as outlines of the machine's
 * sans-serif font, so a file looks the same everywhere once made.
 */
public final class FigureRenderer {

    private FigureRenderer() {}

    /**
     * Draws as SVG 1.1.
     *
     * @param figure what to draw
     * @return one {@code svg} element without XML declaration and document type, with the caption as text alternative;
     *     ids in it start with the figure's id
     * @throws IllegalArgumentException if a layer does not fit the axes
     */
    public static String svg(Figure figure) {
        return Canvas.svg(picture(figure), new SvgText.Described(figure.id(), figure.title(), figure.caption()));
    }

    /**
     * Draws as PNG.
     *
     * @param figure what to draw
     * @param scale pixels per picture unit, 1 for a plain screen, 2 for a fine one; positive
     * @return the file's bytes
     * @throws IllegalArgumentException if a layer does not fit the axes or the scale is not positive
     */
    public static byte[] png(Figure figure, double scale) {
        return Canvas.png(picture(figure), scale);
    }

    /**
     * Prepares a figure for painting by Java 2D: what a view on a screen shows is what a file holds.
     *
     * @param figure what to draw
     * @throws IllegalArgumentException if a layer does not fit the axes
     */
    public static Drawing drawing(Figure figure) {
        return new Drawing(picture(figure));
    }

    private static Picture picture(Figure figure) {
        return figure.x().categories().isEmpty() ? XyPlot.picture(figure) : CategoryPlot.picture(figure);
    }
}
