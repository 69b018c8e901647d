package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Progress;

/** Small recordings for the tests of this package. */
final class Recordings {
    private Recordings() {}

    /** A recording in seconds with channels {@code c0, c1, ...} without units. */
    static Recording of(Run... runs) {
        List<Channel> channels = new ArrayList<>();
        for (int c = 0; c < runs[0].values().numCols; c++) {
            channels.add(new Channel("c" + c, ""));
        }
        List<Channel> inputs = new ArrayList<>();
        for (int c = 0; c < runs[0].inputs().numCols; c++) {
            inputs.add(new Channel("u" + c, ""));
        }
        return new Recording(channels, inputs, List.of(runs), new TimeAxis(TimeAxis.Kind.NUMBER, "s"));
    }

    /** A run whose channels are functions of time. */
    static Run run(String id, double[] times, DoubleUnaryOperator... signals) {
        DMatrixRMaj values = new DMatrixRMaj(times.length, signals.length);
        for (int k = 0; k < times.length; k++) {
            for (int c = 0; c < signals.length; c++) {
                values.set(k, c, signals[c].applyAsDouble(times[k]));
            }
        }
        return new Run(id, times, values);
    }

    /** The times 0, step, 2 step, ... */
    static double[] grid(int count, double step) {
        double[] times = new double[count];
        for (int k = 0; k < count; k++) {
            times[k] = k * step;
        }
        return times;
    }

    /** The run with one cell missing. */
    static Run without(Run run, int row, int channel) {
        DMatrixRMaj values = run.values().copy();
        values.set(row, channel, Double.NaN);
        return new Run(run.id(), run.times(), values, run.inputs(), run.leadIn());
    }

    static Snapshots build(SnapshotPlan plan, Run... runs) {
        return SnapshotBuilder.build(of(runs), plan, Progress.NONE);
    }

    /** The column of one channel. */
    static double[] column(Run run, int channel) {
        double[] column = new double[run.samples()];
        for (int k = 0; k < column.length; k++) {
            column[k] = run.values().get(k, channel);
        }
        return column;
    }

    static List<String> ids(List<Run> runs) {
        return runs.stream().map(Run::id).toList();
    }

    static String fact(Snapshots snapshots, String item) {
        return snapshots.facts().stream().filter(fact -> fact.item().equals(item)).findFirst().orElseThrow().value();
    }

    static OptionalDouble none() {
        return OptionalDouble.empty();
    }
}
