package org.modestead.nodes.fit;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.kernel.ScaleHeuristic;
import org.modestead.engine.moments.Moments;
import org.modestead.engine.moments.Pilot;
import org.modestead.engine.moments.StreamPass;
import org.modestead.engine.moments.StreamPlan;
import org.modestead.nodes.prepare.RecordingRows;

/**
 * Passes over the rows of a recording. The first few thousand rows are looked at before, for the usual step and a balance of the sums; where
 * scales or landmarks must be known, all rows are.
 */
final class StreamedRows {

    private static final int FIRST = 1 << 14;

    private final RecordingRows rows;
    private final List<Row> first = new ArrayList<>();

    private record Row(String run, double time, double[] values) {}

    private StreamedRows(RecordingRows rows) {
        this.rows = rows;
    }

    /**
     * @param rows in order of run and time
     * @param reach samples that a pair of states reaches over
     */
    static StreamedRows of(RecordingRows rows, int reach, Progress progress) {
        StreamedRows streamed = new StreamedRows(rows);
        int most = Math.max(FIRST, 20 * reach);
        rows.read((run, time, values) -> {
            streamed.first.add(new Row(run, time, values.clone()));
            return streamed.first.size() < most;
        }, "looking at the first rows", progress);
        return streamed;
    }

    /** Returns the median distance between states of the first rows, prepared by their own moments. */
    double scale(StreamPlan plan) {
        DMatrixRMaj states = Pilot.states(plan, survey(plan));
        return ScaleHeuristic.medianDistance(states);
    }

    /** Returns what one pass over all rows leaves; there is one before where the plan needs it. */
    Moments moments(StreamPlan plan, Progress progress) {
        double step = step(plan);
        Moments survey = plan.needsSurvey() ? pass(StreamPass.survey(plan, step), "looking at all rows", progress) : survey(plan);
        return pass(StreamPass.summing(plan, Pilot.of(plan, survey, progress)), "summing up", progress);
    }

    private Moments survey(StreamPlan plan) {
        Feed feed = new Feed(StreamPass.survey(plan, step(plan)));
        first.forEach(row -> feed.take(row.run, row.time, row.values));
        return feed.pass.finish();
    }

    private Moments pass(StreamPass pass, String message, Progress progress) {
        Feed feed = new Feed(pass);
        rows.read(feed::take, message, progress);
        return pass.finish();
    }

    private double step(StreamPlan plan) {
        double[] steps = new double[first.size()];
        int count = 0;
        for (int i = 1; i < first.size(); i++) {
            if (first.get(i).run.equals(first.get(i - 1).run)) {
                steps[count++] = first.get(i).time - first.get(i - 1).time;
            }
        }
        double[] sorted = Arrays.copyOf(steps, count);
        Arrays.sort(sorted);
        double median = count == 0 ? Double.NaN : sorted[count / 2];
        if (plan.step().isEmpty() && !(median > 0)) {
            throw new RecordingFault("first rows", "neighbouring rows have no rising times", "put the rows in order of run and time, or give the step");
        }
        return plan.step().orElse(median);
    }

    /** Tells a pass where runs begin. */
    private static final class Feed {
        private final StreamPass pass;
        private final Set<String> seen = new HashSet<>();
        private String run = "";

        Feed(StreamPass pass) {
            this.pass = pass;
        }

        boolean take(String name, double time, double[] values) {
            if (!name.equals(run) || seen.isEmpty()) {
                if (!seen.add(name)) {
                    throw new RecordingFault("run " + name, "its rows are not all together: it comes again after run " + run,
                            "put the rows in order of run and time, with a query and ORDER BY for example");
                }
                run = name;
                pass.begin(name, time, true);
            }
            pass.row(time, values, true);
            return true;
        }
    }
}
