package org.modestead.engine.spectrum;

/**
 * How much a pole may change from one model order to the next and still count as the same. Limits differ between trades and
 * must be chosen; the defaults are common practice.
 *
 * @param frequency largest relative change of the frequency, in (0, 1]
 * @param damping largest relative change of the damping ratio, in (0, 1]
 * @param assurance least modal assurance of the shapes, in [0, 1]
 */
public record StabilityLimits(double frequency, double damping, double assurance) {

    /** 1 %, 5 %, 0.98. */
    public static final StabilityLimits DEFAULT = new StabilityLimits(0.01, 0.05, 0.98);

    /** Checks the ranges. */
    public StabilityLimits {
        if (!(frequency > 0 && frequency <= 1 && damping > 0 && damping <= 1 && assurance >= 0 && assurance <= 1)) {
            throw new IllegalArgumentException("limits " + frequency + ", " + damping + ", " + assurance);
        }
    }
}
