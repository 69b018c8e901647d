package org.modestead.host.bench.recording;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalLong;
import org.modestead.nodes.prepare.RunName;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/**
 * The runs of a recording, read with the parts of the columns known.
 *
 * @param runs in the order in which they begin
 * @param fall row, from 1, where the time of a run falls back or stands still; empty when it always rises
 */
public record RunScan(List<Run> runs, OptionalLong fall) {

    private static final double EVEN = 0.01;
    private static final double GAP = 1.5;

    /**
     * One run.
     *
     * @param name of it, empty for the only one
     * @param times of its rows, as {@link TableScan#number} gives them; row numbers where there is no time
     * @param values by channel, then row; NaN where missing
     */
    public record Run(String name, double[] times, double[][] values) {}

    /** Reads the rows; no more than are looked at elsewhere. */
    static RunScan of(Table table, RecordingWish.Roles roles, int channels) {
        int time = table.schema().indexOf(roles.time()).orElse(-1);
        RunName run = RunName.of(table, roles.run());
        int[] drawn = roles.channels().stream().limit(channels).mapToInt(name -> table.schema().indexOf(name).orElse(-1)).filter(index -> index >= 0).toArray();
        Map<String, Rows> rows = new LinkedHashMap<>();
        long fall = -1;
        try (RowCursor cursor = table.open()) {
            while (cursor.next() && cursor.row() <= TableScan.MOST_ROWS) {
                Rows own = rows.computeIfAbsent(roles.run().isEmpty() ? "" : run.written(cursor), name -> new Rows(drawn.length));
                double now = time < 0 ? own.times.size() : TableScan.number(cursor, time, type(table, time));
                boolean falls = own.times.size() > 0 && !(now > own.times.get(own.times.size() - 1));
                fall = fall < 0 && falls ? cursor.row() : fall;
                own.times.add(now);
                for (int c = 0; c < drawn.length; c++) {
                    own.values.get(c).add(type(table, drawn[c]).isNumber() ? cursor.number(drawn[c]) : Double.NaN);
                }
            }
        }
        List<Run> runs = rows.entrySet().stream().map(entry -> entry.getValue().run(entry.getKey())).toList();
        return new RunScan(runs, fall < 0 ? OptionalLong.empty() : OptionalLong.of(fall));
    }

    private static CellType type(Table table, int column) {
        return table.schema().columns().get(column).type();
    }

    private static final class Rows {
        private final List<Double> times = new ArrayList<>();
        private final List<List<Double>> values = new ArrayList<>();

        Rows(int channels) {
            for (int c = 0; c < channels; c++) {
                values.add(new ArrayList<>());
            }
        }

        Run run(String name) {
            return new Run(name, array(times), values.stream().map(Rows::array).toArray(double[][]::new));
        }

        private static double[] array(List<Double> list) {
            return list.stream().mapToDouble(Double::doubleValue).toArray();
        }
    }

    /** Returns the middle step of all runs; NaN without one. */
    public double step() {
        double[] steps = steps();
        Arrays.sort(steps);
        return steps.length == 0 ? Double.NaN : steps[steps.length / 2];
    }

    /** Returns whether all steps are alike to one in a hundred. */
    public boolean isEven() {
        double middle = step();
        return Arrays.stream(steps()).allMatch(step -> Math.abs(step - middle) <= EVEN * Math.abs(middle));
    }

    /** Returns how many pauses there are: steps much longer than the middle one. */
    long gaps() {
        double middle = step();
        return Arrays.stream(steps()).filter(step -> step > GAP * middle).count();
    }

    private double[] steps() {
        return runs.stream().flatMapToDouble(run -> java.util.stream.IntStream.range(1, run.times().length).mapToDouble(i -> run.times()[i] - run.times()[i - 1]))
                .filter(Double::isFinite).toArray();
    }

    /** Returns the rows of the shortest run. */
    int shortest() {
        return runs.stream().mapToInt(run -> run.times().length).min().orElse(0);
    }

    /** Returns the rows of the longest run. */
    int longest() {
        return runs.stream().mapToInt(run -> run.times().length).max().orElse(0);
    }
}
