package org.modestead.nodes.render;

import de.erichseifert.vectorgraphics2d.intermediate.commands.AffineTransformCommand;
import de.erichseifert.vectorgraphics2d.intermediate.commands.SetClipCommand;
import de.erichseifert.vectorgraphics2d.intermediate.commands.SetColorCommand;
import de.erichseifert.vectorgraphics2d.intermediate.commands.SetPaintCommand;
import de.erichseifert.vectorgraphics2d.intermediate.commands.SetStrokeCommand;
import de.erichseifert.vectorgraphics2d.intermediate.commands.SetTransformCommand;
import de.erichseifert.vectorgraphics2d.intermediate.commands.StateCommand;
import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Shape;
import java.awt.Stroke;
import java.awt.geom.AffineTransform;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * With what, where and within what shapes are drawn.
 *
 * @param colour of lines and areas
 * @param stroke of lines
 * @param clip nothing is seen outside of it
 * @param place of the shapes' coordinates in the picture; not to be changed
 */
record SvgPen(Color colour, BasicStroke stroke, Optional<Shape> clip, AffineTransform place) {

    /** With which Java 2D begins. */
    static final SvgPen FIRST = new SvgPen(Color.BLACK, new BasicStroke(), Optional.empty(), new AffineTransform());

    private static final int OPAQUE = 255;
    private static final List<String> CAPS = List.of("butt", "round", "square");
    private static final List<String> JOINS = List.of("miter", "round", "bevel");
    /** A dash of three and no gap: what the chart library takes for a line drawn through. */
    private static final float[] THROUGH = {3, 0};

    /** Whether shapes that are drawn later have another place or other bounds. */
    static boolean moves(StateCommand<?> change) {
        return change instanceof SetClipCommand || change instanceof SetTransformCommand || change instanceof AffineTransformCommand;
    }

    /** @throws IllegalStateException if it is another stroke or paint than SVG is written with */
    SvgPen after(StateCommand<?> change) {
        if (change instanceof SetColorCommand set) {
            return new SvgPen(set.getValue(), stroke, clip, place);
        } else if (change instanceof SetStrokeCommand set) {
            return new SvgPen(colour, basic(set.getValue()), clip, place);
        } else if (change instanceof SetClipCommand set) {
            return new SvgPen(colour, stroke, Optional.ofNullable(set.getValue()), place);
        } else if (change instanceof SetTransformCommand set) {
            return new SvgPen(colour, stroke, clip, new AffineTransform(set.getValue()));
        } else if (change instanceof AffineTransformCommand more) {
            AffineTransform moved = new AffineTransform(place);
            moved.concatenate(more.getValue());
            return new SvgPen(colour, stroke, clip, moved);
        } else if (change instanceof SetPaintCommand set) {
            throw new IllegalStateException("a figure is painted with " + set.getValue() + ", which is not written as SVG; use a colour");
        }
        return this;
    }

    private static BasicStroke basic(Stroke stroke) {
        if (stroke instanceof BasicStroke basic) {
            return basic;
        }
        throw new IllegalStateException("a line is drawn with " + stroke + ", which is not written as SVG; use a BasicStroke");
    }

    /** Style of a filled shape. */
    String area() {
        return coloured("fill");
    }

    /** Style of a line. Mitres are left at SVG's limit: no line here turns that sharply. */
    String line() {
        StringBuilder style = new StringBuilder("fill:none;").append(coloured("stroke"));
        if (stroke.getLineWidth() != 1) {
            style.append("stroke-width:").append(Hundredths.of(stroke.getLineWidth())).append(';');
        }
        if (stroke.getEndCap() != BasicStroke.CAP_BUTT) {
            style.append("stroke-linecap:").append(CAPS.get(stroke.getEndCap())).append(';');
        }
        if (stroke.getLineJoin() != BasicStroke.JOIN_MITER) {
            style.append("stroke-linejoin:").append(JOINS.get(stroke.getLineJoin())).append(';');
        }
        if (stroke.getDashArray() != null && !Arrays.equals(stroke.getDashArray(), THROUGH)) {
            dashes(style);
        }
        return style.toString();
    }

    private void dashes(StringBuilder style) {
        String before = "stroke-dasharray:";
        for (float length : stroke.getDashArray()) {
            style.append(before).append(Hundredths.of(length));
            before = ",";
        }
        style.append(';');
        if (stroke.getDashPhase() != 0) {
            style.append("stroke-dashoffset:").append(Hundredths.of(stroke.getDashPhase())).append(';');
        }
    }

    private String coloured(String what) {
        String plain = what + ":rgb(" + colour.getRed() + "," + colour.getGreen() + "," + colour.getBlue() + ");";
        return colour.getAlpha() == OPAQUE ? plain : plain + what + "-opacity:" + Hundredths.of(colour.getAlpha() / (double) OPAQUE) + ";";
    }
}
