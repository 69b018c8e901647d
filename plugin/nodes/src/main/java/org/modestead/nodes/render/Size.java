package org.modestead.nodes.render;

import org.modestead.nodes.figure.Figure;

/**
 * Width and height of a picture in pixels at scale 1.
 *
 * @param width positive
 * @param height positive
 */
record Size(int width, int height) {

    static Size of(Figure figure) {
        return switch (figure.kind()) {
            case TIME_SERIES -> new Size(960, 380);
            case COMPLEX_PLANE, MARKS -> new Size(720, 500);
            case CURVES, SHAPES, BARS -> new Size(500, 330);
        };
    }
}
