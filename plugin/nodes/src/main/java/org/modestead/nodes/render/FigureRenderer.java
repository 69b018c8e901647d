package org.modestead.nodes.render;

import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import javax.imageio.ImageIO;
import org.knowm.xchart.ChartEncoder;
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
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try {
            ChartEncoder.saveChart(picture(figure), bytes, "svg");
        } catch (IOException e) {
            throw new UncheckedIOException("a figure could not be drawn in memory", e);
        }
        return SvgText.tidy(bytes.toString(StandardCharsets.UTF_8), figure);
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
        if (!(scale > 0)) {
            throw new IllegalArgumentException("scale " + scale + " must be positive");
        }
        Drawing drawing = drawing(figure);
        BufferedImage image = new BufferedImage((int) Math.round(drawing.width() * scale),
                (int) Math.round(drawing.height() * scale),
                BufferedImage.TYPE_INT_RGB);
        Graphics2D graphics = image.createGraphics();
        graphics.setRenderingHint(RenderingHints.KEY_RENDERING, RenderingHints.VALUE_RENDER_QUALITY);
        drawing.paint(graphics, scale);
        graphics.dispose();
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try {
            ImageIO.write(image, "png", bytes);
        } catch (IOException e) {
            throw new UncheckedIOException("a figure could not be drawn in memory", e);
        }
        return bytes.toByteArray();
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
