package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.recording.Snapshots.Part;

/**
 * Turns a recording into snapshots: checks, split into parts, missing cells, gaps, sample times, detrending, scaling, smoothing.
 *
 * <p>Nothing in the training part depends on a value of calibration or holdout, nothing in calibration on holdout:
 * parts are cut at recorded samples first, interpolation reads the own and earlier parts only, trend and scales come
 * from the training samples. Memory: a copy of the runs that samples are added to, one of
 * all where values are changed, one of runs whose end is kept away.
 */
public final class SnapshotBuilder {
    private final Recording recording;
    private final SnapshotPlan plan;
    private final Progress progress;
    private final PreparationLog log;
    private final Wording wording;
    private final List<Piece> pieces = new ArrayList<>();

    private SnapshotBuilder(Recording recording, SnapshotPlan plan, Progress progress) {
        this.recording = recording;
        this.plan = plan;
        this.progress = progress;
        this.wording = new Wording(recording.time());
        this.log = new PreparationLog(wording, columnNames());
    }

    /**
     * Builds the snapshots.
     *
     * @param recording as logged
     * @param plan what to do
     * @param progress told of every run and asked before each
     * @return runs of each part in recorded order; a run cut into several pieces is named {@code id#1, id#2, ...}
     * @throws RecordingFault if the recording cannot be used as planned, see {@link RecordingChecks}; if a gap or a
     *     missing cell is refused; if a run is too short for two states; if the delays need even times and the times are
     *     uneven; if no run is left to train; if a channel to be scaled does not vary; if a sample is beyond {@link SizeLimits} once scaled
     */
    public static Snapshots build(Recording recording, SnapshotPlan plan, Progress progress) {
        return new SnapshotBuilder(recording, plan, progress).build();
    }

    private Snapshots build() {
        progress.report(0, "checking the recording");
        RecordingChecks.check(recording).forEach(log::add);
        List<Run> runs = recording.runs();
        List<Cut> cuts = Splitter.cuts(runs, plan.holdout(), plan.calibration());
        OptionalDouble uniform = plan.resampling() == Resampling.UNIFORM ? OptionalDouble.of(uniformStep())
                : OptionalDouble.empty();
        RunPieces cutter = new RunPieces(plan, new TargetTimes(uniform, plan.gapPolicy() == GapPolicy.INTERPOLATE),
                columnNames(), wording);
        for (int r = 0; r < runs.size(); r++) {
            progress.checkCancelled();
            progress.report(0.1 + 0.6 * r / runs.size(), "run " + runs.get(r).id());
            pieces.addAll(cutter.of(runs.get(r), cuts.get(r), log));
        }
        OptionalDouble step = uniform.isPresent() ? uniform : commonStep();
        progress.report(0.7, "detrending and scaling");
        Preparation preparation = preparation();
        prepare(preparation);
        RunWeights weights = RunWeights.of(training(), plan.weighting(), recording.channels().size());
        progress.report(0.8, "smoothing");
        Smoothing smoothing = plan.smoothing().of(training().stream()
                .flatMap(piece -> piece.part(Part.TRAINING, plan.delay().reach()).stream()).toList(), recording.channels().size());
        if (smoothing.active()) {
            smooth(smoothing, preparation);
        }
        List<Run> training = parts(Part.TRAINING, weights);
        List<Run> calibration = parts(Part.CALIBRATION, weights);
        List<Run> holdout = parts(Part.HOLDOUT, weights);
        Snapshots bare = new Snapshots(recording.channels(), recording.inputs(), recording.time(), training, calibration,
                holdout, step, plan.delay(), preparation, smoothing, List.of(), log.doubts());
        progress.report(1, "snapshots ready");
        return new SnapshotFacts(recording, plan, log, weights, bare).complete();
    }

    private void prepare(Preparation preparation) {
        boolean untouched = plan.detrend() == Detrend.NONE && plan.scaling() == Scaling.NONE;
        for (int i = 0; i < pieces.size() && !untouched; i++) {
            progress.checkCancelled();
            pieces.set(i, pieces.get(i).prepared(preparation));
            SizeLimits.requirePrepared(pieces.get(i).id(), pieces.get(i).values(), recording.channels());
        }
    }

    private void smooth(Smoothing smoothing, Preparation preparation) {
        for (int i = 0; i < pieces.size(); i++) {
            progress.checkCancelled();
            pieces.set(i, pieces.get(i).smoothed(smoothing));
        }
        log.add(new Doubt("smoothed", "Noise was smoothed away (" + SnapshotFacts.words(smoothing, recording.channels(), preparation)
                + "): forecasts, scores and bands are those of the smoothed signal; single samples scatter by that noise in addition."));
    }

    private double uniformStep() {
        StepEstimate recorded = StepEstimate.of(recording.runs().stream().map(Run::times).toList());
        double step = plan.step().orElse(recorded.typical());
        if (step > plan.gapFactorOrDefault() * recorded.typical()) {
            log.add(new Doubt("coarser-step", "Resampling to a step of " + wording.span(step)
                    + ", coarser than the recorded " + wording.span(recorded.typical())
                    + ", keeps no frequency above " + Wording.number(1 / (2 * step)) + " cycles per "
                    + (recording.time().unit().isEmpty() ? "time unit" : recording.time().unit())
                    + "; faster motion in the recording appears folded, as no filter is applied."));
        }
        return step;
    }

    private OptionalDouble commonStep() {
        StepEstimate step = StepEstimate.of(pieces.stream().map(Piece::times).toList());
        if (step.uniform()) {
            return OptionalDouble.of(step.typical());
        }
        if (plan.delay().depth() > 1) {
            throw new RecordingFault("recording", "its time steps run from " + wording.span(step.shortest()) + " to "
                    + wording.span(step.longest()) + ", but delay depth " + plan.delay().depth()
                    + " needs one step throughout",
                    "resample to a uniform step, for example the median " + wording.span(step.typical()));
        }
        return OptionalDouble.empty();
    }

    /** Returns the pieces that train. */
    private List<Piece> training() {
        return pieces.stream().filter(piece -> piece.samples(Part.TRAINING) >= plan.samplesNeeded() && counts(piece)).toList();
    }

    private boolean counts(Piece piece) {
        return plan.weighting() != RunWeighting.GIVEN || piece.weight() > 0;
    }

    private Preparation preparation() {
        List<Piece> training = training();
        if (training.isEmpty()) {
            throw new RecordingFault("training part", "no run left for it has the " + plan.samplesNeeded()
                    + " samples two states need", "keep less away or choose a smaller delay depth");
        }
        Detrending trend = Detrending.fit(training, recording.channels().size(), plan.detrend());
        return new Preparation(trend.origin(), trend.offset(), trend.slope(),
                ChannelScales.fit(training, recording.channels(), trend, plan.scaling()));
    }

    private List<Run> parts(Part part, RunWeights weights) {
        List<Run> runs = new ArrayList<>();
        for (Piece piece : pieces) {
            if (part == Part.TRAINING && !counts(piece)) {
                log.leftOut(piece.id(), piece.samples(part), "of weight 0");
                continue;
            }
            Optional<Run> run = piece.part(part, plan.delay().reach());
            run.ifPresent(found -> runs.add(found.weighted(weights.of(piece.recorded()))));
            if (run.isEmpty() && piece.samples(part) > 0) {
                log.leftOut(piece.id(), piece.samples(part), "too few for two states in the " + SnapshotFacts.lower(part)
                        + " part (" + plan.samplesNeeded() + " samples)");
            }
        }
        return runs;
    }

    private List<String> columnNames() {
        List<String> names = new ArrayList<>();
        recording.channels().forEach(channel -> names.add(channel.name()));
        recording.inputs().forEach(input -> names.add(input.name()));
        return names;
    }
}
