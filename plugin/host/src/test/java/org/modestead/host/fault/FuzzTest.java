package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.engine.Progress;
import org.modestead.engine.moments.Apart;
import org.modestead.engine.moments.Features;
import org.modestead.engine.moments.Keeping;
import org.modestead.engine.moments.Moments;
import org.modestead.engine.moments.Pilot;
import org.modestead.engine.moments.StreamPass;
import org.modestead.engine.moments.StreamPlan;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.GapPolicy;
import org.modestead.engine.recording.MissingPolicy;
import org.modestead.engine.recording.Scaling;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.modelfile.MomentFiles;

/**
 * Whatever comes from outside is taken, or refused with a sentence: no other error, and no more memory than a bound. Few inputs in the
 * ordinary build, {@code -Dfuzz=1000000} for many.
 */
class FuzzTest {

    private static final double STEP = 0.1;
    private static final long SEED = 20261202;
    /** Most inputs of the ordinary build, of a reader that is quick. */
    private static final int FEW = 600;
    /** The readers of tables start a database each time, and requests go through a socket. */
    private static final int SLOWER = 20;
    /** A file of few kilobytes: an entry of 16 MB unpacked, and twice that while it grows, is the most that any may need. */
    private static final long MOST_BYTES = 300_000_000;

    @TempDir
    Path folder;

    @Test
    void workflows() throws IOException {
        feed(new WorkflowFuzz(folder), 1);
    }

    @Test
    void settings() throws IOException {
        feed(new SettingsFuzz(), 1);
    }

    @Test
    void edits() throws IOException {
        feed(new EditFuzz(), 1);
    }

    @Test
    void models() throws IOException {
        feed(ModelFuzz.models(), 1);
    }

    @Test
    void moments() throws IOException {
        feed(ModelFuzz.moments(sums()), 1);
    }

    @Test
    void tables() throws IOException {
        for (String ending : List.of("csv", "csv.gz", "json", "npy")) {
            feed(new TableFuzz(folder, ending), SLOWER);
        }
    }

    @Test
    void requests() throws IOException, InterruptedException {
        feed(new RequestFuzz(folder), SLOWER);
    }

    private static void feed(FuzzedReader reader, int share) throws IOException {
        try (reader) {
            Tally tally = Tally.of(reader, Integer.getInteger("fuzz", FEW) / share, SEED);
            System.out.println(tally.words());
            assertEquals(List.of(), tally.defects(), tally.words());
            assertTrue(tally.taken() > 0 && tally.refused() > 0, tally.words());
            assertTrue(tally.mostBytes() < MOST_BYTES, tally.words());
        }
    }

    /** A file of the sums of one run of two channels. */
    private static byte[] sums() throws IOException {
        StreamPlan plan = new StreamPlan(List.of(new Channel("level", "m"), new Channel("flow", "m3/h")), new TimeAxis(TimeAxis.Kind.NUMBER, "s"),
                OptionalDouble.of(STEP), 1.5, GapPolicy.SPLIT, MissingPolicy.SPLIT, true, Scaling.STD, DelayEmbedding.NONE, 1,
                new Features.Coordinates(NoiseCorrection.NONE), new Keeping(5, new Apart.Runs(Set.of(), Set.of()), 100, 400, 200));
        Moments survey = pass(StreamPass.survey(plan, STEP));
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        MomentFiles.write(pass(StreamPass.summing(plan, Pilot.of(plan, survey, Progress.NONE))), out);
        return out.toByteArray();
    }

    private static Moments pass(StreamPass pass) {
        pass.begin("run 1", 0, true);
        for (int k = 0; k < 1000; k++) {
            pass.row(STEP * k, new double[] {Math.sin(0.3 * k), Math.cos(0.3 * k)}, true);
        }
        return pass.finish();
    }
}
