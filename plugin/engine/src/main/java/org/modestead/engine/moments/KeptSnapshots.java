package org.modestead.engine.moments;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.FitFault;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.Snapshots.Fact;

/** Snapshots of what was kept, for the steps that look at the recording. */
final class KeptSnapshots {

    private KeptSnapshots() {}

    static Snapshots of(Moments moments, Preparation preparation) {
        StreamPlan plan = moments.plan();
        List<Run> training = runs(moments.training(), preparation);
        if (training.isEmpty()) {
            throw new FitFault("kept stretches", "none of the training part was kept", "make stretches shorter or keep more samples");
        }
        List<Run> calibration = runs(moments.calibration(), preparation);
        List<Run> holdout = runs(moments.holdout(), preparation);
        return new Snapshots(plan.channels(), List.of(), plan.time(), training, calibration, holdout, OptionalDouble.of(moments.steps().mean()),
                plan.delay(), preparation, facts(moments), doubts(moments, holdout));
    }

    /** A run of which one stretch was kept has its name, else each stretch has a number. */
    private static List<Run> runs(KeptStretches kept, Preparation preparation) {
        Map<String, List<KeptStretch>> byRun = new LinkedHashMap<>();
        kept.kept().stream().sorted(KeptStretch.IN_ORDER).forEach(stretch -> byRun.computeIfAbsent(stretch.run(), run -> new ArrayList<>())
                .add(stretch));
        List<Run> runs = new ArrayList<>();
        byRun.forEach((name, stretches) -> {
            for (int i = 0; i < stretches.size(); i++) {
                runs.add(run(stretches.size() == 1 ? name : name + "#" + (i + 1), stretches.get(i), preparation));
            }
        });
        return runs;
    }

    private static Run run(String name, KeptStretch stretch, Preparation preparation) {
        DMatrixRMaj values = stretch.values().copy();
        for (int k = 0; k < values.numRows; k++) {
            for (int c = 0; c < values.numCols; c++) {
                values.set(k, c, preparation.prepare(c, stretch.times()[k], values.get(k, c)));
            }
        }
        return new Run(name, stretch.times(), values);
    }

    private static List<Fact> facts(Moments moments) {
        StreamPlan plan = moments.plan();
        RowCounts counts = moments.counts();
        List<Fact> facts = new ArrayList<>();
        facts.add(new Fact("recorded runs", Long.toString(counts.runs())));
        facts.add(new Fact("recorded samples", Long.toString(counts.rows())));
        facts.add(new Fact("channels", plan.channels().size() + ": " + String.join(", ", plan.channels().stream().map(Channel::label).toList())));
        facts.add(new Fact("inputs", "none"));
        facts.add(new Fact("step", moments.steps().mean() + (plan.time().unit().isEmpty() ? "" : " " + plan.time().unit()) + ", as recorded"));
        facts.add(new Fact("gaps", counts.gaps() == 0 ? "none" : counts.gaps() + " found, split"));
        facts.add(new Fact("samples with missing cells", counts.missing() == 0 ? "none" : counts.missing() + " left out, split there"));
        facts.add(new Fact("samples left out", Long.toString(counts.missing() + counts.scattered())));
        facts.add(new Fact("samples fitted", Long.toString(counts.training())));
        facts.add(new Fact("snapshot pairs", Long.toString(moments.pairs().pairs())));
        facts.add(new Fact("detrend", plan.centred() ? "mean" : "none"));
        facts.add(new Fact("scaling", plan.scaling().words()));
        facts.add(new Fact("delay", plan.delay().depth() == 1 ? "none" : "depth " + plan.delay().depth() + ", spacing " + plan.delay().spacing()));
        facts.add(kept("training", moments.training()));
        facts.add(kept("calibration", moments.calibration()));
        facts.add(kept("holdout", moments.holdout()));
        return facts;
    }

    private static Fact kept(String part, KeptStretches kept) {
        return new Fact(part + " samples kept", kept.kept().stream().mapToLong(KeptStretch::samples).sum() + " of " + kept.samples() + ", in "
                + kept.kept().size() + " stretches");
    }

    private static List<Doubt> doubts(Moments moments, List<Run> holdout) {
        List<Doubt> doubts = new ArrayList<>();
        ChannelMoments channels = moments.channels();
        for (int c = 0; c < channels.mean().length; c++) {
            if (channels.low()[c] == channels.high()[c]) {
                doubts.add(new Doubt("constant-channel", "Channel " + moments.plan().channels().get(c).name() + " is " + channels.low()[c]
                        + " in every sample; it tells nothing about the motion."));
            }
        }
        if (moments.counts().scattered() > 0) {
            doubts.add(new Doubt("samples-left-out", moments.counts().scattered() + " samples were left out, in pieces with fewer than the "
                    + moments.plan().samplesNeeded() + " samples two states need."));
        }
        if (holdout.isEmpty()) {
            doubts.add(new Doubt("nothing-held-out", "No stretch was kept away from the fit, so modes and forecasts are judged on data"
                    + " that the fit saw."));
        }
        return doubts;
    }
}
