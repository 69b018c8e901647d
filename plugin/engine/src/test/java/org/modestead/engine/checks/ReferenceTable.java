package org.modestead.engine.checks;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Objects;

/**
 * A table of figures beside the tests; see {@code checks/SOURCES.md} for where each comes from.
 *
 * @param rows cells as text, without the header
 */
record ReferenceTable(List<String[]> rows) {

    static ReferenceTable read(String name) {
        var stream = Objects.requireNonNull(ReferenceTable.class.getResourceAsStream("/checks/" + name), name);
        try (BufferedReader reader = new BufferedReader(new InputStreamReader(stream, StandardCharsets.UTF_8))) {
            return new ReferenceTable(reader.lines().skip(1).map(line -> line.split(",", -1)).toList());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    double number(int row, int column) {
        return Double.parseDouble(rows.get(row)[column]);
    }
}
