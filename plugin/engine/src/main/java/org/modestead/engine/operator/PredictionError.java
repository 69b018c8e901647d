package org.modestead.engine.operator;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.MatrixExponential;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.StateRun;

/**
 * How well a compression predicts the state one sampling step ahead:
 * {@code ‖y - q(x)ᵀ P <g, q>‖ / ‖y - mean y‖} over given runs. On uneven times every step of a run is taken for its
 * mean step, so that jitter of the steps sets a floor that all candidates share.
 */
final class PredictionError {

    private PredictionError() {}

    /**
     * @param rank with the smallest error
     * @param error relative, 0 is perfect, 1 no better than the mean
     * @param persistence error of predicting no change
     */
    record Best(int rank, double error, double persistence) {}

    static Best bestRank(OrthonormalCompression compression, List<StateRun> runs, Progress progress) {
        double[] squared = new double[compression.rank()];
        double persistence = 0;
        double spread = 0;
        for (StateRun run : runs) {
            DMatrixRMaj now = Matrices.block(run.states(), 0, run.count() - 1, 0, run.states().numCols);
            DMatrixRMaj next = Matrices.block(run.states(), 1, run.count(), 0, run.states().numCols);
            double step = (run.times()[run.count() - 1] - run.times()[0]) / (run.count() - 1);
            DMatrixRMaj functions = compression.evaluate(now);
            for (int r = 1; r <= compression.rank(); r++) {
                progress.checkCancelled();
                OrthonormalCompression rung = compression.leading(r);
                DMatrixRMaj carried = Matrices.product(propagator(rung, step), rung.observable());
                squared[r - 1] += squaredDistance(Matrices.product(Matrices.block(functions, 0, now.numRows, 0, r), carried), next);
            }
            persistence += squaredDistance(now, next);
            spread += squaredSpread(next);
        }
        int best = 0;
        for (int r = 1; r < squared.length; r++) {
            best = squared[r] < squared[best] ? r : best;
        }
        return new Best(best + 1, Math.sqrt(squared[best] / spread), Math.sqrt(persistence / spread));
    }

    private static DMatrixRMaj propagator(OrthonormalCompression rung, double step) {
        return rung.evolution() instanceof Evolution.StepMap ? rung.action() : MatrixExponential.of(Matrices.scaled(rung.action(), step));
    }

    private static double squaredDistance(DMatrixRMaj a, DMatrixRMaj b) {
        double sum = 0;
        for (int i = 0; i < a.getNumElements(); i++) {
            double d = a.data[i] - b.data[i];
            sum += d * d;
        }
        return sum;
    }

    private static double squaredSpread(DMatrixRMaj a) {
        double sum = 0;
        for (int k = 0; k < a.numCols; k++) {
            double mean = 0;
            for (int i = 0; i < a.numRows; i++) {
                mean += a.get(i, k) / a.numRows;
            }
            for (int i = 0; i < a.numRows; i++) {
                double d = a.get(i, k) - mean;
                sum += d * d;
            }
        }
        return sum;
    }
}
