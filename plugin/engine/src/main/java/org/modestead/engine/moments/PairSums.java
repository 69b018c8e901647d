package org.modestead.engine.moments;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Matrices;

/** Snapshot pairs summed up block by block, for one thread. */
final class PairSums {

    private final StreamPlan plan;
    private final Pilot pilot;
    private final boolean observed;
    private final CompensatedSums.Running gram;
    private final CompensatedSums.Running action;
    private final CompensatedSums.Running second;
    private final CompensatedSums.Running observable;
    private long pairs;

    PairSums(StreamPlan plan, Pilot pilot) {
        this.plan = plan;
        this.pilot = pilot;
        this.observed = Pilot.observed(plan) > 0;
        PairMoments none = none(plan, pilot);
        this.gram = new CompensatedSums.Running(none.gram());
        this.action = new CompensatedSums.Running(none.action());
        this.second = new CompensatedSums.Running(none.second());
        this.observable = new CompensatedSums.Running(none.observable());
    }

    static PairMoments none(StreamPlan plan, Pilot pilot) {
        return PairMoments.none(pilot.basis().size(), Pilot.observed(plan));
    }

    /**
     * Adds the pairs among the samples of a piece whose earlier states are numbered from, ..., to - 1.
     *
     * @param times of samples without a gap
     * @param values as recorded, row by row
     */
    void add(double[] times, double[] values, int from, int to) {
        int count = to - from;
        if (count <= 0) {
            return;
        }
        int n = plan.channels().size();
        DMatrixRMaj states = DelayedStates.of(plan.delay(), times, values, n, pilot.preparation(), from, to + plan.stride());
        DMatrixRMaj functions = pilot.conditioner().apply(pilot.basis().evaluate(states));
        DMatrixRMaj now = rows(functions, 0, count);
        DMatrixRMaj next = rows(functions, plan.stride(), plan.stride() + count);
        DMatrixRMaj block = Matrices.transposeProduct(now, now);
        gram.add(block.data);
        action.add(Matrices.transposeProduct(now, next).data);
        second.add(second(block, functions, next, count).data);
        if (observed) {
            observable.add(Matrices.transposeProduct(now, rows(states, 0, count)).data);
        }
        pairs += count;
    }

    /** Earlier and later states of a block are the same but for the first and the last few: their sum of squares differs by those only. */
    private DMatrixRMaj second(DMatrixRMaj block, DMatrixRMaj functions, DMatrixRMaj next, int count) {
        int stride = plan.stride();
        if (count < 4 * stride) {
            return Matrices.transposeProduct(next, next);
        }
        DMatrixRMaj first = rows(functions, 0, stride);
        DMatrixRMaj last = rows(functions, count, count + stride);
        double[] less = Matrices.transposeProduct(first, first).data;
        double[] more = Matrices.transposeProduct(last, last).data;
        DMatrixRMaj out = block.copy();
        for (int i = 0; i < less.length; i++) {
            out.data[i] += more[i] - less[i];
        }
        return out;
    }

    private static DMatrixRMaj rows(DMatrixRMaj a, int from, int to) {
        return Matrices.block(a, from, to, 0, a.numCols);
    }

    PairMoments total() {
        return new PairMoments(pairs, gram.total(), action.total(), second.total(), observable.total());
    }
}
