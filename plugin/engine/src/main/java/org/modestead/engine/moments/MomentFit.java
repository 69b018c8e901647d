package org.modestead.engine.moments;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.operator.Compression;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.FoldedCompression;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Snapshots;

/** From the moments of a pass to the operator that the fit in memory gives, with what was kept of the recording for later steps. */
public final class MomentFit {

    /** Beyond this condition of the conditioned sums, fewer than about ten digits are left. */
    private static final double UNLIKE = 1e6;

    private MomentFit() {}

    /**
     * @param moments of a pass that summed
     * @param rule how the rank is chosen; {@link RankRule.Holdout} looks at what was kept
     * @param ridge see {@link org.modestead.engine.operator.Ridge}; at least 0
     * @param progress polled for cancel
     * @throws FitFault if there is no pair, or the rank asked for is more than the data hold
     */
    public static FittedOperator fit(Moments moments, RankRule rule, double ridge, Progress progress) {
        StreamPlan plan = moments.plan();
        Pilot pilot = moments.pilot().orElseThrow(() -> new IllegalArgumentException("moments of a survey"));
        if (moments.pairs().pairs() == 0) {
            throw new FitFault("operator", "no piece of a run has the " + (plan.pairReach() + 1) + " samples that a pair of states needs",
                    "use longer runs, a smaller delay depth, or keep less away");
        }
        Preparation preparation = StreamPreparation.of(plan, moments.channels());
        boolean coordinates = plan.features() instanceof Features.Coordinates;
        Preparation used = coordinates ? preparation : pilot.preparation();
        Folding folding = Folding.of(moments.pairs(), pilot.conditioner());
        if (plan.features().innerProduct() == InnerProduct.DATA) {
            folding = folding.dividedBy(Math.sqrt(moments.pairs().pairs()));
        }
        Snapshots kept = KeptSnapshots.of(moments, used);
        Compression compression = coordinates ? linear(moments, folding.combined(shifted(plan, pilot.preparation(), used)))
                : compression(moments, pilot.basis(), folding, NoiseCorrection.NONE);
        FittedOperator fitted = OperatorFitter.fit(compression, kept, plan.features().estimator(plan.stride()), rule, ridge, progress);
        return withDoubts(fitted, moments, folding.condition());
    }

    private static Compression linear(Moments moments, Folding folding) {
        Folding observed = new Folding(folding.now(), folding.next(), folding.now(), folding.condition());
        return compression(moments, new Coordinates(moments.plan().stateSize()), observed,
                ((Features.Coordinates) moments.plan().features()).correction());
    }

    private static Compression compression(Moments moments, FunctionBasis functions, Folding folding, NoiseCorrection correction) {
        Evolution step = new Evolution.StepMap(moments.steps().mean() * moments.plan().stride());
        return FoldedCompression.of(functions, folding.now(), folding.next(), folding.target(), moments.plan().features().innerProduct(), step,
                correction, moments.pairs().pairs());
    }

    /** How components in the final preparation are combined from 1 and those in the first guess, (N + 1) x N. */
    private static DMatrixRMaj shifted(StreamPlan plan, Preparation guess, Preparation last) {
        int n = plan.channels().size();
        int size = plan.stateSize();
        DMatrixRMaj out = new DMatrixRMaj(size + 1, size);
        for (int j = 0; j < size; j++) {
            int c = j % n;
            out.set(0, j, (guess.offset()[c] - last.offset()[c]) / last.scale()[c]);
            out.set(j + 1, j, guess.scale()[c] / last.scale()[c]);
        }
        return out;
    }

    private static FittedOperator withDoubts(FittedOperator fitted, Moments moments, double condition) {
        List<Doubt> doubts = new ArrayList<>(fitted.doubts());
        long kept = moments.training().kept().stream().mapToLong(KeptStretch::samples).sum();
        if (kept < moments.counts().training()) {
            doubts.add(new Doubt("streamed", String.format(Locale.ROOT, "The operator rests on all %d training samples, read in one pass; %d of"
                    + " them were kept. Amplitudes, intervals and refits of later steps rest on the kept ones, so intervals are as wide as"
                    + " for a recording of that length.", moments.counts().training(), kept)));
        }
        if (condition > UNLIKE) {
            doubts.add(new Doubt("first-rows-unlike", String.format(Locale.ROOT, "The rows by which sums were balanced differ from the rest"
                    + " (condition %.2g): about %d digits of the sums are good.", condition, Math.max(0, (int) (15.5 - Math.log10(condition))))));
        }
        return new FittedOperator(fitted.functions(), fitted.rank(), fitted.rule(), fitted.rankChoice(), fitted.ridge(), fitted.estimator(),
                fitted.method() + ", in one pass", fitted.kernel(), fitted.snapshots(), doubts);
    }
}
