package org.modestead.engine.moments;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.Set;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Detrend;
import org.modestead.engine.recording.GapPolicy;
import org.modestead.engine.recording.MissingPolicy;
import org.modestead.engine.recording.Recording;
import org.modestead.engine.recording.Resampling;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.RunWeighting;
import org.modestead.engine.recording.Scaling;
import org.modestead.engine.recording.SmoothingRule;
import org.modestead.engine.recording.SnapshotBuilder;
import org.modestead.engine.recording.SnapshotPlan;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.Split;
import org.modestead.engine.recording.TimeAxis;

/** Recordings for the tests of the fit in one pass, and both ways of reading them. */
final class Streams {

    static final double STEP = 0.1;
    static final List<Channel> CHANNELS = List.of(new Channel("level", "m"), new Channel("flow", "m3/h"), new Channel("pressure", "bar"));
    static final TimeAxis TIME = new TimeAxis(TimeAxis.Kind.NUMBER, "s");
    /** Long enough for several blocks, and one with the fewest samples that are of use. */
    private static final int[] LENGTHS = {2600, 700, 40, 1500, 1200};

    private Streams() {}

    /** Two pushed oscillations seen by three channels of other size and offset, with a little noise, a gap and missing cells. */
    static Recording recording() {
        Random random = new Random(20);
        List<Run> runs = new ArrayList<>();
        for (int r = 0; r < LENGTHS.length; r++) {
            runs.add(run("run " + r, LENGTHS[r], random, r == 1 ? 333 : -1));
        }
        for (int row : new int[] {100, 101, 1034, 1499}) {
            runs.get(3).values().set(row, row % 3, Double.NaN);
        }
        return new Recording(CHANNELS, List.of(), runs, TIME);
    }

    private static Run run(String name, int samples, Random random, int gapAfter) {
        double[] times = new double[samples];
        DMatrixRMaj values = new DMatrixRMaj(samples, 3);
        double[] z = {1, 0, 0.5, 0};
        for (int k = 0; k < samples; k++) {
            times[k] = 7 + (k + (gapAfter >= 0 && k > gapAfter ? 12 : 0)) * STEP;
            z = step(z, random);
            values.set(k, 0, 20 + 3 * z[0] + z[2] + 0.02 * random.nextGaussian());
            values.set(k, 1, -400 + 90 * z[1] - 40 * z[3] + random.nextGaussian());
            values.set(k, 2, 2 + 0.1 * z[0] * z[0] + 0.2 * z[2] + 0.002 * random.nextGaussian());
        }
        return new Run(name, times, values);
    }

    private static double[] step(double[] z, Random random) {
        double[] out = new double[4];
        double[] turn = {0.31, 0.83};
        double[] damp = {0.995, 0.98};
        for (int j = 0; j < 2; j++) {
            double c = damp[j] * Math.cos(turn[j]);
            double s = damp[j] * Math.sin(turn[j]);
            out[2 * j] = c * z[2 * j] - s * z[2 * j + 1] + 0.1 * random.nextGaussian();
            out[2 * j + 1] = s * z[2 * j] + c * z[2 * j + 1] + 0.1 * random.nextGaussian();
        }
        return out;
    }

    static StreamPlan plan(Features features, DelayEmbedding delay, boolean centred, Scaling scaling) {
        return plan(features, delay, centred, scaling, 1);
    }

    static StreamPlan plan(Features features, DelayEmbedding delay, boolean centred, Scaling scaling, int stride) {
        Keeping keeping = new Keeping(5, new Apart.Runs(Set.of("run 4"), Set.of()), 3000, 20_000, 5000);
        return new StreamPlan(CHANNELS, TIME, OptionalDouble.of(STEP), 1.5, GapPolicy.SPLIT, MissingPolicy.SPLIT, centred, scaling, delay, stride,
                features, keeping);
    }

    /** What the Snapshot Builder makes of the same wishes. */
    static Snapshots inMemory(StreamPlan plan, Recording recording) {
        SnapshotPlan alike = new SnapshotPlan(GapPolicy.SPLIT, OptionalDouble.of(plan.gapFactor()), Resampling.KEEP, OptionalDouble.empty(),
                MissingPolicy.SPLIT, plan.centred() ? Detrend.MEAN : Detrend.NONE, plan.scaling(), plan.delay(),
                new Split.Runs(List.of("run 4")), new Split.None(), RunWeighting.EQUAL_SAMPLES, SmoothingRule.NONE);
        return SnapshotBuilder.build(recording, alike, Progress.NONE);
    }

    /** One pass over all rows after a survey: of all rows, or of the first 1500 only. */
    static Moments moments(StreamPlan plan, Recording recording) {
        StreamPass pass = StreamPass.summing(plan, pilot(plan, recording));
        recording.runs().forEach(run -> feed(pass, run, 0, run.samples(), 0));
        return pass.finish();
    }

    static Pilot pilot(StreamPlan plan, Recording recording) {
        StreamPass survey = StreamPass.survey(plan, STEP);
        for (Run run : plan.needsSurvey() ? recording.runs() : recording.runs().subList(0, 1)) {
            feed(survey, run, 0, plan.needsSurvey() ? run.samples() : Math.min(1500, run.samples()), 0);
        }
        return Pilot.of(plan, survey.finish(), Progress.NONE);
    }

    /** Reads the rows [from, to) of a run, and up to so many on either side that belong to others. */
    static void feed(StreamPass pass, Run run, int from, int to, int borrowed) {
        pass.begin(run.id(), run.times()[0], from == 0);
        int n = run.values().numCols;
        for (int k = Math.max(0, from - borrowed); k < Math.min(run.samples(), to + borrowed); k++) {
            pass.row(run.times()[k], Arrays.copyOfRange(run.values().data, k * n, (k + 1) * n), k >= from && k < to);
        }
    }
}
