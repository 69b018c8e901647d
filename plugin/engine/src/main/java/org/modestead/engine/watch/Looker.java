package org.modestead.engine.watch;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ShapeComparison;
import org.modestead.engine.spectrum.ShapeComparison.Pair;
import org.modestead.engine.spectrum.ShapeScaling;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;
import org.modestead.engine.spread.ModeSpread;
import org.modestead.engine.spread.SamplingSpread;
import org.modestead.engine.spread.SpreadPlan;

/**
 * Fits a window as the stored operator was fitted, with its estimator, rank and ridge, and finds the stored modes again: optimal assignment
 * of all stored modes to all modes of the window ({@link ShapeComparison}), so that a mode is not taken for its neighbour.
 *
 * @param operator stored
 * @param spectrum stored
 * @param watched modes of the spectrum
 * @param length of a full window in time units
 * @param plan how
 */
record Looker(FittedOperator operator, Spectrum spectrum, List<Mode> watched, double length, WatchPlan plan) {

    Look at(Window window, Progress progress) {
        progress.checkCancelled();
        try {
            FittedOperator fitted = fit(window, progress);
            Spectrum found = SpectrumExtractor.extract(fitted, Progress.NONE);
            int most = Math.max(spectrum.modes().size(), found.modes().size());
            List<Pair> pairs = ShapeComparison.of(spectrum, found, ShapeScaling.PREPARED, plan.limits(), most).pairs();
            Optional<SamplingSpread> spread = plan.windowReplicates() == 0 ? Optional.empty() : Optional.of(SamplingSpread.of(fitted, found,
                    new SpreadPlan(plan.windowReplicates(), plan.baseline().level(), plan.baseline().seed()), progress));
            return new Look(window, watched.stream().map(mode -> sighting(mode, pairs, spread)).toList(), Optional.empty());
        } catch (FitFault impossible) {
            return new Look(window, new ArrayList<>(Collections.nCopies(watched.size(), Optional.empty())), Optional.of(impossible.seen()));
        }
    }

    /** At the stored rank, or at what the window holds where that is less. */
    private FittedOperator fit(Window window, Progress progress) {
        Snapshots stored = operator.snapshots();
        Snapshots own = stored.replaced(window.pieces(), List.of(), stored.smoothing());
        FittedOperator whole = OperatorFitter.fit(own, operator.estimator(), new RankRule.Fixed(1), operator.ridge(), progress);
        int rank = Math.min(operator.rank(), whole.functions().rank());
        return new FittedOperator(whole.functions().at(rank), rank, operator.rule(), operator.rankChoice(), whole.ridge(), whole.estimator(),
                whole.method(), whole.kernel(), own, whole.doubts());
    }

    private Optional<Sighting> sighting(Mode mode, List<Pair> pairs, Optional<SamplingSpread> spread) {
        return pairs.stream().filter(pair -> pair.paired() && pair.a().number() == mode.number()).findFirst().map(pair -> {
            Optional<ModeSpread> own = spread.flatMap(all -> all.of(pair.b().number()));
            double scale = Quantity.scale(mode, length);
            return new Sighting(pair.b(), pair.assurance(), deviation(own, Mode::frequency, Quantity.FREQUENCY, scale),
                    deviation(own, Mode::dampingRatio, Quantity.DAMPING, scale));
        });
    }

    static double deviation(Optional<ModeSpread> spread, Function<Mode, Double> figure, Quantity quantity, double scale) {
        return spread.map(found -> Scatter.of(found.rates().stream()
                .map(rate -> new Mode(1, List.of(0), rate, 1, 1, 0, List.of(), false, 0))
                .filter(Mode::oscillates).mapToDouble(mode -> quantity.chart(figure.apply(mode), scale)).toArray()).deviation())
                .orElse(Double.NaN);
    }
}
