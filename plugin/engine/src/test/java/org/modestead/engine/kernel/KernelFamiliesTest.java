package org.modestead.engine.kernel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.function.DoubleBinaryOperator;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.engine.FitFault;
import org.modestead.engine.fixtures.Motions;

class KernelFamiliesTest {

    @Test
    void everyFamilyIsFoundByTheServiceLoaderUnderItsId() {
        List<String> ids = KernelFamilies.all().stream().map(KernelFamily::id).sorted().toList();
        assertEquals(List.of("exponential", "gaussian", "laplacian", "linear", "matern32", "matern52", "polynomial"), ids);
        for (KernelFamily family : KernelFamilies.all()) {
            assertEquals(family.id(), KernelFamilies.byId(family.id()).orElseThrow().id());
            assertFalse(family.title().isEmpty() || family.formula().isEmpty());
        }
    }

    @Test
    void anUnknownFamilyIsAFaultThatListsTheKnownOnes() {
        FitFault fault = assertThrows(FitFault.class, () -> KernelFamilies.create(new KernelSpec("sinc", Map.of())));
        assertTrue(fault.getMessage().contains("sinc") && fault.getMessage().contains("matern52"), fault.getMessage());
    }

    @Test
    void aMissingParameterIsAFaultThatNamesIt() {
        for (KernelFamily family : KernelFamilies.all()) {
            if (!family.parameters().isEmpty()) {
                FitFault fault = assertThrows(FitFault.class, () -> family.create(new KernelSpec(family.id(), Map.of())));
                assertTrue(fault.getMessage().contains(family.parameters().get(0).name()), fault.getMessage());
            }
        }
    }

    @ParameterizedTest
    @CsvSource({"gaussian, scale, 0", "gaussian, scale, -1", "laplacian, scale, NaN", "matern32, scale, Infinity",
            "matern52, scale, 0",
        "exponential, rate, 0", "exponential, rate, -2"})
    void aParameterOutOfRangeIsAFaultWithItsValue(String family, String name, double value) {
        FitFault fault = assertThrows(FitFault.class, () -> Motions.kernel(family, name, value));
        assertTrue(fault.getMessage().contains(Double.toString(value)), fault.getMessage());
    }

    @Test
    void aPolynomialNeedsAWholePositiveDegreeAndNoNegativeOffset() {
        assertThrows(FitFault.class, () -> Motions.kernel("polynomial", "degree", 2.5, "offset", 1));
        assertThrows(FitFault.class, () -> Motions.kernel("polynomial", "degree", 0, "offset", 1));
        assertThrows(FitFault.class, () -> Motions.kernel("polynomial", "degree", 2, "offset", -1));
    }

    @ParameterizedTest
    @CsvSource({"gaussian, 0.135335283236613", "laplacian, 0.135335283236613", "matern32, 0.139707146062465",
            "matern52, 0.138664871895072"})
    void radialKernelsFollowTheirFormulaAtDistanceTwoScales(String family, double expected) {
        // closed form at |x-y| = 2 s: e^-2 (Gaussian and Laplacian), (1+a)e^-a with a = 2√3, (1+a+a²/3)e^-a with a = 2√5
        double value = Motions.kernel(family, "scale", 0.5).matrix(Motions.column(0.2), Motions.column(1.2)).get(0, 0);
        assertEquals(expected, value, 1e-3 * 0.14);
        double a = family.equals("matern32") ? 2 * Math.sqrt(3) : 2 * Math.sqrt(5);
        double exact = switch (family) {
            case "matern32" -> (1 + a) * Math.exp(-a);
            case "matern52" -> (1 + a + a * a / 3) * Math.exp(-a);
            default -> Math.exp(-2);
        };
        assertEquals(exact, value, 1e-15);
    }

    @Test
    void dotProductKernelsFollowTheirFormula() {
        DMatrixRMaj x = new DMatrixRMaj(new double[][] {{1, 2}});
        DMatrixRMaj y = new DMatrixRMaj(new double[][] {{0.5, -1}});
        assertEquals(-1.5, Motions.kernel("linear").matrix(x, y).get(0, 0), 1e-15);
        assertEquals(-0.125, Motions.kernel("polynomial", "degree", 3, "offset", 1).matrix(x, y).get(0, 0), 1e-15);
        assertEquals(Math.exp(-0.3), Motions.kernel("exponential", "rate", 0.2).matrix(x, y).get(0, 0), 1e-15);
    }

    @Test
    void factsAboutTheSpacesAreThoseOfTheTheory() {
        // CHECKS C3.1, C3.11, C3.12
        assertTrue(Motions.kernel("exponential", "rate", 2).space().holdsConstants());
        assertEquals(0.5, Motions.kernel("exponential", "rate", 2).space().coordinateNormSquared().orElseThrow(), 1e-15);
        assertEquals(1.0 / 3, Motions.kernel("polynomial", "degree", 3, "offset",
                1).space().coordinateNormSquared().orElseThrow(), 1e-15);
        assertFalse(Motions.kernel("gaussian", "scale", 1).space().holdsConstants());
        assertFalse(Motions.kernel("polynomial", "degree", 2, "offset", 0).space().holdsCoordinates());
        assertTrue(Motions.kernel("linear").space().holdsCoordinates());
    }

    @Test
    void theRoomForModesFollowsFromConstantsAndCoordinates() {
        // CHECKS C3.4, C3.11, C3.12 and the proof beside ModeRoom
        assertEquals(ModeRoom.AFFINE, Motions.kernel("exponential", "rate", 2).space().room());
        assertEquals(ModeRoom.AFFINE, Motions.kernel("polynomial", "degree", 3, "offset", 1).space().room());
        assertEquals(ModeRoom.LINEAR, Motions.kernel("polynomial", "degree", 1, "offset", 0).space().room());
        assertEquals(ModeRoom.PRODUCTS, Motions.kernel("polynomial", "degree", 2, "offset", 0).space().room());
        assertEquals(ModeRoom.LINEAR, Motions.kernel("linear").space().room());
        for (String family : List.of("gaussian", "laplacian", "matern32", "matern52")) {
            assertEquals(ModeRoom.STEADY, Motions.kernel(family, "scale", 1).space().room());
        }
        assertFalse(ModeRoom.STEADY.holds(true));
        assertTrue(ModeRoom.STEADY.holds(false) && ModeRoom.LINEAR.holds(true) && ModeRoom.AFFINE.holds(true));
        assertFalse(ModeRoom.PRODUCTS.holds(false));
    }

    /** fᵀ K⁻¹ f on a grid of spacing 1: rises with the grid to the squared norm of f where f is in the space, else without bound. */
    private static double normOnGrid(int reach, DoubleBinaryOperator f) {
        int side = 2 * reach + 1;
        DMatrixRMaj points = new DMatrixRMaj(side * side, 2);
        DMatrixRMaj values = new DMatrixRMaj(side * side, 1);
        for (int i = 0; i < side * side; i++) {
            points.set(i, 0, i / side - reach);
            points.set(i, 1, i % side - reach);
            values.set(i, f.applyAsDouble(points.get(i, 0), points.get(i, 1)));
        }
        DMatrixRMaj weights = new DMatrixRMaj(side * side, 1);
        CommonOps_DDRM.solve(Motions.kernel("gaussian", "scale", 1).matrix(points, points), values, weights);
        return CommonOps_DDRM.dot(values, weights);
    }

    @Test
    void inTwoCoordinatesTheGaussianSpaceHoldsAModeOfSteadyRotationButNotTheCoordinate() {
        // (x + iy) exp(-(x²+y²)/4) turns by e^(iωt) under rotation. Real part: with ‖x e^(-x²/4)‖² = (3/4)^(-3/2) and
        // ‖e^(-y²/4)‖² = (3/4)^(-1/2) (as in CHECKS C3.12, s = 1, α = 1/4) its squared norm is 16/9
        double rotating = normOnGrid(5, (x, y) -> x * Math.exp(-(x * x + y * y) / 4));
        assertTrue(rotating <= 16.0 / 9 && rotating > 0.9 * 16 / 9, "" + rotating);
        double near = normOnGrid(3, (x, y) -> x);
        double far = normOnGrid(6, (x, y) -> x);
        // the mean square over the grid grows like its reach squared, its area likewise: sixteen times
        assertTrue(far > 8 * near, near + " " + far);
    }

    @Test
    void aLabelIsInWordsForPeopleWithSensibleDigits() {
        assertEquals("Gaussian (scale 0.8)", new KernelSpec("gaussian", Map.of("scale", 0.8)).label());
        assertEquals("Gaussian (scale 1.235)", new KernelSpec("gaussian", Map.of("scale", 1.23456789)).label());
        assertEquals("Polynomial (degree 3, offset 1)", new KernelSpec("polynomial", Map.of("offset", 1.0, "degree", 3.0)).label());
        assertEquals("Exponential dot product (rate 120)", new KernelSpec("exponential", Map.of("rate", 120.0)).label());
        assertEquals("Linear", new KernelSpec("linear", Map.of()).label(), "without parameters no brackets");
        assertEquals("of-an-extension", new KernelSpec("of-an-extension", Map.of()).label());
    }

    @Test
    void theScaleOfAKernelIsThatOfItsRateToo() {
        assertEquals(0.8, new KernelSpec("gaussian", Map.of("scale", 0.8)).scale().orElseThrow());
        assertEquals(5, new KernelSpec("exponential", Map.of("rate", 0.04)).scale().orElseThrow(), 1e-14);
        assertTrue(new KernelSpec("linear", Map.of()).scale().isEmpty());
    }

    @Test
    void theScaleHeuristicIsTheMedianDistance() {
        // distances of 0, 1, 3: 1, 2, 3
        assertEquals(2, ScaleHeuristic.medianDistance(Motions.column(0, 1, 3)), 1e-15);
        assertThrows(FitFault.class, () -> ScaleHeuristic.medianDistance(Motions.column(1, 1, 1, 1, 2)));
        assertThrows(FitFault.class, () -> ScaleHeuristic.medianDistance(Motions.column(1)));
    }

    @Test
    void theScaleHeuristicHoldsForManyStates() {
        double[] even = new double[20001];
        for (int i = 0; i < even.length; i++) {
            even[i] = i / 20000.0;
        }
        // distances of evenly spread points on [0, 1] have the density 2(1-d): median 1 - √½
        assertEquals(1 - Math.sqrt(0.5), ScaleHeuristic.medianDistance(Motions.column(even)), 2e-3);
    }
}
