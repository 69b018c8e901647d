package org.modestead.release;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** Nothing ships with a weakness that {@code plugin/DEPENDENCIES.md} knows, unless it says there why it does no harm. */
class KnownWeaknessesIT {

    private static final String ECHARTS = "org.webjars.npm:echarts";

    /** Returns the versions of all that ships, by the lists of parts. */
    private static Map<String, Set<String>> shipped() {
        Map<String, Set<String>> versions = new TreeMap<>();
        for (Shipment shipment : Shipment.all()) {
            shipment.partsLists().values().forEach(list -> list.parts()
                    .forEach((name, part) -> versions.computeIfAbsent(name, any -> new TreeSet<>()).add(part.version())));
        }
        return versions;
    }

    @Test
    void whatShipsIsMendedOrTheTableTellsWhyTheWeaknessDoesNoHarm() throws IOException {
        Map<String, Set<String>> shipped = shipped();
        List<WeaknessTable.Row> rows = WeaknessTable.read().rows();
        assertTrue(rows.size() >= 10, "rows of the table: " + rows.size());
        for (WeaknessTable.Row row : rows) {
            assertTrue(shipped.containsKey(row.dependency()), row.dependency() + " does not ship; " + row.names() + " can go from the table");
            for (String version : shipped.get(row.dependency())) {
                assertEquals(row.reaches(version), !row.harmless().isEmpty(), row.dependency() + " " + version + " ships, " + row.names()
                        + " is mended in " + row.mended() + "; the table says why it does no harm: \"" + row.harmless() + "\"");
            }
        }
    }

    /** Both weaknesses of ECharts that the table names are in what it shows beside the pointer, for which it must be asked. */
    @Test
    void thePageAsksTheChartsForNoTooltipsAndNoLegends() throws IOException {
        assertTrue(WeaknessTable.read().rows().stream().anyMatch(row -> row.dependency().equals(ECHARTS)), "no weakness of ECharts in the table");
        Path page = Path.of(System.getProperty("project.root"), "plugin/host/src/main/resources/org/modestead/host/bench/page");
        try (Stream<Path> files = Files.walk(page)) {
            List<Path> scripts = files.filter(file -> file.toString().endsWith(".js")).sorted().toList();
            assertTrue(scripts.stream().anyMatch(file -> file.endsWith("looks/charts.js")), scripts.toString());
            for (Path script : scripts) {
                String text = Files.readString(script);
                assertFalse(text.matches("(?s).*\\b(tooltip|legend)\\s*:\\s*[{\\[].*"), script + " asks for a tooltip or a legend");
                assertFalse(text.matches("(?s).*type:\\s*['\"]lines['\"].*"), script + " draws a series of lines");
            }
        }
    }
}
