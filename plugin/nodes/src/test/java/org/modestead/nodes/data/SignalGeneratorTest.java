package org.modestead.nodes.data;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.Progress;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

class SignalGeneratorTest {

    private static final int FIRST_CHANNEL = 2;
    private static final Map<String, Object> CLEAN = Map.of("noise", 0, "dropouts", 0, "gaps", 0);

    private final SignalGenerator generator = new SignalGenerator();

    @Test
    void theSameSeedGivesTheSameCellsAndAnotherSeedOthers() {
        List<List<Optional<Object>>> first = cells(table(Map.of("runs", 2)));
        assertEquals(first, cells(table(Map.of("runs", 2))));
        assertNotEquals(first, cells(table(Map.of("runs", 2, "seed", 2))));
    }

    @Test
    void theTruthTableStatesWhatTheStationWasMadeOf() {
        Map<String, double[]> truth = truth(Map.of("runs", 1));
        assertEquals(Set.of("surge", "draining", "bearing-resonance", "rotor-whirl"), truth.keySet());
        // closed form: zeta -> sigma -> zeta and a halving time given as such; rounding only
        assertEquals(0.62, truth.get("surge")[0], 1e-15);
        assertEquals(0.02, truth.get("surge")[1], 1e-15);
        assertEquals(-25, truth.get("draining")[2], 1e-12);
        // ln 2 / (0.006 * 2 pi 1.37 / sqrt(1 - 0.006^2))
        assertEquals(13.4204, truth.get("rotor-whirl")[2], 1e-4);
    }

    @Test
    void aStationWithoutWhirlDoesNotClaimOne() {
        assertTrue(truth(Map.of("runs", 1, "unstable-runs", 0)).keySet().stream().noneMatch("rotor-whirl"::equals));
    }

    @Test
    void oneSumOfTheTrueModesExplainsEveryRun() {
        Map<String, List<double[]>> runs = numbers(table(with(CLEAN, "runs", 4)));
        List<TrueMode> modes = station(4).truth();
        runs.forEach((run, rows) -> {
            // half a last digit of each instrument; least squares moves errors about by less
            // than half of that with 9 functions
            double[] roundings = {5e-5, 5e-5, 5e-3, 5e-5, 5e-4, 5e-5, 5e-5, 5e-4};
            for (int c = 0; c < roundings.length; c++) {
                assertTrue(worstResidual(rows, c, modes) < 1.5 * roundings[c], run + ", channel " + c);
            }
        });
    }

    @Test
    void theWhirlGrowsInTheChosenNumberOfRunsOnly() {
        Map<String, List<double[]>> runs = numbers(table(with(CLEAN, "runs", 6, "unstable-runs", 2)));
        List<TrueMode> withoutWhirl = station(0).truth();
        // without the whirl among the modes the runs that hold it are not explained: casing vibration, rounded to 5e-5
        long unexplained = runs.values().stream().filter(rows -> worstResidual(rows, 6, withoutWhirl) > 1e-3).count();
        assertEquals(2, unexplained);
    }

    @Test
    void timesRiseHoweverUnevenTheSteps() {
        numbers(table(Map.of("runs", 2, "jitter", 0.4))).forEach((run, rows) -> {
            for (int k = 1; k < rows.size(); k++) {
                assertTrue(rows.get(k)[0] > rows.get(k - 1)[0], run + " at " + rows.get(k)[0]);
            }
        });
    }

    @Test
    void dropOutsLeaveCellsMissingAndGapsLeaveRowsOut() {
        Table plain = table(Map.of("runs", 4, "dropouts", 0, "gaps", 0));
        Table broken = table(Map.of("runs", 4, "dropouts", 3, "gaps", 1));
        assertEquals(0, missing(plain));
        // three drop-outs of two to four samples in each of four runs, some of them within the gap or overlapping
        assertTrue(missing(broken) >= 2 * 3 && missing(broken) <= 4 * 3 * 4, "missing " + missing(broken));
        double widest = numbers(broken).values().stream().mapToDouble(SignalGeneratorTest::widestStep).max().orElseThrow();
        // two seconds, one step of 0.05 s and at most 0.1 of a step at either end
        assertEquals(2.05, widest, 0.011);
    }

    @ParameterizedTest
    @ValueSource(strings = {"affine", "square", "minus-cube", "logistic"})
    void aFlowSolvesItsEquation(String flow) {
        Map<String, List<double[]>> runs = numbers(table(Map.of("scenario", "flows", "flow", flow, "a", 0.8, "b", 0.3)));
        assertEquals(40, runs.size());
        runs.forEach((run, rows) -> {
            double[] last = rows.get(rows.size() - 1);
            // an independent integration, fourth order with 1e4 steps: error far below 1e-12
            assertEquals(integrate(flow, rows.get(0)[1], last[0]), last[1], 1e-12, run);
        });
    }

    @Test
    void startsAreEvenlySpacedFromMinusOneToOne() {
        Map<String, List<double[]>> runs = numbers(table(Map.of("scenario", "flows", "runs", 5)));
        assertEquals(List.of(-1.0, -0.5, 0.0, 0.5, 1.0), runs.values().stream().map(rows -> rows.get(0)[1]).toList());
    }

    @Test
    void aDriftHasNoModeAndAnAffineFlowHasItsRate() {
        assertTrue(truth(Map.of("scenario", "flows", "a", 0, "b", 1)).isEmpty());
        // doubling time of rate 2 is ln 2 / 2
        assertEquals(Math.log(2) / 2, truth(Map.of("scenario", "flows", "a", 2)).get("state")[2], 1e-15);
    }

    @Test
    void aRunBeyondInfinityIsRefusedWithTheEscapeTime() {
        List<SettingProblem> problems = generator.check(Map.of(),
                settings(Map.of("scenario", "flows", "flow", "square", "duration", 1.5)));
        assertEquals(List.of(new SettingProblem("duration", "a run of length 1.5 would pass infinity at time 1.0",
                "choose a length below 1.0")), problems);
    }

    private static PumpHouse station(int unstableRuns) {
        return new PumpHouse(4, 60, 20, 0.1, 0, unstableRuns, 0, 0, 1);
    }

    /** Largest residual of least squares on a constant and the modes' own functions of time. */
    private static double worstResidual(List<double[]> rows, int channel, List<TrueMode> modes) {
        DMatrixRMaj basis = new DMatrixRMaj(rows.size(), 1 + 2 * modes.size());
        DMatrixRMaj signal = new DMatrixRMaj(rows.size(), 1);
        for (int k = 0; k < rows.size(); k++) {
            double time = rows.get(k)[0];
            basis.set(k, 0, 1);
            for (int m = 0; m < modes.size(); m++) {
                double envelope = Math.exp(modes.get(m).growth() * time);
                basis.set(k, 1 + 2 * m, envelope * Math.cos(2 * Math.PI * modes.get(m).frequency() * time));
                basis.set(k, 2 + 2 * m, envelope * Math.sin(2 * Math.PI * modes.get(m).frequency() * time));
            }
            signal.set(k, 0, rows.get(k)[1 + channel]);
        }
        DMatrixRMaj used = withoutZeroColumns(basis);
        DMatrixRMaj weights = new DMatrixRMaj(used.numCols, 1);
        CommonOps_DDRM.solve(used, signal, weights);
        CommonOps_DDRM.multAdd(-1, used, weights, signal);
        return CommonOps_DDRM.elementMaxAbs(signal);
    }

    private static DMatrixRMaj withoutZeroColumns(DMatrixRMaj matrix) {
        List<DMatrixRMaj> kept = new ArrayList<>();
        for (int j = 0; j < matrix.numCols; j++) {
            DMatrixRMaj column = CommonOps_DDRM.extractColumn(matrix, j, null);
            if (NormOps_DDRM.normF(column) > 0) {
                kept.add(column);
            }
        }
        return CommonOps_DDRM.concatColumnsMulti(kept.toArray(DMatrixRMaj[]::new));
    }

    private static double integrate(String flow, double start, double time) {
        int steps = 10_000;
        double h = time / steps;
        double x = start;
        for (int i = 0; i < steps; i++) {
            double k1 = field(flow, x);
            double k2 = field(flow, x + h / 2 * k1);
            double k3 = field(flow, x + h / 2 * k2);
            double k4 = field(flow, x + h * k3);
            x += h / 6 * (k1 + 2 * k2 + 2 * k3 + k4);
        }
        return x;
    }

    private static double field(String flow, double x) {
        return switch (flow) {
            case "affine" -> 0.8 * x + 0.3;
            case "square" -> x * x;
            case "minus-cube" -> -x * x * x;
            default -> x - x * x;
        };
    }

    private static double widestStep(List<double[]> rows) {
        double widest = 0;
        for (int k = 1; k < rows.size(); k++) {
            widest = Math.max(widest, rows.get(k)[0] - rows.get(k - 1)[0]);
        }
        return widest;
    }

    private static long missing(Table table) {
        return cells(table).stream().flatMap(List::stream).filter(Optional::isEmpty).count();
    }

    private static List<List<Optional<Object>>> cells(Table table) {
        List<List<Optional<Object>>> all = new ArrayList<>();
        try (RowCursor cursor = table.open()) {
            while (cursor.next()) {
                List<Optional<Object>> row = new ArrayList<>();
                for (int j = 0; j < table.schema().columns().size(); j++) {
                    row.add(cursor.cell(j));
                }
                all.add(row);
            }
        }
        return all;
    }

    /** Returns, by run, one array a row: time and channels. */
    private static Map<String, List<double[]>> numbers(Table table) {
        Map<String, List<double[]>> runs = new LinkedHashMap<>();
        int channels = table.schema().columns().size() - FIRST_CHANNEL;
        try (RowCursor cursor = table.open()) {
            while (cursor.next()) {
                double[] row = new double[1 + channels];
                for (int j = 0; j <= channels; j++) {
                    row[j] = cursor.number(1 + j);
                }
                runs.computeIfAbsent(cursor.text(0), run -> new ArrayList<>()).add(row);
            }
        }
        return runs;
    }

    private Map<String, double[]> truth(Map<String, Object> raw) {
        Map<String, double[]> modes = new HashMap<>();
        try (RowCursor cursor = ((Table) run(raw).outputs().get("truth")).open()) {
            while (cursor.next()) {
                modes.put(cursor.text(0), new double[] {cursor.number(1), cursor.number(2), cursor.number(3)});
            }
        }
        return modes;
    }

    private Table table(Map<String, Object> raw) {
        return (Table) run(raw).outputs().get("table");
    }

    private NodeResult run(Map<String, Object> raw) {
        RunContext context = new RunContext(Progress.NONE, Path.of("."), Path.of("."));
        return generator.run(new NodeInputs(Map.of()), settings(raw), context);
    }

    private Settings settings(Map<String, Object> raw) {
        SettingsReader.Reading reading = SettingsReader.read(generator, raw);
        assertEquals(List.of(), reading.problems());
        return reading.settings().orElseThrow();
    }

    private static Map<String, Object> with(Map<String, Object> base, Object... more) {
        Map<String, Object> all = new HashMap<>(base);
        for (int i = 0; i < more.length; i += 2) {
            all.put((String) more[i], more[i + 1]);
        }
        return all;
    }
}
