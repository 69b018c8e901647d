package org.modestead.spark;

import static org.apache.spark.sql.functions.array;
import static org.apache.spark.sql.functions.array_except;
import static org.apache.spark.sql.functions.col;
import static org.apache.spark.sql.functions.explode;
import static org.apache.spark.sql.functions.floor;
import static org.apache.spark.sql.functions.lit;
import static org.apache.spark.sql.functions.min;
import static org.apache.spark.sql.functions.when;

import java.util.ArrayList;
import java.util.List;
import org.apache.spark.api.java.JavaRDD;
import org.apache.spark.sql.Column;
import org.apache.spark.sql.Dataset;
import org.apache.spark.sql.Row;
import org.apache.spark.sql.types.DataTypes;
import org.modestead.engine.modelfile.FieldsReader;
import org.modestead.engine.modelfile.Stored;
import org.modestead.engine.modelfile.StoredMoments;
import org.modestead.engine.moments.Moments;
import org.modestead.engine.moments.StreamPlan;

/**
 * Runs cut by time into slices that fit a task. Rows near a border are read on both sides, but counted on one: so pairs and delays reach over
 * it, and a piece is as long on either side as it is in the run.
 *
 * @param recorded rows
 * @param rows of a slice, a multiple of the stretches that are kept
 * @param partitions tasks, 0 for Spark's own choice
 */
record Slices(RecordedRows recorded, long rows, int partitions) {

    private static final String SLICE = "modestead_slice";
    private static final String OWN_SLICE = "modestead_own_slice";
    private static final String START = "modestead_start";
    private static final String INDEX = "modestead_index";
    private static final long FEW_RUNS = 100_000;

    /** Does one pass and returns what it leaves. */
    Moments pass(StreamPlan plan, SliceReader reader) {
        JavaRDD<Stored.Fields> parts = sliced(plan, reader.step()).toJavaRDD().mapPartitions(reader);
        return StoredMoments.read(new FieldsReader("moments", parts.treeReduce(Slices::merged)));
    }

    private static Stored.Fields merged(Stored.Fields a, Stored.Fields b) {
        return StoredMoments.of(StoredMoments.read(new FieldsReader("moments", a)).plus(StoredMoments.read(new FieldsReader("moments", b))));
    }

    private Dataset<Row> sliced(StreamPlan plan, double step) {
        Dataset<Row> starts = recorded.rows().groupBy(RecordedRows.RUN).agg(min(RecordedRows.TIME).as(START));
        Column index = floor(col(RecordedRows.TIME).minus(col(START)).divide(step).plus(0.5)).cast(DataTypes.LongType);
        Dataset<Row> numbered = recorded.joinedWith(starts, starts.count() < FEW_RUNS).withColumn(INDEX, index);
        long reach = plan.sliceReach();
        Column slice = floor(col(INDEX).divide(lit((double) rows))).cast(DataTypes.LongType);
        Column place = col(INDEX).minus(slice.multiply(rows));
        Column none = lit(-1L);
        Column before = when(place.lt(reach), slice.minus(1L)).otherwise(none);
        Column after = when(place.geq(rows - reach), slice.plus(1L)).otherwise(none);
        Dataset<Row> copies = numbered.withColumn(OWN_SLICE, slice)
                .withColumn(SLICE, explode(array_except(array(slice, before, after), array(none))));
        Column[] keys = {col(RecordedRows.RUN), col(SLICE)};
        Dataset<Row> dealt = partitions == 0 ? copies.repartition(keys) : copies.repartition(partitions, keys);
        return dealt.sortWithinPartitions(col(RecordedRows.RUN), col(SLICE), col(RecordedRows.TIME)).select(ordered().toArray(Column[]::new));
    }

    private List<Column> ordered() {
        List<Column> out = new ArrayList<>(List.of(col(RecordedRows.RUN), col(SLICE), col(SLICE).equalTo(col(OWN_SLICE)), col(START),
                col(RecordedRows.TIME)));
        for (String channel : recorded.rows().columns()) {
            if (!channel.equals(RecordedRows.RUN) && !channel.equals(RecordedRows.TIME)) {
                out.add(col(channel));
            }
        }
        return out;
    }
}
