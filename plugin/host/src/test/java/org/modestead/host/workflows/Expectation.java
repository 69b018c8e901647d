package org.modestead.host.workflows;

import com.fasterxml.jackson.annotation.JsonProperty;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.nodes.table.Table;

/**
 * One line of an {@code expected.json}: what one cell of one table must hold.
 *
 * @param step id of the step
 * @param table id of its output port
 * @param where which row: texts and whole numbers exactly, decimals the nearest row
 * @param column which cell of it
 * @param expected a number, or a text that the cell is or begins with, whole words only
 * @param tolerance absolute, for a number
 * @param atLeast smallest number allowed, instead of {@code expected}
 * @param atMost largest number allowed, instead of {@code expected}
 * @param reason where the figure comes from and why the tolerance is what it is
 */
record Expectation(String step, String table, Map<String, JsonNode> where, String column, JsonNode expected,
        double tolerance,
        @JsonProperty("at-least") Double atLeast, @JsonProperty("at-most") Double atMost, String reason) {

    /**
     * Content of an {@code expected.json}.
     *
     * @param comment what the figures as a whole mean
     * @param expectations at least one
     */
    record Sheet(String comment, List<Expectation> expectations) {}

    /** Refuses a line that could not fail or that gives no reason. */
    Expectation {
        if (expected == null && atLeast == null && atMost == null || reason == null || reason.isBlank()) {
            throw new IllegalArgumentException(step + "." + table + " " + column + ": say what is expected and why");
        }
    }

    static Sheet read(Path file) throws IOException {
        return new ObjectMapper().readValue(file.toFile(), Sheet.class);
    }

    /** Returns which cell is meant. */
    String name() {
        return step + "." + table + " " + column + " where " + where;
    }

    /** Returns what differs, with the row that differs; empty when all is well. */
    Optional<String> differs(Table found) {
        Map<String, String> row = RowPick.row(found, where);
        String cell = row.get(column);
        if (cell == null) {
            return Optional.of("no column " + column + " among " + row.keySet());
        }
        boolean met = isText() ? isSaid(cell) : isWithin(cell);
        return met ? Optional.empty() : Optional.of(column + " is " + cell + ", wanted " + wanted() + " (" + reason
                + "); row " + row);
    }

    private boolean isText() {
        return expected != null && expected.isTextual();
    }

    private boolean isSaid(String cell) {
        String wanted = expected.asText();
        return cell.equals(wanted) || cell.startsWith(wanted) && !Character.isLetter(cell.charAt(wanted.length()));
    }

    private boolean isWithin(String cell) {
        return !cell.isEmpty() && Double.parseDouble(cell) >= low() && Double.parseDouble(cell) <= high();
    }

    private double low() {
        return expected != null ? expected.asDouble() - tolerance
                : Optional.ofNullable(atLeast).orElse(Double.NEGATIVE_INFINITY);
    }

    private double high() {
        return expected != null ? expected.asDouble() + tolerance
                : Optional.ofNullable(atMost).orElse(Double.POSITIVE_INFINITY);
    }

    private String wanted() {
        return isText() ? expected.asText() : "a number in [" + low() + ", " + high() + "]";
    }
}
