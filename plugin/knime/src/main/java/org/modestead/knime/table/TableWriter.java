package org.modestead.knime.table;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataCellFactory;
import org.knime.core.data.DataTableSpec;
import org.knime.core.data.DataType;
import org.knime.core.data.RowKey;
import org.knime.core.data.collection.CollectionCellFactory;
import org.knime.core.data.def.BooleanCell;
import org.knime.core.data.def.DefaultRow;
import org.knime.core.data.def.DoubleCell;
import org.knime.core.data.def.LongCell;
import org.knime.core.data.def.StringCell;
import org.knime.core.node.BufferedDataContainer;
import org.knime.core.node.BufferedDataTable;
import org.knime.core.node.ExecutionContext;
import org.modestead.engine.Progress;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.ListCell;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** Copies a table of a node into one of the platform, row by row. */
public final class TableWriter {

    private final ExecutionContext exec;
    private final Progress progress;

    /**
     * @param exec makes the platform's table
     * @param progress asked for every row whether to stop
     */
    public TableWriter(ExecutionContext exec, Progress progress) {
        this.exec = exec;
        this.progress = progress;
    }

    /** Copies all rows; row keys are {@code Row0, Row1, ...} as the platform's own nodes give them. */
    public BufferedDataTable write(Table table) {
        DataTableSpec spec = TableSpecs.spec(table.schema());
        List<Function<Object, DataCell>> makers = makers(table, spec);
        BufferedDataContainer container = exec.createDataContainer(spec);
        try (RowCursor cursor = table.open()) {
            DataCell[] cells = new DataCell[makers.size()];
            for (long row = 0; cursor.next(); row++) {
                progress.checkCancelled();
                for (int j = 0; j < cells.length; j++) {
                    Optional<Object> value = cursor.cell(j);
                    cells[j] = value.map(makers.get(j)).orElseGet(DataType::getMissingCell);
                }
                container.addRowToTable(new DefaultRow(RowKey.createRowKey(row), cells.clone()));
            }
        } finally {
            container.close();
        }
        return container.getTable();
    }

    private List<Function<Object, DataCell>> makers(Table table, DataTableSpec spec) {
        List<Function<Object, DataCell>> makers = new ArrayList<>();
        List<Column> columns = table.schema().columns();
        for (int j = 0; j < columns.size(); j++) {
            makers.add(maker(columns.get(j).type(), spec.getColumnSpec(j).getType()));
        }
        return makers;
    }

    private Function<Object, DataCell> maker(CellType kind, DataType type) {
        return switch (kind) {
            case DOUBLE -> value -> new DoubleCell(((Number) value).doubleValue());
            case LONG -> value -> new LongCell(((Number) value).longValue());
            case TEXT -> value -> new StringCell((String) value);
            case FLAG -> value -> (Boolean) value ? BooleanCell.TRUE : BooleanCell.FALSE;
            case DATE, DATE_TIME, ZONED_DATE_TIME -> time(type);
            case DOUBLE_LIST, LONG_LIST, TEXT_LIST, FLAG_LIST, DATE_LIST, DATE_TIME_LIST, ZONED_DATE_TIME_LIST ->
                list(maker(kind.entries().orElseThrow(), type.getCollectionElementType()));
        };
    }

    private static Function<Object, DataCell> list(Function<Object, DataCell> entry) {
        return value -> CollectionCellFactory.createListCell(((ListCell) value).entries().stream()
                .map(found -> found.map(entry).orElseGet(DataType::getMissingCell)).toList());
    }

    private Function<Object, DataCell> time(DataType type) {
        Optional<DataCellFactory.FromString> factory = type.equals(StringCell.TYPE) ? Optional.empty() : TimeCells.factory(type, exec);
        return factory.<Function<Object, DataCell>>map(made -> value -> TimeCells.cell(made, value))
                .orElse(value -> new StringCell(value.toString()));
    }
}
