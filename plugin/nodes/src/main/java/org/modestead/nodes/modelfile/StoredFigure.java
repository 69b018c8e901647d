package org.modestead.nodes.modelfile;

import java.util.List;
import org.modestead.engine.modelfile.FieldsReader;
import org.modestead.engine.modelfile.FieldsWriter;
import org.modestead.engine.modelfile.Stored;
import org.modestead.nodes.figure.Figure;

/** A figure: axes and layers, coordinates as arrays. */
final class StoredFigure {

    private StoredFigure() {}

    static Stored.Fields of(Figure figure) {
        return new FieldsWriter().text("id", figure.id()).choice("kind", figure.kind()).text("title", figure.title())
                .text("caption", figure.caption()).put("x", of(figure.x())).put("y", of(figure.y())).put("right", figure.right(), StoredFigure::of)
                .list("layers", figure.layers(), StoredFigure::of).done();
    }

    static Figure read(FieldsReader in) {
        return new Figure(in.text("id"), in.choice("kind", Figure.Kind.class), in.text("title"), in.text("caption"),
                in.object("x", StoredFigure::axis), in.object("y", StoredFigure::axis), in.optional("right", StoredFigure::axis),
                in.objects("layers", StoredFigure::layer));
    }

    private static Stored.Fields of(Figure.Axis axis) {
        return new FieldsWriter().text("label", axis.label()).flag("logarithmic", axis.logarithmic()).texts("categories", axis.categories())
                .text("time", axis.time()).done();
    }

    private static Figure.Axis axis(FieldsReader in) {
        return new Figure.Axis(in.text("label"), in.flag("logarithmic"), in.texts("categories"), in.text("time"));
    }

    private static Stored.Fields of(Figure.Layer layer) {
        FieldsWriter out = new FieldsWriter().text("name", layer.name()).text("selection", layer.selection());
        if (layer instanceof Figure.Line line) {
            return out.text("kind", "line").vector("x", line.x()).vector("y", line.y()).choice("emphasis", line.emphasis()).done();
        }
        if (layer instanceof Figure.Backdrop backdrop) {
            return out.text("kind", "backdrop").vector("x", backdrop.x()).vector("y", backdrop.y()).done();
        }
        if (layer instanceof Figure.Band band) {
            return out.text("kind", "band").vector("x", band.x()).vector("low", band.low()).vector("high", band.high()).done();
        }
        if (layer instanceof Figure.Points points) {
            return out.text("kind", "points").vector("x", points.x()).vector("y", points.y()).texts("labels", points.labels())
                    .choice("emphasis", points.emphasis()).choice("mark", points.mark()).done();
        }
        if (layer instanceof Figure.Bars bars) {
            return out.text("kind", "bars").vector("heights", bars.heights()).done();
        }
        Figure.Rule rule = (Figure.Rule) layer;
        return out.text("kind", "rule").flag("vertical", rule.vertical()).number("at", rule.at()).done();
    }

    private static Figure.Layer layer(FieldsReader in) {
        String name = in.text("name");
        String selection = in.text("selection");
        String kind = in.text("kind");
        return switch (kind) {
            case "line" -> line(in, name, selection);
            case "backdrop" -> backdrop(in, name, selection);
            case "band" -> band(in, name, selection);
            case "points" -> points(in, name, selection);
            case "bars" -> new Figure.Bars(name, selection, in.vector("heights"));
            case "rule" -> new Figure.Rule(name, selection, in.flag("vertical"), in.number("at"));
            default -> throw in.wrong("kind", "a layer of kind " + kind, "a kind that is known here");
        };
    }

    private static Figure.Line line(FieldsReader in, String name, String selection) {
        double[] x = in.vector("x");
        return new Figure.Line(name, selection, x, in.vector("y", x.length), in.choice("emphasis", Figure.Emphasis.class));
    }

    private static Figure.Backdrop backdrop(FieldsReader in, String name, String selection) {
        double[] x = in.vector("x");
        return new Figure.Backdrop(name, selection, x, in.vector("y", x.length));
    }

    private static Figure.Band band(FieldsReader in, String name, String selection) {
        double[] x = in.vector("x");
        return new Figure.Band(name, selection, x, in.vector("low", x.length), in.vector("high", x.length));
    }

    private static Figure.Points points(FieldsReader in, String name, String selection) {
        double[] x = in.vector("x");
        List<String> labels = in.texts("labels");
        if (labels.size() != x.length) {
            throw in.wrong("labels", labels.size() + " labels", x.length + " labels");
        }
        return new Figure.Points(name, selection, x, in.vector("y", x.length), labels, in.choice("emphasis", Figure.Emphasis.class),
                in.choice("mark", Figure.Mark.class));
    }
}
