package org.modestead.engine.operator;

import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.SampleNoise;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;

/**
 * What noise of the data adds to the moments of the functions q_1..q_R. With {@code G = Σ q(x) q(x)ᵀ}, {@code M = Σ q(x) q(y)ᵀ} (for a
 * generator the integrals over segments and the differences of their ends) least squares is {@code Ã = G⁻¹ M}. The moments of runs with as
 * much noise again exceed G and M by as much as those exceed the moments without noise, to first order in its variance, so
 *
 * <pre>    Ã_r = (G - θ ΔG)_r⁻¹ (M - θ ΔM)_r,    ΔG = mean G' - G,  ΔM = mean M' - M</pre>
 *
 * over noisier copies. θ is 1 unless noise makes more than half of some direction of G; then it is as large as leaves half of
 * it. (Simulation extrapolation, Cook and Stefanski, J. Am. Stat. Assoc. 89:1314, 1994, applied to moments; for polynomials that is
 * adjusted least squares, Cheng and Schneeweiss, J. R. Stat. Soc. B 60:189, 1998. Citations from memory.)
 *
 * @param gram G, R x R
 * @param action M, R x R
 * @param gramNoise ΔG, R x R
 * @param actionNoise ΔM, R x R
 */
public record NoiseMoments(DMatrixRMaj gram, DMatrixRMaj action, DMatrixRMaj gramNoise, DMatrixRMaj actionNoise) {

    private static final int PAIRS = 2;
    private static final long SEED = 4242;
    private static final double MOST = 0.5;

    /**
     * @param estimator that can tell what single runs say of given functions
     * @param snapshots fitted
     * @param functions q, as fitted without correction
     * @param progress polled for cancel
     */
    static NoiseMoments of(Estimator estimator, Snapshots snapshots, OrthonormalCompression functions, Progress progress) {
        SampleNoise level = level(snapshots, functions, progress);
        DMatrixRMaj[] plain = moments(estimator, snapshots, functions, progress);
        DMatrixRMaj gramNoise = Matrices.scaled(plain[0], -1);
        DMatrixRMaj actionNoise = Matrices.scaled(plain[1], -1);
        List<Snapshots> copies = level.disturbed(snapshots, PAIRS, SEED);
        for (Snapshots copy : copies) {
            DMatrixRMaj[] noisier = moments(estimator, copy, functions, progress);
            CommonOps_DDRM.add(gramNoise, 1.0 / copies.size(), noisier[0], gramNoise);
            CommonOps_DDRM.add(actionNoise, 1.0 / copies.size(), noisier[1], actionNoise);
        }
        return new NoiseMoments(plain[0], plain[1], gramNoise, actionNoise);
    }

    private static SampleNoise level(Snapshots snapshots, OrthonormalCompression functions, Progress progress) {
        List<StateRun> runs = snapshots.states(Snapshots.Part.TRAINING).stream().filter(run -> run.count() > 1)
                .map(run -> paced(run, functions.evolution())).filter(run -> run.count() > 1).toList();
        List<DMatrixRMaj> values = runs.stream().map(run -> functions.evaluate(functions.arguments(run))).toList();
        progress.checkCancelled();
        return SampleNoise.rough(snapshots).atMost(PredictionError.leastOfNewest(functions, runs, values, List.of(functions.rank()),
                snapshots.channels().size()));
    }

    /** States one step of the operator apart: part of a step is told by its rate alone, which is folded where the motion is faster than the step. */
    private static StateRun paced(StateRun run, Evolution evolution) {
        double sampling = run.meanStep();
        int stride = (int) Math.max(1, Math.round(evolution.step(sampling) / sampling));
        int[] kept = IntStream.range(0, run.count()).filter(k -> k % stride == 0).toArray();
        return stride == 1 ? run : new StateRun(run.id(), Arrays.stream(kept).mapToDouble(k -> run.times()[k]).toArray(),
                Matrices.rows(run.states(), kept), Matrices.rows(run.inputs(), kept), run.weight());
    }

    private static DMatrixRMaj[] moments(Estimator estimator, Snapshots snapshots, OrthonormalCompression functions, Progress progress) {
        int r = functions.rank();
        DMatrixRMaj[] out = {new DMatrixRMaj(r, r), new DMatrixRMaj(r, r)};
        estimator.observed(snapshots, functions).forEach(run -> {
            progress.checkCancelled();
            CommonOps_DDRM.multAddTransA(run.now(), run.now(), out[0]);
            CommonOps_DDRM.multAddTransA(run.now(), run.next(), out[1]);
        });
        return out;
    }

    /** The same for the leading r functions. */
    NoiseMoments leading(int r) {
        return new NoiseMoments(Matrices.block(gram, 0, r, 0, r), Matrices.block(action, 0, r, 0, r), Matrices.block(gramNoise, 0, r, 0, r),
                Matrices.block(actionNoise, 0, r, 0, r));
    }

    /** The same for other functions {@code q' = q C}; what noise adds is taken to be as large relative to the size of the moments. */
    NoiseMoments of(DMatrixRMaj c) {
        return new NoiseMoments(congruent(c, gram), congruent(c, action), congruent(c, gramNoise), congruent(c, actionNoise));
    }

    private static DMatrixRMaj congruent(DMatrixRMaj c, DMatrixRMaj a) {
        return Matrices.transposeProduct(c, Matrices.product(a, c));
    }

    /**
     * Corrects an action for these functions.
     *
     * @param measured Ã as least squares gives it, r x r
     * @return {@code (I - θ G⁻¹ΔG)⁻¹ (Ã - θ G⁻¹ΔM)}
     */
    DMatrixRMaj corrected(DMatrixRMaj measured) {
        double theta = share();
        DMatrixRMaj left = gram.copy();
        CommonOps_DDRM.addEquals(left, -theta, gramNoise);
        DMatrixRMaj right = Matrices.product(gram, measured);
        CommonOps_DDRM.addEquals(right, -theta, actionNoise);
        DMatrixRMaj out = measured.createLike();
        return CommonOps_DDRM.solve(left, right, out) ? out : measured;
    }

    /** θ: the largest share of ΔG in any direction, measured by G, decides. */
    private double share() {
        int r = gram.numRows;
        DMatrixRMaj relative = gramNoise.copy();
        for (int i = 0; i < r; i++) {
            for (int j = 0; j < r; j++) {
                double scale = Math.sqrt(gram.get(i, i) * gram.get(j, j));
                relative.set(i, j, scale > 0 ? (gramNoise.get(i, j) + gramNoise.get(j, i)) / (2 * scale) : 0);
            }
        }
        double largest = LinearAlgebra.installed().symmetricEigen(relative).values()[0];
        return largest > MOST ? MOST / largest : 1;
    }
}
