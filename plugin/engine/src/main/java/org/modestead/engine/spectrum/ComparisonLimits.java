package org.modestead.engine.spectrum;

/**
 * From where on two modes may be taken for the same one.
 *
 * @param assurance least modal assurance, in [0, 1]
 * @param change largest relative change of the frequency (of the growth rate where nothing oscillates), in (0, 1]
 */
public record ComparisonLimits(double assurance, double change) {

    /** Checks the ranges. */
    public ComparisonLimits {
        if (!(assurance >= 0 && assurance <= 1 && change > 0 && change <= 1)) {
            throw new IllegalArgumentException("limits " + assurance + ", " + change);
        }
    }
}
