package org.modestead.engine.choose;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.MatrixExponential;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.recording.StateRun;

/**
 * States held out while choosing, in pairs some sampling steps apart: all of them, or evenly spaced ones where there are very many.
 * On uneven times every pair is taken for the mean distance in time, so that jitter of the steps sets a floor that all candidates share.
 *
 * @param now p x N earlier states, run after run
 * @param later p x N the same some steps later
 * @param time mean time between them
 * @param steps sampling steps between them
 */
record HeldOutData(DMatrixRMaj now, DMatrixRMaj later, double time, int steps) {

    private static final int MOST = 2000;
    private static final int BLOCKS = 10;

    /** @throws FitFault if no run is longer than the steps */
    static HeldOutData of(List<StateRun> runs, int steps) {
        int total = runs.stream().mapToInt(run -> Math.max(0, run.count() - steps)).sum();
        if (total == 0) {
            throw new FitFault("choice by held-out data", "no held-out run is longer than " + steps + " steps",
                    "predict fewer steps ahead, or use longer runs");
        }
        int every = (total + MOST - 1) / MOST;
        int n = runs.get(0).states().numCols;
        int kept = (total + every - 1) / every;
        DMatrixRMaj now = new DMatrixRMaj(kept, n);
        DMatrixRMaj later = new DMatrixRMaj(kept, n);
        double time = 0;
        int seen = 0;
        for (StateRun run : runs) {
            for (int k = 0; k + steps < run.count(); k++, seen++) {
                time += (run.times()[k + steps] - run.times()[k]) / total;
                if (seen % every == 0) {
                    System.arraycopy(run.states().data, k * n, now.data, seen / every * n, n);
                    System.arraycopy(run.states().data, (k + steps) * n, later.data, seen / every * n, n);
                }
            }
        }
        return new HeldOutData(now, later, time, steps);
    }

    /** Errors {@code y - q(x)ᵀ P <g, q>} of the compression at each of its ranks, from 1 on. */
    List<BlockErrors> errors(OrthonormalCompression compression, int largest, Progress progress) {
        DMatrixRMaj functions = compression.evaluate(now);
        List<BlockErrors> errors = new ArrayList<>();
        for (int rank = 1; rank <= Math.min(largest, compression.rank()); rank++) {
            progress.checkCancelled();
            OrthonormalCompression rung = compression.leading(rank);
            DMatrixRMaj carried = Matrices.product(propagator(rung), rung.observable());
            errors.add(blocks(Matrices.product(Matrices.block(functions, 0, functions.numRows, 0, rank), carried)));
        }
        return errors;
    }

    /** Errors of predicting no change. */
    BlockErrors persistence() {
        return blocks(now);
    }

    private DMatrixRMaj propagator(OrthonormalCompression rung) {
        return rung.evolution() instanceof Evolution.StepMap ? Matrices.power(rung.action(), steps)
                : MatrixExponential.of(Matrices.scaled(rung.action(), time));
    }

    private BlockErrors blocks(DMatrixRMaj predicted) {
        int p = now.numRows;
        int count = Math.min(BLOCKS, p);
        double[] squared = new double[count];
        for (int b = 0; b < count; b++) {
            int from = (int) ((long) b * p / count);
            int to = (int) ((long) (b + 1) * p / count);
            double sum = 0;
            for (int i = from * now.numCols; i < to * now.numCols; i++) {
                double missed = predicted.data[i] - later.data[i];
                sum += missed * missed;
            }
            squared[b] = sum / (to - from) / spread();
        }
        return new BlockErrors(squared);
    }

    /** Mean squared distance of a later state from their mean. */
    private double spread() {
        double sum = 0;
        for (int k = 0; k < later.numCols; k++) {
            int column = k;
            double mean = IntStream.range(0, later.numRows).mapToDouble(i -> later.get(i, column)).average().orElse(0);
            sum += IntStream.range(0, later.numRows).mapToDouble(i -> Math.pow(later.get(i, column) - mean, 2)).average().orElse(0);
        }
        return sum;
    }
}
