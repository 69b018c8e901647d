package org.modestead.nodes.modelfile;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.document.ReportDocument.Grid;
import org.modestead.nodes.document.ReportDocument.Head;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.words.Digits;

/** The first rows of output tables as texts; no table is read further. */
final class TableHeads {
    private static final int MOST_ROWS = 20;
    private static final int MOST_COLUMNS = 30;

    private TableHeads() {}

    static List<Grid> of(NodeDeclaration declaration, Map<String, Object> outputs) {
        List<Grid> heads = new ArrayList<>();
        for (Port port : declaration.outputs()) {
            if (outputs.get(port.id()) instanceof Table table) {
                heads.add(head(port, table));
            }
        }
        return heads;
    }

    private static Grid head(Port port, Table table) {
        List<Column> all = table.schema().columns();
        List<Column> columns = all.subList(0, Math.min(MOST_COLUMNS, all.size()));
        List<List<String>> rows = new ArrayList<>();
        boolean more;
        try (RowCursor cursor = table.open()) {
            more = cursor.next();
            while (more && rows.size() < MOST_ROWS) {
                rows.add(cells(cursor, columns));
                more = cursor.next();
            }
        }
        String left = (more ? "The first " + MOST_ROWS + " rows. " : "")
                + (columns.size() < all.size() ? "The first " + MOST_COLUMNS + " of " + all.size() + " columns." : "");
        return new Grid(port.title(), columns.stream().map(column -> new Head(column.name(), column.type().isNumber())).toList(), rows, left.strip());
    }

    private static List<String> cells(RowCursor cursor, List<Column> columns) {
        List<String> cells = new ArrayList<>();
        for (int j = 0; j < columns.size(); j++) {
            boolean real = columns.get(j).type() == CellType.DOUBLE;
            cells.add(cursor.isMissing(j) ? "" : real ? Digits.cell(cursor.number(j)) : cursor.text(j));
        }
        return cells;
    }
}
