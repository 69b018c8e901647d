package org.modestead.host.fault;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Set;
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

/** Sums of a small recording, as a file. */
final class SampleSums {

    private static final double STEP = 0.1;

    private SampleSums() {}

    /** A file of the sums of one run of two channels. */
    static byte[] file() throws IOException {
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
