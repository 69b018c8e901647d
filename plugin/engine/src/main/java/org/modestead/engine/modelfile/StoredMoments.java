package org.modestead.engine.modelfile;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.moments.ChannelMoments;
import org.modestead.engine.moments.CompensatedSums;
import org.modestead.engine.moments.KeptStretch;
import org.modestead.engine.moments.KeptStretches;
import org.modestead.engine.moments.Moments;
import org.modestead.engine.moments.PairMoments;
import org.modestead.engine.moments.Pilot;
import org.modestead.engine.moments.RowCounts;
import org.modestead.engine.moments.StepMoments;
import org.modestead.engine.moments.StreamPlan;
import org.modestead.engine.recording.Snapshots.Part;

/** What a pass over rows left: sums that can be added to those of other passes, and stretches that were kept, as recorded. */
public final class StoredMoments {

    private StoredMoments() {}

    /** Returns the tree of moments. */
    public static Stored.Fields of(Moments moments) {
        RowCounts counts = moments.counts();
        ChannelMoments channels = moments.channels();
        return new FieldsWriter().put("plan", StoredStreamPlan.of(moments.plan()))
                .put("pilot", moments.pilot(), pilot -> StoredPilot.of(moments.plan(), pilot))
                .put("counts", new FieldsWriter().whole("rows", counts.rows()).whole("runs", counts.runs()).whole("gaps", counts.gaps())
                        .whole("missing", counts.missing()).whole("scattered", counts.scattered()).whole("training", counts.training()).done())
                .put("channels", new FieldsWriter().whole("count", channels.count()).vector("mean", channels.mean())
                        .vector("squares", channels.squares()).vector("low", channels.low()).vector("high", channels.high()).done())
                .put("steps", new FieldsWriter().number("nominal", moments.steps().nominal()).whole("count", moments.steps().count())
                        .put("excess", of(moments.steps().excess())).done())
                .put("pairs", of(moments.pairs()))
                .put("training", of(moments, moments.training())).put("calibration", of(moments, moments.calibration()))
                .put("holdout", of(moments, moments.holdout())).done();
    }

    /** Returns the moments of a tree. */
    public static Moments read(FieldsReader in) {
        StreamPlan plan = in.object("plan", StoredStreamPlan::read);
        Optional<Pilot> pilot = in.optional("pilot", own -> StoredPilot.read(own, plan));
        int n = plan.channels().size();
        int functions = pilot.map(known -> known.basis().size()).orElse(0);
        int observed = pilot.isPresent() ? Pilot.observed(plan) : 0;
        return new Moments(plan, pilot,
                in.object("counts", own -> new RowCounts(own.whole("rows"), own.whole("runs"), own.whole("gaps"), own.whole("missing"),
                        own.whole("scattered"), own.whole("training"))),
                in.object("channels", own -> new ChannelMoments(own.whole("count"), own.vector("mean", n), own.vector("squares", n),
                        own.vector("low", n), own.vector("high", n))),
                in.object("steps", own -> new StepMoments(own.number("nominal"), own.whole("count"), own.object("excess", sum -> sums(sum, 1, 1)))),
                in.object("pairs", own -> pairs(own, functions, observed)),
                in.object("training", own -> kept(own, Part.TRAINING, n)), in.object("calibration", own -> kept(own, Part.CALIBRATION, n)),
                in.object("holdout", own -> kept(own, Part.HOLDOUT, n)));
    }

    private static Stored.Fields of(PairMoments pairs) {
        return new FieldsWriter().whole("count", pairs.pairs()).put("gram", of(pairs.gram())).put("action", of(pairs.action()))
                .put("second", of(pairs.second())).put("observable", of(pairs.observable())).done();
    }

    private static PairMoments pairs(FieldsReader in, int functions, int observed) {
        return new PairMoments(in.whole("count"), in.object("gram", own -> sums(own, functions, functions)),
                in.object("action", own -> sums(own, functions, functions)), in.object("second", own -> sums(own, functions, functions)),
                in.object("observable", own -> sums(own, functions, observed)));
    }

    /** A matrix without entries has no array. */
    private static Stored.Fields of(CompensatedSums sums) {
        FieldsWriter out = new FieldsWriter();
        if (sums.high().length > 0) {
            out.matrix("high", DMatrixRMaj.wrap(sums.rows(), sums.columns(), sums.high()))
                    .matrix("low", DMatrixRMaj.wrap(sums.rows(), sums.columns(), sums.low()));
        }
        return out.done();
    }

    private static CompensatedSums sums(FieldsReader in, int rows, int columns) {
        return rows * columns == 0 ? new CompensatedSums(rows, columns, new double[0], new double[0])
                : new CompensatedSums(rows, columns, in.matrix("high", rows, columns).data, in.matrix("low", rows, columns).data);
    }

    private static Stored.Fields of(Moments moments, KeptStretches kept) {
        FieldsWriter out = new FieldsWriter().whole("most", kept.most()).whole("samples", kept.samples())
                .texts("runs", kept.kept().stream().map(KeptStretch::run).toList())
                .put("draws", Optional.of(kept.kept()).filter(all -> !all.isEmpty()), all -> new Stored.Wholes(1,
                        all.stream().mapToLong(KeptStretch::draw).toArray()));
        kept.cutoff().ifPresent(cutoff -> out.whole("cutoff", cutoff));
        if (!kept.kept().isEmpty()) {
            out.vectors("times", kept.kept().stream().map(KeptStretch::times).toList())
                    .matrices("values", moments.plan().channels().size(), kept.kept().stream().map(KeptStretch::values).toList());
        }
        return out.done();
    }

    private static KeptStretches kept(FieldsReader in, Part part, int channels) {
        List<String> runs = in.texts("runs");
        long[] draws = runs.isEmpty() ? new long[0] : in.wholeVector("draws", runs.size());
        List<double[]> times = runs.isEmpty() ? List.of() : in.vectors("times");
        List<DMatrixRMaj> values = runs.isEmpty() ? List.of() : in.matrices("values");
        if (times.size() != runs.size() || values.size() != runs.size()) {
            throw in.wrong("values", values.size() + " stretches", "one for each of " + runs.size() + " names");
        }
        List<KeptStretch> stretches = new ArrayList<>();
        IntStream.range(0, runs.size()).forEach(i -> {
            if (values.get(i).numCols != channels || values.get(i).numRows != times.get(i).length || times.get(i).length == 0) {
                throw in.wrong("values", values.get(i).numRows + " x " + values.get(i).numCols, times.get(i).length + " rows of " + channels);
            }
            stretches.add(new KeptStretch(draws[i], part, runs.get(i), times.get(i), values.get(i)));
        });
        return new KeptStretches(part, in.count("most", 1, Integer.MAX_VALUE), stretches,
                in.has("cutoff") ? OptionalLong.of(in.whole("cutoff")) : OptionalLong.empty(), in.whole("samples"));
    }
}
