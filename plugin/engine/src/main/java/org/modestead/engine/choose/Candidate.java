package org.modestead.engine.choose;

import java.util.List;
import java.util.Optional;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.kernel.ModeRoom;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.OccupationEstimator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.operator.SegmentPlan;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;
import org.modestead.engine.wellposed.JudgeSettings;
import org.modestead.engine.wellposed.WellPosedness;

/**
 * One kernel while it is compared: what was fitted in its space and how well it predicts.
 *
 * @param spec family and parameters
 * @param place in the order in which the kernels were given
 * @param fit what was fitted; empty when nothing could be
 * @param verdict whether modes exist in its space, where that was judged
 * @param failure why it could not be fitted or judged; empty otherwise
 */
record Candidate(KernelSpec spec, int place, Optional<Fit> fit, Optional<KernelVerdict> verdict, String failure) {

    private static final int LANDMARKS = 200;
    private static final int SECOND_STEP = 100;
    private static final int PER_FUNCTION = 4;
    private static final int LEAST_RUNGS_ABOVE = 2;

    /**
     * @param kernel made
     * @param compression up to the largest rank and the rungs above it
     * @param rank the smallest one that predicts as well as the best
     * @param errors at that rank
     */
    record Fit(Kernel kernel, OrthonormalCompression compression, int rank, BlockErrors errors) {}

    /** Fits in the kernel's space: the step map on a uniform step, the generator of whole runs on uneven times. */
    static Candidate of(KernelSpec spec, int place, Snapshots fitting, HeldOutData heldOut, RankingPlan plan, Progress progress) {
        try {
            Kernel kernel = KernelFamilies.create(spec);
            OrthonormalCompression compression = estimator(kernel, fitting, LANDMARKS).compress(fitting, progress)
                    .whiten(withRungs(plan.largestRank()));
            List<BlockErrors> errors = heldOut.errors(compression, plan.largestRank(), progress);
            int rank = simplest(errors);
            return new Candidate(spec, place, Optional.of(new Fit(kernel, compression, rank, errors.get(rank - 1))),
                    Optional.empty(), "");
        } catch (Fault fault) {
            return new Candidate(spec, place, Optional.empty(), Optional.empty(), "Could not be fitted: " + fault.getMessage());
        }
    }

    private static Estimator estimator(Kernel kernel, Snapshots fitting, int landmarks) {
        return fitting.step().isPresent() ? new KernelStepEstimator(kernel, landmarks)
                : new OccupationEstimator(kernel, SegmentPlan.WHOLE_RUNS, 1);
    }

    /** The ladder climbs half the fitted rank above it. */
    private static int withRungs(int rank) {
        return rank + Math.max(LEAST_RUNGS_ABOVE, (rank + 1) / 2);
    }

    private static int simplest(List<BlockErrors> errors) {
        int best = 0;
        for (int k = 1; k < errors.size(); k++) {
            best = errors.get(k).relative() < errors.get(best).relative() ? k : best;
        }
        int rank = 0;
        while (!errors.get(rank).asGoodAs(errors.get(best))) {
            rank++;
        }
        return rank + 1;
    }

    /** Returns the relative error, NaN when it could not be fitted. */
    double error() {
        return fit.map(made -> made.errors().relative()).orElse(Double.NaN);
    }

    /** Returns whether it could be fitted. */
    boolean fitted() {
        return fit.isPresent();
    }

    /**
     * Returns the same with its verdict.
     *
     * @param split which part fits and which one judges
     */
    Candidate judged(Snapshots split, Progress progress) {
        try {
            return new Candidate(spec, place, fit, Optional.of(judge(fit.orElseThrow(), split, progress)), "");
        } catch (Fault fault) {
            return new Candidate(spec, place, fit, Optional.empty(), "Could not be judged: " + fault.getMessage());
        }
    }

    /** The fit with another step, which the judge compares rates with, needs fewer landmarks than the choice of the rank. */
    private static KernelVerdict judge(Fit made, Snapshots split, Progress progress) {
        Estimator estimator = estimator(made.kernel(), split, Math.min(LANDMARKS, Math.max(SECOND_STEP, PER_FUNCTION * made.rank())));
        FittedOperator operator = new FittedOperator(made.compression(), made.rank(), new RankRule.Fixed(made.rank()), "predicts held-out data as well as any, within noise", 0,
                estimator, estimator.describe(), estimator.kernel(), split, List.of());
        Spectrum spectrum = SpectrumExtractor.extract(operator, progress.part(0, 0.2));
        double longest = split.states(Snapshots.Part.TRAINING).stream().mapToDouble(Candidate::duration).max().orElse(0);
        return KernelVerdict.of(spectrum, WellPosedness.judge(split, operator, spectrum, JudgeSettings.DEFAULT.withReplays(0).withSplits(1), progress.part(0.2, 1)), longest);
    }

    private static double duration(StateRun run) {
        return run.times()[run.count() - 1] - run.times()[0];
    }

    RankedKernel ranked(double persistence) {
        return fit.map(made -> new RankedKernel(spec, made.rank(), error(), persistence, verdict, made.kernel().space().room(),
                failure.isEmpty() ? made.kernel().space().sentence() : failure))
                .orElseGet(() -> new RankedKernel(spec, 0, Double.NaN, Double.NaN, Optional.empty(), ModeRoom.UNKNOWN, failure));
    }
}
