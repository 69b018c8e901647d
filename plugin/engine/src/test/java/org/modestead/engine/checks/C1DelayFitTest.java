package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Comparator;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.ThinSvd;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.SpectrumExtractor;

/** CHECKS C1.1: three decaying exponentials with certified answers (NIST StRD nonlinear regression, Lanczos1). */
class C1DelayFitTest {

    private static final double STEP = 0.05;
    /** NIST StRD Lanczos1, certified. */
    private static final double[] RATES = {1.0000000001, 3.0000000002, 5.0000000001};
    /** NIST StRD Lanczos1, certified. */
    private static final double[] AMPLITUDES = {0.095100000027, 0.86070000013, 1.5575999998};
    /** Rounding of the 14 printed digits, magnified by the fit; CHECKS C1.1 asks 1e-8 and 2e-8 for depths 4 to 20. */
    private static final double RATE_TOLERANCE = 1e-8;
    private static final double AMPLITUDE_TOLERANCE = 2e-8;

    private static Snapshots lanczos(int depth) {
        ReferenceTable table = ReferenceTable.read("nist_lanczos1.csv");
        double[] times = new double[table.rows().size()];
        DMatrixRMaj values = new DMatrixRMaj(times.length, 1);
        for (int k = 0; k < times.length; k++) {
            times[k] = table.number(k, 0);
            values.set(k, 0, table.number(k, 1));
        }
        return Fits.snapshots(STEP, depth, List.of(new Run("lanczos", times, values)));
    }

    /** Squared singular values from the fourth on are rounding: a share of 1 - 1e-12 leaves exactly them out. */
    static FittedOperator fit(int depth) {
        return fit(depth, NoiseCorrection.NONE);
    }

    private static FittedOperator fit(int depth, NoiseCorrection correction) {
        return OperatorFitter.fit(lanczos(depth), new LinearEstimator(correction), new RankRule.Energy(1 - 1e-12), 0,
                Progress.NONE);
    }

    static List<Mode> slowestFirst(FittedOperator operator) {
        Spectrum spectrum = SpectrumExtractor.extract(operator, Progress.NONE);
        return spectrum.modes().stream().sorted(Comparator.comparingDouble(mode -> -mode.rate().re())).toList();
    }

    @ParameterizedTest
    @ValueSource(ints = {4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18, 19, 20})
    void certifiedRatesAndAmplitudesAtEveryDepthWithTheRankDecidedByTheEngine(int depth) {
        for (NoiseCorrection correction : NoiseCorrection.values()) {
            FittedOperator operator = fit(depth, correction);
            assertEquals(3, operator.rank());
            List<Mode> modes = slowestFirst(operator);
            for (int j = 0; j < 3; j++) {
                String which = j + " by " + correction;
                assertEquals(0, modes.get(j).rate().im());
                assertEquals(-RATES[j], modes.get(j).rate().re(), RATE_TOLERANCE * RATES[j], "rate " + which);
                assertEquals(AMPLITUDES[j], modes.get(j).amplitude(), AMPLITUDE_TOLERANCE * AMPLITUDES[j],
                        "amplitude " + which);
            }
        }
    }

    @Test
    void multipliersAreExponentialsOfTheRates() {
        // closed form: e^-0.05, e^-0.15, e^-0.25, printed to 12 digits in CHECKS C1.1
        double[] expected = {0.951229424501, 0.860707976425, 0.778800783071};
        List<Mode> modes = slowestFirst(fit(8));
        for (int j = 0; j < 3; j++) {
            assertEquals(expected[j], modes.get(j).rate().times(STEP).exp().re(), RATE_TOLERANCE * RATES[j] * STEP,
                    "multiplier " + j);
        }
    }

    @Test
    void singularValuesOfTheTwelveRowDelayMatrixShowTheGap() {
        // derived with the figures of CHECKS C1.1, which prints five digits; the last is rounding of the printed data
        DMatrixRMaj delayed = lanczos(12).states(Snapshots.Part.TRAINING).get(0).states();
        double[] singular = ThinSvd.of(delayed, 12).values();
        assertEquals(7.7015, singular[0], 5e-5);
        assertEquals(0.20078, singular[1], 5e-6);
        assertEquals(2.6632e-3, singular[2], 5e-8);
        assertEquals(4.4e-13, singular[3], 0.5e-13);
        assertTrue(singular[2] / singular[3] > 5e9, "gap of about 6e9");
    }

    @Test
    void theHardThresholdDecidesTheSameRank() {
        for (int depth = 10; depth <= 14; depth++) {
            FittedOperator operator = OperatorFitter.fit(lanczos(depth), new LinearEstimator(),
                    new RankRule.HardThreshold(), 0, Progress.NONE);
            assertEquals(3, operator.rank(), "depth " + depth + ": " + operator.rankChoice());
        }
    }
}
