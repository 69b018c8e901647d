package org.modestead.nodes.report;

import java.util.Arrays;
import org.modestead.nodes.figure.Figure;

/** The numbers behind a layer as one text, without names and emphasis. */
final class DrawnData {
    private DrawnData() {}

    static String of(Figure.Layer layer) {
        if (layer instanceof Figure.Line line) {
            return Arrays.toString(line.x()) + Arrays.toString(line.y());
        }
        if (layer instanceof Figure.Backdrop backdrop) {
            return Arrays.toString(backdrop.x()) + Arrays.toString(backdrop.y());
        }
        if (layer instanceof Figure.Points points) {
            return Arrays.toString(points.x()) + Arrays.toString(points.y());
        }
        if (layer instanceof Figure.Band band) {
            return Arrays.toString(band.x()) + Arrays.toString(band.low()) + Arrays.toString(band.high());
        }
        if (layer instanceof Figure.Bars bars) {
            return Arrays.toString(bars.heights());
        }
        Figure.Rule rule = (Figure.Rule) layer;
        return rule.vertical() + " " + rule.at();
    }
}
