package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;

/**
 * The constant and {@code cos(2π n x_k/period_k), sin(2π n x_k/period_k)}, n = 1..order, for every component of states of a known size.
 *
 * @param order highest harmonic, at least 1
 * @param periods one a component, or a single one for all; positive; not modified
 * @param stateSize N
 * @param description what they are
 */
public record Harmonics(int order, double[] periods, int stateSize, String description) implements FunctionBasis {

    @Override
    public int size() {
        return 1 + 2 * order * stateSize;
    }

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        DMatrixRMaj out = new DMatrixRMaj(states.numRows, size());
        for (int i = 0; i < states.numRows; i++) {
            int at = i * size();
            out.data[at++] = 1;
            for (int k = 0; k < stateSize; k++) {
                double angle = 2 * Math.PI * states.get(i, k) / periods[periods.length == 1 ? 0 : k];
                for (int n = 1; n <= order; n++) {
                    out.data[at++] = Math.cos(n * angle);
                    out.data[at++] = Math.sin(n * angle);
                }
            }
        }
        return out;
    }

    @Override
    public String describe() {
        return size() + " " + description;
    }
}
