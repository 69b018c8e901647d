package org.modestead.spark;

import java.io.IOException;
import java.io.OutputStream;
import java.util.Arrays;
import java.util.List;
import org.apache.hadoop.fs.FileSystem;
import org.apache.hadoop.fs.Path;
import org.apache.spark.sql.Row;
import org.apache.spark.sql.SparkSession;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.kernel.ScaleHeuristic;
import org.modestead.engine.moments.Moments;
import org.modestead.engine.moments.Pilot;
import org.modestead.engine.moments.StreamPass;
import org.modestead.engine.moments.StreamPlan;

/**
 * The job for {@code spark-submit}: reads a recording from Parquet files, sums up all pairs of states, and writes the sums with a sample of
 * stretches to one small file, which the Moments Reader takes up. The figures are those of the Streaming Fit.
 */
public final class MomentsJob {

    private static final int FIRST = 1 << 14;
    private static final int SLICE = 1_000_000;

    private MomentsJob() {}

    /** @param arguments see {@link JobOptions} */
    public static void main(String... arguments) throws IOException {
        try (SparkSession session = SparkSession.builder().appName("Modestead moments").getOrCreate()) {
            JobOptions options = JobOptions.of(arguments);
            write(session, moments(session, options), options.required("output"));
        } catch (Fault fault) {
            throw new IllegalArgumentException(fault.getMessage(), fault);
        }
    }

    /**
     * Does the passes.
     *
     * @throws Fault if an option is wrong or the recording cannot be used
     */
    static Moments moments(SparkSession session, JobOptions options) {
        RecordedRows recorded = RecordedRows.of(session.read().parquet(options.required("input")), options);
        StreamPlan asked = JobPlan.of(options, recorded.channels(), recorded.axis(), 1);
        FirstRows first = new FirstRows(recorded.first(Math.max(FIRST, 20 * asked.pairReach())));
        double step = asked.step().orElseGet(first::medianStep);
        StreamPlan plan = JobPlan.needsScale(options) ? JobPlan.of(options, recorded.channels(), recorded.axis(),
                ScaleHeuristic.medianDistance(Pilot.states(asked, first.survey(asked, step)))) : asked;
        int stretch = plan.keeping().stretch();
        long slice = (Math.max(options.whole("slice", SLICE, 1), 4 * plan.sliceReach()) + stretch - 1) / stretch * stretch;
        Slices slices = new Slices(recorded, slice, options.whole("partitions", 0, 0));
        Moments survey = plan.needsSurvey() ? slices.pass(plan, SliceReader.survey(plan, step)) : first.survey(plan, step);
        return slices.pass(plan, SliceReader.summing(plan, Pilot.of(plan, survey, Progress.NONE)));
    }

    private static void write(SparkSession session, Moments moments, String output) throws IOException {
        Path path = new Path(output);
        FileSystem files = path.getFileSystem(session.sparkContext().hadoopConfiguration());
        try (OutputStream out = files.create(path, true)) {
            MomentsFile.write(moments, out);
        }
    }

    /**
     * The first rows by run and time.
     *
     * @param rows run, time, channels
     */
    private record FirstRows(List<Row> rows) {

        Moments survey(StreamPlan plan, double step) {
            StreamPass pass = StreamPass.survey(plan, step);
            double[] values = new double[plan.channels().size()];
            String run = "";
            for (int i = 0; i < rows.size(); i++) {
                Row row = rows.get(i);
                if (i == 0 || !row.getString(0).equals(run)) {
                    run = row.getString(0);
                    pass.begin(run, row.getDouble(1), true);
                }
                for (int c = 0; c < values.length; c++) {
                    values[c] = row.getDouble(2 + c);
                }
                pass.row(row.getDouble(1), values, true);
            }
            return pass.finish();
        }

        double medianStep() {
            double[] steps = new double[rows.size()];
            int count = 0;
            for (int i = 1; i < rows.size(); i++) {
                if (rows.get(i).getString(0).equals(rows.get(i - 1).getString(0))) {
                    steps[count++] = rows.get(i).getDouble(1) - rows.get(i - 1).getDouble(1);
                }
            }
            double[] sorted = Arrays.copyOf(steps, count);
            Arrays.sort(sorted);
            if (count == 0 || !(sorted[count / 2] > 0)) {
                throw new RecordingFault("first rows", "no run has two rows at different times", "check the run column, or give the step");
            }
            return sorted[count / 2];
        }
    }
}
