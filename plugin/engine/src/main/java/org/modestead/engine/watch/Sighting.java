package org.modestead.engine.watch;

import org.modestead.engine.spectrum.Mode;

/**
 * A stored mode as found in one window.
 *
 * @param found the mode of the window's fit that was taken for it
 * @param assurance modal assurance of its shape and the stored one over all channels, in [0, 1]
 * @param frequencySpread deviation of {@code ln f} among resampled fits of the window; NaN when not known
 * @param dampingSpread deviation of the charted damping ratio among them; NaN when not known
 */
public record Sighting(Mode found, double assurance, double frequencySpread, double dampingSpread) {

    /** Returns the figure of a quantity. */
    public double figure(Quantity quantity) {
        return switch (quantity) {
            case FREQUENCY -> found.frequency();
            case DAMPING -> found.dampingRatio();
            case SHAPE -> assurance;
        };
    }

    /** Returns the spread of a charted quantity within the window; NaN when not known. */
    double spread(Quantity quantity) {
        return switch (quantity) {
            case FREQUENCY -> frequencySpread;
            case DAMPING -> dampingSpread;
            case SHAPE -> Double.NaN;
        };
    }
}
