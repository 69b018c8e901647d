package org.modestead.engine.operator;

import java.util.Arrays;
import java.util.List;
import java.util.function.Function;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.linalg.MatrixExponential;
import org.modestead.engine.recording.StateRun;

/**
 * How well a compression predicts the state one sampling step ahead:
 * {@code ‖y - q(x)ᵀ P <g, q>‖ / ‖y - mean y‖} over given runs. On uneven times every step of a run is taken for its
 * mean step, so that jitter of the steps sets a floor that all candidates share. What
 * known inputs explain of y at once is taken off first, where they are separated.
 */
public final class PredictionError {

    /** An error within half a per cent of the least is as good, and the lowest such rank is taken. */
    private static final double NO_BETTER = 1.005;

    private PredictionError() {}

    /**
     * @param rank with the smallest error
     * @param error relative, 0 is perfect, 1 no better than the mean
     */
    record Best(int rank, double error) {}

    static Best bestRank(OrthonormalCompression compression, List<StateRun> runs, Progress progress) {
        List<Integer> ranks = IntStream.rangeClosed(1, compression.rank()).boxed().toList();
        List<DMatrixRMaj> functions = runs.stream().map(run -> compression.evaluate(compression.arguments(run))).toList();
        double[] errors = relative(compression, runs, functions, ranks, progress);
        double[] far = halfwayAhead(compression, runs, functions, ranks, progress);
        double least = Double.POSITIVE_INFINITY;
        for (int r = 0; r < errors.length; r++) {
            errors[r] = Math.hypot(errors[r], far[r]);
            least = Math.min(least, errors[r]);
        }
        int best = 0;
        while (!(errors[best] <= NO_BETTER * least)) {
            best++;
        }
        return new Best(best + 1, errors[best]);
    }

    /** Errors of predicting the state half a run ahead, where spurious modes have had time to grow; 0 where inputs drive it on the way. */
    private static double[] halfwayAhead(OrthonormalCompression compression, List<StateRun> runs, List<DMatrixRMaj> functions,
            List<Integer> ranks, Progress progress) {
        if (compression.inputs().isPresent()) {
            return new double[ranks.size()];
        }
        double[] errors = errors(compression, runs, functions, ranks, progress, run -> {
            int steps = Math.max(1, (run.count() - 1) / 2);
            return new Ahead(steps, Matrices.block(run.states(), steps, run.count(), 0, run.states().numCols));
        });
        return Arrays.stream(errors).map(error -> Double.isNaN(error) ? Double.POSITIVE_INFINITY : error).toArray();
    }

    /** How far is predicted, and what is to be hit there. */
    private record Ahead(int steps, DMatrixRMaj states) {}

    private static double[] errors(OrthonormalCompression compression, List<StateRun> runs, List<DMatrixRMaj> functions,
            List<Integer> ranks, Progress progress, Function<StateRun, Ahead> ahead) {
        double[] errors = new double[ranks.size()];
        Carriers carriers = new Carriers(compression, compression.observable().numCols, ranks.size());
        double spread = 0;
        for (int i = 0; i < runs.size(); i++) {
            StateRun run = runs.get(i);
            Ahead goal = ahead.apply(run);
            for (int k = 0; k < errors.length; k++) {
                progress.checkCancelled();
                DMatrixRMaj carried = carriers.of(k, ranks.get(k), run.meanStep(), goal.steps());
                DMatrixRMaj now = Matrices.block(functions.get(i), 0, run.count() - goal.steps(), 0, ranks.get(k));
                errors[k] += squaredDistance(Matrices.product(now, carried), goal.states());
            }
            spread += squaredSpread(goal.states());
        }
        for (int k = 0; k < errors.length; k++) {
            errors[k] = Math.sqrt(errors[k] / spread);
        }
        return errors;
    }

    /** What carries the functions of each rank to the state ahead; made again only where a run's step or reach differs from that of the run before. */
    private static final class Carriers {
        private final OrthonormalCompression compression;
        private final int components;
        private final double[] step;
        private final int[] steps;
        private final DMatrixRMaj[] carried;

        /** @param components of the state, from the first on */
        Carriers(OrthonormalCompression compression, int components, int ranks) {
            this.compression = compression;
            this.components = components;
            this.step = new double[ranks];
            this.steps = new int[ranks];
            this.carried = new DMatrixRMaj[ranks];
        }

        DMatrixRMaj of(int k, int rank, double time, int ahead) {
            if (carried[k] == null || step[k] != time || steps[k] != ahead) {
                OrthonormalCompression rung = compression.leading(rank);
                carried[k] = Matrices.product(propagator(rung, time, ahead), Matrices.block(rung.observable(), 0, rank, 0, components));
                step[k] = time;
                steps[k] = ahead;
            }
            return carried[k];
        }
    }

    private static DMatrixRMaj propagator(OrthonormalCompression rung, double step, int steps) {
        return rung.evolution() instanceof Evolution.StepMap ? Matrices.power(rung.action(), steps)
                : MatrixExponential.of(Matrices.scaled(rung.action(), steps * step));
    }

    /**
     * @param compression up to rank R
     * @param runs on which it is judged, at least two states each
     * @param functions per run, p x R values of the orthonormal functions at its states
     * @param ranks to judge, each in [1, R]
     * @param progress polled once a run and rank
     * @return relative errors in the order of the ranks; 0 is perfect, 1 no better than the mean
     */
    public static double[] relative(OrthonormalCompression compression, List<StateRun> runs, List<DMatrixRMaj> functions,
            List<Integer> ranks, Progress progress) {
        return errors(compression, runs, functions, ranks, progress, run -> new Ahead(1, compression.signalAhead(run)));
    }

    /**
     * How closely the newest sample of the next state can be predicted at all: the smallest root mean square error over the ranks,
     * channel by channel. No prediction foresees noise, so this bounds the noise of a channel from above.
     *
     * @param compression up to rank R
     * @param runs on which it is judged, at least two states each
     * @param functions per run, p x R values of the orthonormal functions at its states
     * @param ranks to judge, each in [1, R]
     * @param channels n, the first n state components are the newest sample
     * @return length n, in prepared units
     */
    public static double[] leastOfNewest(OrthonormalCompression compression, List<StateRun> runs, List<DMatrixRMaj> functions,
            List<Integer> ranks, int channels) {
        double[] least = new double[channels];
        Arrays.fill(least, Double.POSITIVE_INFINITY);
        Carriers carriers = new Carriers(compression, channels, ranks.size());
        for (int k = 0; k < ranks.size(); k++) {
            int rank = ranks.get(k);
            double[] squares = new double[channels];
            int count = 0;
            for (int i = 0; i < runs.size(); i++) {
                StateRun run = runs.get(i);
                DMatrixRMaj carried = carriers.of(k, rank, run.meanStep(), 1);
                DMatrixRMaj predicted = Matrices.product(Matrices.block(functions.get(i), 0, run.count() - 1, 0, rank), carried);
                DMatrixRMaj next = compression.signalAhead(run);
                for (int at = 0; at < predicted.getNumElements(); at++) {
                    squares[at % channels] += Math.pow(predicted.data[at] - next.get(at / channels, at % channels), 2);
                }
                count += predicted.numRows;
            }
            for (int c = 0; c < channels; c++) {
                double missed = Math.sqrt(squares[c] / count);
                // of a rank whose growth leaves the range of numbers within one step nothing is learnt
                least[c] = Double.isNaN(missed) ? least[c] : Math.min(least[c], missed);
            }
        }
        return least;
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
