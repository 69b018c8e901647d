package org.modestead.nodes.render;

import de.erichseifert.vectorgraphics2d.intermediate.CommandSequence;
import de.erichseifert.vectorgraphics2d.intermediate.commands.Command;
import de.erichseifert.vectorgraphics2d.intermediate.commands.CreateCommand;
import de.erichseifert.vectorgraphics2d.intermediate.commands.DisposeCommand;
import de.erichseifert.vectorgraphics2d.intermediate.commands.DrawShapeCommand;
import de.erichseifert.vectorgraphics2d.intermediate.commands.FillShapeCommand;
import de.erichseifert.vectorgraphics2d.intermediate.commands.StateCommand;
import java.awt.Shape;
import java.awt.geom.AffineTransform;
import java.awt.geom.Line2D;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * Writes what was drawn as SVG that can stand inside a page: no declarations, ids that start with the figure's id, a text
 * alternative, coordinates to a hundredth of a pixel, and touching line segments of one style joined to one path (so
 * that dashes run through and the file is some ten times smaller).
 */
final class SvgText {

    private final StringBuilder out = new StringBuilder();
    private final StringBuilder clips = new StringBuilder();
    private final Map<Shape, String> ids = new LinkedHashMap<>();
    private final Deque<SvgPen> pens = new ArrayDeque<>();
    private final SvgLines lines = new SvgLines();
    private final Described figure;
    private boolean grouped;
    private boolean moved;

    private SvgText(Described figure) {
        this.figure = figure;
        pens.push(SvgPen.FIRST);
    }

    /**
     * What is said of a picture.
     *
     * @param id with which ids in it start
     * @param title one line
     * @param caption with the title the text alternative
     */
    record Described(String id, String title, String caption) {}

    /**
     * @param drawn shapes and how they are drawn
     * @param width pixels
     * @param height pixels
     * @return one {@code svg} element
     * @throws IllegalStateException if something else than a shape in one colour was drawn
     */
    static String of(CommandSequence drawn, int width, int height, Described figure) {
        SvgText text = new SvgText(figure);
        for (Command<?> command : drawn) {
            text.take(command);
        }
        text.lines.writeTo(text.out);
        return text.root(width, height) + (text.clips.isEmpty() ? "" : "\n<defs>" + text.clips + "</defs>") + text.out
                + (text.grouped ? "</g>" : "") + "</svg>";
    }

    private void take(Command<?> command) {
        if (command instanceof DrawShapeCommand outline) {
            shape(outline.getValue(), pens.element().line());
        } else if (command instanceof FillShapeCommand area) {
            shape(area.getValue(), pens.element().area());
        } else if (command instanceof StateCommand<?> change) {
            change(change);
        } else {
            throw new IllegalStateException("the figure " + figure.id() + " draws by " + command.getClass().getSimpleName()
                    + ", which is not written as SVG; draw shapes");
        }
    }

    private void change(StateCommand<?> change) {
        SvgPen before = pens.element();
        if (change instanceof CreateCommand) {
            pens.push(before);
        } else if (change instanceof DisposeCommand) {
            pens.pop();
            moved = true;
        } else {
            pens.pop();
            pens.push(before.after(change));
            moved |= SvgPen.moves(change);
        }
    }

    private void shape(Shape shape, String style) {
        if (moved) {
            lines.writeTo(out);
            group(pens.element());
            moved = false;
        }
        if (shape instanceof Line2D line) {
            if (!lines.continuedBy(line, style)) {
                lines.writeTo(out);
            }
            lines.add(line, style);
        } else {
            lines.writeTo(out);
            SvgShapes.write(out, shape, style);
        }
    }

    /** What follows is drawn at another place or within other bounds. */
    private void group(SvgPen pen) {
        out.append(grouped ? "</g>" : "").append("\n<g");
        pen.clip().ifPresent(clip -> out.append(" clip-path=\"url(#").append(id(clip)).append(")\""));
        if (!pen.place().isIdentity()) {
            out.append(" transform=\"").append(transform(pen.place())).append('"');
        }
        out.append('>');
        grouped = true;
    }

    private String id(Shape clip) {
        return ids.computeIfAbsent(clip, unseen -> {
            String id = figure.id() + "-clip-" + (ids.size() + 1);
            clips.append("\n<clipPath id=\"").append(id).append("\">");
            SvgShapes.write(clips, unseen, "");
            clips.append("</clipPath>");
            return id;
        });
    }

    private static String transform(AffineTransform place) {
        if (place.getType() == AffineTransform.TYPE_TRANSLATION) {
            return "translate(" + Hundredths.of(place.getTranslateX()) + " " + Hundredths.of(place.getTranslateY()) + ")";
        }
        return "matrix(" + place.getScaleX() + " " + place.getShearY() + " " + place.getShearX() + " " + place.getScaleY() + " "
                + Hundredths.of(place.getTranslateX()) + " " + Hundredths.of(place.getTranslateY()) + ")";
    }

    private String root(int width, int height) {
        return "<svg xmlns=\"http://www.w3.org/2000/svg\" role=\"img\" viewBox=\"0 0 " + width + " " + height + "\" width=\"" + width
                + "\" height=\"" + height + "\" aria-label=\"" + escape(figure.title() + ". " + figure.caption()) + "\"><title>"
                + escape(figure.title()) + "</title>";
    }

    private static String escape(String text) {
        return text.replace("&", "&amp;").replace("<", "&lt;").replace(">", "&gt;").replace("\"", "&quot;");
    }
}
