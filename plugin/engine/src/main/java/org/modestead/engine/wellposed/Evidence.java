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
 * @param carryingNormNoise per rung, factor by which noise of the data's own size changes it
 * @param carryingNorm per rung, mean norm ratio of the modes that carry the signal
 * @param medianResidual per rung, median residual of its modes
 * @param predictionErrors per rung, relative one-step prediction error on the judging runs
 * @param undamped per rung, number of its modes with damping ratio below 5 %
 * @param twins per mode of the spectrum, whether the judging runs cannot tell it from half of a defective one
 * @param halves per mode of the spectrum, its rate in both halves of the judging runs
 * @param noiseShare standard deviation of the noise over that of the signal, root mean square over the channels
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
        List<Double> carryingNormNoise,
        List<Double> medianResidual,
        List<Double> predictionErrors,
        List<Integer> undamped,
        List<Boolean> twins,
        List<HalfRates> halves,
        double noiseShare,
        boolean heldOut,
        double longest,
        JudgeSettings settings) {

    /** A norm that noise of the data's own size changes by more than this factor is not looked at. */
    static final double NOISY_NORM = 1.05;

    /** A norm that noise changes by less than this factor moves an overlap by less than half of 0.1: a part of size b lengthens by b²/2. */
    private static final double STILL_NORM = 1.001;

    static final double USABLE = 0.25;
    static final double GOOD = 0.05;
    private static final double TWICE = 2;

    /** How many rungs at the top of a mode's ladder are looked at. */
    static final int LAST_RUNGS = 4;

    private static final double UNDAMPED = 0.05;

    /** Share of the signal below which nothing moves that could be judged. */
    private static final double MOVES = 1e-3;

    static Evidence of(FittedOperator operator, Spectrum spectrum, Ladder ladder, boolean heldOut, JudgeSettings settings) {
        ModalExpansion fitted = ladder.rungs().stream().filter(rung -> rung.rank() == operator.rank()).findFirst().orElseThrow().expansion();
        return new Evidence(operator, spectrum, ladder.rungs().stream().map(Rung::rank).toList(), ladder.rows(), fitted,
                ladder.rungs().stream().map(Rung::captured).toList(), ladder.rungs().stream().map(Rung::carryingNorm).toList(), ladder.normEffects(),
                ladder.rungs().stream().map(Evidence::median).toList(),
                ladder.predictionErrors(), ladder.rungs().stream().map(Evidence::countUndamped).toList(), ladder.twins(),
                ladder.halves(), ladder.noiseShare(), heldOut, ladder.longest(), settings);
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

    /** Returns the rungs of one mode, by rising rank, on which noise of the data's own size changes rate and weight by no more than a quarter. */
    public List<LadderRow> usableRungsOf(int mode) {
        return ladderOf(mode).stream().filter(row -> row.noise().change() <= USABLE).toList();
    }

    /**
     * Returns those of them on which the mode moves by its own rule on the judging runs: to 5 % once the noise is taken off, or about as
     * well as on any rung. Lower ranks lack functions it needs, higher ones fit noise.
     */
    public List<LadderRow> goodRungsOf(int mode) {
        List<LadderRow> usable = usableRungsOf(mode);
        double best = usable.stream().mapToDouble(LadderRow::rawResidual).filter(r -> !Double.isNaN(r)).min().orElse(Double.NaN);
        return usable.stream().filter(row -> row.residual() <= Math.min(Math.max(GOOD, TWICE * best), settings.residualThreshold())).toList();
    }

    /** Returns the good rungs where they are enough to show settling, otherwise the usable ones. */
    List<LadderRow> tellingRungsOf(int mode) {
        List<LadderRow> good = goodRungsOf(mode);
        return good.size() >= Settling.LEAST_RUNGS ? good : usableRungsOf(mode);
    }

    /** Returns the telling rungs on which noise leaves the norm alone. */
    List<LadderRow> clearNormsOf(int mode) {
        return clear(tellingRungsOf(mode), row -> row.noise().norm() <= NOISY_NORM);
    }

    /** Returns the rank of the rung that predicts the judging runs best one step ahead. */
    int bestPredicting() {
        int best = 0;
        for (int k = 1; k < predictionErrors.size(); k++) {
            best = predictionErrors.get(k) < predictionErrors.get(best) ? k : best;
        }
        return rungs.get(best);
    }

    /**
     * Returns the rung on which orthogonality is read: the highest telling one before noise begins to change the norm by more than a tenth of a
     * per cent, or the one on which it changes it least; the fitted rank where none is telling. Where the mode is an eigenfunction of a finite space
     * and that rung shows another rate in its place, all of the space is asked.
     */
    LadderRow clearestOf(int mode) {
        LadderRow telling = clearestTellingOf(mode);
        return Closure.row(mode, this).filter(whole -> Ladder.relativeChange(whole.rate(), telling.rate(), longest()) > settings.settleThreshold())
                .orElse(telling);
    }

    private LadderRow clearestTellingOf(int mode) {
        List<LadderRow> rows = tellingRungsOf(mode);
        List<LadderRow> still = clear(rows, row -> row.noise().norm() <= STILL_NORM);
        return still.isEmpty() ? rows.stream().min(java.util.Comparator.comparingDouble(row -> row.noise().norm())).orElseGet(() -> fittedOf(mode))
                : still.get(still.size() - 1);
    }

    /** Returns the highest rung that tells of a mode; the fitted rank where none does. */
    LadderRow lastTellingOf(int mode) {
        List<LadderRow> rows = tellingRungsOf(mode);
        return rows.isEmpty() ? fittedOf(mode) : rows.get(rows.size() - 1);
    }

    /** Returns the row of a mode at the fitted rank. */
    LadderRow fittedOf(int mode) {
        return ladderOf(mode).stream().filter(row -> row.rank() == operator.rank()).findFirst().orElseThrow();
    }

    /** Leading noisy entries are dropped; the list ends before the first noisy one after that. */
    static <T> List<T> clear(List<T> rows, java.util.function.Predicate<T> isClear) {
        return rows.stream().dropWhile(isClear.negate()).takeWhile(isClear).toList();
    }

    /** Returns the modes that carry a stated share of the signal and are not the constant function. */
    public Stream<Mode> carrying() {
        return spectrum.modes().stream().filter(this::carries);
    }

    /**
     * Returns whether a mode carries a stated share of the signal and is not the constant function. Where none does because the constant holds nearly all of the
     * signal, the share is taken of the part that moves.
     */
    public boolean carries(Mode mode) {
        if (mode.constant()) {
            return false;
        }
        double moving = moving().mapToDouble(Mode::energyShare).sum();
        boolean hidden = moving >= MOVES && moving().allMatch(other -> other.energyShare() < settings.shareThreshold());
        return mode.energyShare() >= settings.shareThreshold() * (hidden ? moving : 1);
    }

    private Stream<Mode> moving() {
        return spectrum.modes().stream().filter(mode -> !mode.constant());
    }
}
