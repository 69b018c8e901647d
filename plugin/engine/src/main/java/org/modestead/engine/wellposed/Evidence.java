package org.modestead.engine.wellposed;

import java.util.List;
import java.util.stream.Stream;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;

/**
 * What a check may look at.
 *
 * @param operator fitted
 * @param spectrum at the fitted rank
 * @param rungs ranks of the ladder, rising
 * @param ladder every mode on every rung where it was found
 * @param fitted expansion at the fitted rank
 * @param captured per rung, share of the judging runs' variance that the projection holds
 * @param carryingNorm per rung, mean norm ratio of the modes that carry the signal
 * @param medianResidual per rung, median residual of its modes
 * @param predictionErrors per rung, relative one-step prediction error on the judging runs
 * @param undamped per rung, number of its modes with damping ratio below 5 %
 * @param heldOut whether the residuals were measured on runs the fit never saw
 * @param longest duration of the longest training run
 * @param settings thresholds
 */
public record Evidence(
        FittedOperator operator,
        Spectrum spectrum,
        List<Integer> rungs,
        List<LadderRow> ladder,
        ModalExpansion fitted,
        List<Double> captured,
        List<Double> carryingNorm,
        List<Double> medianResidual,
        List<Double> predictionErrors,
        List<Integer> undamped,
        boolean heldOut,
        double longest,
        JudgeSettings settings) {

    /** How many rungs at the top of a mode's ladder are looked at. */
    static final int LAST_RUNGS = 4;

    private static final double UNDAMPED = 0.05;

    static Evidence of(FittedOperator operator, Spectrum spectrum, Ladder ladder, boolean heldOut, JudgeSettings settings) {
        ModalExpansion fitted = ladder.rungs().stream().filter(rung -> rung.rank() == operator.rank()).findFirst().orElseThrow().expansion();
        return new Evidence(operator, spectrum, ladder.rungs().stream().map(Rung::rank).toList(), ladder.rows(), fitted,
                ladder.rungs().stream().map(Rung::captured).toList(), ladder.rungs().stream().map(Rung::carryingNorm).toList(),
                ladder.rungs().stream().map(Evidence::median).toList(),
                ladder.predictionErrors(), ladder.rungs().stream().map(Evidence::countUndamped).toList(), heldOut, ladder.longest(), settings);
    }

    private static double median(Rung rung) {
        double[] sorted = rung.parts().stream().mapToDouble(Rung.Part::residual).filter(r -> !Double.isNaN(r)).sorted().toArray();
        return sorted.length == 0 ? Double.NaN : sorted[sorted.length / 2];
    }

    private static int countUndamped(Rung rung) {
        return (int) rung.parts().stream().filter(part -> part.rate().im() != 0 && Math.abs(part.rate().re()) < UNDAMPED * part.rate().abs())
                .count();
    }

    /** Returns the ladder rows of one mode by rising rank. */
    public List<LadderRow> ladderOf(int mode) {
        return ladder.stream().filter(row -> row.mode() == mode).toList();
    }

    /** Returns the last rungs of one mode, at most four, by rising rank. */
    public List<LadderRow> lastRungsOf(int mode) {
        List<LadderRow> rows = ladderOf(mode);
        return rows.subList(Math.max(0, rows.size() - LAST_RUNGS), rows.size());
    }

    /** Returns the modes that carry a stated share of the signal and are not the constant function. */
    public Stream<Mode> carrying() {
        return spectrum.modes().stream().filter(this::carries);
    }

    /** Returns whether a mode carries a stated share of the signal and is not the constant function. */
    public boolean carries(Mode mode) {
        return !mode.constant() && mode.energyShare() >= settings.shareThreshold();
    }
}
