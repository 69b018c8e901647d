package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.List;
import org.modestead.nodes.document.ReportDocument.Grid;
import org.modestead.nodes.document.ReportDocument.Head;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.Sentence;

/** The first rows and columns of an output table, and how much more there is. */
final class TableExcerpt {
    private static final int MOST_COLUMNS = 12;
    // A source may be far larger than memory: its rows are not counted to the end for a note.
    private static final long MOST_COUNTED = 1_000_000;

    private TableExcerpt() {}

    static Grid of(Table table, String stepId, String port, int most) {
        List<Column> columns = table.schema().columns();
        int shown = Math.min(MOST_COLUMNS, columns.size());
        List<List<String>> rows = new ArrayList<>();
        long more = 0;
        try (RowCursor cursor = table.open()) {
            while (more < MOST_COUNTED && cursor.next()) {
                if (rows.size() < most) {
                    rows.add(row(cursor, columns.subList(0, shown)));
                } else {
                    more++;
                }
            }
        }
        List<Head> heads = columns.subList(0, shown).stream()
                .map(column -> new Head(column.name(), column.type().isNumber())).toList();
        return new Grid("Table " + port + " of step"
                + " " + stepId, heads, rows, note(more, columns.size() - shown, stepId + "/" + port));
    }

    private static List<String> row(RowCursor cursor, List<Column> columns) {
        List<String> cells = new ArrayList<>();
        for (int c = 0; c < columns.size(); c++) {
            boolean real = columns.get(c).type() == CellType.DOUBLE;
            cells.add(cursor.isMissing(c) ? "" : real ? Digits.cell(cursor.number(c)) : cursor.text(c));
        }
        return cells;
    }

    private static String note(long rows, int columns, String file) {
        List<String> left = new ArrayList<>();
        if (rows > 0) {
            left.add((rows == MOST_COUNTED ? "at least " : "") + Sentence.count(rows, "more row"));
        }
        if (columns > 0) {
            left.add(Sentence.count(columns, "more column"));
        }
        return left.isEmpty() ? "" : Sentence.of(String.join(" and ", left) + " in " + file + ".csv");
    }
}
