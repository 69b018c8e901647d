package org.modestead.release;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The table of known weaknesses in {@code plugin/DEPENDENCIES.md}.
 *
 * @param rows in the order of the file
 */
record WeaknessTable(List<Row> rows) {

    /**
     * A published weakness of a dependency.
     *
     * @param names its identifiers
     * @param dependency as {@code group:artifact}
     * @param mended the first version without it of the line that ships, or of the newest line
     * @param harmless why a version below ships all the same, empty where none does
     */
    record Row(String names, String dependency, String mended, String harmless) {

        /** Whether a version comes before the mended one. */
        boolean reaches(String version) {
            return Arrays.compare(numbers(version), numbers(mended)) < 0;
        }

        private static int[] numbers(String version) {
            if (!version.matches("\\d+([.]\\d+)*")) {
                throw new IllegalArgumentException("a version of numbers and dots would be right: " + version);
            }
            return Arrays.stream(version.split("[.]")).mapToInt(Integer::parseInt).toArray();
        }
    }

    WeaknessTable {
        rows = List.copyOf(rows);
    }

    static WeaknessTable read() throws IOException {
        List<Row> rows = new ArrayList<>();
        for (String line : Files.readAllLines(Path.of(System.getProperty("project.root"), "plugin", "DEPENDENCIES.md"))) {
            if (line.matches("[|] (CVE|GHSA|SNYK)-.*")) {
                List<String> cells = List.of(line.replaceFirst("^[|]\\s*", "").replaceFirst("[|]\\s*$", "").split("\\s*[|]\\s*", -1));
                if (cells.size() != 4) {
                    throw new IllegalArgumentException("four cells would be right: " + line);
                }
                rows.add(new Row(cells.get(0), cells.get(1).replace("`", ""), cells.get(2), cells.get(3).strip()));
            }
        }
        return new WeaknessTable(rows);
    }
}
