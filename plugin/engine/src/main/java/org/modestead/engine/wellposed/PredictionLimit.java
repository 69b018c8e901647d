package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;

/**
 * Where noise takes over: the rung of the ladder that predicts the judging runs best, one step ahead. A rank that predicts more
 * than 5 % worse than a lower one fits noise.
 */
public final class PredictionLimit implements Check {

    /** Prediction error over the smallest from which on a rank counts as worse. */
    private static final double WORSE = 1.05;

    @Override
    public String id() {
        return "prediction-limit";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        List<Double> errors = evidence.predictionErrors();
        int best = evidence.rungs().indexOf(evidence.bestPredicting());
        int fitted = evidence.rungs().indexOf(evidence.operator().rank());
        boolean noise = best < fitted && errors.get(fitted) > WORSE * errors.get(best);
        return List.of(new Finding(0, id(), evidence.rungs().get(best), Double.NaN, !noise, String.format(Locale.ROOT,
                "One step ahead rank %d predicts best (relative error %.3g; %.3g at the fitted rank %d)%s.", evidence.rungs().get(best),
                errors.get(best), errors.get(fitted), evidence.operator().rank(),
                noise ? ": the fitted rank takes noise for motion, so lower it" : "")));
    }
}
