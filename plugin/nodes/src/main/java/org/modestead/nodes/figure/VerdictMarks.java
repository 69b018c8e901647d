package org.modestead.nodes.figure;

import org.modestead.engine.wellposed.Grade;

/** How a verdict looks in a picture: by shape, filling and weight, so that it can be read without colour. */
final class VerdictMarks {
    private VerdictMarks() {}

    static Figure.Mark mark(Grade grade) {
        return switch (grade) {
            case STANDS -> Figure.Mark.DISC;
            case SETTLES -> Figure.Mark.SQUARE;
            case UNDECIDED -> Figure.Mark.RING;
            case DRIFTS -> Figure.Mark.TRIANGLE;
            case ABSENT -> Figure.Mark.CROSS;
        };
    }

    static Figure.Emphasis emphasis(Grade grade) {
        return switch (grade) {
            case STANDS -> Figure.Emphasis.STRONG;
            case SETTLES, UNDECIDED, DRIFTS, ABSENT -> Figure.Emphasis.NORMAL;
        };
    }
}
