package org.modestead.nodes.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.testing.Ringing;
import org.modestead.nodes.testing.Steps;

/**
 * Certified values: National Institute of Standards and Technology, Statistical Reference Datasets, nonlinear regression (public domain).
 * Data, values and standard deviations as in CHECKS C1.2 to C1.4.
 */
class RateRefinementNodeTest {

    private static final double[] MISRA_X = {77.6, 114.9, 141.1, 190.8, 239.9, 289.0, 332.8, 378.4, 434.8, 477.3, 536.8, 593.1, 689.1, 760.0};
    private static final double[] MISRA_Y = {10.07, 14.73, 17.94, 23.93, 29.61, 35.18, 40.02, 44.82, 50.76, 55.05, 61.01, 66.40, 75.47, 81.78};
    private static final double[] LANCZOS3 = {2.5134, 2.0443, 1.6684, 1.3664, 1.1232, 0.9269, 0.7679, 0.6389, 0.5338, 0.4479, 0.3776, 0.3197,
        0.2720, 0.2325, 0.1997, 0.1723, 0.1493, 0.1301, 0.1138, 0.1000, 0.0883, 0.0783, 0.0698, 0.0624};

    private static Object snapshots(double[] times, double[] values, Map<String, Object> more) {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.number("time"), Column.number("y")), "nist");
        for (int k = 0; k < times.length; k++) {
            rows.row(times[k], values[k]);
        }
        Map<String, Object> raw = new HashMap<>(Map.of("time-column", "time"));
        raw.putAll(more);
        return Steps.run("snapshot-builder", Map.of("table", rows.build()), raw).outputs().get("snapshots");
    }

    private static NodeResult refine(Map<String, Object> inputs, Map<String, Object> raw) {
        return Steps.run("rate-refinement", inputs, raw);
    }

    private static double fit(NodeResult refined, String item) {
        return Double.parseDouble(Steps.texts(refined, "fit").stream().filter(row -> row.get(0).equals(item)).findFirst().orElseThrow().get(1));
    }

    private static String search(NodeResult refined) {
        return Steps.texts(refined, "fit").stream().filter(row -> row.get(0).equals("search")).findFirst().orElseThrow().get(1);
    }

    @Test
    void misra1aIsReachedAtUnevenTimes() {
        NodeResult refined = refine(Map.of("snapshots", snapshots(MISRA_X, MISRA_Y, Map.of("gap-factor", 5))), Map.of("start-rates", List.of(-1e-4),
                "constant", true, "from-zero", true, "time-zero", "recorded"));
        assertEquals("converged", search(refined));
        assertEquals(1.2455138894e-1, fit(refined, "residual sum"), 1.3e-10);
        assertEquals(1.0187876330e-1, fit(refined, "residual deviation"), 1e-9);
        assertEquals(12, fit(refined, "degrees of freedom"));
        int row = Steps.number(refined, "modes", "lambda_real", 0) == 0 ? 1 : 0;
        double rate = Steps.number(refined, "modes", "lambda_real", row);
        assertEquals(-5.5015643181e-4, rate, 1e-6 * 5.5e-4, "tolerance of CHECKS C1.4");
        // certified standard deviation 7.2668688436e-6; Student's 97.5 % quantile with 12 degrees of freedom is 2.1788
        assertEquals(2 * 2.1788 * 7.2668688436e-6, Steps.number(refined, "modes", "lambda_real_high", row)
                - Steps.number(refined, "modes", "lambda_real_low", row), 1e-3 * 3.2e-5);
    }

    @Test
    void lanczos3IsReachedFromTheSpectrumOfADelayFit() {
        double[] times = new double[24];
        for (int k = 0; k < 24; k++) {
            times[k] = 0.05 * k;
        }
        Object snapshots = snapshots(times, LANCZOS3, Map.of("delay-depth", 10));
        Object operator = Steps.run("operator-fitter", Map.of("snapshots", snapshots), Map.of("rank-rule", "fixed", "rank", 3)).outputs()
                .get("operator");
        Object spectrum = Steps.run("spectrum-extractor", Map.of("operator", operator), Map.of()).outputs().get("spectrum");
        assertTrue(((Spectrum) spectrum).modes().size() >= 2);
        NodeResult refined = refine(Map.of("snapshots", snapshots, "spectrum", spectrum), Map.of("least-share", 0, "constant", false));
        assertEquals("converged", search(refined));
        assertEquals(1.6117193594e-8, fit(refined, "residual sum"), 1e-6 * 1.6e-8, "tolerance of CHECKS C1.2");
        List<Double> rates = Steps.column(refined, "modes", "lambda_real").stream().map(Double::valueOf).sorted().toList();
        double[] certified = {-4.9863565084, -2.9515951832, -0.95498101505};
        for (int j = 0; j < 3; j++) {
            assertEquals(certified[j], rates.get(j), 1e-6 * Math.abs(certified[j]));
        }
    }

    @Test
    void runsShareRatesAndTheTableHasTheColumnsOfTheModeTableAndIntervals() {
        Object snapshots = Steps.run("snapshot-builder", Map.of("table", Ringing.numbers(3)), Map.of("time-column", "time", "run-column",
                "run")).outputs().get("snapshots");
        NodeResult refined = refine(Map.of("snapshots", snapshots), Map.of("start-periods", List.of(0.7), "constant", false));
        assertEquals(Ringing.FREQUENCY, Steps.number(refined, "modes", "frequency", 0), 1e-9);
        assertEquals(Ringing.DAMPING, Steps.number(refined, "modes", "damping_ratio", 0), 1e-9);
        assertEquals("", Steps.column(refined, "modes", "verdict").get(0));
        assertEquals(1, Steps.number(refined, "modes", "energy_share", 0), 1e-12);
        // x = e^(σt) cos and y = 2 e^(σt) sin: peak √(1 + 4) over both channels
        assertEquals(Math.sqrt(5), Steps.number(refined, "modes", "amplitude", 0), 1e-8);
        assertEquals(3, fit(refined, "runs"));
        assertTrue(refined.doubts().isEmpty(), refined.doubts().toString());
    }

    @Test
    void offsetsDoNotBendASlowRateUnlessTheConstantIsLeftOut() {
        double[] times = new double[100];
        double[] values = new double[100];
        for (int k = 0; k < 100; k++) {
            times[k] = 0.1 * k;
            values[k] = 3 + 2 * Math.exp(-0.4 * times[k]);
        }
        Map<String, Object> start = Map.of("start-rates", List.of(-0.3));
        NodeResult refined = refine(Map.of("snapshots", snapshots(times, values, Map.of("detrend", "mean"))), start);
        List<Double> rates = Steps.column(refined, "modes", "lambda_real").stream().map(Double::valueOf).sorted().toList();
        assertEquals(-0.4, rates.get(0), 1e-8);
        assertEquals(0, rates.get(1));
        NodeResult bent = refine(Map.of("snapshots", snapshots(times, values, Map.of("detrend", "mean"))),
                Map.of("start-rates", List.of(-0.3), "constant", false));
        assertTrue(Math.abs(Steps.number(bent, "modes", "lambda_real", 0) + 0.4) > 0.05);
    }

    @Test
    void intervalsHoldTheTruthAsOftenAsTheySay() {
        Random random = new Random(31);
        int held = 0;
        int dampings = 0;
        int draws = 100;
        for (int draw = 0; draw < draws; draw++) {
            double[] times = new double[80];
            double[] values = new double[80];
            double t = 0;
            for (int k = 0; k < 80; k++) {
                t += 0.05 + 0.1 * random.nextDouble();
                times[k] = t;
                values[k] = Math.exp(-0.1 * t) * Math.cos(3 * t) + 0.1 * random.nextGaussian();
            }
            NodeResult refined = refine(Map.of("snapshots", snapshots(times, values, Map.of())), Map.of("start-periods", List.of(2.1),
                    "level", 0.9));
            held += holds(refined, "frequency", 3 / (2 * Math.PI)) ? 1 : 0;
            dampings += holds(refined, "damping_ratio", 0.1 / Math.hypot(0.1, 3)) ? 1 : 0;
        }
        // 100 draws at 90 %: 84 to 95 are within the exact binomial 95 % (CHECKS C5.5), 81 to 97 within 99.5 %
        assertTrue(held >= 81 && held <= 97, "frequency " + held);
        assertTrue(dampings >= 81 && dampings <= 97, "damping " + dampings);
    }

    private static boolean holds(NodeResult refined, String column, double truth) {
        return Steps.number(refined, "modes", column + "_low", 0) <= truth && truth <= Steps.number(refined, "modes", column + "_high", 0);
    }

    @Test
    void ensoIsReachedWithTheYearKnownAndAConstant() throws IOException {
        List<String> lines;
        try (InputStream file = RateRefinementNodeTest.class.getResourceAsStream("/checks/nist_enso.csv")) {
            lines = new String(file.readAllBytes(), StandardCharsets.UTF_8).lines().skip(1).toList();
        }
        double[] times = lines.stream().mapToDouble(line -> Double.parseDouble(line.split(",")[0])).toArray();
        double[] values = lines.stream().mapToDouble(line -> Double.parseDouble(line.split(",")[1])).toArray();
        NodeResult refined = refine(Map.of("snapshots", snapshots(times, values, Map.of())), Map.of("fixed-periods", List.of(12),
                "start-periods", List.of(40, 25), "oscillations", "steady", "constant", true));
        assertEquals("converged", search(refined));
        assertEquals(7.8853978668e2, fit(refined, "residual sum"), 1e-7);
        assertEquals(2.2269642403, fit(refined, "residual deviation"), 1e-9);
        List<String> periods = Steps.column(refined, "modes", "period");
        assertPeriod(refined, 44.311088700, 0.94408025976);
        assertPeriod(refined, 26.887614440, 0.41612939130);
        // the year is held: no interval; the constant has no period
        int year = row(refined, 12);
        assertEquals(12, Double.parseDouble(periods.get(year)), 1e-12);
        assertEquals("", Steps.column(refined, "modes", "period_low").get(year));
        assertEquals(1, periods.stream().filter(String::isEmpty).count());
        assertEquals(4, periods.size());
    }

    private static int row(NodeResult refined, double period) {
        List<String> periods = Steps.column(refined, "modes", "period");
        return IntStream.range(0, periods.size()).filter(k -> !periods.get(k).isEmpty()
                && Math.abs(Double.parseDouble(periods.get(k)) - period) < 1).findFirst().orElseThrow();
    }

    private static void assertPeriod(NodeResult refined, double certified, double deviation) {
        int row = row(refined, certified);
        assertEquals(certified, Steps.number(refined, "modes", "period", row), 1e-6, "tolerance of CHECKS C1.3");
        // Student's 97.5 % quantile with 159 degrees of freedom is 1.975; ends are those of the frequency, second order in the deviation
        double width = Steps.number(refined, "modes", "period_high", row) - Steps.number(refined, "modes", "period_low", row);
        assertEquals(2 * 1.975 * deviation, width, 0.01 * width);
        assertEquals("0.0", Steps.column(refined, "modes", "lambda_real").get(row));
    }

    @Test
    void withoutAnythingToStartFromItSaysWhatIsMissing() {
        Object snapshots = snapshots(MISRA_X, MISRA_Y, Map.of());
        assertEquals("neither a spectrum is connected nor a rate or period given",
                assertThrows(SettingFault.class, () -> refine(Map.of("snapshots", snapshots), Map.of())).seen());
        assertEquals("setting from-zero", assertThrows(SettingFault.class, () -> refine(Map.of("snapshots", snapshots),
                Map.of("start-rates", List.of(-1), "from-zero", true, "constant", false))).where());
    }

    @Test
    void termsThatCoincideAreDoubted() {
        double[] times = new double[30];
        double[] values = new double[30];
        for (int k = 0; k < 30; k++) {
            times[k] = 0.1 * k;
            values[k] = Math.exp(-times[k]);
        }
        NodeResult refined = refine(Map.of("snapshots", snapshots(times, values, Map.of())), Map.of("start-rates", List.of(-1, -1)));
        assertTrue(refined.doubts().stream().anyMatch(doubt -> doubt.code().equals("rates-undecided")), refined.doubts().toString());
    }
}
