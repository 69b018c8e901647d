package org.modestead.knime.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;

/** Compares tables of the two hosts, written as text with all digits. */
final class Tables {

    private Tables() {}

    static void assertSame(Map<String, List<String>> host, Map<String, List<String>> platform) {
        assertEquals(host.keySet(), platform.keySet());
        assertTrue(lines(host) > host.size(), "the host's tables are empty");
        host.forEach((table, all) -> {
            List<String> lines = withoutOrigin(all);
            List<String> found = withoutOrigin(platform.get(table));
            for (int i = 0; i < Math.min(lines.size(), found.size()); i++) {
                assertEquals(lines.get(i), found.get(i), table + ", line " + (i + 1));
            }
            assertEquals(lines.size(), found.size(), table + ", lines");
        });
    }

    static int lines(Map<String, List<String>> tables) {
        return tables.values().stream().mapToInt(List::size).sum();
    }

    /** The one cell that may differ names where a table came from: a table of the platform does not tell. */
    private static List<String> withoutOrigin(List<String> lines) {
        return lines.stream().filter(line -> !line.startsWith("table\t")).toList();
    }
}
