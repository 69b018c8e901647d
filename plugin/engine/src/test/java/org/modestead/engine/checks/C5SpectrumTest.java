package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.stream.DoubleStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.refine.RateModel;
import org.modestead.engine.refine.RateRefinement;
import org.modestead.engine.refine.RateTerm;
import org.modestead.engine.refine.RefinedRates;
import org.modestead.engine.spectrum.ModalExpansion;

/**
 * CHECKS C5.9 and C5.10: what classical models say of the sunspots and the lynx, by the engine's own fits where these
 * are the same thing.
 */
class C5SpectrumTest {

    private static final double[] LYNX = RecordedSeries.lynx();
    private static final double[] LOGARITHM = DoubleStream.of(LYNX).map(Math::log10).toArray();

    /** y_(t+1) = c + a y_t + b y_(t-1). */
    private record Autoregression(double first, double second, double constant, double period) {

        /**
         * Least squares with a constant is the step map on 1, y_t and y_(t-1): its eigenvalues are 1 and the two roots,
         * and c is where it carries the state (0, 0).
         */
        static Autoregression of(double[] y) {
            FittedOperator operator = Fits.fit(Fits.snapshots(1, 2, List.of(RecordedSeries.run(y))),
                    new DictionaryEstimator(Dictionary.monomials(1)), 3);
            Complex root = ModalExpansion.of(operator.chosen()).eigenvalues().stream()
                    .max(Comparator.comparingDouble(Complex::im)).orElseThrow();
            DMatrixRMaj origin = operator.chosen().evaluate(new DMatrixRMaj(1, 2));
            DMatrixRMaj next = Matrices.product(Matrices.product(origin, operator.propagator(1)),
                    operator.chosen().observable());
            return new Autoregression(2 * root.re(), -root.abs() * root.abs(), next.data[0], 2 * Math.PI / root.arg());
        }
    }

    @Test
    void autoregressionOfSunspots() {
        // CHECKS C5.9, derived, digits printed; Box and Jenkins, series E, quote 1.42, -0.73, 14.35
        Autoregression fit = Autoregression.of(RecordedSeries.sunspots(1770, 1869));
        assertEquals(1.40322155, fit.first(), 5e-9);
        assertEquals(-0.70985190, fit.second(), 5e-9);
        assertEquals(14.5425, fit.constant(), 5e-5);
        assertEquals(10.708, fit.period(), 5e-4);
    }

    @Test
    void autoregressionOfSunspotsAfterYule() {
        // CHECKS C5.9, derived, digits printed; Yule 1927 quotes 1.34254, -0.65504 and a period of 10.600
        Autoregression fit = Autoregression.of(RecordedSeries.sunspots(1749, 1924));
        assertEquals(1.33595, fit.first(), 5e-6);
        assertEquals(-0.64985, fit.second(), 5e-6);
        assertEquals(10.575, fit.period(), 5e-4);
    }

    @Test
    void autoregressionOfTheLogarithmOfLynx() {
        // CHECKS C5.10, derived, digits printed; Moran 1953 quotes 1.41, -0.77 and a period of 9.852
        Autoregression fit = Autoregression.of(LOGARITHM);
        assertEquals(1.38423771, fit.first(), 5e-9);
        assertEquals(-0.74777572, fit.second(), 5e-9);
        assertEquals(1.05760, fit.constant(), 5e-6);
        assertEquals(9.774, fit.period(), 5e-4);
    }

    /** The best single line near a start: a periodogram's peak, but for the mean, which is fitted along. */
    private static double line(double[] y, double start) {
        RefinedRates refined = RateRefinement.refine(
                new RateModel(List.of(RateTerm.constant(), RateTerm.periodic(start, true))), List.of(RecordedSeries.run(y)),
                Progress.NONE);
        assertEquals(RefinedRates.Convergence.CONVERGED, refined.convergence());
        return C1OptimisedFitTest.period(refined, 1);
    }

    /** The mean, fitted or taken out before, moves a line by less than a twentieth of its width T²/N. */
    private static void assertLine(double printed, double digit, double[] y) {
        double width = printed * printed / y.length;
        assertEquals(printed, line(y, printed), digit / 2 + width / 20);
    }

    @ParameterizedTest
    @CsvSource({"11.04, 0.01", "10.0, 0.1", "10.5, 0.1", "12.0, 0.1", "100, 1"})
    void linesOfSunspots(double printed, double digit) {
        // CHECKS C5.9: peaks of the periodogram of 1700 to 1988
        assertLine(printed, digit, RecordedSeries.sunspots(1700, 1988));
    }

    @Test
    void theLineNearElevenYearsIsTheStrongest() {
        double[] y = RecordedSeries.sunspots(1700, 1988);
        for (double other : new double[] {10, 10.5, 12, 100}) {
            assertTrue(rest(y, 11.04) < rest(y, other), "against " + other);
        }
    }

    private static double rest(double[] y, double start) {
        return RateRefinement.refine(new RateModel(List.of(RateTerm.constant(), RateTerm.periodic(start, true))),
                List.of(RecordedSeries.run(y)), Progress.NONE).residualSum();
    }

    @Test
    void strongestLineOfSunspotsTo2008() {
        // CHECKS C5.9
        assertLine(10.99, 0.01, RecordedSeries.sunspots());
    }

    @Test
    void strongestLineOfLynx() {
        // CHECKS C5.10: 9.65 as counted and as logarithm; Elton and Nicholson 1942 say 9.6 years
        assertLine(9.65, 0.01, LYNX);
        assertLine(9.65, 0.01, LOGARITHM);
    }

    @Test
    void sunspotsAverageAsPublished() {
        // CHECKS C5.9: the figures as they stood in 1988
        assertEquals(48.6134948097, Arrays.stream(RecordedSeries.sunspots(1700, 1988)).average().orElseThrow(), 5e-11);
    }
}
