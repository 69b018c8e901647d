package org.modestead.engine.spectrum;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;

/**
 * Eigenvalues that are one as far as rounding can tell: a nearly defective matrix splits a multiple eigenvalue by the
 * square root of its rounding error, real or complex by chance, so such a pair is neither two modes nor a slow oscillation.
 *
 * <p>A pair belongs together when its distance is at most {@code 30 √(ε s_1/s_r) ‖Ã‖}, the first-order size of that
 * splitting with the whitening's condition as amplifier, and its unit eigenvectors are parallel to the same accuracy.
 * Equal eigenvalues with independent eigenvectors are no cluster. Wilkinson, <i>The Algebraic Eigenvalue Problem</i>,
 * 1965, chapter 2.
 */
public final class Cluster {

    private static final double FACTOR = 30;

    private Cluster() {}

    /** Returns the cluster number of every eigenvalue, 0 for none, numbered from 1. */
    public static int[] numbers(ModalExpansion expansion) {
        int r = expansion.rank();
        double[] singular = expansion.compression().singular();
        double tolerance = FACTOR * Math.sqrt(Math.ulp(1.0) * singular[0] / singular[r - 1]);
        double scale = expansion.eigenvalues().stream().mapToDouble(Complex::abs).max().orElse(0);
        int[] numbers = new int[r];
        int used = 0;
        for (int i = 0; i < r; i++) {
            for (int j = i + 1; j < r; j++) {
                if (together(expansion, i, j, tolerance, scale)) {
                    int number = numbers[i] != 0 ? numbers[i] : numbers[j] != 0 ? numbers[j] : ++used;
                    join(numbers, i, number);
                    join(numbers, j, number);
                }
            }
        }
        return numbers;
    }

    private static void join(int[] numbers, int at, int number) {
        int before = numbers[at];
        for (int k = 0; k < numbers.length; k++) {
            if (k == at || before != 0 && numbers[k] == before) {
                numbers[k] = number;
            }
        }
    }

    private static boolean together(ModalExpansion expansion, int i, int j, double tolerance, double scale) {
        double distance = expansion.eigenvalues().get(i).minus(expansion.eigenvalues().get(j)).abs();
        if (distance > tolerance * scale) {
            return false;
        }
        Complex overlap = Complex.ZERO;
        for (int k = 0; k < expansion.rank(); k++) {
            overlap = overlap.plus(ComplexMatrices.entry(expansion.vectors(), k, i).conj().times(ComplexMatrices.entry(expansion.vectors(), k, j)));
        }
        return 1 - overlap.abs() < tolerance;
    }

    /** Groups column indices into modes: clusters with their conjugates, conjugate pairs, single real ones. */
    public static List<List<Integer>> groups(ModalExpansion expansion, int[] numbers) {
        List<List<Integer>> groups = new ArrayList<>();
        boolean[] taken = new boolean[expansion.rank()];
        for (int j = 0; j < expansion.rank(); j++) {
            if (taken[j]) {
                continue;
            }
            List<Integer> group = new ArrayList<>();
            for (int k = j; k < expansion.rank(); k++) {
                int conjugate = k + (int) Math.signum(expansion.eigenvalues().get(k).im());
                boolean partner = same(numbers, j, k) || same(numbers, j, conjugate);
                if (partner && !taken[k]) {
                    group.add(k);
                    taken[k] = true;
                }
            }
            groups.add(List.copyOf(group));
        }
        return groups;
    }

    private static boolean same(int[] numbers, int j, int k) {
        return j == k || numbers[j] != 0 && numbers[j] == numbers[k];
    }
}
