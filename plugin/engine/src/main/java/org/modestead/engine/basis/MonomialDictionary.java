package org.modestead.engine.basis;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.modestead.engine.FitFault;

/**
 * Monomials of total degree at most d, {@code √(|α|!/α!) x^α}. Total degree, not degree by component: the span is then
 * invariant under every linear change of coordinates, so linear motion stays inside it.
 *
 * <p>The factor is that of the feature map of {@code Σ_k (x·y)^k}: a rotation of the coordinates then turns the functions
 * of each degree into one another by a rotation, and no cut at a smaller rank depends on how the coordinates were turned.
 *
 * @param degree d, at least 1
 */
public record MonomialDictionary(int degree) implements Dictionary {

    private static final long MOST = 5000;

    /** Checks the range. */
    public MonomialDictionary {
        if (degree < 1) {
            throw new FitFault("dictionary", "the degree is " + degree, "give a degree of at least 1");
        }
    }

    @Override
    public String describe() {
        return "monomials of total degree up to " + degree;
    }

    @Override
    public FunctionBasis on(int stateSize) {
        return new MonomialFunctions(exponents(stateSize, "state components"), describe());
    }

    /**
     * The constant and all monomials of state and inputs up to the degree in which an input stands: exact for linear motion, whose
     * next state is a polynomial of both.
     */
    @Override
    public FunctionBasis inputTerms(int stateSize, int inputs) {
        List<int[]> terms = new ArrayList<>();
        terms.add(new int[stateSize + inputs]);
        for (int[] exponent : exponents(stateSize + inputs, "state components and inputs")) {
            if (Arrays.stream(exponent, stateSize, stateSize + inputs).anyMatch(power -> power > 0)) {
                terms.add(exponent);
            }
        }
        return new MonomialFunctions(List.copyOf(terms), "input terms, " + describe());
    }

    private List<int[]> exponents(int size, String what) {
        double count = 1;
        for (int k = 1; k <= degree; k++) {
            count = count * (size + k) / k;
        }
        if (count > MOST) {
            throw new FitFault("dictionary", "degree " + degree + " on " + size + " " + what + " makes " + (long) count
                    + " functions", "keep it at most " + MOST + ": lower the degree or the delay depth, or use a kernel");
        }
        List<int[]> exponents = new ArrayList<>();
        for (int total = 0; total <= degree; total++) {
            collect(new int[size], 0, total, exponents);
        }
        return List.copyOf(exponents);
    }

    private static void collect(int[] exponent, int from, int rest, List<int[]> out) {
        if (rest == 0) {
            out.add(exponent.clone());
            return;
        }
        for (int k = from; k < exponent.length; k++) {
            exponent[k]++;
            collect(exponent, k, rest - 1, out);
            exponent[k]--;
        }
    }
}
