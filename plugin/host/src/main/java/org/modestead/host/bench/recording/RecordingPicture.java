package org.modestead.host.bench.recording;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.table.CellType;

/** The recording at a glance: one line a channel, in recorded values, of the runs that follow each other in time. */
final class RecordingPicture {

    /** Channels beyond are not drawn. */
    static final int MOST_CHANNELS = 8;

    private static final int MOST_POINTS = 1200;
    private static final int FEWEST_POINTS = 40;

    private RecordingPicture() {}

    static Optional<Figure> of(RunScan scan, RecordingWish.Roles roles, List<ColumnFacts> channels, Optional<CellType> time) {
        if (channels.isEmpty() || scan.runs().isEmpty()) {
            return Optional.empty();
        }
        List<RunScan.Run> drawn = apart(scan.runs());
        List<Figure.Layer> layers = new ArrayList<>();
        for (int c = 0; c < Math.min(MOST_CHANNELS, channels.size()); c++) {
            layers.add(line(channels.get(c), c, drawn));
        }
        String which = channels.size() > MOST_CHANNELS ? "The first " + MOST_CHANNELS + " of " + channels.size() + " channels" : channels.size() == 1 ? "The channel"
                : "All " + channels.size() + " channels";
        String runs = drawn.size() == scan.runs().size() ? "" : " Drawn: " + drawn.size() + " of " + scan.runs().size() + " runs; the others lie at the same times.";
        return Optional.of(new Figure("recording", Figure.Kind.TIME_SERIES, "The recording", which + ", each in its own range." + runs, axis(roles, time),
                Figure.Axis.linear("value"), layers));
    }

    private static Figure.Axis axis(RecordingWish.Roles roles, Optional<CellType> time) {
        if (time.isPresent() && !time.get().isNumber()) {
            return time.get() == CellType.DATE ? new Figure.Axis("date", false, List.of(), "date") : new Figure.Axis("date and time (UTC)", false, List.of(), "date-time");
        }
        return Figure.Axis.linear((roles.time().isEmpty() ? "row" : "time") + (roles.timeUnit().isEmpty() ? "" : " [" + roles.timeUnit() + "]"));
    }

    private static Figure.Line line(ColumnFacts channel, int index, List<RunScan.Run> runs) {
        int most = Math.max(FEWEST_POINTS, MOST_POINTS / runs.size());
        List<double[]> points = new ArrayList<>();
        for (RunScan.Run run : runs) {
            thin(run.times(), run.values()[index], most, points);
            points.add(new double[] {Double.NaN, Double.NaN});
        }
        String name = channel.title() + (channel.unit().isEmpty() ? "" : " [" + channel.unit() + "]");
        return new Figure.Line(name, "channel:" + (index + 1), points.stream().mapToDouble(point -> point[0]).toArray(),
                points.stream().mapToDouble(point -> point[1]).toArray(), Figure.Emphasis.NORMAL);
    }

    /** Of every stretch the smallest and the largest value are kept, so that no peak is lost. */
    private static void thin(double[] x, double[] y, int most, List<double[]> points) {
        int stretches = Math.min(x.length, most / 2);
        for (int s = 0; s < stretches; s++) {
            int from = (int) ((long) s * x.length / stretches);
            int to = (int) ((long) (s + 1) * x.length / stretches);
            int low = from;
            int high = from;
            for (int i = from + 1; i < to; i++) {
                low = y[i] < y[low] || Double.isNaN(y[low]) ? i : low;
                high = y[i] > y[high] || Double.isNaN(y[high]) ? i : high;
            }
            points.add(new double[] {x[Math.min(low, high)], y[Math.min(low, high)]});
            if (low != high) {
                points.add(new double[] {x[Math.max(low, high)], y[Math.max(low, high)]});
            }
        }
    }

    private static List<RunScan.Run> apart(List<RunScan.Run> runs) {
        List<RunScan.Run> kept = new ArrayList<>();
        double end = Double.NEGATIVE_INFINITY;
        for (RunScan.Run run : runs.stream().filter(run -> run.times().length > 0).sorted(Comparator.comparingDouble(run -> run.times()[0])).toList()) {
            if (run.times()[0] > end) {
                kept.add(run);
                end = run.times()[run.times().length - 1];
            }
        }
        return kept.isEmpty() ? runs.subList(0, 1) : kept;
    }
}
