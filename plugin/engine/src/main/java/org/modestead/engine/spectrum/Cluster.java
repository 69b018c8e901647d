package org.modestead.engine.spectrum;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.linalg.LinearAlgebra;

/**
 * Eigenvalues that are one as far as rounding can tell: a nearly defective matrix splits an eigenvalue of multiplicity p by
 * the p-th root of its rounding error, real or complex by chance, so what comes out is neither several modes nor a slow
 * oscillation.
 *
 * <p>A pair belongs together when its distance is at most {@code 30 √(ε s_1/s_r) ‖Ã‖}, the first-order size of that splitting
 * with the whitening's condition as amplifier, and p > 2 when their distances are at most
 * {@code min((10 ε s_1/s_r)^(1/p), 0.01) ‖Ã‖}: less room for rounding, since its root is so much wider. Their unit eigenvectors
 * are parallel to the same accuracy. Equal eigenvalues with independent eigenvectors are no cluster. Wilkinson, <i>The
 * Algebraic Eigenvalue Problem</i>, 1965, chapter 2.
 */
public final class Cluster {

    private static final double OF_A_PAIR = 900;
    private static final double OF_MORE = 10;
    private static final double WIDEST = 0.01;

    private Cluster() {}

    /** Returns the cluster number of every eigenvalue, 0 for none, numbered from 1. */
    public static int[] numbers(ModalExpansion expansion) {
        int r = expansion.rank();
        double[] singular = expansion.compression().singular();
        double rounding = Math.ulp(1.0) * singular[0] / singular[r - 1];
        double pair = Math.sqrt(OF_A_PAIR * rounding);
        double limit = Math.max(WIDEST, pair);
        double[][] apart = apart(expansion, limit);
        int most = Arrays.stream(apart).mapToInt(row -> (int) Arrays.stream(row).filter(d -> d <= limit).count()).max().orElse(0);
        int[] numbers = new int[r];
        int used = 0;
        for (int multiplicity = 2; multiplicity <= most; multiplicity++) {
            double splitting = multiplicity == 2 ? pair : Math.min(WIDEST, Math.pow(OF_MORE * rounding, 1.0 / multiplicity));
            for (int i = 0; i < r; i++) {
                List<Integer> group = around(apart, i, splitting);
                if (group.size() >= multiplicity) {
                    int number = group.stream().mapToInt(j -> numbers[j]).filter(k -> k != 0).findFirst().orElse(used + 1);
                    used = Math.max(used, number);
                    group.forEach(j -> join(numbers, j, number));
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

    /** The eigenvalues within a splitting of one and of each other. */
    private static List<Integer> around(double[][] apart, int i, double splitting) {
        List<Integer> group = new ArrayList<>(List.of(i));
        for (int j = 0; j < apart.length; j++) {
            int candidate = j;
            if (j != i && group.stream().allMatch(k -> apart[k][candidate] <= splitting)) {
                group.add(j);
            }
        }
        return group;
    }

    /** The larger of distance over ‖Ã‖ and lack of parallelism, infinite where the distance alone is above a limit. */
    private static double[][] apart(ModalExpansion expansion, double limit) {
        int r = expansion.rank();
        double scale = LinearAlgebra.installed().svd(expansion.compression().action()).values()[0];
        double[][] apart = new double[r][r];
        for (int i = 0; i < r; i++) {
            for (int j = i + 1; j < r; j++) {
                double distance = expansion.eigenvalues().get(i).minus(expansion.eigenvalues().get(j)).abs();
                boolean far = distance > limit * scale;
                apart[i][j] = far ? Double.POSITIVE_INFINITY
                        : Math.max(scale == 0 ? 0 : distance / scale, 1 - overlap(expansion, i, j));
                apart[j][i] = apart[i][j];
            }
        }
        return apart;
    }

    private static double overlap(ModalExpansion expansion, int i, int j) {
        Complex overlap = Complex.ZERO;
        for (int k = 0; k < expansion.rank(); k++) {
            overlap = overlap.plus(ComplexMatrices.entry(expansion.vectors(), k, i).conj()
                    .times(ComplexMatrices.entry(expansion.vectors(), k, j)));
        }
        return overlap.abs();
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
