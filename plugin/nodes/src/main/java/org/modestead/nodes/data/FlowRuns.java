package org.modestead.nodes.data;

import java.util.Locale;
import java.util.Random;
import org.modestead.engine.Progress;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/**
 * Runs of a one-dimensional flow from evenly spaced starts in [-1, 1].
 *
 * @param flow what moves the state
 * @param runs number of runs, at least 1; a single one starts at -1
 * @param duration length of each run in time units, positive
 * @param samples samples a run including both ends, at least 2
 * @param noise standard deviation of the measurement noise, as a share of the largest start 1
 * @param seed of the noise
 */
record FlowRuns(Flow flow, int runs, double duration, int samples, double noise, long seed) {

    static TableSchema schema() {
        return TableSchema.of(new Column("run", CellType.TEXT), new Column("time", CellType.DOUBLE),
                new Column("x", CellType.DOUBLE));
    }

    /** Returns the start of a run, counted from 0. */
    double start(int run) {
        return runs == 1 ? -1 : -1 + 2.0 * run / (runs - 1);
    }

    /** Returns the shortest time after which one of the runs has escaped to infinity. */
    double escapeTime() {
        double earliest = Double.POSITIVE_INFINITY;
        for (int run = 0; run < runs; run++) {
            earliest = Math.min(earliest, flow.escapeTime(start(run)));
        }
        return earliest;
    }

    /** Makes the recordings; {@code duration} must be below {@link #escapeTime()}. */
    Table table(Progress progress) {
        MemoryTable.Builder table = MemoryTable.builder(schema(), "signal generator, flow " + flow + ", seed " + seed);
        Random random = new Random(seed);
        for (int run = 0; run < runs; run++) {
            progress.checkCancelled();
            String id = String.format(Locale.ROOT, "run-%02d", run + 1);
            for (int k = 0; k < samples; k++) {
                double time = duration * k / (samples - 1);
                table.row(id, time, flow.at(start(run), time) + noise * random.nextGaussian());
            }
        }
        return table.build();
    }
}
