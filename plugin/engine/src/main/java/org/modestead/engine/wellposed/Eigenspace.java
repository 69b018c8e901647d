package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.spectrum.ModalExpansion;

/**
 * All eigenfunctions of one rate. Where several independent ones share it (a resonance: a rate that is the sum of others), each single
 * one is an
 * arbitrary choice, and only what the space as a whole does to the signal has a meaning:
 *
 * <pre>
 *   joint weights:  U = V_λ ξ_λ        solo weights:  P_λ &lt;g, q&gt;, P_λ the orthogonal projector on the columns of V_λ
 *   carrier:        the unit vector along the column of U for the component of the signal that it adds most to
 * </pre>
 *
 * For a single eigenfunction the carrier is v and the gap that of its own weights.
 *
 * @param columns of the expansion, conjugates left out
 * @param all columns with their conjugates
 * @param carrier r, unit length
 * @param gap relative difference of joint and solo weights
 */
record Eigenspace(List<Integer> columns, List<Integer> all, Complex[] carrier, double gap) {

    /** Rates closer than this, relative to their size, are one. */
    static final double SAME_RATE = 0.03;

    private static final double DEPENDENT = 1e-6;

    /**
     * @param expansion on one rung
     * @param groups the columns of every mode, conjugates together
     * @param p which mode
     * @param longest duration of the longest run
     */
    static Eigenspace of(ModalExpansion expansion, List<List<Integer>> groups, int p, double longest) {
        Complex rate = expansion.rates().get(groups.get(p).get(0));
        List<Integer> all = new ArrayList<>(groups.get(p));
        for (List<Integer> other : groups) {
            Complex near = expansion.rates().get(other.get(0));
            boolean same = Ladder.relativeChange(rate, near, longest) < SAME_RATE
                    || Ladder.relativeChange(rate, near.conj(), longest) < SAME_RATE;
            if (other != groups.get(p) && same) {
                all.addAll(other);
            }
        }
        List<Integer> columns = all.stream().filter(j -> j.equals(groups.get(p).get(0))
                || !groups.get(p).contains(j) && Ladder.relativeChange(rate, expansion.rates().get(j), longest) < SAME_RATE).toList();
        Complex[][] joint = joint(expansion, columns);
        return new Eigenspace(columns, List.copyOf(all), unit(joint[strongest(joint)], expansion, columns.get(0)), gap(expansion, columns, joint));
    }

    /** One array a component of the signal: column k of V_λ ξ_λ. */
    private static Complex[][] joint(ModalExpansion expansion, List<Integer> columns) {
        Complex[][] out = new Complex[expansion.joint().numCols][expansion.rank()];
        for (int k = 0; k < out.length; k++) {
            for (int i = 0; i < expansion.rank(); i++) {
                Complex sum = Complex.ZERO;
                for (int j : columns) {
                    sum = sum.plus(ComplexMatrices.entry(expansion.vectors(), i, j).times(ComplexMatrices.entry(expansion.joint(), j, k)));
                }
                out[k][i] = sum;
            }
        }
        return out;
    }

    private static int strongest(Complex[][] columns) {
        int best = 0;
        for (int k = 1; k < columns.length; k++) {
            best = norm(columns[k]) > norm(columns[best]) ? k : best;
        }
        return best;
    }

    private static Complex[] unit(Complex[] vector, ModalExpansion expansion, int own) {
        double norm = norm(vector);
        return norm > 0 && Double.isFinite(norm) ? scaled(vector, 1 / norm) : column(expansion.vectors(), own);
    }

    private static double gap(ModalExpansion expansion, List<Integer> columns, Complex[][] joint) {
        List<Complex[]> basis = orthonormal(expansion.vectors(), columns);
        double difference = 0;
        double size = 0;
        for (int k = 0; k < joint.length; k++) {
            Complex[] solo = projected(basis, expansion.compression().observable(), k);
            Complex[] apart = new Complex[solo.length];
            for (int i = 0; i < solo.length; i++) {
                apart[i] = joint[k][i].minus(solo[i]);
            }
            difference = Math.hypot(difference, norm(apart));
            size = Math.hypot(size, Math.max(norm(joint[k]), norm(solo)));
        }
        return size == 0 ? 0 : difference / size;
    }

    private static Complex[] projected(List<Complex[]> basis, DMatrixRMaj observable, int k) {
        Complex[] out = new Complex[observable.numRows];
        java.util.Arrays.fill(out, Complex.ZERO);
        for (Complex[] e : basis) {
            Complex weight = Complex.ZERO;
            for (int i = 0; i < out.length; i++) {
                weight = weight.plus(e[i].conj().times(observable.get(i, k)));
            }
            for (int i = 0; i < out.length; i++) {
                out[i] = out[i].plus(e[i].times(weight));
            }
        }
        return out;
    }

    private static List<Complex[]> orthonormal(ZMatrixRMaj vectors, List<Integer> columns) {
        List<Complex[]> basis = new ArrayList<>();
        for (int j : columns) {
            Complex[] v = column(vectors, j);
            for (Complex[] e : basis) {
                Complex part = inner(e, v);
                for (int i = 0; i < v.length; i++) {
                    v[i] = v[i].minus(e[i].times(part));
                }
            }
            double norm = norm(v);
            if (norm > DEPENDENT) {
                basis.add(scaled(v, 1 / norm));
            }
        }
        return basis;
    }

    static Complex[] column(ZMatrixRMaj a, int j) {
        Complex[] out = new Complex[a.numRows];
        for (int i = 0; i < out.length; i++) {
            out[i] = ComplexMatrices.entry(a, i, j);
        }
        return out;
    }

    /** Returns a* b. */
    static Complex inner(Complex[] a, Complex[] b) {
        Complex sum = Complex.ZERO;
        for (int i = 0; i < a.length; i++) {
            sum = sum.plus(a[i].conj().times(b[i]));
        }
        return sum;
    }

    static double norm(Complex[] a) {
        return SquaredSize.of(a).norm();
    }

    private static Complex[] scaled(Complex[] a, double factor) {
        Complex[] out = new Complex[a.length];
        for (int i = 0; i < a.length; i++) {
            out[i] = a[i].times(factor);
        }
        return out;
    }
}
