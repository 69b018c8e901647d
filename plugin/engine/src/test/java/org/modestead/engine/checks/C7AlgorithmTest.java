package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.Compression;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.ModalExpansion;

/** CHECKS C7.1-C7.3: formulas of the literature against their exact cases. */
class C7AlgorithmTest {

    // ---- C7.1: Williams, Kevrekidis and Rowley, J. Nonlinear Sci. 25:1307, 2015 (from memory; derived values) ----

    private static Snapshots linearPairs() {
        List<double[]> x = new ArrayList<>();
        List<double[]> y = new ArrayList<>();
        for (int k = 0; k < 60; k++) {
            // points that fill the square evenly, the same on every run
            double[] point = {2 * (k * 0.7548776662466927 % 1) - 1, 2 * (k * 0.5698402909980532 % 1) - 1};
            x.add(point);
            y.add(new double[] {0.9 * point[0] - 0.04 * point[1], 0.8 * point[1]});
        }
        return Fits.pairs(1, x.toArray(double[][]::new), y.toArray(double[][]::new));
    }

    private static ModalExpansion expansion(Snapshots snapshots, Dictionary dictionary, int rank) {
        return ModalExpansion.of(Fits.fit(snapshots, new DictionaryEstimator(dictionary), rank).chosen());
    }

    private static double[] falling(ModalExpansion expansion) {
        expansion.eigenvalues().forEach(value -> assertEquals(0, value.im(), 1e-12));
        double[] rising = expansion.eigenvalues().stream().mapToDouble(Complex::re).sorted().toArray();
        return IntStream.range(0, rising.length).mapToDouble(k -> rising[rising.length - 1 - k]).toArray();
    }

    @Test
    void totalDegreeIsClosedUnderALinearMap() {
        // closed form .9^i .8^j; CHECKS C7.1 asks 1e-15 at degree 2; at degree 3 the condition of the monomials is about 100
        assertArrayEquals(new double[] {1, 0.9, 0.81, 0.8, 0.72, 0.64},
                falling(expansion(linearPairs(), Dictionary.monomials(2), 6)), 1e-15);
        double[] cubic = {1, 0.9, 0.81, 0.8, 0.729, 0.72, 0.648, 0.64, 0.576, 0.512};
        assertArrayEquals(cubic, falling(expansion(linearPairs(), Dictionary.monomials(3), 10)), 1e-13);
    }

    @Test
    void modesOfTheFullState() {
        // closed form: eigenfunctions x - .4y and y, modes (1, 0) and (.4, 1); normalised so that the eigenfunction has
        // those coefficients
        ModalExpansion expansion = expansion(linearPairs(), Dictionary.monomials(2), 6);
        var functions = ComplexMatrices.product(expansion.compression().map(), expansion.vectors());
        int slow = Fits.nearest(expansion.eigenvalues(), 0.9);
        Complex size = ComplexMatrices.entry(functions, 1, slow);
        assertEquals(-0.4, functions.getReal(2, slow) / size.re(), 1e-13);
        assertEquals(1, expansion.joint().getReal(slow, 0) * size.re(), 1e-13);
        assertEquals(0, expansion.joint().getReal(slow, 1) * size.re(), 1e-13);
        int fast = Fits.nearest(expansion.eigenvalues(), 0.8);
        size = ComplexMatrices.entry(functions, 2, fast);
        assertEquals(0, functions.getReal(1, fast) / size.re(), 1e-13);
        assertEquals(0.4, expansion.joint().getReal(fast, 0) * size.re(), 1e-13);
        assertEquals(1, expansion.joint().getReal(fast, 1) * size.re(), 1e-13);
    }

    @Test
    void residualsFlagExactlyTheThreeWrongEigenvaluesOfATensorDictionary() {
        // the span of x^i y^j, i, j <= 2, is not closed: J mixes x into y (CHECKS C7.1, trap)
        List<ListedFunctions.StateFunction> tensor = new ArrayList<>();
        for (int i = 0; i <= 2; i++) {
            for (int j = 0; j <= 2; j++) {
                int a = i;
                int b = j;
                tensor.add(x -> Math.pow(x[0], a) * Math.pow(x[1], b));
            }
        }
        ModalExpansion expansion = expansion(linearPairs(), new ListedFunctions(tensor), 9);
        double[] exact = {1, 0.9, 0.81, 0.8, 0.72, 0.64};
        List<Integer> right = new ArrayList<>();
        for (double value : exact) {
            int j = Fits.nearest(expansion.eigenvalues(), value);
            right.add(j);
            assertEquals(value, expansion.eigenvalues().get(j).re(), 1e-12);
            // root of a difference of squares: √ε times the overlap of the eigenvectors
            assertEquals(0, Fits.residual(expansion, j), 1e-6, "residual of " + value);
        }
        int wrong = 0;
        for (int j = 0; j < 9; j++) {
            if (!right.contains(j)) {
                wrong++;
                assertTrue(Fits.residual(expansion, j) > 1e-3, "residual of " + expansion.eigenvalues().get(j) + ": "
                        + Fits.residual(expansion, j));
                double value = expansion.eigenvalues().get(j).re();
                double miss = Arrays.stream(new double[] {0.648, 0.576, 0.5184}).map(target -> Math.abs(target - value))
                        .min().orElseThrow();
                assertTrue(miss > 1e-5, value + " is not one of the closed-form products");
            }
        }
        assertEquals(3, wrong);
    }

    // ---- C7.2: Williams, Rowley and Kevrekidis, J. Comput. Dyn. 2:247, 2015 (from memory; values closed form) ----

    private static Compression polynomialStep() {
        Snapshots pairs = Fits.pairs(1, new double[][] {{1}, {2}, {3}}, new double[][] {{0.9}, {1.8}, {2.7}});
        return new KernelStepEstimator(Fits.kernel("polynomial", "degree", 2, "offset", 1), 3)
                .compress(pairs, Progress.NONE);
    }

    @Test
    void kernelArraysOfASquareMap() {
        // closed form (1 + xy)²; y rows come first in the action: one rounding
        Compression compression = polynomialStep();
        assertArrayEquals(new double[] {4, 9, 16, 9, 25, 49, 16, 49, 100}, compression.gram().data, 1e-13);
        assertArrayEquals(new double[] {3.61, 7.84, 13.69, 7.84, 21.16, 40.96, 13.69, 40.96, 82.81}, compression.action()
                .data, 1e-13);
        double determinant = Arrays.stream(LinearAlgebra.installed().symmetricEigen(compression.gram()).values())
                .reduce(1, (a, b) -> a * b);
        // smallest eigenvalue is good to ε times the largest: 1e-14 · 128 / 0.03
        assertEquals(8, determinant, 1e-10);
    }

    @Test
    void kernelEigenvaluesOfASquareMap() {
        // closed form 1, .9, .81; condition of G, about 1e4, times rounding
        double[] values = falling(ModalExpansion.of(polynomialStep().whiten(3)));
        assertArrayEquals(new double[] {1, 0.9, 0.81}, values, 1e-11);
    }

    @Test
    void theActionsRowBelongsToTheMovedPoint() {
        // a map that is not symmetric in the kernel: A_ij = K(y_i, x_j), not its transpose; closed form (1 + 2y)² at y =
        // 0.5·1 + 1
        Snapshots pairs = Fits.pairs(1, new double[][] {{1}, {2}}, new double[][] {{1.5}, {2}});
        DMatrixRMaj action = new KernelStepEstimator(Fits.kernel("polynomial", "degree", 2, "offset", 1), 2)
                .compress(pairs, Progress.NONE).action();
        assertEquals(16, action.get(0, 1), 1e-13);
        assertEquals(9, action.get(1, 0), 1e-13);
    }

    @Test
    void kernelAndItsFeaturesHaveTheSameSpectrumOnANonlinearMap() {
        // (1 + x·y)² = features 1, √2x1, √2x2, x1², √2x1x2, x2² (CHECKS C7.2: equal to 1e-8); six pairs, so both see the
        // same square problem
        double root = Math.sqrt(2);
        ListedFunctions features = ListedFunctions.of(x -> 1, x -> root * x[0], x -> root * x[1], x -> x[0] * x[0],
                x -> root * x[0] * x[1],
                x -> x[1] * x[1]);
        Kernel kernel = Fits.kernel("polynomial", "degree", 2, "offset", 1);
        double[][] x = {{0.1, 0.9}, {-0.8, 0.3}, {0.5, -0.6}, {0.9, 0.7}, {-0.4, -0.9}, {0.3, 0.2}, {-0.2, 0.6},
                {0.7, -0.1}};
        double[][] y = Arrays.stream(x).map(p -> new double[] {0.8 * p[0] + 0.1 * p[1] * p[1],
                0.7 * p[1] - 0.2 * p[0] * p[1]})
                .toArray(double[][]::new);
        DMatrixRMaj at = new DMatrixRMaj(x);
        DMatrixRMaj values = features.evaluate(at);
        assertArrayEquals(Matrices.productTranspose(values, values).data, kernel.matrix(at, at).data, 1e-14);
        Snapshots pairs = Fits.pairs(1, x, y);
        double[] fromKernel = moduli(ModalExpansion.of(new KernelStepEstimator(kernel, 6).compress(pairs, Progress.NONE)
                .whiten(6)));
        double[] fromFeatures = moduli(expansion(pairs, features, 6));
        assertArrayEquals(fromFeatures, fromKernel, 1e-8);
    }

    private static double[] moduli(ModalExpansion expansion) {
        return expansion.eigenvalues().stream().mapToDouble(Complex::abs).sorted().toArray();
    }

    // ---- C7.3: Colbrook and Townsend, Comm. Pure Appl. Math. 77:221, 2024 (from memory; derived) ----

    @Test
    void residualOfAnEigenpairReducesToADifferenceOfSquares() {
        // v*Lv/v*Gv - |μ|² in orthonormal functions, on a dictionary that is not closed (quadratic map, monomials of
        // degree 3)
        double[][] x = IntStream.range(0, 40).mapToObj(k -> new double[] {-1 + k / 20.0}).toArray(double[][]::new);
        double[][] y = Arrays.stream(x).map(p -> new double[] {0.9 * p[0] - 0.5 * p[0] * p[0] + 0.1})
                .toArray(double[][]::new);
        ModalExpansion expansion = expansion(Fits.pairs(1, x, y), Dictionary.monomials(3), 4);
        var moved = ComplexMatrices.product(expansion.compression().second(), expansion.vectors());
        var forms = ComplexMatrices.conjugateTransposeProduct(expansion.vectors(), moved);
        boolean anyLarge = false;
        for (int j = 0; j < 4; j++) {
            double reduced = forms.getReal(j, j) - Math.pow(expansion.eigenvalues().get(j).abs(), 2);
            double residual = Fits.residual(expansion, j);
            assertEquals(reduced, residual * residual, 1e-12, "eigenvalue " + expansion.eigenvalues().get(j));
            anyLarge |= residual > 0.01;
        }
        assertTrue(anyLarge, "the map leaves cubic polynomials");
    }

    @Test
    void residualOfAMeasurePreservingMapIsOneMinusTheSquaredModulus() {
        // a rotation by 2/27 of a turn permutes 27 equispaced points, so quadrature is exact: res² = 1 - |μ|²
        int n = 27;
        double[][] x = IntStream.range(0, n).mapToObj(k -> new double[] {k / (double) n}).toArray(double[][]::new);
        double[][] y = IntStream.range(0, n).mapToObj(k -> new double[] {(k + 2) % n / (double) n}).toArray(double[][]::new);
        ListedFunctions mixed = ListedFunctions.of(p -> 1, p -> Math.cos(2 * Math.PI * p[0]) + Math.cos(4 * Math.PI * p[0]),
                p -> Math.sin(2 * Math.PI * p[0]));
        ModalExpansion expansion = expansion(Fits.pairs(1, x, y), mixed, 3);
        boolean proper = false;
        for (int j = 0; j < 3; j++) {
            double modulus = expansion.eigenvalues().get(j).abs();
            assertEquals(1 - modulus * modulus, Math.pow(Fits.residual(expansion, j), 2), 1e-12);
            proper |= modulus > 0.05 && modulus < 0.95;
        }
        assertTrue(proper, "an eigenvalue strictly inside the circle");
    }
}
