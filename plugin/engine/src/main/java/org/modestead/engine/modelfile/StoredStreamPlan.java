package org.modestead.engine.modelfile;

import java.util.Set;
import java.util.TreeSet;
import org.modestead.engine.moments.Apart;
import org.modestead.engine.moments.Features;
import org.modestead.engine.moments.Keeping;
import org.modestead.engine.moments.StreamPlan;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.recording.GapPolicy;
import org.modestead.engine.recording.MissingPolicy;
import org.modestead.engine.recording.Scaling;

/** What was asked of a fit in one pass. */
public final class StoredStreamPlan {

    private StoredStreamPlan() {}

    /** Returns the tree of a plan. */
    public static Stored.Fields of(StreamPlan plan) {
        FieldsWriter out = new FieldsWriter().list("channels", plan.channels(), StoredSnapshots::of)
                .put("time", new FieldsWriter().choice("kind", plan.time().kind()).text("unit", plan.time().unit()).done());
        plan.step().ifPresent(step -> out.number("step", step));
        return out.number("gap_factor", plan.gapFactor()).choice("gaps", plan.gaps()).choice("missing", plan.missing())
                .flag("centred", plan.centred()).choice("scaling", plan.scaling()).put("delay", StoredSnapshots.of(plan.delay()))
                .whole("stride", plan.stride()).put("features", of(plan.features())).put("keeping", of(plan.keeping())).done();
    }

    /** Returns the plan of a tree. */
    public static StreamPlan read(FieldsReader in) {
        return new StreamPlan(StoredSnapshots.readChannels(in), StoredSnapshots.readTime(in), in.optionalNumber("step"), in.number("gap_factor"),
                in.choice("gaps", GapPolicy.class), in.choice("missing", MissingPolicy.class), in.flag("centred"),
                in.choice("scaling", Scaling.class), in.object("delay", StoredSnapshots::readDelay), in.count("stride", 1, 1 << 24),
                in.object("features", StoredStreamPlan::readFeatures), in.object("keeping", StoredStreamPlan::readKeeping));
    }

    private static Stored.Fields of(Features features) {
        FieldsWriter out = new FieldsWriter();
        if (features instanceof Features.Coordinates coordinates) {
            return out.text("kind", "coordinates").choice("correction", coordinates.correction()).done();
        }
        if (features instanceof Features.Monomials monomials) {
            return out.text("kind", "monomials").whole("degree", monomials.degree()).done();
        }
        if (features instanceof Features.RandomFourier random) {
            return out.text("kind", "random-waves").put("kernel", StoredKernel.of(random.kernel())).whole("waves", random.waves())
                    .whole("seed", random.seed()).done();
        }
        Features.Landmarks landmarks = (Features.Landmarks) features;
        return out.text("kind", "landmarks").put("kernel", StoredKernel.of(landmarks.kernel())).whole("landmarks", landmarks.landmarks()).done();
    }

    private static Features readFeatures(FieldsReader in) {
        String kind = in.text("kind");
        return switch (kind) {
            case "coordinates" -> new Features.Coordinates(in.choice("correction", NoiseCorrection.class));
            case "monomials" -> new Features.Monomials(in.count("degree", 1, Short.MAX_VALUE));
            case "random-waves" -> new Features.RandomFourier(in.object("kernel", StoredKernel::readSpec), in.count("waves", 1, Integer.MAX_VALUE),
                    in.whole("seed"));
            case "landmarks" -> new Features.Landmarks(in.object("kernel", StoredKernel::readSpec), in.count("landmarks", 1, Integer.MAX_VALUE));
            default -> throw in.wrong("kind", "functions of kind " + kind, "a kind that is known here");
        };
    }

    private static Stored.Fields of(Keeping keeping) {
        return new FieldsWriter().whole("seed", keeping.seed()).put("apart", of(keeping.apart())).whole("stretch", keeping.stretch())
                .whole("training", keeping.training()).whole("judging", keeping.judging()).done();
    }

    private static Keeping readKeeping(FieldsReader in) {
        return new Keeping(in.whole("seed"), in.object("apart", StoredStreamPlan::readApart), in.count("stretch", 2, Integer.MAX_VALUE),
                in.count("training", 2, Integer.MAX_VALUE), in.count("judging", 2, Integer.MAX_VALUE));
    }

    private static Stored.Fields of(Apart apart) {
        FieldsWriter out = new FieldsWriter();
        if (apart instanceof Apart.Runs runs) {
            return out.text("kind", "runs").texts("holdout", runs.holdout().stream().toList())
                    .texts("calibration", runs.calibration().stream().toList()).done();
        }
        if (apart instanceof Apart.Shares shares) {
            return out.text("kind", "shares").number("holdout", shares.holdout()).number("calibration", shares.calibration())
                    .flag("whole_runs", shares.wholeRuns()).done();
        }
        return out.text("kind", "none").done();
    }

    private static Apart readApart(FieldsReader in) {
        String kind = in.text("kind");
        return switch (kind) {
            case "none" -> new Apart.None();
            case "runs" -> new Apart.Runs(names(in, "holdout"), names(in, "calibration"));
            case "shares" -> new Apart.Shares(in.number("holdout"), in.number("calibration"), in.flag("whole_runs"));
            default -> throw in.wrong("kind", "the kind " + kind, "none, runs or shares");
        };
    }

    private static Set<String> names(FieldsReader in, String name) {
        return new TreeSet<>(in.texts(name));
    }
}
