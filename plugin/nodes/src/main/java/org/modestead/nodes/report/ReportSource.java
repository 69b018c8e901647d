package org.modestead.nodes.report;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.engine.Doubt;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.words.TimeUnit;

/**
 * What a mode report is made from.
 *
 * @param snapshots the prepared recording; the operator's when not given by itself
 * @param operator what was fitted
 * @param spectrum the modes
 * @param verdict whether they exist
 * @param forecast rows of the forecast, of its reconstruction, and scores; empty lists where none was handed in
 * @param modes at most how many modes are told one by one
 * @param channels at most how many channels are drawn
 */
record ReportSource(Optional<Snapshots> snapshots, Optional<FittedOperator> operator, Spectrum spectrum,
        Optional<Verdict> verdict, ForecastRows forecast, int modes, int channels) {

    ReportSource {
        Objects.requireNonNull(spectrum);
        Objects.requireNonNull(forecast);
        snapshots = snapshots.or(() -> operator.map(FittedOperator::snapshots));
    }

    TimeUnit unit() {
        return new TimeUnit(spectrum.timeUnit());
    }

    /** Returns the strongest modes that are not the constant. */
    List<Mode> leading() {
        return spectrum.modes().stream().filter(mode -> !mode.constant()).limit(modes).toList();
    }

    Optional<Grade> grade(Mode mode) {
        return mode.constant() ? Optional.empty() : verdict.flatMap(v -> v.of(mode.number())).map(ModeVerdict::grade);
    }

    /** Returns every doubt once, in the order of the work. */
    List<Doubt> doubts() {
        return Stream.of(snapshots.map(Snapshots::doubts), operator.map(FittedOperator::doubts),
                Optional.of(spectrum.doubts()),
                verdict.map(Verdict::doubts)).flatMap(Optional::stream).flatMap(List::stream).distinct().toList();
    }
}
