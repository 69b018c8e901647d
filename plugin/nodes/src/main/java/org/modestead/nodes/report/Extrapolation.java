package org.modestead.nodes.report;

import java.util.List;
import java.util.Optional;
import org.modestead.engine.forecast.ForecastRow;
import org.modestead.engine.forecast.Region;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.Sentence;

/** Where a forecast leaves the range that the fit has seen. */
final class Extrapolation {

    private static final int NAMED = 6;

    private Extrapolation() {}

    /** Returns how much of the drawn forecast is extrapolated, in which channels and from when on; empty where nothing is. */
    static Optional<String> sentence(ReportSource source) {
        return source.snapshots().flatMap(snapshots -> {
            Region region = Region.of(snapshots);
            List<ForecastRow> all = source.forecast().forecast();
            List<ForecastRow> beyond = all.stream().filter(row -> region.leaves(row.channel(),
                    snapshots.preparation().prepare(row.channel(), row.time(), row.value()))).toList();
            return beyond.isEmpty() ? Optional.empty() : Optional.of(told(snapshots, all.size(), beyond));
        });
    }

    private static String told(Snapshots snapshots, int all, List<ForecastRow> beyond) {
        List<String> channels = beyond.stream().map(row -> snapshots.channels().get(row.channel()).name()).distinct().toList();
        double first = beyond.stream().mapToDouble(ForecastRow::time).min().orElseThrow();
        TimeAxis axis = snapshots.time();
        return "The forecast leaves the range that the fit has seen, by more than a tenth of it, in " + Digits.percent((double) beyond.size() / all)
                + " of the values drawn (" + Sentence.listed(channels, NAMED) + "), first at " + axis.format(first)
                + (axis.kind() == TimeAxis.Kind.NUMBER && !axis.unit().isEmpty() ? " " + axis.unit() : "") + ": there it is extrapolation.";
    }
}
