package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.refine.RateModel;
import org.modestead.engine.refine.RateRefinement;
import org.modestead.engine.refine.RateTerm;
import org.modestead.engine.refine.RefinedRates;
import org.modestead.engine.spectrum.Spectrum;

/** CHECKS C1.1 to C1.4 and C7.5: the optimised fit reaches certified values (NIST StRD nonlinear regression). */
class C1OptimisedFitTest {

    private static final ReferenceTable CERTIFIED = ReferenceTable.read("nist_certified.csv");
    private static final int VALUE = 2;
    private static final int DEVIATION = 3;

    /** A figure of the table of certified values; start values are in columns 4 and 5. */
    private static double certified(String dataset, String quantity, int column) {
        int row = IntStream.range(0, CERTIFIED.rows().size()).filter(i -> CERTIFIED.rows().get(i)[0].equals(dataset)
                && CERTIFIED.rows().get(i)[1].equals(quantity)).findFirst().orElseThrow();
        return CERTIFIED.number(row, column);
    }

    static Run recorded(String file) {
        ReferenceTable table = ReferenceTable.read(file);
        double[] times = new double[table.rows().size()];
        DMatrixRMaj values = new DMatrixRMaj(times.length, 1);
        for (int k = 0; k < times.length; k++) {
            times[k] = table.number(k, 0);
            values.set(k, 0, table.number(k, 1));
        }
        return new Run(file, times, values);
    }

    private static RefinedRates refine(RateModel start, String file) {
        RefinedRates refined = RateRefinement.refine(start, List.of(recorded(file)), Progress.NONE);
        assertEquals(RefinedRates.Convergence.CONVERGED, refined.convergence(), () -> "after "
                + refined.iterations() + " steps, offset " + refined.offset());
        return refined;
    }

    private static RateModel decays(String dataset, int start) {
        List<RateTerm> terms = new ArrayList<>();
        for (String rate : List.of("b2", "b4", "b6")) {
            terms.add(new RateTerm.Real(-certified(dataset, rate, start), true));
        }
        return new RateModel(terms);
    }

    /** Index of the terms, slowest decay first. */
    static List<Integer> slowestFirst(RefinedRates refined) {
        return IntStream.range(0, 3).boxed().sorted(Comparator.comparingDouble(j -> -growth(refined, j))).toList();
    }

    static double growth(RefinedRates refined, int term) {
        return ((RateTerm.Real) refined.model().terms().get(term)).growth();
    }

    @ParameterizedTest
    @ValueSource(ints = {4, 5})
    void lanczos1FromBothStarts(int start) {
        RefinedRates refined = refine(decays("Lanczos1", start), "nist_lanczos1.csv");
        List<Integer> order = slowestFirst(refined);
        for (int j = 0; j < 3; j++) {
            double rate = certified("Lanczos1", "b" + (2 * j + 2), VALUE);
            double weight = certified("Lanczos1", "b" + (2 * j + 1), VALUE);
            // tolerance of CHECKS C1.1
            assertEquals(-rate, growth(refined, order.get(j)), 1e-8 * rate);
            assertEquals(weight, refined.weights().get(0).get(order.get(j), 0), 2e-8 * weight);
        }
        // the certified sum is 1.4e-25; residuals of 1e-13 are a few hundred roundings of samples up to 2.5
        assertEquals(certified("Lanczos1", "Residual_Sum_of_Squares", VALUE), refined.residualSum(), 5e-27);
    }

    @ParameterizedTest
    @ValueSource(ints = {4, 5})
    void lanczos3FromBothStarts(int start) {
        assertLanczos3(refine(decays("Lanczos3", start), "nist_lanczos3.csv"));
    }

    @ParameterizedTest
    @ValueSource(ints = {8, 10, 12})
    void lanczos3FromADelayFit(int depth) {
        assertLanczos3(refine(delayFit(depth), "nist_lanczos3.csv"));
    }

    private static RateModel delayFit(int depth) {
        Snapshots snapshots = Fits.snapshots(0.05, depth, List.of(recorded("nist_lanczos3.csv")));
        Spectrum spectrum = Fits.spectrum(snapshots, new LinearEstimator(), 3);
        return new RateModel(spectrum.modes().stream().map(mode -> RateTerm.from(mode.rate())).toList());
    }

    private static void assertLanczos3(RefinedRates refined) {
        double sum = certified("Lanczos3", "Residual_Sum_of_Squares", VALUE);
        assertEquals(sum, refined.residualSum(), 1e-6 * sum, "tolerance of CHECKS C1.2");
        assertEquals(18, refined.degreesOfFreedom());
        List<Integer> order = slowestFirst(refined);
        for (int j = 0; j < 3; j++) {
            String b = "b" + (2 * j + 2);
            double rate = certified("Lanczos3", b, VALUE);
            double deviation = certified("Lanczos3", b, DEVIATION);
            // eleven certified digits; the search ends within 1e-6 standard errors
            assertEquals(-rate, growth(refined, order.get(j)), 1e-6 * deviation);
            assertEquals(deviation, refined.growthErrors()[order.get(j)], 1e-6 * deviation);
            double weight = certified("Lanczos3", "b" + (2 * j + 1), VALUE);
            assertEquals(weight, refined.weights().get(0).get(order.get(j), 0),
                    1e-6 * certified("Lanczos3", "b" + (2 * j + 1), DEVIATION));
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {4, 5})
    void ensoWithAConstantAndTheYearFixed(int start) {
        RefinedRates refined = enso(start);
        assertPeriod(refined, 2, "b4");
        assertPeriod(refined, 3, "b7");
        DMatrixRMaj weights = refined.weights().get(0);
        // the mean, then cosine and sine of the year, of the slow and of the fast cycle
        String[] names = {"b1", "b2", "b3", "b5", "b6", "b8", "b9"};
        for (int i = 0; i < names.length; i++) {
            double tolerance = 1e-6 * certified("ENSO", names[i], DEVIATION);
            assertEquals(certified("ENSO", names[i], VALUE), weights.get(i, 0), tolerance, names[i]);
        }
        double sum = certified("ENSO", "Residual_Sum_of_Squares", VALUE);
        // eleven certified digits
        assertEquals(sum, refined.residualSum(), 1e-9 * sum);
        assertEquals(certified("ENSO", "Residual_Standard_Deviation", VALUE), refined.residualDeviation(), 1e-9);
    }

    /** A constant, the year, and the slow and the fast cycle, in this order. */
    static RefinedRates enso(int start) {
        return refine(new RateModel(List.of(RateTerm.constant(), RateTerm.periodic(12, false),
                RateTerm.periodic(certified("ENSO", "b4", start), true),
                RateTerm.periodic(certified("ENSO", "b7", start), true))), "nist_enso.csv");
    }

    static double period(RefinedRates refined, int term) {
        return 2 * Math.PI / ((RateTerm.Pair) refined.model().terms().get(term)).angular();
    }

    private static void assertPeriod(RefinedRates refined, int term, String name) {
        double period = period(refined, term);
        double angular = 2 * Math.PI / period;
        assertEquals(certified("ENSO", name, VALUE), period, 1e-6, "tolerance of CHECKS C1.3");
        double deviation = certified("ENSO", name, DEVIATION);
        // dT = 2π/ω² dω
        assertEquals(deviation, period / angular * refined.angularErrors()[term], 1e-6 * deviation);
        assertEquals(0, refined.growthErrors()[term], "steady by construction");
    }

    @ParameterizedTest
    @ValueSource(ints = {4, 5})
    void misra1aAtUnevenTimesWithTiedWeights(int start) {
        RefinedRates refined = misra1a(start);
        double rate = certified("Misra1a", "b2", VALUE);
        double weight = certified("Misra1a", "b1", VALUE);
        double sum = certified("Misra1a", "Residual_Sum_of_Squares", VALUE);
        assertEquals(-rate, growth(refined, 1), 1e-6 * rate, "tolerance of CHECKS C1.4");
        assertEquals(weight, refined.weights().get(0).get(0, 0), 1e-6 * weight);
        assertEquals(sum, refined.residualSum(), 1e-9 * sum);
        double deviation = certified("Misra1a", "b2", DEVIATION);
        assertEquals(deviation, refined.growthErrors()[1], 1e-6 * deviation);
        assertEquals(12, refined.degreesOfFreedom());
    }

    /** y = b1 (1 - e^(-b2 x)): one weight for both functions, the constant first. */
    static RefinedRates misra1a(int start) {
        RateTerm rise = new RateTerm.Real(-certified("Misra1a", "b2", start), true);
        RateModel model = new RateModel(List.of(RateTerm.constant(), rise),
                Optional.of(new DMatrixRMaj(new double[][] {{1}, {-1}})));
        return refine(model, "nist_misra1a.csv");
    }

    @ParameterizedTest
    @CsvSource({"48, 7, 11.949, 41.5, 25.96", "60, 7, 11.950, 40.98, 27.24", "48, 9, 11.952, 42.2, 26.2"})
    void delayFitsOfEnsoFindTheCyclesLessWell(int depth, int rank, double year, double slow, double fast) {
        // CHECKS C1.3, derived; printed to one to three decimals
        List<Double> periods = MeasuredSystems.periods("nist_enso.csv", depth, rank);
        assertNear(year, periods, 5e-4);
        assertNear(slow, periods, 0.05);
        assertNear(fast, periods, 0.05);
    }

    private static void assertNear(double expected, List<Double> periods, double tolerance) {
        assertEquals(expected, periods.stream().min(Comparator.comparingDouble(p -> Math.abs(p - expected))).orElseThrow(),
                tolerance);
    }
}
