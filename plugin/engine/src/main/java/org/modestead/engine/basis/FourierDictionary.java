package org.modestead.engine.basis;

import org.modestead.engine.FitFault;

/**
 * Sines and cosines of each state component: for angles and other periodic quantities. The real forms span the same
 * functions as the complex exponentials {@code e^(2πi n x/period)}, |n| &lt;= order.
 *
 * @param order highest harmonic, at least 1
 * @param periods one a component, or a single one for all; positive
 */
public record FourierDictionary(int order, double[] periods) implements Dictionary {

    /** Checks the ranges. */
    public FourierDictionary {
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
}
