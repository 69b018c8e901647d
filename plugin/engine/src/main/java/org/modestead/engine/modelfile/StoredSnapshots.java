package org.modestead.engine.modelfile;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Smoothing;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;

/** Snapshots: the runs of a part one below the other, with the samples of each, and what was done to them. */
public final class StoredSnapshots {

    private StoredSnapshots() {}

    /** Returns the tree of snapshots. */
    public static Stored.Fields of(Snapshots snapshots) {
        FieldsWriter out = new FieldsWriter()
                .list("channels", snapshots.channels(), StoredSnapshots::of)
                .list("inputs", snapshots.inputs(), StoredSnapshots::of)
                .put("time", new FieldsWriter().choice("kind", snapshots.time().kind()).text("unit", snapshots.time().unit()).done());
        snapshots.step().ifPresent(step -> out.number("step", step));
        Optional<Smoothing> smoothed = Optional.of(snapshots.smoothing()).filter(Smoothing::active);
        return out.put("delay", of(snapshots.delay())).put("preparation", of(snapshots.preparation()))
                .put("smoothing", smoothed, StoredSnapshots::of)
                .put("training", runs(snapshots, snapshots.training()))
                .put("calibration", runs(snapshots, snapshots.calibration()))
                .put("holdout", runs(snapshots, snapshots.holdout()))
                .list("facts", snapshots.facts(), fact -> new FieldsWriter().text("item", fact.item()).text("value", fact.value()).done())
                .list("doubts", snapshots.doubts(), StoredSnapshots::of).done();
    }

    /** Returns the snapshots of a tree. */
    public static Snapshots read(FieldsReader in) {
        List<Channel> channels = readChannels(in);
        List<Channel> inputs = readInputs(in);
        OptionalDouble step = in.optionalNumber("step");
        if (step.isPresent() && !(step.getAsDouble() > 0 && Double.isFinite(step.getAsDouble()))) {
            throw in.wrong("step", "the number " + step.getAsDouble(), "a positive number");
        }
        return new Snapshots(channels, inputs, readTime(in),
                in.object("training", runs -> readRuns(runs, channels.size(), inputs.size())),
                in.object("calibration", runs -> readRuns(runs, channels.size(), inputs.size())),
                in.object("holdout", runs -> readRuns(runs, channels.size(), inputs.size())),
                step, in.object("delay", StoredSnapshots::readDelay),
                in.object("preparation", preparation -> readPreparation(preparation, channels.size())),
                in.optional("smoothing", own -> readSmoothing(own, channels.size())).orElseGet(() -> Smoothing.none(channels.size())),
                in.objects("facts", fact -> new Snapshots.Fact(fact.text("item"), fact.text("value"))),
                in.objects("doubts", StoredSnapshots::readDoubt));
    }

    /** Returns the channels of a tree of snapshots. */
    public static List<Channel> readChannels(FieldsReader in) {
        return in.objects("channels", StoredSnapshots::readChannel);
    }

    /** Returns the inputs of a tree of snapshots. */
    public static List<Channel> readInputs(FieldsReader in) {
        return in.objects("inputs", StoredSnapshots::readChannel);
    }

    /** Returns the time axis of a tree of snapshots. */
    public static TimeAxis readTime(FieldsReader in) {
        return in.object("time", time -> new TimeAxis(time.choice("kind", TimeAxis.Kind.class), time.text("unit")));
    }

    static Stored.Fields of(Channel channel) {
        return new FieldsWriter().text("name", channel.name()).text("unit", channel.unit()).done();
    }

    static Channel readChannel(FieldsReader in) {
        return new Channel(in.text("name"), in.text("unit"));
    }

    /** Returns the tree of a doubt. */
    public static Stored.Fields of(Doubt doubt) {
        return new FieldsWriter().text("code", doubt.code()).text("sentence", doubt.sentence()).done();
    }

    /** Returns the doubt of a tree. */
    public static Doubt readDoubt(FieldsReader in) {
        return new Doubt(in.text("code"), in.text("sentence"));
    }

    static Stored.Fields of(DelayEmbedding delay) {
        return new FieldsWriter().whole("depth", delay.depth()).whole("spacing", delay.spacing()).done();
    }

    static DelayEmbedding readDelay(FieldsReader in) {
        return new DelayEmbedding(in.count("depth", 1, Short.MAX_VALUE), in.count("spacing", 1, Short.MAX_VALUE));
    }

    static Stored.Fields of(Preparation preparation) {
        return new FieldsWriter().number("origin", preparation.origin()).vector("offset", preparation.offset())
                .vector("slope", preparation.slope()).vector("scale", preparation.scale()).done();
    }

    static Preparation readPreparation(FieldsReader in, int channels) {
        return new Preparation(in.number("origin"), in.vector("offset", channels), in.vector("slope", channels), in.vector("scale", channels));
    }

    private static Stored.Fields of(Smoothing smoothing) {
        return new FieldsWriter().wholes("reach", smoothing.reach())
                .vector("noise", smoothing.noise().stream().mapToDouble(Double::doubleValue).toArray()).done();
    }

    private static Smoothing readSmoothing(FieldsReader in, int channels) {
        List<Integer> reach = in.wholes("reach", 0, Short.MAX_VALUE);
        if (reach.size() != channels) {
            throw in.wrong("reach", reach.size() + " entries", "one for each of " + channels + " channels");
        }
        return new Smoothing(reach, Arrays.stream(in.vector("noise", channels)).boxed().toList());
    }

    private static Stored.Fields runs(Snapshots snapshots, List<Run> runs) {
        return new FieldsWriter().texts("runs", runs.stream().map(Run::id).toList())
                .wholes("lead_in", runs.stream().map(Run::leadIn).toList())
                .list("weight", runs, run -> new Stored.Number(run.weight()))
                .vectors("times", runs.stream().map(Run::times).toList())
                .matrices("values", snapshots.channels().size(), runs.stream().map(Run::values).toList())
                .matrices("inputs", snapshots.inputs().size(), runs.stream().map(Run::inputs).toList()).done();
    }

    private static List<Run> readRuns(FieldsReader in, int channels, int inputs) {
        List<String> ids = in.texts("runs");
        List<Integer> leadIns = ofEachRun(in, "lead_in", in.wholes("lead_in", 0, Integer.MAX_VALUE), ids.size());
        List<Double> weights = ofEachRun(in, "weight", in.numbers("weight"), ids.size());
        List<double[]> times = ofEachRun(in, "times", in.vectors("times"), ids.size());
        List<DMatrixRMaj> values = ofEachRun(in, "values", in.matrices("values"), ids.size());
        List<DMatrixRMaj> known = ofEachRun(in, "inputs", in.matrices("inputs"), ids.size());
        List<Run> out = new ArrayList<>(ids.size());
        for (int i = 0; i < ids.size(); i++) {
            if (values.get(i).numCols != channels || known.get(i).numCols != inputs) {
                throw in.wrong("values", values.get(i).numCols + " channels and " + known.get(i).numCols + " inputs",
                        channels + " and " + inputs);
            }
            requireRising(in, ids.get(i), times.get(i));
            out.add(new Run(ids.get(i), times.get(i), values.get(i), known.get(i), leadIns.get(i), weights.get(i)));
        }
        return out;
    }

    private static void requireRising(FieldsReader in, String run, double[] times) {
        for (int k = 0; k < times.length; k++) {
            if (!Double.isFinite(times[k]) || k > 0 && !(times[k] > times[k - 1])) {
                throw in.wrong("times", "run " + run + ", sample " + (k + 1) + " at " + times[k], "a finite time above that of the sample before");
            }
        }
    }

    private static <T> List<T> ofEachRun(FieldsReader in, String name, List<T> found, int runs) {
        if (found.size() != runs) {
            throw in.wrong(name, found.size() + " entries", "one for each of " + runs + " runs");
        }
        return found;
    }
}
