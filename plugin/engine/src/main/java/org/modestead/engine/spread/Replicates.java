package org.modestead.engine.spread;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.concurrent.atomic.AtomicInteger;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.ObservedRun;

/**
 * The fit, repeated with resampled observations.
 *
 * <p>Whole runs are drawn as they come. Blocks of few runs differ much in what they tell (the beginning of a transient tells
 * most), so that a replicate without one of them says nothing of the recording's own spread: there every observation is kept, with
 * the weight {@code 1 + δ(c - 1)} instead of c, {@code δ = 1/4}, and what changes is multiplied by {@code 1/δ} again. For a
 * figure that depends linearly on the weights this is the same.
 *
 * @param frame within which the fit is repeated
 * @param resampling what was drawn
 * @param stretch 1/δ
 * @param refits those that succeeded, in the order drawn
 */
record Replicates(Frame frame, Resampling resampling, double stretch, List<Refit> refits) {

    private static final double KEPT = 0.25;

    /** Draws whose sums are held at a time. */
    private static final int TOGETHER = 50;

    /** @return empty list of refits where the estimator offers no observations */
    static Replicates of(FittedOperator operator, SpreadPlan plan, Progress progress) {
        Frame frame = Frame.of(operator);
        List<ObservedRun> runs = observed(operator, frame);
        if (runs.isEmpty()) {
            return new Replicates(frame, new Resampling(List.of(), 1, 0, false, "nothing"), 1, List.of());
        }
        Resampling resampling = Resampling.of(runs, operator.snapshots().delay().reach() + 1);
        double share = resampling.wholeRuns() ? 1 : KEPT;
        List<double[]> draws = draws(resampling, plan);
        AtomicInteger done = new AtomicInteger();
        List<Refit> refits = new ArrayList<>();
        for (int from = 0; from < draws.size(); from += TOGETHER) {
            progress.checkCancelled();
            List<double[]> some = draws.subList(from, Math.min(from + TOGETHER, draws.size())).stream().map(times -> kept(times, share)).toList();
            refits.addAll(Moments.sums(resampling.cells(), some).parallelStream().map(drawn -> {
                progress.checkCancelled();
                Optional<Refit> refit = frame.refit(drawn);
                synchronized (done) { // told in order
                    progress.report((double) done.incrementAndGet() / plan.replicates(), "replicate " + done.get());
                }
                return refit;
            }).flatMap(Optional::stream).toList());
        }
        return new Replicates(frame, resampling, 1 / share, List.copyOf(refits));
    }

    /** All are drawn from one generator before any is fitted, so that the fits may run beside each other. */
    private static List<double[]> draws(Resampling resampling, SpreadPlan plan) {
        Random random = new Random(plan.seed());
        List<double[]> draws = new ArrayList<>();
        for (int b = 0; b < plan.replicates(); b++) {
            draws.add(resampling.draw(random));
        }
        return draws;
    }

    private static double[] kept(double[] times, double share) {
        double[] out = new double[times.length];
        for (int k = 0; k < times.length; k++) {
            out[k] = 1 + share * (times[k] - 1);
        }
        return out;
    }

    /** Of the observable only the newest and the oldest sample of each state are followed. */
    private static List<ObservedRun> observed(FittedOperator operator, Frame frame) {
        int channels = operator.snapshots().channels().size();
        return operator.estimator().observed(operator.snapshots(), frame.functions())
                .map(run -> frame.scaled(run).withTarget(ends(run.target(), channels))).toList();
    }

    private static DMatrixRMaj ends(DMatrixRMaj states, int channels) {
        return CommonOps_DDRM.concatColumnsMulti(Matrices.block(states, 0, states.numRows, 0, channels),
                Matrices.block(states, 0, states.numRows, states.numCols - channels, states.numCols));
    }
}
