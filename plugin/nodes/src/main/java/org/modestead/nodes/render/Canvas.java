package org.modestead.nodes.render;

import de.erichseifert.vectorgraphics2d.VectorGraphics2D;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import javax.imageio.ImageIO;
import org.knowm.xchart.internal.chartpart.IChart;

/** Makes files of what can be painted. */
final class Canvas {

    private Canvas() {}

    /** Returns one {@code svg} element. */
    static String svg(IChart painted, SvgText.Described described) {
        VectorGraphics2D recorder = new VectorGraphics2D();
        painted.paint(recorder, painted.getWidth(), painted.getHeight());
        return SvgText.of(recorder.getCommands(), painted.getWidth(), painted.getHeight(), described);
    }

    /** Returns a file's bytes. */
    static byte[] png(IChart painted, double scale) {
        if (!(scale > 0)) {
            throw new IllegalArgumentException("scale " + scale + " must be positive");
        }
        BufferedImage image = new BufferedImage((int) Math.round(painted.getWidth() * scale), (int) Math.round(painted.getHeight() * scale),
                BufferedImage.TYPE_INT_RGB);
        Graphics2D graphics = image.createGraphics();
        graphics.setRenderingHint(RenderingHints.KEY_RENDERING, RenderingHints.VALUE_RENDER_QUALITY);
        graphics.scale(scale, scale);
        painted.paint(graphics, painted.getWidth(), painted.getHeight());
        graphics.dispose();
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try {
            ImageIO.write(image, "png", bytes);
        } catch (IOException e) {
            throw new UncheckedIOException("a figure could not be drawn in memory", e);
        }
        return bytes.toByteArray();
    }
}
