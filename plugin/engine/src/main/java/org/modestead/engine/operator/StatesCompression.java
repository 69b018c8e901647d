package org.modestead.engine.operator;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebra.SymmetricEigen;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;

/**
 * The linear step map on states of very many components, of which there are far fewer: all arrays come from the states X themselves, which are
 * held once, not once as earlier and once as later ones. The products of states with each other, {@code X Xᵀ}, tell the singular values; only
 * as many functions are made as are asked for, see {@link StateFunctions}. Sirovich, Quart. Appl. Math. 45:561, 1987 (method of snapshots).
 *
 * @param states X, M x N, all states of all runs in order
 * @param now the m rows that have a later one
 * @param stride rows from there to the later one
 * @param weights m, what an earlier and its later state are multiplied by, squares summing to 1
 * @param step time between the two
 */
record StatesCompression(DMatrixRMaj states, int[] now, int stride, double[] weights, double step) implements Compression {

    /** Fewer entries are no burden, and few states are not worth another way. */
    private static final int LARGE = 1 << 22;
    private static final int WIDE = 4;
    private static final int WORTH_IT = 16;
    /** Share of the largest squared singular value below which the rounding of products, ε of the largest, would blur a singular value by 1e-6. */
    private static final double KNOWN = 1e-10;

    /** Returns the compression where states have far more components than there are pairs of them. */
    static Optional<StatesCompression> of(Snapshots snapshots, int stride) {
        long size = snapshots.stateSize();
        long pairs = StatePairs.number(snapshots, stride);
        if (snapshots.step().isEmpty() || pairs < WORTH_IT || size < WIDE * pairs || size * pairs < LARGE) {
            return Optional.empty();
        }
        List<StateRun> runs = snapshots.states(Snapshots.Part.TRAINING).stream().filter(run -> run.count() > stride).toList();
        int[] now = new int[(int) pairs];
        double[] weights = new double[(int) pairs];
        int at = 0;
        int row = 0;
        for (StateRun run : runs) {
            for (int k = 0; k < run.count() - stride; k++, at++) {
                now[at] = row + k;
                weights[at] = run.weight();
            }
            row += run.count();
        }
        double total = Arrays.stream(weights).sum();
        double[] roots = Arrays.stream(weights).map(weight -> Math.sqrt(weight / total)).toArray();
        return Optional.of(new StatesCompression(joined(runs, row), now, stride, roots, stride * snapshots.step().getAsDouble()));
    }

    private static DMatrixRMaj joined(List<StateRun> runs, int rows) {
        if (runs.size() == 1) {
            return runs.get(0).states();
        }
        DMatrixRMaj out = new DMatrixRMaj(rows, runs.get(0).states().numCols);
        int at = 0;
        for (StateRun run : runs) {
            System.arraycopy(run.states().data, 0, out.data, at, run.states().getNumElements());
            at += run.states().getNumElements();
        }
        return out;
    }

    @Override
    public FunctionBasis basis() {
        return new Coordinates(states.numCols);
    }

    @Override
    public DMatrixRMaj gram() {
        return factored().gram();
    }

    @Override
    public DMatrixRMaj action() {
        return factored().action();
    }

    @Override
    public DMatrixRMaj second() {
        return factored().second();
    }

    @Override
    public DMatrixRMaj observable() {
        return factored().observable();
    }

    @Override
    public OrthonormalCompression whiten(int largest) {
        return factored().whiten(largest);
    }

    /** All at once where singular values are so small that products of states do not show them. */
    @Override
    public Whitened whitened(int largest) {
        SymmetricEigen eigen = LinearAlgebra.installed().symmetricEigen(products());
        int rank = Math.min(largest, now.length);
        return eigen.values()[rank - 1] > KNOWN * eigen.values()[0] ? new StagedFunctions(new StateFunctions(this, eigen, rank))
                : whiten(largest);
    }

    /** The products of the weighted earlier states, m x m. */
    private DMatrixRMaj products() {
        DMatrixRMaj all = Matrices.productTranspose(states, states);
        DMatrixRMaj out = new DMatrixRMaj(now.length, now.length);
        for (int i = 0; i < now.length; i++) {
            for (int j = 0; j < now.length; j++) {
                out.set(i, j, weights[i] * weights[j] * all.get(now[i], now[j]));
            }
        }
        return out;
    }

    /** Returns weighted rows of what has one row a state: those of the earlier states, or those so many rows later. */
    DMatrixRMaj weighted(DMatrixRMaj a, int later) {
        DMatrixRMaj out = Matrices.rows(a, IntStream.of(now).map(row -> row + later).toArray());
        for (int i = 0; i < now.length; i++) {
            for (int k = i * out.numCols; k < (i + 1) * out.numCols; k++) {
                out.data[k] *= weights[i];
            }
        }
        return out;
    }

    /** Returns a sum over pairs as one over all states: {@code weighted(X, 0)ᵀ A = Xᵀ spread(A)}. */
    DMatrixRMaj spread(DMatrixRMaj a) {
        DMatrixRMaj out = new DMatrixRMaj(states.numRows, a.numCols);
        for (int i = 0; i < now.length; i++) {
            for (int k = 0; k < a.numCols; k++) {
                out.set(now[i], k, weights[i] * a.get(i, k));
            }
        }
        return out;
    }

    private FactoredCompression factored() {
        DMatrixRMaj earlier = weighted(states, 0);
        return new FactoredCompression(basis(), earlier, weighted(states, stride), earlier, InnerProduct.DATA, new Evolution.StepMap(step),
                NoiseCorrection.NONE);
    }
}
