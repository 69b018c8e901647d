package org.modestead.engine.checks;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;

/**
 * Every row of {@code checks.csv} against what the engine finds, with the tolerance of the row. Which rows it does not meet
 * stands in {@link #UNMET}: a row there that is met fails as well.
 */
class TableOfChecksTest {

    private static final Map<String, Function<CheckRow, List<Found>>> MEASURES = new TreeMap<>(Map.ofEntries(
            Map.entry("C1.1", MeasuredSystems::threeDecays),
            Map.entry("C1.2", MeasuredSystems::threeRoundedDecays),
            Map.entry("C1.3", MeasuredSystems::enso),
            Map.entry("C1.4", MeasuredSystems::unevenRise),
            Map.entry("C2.1", MeasuredSystems::exponential),
            Map.entry("C2.3", MeasuredSystems::slowManifold),
            Map.entry("C2.4", MeasuredSystems::stuartLandau),
            Map.entry("C2.5", MeasuredSystems::vanDerPol),
            Map.entry("C2.6", MeasuredSystems::duffing),
            Map.entry("C2.7", MeasuredSystems::pendulum),
            Map.entry("C2.8", MeasuredSystems::lotkaVolterra),
            Map.entry("C2.12", MeasuredSystems::heat),
            Map.entry("C3.2", MeasuredSpaces::norms),
            Map.entry("C3.5", MeasuredSpaces::exponentials),
            Map.entry("C3.7", MeasuredSpaces::composition),
            Map.entry("C3.9", MeasuredSpaces::uniformMotion),
            Map.entry("C4.1", MeasuredTrades::decrement),
            Map.entry("C4.4", MeasuredTrades::chain),
            Map.entry("C4.5", MeasuredTrades::cantilever),
            Map.entry("C5.3", MeasuredTrades::rankedProbability),
            Map.entry("C6.2", MeasuredTrades::frank)));

    /** Rows that are not met, by name, and why. */
    private static final Map<String, String> UNMET = Map.of(
            "C3.5 residual_norm2 of x: equispaced_-1_to_1 n=6",
            "1e-8 relative, which the table states for n <= 5, would be 4e-16 of the squared norm 1 it is the rest of");

    private static List<Found> found(CheckRow row) {
        return MEASURES.getOrDefault(row.id(), any -> List.of()).apply(row);
    }

    /** What misses the row; a tolerance that nothing was found for counts as missed. */
    private static List<String> misses(CheckRow row, List<Found> found) {
        Stream<String> wrong = found.stream().filter(value -> !tolerance(row, value).holds(row.expected(), value.value()))
                .map(value -> String.format(Locale.ROOT, "%s: %.17g instead of %.17g", value.how(), value.value(),
                        row.expected()));
        Stream<String> absent = row.tolerances().stream()
                .filter(tolerance -> found.stream().noneMatch(value -> value.kind().equals(tolerance.kind())))
                .map(tolerance -> "nothing found" + (tolerance.kind().isEmpty() ? "" : " by " + tolerance.kind()));
        return Stream.concat(wrong, absent).toList();
    }

    private static Tolerance tolerance(CheckRow row, Found found) {
        return row.tolerances().stream().filter(tolerance -> tolerance.kind().equals(found.kind())).findFirst().orElseThrow();
    }

    @TestFactory
    Stream<DynamicTest> everyRow() {
        return CheckRow.all().stream().map(row -> DynamicTest.dynamicTest(row.name(), () -> {
            List<String> misses = misses(row, found(row));
            boolean listed = UNMET.containsKey(row.name());
            assertEquals(listed, !misses.isEmpty(), () -> listed ? "is met now: take it off the list" : misses.toString());
        }));
    }

    @Test
    void theTableIsWhole() {
        List<CheckRow> rows = CheckRow.all();
        assertEquals(108, rows.size());
        // roots of the cantilever differ in nothing but the value
        assertEquals(105, rows.stream().map(CheckRow::name).distinct().count());
        Set<String> names = rows.stream().map(CheckRow::name).collect(Collectors.toSet());
        assertTrue(names.containsAll(UNMET.keySet()), "a row on the list is not in the table");
        assertTrue(rows.stream().map(CheckRow::id).collect(Collectors.toSet()).containsAll(MEASURES.keySet()));
    }

    @Test
    void onlyTheHopfFormulasAreFixturesOfTheTestsAndTheirRowsAreFoundFromDataToo() {
        for (CheckRow row : CheckRow.all()) {
            if (!row.id().equals("C2.5")) {
                List<Found> found = found(row);
                assertEquals(row.id().equals("C2.4"), found.stream().anyMatch(value -> !value.engine()), row.name());
                assertEquals(found.isEmpty(), found.stream().noneMatch(Found::engine), row.name());
            }
        }
    }

    @Test
    void tolerancesAreReadAsTheTableWritesThem() {
        assertEquals(List.of(new Tolerance(1e-8, true, "")), Tolerance.read("1e-8 rel (delay fit, 4<=d<=20, rank 3)"));
        assertEquals(List.of(new Tolerance(0.291, false, "")), Tolerance.read("3 certified sd=0.291"));
        assertEquals(List.of(new Tolerance(1e-7, false, "")), Tolerance.read("1e-7 abs"));
        assertEquals(List.of(new Tolerance(1e-9, true, "")), Tolerance.read("1e-9 rel varpro"));
        assertEquals(List.of(new Tolerance(1e-6, true, "varpro"), new Tolerance(3, false, "delay fit")),
                Tolerance.read("1e-6 rel varpro; 3.0 delay fit"));
        assertEquals(List.of(new Tolerance(1e-12, true, "exact formula"), new Tolerance(1e-6, false, "from data")),
                Tolerance.read("1e-12 rel exact formula; 1e-6 from data"));
        assertTrue(new Tolerance(1e-3, true, "").holds(-2000, -2002));
        assertFalse(new Tolerance(1e-3, false, "").holds(-2000, -2002));
        assertFalse(new Tolerance(1e-3, false, "").holds(1, Double.NaN));
    }
}
