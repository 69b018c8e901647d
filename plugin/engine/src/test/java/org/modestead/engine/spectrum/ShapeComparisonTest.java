package org.modestead.engine.spectrum;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.ZMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.FitFault;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;

/** Modes of two recordings are held against each other by shape and frequency. */
class ShapeComparisonTest {

    private static final ComparisonLimits LIMITS = new ComparisonLimits(0.8, 0.2);

    static Spectrum spectrum(List<String> channels, double[] scale, List<Mode> modes) {
        ZMatrixRMaj none = new ZMatrixRMaj(1, 1);
        int n = channels.size();
        return new Spectrum(List.of(), List.of(), none, none, none, modes, channels.stream().map(name -> new Channel(name, "")).toList(),
                DelayEmbedding.NONE, new Preparation(0, new double[n], new double[n], scale), "s", List.of());
    }

    static Mode mode(int number, double growth, double frequency, Complex... shape) {
        return new Mode(number, List.of(number - 1), new Complex(growth, 2 * Math.PI * frequency), 1, 0.5, 0, List.of(shape), false, 0);
    }

    static Complex re(double value) {
        return new Complex(value, 0);
    }

    /** The chain of CHECKS C4.4, three masses between two walls: shape k is sin(jkπ/4). */
    private static Mode chainMode(int number, int k, double frequency, Complex factor) {
        return mode(number, -0.01, frequency, IntStream.rangeClosed(1, 3)
                .mapToObj(j -> factor.times(Math.sin(j * k * Math.PI / 4))).toArray(Complex[]::new));
    }

    private static final double[] ONES = {1, 1, 1};
    private static final List<String> MASSES = List.of("m1", "m2", "m3");

    private static Spectrum chain() {
        return spectrum(MASSES, ONES, List.of(chainMode(1, 1, 0.1218, re(1)), chainMode(2, 2, 0.2251, re(1)), chainMode(3, 3, 0.2941, re(1))));
    }

    @Test
    void aSpectrumAgainstItselfIsOneOnTheDiagonalAndNothingBesideItForAChain() {
        ShapeComparison compared = ShapeComparison.of(chain(), chain(), ShapeScaling.PREPARED, LIMITS, 9);
        assertEquals(9, compared.pairs().size());
        for (ShapeComparison.Pair pair : compared.pairs()) {
            boolean same = pair.a().number() == pair.b().number();
            // sin(jkπ/4) are orthogonal over j = 1, 2, 3: closed form
            assertEquals(same ? 1 : 0, pair.assurance(), 1e-15);
            assertEquals(same, pair.paired());
        }
    }

    @Test
    void modesPairUpWhateverTheirOrderAndComplexFactor() {
        Spectrum later = spectrum(MASSES, ONES, List.of(chainMode(1, 3, 0.28, new Complex(0, -3)), chainMode(2, 1, 0.12, new Complex(2, 1))));
        List<ShapeComparison.Pair> paired = ShapeComparison.of(chain(), later, ShapeScaling.PREPARED, LIMITS, 9).pairs().stream()
                .filter(ShapeComparison.Pair::paired).toList();
        assertEquals(List.of(1, 3), paired.stream().map(pair -> pair.a().number()).toList());
        assertEquals(List.of(2, 1), paired.stream().map(pair -> pair.b().number()).toList());
        assertEquals(0.12 / 0.1218 - 1, paired.get(0).frequencyChange(), 1e-12);
        assertTrue(paired.stream().allMatch(pair -> Math.abs(pair.assurance() - 1) < 1e-15));
    }

    @Test
    void valuesOfCheckC46ReachThePairs() {
        // CHECKS C4.6: (1,2,3) against (1,2,4) 289/294; (1,i) against (1,-i) 0
        Spectrum a = spectrum(MASSES, ONES, List.of(mode(1, 0, 1, re(1), re(2), re(3))));
        Spectrum b = spectrum(MASSES, ONES, List.of(mode(1, 0, 1, re(1), re(2), re(4))));
        assertEquals(0.982993197278912, ShapeComparison.of(a, b, ShapeScaling.PREPARED, LIMITS, 1).pairs().get(0).assurance(), 1e-15);
        Spectrum right = spectrum(List.of("x", "y"), new double[] {1, 1}, List.of(mode(1, 0, 1, re(1), new Complex(0, 1))));
        Spectrum left = spectrum(List.of("x", "y"), new double[] {1, 1}, List.of(mode(1, 0, 1, re(1), new Complex(0, -1))));
        ShapeComparison.Pair turned = ShapeComparison.of(right, left, ShapeScaling.PREPARED, LIMITS, 1).pairs().get(0);
        assertEquals(0, turned.assurance(), 1e-15);
        assertTrue(!turned.paired());
    }

    @Test
    void scalesOfThePreparationAreUndoneBeforeShapesAreCompared() {
        // one shape (4, 9) in recorded units, prepared with other scales each time
        Spectrum a = spectrum(List.of("p", "q"), new double[] {4, 9}, List.of(mode(1, 0, 1, re(1), re(1))));
        Spectrum b = spectrum(List.of("q", "p"), new double[] {1, 0.5}, List.of(mode(1, 0, 1, re(9), re(8))));
        for (ShapeScaling scaling : ShapeScaling.values()) {
            assertEquals(1, ShapeComparison.of(a, b, scaling, LIMITS, 1).pairs().get(0).assurance(), 1e-15, scaling.name());
        }
        // (4, 9) against (4, 0) in recorded units: 16²/(97·16); divided by the scales (4, 9) of both it is (1, 1) against (1, 0): 1/2
        Spectrum one = spectrum(List.of("p", "q"), new double[] {4, 9}, List.of(mode(1, 0, 1, re(1), re(0))));
        assertEquals(16.0 / 97, ShapeComparison.of(a, one, ShapeScaling.RECORDED, LIMITS, 1).pairs().get(0).assurance(), 1e-15);
        assertEquals(0.5, ShapeComparison.of(a, one, ShapeScaling.PREPARED, LIMITS, 1).pairs().get(0).assurance(), 1e-15);
    }

    @Test
    void onlyCommonChannelsCountAndTheOthersAreTold() {
        Spectrum a = spectrum(List.of("x", "y", "z"), ONES, List.of(mode(1, 0, 1, re(1), re(2), re(50))));
        Spectrum b = spectrum(List.of("y", "w", "x"), ONES, List.of(mode(1, 0, 1, re(4), re(-70), re(2))));
        ShapeComparison compared = ShapeComparison.of(a, b, ShapeScaling.PREPARED, LIMITS, 1);
        assertEquals(List.of("x", "y"), compared.channels());
        assertEquals(List.of("z", "w"), compared.leftOut());
        assertEquals(1, compared.pairs().get(0).assurance(), 1e-15);
        FitFault fault = assertThrows(FitFault.class, () -> ShapeComparison.of(a, chain(), ShapeScaling.PREPARED, LIMITS, 1));
        assertTrue(fault.getMessage().contains("x, y, z") && fault.getMessage().contains("m1, m2, m3"), fault.getMessage());
    }

    @Test
    void anOscillationIsNeverPairedWithADecayNorWithOneFarAway() {
        Spectrum a = spectrum(List.of("x"), new double[] {1}, List.of(mode(1, -0.1, 1, re(1)), mode(2, -0.5, 0, re(1))));
        Spectrum b = spectrum(List.of("x"), new double[] {1}, List.of(mode(1, -0.1, 0, re(1)), mode(2, -0.1, 1.5, re(1)),
                mode(3, -0.45, 0, re(1))));
        List<ShapeComparison.Pair> paired = ShapeComparison.of(a, b, ShapeScaling.PREPARED, LIMITS, 9).pairs().stream()
                .filter(ShapeComparison.Pair::paired).toList();
        assertEquals(1, paired.size());
        assertEquals(2, paired.get(0).a().number());
        assertEquals(3, paired.get(0).b().number());
        assertTrue(Double.isNaN(paired.get(0).frequencyChange()));
    }

    @Test
    void sharesOfGroupsAddUpToOneAndTellPhaseAndAgreement() {
        Spectrum spectrum = spectrum(List.of("a1", "a2", "b1", "b2"), new double[] {1, 1, 1, 1},
                List.of(mode(1, 0, 1, new Complex(0, 2), new Complex(0, 2), re(1), re(-1))));
        List<ChannelGroup.Share> shares = ChannelGroup.shares(spectrum, spectrum.modes().get(0),
                List.of(new ChannelGroup("a", List.of(0, 1)), new ChannelGroup("b", List.of(2, 3)), new ChannelGroup("b1", List.of(2))));
        assertEquals(0.8, shares.get(0).energyShare(), 1e-15);
        assertEquals(0.2, shares.get(1).energyShare(), 1e-15);
        assertEquals(1, shares.get(0).magnitude(), 1e-15);
        assertEquals(0.5, shares.get(1).magnitude(), 1e-15);
        assertEquals(0, shares.get(0).phase(), 1e-15, "it moves most");
        assertEquals(1, shares.get(0).inStep(), 1e-15);
        assertEquals(0, shares.get(1).inStep(), 1e-15, "its channels cancel");
        assertEquals(-Math.PI / 2, shares.get(2).phase(), 1e-15, "a quarter cycle behind");
        assertThrows(IllegalArgumentException.class, () -> new ChannelGroup("none", List.of()));
    }
}
