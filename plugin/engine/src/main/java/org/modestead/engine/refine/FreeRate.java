package org.modestead.engine.refine;

/**
 * A free parameter of a model.
 *
 * @param term index of its term
 * @param column of the first function of the term
 * @param part of the rate
 * @param value current
 */
record FreeRate(int term, int column, Part part, double value) {

    /** Which part of a rate. */
    enum Part {
        GROWTH,
        ANGULAR
    }
}
