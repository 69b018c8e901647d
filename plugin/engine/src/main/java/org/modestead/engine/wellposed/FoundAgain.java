package org.modestead.engine.wellposed;

import java.util.Comparator;
import java.util.OptionalInt;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;

/**
 * Which mode of a spectrum fitted to other data is a given one: the nearest in rate and share of the signal,
 *
 * <pre>    |λ - λ'| / max(|λ|, |λ'|, 0.1/T) + |s - s'| &lt; 0.5</pre>
 *
 * with T the longest run. The constant function is none.
 */
final class FoundAgain {

    private static final double TOO_FAR = 0.5;

    private FoundAgain() {}

    /**
     * @param spectrum fitted to other data
     * @param mode looked for
     * @param longest duration of the longest run
     * @return its number there; empty where it is not found again
     */
    static OptionalInt in(Spectrum spectrum, Mode mode, double longest) {
        return spectrum.modes().stream().filter(other -> !other.constant() && distance(mode, other, longest) < TOO_FAR)
                .min(Comparator.comparingDouble(other -> distance(mode, other, longest))).stream().mapToInt(Mode::number).findFirst();
    }

    private static double distance(Mode a, Mode b, double longest) {
        return Ladder.relativeChange(a.rate(), b.rate(), longest) + Math.abs(a.energyShare() - b.energyShare());
    }
}
