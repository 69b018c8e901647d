package org.modestead.engine.basis;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.linalg.Matrices;

/**
 * Occupation functions {@code Γ_i(x) = ∫ K(x, γ_i(t)) dt} of run segments, by quadrature over their samples.
 *
 * <p>Rosenfeld, Russo, Kamalapurkar and Johnson, "The occupation kernel method for nonlinear system identification",
 * CDC 2019: {@code <h, Γ_i> = ∫ h(γ_i(t)) dt}.
 *
 * @param kernel K
 * @param segments γ_i with their quadrature weights
 */
public record OccupationFunctions(Kernel kernel, List<Segment> segments) implements FunctionBasis {

    /**
     * One segment of a run.
     *
     * @param times sample times, length p, rising
     * @param states samples, p x N
     * @param weights quadrature weights, length p; see {@link Quadrature}
     * @param start state at the first time, length N, smoothed where asked
     * @param end state at the last time, length N, smoothed where asked
     * @param runWeight how much its run counts, positive
     */
    public record Segment(double[] times, DMatrixRMaj states, double[] weights, double[] start, double[] end, double runWeight) {

        /** A segment of a run of weight 1. */
        public Segment(double[] times, DMatrixRMaj states, double[] weights, double[] start, double[] end) {
            this(times, states, weights, start, end, 1);
        }
    }

    /** Takes an immutable copy. */
    public OccupationFunctions {
        segments = List.copyOf(segments);
    }

    @Override
    public int size() {
        return segments.size();
    }

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        DMatrixRMaj out = new DMatrixRMaj(states.numRows, segments.size());
        for (int j = 0; j < segments.size(); j++) {
            Segment segment = segments.get(j);
            DMatrixRMaj weights = DMatrixRMaj.wrap(segment.weights().length, 1, segment.weights());
            DMatrixRMaj column = Matrices.product(kernel.matrix(states, segment.states()), weights);
            for (int i = 0; i < states.numRows; i++) {
                out.data[i * out.numCols + j] = column.data[i];
            }
        }
        return out;
    }

    @Override
    public String describe() {
        return segments.size() + " occupation functions, " + kernel.spec().label();
    }
}
