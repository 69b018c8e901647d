package org.modestead.engine.operator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.ModalExpansion;

class CompressionTest {

    private static Snapshots snapshots() {
        List<Run> runs = new java.util.ArrayList<>();
        for (int i = 0; i < 12; i++) {
            double turn = i;
            double size = 0.4 + 0.05 * i;
            runs.add(Motions.run("r" + i, 20, 0.1, t -> new double[] {
                size * Math.exp(-0.2 * t) * Math.cos(2 * t + turn), size * Math.exp(-0.2 * t) * Math.sin(2 * t + turn)}));
        }
        return Motions.snapshots(0.1, 1, runs, List.of());
    }

    static List<Estimator> estimators() {
        return List.of(new LinearEstimator(), new DictionaryEstimator(Dictionary.monomials(3)),
                new DictionaryEstimator(Dictionary.fourier(2, 4)), new KernelStepEstimator(Motions.kernel("gaussian",
                        "scale", 1), 50),
                new OccupationEstimator(Motions.kernel("exponential", "rate", 1), new SegmentPlan(5, 0), 1),
                new OccupationEstimator(Motions.kernel("exponential", "rate", 1), new SegmentPlan(5, 0), 0.9));
    }

    @ParameterizedTest
    @MethodSource("estimators")
    void whitenedFunctionsAreOrthonormalAndCompressTheFourArrays(Estimator estimator) {
        Compression compression = estimator.compress(snapshots(), Progress.NONE);
        OrthonormalCompression white = compression.whiten(4);
        if (white.innerProduct() == InnerProduct.SPACE && !(compression instanceof GramCompression)) {
            return;
        }
        DMatrixRMaj q = white.map();
        assertClose(CommonOps_DDRM.identity(white.rank()), sandwich(q, compression.gram()));
        assertClose(white.action(), sandwich(q, compression.action()));
        assertClose(white.second(), sandwich(q, compression.second()));
        assertClose(white.observable(), Matrices.transposeProduct(q, compression.observable()));
    }

    @ParameterizedTest
    @MethodSource("estimators")
    void leadingFunctionsOfALargerWhiteningAreThoseOfASmallerOne(Estimator estimator) {
        OrthonormalCompression large = estimator.compress(snapshots(), Progress.NONE).whiten(5);
        OrthonormalCompression leading = large.leading(2);
        OrthonormalCompression small = estimator.compress(snapshots(), Progress.NONE).whiten(2);
        assertEquals(2, leading.rank());
        assertClose(small.action(), leading.action());
        assertArrayEquals(small.singular(), leading.singular(), 1e-10);
        for (int i = 0; i < 2; i++) {
            for (int j = 0; j < 2; j++) {
                assertEquals(large.action().get(i, j), leading.action().get(i, j));
            }
        }
    }

    @Test
    void aRankOutsideTheCompressionIsRefused() {
        OrthonormalCompression white = new LinearEstimator().compress(snapshots(), Progress.NONE).whiten(2);
        assertThrows(IllegalArgumentException.class, () -> white.leading(3));
        assertThrows(IllegalArgumentException.class, () -> white.leading(0));
    }

    @Test
    void formedAndFactoredArraysOfTheDataInnerProductAgree() {
        FactoredCompression factored =
                (FactoredCompression) new DictionaryEstimator(Dictionary.monomials(2)).compress(snapshots(), Progress.NONE);
        GramCompression formed = new GramCompression(factored.basis(), factored.gram(), factored.action(), factored.second(),
                factored.observable(), InnerProduct.DATA, factored.evolution());
        assertAgree(formed.whiten(6), factored.whiten(6), 1e-9);
    }

    @Test
    void formedAndFactoredArraysOfAKernelSpaceAgree() {
        // a polynomial space of 6 dimensions: landmark features hold all of it
        var kernel = Motions.kernel("polynomial", "degree", 2, "offset", 1);
        StatePairs pairs = StatePairs.of(snapshots(), Snapshots.Part.TRAINING, 1);
        GramCompression formed = (GramCompression) new KernelStepEstimator(kernel, 50).compress(snapshots(), Progress.NONE);
        var features = org.modestead.engine.basis.LandmarkFeatures.choose(kernel, pairs.now(), 50, Progress.NONE);
        FactoredCompression factored = new FactoredCompression(features, features.evaluate(pairs.now()),
                features.evaluate(pairs.next()),
                pairs.now(), InnerProduct.SPACE, formed.evolution());
        assertAgree(formed.whiten(6), factored.whiten(6), 1e-7);
    }

    @Test
    void manyPairsTakeTheFactoredPathWithTheSameRates() {
        List<Run> runs = new java.util.ArrayList<>();
        for (int i = 0; i < 30; i++) {
            double turn = i;
            runs.add(Motions.run("r" + i, 60, 0.1, t -> new double[] {
                0.8 * Math.exp(-0.2 * t) * Math.cos(2 * t + turn), 0.8 * Math.exp(-0.2 * t) * Math.sin(2 * t + turn)}));
        }
        Snapshots many = Motions.snapshots(0.1, 1, runs, List.of());
        var kernel = Motions.kernel("polynomial", "degree", 2, "offset", 1);
        for (Estimator estimator : List.of(new KernelStepEstimator(kernel, 50),
                new OccupationEstimator(kernel, new SegmentPlan(6, 0), 1))) {
            Compression compression = estimator.compress(many, Progress.NONE);
            assertEquals(FactoredCompression.class, compression.getClass());
            List<Complex> rates = ModalExpansion.of(compression.whiten(6)).rates();
            // closed form: 0, -0.2±2i, -0.4, -0.4±4i; the generator is off by its quadrature of order 6
            for (Complex expected : List.of(new Complex(0, 0), new Complex(-0.2, 2), new Complex(-0.4, 0),
                    new Complex(-0.4, 4))) {
                assertEquals(0, rates.stream().mapToDouble(rate -> rate.minus(expected).abs()).min().orElseThrow(), 1e-4,
                        estimator.id());
            }
        }
    }

    @Test
    void functionsThatVanishOnTheDataAreAFault() {
        Snapshots still = Motions.snapshots(0.1, 1, List.of(Motions.run("a", 10, 0.1, t -> new double[] {0, 0})), List.of());
        for (Estimator estimator : List.of(new LinearEstimator(), new KernelStepEstimator(Motions.kernel("linear"), 20),
                new OccupationEstimator(Motions.kernel("linear"), SegmentPlan.WHOLE_RUNS, 1))) {
            assertThrows(FitFault.class, () -> estimator.compress(still, Progress.NONE).whiten(3), estimator.id());
        }
    }

    @Test
    void valuesThatOverflowTheKernelAreAFault() {
        for (int samples : new int[] {20, 500}) {
            Snapshots large = Motions.snapshots(0.1, 1, List.of(Motions.run("a", samples, 0.1,
                    t -> new double[] {100 + t})), List.of());
            for (Estimator estimator : List.of(new KernelStepEstimator(Motions.kernel("exponential", "rate", 1), 20),
                    new OccupationEstimator(Motions.kernel("exponential", "rate", 1), new SegmentPlan(5, 0), 1))) {
                assertThrows(FitFault.class, () -> estimator.compress(large, Progress.NONE).whiten(3),
                        estimator.id() + " " + samples);
            }
        }
    }

    @Test
    void coordinatesAreTheirOwnBasis() {
        DMatrixRMaj states = new DMatrixRMaj(new double[][] {{1, 2}, {3, 4}});
        assertArrayEquals(states.data, new Coordinates(2).evaluate(states).data);
    }

    private static void assertAgree(OrthonormalCompression a, OrthonormalCompression b, double tolerance) {
        assertEquals(a.rank(), b.rank());
        assertArrayEquals(a.singular(), b.singular(), 1e-10 * a.singular()[0]);
        // the sign of each function is free: compare what does not depend on it
        for (int i = 0; i < a.rank(); i++) {
            for (int j = 0; j < a.rank(); j++) {
                assertEquals(Math.abs(a.action().get(i, j)), Math.abs(b.action().get(i, j)), tolerance);
            }
        }
        DMatrixRMaj points = new DMatrixRMaj(new double[][] {{0.1, 0.2}, {-0.5, 0.3}});
        DMatrixRMaj first = Matrices.product(a.evaluate(points), a.observable());
        DMatrixRMaj second = Matrices.product(b.evaluate(points), b.observable());
        assertArrayEquals(first.data, second.data, tolerance);
    }

    private static DMatrixRMaj sandwich(DMatrixRMaj q, DMatrixRMaj a) {
        return Matrices.transposeProduct(q, Matrices.product(a, q));
    }

    private static void assertClose(DMatrixRMaj expected, DMatrixRMaj actual) {
        // four directions of a well-conditioned fit; dividing by small singular values costs some digits
        assertArrayEquals(expected.data, actual.data, 1e-8 * Math.max(1, CommonOps_DDRM.elementMaxAbs(expected)));
    }
}
