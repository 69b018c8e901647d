package org.modestead.engine.spectrum;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.JudgeSettings;
import org.modestead.engine.wellposed.Verdict;

/** Signals of a multiple eigenvalue, CHECKS C2.18: one cluster, never a slow oscillation. */
class DefectiveSignalsTest {

    private static Snapshots drift(int depth) {
        return Motions.snapshots(1, depth, List.of(Motions.run("a", 60, 1, t -> new double[] {2 + 3 * t})), List.of());
    }

    private static Snapshots fadingRamp(int depth) {
        return Motions.snapshots(0.1, depth, List.of(Motions.run("a", 60, 0.1, t -> new double[] {t * Math.exp(-t)})),
                List.of());
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 3, 4, 5, 6, 7, 8, 9, 10})
    void aDriftIsOneClusterAtRateZeroWithoutOscillation(int depth) {
        Spectrum spectrum = Motions.spectrum(drift(depth), new LinearEstimator(), 2);
        assertEquals(1, spectrum.modes().size());
        Mode mode = spectrum.modes().get(0);
        assertNotEquals(0, mode.cluster());
        assertFalse(mode.oscillates());
        // the pair splits by the square root of rounding, its mean stays at rounding of the condition
        assertEquals(0, mode.rate().re(), 1e-7);
        assertFalse(mode.constant(), "2 + 3k is not the constant function");
        assertTrue(spectrum.doubts().stream().anyMatch(doubt -> doubt.code().equals("nearly-defective")));
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 3, 4, 5, 6, 7, 8, 9, 10})
    void aFadingRampIsOneClusterAtItsRateWithoutOscillation(int depth) {
        Spectrum spectrum = Motions.spectrum(fadingRamp(depth), new LinearEstimator(), 2);
        assertEquals(1, spectrum.modes().size());
        assertFalse(spectrum.modes().get(0).oscillates());
        assertEquals(-1, spectrum.modes().get(0).rate().re(), 1e-6);
        assertEquals(1, spectrum.modes().get(0).energyShare(), 1e-12);
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 3, 4})
    void aPolynomialInTimeIsOneClusterHoweverManyEigenvaluesItTakes(int degree) {
        // degree d: eigenvalue 1 with a Jordan block of size d + 1, split by the (d+1)-th root of rounding
        Snapshots snapshots = Motions.snapshots(1, degree + 1, List.of(Motions.run("a", 40, 1, t -> new double[] {
            Math.pow((t - 20) / 20, degree) + 0.3 * t / 20 + 1})), List.of());
        Spectrum spectrum = Motions.spectrum(snapshots, new LinearEstimator(), degree + 1);
        assertEquals(1, spectrum.modes().size(), spectrum.modes().toString());
        assertEquals(degree + 1, spectrum.modes().get(0).indices().size());
        assertFalse(spectrum.modes().get(0).oscillates());
        // the mean of the members is the trace, good to rounding times the condition of the whitening
        assertEquals(0, spectrum.modes().get(0).rate().re(), 1e-8);
    }

    @Test
    void threeSlowDecaysAreNoCluster() {
        // multipliers 0.99, 0.98 and 0.97: a hundredth apart, where rounding reaches a thousandth
        Snapshots snapshots = Motions.snapshots(1, 3, List.of(Motions.run("a", 300, 1, t -> new double[] {
            Math.pow(0.99, t) + Math.pow(0.98, t) + Math.pow(0.97, t)})), List.of());
        Spectrum spectrum = Motions.spectrum(snapshots, new LinearEstimator(), 3);
        assertEquals(3, spectrum.modes().size());
        assertTrue(spectrum.modes().stream().allMatch(mode -> mode.cluster() == 0));
    }

    @Test
    void aClusterDriftsByVerdict() {
        Verdict verdict = Motions.judge(Motions.fit(drift(4), new LinearEstimator(), 2), JudgeSettings.DEFAULT);
        assertEquals(Grade.DRIFTS, verdict.overall().grade());
        assertTrue(verdict.overall().decidedBy().contains("clustered-eigenvalues"));
    }

    @ParameterizedTest
    @ValueSource(ints = {4, 5, 6, 8})
    void anOscillationThatGrowsWithTimeIsOneModeAtItsFrequency(int depth) {
        Snapshots snapshots = Motions.snapshots(0.1, depth, List.of(Motions.run("a", 200, 0.1,
                t -> new double[] {(1 + t) * Math.exp(-0.2 * t) * Math.cos(3 * t)})), List.of());
        Spectrum spectrum = Motions.spectrum(snapshots, new LinearEstimator(), 4);
        assertEquals(1, spectrum.modes().size(), spectrum.modes().toString());
        Mode mode = spectrum.modes().get(0);
        assertEquals(4, mode.indices().size());
        // closed form; the mean of a split pair is good to about rounding times the condition
        assertEquals(3, mode.rate().im(), 1e-5);
        assertEquals(-0.2, mode.rate().re(), 1e-5);
        assertEquals(1, mode.energyShare(), 1e-9);
        assertEquals(1, mode.amplitude(), 1e-6);
    }

    @Test
    void aSlowOscillationSampledFinelyIsNoCluster() {
        Snapshots snapshots = Motions.snapshots(0.01, 4, List.of(Motions.run("a", 2000, 0.01,
                t -> new double[] {Math.cos(0.5 * t), Math.sin(0.5 * t + 0.3)})), List.of());
        Spectrum spectrum = Motions.spectrum(snapshots, new LinearEstimator(), 2);
        assertEquals(1, spectrum.modes().size());
        assertEquals(0, spectrum.modes().get(0).cluster());
        assertEquals(0.5, spectrum.modes().get(0).rate().im(), 1e-9);
    }

    @Test
    void equalRatesWithIndependentShapesAreNoCluster() {
        // two channels that decay alike from unrelated starts: a repeated eigenvalue with two eigenfunctions
        Snapshots snapshots = Motions.snapshots(0.1, 1, List.of(
                Motions.run("a", 30, 0.1, t -> new double[] {Math.exp(-t), 0.3 * Math.exp(-t)}),
                Motions.run("b", 30, 0.1, t -> new double[] {-0.2 * Math.exp(-t), Math.exp(-t)})), List.of());
        Spectrum spectrum = Motions.spectrum(snapshots, new LinearEstimator(), 2);
        assertEquals(2, spectrum.modes().size());
        assertTrue(spectrum.modes().stream().allMatch(mode -> mode.cluster() == 0 && !mode.oscillates()));
    }
}
