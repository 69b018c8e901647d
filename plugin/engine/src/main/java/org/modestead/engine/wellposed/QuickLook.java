package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.spectrum.ModalExpansion;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.TrainingSample;

/**
 * Only how far eigenfunctions miss their own rule of motion, at the fitted rank, see {@link Residuals}: no ladder, no fit to noisier runs, and so no share of
 * the noise that could be taken off. It decides nothing, and every mode but the constant function stays undecided.
 */
final class QuickLook {

    private static final String CHECK = "holdout-residual";
    private static final String UNASKED = "Only residuals were asked for, which cannot decide whether a mode exists: let the whole check run.";

    private QuickLook() {}

    /**
     * @param operator on the snapshots that judge
     * @param spectrum extracted from it
     * @param settings the thresholds of residual and share are heeded
     * @return one finding a mode and no ladder
     */
    static Verdict of(FittedOperator operator, Spectrum spectrum, JudgeSettings settings) {
        JudgingRuns judging = JudgingRuns.of(operator);
        double[] residuals = residuals(operator, judging);
        List<Finding> findings = new ArrayList<>();
        List<ModeVerdict> verdicts = new ArrayList<>();
        for (Mode mode : spectrum.modes()) {
            Finding finding = finding(mode, residuals[mode.indices().get(0)], judging.heldOut(), settings.residualThreshold());
            findings.add(finding);
            verdicts.add(mode.constant() ? Grading.constant(mode) : new ModeVerdict(mode.number(), Grade.UNDECIDED, List.of(CHECK),
                    mode.energyShare() >= settings.shareThreshold(), "Mode " + mode.number() + " undecided. " + UNASKED + " " + finding.sentence()));
        }
        List<Doubt> doubts = new ArrayList<>(List.of(new Doubt("residuals-only", UNASKED)));
        if (!judging.heldOut()) {
            doubts.add(JudgingRuns.NOTHING_HELD_OUT);
        }
        return new Verdict(new ModeVerdict(0, Grade.UNDECIDED, List.of(CHECK), true, "Overall: undecided. " + UNASKED), verdicts, findings, List.of(), doubts);
    }

    private static Finding finding(Mode mode, double value, boolean heldOut, double threshold) {
        String where = heldOut ? "runs held out" : "the training runs (nothing was held out)";
        String sentence = Double.isNaN(value) ? HoldoutResidual.sentence(where, value)
                : String.format(Locale.ROOT, "On %s it misses its own rule of motion by %.3g of its size, noise included.", where, value);
        return new Finding(mode.number(), CHECK, value, threshold, value <= threshold, sentence);
    }

    /** Length r, one an eigenpair of the fitted rank; NaN where the judging runs do not excite it. */
    private static double[] residuals(FittedOperator operator, JudgingRuns judging) {
        OrthonormalCompression compression = operator.chosen();
        ModalExpansion expansion = ModalExpansion.of(compression);
        List<Tracks> tracks = judging.tracks(expansion);
        double[] judged = tracks.get(0).sizes();
        ZMatrixRMaj trained = ComplexMatrices.product(compression.evaluate(TrainingSample.of(operator).states()), expansion.vectors());
        double[] raw = Residuals.of(expansion, judging, tracks).stream().mapToDouble(Residuals.Pair::raw).toArray();
        for (int j = 0; j < raw.length; j++) {
            boolean excited = judged[j] >= Rung.EXCITED * SquaredSize.of(trained, j).rootMean(trained.numRows);
            raw[j] = excited ? raw[j] : Double.NaN;
        }
        return raw;
    }
}
