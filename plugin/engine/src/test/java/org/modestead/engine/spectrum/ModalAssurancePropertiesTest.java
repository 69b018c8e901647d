package org.modestead.engine.spectrum;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.stream.IntStream;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.Combinators;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;
import org.modestead.engine.linalg.Complex;

/** What must hold of the modal assurance of any two shapes. */
class ModalAssurancePropertiesTest {

    @Provide
    Arbitrary<Complex> component() {
        // away from zero, so that no shape vanishes
        Arbitrary<Double> part = Arbitraries.doubles().between(0.01, 10).map(value -> Math.rint(value * 1000) / 1000);
        return Combinators.combine(part, part, Arbitraries.integers().between(0, 3)).as((re, im, quarter) ->
                IntStream.range(0, quarter).boxed().reduce(new Complex(re, im), (z, k) -> z.times(new Complex(0, 1)), (z, w) -> z));
    }

    @Provide
    Arbitrary<List<Complex>> shape() {
        return component().list().ofSize(4);
    }

    @Property(tries = 300, seed = "20261201")
    void itLiesBetweenZeroAndOneAndIsSymmetric(@ForAll("shape") List<Complex> a, @ForAll("shape") List<Complex> b) {
        double value = ModalAssurance.of(a, b);
        assertTrue(value >= 0 && value <= 1);
        assertEquals(value, ModalAssurance.of(b, a), 1e-14);
    }

    @Property(tries = 300, seed = "20261201")
    void aComplexFactorOnEitherLeavesItAlone(@ForAll("shape") List<Complex> a, @ForAll("shape") List<Complex> b,
            @ForAll("component") Complex factor) {
        List<Complex> turned = a.stream().map(z -> z.times(factor)).toList();
        assertEquals(ModalAssurance.of(a, b), ModalAssurance.of(turned, b), 1e-13);
        assertEquals(1, ModalAssurance.of(a, turned), 1e-14);
    }

    @Property(tries = 100, seed = "20261201")
    void comparedSpectraShowItForEveryPair(@ForAll("shape") List<Complex> a, @ForAll("shape") List<Complex> b,
            @ForAll("component") Complex factor) {
        Spectrum first = spectrum(a, b, new Complex(1, 0));
        Spectrum second = spectrum(a, b, factor);
        List<ShapeComparison.Pair> plain = compare(first, first);
        List<ShapeComparison.Pair> turned = compare(first, second);
        for (int k = 0; k < plain.size(); k++) {
            assertEquals(plain.get(k).assurance(), turned.get(k).assurance(), 1e-13);
        }
        assertEquals(1, plain.get(0).assurance(), 1e-14);
        assertEquals(1, plain.get(3).assurance(), 1e-14);
    }

    private static List<ShapeComparison.Pair> compare(Spectrum a, Spectrum b) {
        return ShapeComparison.of(a, b, ShapeScaling.PREPARED, new ComparisonLimits(0.8, 0.2), 2).pairs();
    }

    private static Spectrum spectrum(List<Complex> a, List<Complex> b, Complex factor) {
        return ShapeComparisonTest.spectrum(List.of("p", "q", "r", "s"), new double[] {1, 2, 3, 4}, List.of(
                ShapeComparisonTest.mode(1, -0.1, 1, a.stream().map(z -> z.times(factor)).toArray(Complex[]::new)),
                ShapeComparisonTest.mode(2, -0.1, 2, b.toArray(Complex[]::new))));
    }
}
