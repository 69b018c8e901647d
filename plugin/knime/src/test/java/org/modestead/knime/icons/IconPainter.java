package org.modestead.knime.icons;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.Shape;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.awt.geom.RoundRectangle2D;
import java.awt.image.BufferedImage;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Scanner;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import javax.imageio.ImageIO;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;
import org.xml.sax.SAXException;

/**
 * Draws the icons from their vector source: the few elements that they are made of (rectangles, circles and paths of absolute
 * straight and cubic pieces). {@link #main} writes the pixel files anew beside the sources.
 */
public final class IconPainter {
    static final Path FOLDER = Path.of("src", "main", "resources", "icons");
    static final int SIDE = 16;
    private static final Pattern STEP = Pattern.compile("[MLHVCZ]");

    private IconPainter() {}

    /** Writes every icon in both sizes. */
    public static void main(String[] arguments) throws IOException {
        for (String name : names()) {
            ImageIO.write(draw(FOLDER.resolve(name + ".svg"), 1), "png", FOLDER.resolve(name + ".png").toFile());
            ImageIO.write(draw(FOLDER.resolve(name + ".svg"), 2), "png", FOLDER.resolve(name + "@2x.png").toFile());
        }
    }

    /** Returns the names of all icons. */
    static List<String> names() throws IOException {
        try (Stream<Path> files = Files.list(FOLDER)) {
            return files.map(file -> file.getFileName().toString()).filter(name -> name.endsWith(".svg"))
                    .map(name -> name.substring(0, name.length() - ".svg".length())).sorted().toList();
        }
    }

    /** Draws one icon at a multiple of its size. */
    static BufferedImage draw(Path source, int scale) throws IOException {
        BufferedImage image = new BufferedImage(SIDE * scale, SIDE * scale, BufferedImage.TYPE_INT_ARGB);
        Graphics2D graphics = image.createGraphics();
        graphics.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        graphics.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        graphics.scale(scale, scale);
        NodeList elements = root(source).getChildNodes();
        for (int i = 0; i < elements.getLength(); i++) {
            if (elements.item(i) instanceof Element element && !element.getTagName().equals("title")) {
                draw(graphics, element);
            }
        }
        graphics.dispose();
        return image;
    }

    private static Element root(Path source) throws IOException {
        try {
            return DocumentBuilderFactory.newInstance().newDocumentBuilder().parse(source.toFile()).getDocumentElement();
        } catch (ParserConfigurationException | SAXException e) {
            throw new IOException(source + " cannot be read", e);
        }
    }

    private static void draw(Graphics2D graphics, Element element) {
        Shape shape = shape(element);
        if (!element.getAttribute("fill").equals("none")) {
            Color fill = Color.decode(element.getAttribute("fill"));
            double opacity = element.hasAttribute("fill-opacity") ? number(element, "fill-opacity") : 1;
            graphics.setColor(new Color(fill.getRed(), fill.getGreen(), fill.getBlue(), (int) Math.round(255 * opacity)));
            graphics.fill(shape);
        }
        if (element.hasAttribute("stroke")) {
            graphics.setColor(Color.decode(element.getAttribute("stroke")));
            graphics.setStroke(stroke(element));
            graphics.draw(shape);
        }
    }

    private static BasicStroke stroke(Element element) {
        float width = (float) number(element, "stroke-width");
        if (!element.hasAttribute("stroke-dasharray")) {
            return new BasicStroke(width, BasicStroke.CAP_BUTT, BasicStroke.JOIN_MITER, 4);
        }
        String[] dashes = element.getAttribute("stroke-dasharray").split(" ");
        return new BasicStroke(width, BasicStroke.CAP_BUTT, BasicStroke.JOIN_MITER, 4,
                new float[] {Float.parseFloat(dashes[0]), Float.parseFloat(dashes[1])}, 0);
    }

    private static Shape shape(Element element) {
        return switch (element.getTagName()) {
            case "rect" -> {
                double arc = element.hasAttribute("rx") ? 2 * number(element, "rx") : 0;
                yield new RoundRectangle2D.Double(number(element, "x"), number(element, "y"), number(element, "width"),
                        number(element, "height"), arc, arc);
            }
            case "circle" -> {
                double r = number(element, "r");
                yield new Ellipse2D.Double(number(element, "cx") - r, number(element, "cy") - r, 2 * r, 2 * r);
            }
            case "path" -> path(element.getAttribute("d"));
            default -> throw new IllegalArgumentException("element " + element.getTagName() + " is not drawn; use rect, circle or path");
        };
    }

    private static Shape path(String d) {
        Path2D.Double path = new Path2D.Double();
        Scanner in = new Scanner(d.replaceAll("([MLHVCZ])", " $1 ")).useLocale(java.util.Locale.ROOT);
        String step = "";
        while (in.hasNext()) {
            step = in.hasNext(STEP) ? in.next() : step;
            switch (step) {
                case "M" -> path.moveTo(in.nextDouble(), in.nextDouble());
                case "L" -> path.lineTo(in.nextDouble(), in.nextDouble());
                case "H" -> path.lineTo(in.nextDouble(), path.getCurrentPoint().getY());
                case "V" -> path.lineTo(path.getCurrentPoint().getX(), in.nextDouble());
                case "C" -> path.curveTo(in.nextDouble(), in.nextDouble(), in.nextDouble(), in.nextDouble(), in.nextDouble(),
                        in.nextDouble());
                case "Z" -> path.closePath();
                default -> throw new IllegalArgumentException("path " + d + ": step " + step);
            }
        }
        in.close();
        return path;
    }

    private static double number(Element element, String attribute) {
        return Double.parseDouble(element.getAttribute(attribute));
    }
}
