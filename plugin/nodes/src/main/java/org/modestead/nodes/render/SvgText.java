package org.modestead.nodes.render;

import java.io.StringReader;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import javax.xml.stream.XMLInputFactory;
import javax.xml.stream.XMLStreamConstants;
import javax.xml.stream.XMLStreamException;
import javax.xml.stream.XMLStreamReader;

/**
 * Rewrites drawn SVG so that it can stand inside a page: no declarations, ids that start with the figure's id, a text
 * alternative, coordinates to a hundredth of a pixel, and touching line segments of one style joined to one path (so
 * that dashes run through and the file is some ten times smaller).
 */
final class SvgText {
    private static final Pattern DOCTYPE = Pattern.compile("<!DOCTYPE[^>]*>");
    private static final Pattern DECIMAL = Pattern.compile("-?\\d+\\.\\d+(?:[eE][-+]?\\d+)?");
    private static final Pattern REFERENCE = Pattern.compile("url\\(#([^)]*)\\)");

    private final StringBuilder out = new StringBuilder();
    private final Map<String, String> ids = new LinkedHashMap<>();
    private final Described figure;
    private final Polyline open = new Polyline();

    private SvgText(Described figure) {
        this.figure = figure;
    }

    /**
     * What is said of a picture.
     *
     * @param id with which ids in it start
     * @param title one line
     * @param caption with the title the text alternative
     */
    record Described(String id, String title, String caption) {}

    static String tidy(String svg, Described figure) {
        SvgText text = new SvgText(figure);
        try {
            text.rewrite(DOCTYPE.matcher(svg).replaceFirst(""));
        } catch (XMLStreamException e) {
            throw new IllegalStateException("the drawn figure " + figure.id() + " is not well-formed", e);
        }
        return text.out.toString();
    }

    private void rewrite(String svg) throws XMLStreamException {
        XMLInputFactory factory = XMLInputFactory.newInstance();
        factory.setProperty(XMLInputFactory.SUPPORT_DTD, false);
        factory.setProperty(XMLInputFactory.IS_SUPPORTING_EXTERNAL_ENTITIES, false);
        XMLStreamReader reader = factory.createXMLStreamReader(new StringReader(svg));
        while (reader.hasNext()) {
            int event = reader.next();
            if (event == XMLStreamConstants.START_ELEMENT) {
                start(reader.getLocalName(), attributes(reader));
            } else if (event == XMLStreamConstants.END_ELEMENT) {
                end(reader.getLocalName());
            } else if (event == XMLStreamConstants.CHARACTERS && !reader.isWhiteSpace()) {
                out.append(escape(reader.getText()));
            }
        }
    }

    private void start(String name, Map<String, String> attributes) {
        if (name.equals("line")) {
            if (!open.continues(attributes)) {
                close();
                open.begin(attributes);
            }
            open.extend(attributes);
            return;
        }
        close();
        if (name.equals("svg")) {
            root(attributes);
            return;
        }
        element(name, attributes);
        out.append('>');
    }

    private void end(String name) {
        if (!name.equals("line")) {
            close();
            out.append("</").append(name).append(">");
        }
    }

    private void close() {
        if (!open.isEmpty()) {
            element("path", Map.of("d", open.path(), "style", open.style()));
            out.append("/>");
            open.clear();
        }
    }

    private void root(Map<String, String> attributes) {
        String[] box = attributes.get("viewBox").split(" ");
        out.append("<svg xmlns=\"http://www.w3.org/2000/svg\" role=\"img\" viewBox=\"").append(attributes.get("viewBox"))
                .append("\" width=\"").append(box[2]).append("\" height=\"").append(box[3]).append("\" aria-label=\"")
                .append(escape(figure.title() + ". " + figure.caption())).append("\"><title>")
                .append(escape(figure.title()))
                .append("</title>");
    }

    private void element(String name, Map<String, String> attributes) {
        out.append("\n<").append(name);
        new TreeMap<>(attributes).forEach((key, value) -> out.append(' ').append(key).append("=\"")
                .append(value(key, value)).append('"'));
    }

    private String value(String key, String value) {
        return switch (key) {
            case "id" -> id(value);
            case "clip-path" -> REFERENCE.matcher(value).replaceAll(match -> "url(#" + id(match.group(1)) + ")");
            case "style" -> escape(plainStyle(value));
            default -> escape(rounded(value));
        };
    }

    private String id(String drawn) {
        return ids.computeIfAbsent(drawn, unseen -> figure.id() + "-clip-" + (ids.size() + 1));
    }

    private static String plainStyle(String style) {
        return rounded(style.replace("stroke-miterlimit:10;", "").replace("stroke-dasharray:3,0;", "")
                .replace("stroke:none;", ""));
    }

    private static String rounded(String text) {
        Matcher matcher = DECIMAL.matcher(text);
        return matcher.replaceAll(match -> Hundredths.of(match.group()));
    }

    private static Map<String, String> attributes(XMLStreamReader reader) {
        Map<String, String> found = new LinkedHashMap<>();
        for (int i = 0; i < reader.getAttributeCount(); i++) {
            found.put(reader.getAttributeLocalName(i), reader.getAttributeValue(i));
        }
        return found;
    }

    private static String escape(String text) {
        return text.replace("&", "&amp;").replace("<", "&lt;").replace(">", "&gt;").replace("\"", "&quot;");
    }

    /** Line segments that touch, in drawing order. */
    private static final class Polyline {
        private final StringBuilder path = new StringBuilder();
        private String style = "";
        private List<String> end = List.of();

        boolean continues(Map<String, String> line) {
            return style.equals(line.get("style")) && end.equals(List.of(line.get("x1"), line.get("y1")));
        }

        void begin(Map<String, String> line) {
            style = line.get("style");
            path.append('M').append(line.get("x1")).append(',').append(line.get("y1"));
        }

        void extend(Map<String, String> line) {
            path.append(" L").append(line.get("x2")).append(',').append(line.get("y2"));
            end = List.of(line.get("x2"), line.get("y2"));
        }

        boolean isEmpty() {
            return path.isEmpty();
        }

        String path() {
            return path.toString();
        }

        String style() {
            return style;
        }

        void clear() {
            path.setLength(0);
            style = "";
            end = List.of();
        }
    }
}
