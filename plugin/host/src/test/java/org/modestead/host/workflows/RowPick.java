package org.modestead.host.workflows;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** Finds the one row of a table that a condition means. */
final class RowPick {

    private RowPick() {}

    /**
     * Returns the row, cells as text by column name, missing ones empty.
     *
     * @param table to look in
     * @param where texts and whole numbers must be met exactly; of the rows that do, the one nearest to the decimals
     * @throws AssertionError if no row or, without decimals, more than one row is meant
     */
    static Map<String, String> row(Table table, Map<String, JsonNode> where) {
        List<Map<String, String>> rows = rows(table).stream().filter(row -> where.entrySet().stream()
                .allMatch(wanted -> wanted.getValue().isFloatingPointNumber()
                        || isMet(row.get(wanted.getKey()), wanted.getValue())))
                .toList();
        boolean nearest = where.values().stream().anyMatch(JsonNode::isFloatingPointNumber);
        if (rows.isEmpty() || rows.size() > 1 && !nearest) {
            throw new AssertionError(rows.size() + " rows of " + table.origin() + " meet " + where + " among "
                    + rows(table));
        }
        return rows.stream().min(Comparator.comparingDouble(row -> distance(row, where))).orElseThrow();
    }

    private static boolean isMet(String cell, JsonNode wanted) {
        if (cell == null || cell.isEmpty()) {
            return false;
        }
        return wanted.isTextual() ? wanted.asText().equals(cell) : Double.parseDouble(cell) == wanted.asDouble();
    }

    private static double distance(Map<String, String> row, Map<String, JsonNode> where) {
        double sum = 0;
        for (Map.Entry<String, JsonNode> wanted : where.entrySet()) {
            String cell = row.getOrDefault(wanted.getKey(), "");
            if (wanted.getValue().isFloatingPointNumber()) {
                sum += cell.isEmpty() ? Double.MAX_VALUE : Math.abs(Double.parseDouble(cell) - wanted.getValue().asDouble());
            }
        }
        return sum;
    }

    private static List<Map<String, String>> rows(Table table) {
        List<String> names = table.schema().names();
        List<Map<String, String>> rows = new ArrayList<>();
        try (RowCursor cursor = table.open()) {
            while (cursor.next()) {
                Map<String, String> row = new LinkedHashMap<>();
                for (int j = 0; j < names.size(); j++) {
                    row.put(names.get(j), cursor.text(j));
                }
                rows.add(row);
            }
        }
        return rows;
    }
}
