package org.modestead.engine.basis;

import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;

/**
 * Sines and cosines of each state component: for angles and other periodic quantities. The real forms span the same
 * functions as the complex exponentials {@code e^(2πi n x/period)}, |n| &lt;= order.
 *
 * @param order highest harmonic, at least 1
 * @param periods one a component, or a single one for all; positive
 */
record FourierDictionary(int order, double[] periods) implements Dictionary {

    FourierDictionary {
        if (order < 1) {
            throw new FitFault("dictionary", "the order is " + order, "give an order of at least 1");
        }
        for (double period : periods) {
            if (!(period > 0)) {
                throw new FitFault("dictionary", "a period is " + period, "give positive periods");
            }
        }
    }

    @Override
    public String describe() {
        return "sines and cosines up to harmonic " + order;
    }

    @Override
    public FunctionBasis on(int stateSize) {
        if (periods.length != 1 && periods.length != stateSize) {
            throw new FitFault("dictionary", periods.length + " periods for " + stateSize + " state components",
                    "give one period for all, or one for each component");
        }
        return new Harmonics(order, periods, stateSize, describe());
    }

    /** The harmonics on states of a known size. */
    private record Harmonics(int order, double[] periods, int stateSize, String description) implements FunctionBasis {

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
}
