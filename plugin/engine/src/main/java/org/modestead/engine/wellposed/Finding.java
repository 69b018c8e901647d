package org.modestead.engine.wellposed;

/**
 * Outcome of one check, for one mode or for the operator as a whole.
 *
 * @param mode mode number, 0 for the operator as a whole
 * @param check id of the check, lower case with dashes
 * @param value the figure; NaN when it could not be computed
 * @param threshold against which it was held; NaN when it only informs
 * @param passed whether it passed; true when it only informs
 * @param sentence in plain words
 */
public record Finding(int mode, String check, double value, double threshold, boolean passed, String sentence) {}
