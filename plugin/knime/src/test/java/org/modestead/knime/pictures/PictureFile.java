package org.modestead.knime.pictures;

import java.awt.image.BufferedImage;
import java.awt.image.IndexColorModel;
import java.io.IOException;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import javax.imageio.ImageIO;

/** Writes small pictures: at most 256 colours, the most frequent ones; others become the nearest of these. */
final class PictureFile {
    private static final int MOST = 256;

    private PictureFile() {}

    static void write(BufferedImage image, Path file) throws IOException {
        ImageIO.write(indexed(image), "png", file.toFile());
    }

    private static BufferedImage indexed(BufferedImage image) {
        Map<Integer, Integer> counts = new HashMap<>();
        int[] pixels = image.getRGB(0, 0, image.getWidth(), image.getHeight(), null, 0, image.getWidth());
        for (int pixel : pixels) {
            counts.merge(pixel & 0xffffff, 1, Integer::sum);
        }
        List<Integer> colours = counts.entrySet().stream()
                .sorted(Map.Entry.<Integer, Integer>comparingByValue().reversed().thenComparing(Map.Entry.comparingByKey()))
                .limit(MOST).map(Map.Entry::getKey).toList();
        int[] palette = colours.stream().mapToInt(Integer::intValue).toArray();
        IndexColorModel model = new IndexColorModel(8, palette.length, palette, 0, false, -1, java.awt.image.DataBuffer.TYPE_BYTE);
        BufferedImage small = new BufferedImage(image.getWidth(), image.getHeight(), BufferedImage.TYPE_BYTE_INDEXED, model);
        Map<Integer, Integer> nearest = new HashMap<>();
        for (int i = 0; i < pixels.length; i++) {
            int index = nearest.computeIfAbsent(pixels[i] & 0xffffff, colour -> nearest(palette, colour));
            small.getRaster().setSample(i % image.getWidth(), i / image.getWidth(), 0, index);
        }
        return small;
    }

    private static int nearest(int[] palette, int colour) {
        return IntStream.range(0, palette.length).boxed().min(java.util.Comparator.comparingInt(k -> distance(palette[k], colour)))
                .orElseThrow();
    }

    private static int distance(int a, int b) {
        return IntStream.of(0, 8, 16).map(shift -> (a >> shift & 255) - (b >> shift & 255)).map(d -> d * d).sum();
    }
}
