package org.modestead.release;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * The table of all dependencies, {@code plugin/DEPENDENCIES.md}.
 *
 * @param rows by {@code group:artifact}
 */
record DependencyTable(Map<String, Row> rows) {

    /**
     * A dependency.
     *
     * @param version its version
     * @param licence SPDX identifiers, joined by OR or AND
     * @param place what it is shipped in, separated by commas, or why it is not shipped
     * @param reason why it is there
     */
    record Row(String version, String licence, String place, String reason) {
    }

    DependencyTable {
        rows = Collections.unmodifiableMap(new TreeMap<>(rows));
    }

    static DependencyTable read() throws IOException {
        Map<String, Row> rows = new TreeMap<>();
        for (String line : Files.readAllLines(Path.of(System.getProperty("project.root"), "plugin", "DEPENDENCIES.md"))) {
            if (line.startsWith("| `")) {
                List<String> cells = List.of(line.replaceFirst("^[|]\\s*", "").replaceFirst("\\s*[|]\\s*$", "").split("\\s*[|]\\s*"));
                if (cells.size() != 5 || rows.put(cells.get(0).replace("`", ""), new Row(cells.get(1), cells.get(2), cells.get(3), cells.get(4))) != null) {
                    throw new IllegalArgumentException("five cells, and a name that is not there before, would be right: " + line);
                }
            }
        }
        return new DependencyTable(rows);
    }
}
