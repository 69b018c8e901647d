package org.modestead.knime.icons;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Color;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.file.Files;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;

/** Every node and the category have an icon in the platform's sizes, drawn from the vector source beside it. */
class IconsTest {

    @Test
    void everyNodeAndTheCategoryHaveAnIcon() throws IOException {
        List<String> wanted = new ArrayList<>(NodeCatalog.load(List.of(Node.class.getClassLoader())).ids());
        wanted.add("modestead");
        assertTrue(IconPainter.names().containsAll(wanted), () -> "missing among " + wanted);
    }

    /**
     * Pixels, not bytes: how a file is packed is up to the JDK, and edges differ between JDK 17 and 25 by up to 3 of 255; a shape that
     * was changed differs by 100 and more. To draw anew run {@link IconPainter} in the module's folder.
     */
    @Test
    void pixelFilesAreDrawnFromTheVectorSource() throws IOException {
        for (String name : IconPainter.names()) {
            for (int scale : new int[] {1, 2}) {
                BufferedImage drawn = IconPainter.draw(IconPainter.FOLDER.resolve(name + ".svg"), scale);
                BufferedImage kept = ImageIO.read(IconPainter.FOLDER.resolve(name + (scale == 1 ? ".png" : "@2x.png")).toFile());
                assertEquals(IconPainter.SIDE * scale, kept.getWidth(), name);
                assertEquals(IconPainter.SIDE * scale, kept.getHeight(), name);
                assertTrue(distance(drawn, kept) <= 16, name + " at scale " + scale + " differs by " + distance(drawn, kept) + " of 255");
            }
        }
    }

    /** Each icon differs from each other in a tenth of its pixels or more, by lightness alone: told apart without colour too. */
    @Test
    void iconsAreToldApartAtSixteenPixelsWithoutColour() throws IOException {
        List<String> names = IconPainter.names();
        for (int i = 0; i < names.size(); i++) {
            for (int j = 0; j < i; j++) {
                double share = share(read(names.get(i)), read(names.get(j)));
                assertTrue(share >= 0.1, names.get(i) + " and " + names.get(j) + " differ in " + share + " of their pixels");
            }
        }
    }

    /** On the plate, whose lightness they must leave by 3:1 at least somewhere (WCAG 2.2, 1.4.11). */
    @Test
    void iconsAreDarkOnABrightPlateOnAnyNodeColour() throws IOException {
        for (String name : IconPainter.names()) {
            BufferedImage image = read(name);
            long strong = IntStream.range(0, 256).filter(k -> luminance(image.getRGB(k % 16, k / 16)) < 0.3).count();
            assertTrue(strong >= 20, name + " has " + strong + " dark pixels");
            assertTrue(image.getRGB(0, 0) >>> 24 < 32, "corners are clear");
        }
    }

    @Test
    void everySourceNamesWhatItStandsFor() throws IOException {
        for (String name : IconPainter.names()) {
            assertTrue(Files.readString(IconPainter.FOLDER.resolve(name + ".svg")).contains("<title>"), name);
        }
    }

    private static BufferedImage read(String name) throws IOException {
        return ImageIO.read(IconPainter.FOLDER.resolve(name + ".png").toFile());
    }

    private static double share(BufferedImage a, BufferedImage b) {
        return IntStream.range(0, 256).filter(k -> Math.abs(luminance(a.getRGB(k % 16, k / 16)) - luminance(b.getRGB(k % 16,
                k / 16))) > 0.2)
                .count() / 256.0;
    }

    private static double luminance(int argb) {
        Color colour = new Color(argb, true);
        double opaque = colour.getAlpha() / 255.0;
        double light = 0.2126 * Math.pow(colour.getRed() / 255.0, 2.2) + 0.7152 * Math.pow(colour.getGreen() / 255.0, 2.2)
                + 0.0722 * Math.pow(colour.getBlue() / 255.0, 2.2);
        return opaque * light + 1 - opaque;
    }

    private static int distance(BufferedImage a, BufferedImage b) {
        int worst = 0;
        for (int y = 0; y < a.getHeight(); y++) {
            for (int x = 0; x < a.getWidth(); x++) {
                for (int shift = 0; shift < 32; shift += 8) {
                    worst = Math.max(worst, Math.abs((a.getRGB(x, y) >>> shift & 255) - (b.getRGB(x, y) >>> shift & 255)));
                }
            }
        }
        return worst;
    }
}
