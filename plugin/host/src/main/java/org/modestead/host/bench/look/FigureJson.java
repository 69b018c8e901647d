package org.modestead.host.bench.look;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import org.modestead.nodes.figure.Figure;

/**
 * Writes a figure as JSON: the same data that the renderer draws into files and reports, so that no picture is defined twice.
 *
 * <p>Kinds, marks and emphasis are the names of the enum constants; numbers that are not finite are {@code null}.
 */
public final class FigureJson {
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    private FigureJson() {}

    /** Returns the whole figure. */
    public static ObjectNode of(Figure figure) {
        ObjectNode out = headline(figure);
        out.set("x", axis(figure.x()));
        out.set("y", axis(figure.y()));
        out.set("right", figure.right().map(FigureJson::axis).orElse(null));
        ArrayNode layers = out.putArray("layers");
        figure.layers().forEach(layer -> layers.add(layer(layer)));
        return out;
    }

    /** Returns what a list of figures says of each: id, kind, title, caption. */
    public static ObjectNode headline(Figure figure) {
        return NODES.objectNode().put("id", figure.id()).put("kind", figure.kind().name()).put("title", figure.title())
                .put("caption", figure.caption());
    }

    private static ObjectNode axis(Figure.Axis axis) {
        ObjectNode out = NODES.objectNode().put("label", axis.label()).put("logarithmic", axis.logarithmic());
        ArrayNode categories = out.putArray("categories");
        axis.categories().forEach(categories::add);
        return out.put("time", axis.time());
    }

    private static ObjectNode layer(Figure.Layer layer) {
        ObjectNode out = NODES.objectNode();
        if (layer instanceof Figure.Line line) {
            named(out, "line", layer).put("emphasis", line.emphasis().name());
            return points(out, line.x(), line.y());
        }
        if (layer instanceof Figure.Backdrop backdrop) {
            return points(named(out, "backdrop", layer), backdrop.x(), backdrop.y());
        }
        if (layer instanceof Figure.Band band) {
            named(out, "band", layer).set("x", Numbers.of(band.x()));
            out.set("low", Numbers.of(band.low()));
            return out.set("high", Numbers.of(band.high()));
        }
        if (layer instanceof Figure.Points points) {
            named(out, "points", layer).put("emphasis", points.emphasis().name()).put("mark", points.mark().name());
            ArrayNode labels = out.putArray("labels");
            points.labels().forEach(labels::add);
            return points(out, points.x(), points.y());
        }
        if (layer instanceof Figure.Bars bars) {
            return named(out, "bars", layer).set("heights", Numbers.of(bars.heights()));
        }
        Figure.Rule rule = (Figure.Rule) layer;
        return named(out, "rule", layer).put("vertical", rule.vertical()).put("at", rule.at());
    }

    private static ObjectNode named(ObjectNode out, String type, Figure.Layer layer) {
        return out.put("type", type).put("name", layer.name()).put("selection", layer.selection());
    }

    private static ObjectNode points(ObjectNode out, double[] x, double[] y) {
        out.set("x", Numbers.of(x));
        return out.set("y", Numbers.of(y));
    }
}
