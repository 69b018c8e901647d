package org.modestead.engine.wellposed;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;
import org.modestead.engine.spectrum.Interval;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeIntervals;

/**
 * How far the rate of a mode may be off by the chance of what was recorded: half the interval of the rate relative to the rate,
 * {@code √(Δσ² + Δω²) / |λ|}. Informs: it asks how well a rate is known, not whether the mode exists. Says nothing of modes
 * without intervals.
 */
public final class SpreadOfRates implements Check {

    private static final MathContext DIGITS = new MathContext(4);

    @Override
    public String id() {
        return "sampling-spread";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        return evidence.spectrum().modes().stream().filter(mode -> !mode.constant() && mode.rate().abs() > 0)
                .flatMap(mode -> mode.intervals().map(found -> finding(mode, found)).stream()).toList();
    }

    private Finding finding(Mode mode, ModeIntervals found) {
        double growth = half(found.growth());
        double turning = half(found.turning());
        double share = Math.hypot(growth, turning) / mode.rate().abs();
        String turn = mode.oscillates() ? String.format(Locale.ROOT, " and its angular frequency by %.3g", turning) : "";
        String sign = found.growth().low() < 0 && found.growth().high() > 0 ? " Whether it grows or fades is not certain." : "";
        return new Finding(mode.number(), id(), share, Double.NaN, true, String.format(Locale.ROOT,
                "With other recordings of this kind its growth rate may be off by %.3g%s, together %.2g of the rate (%s %% intervals).%s",
                growth, turn, share, percent(found.level()), sign));
    }

    private static String percent(double level) {
        return BigDecimal.valueOf(100 * level).round(DIGITS).stripTrailingZeros().toPlainString();
    }

    private static double half(Interval interval) {
        return (interval.high() - interval.low()) / 2;
    }
}
