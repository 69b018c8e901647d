package org.modestead.engine.spread;

import java.util.List;
import java.util.Optional;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.spectrum.ModeIntervals;

/**
 * How one mode came out of the replicates.
 *
 * @param mode number of the mode
 * @param found share of the replicates in which it was found again, in [0, 1]
 * @param rates λ of those replicates, imaginary part at least 0, in the order drawn
 * @param deviation standard deviation of λ, {@code √(var σ + var ω)}, per time unit; NaN when it was found in fewer than two
 * @param intervals of its figures; empty when it was found too rarely
 */
public record ModeSpread(int mode, double found, List<Complex> rates, double deviation, Optional<ModeIntervals> intervals) {

    /** Takes an immutable copy. */
    public ModeSpread {
        rates = List.copyOf(rates);
    }
}
