package org.modestead.engine.basis;

import java.util.List;
import org.ejml.data.DMatrixRMaj;

/**
 * Monomials {@code √(|α|!/α!) x^α} in a known number of variables.
 *
 * @param exponents α, one entry a variable; not modified
 * @param factors √(|α|!/α!), one a monomial
 * @param description what they are
 */
public record MonomialFunctions(List<int[]> exponents, double[] factors, String description) implements FunctionBasis {

    /** With the factors that belong to the exponents. */
    public MonomialFunctions(List<int[]> exponents, String description) {
        this(exponents, exponents.stream().mapToDouble(MonomialFunctions::factor).toArray(), description);
    }

    /** As the root of a product of binomials. */
    private static double factor(int[] exponent) {
        double count = 1;
        int total = 0;
        for (int power : exponent) {
            for (int k = 1; k <= power; k++) {
                total++;
                count = count * total / k;
            }
        }
        return Math.sqrt(count);
    }

    @Override
    public int size() {
        return exponents.size();
    }

    @Override
    public DMatrixRMaj evaluate(DMatrixRMaj states) {
        DMatrixRMaj out = new DMatrixRMaj(states.numRows, size());
        for (int i = 0; i < states.numRows; i++) {
            for (int j = 0; j < size(); j++) {
                out.data[i * size() + j] = factors[j] * monomial(states, i, exponents.get(j));
            }
        }
        return out;
    }

    private static double monomial(DMatrixRMaj states, int row, int[] exponent) {
        double product = 1;
        for (int k = 0; k < exponent.length; k++) {
            for (int power = exponent[k]; power > 0; power--) {
                product *= states.data[row * states.numCols + k];
            }
        }
        return product;
    }

    @Override
    public String describe() {
        return size() + " " + description;
    }
}
