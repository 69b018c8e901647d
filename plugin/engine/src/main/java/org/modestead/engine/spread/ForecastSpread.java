package org.modestead.engine.spread;

import java.util.Arrays;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.InnerProduct;

/**
 * How forecasts of a step map spread: because another recording would have given another operator, and because what one step
 * leaves over piles up. Both in prepared units, for the newest sample of the state, from powers of the operator alone.
 *
 * <pre>
 *   fit:    distances |q(x) (P_b^h B_b - P^h B)| over replicates b
 *   noise:  s_h² = Σ_{k<h} diag (P^k B)ᵀ R (P^k B),  R the covariance of q(y) - q(x) P over the training pairs
 * </pre>
 *
 * <p><b>Weakness.</b> What is left over is taken as independent from step to step and alike everywhere.
 */
public final class ForecastSpread {

    private static final int HIGHEST_RANK = 80;

    private final FittedOperator operator;
    private final Frame frame;
    private final Replicates replicates;
    private final Refit fitted;
    private final Moments sums;
    private final int channels;
    private final SpreadPlan plan;

    private ForecastSpread(FittedOperator operator, Replicates replicates, Moments sums, Refit fitted, SpreadPlan plan) {
        this.operator = operator;
        this.frame = replicates.frame();
        this.replicates = replicates;
        this.sums = sums;
        this.fitted = fitted;
        this.channels = operator.snapshots().channels().size();
        this.plan = plan;
    }

    /**
     * Repeats the fit.
     *
     * @param operator fitted
     * @param plan level of the half widths, replicates and seed
     * @param progress polled for cancel
     * @return empty where forecasts are not powers of a step map on the state alone (generators, separated inputs), where nothing can
     *     be resampled, and above rank 80, where it would take long
     */
    public static Optional<ForecastSpread> of(FittedOperator operator, SpreadPlan plan, Progress progress) {
        boolean power = operator.evolution() instanceof Evolution.StepMap && operator.functions().inputs().isEmpty();
        if (!power || operator.rank() > HIGHEST_RANK) {
            return Optional.empty();
        }
        Replicates replicates = Replicates.of(operator, plan, progress);
        if (replicates.refits().isEmpty()) {
            return Optional.empty();
        }
        double[] once = new double[replicates.resampling().cells().size()];
        Arrays.fill(once, 1);
        Moments sums = Moments.sum(replicates.resampling().cells(), once);
        return replicates.frame().refit(sums).map(fitted -> new ForecastSpread(operator, replicates, sums, fitted, plan));
    }

    /**
     * Returns how far forecasts from a state may be off because of the fit.
     *
     * @param state 1 x N
     * @param steps longest lead, at least 1
     * @return steps x channels, half widths at the level of the plan; infinite or NaN where forecasts overflow
     */
    public DMatrixRMaj fit(DMatrixRMaj state, int steps) {
        DMatrixRMaj functions = frame.functions().evaluate(state);
        if (frame.functions().innerProduct() == InnerProduct.SPACE) {
            CommonOps_DDRM.divideCols(functions, frame.scale());
        }
        double[] centre = forecast(fitted, functions, steps).data;
        double[][] distances = new double[centre.length][replicates.refits().size()];
        for (int b = 0; b < replicates.refits().size(); b++) {
            double[] other = forecast(replicates.refits().get(b), functions, steps).data;
            for (int i = 0; i < centre.length; i++) {
                distances[i][b] = replicates.stretch() * Math.abs(other[i] - centre[i]);
            }
        }
        double reach = Replicated.reach(plan.level(), replicates.resampling().units()) / NormalQuantiles.normal((1 + plan.level()) / 2);
        DMatrixRMaj out = new DMatrixRMaj(steps, channels);
        for (int i = 0; i < centre.length; i++) {
            Arrays.sort(distances[i]);
            out.data[i] = reach * Replicated.quantile(distances[i], plan.level());
        }
        return out;
    }

    private DMatrixRMaj forecast(Refit refit, DMatrixRMaj functions, int steps) {
        DMatrixRMaj out = new DMatrixRMaj(steps, channels);
        for (int j = 0; j < refit.eigenvalues().size(); j++) {
            Complex phi = Complex.ZERO;
            for (int k = 0; k < functions.numCols; k++) {
                phi = phi.plus(ComplexMatrices.entry(refit.functions(), k, j).times(functions.get(0, k)));
            }
            for (int h = 0; h < steps; h++) {
                phi = phi.times(refit.eigenvalues().get(j));
                for (int c = 0; c < channels; c++) {
                    out.data[h * channels + c] += phi.times(ComplexMatrices.entry(refit.weights(), j, c)).re();
                }
            }
        }
        return out;
    }

    /**
     * Returns how what one step leaves over piles up with the lead.
     *
     * @param steps longest lead, at least 1
     * @return steps x channels, standard deviations up to a common factor, never falling with the lead
     */
    public DMatrixRMaj noise(int steps) {
        int r = frame.rank();
        DMatrixRMaj step = operator.chosen().action();
        DMatrixRMaj newest = Matrices.block(operator.chosen().observable(), 0, r, 0, channels);
        DMatrixRMaj left = leftOver(step);
        double[] variance = new double[channels];
        DMatrixRMaj out = new DMatrixRMaj(steps, channels);
        for (int h = 0; h < steps; h++) {
            DMatrixRMaj moved = Matrices.product(left, newest);
            for (int c = 0; c < channels; c++) {
                double added = 0;
                for (int k = 0; k < r; k++) {
                    added += newest.get(k, c) * moved.get(k, c);
                }
                variance[c] += Math.max(0, added);
                out.set(h, c, Math.sqrt(variance[c]));
            }
            newest = Matrices.product(step, newest);
        }
        return out;
    }

    /** Sum over the training pairs of the outer squares of {@code q(y) - q(x) P}, r x r. */
    private DMatrixRMaj leftOver(DMatrixRMaj step) {
        DMatrixRMaj gram = head(sums.gram());
        DMatrixRMaj cross = head(sums.cross());
        DMatrixRMaj explained = Matrices.transposeProduct(step, cross);
        DMatrixRMaj out = head(sums.second());
        CommonOps_DDRM.addEquals(out, Matrices.transposeProduct(step, Matrices.product(gram, step)));
        CommonOps_DDRM.subtractEquals(out, explained);
        CommonOps_DDRM.subtractEquals(out, CommonOps_DDRM.transpose(explained, null));
        return out;
    }

    /** The sums of the leading r functions q, which are the p times their scale in the kernel's space. */
    private DMatrixRMaj head(DMatrixRMaj sum) {
        DMatrixRMaj out = Matrices.block(sum, 0, frame.rank(), 0, frame.rank());
        if (frame.functions().innerProduct() == InnerProduct.SPACE) {
            CommonOps_DDRM.multRows(frame.scale(), out);
            CommonOps_DDRM.multCols(out, frame.scale());
        }
        return out;
    }
}
