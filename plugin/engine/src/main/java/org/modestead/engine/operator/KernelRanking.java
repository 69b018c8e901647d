package org.modestead.engine.operator;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.recording.Snapshots;

/** Ranks kernels by how well an operator in their space predicts training data that were left out. */
public final class KernelRanking {

    private static final int LANDMARKS = 200;

    private KernelRanking() {}

    /**
     * @param largestRank largest rank tried for each kernel, at least 1
     */
    public record Plan(int largestRank) {}

    /**
     * One candidate.
     *
     * @param kernel family and parameters
     * @param rank at which it predicts best; 0 when it could not be fitted
     * @param holdoutError one-step error relative to the spread, NaN when it could not be fitted
     * @param persistenceError of predicting no change, same measure
     * @param note what the space cannot hold, or why it could not be fitted
     */
    public record Row(KernelSpec kernel, int rank, double holdoutError, double persistenceError, String note) {}

    /**
     * Fits every candidate to three quarters of the training data and judges it on the rest: the step map on a uniform
     * step, the generator on uneven times.
     *
     * @return one row a candidate, smallest error first, those that failed last
     */
    public static List<Row> rank(Snapshots snapshots, List<KernelSpec> candidates, Plan plan, Progress progress) {
        InnerSplit split = InnerSplit.of(snapshots);
        List<Row> rows = new ArrayList<>();
        for (int i = 0; i < candidates.size(); i++) {
            progress.report((double) i / candidates.size(), candidates.get(i).label());
            progress.checkCancelled();
            rows.add(row(split, candidates.get(i), plan, progress));
        }
        rows.sort(Comparator.comparingDouble(row -> Double.isNaN(row.holdoutError()) ? Double.POSITIVE_INFINITY : row.holdoutError()));
        return List.copyOf(rows);
    }

    private static Row row(InnerSplit split, KernelSpec spec, Plan plan, Progress progress) {
        try {
            Kernel kernel = KernelFamilies.create(spec);
            Estimator estimator = split.fitting().step().isPresent() ? new KernelStepEstimator(kernel, LANDMARKS)
                    : new OccupationEstimator(kernel, SegmentPlan.WHOLE_RUNS, 1);
            OrthonormalCompression compression = estimator.compress(split.fitting(), progress).whiten(plan.largestRank());
            PredictionError.Best best = PredictionError.bestRank(compression, split.judging(), progress);
            return new Row(spec, best.rank(), best.error(), best.persistence(), kernel.space().sentence());
        } catch (Fault fault) {
            return new Row(spec, 0, Double.NaN, Double.NaN, String.format(Locale.ROOT, "Could not be fitted: %s", fault.getMessage()));
        }
    }
}
