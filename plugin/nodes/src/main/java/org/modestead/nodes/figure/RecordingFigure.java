package org.modestead.nodes.figure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.Stream;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.nodes.words.Sentence;

/** The recorded channels over time, thinned so that every peak stays. */
public final class RecordingFigure {
    private static final int MOST_POINTS = 2000;
    private static final int FEWEST_POINTS = 40;

    private RecordingFigure() {}

    /**
     * Draws the first channels of the runs that follow each other in time; of runs at the same times the earliest.
     * Channels of one unit share a scale in that unit; channels of different units are shown as distance from their
     * mean in standard deviations.
     *
     * @param snapshots prepared runs; drawn in recorded values
     * @param channels at most how many, at least 1
     * @return kind {@link Figure.Kind#TIME_SERIES}, selection keys {@code channel:<number>} counted from 1
     */
    public static Figure figure(Snapshots snapshots, int channels) {
        int shown = Math.min(channels, snapshots.channels().size());
        List<Channel> drawn = snapshots.channels().subList(0, shown);
        boolean oneUnit = drawn.stream().map(Channel::unit).distinct().count() == 1;
        List<Run> all = Stream.of(Snapshots.Part.values()).flatMap(part -> snapshots.runs(part).stream()).toList();
        List<Run> runs = apart(all);
        List<Figure.Layer> layers = new ArrayList<>();
        for (int c = 0; c < shown; c++) {
            layers.addAll(lines(snapshots, runs, c, oneUnit));
        }
        tailStart(snapshots).ifPresent(at -> layers.add(new Figure.Rule("holdout starts", "", true,
                at * snapshots.time().calendarUnitsPerUnit())));
        return new Figure("recording", Figure.Kind.TIME_SERIES, "Recorded channels",
                caption(snapshots, shown, runs.size(), all.size(), oneUnit),
                Axes.time(snapshots.time()), Figure.Axis.linear(valueLabel(drawn, oneUnit)), layers);
    }

    private static List<Figure.Layer> lines(Snapshots snapshots, List<Run> runs, int channel, boolean oneUnit) {
        DoubleUnaryOperator scaling = oneUnit ? DoubleUnaryOperator.identity() : standardised(snapshots, runs, channel);
        int most = Math.max(FEWEST_POINTS, MOST_POINTS / Math.max(1, runs.size()));
        List<Figure.Layer> lines = new ArrayList<>();
        for (Run run : runs) {
            double[] values = Arrays.stream(RecordedValues.of(run, channel, snapshots.preparation())).map(scaling)
                    .toArray();
            Thinning.Curve curve = Thinning.thin(Axes.times(snapshots.time(), run.times()), values, most);
            lines.add(new Figure.Line(snapshots.channels().get(channel).label(), "channel:" + (channel + 1), curve.x(),
                    curve.y(),
                    Figure.Emphasis.NORMAL));
        }
        return lines;
    }

    private static DoubleUnaryOperator standardised(Snapshots snapshots, List<Run> runs, int channel) {
        double[] known = runs.stream().flatMapToDouble(run -> Arrays.stream(RecordedValues.of(run, channel,
                snapshots.preparation())))
                .filter(Double::isFinite).toArray();
        double mean = Arrays.stream(known).average().orElse(0);
        double variance = Arrays.stream(known).map(v -> (v - mean) * (v - mean)).average().orElse(0);
        double spread = variance > 0 ? Math.sqrt(variance) : 1;
        return value -> (value - mean) / spread;
    }

    private static OptionalDouble tailStart(Snapshots snapshots) {
        double lastSeen = snapshots.training().stream().mapToDouble(RecordingFigure::last).max()
                .orElse(Double.POSITIVE_INFINITY);
        return snapshots.holdout().stream().filter(run -> run.leadIn() < run.samples())
                .mapToDouble(RecordingFigure::first)
                .filter(start -> start > lastSeen).min();
    }

    private static double last(Run run) {
        return run.times()[run.samples() - 1];
    }

    private static String valueLabel(List<Channel> drawn, boolean oneUnit) {
        return oneUnit ? Axes.labelled("value", drawn.get(0).unit()) : "distance from the mean [standard deviations]";
    }

    private static String caption(Snapshots snapshots, int shown, int drawn, int runs, boolean oneUnit) {
        int channels = snapshots.channels().size();
        String which = shown < channels ? "The first " + shown + " of " + channels + " channels"
                : channels == 1 ? "The channel" : "All " + channels + " channels";
        String scale = oneUnit ? "." : ", each from its mean in its own standard deviations, for the units differ.";
        String others = drawn == runs ? "" : " Drawn: " + drawn + " of " + Sentence.count(runs, "run")
                + "; the others lie at the same times.";
        return which + " over time" + scale + others;
    }

    /** Runs that follow each other; of those at the same times the earliest. */
    private static List<Run> apart(List<Run> runs) {
        List<Run> kept = new ArrayList<>();
        double end = Double.NEGATIVE_INFINITY;
        List<Run> rising = runs.stream().filter(run -> run.leadIn() < run.samples())
                .sorted(Comparator.comparingDouble(RecordingFigure::first)).toList();
        for (Run run : rising) {
            if (first(run) > end) {
                kept.add(run);
                end = last(run);
            }
        }
        return kept;
    }

    private static double first(Run run) {
        return run.times()[run.leadIn()];
    }
}
