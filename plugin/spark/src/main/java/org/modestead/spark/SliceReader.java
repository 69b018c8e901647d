package org.modestead.spark;

import java.util.Iterator;
import java.util.List;
import org.apache.spark.api.java.function.FlatMapFunction;
import org.apache.spark.sql.Row;
import org.modestead.engine.modelfile.FieldsReader;
import org.modestead.engine.modelfile.Stored;
import org.modestead.engine.modelfile.StoredMoments;
import org.modestead.engine.modelfile.StoredPilot;
import org.modestead.engine.modelfile.StoredStreamPlan;
import org.modestead.engine.moments.Pilot;
import org.modestead.engine.moments.StreamPass;
import org.modestead.engine.moments.StreamPlan;

/**
 * One task's part of the pass: rows of some slices of runs, sorted, with columns run, slice, own, start, time, then the channels. Travels to
 * the machines with what was asked and what was learned before, as trees.
 *
 * @param plan what was asked
 * @param pilot what was learned, as a list of one; of none for a survey
 * @param step usual time from row to row
 */
record SliceReader(Stored.Fields plan, List<Stored.Fields> pilot, double step) implements FlatMapFunction<Iterator<Row>, Stored.Fields> {

    private static final int RUN = 0;
    private static final int SLICE = 1;
    private static final int OWN = 2;
    private static final int START = 3;
    private static final int TIME = 4;
    private static final int CHANNELS = 5;

    static SliceReader survey(StreamPlan plan, double step) {
        return new SliceReader(StoredStreamPlan.of(plan), List.of(), step);
    }

    static SliceReader summing(StreamPlan plan, Pilot pilot) {
        return new SliceReader(StoredStreamPlan.of(plan), List.of(StoredPilot.of(plan, pilot)), pilot.step());
    }

    @Override
    public Iterator<Stored.Fields> call(Iterator<Row> rows) {
        if (!rows.hasNext()) {
            return List.<Stored.Fields>of().iterator();
        }
        StreamPlan asked = StoredStreamPlan.read(new FieldsReader("plan", plan));
        StreamPass pass = pilot.isEmpty() ? StreamPass.survey(asked, step)
                : StreamPass.summing(asked, StoredPilot.read(new FieldsReader("pilot", pilot.get(0)), asked));
        double[] values = new double[asked.channels().size()];
        String run = "";
        long slice = -1;
        while (rows.hasNext()) {
            Row row = rows.next();
            if (row.getLong(SLICE) != slice || !row.getString(RUN).equals(run)) {
                run = row.getString(RUN);
                slice = row.getLong(SLICE);
                pass.begin(run, row.getDouble(START), slice == 0);
            }
            for (int c = 0; c < values.length; c++) {
                values[c] = row.getDouble(CHANNELS + c);
            }
            pass.row(row.getDouble(TIME), values, row.getBoolean(OWN));
        }
        return List.of(StoredMoments.of(pass.finish())).iterator();
    }
}
