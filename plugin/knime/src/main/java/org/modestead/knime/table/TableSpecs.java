package org.modestead.knime.table;

import java.util.ArrayList;
import java.util.List;
import org.knime.core.data.DataColumnSpec;
import org.knime.core.data.DataColumnSpecCreator;
import org.knime.core.data.DataTableSpec;
import org.knime.core.data.DataType;
import org.knime.core.data.collection.ListCell;
import org.knime.core.data.def.BooleanCell;
import org.knime.core.data.def.DoubleCell;
import org.knime.core.data.def.LongCell;
import org.knime.core.data.def.StringCell;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

/** Column names and types of tables, from the platform's to the nodes' and back. */
public final class TableSpecs {

    private TableSpecs() {}

    /** Returns the columns that the nodes can read; others are left out, as if they were not there. */
    public static TableSchema schema(DataTableSpec spec) {
        List<Column> columns = new ArrayList<>();
        for (DataColumnSpec column : spec) {
            CellTypes.kind(column.getType()).ifPresent(kind -> columns.add(new Column(column.getName(), kind, entries(column, kind))));
        }
        return new TableSchema(columns);
    }

    /** Names of entries, as the platform's own node that gathers columns into lists leaves them. */
    private static List<String> entries(DataColumnSpec column, CellType kind) {
        return kind.entries().isPresent() ? column.getElementNames() : List.of();
    }

    /** Returns the platform's spec for a table of the nodes. */
    public static DataTableSpec spec(TableSchema schema) {
        return new DataTableSpec(schema.columns().stream().map(TableSpecs::spec).toArray(DataColumnSpec[]::new));
    }

    private static DataColumnSpec spec(Column column) {
        DataColumnSpecCreator creator = new DataColumnSpecCreator(column.name(), type(column.type()));
        creator.setElementNames(column.entries().toArray(String[]::new));
        return creator.createSpec();
    }

    private static DataType type(CellType kind) {
        return switch (kind) {
            case DOUBLE -> DoubleCell.TYPE;
            case LONG -> LongCell.TYPE;
            case TEXT -> StringCell.TYPE;
            case FLAG -> BooleanCell.TYPE;
            case DATE, DATE_TIME, ZONED_DATE_TIME -> TimeCells.type(kind).orElse(StringCell.TYPE);
            case DOUBLE_LIST, LONG_LIST, TEXT_LIST, FLAG_LIST, DATE_LIST, DATE_TIME_LIST, ZONED_DATE_TIME_LIST ->
                ListCell.getCollectionType(type(kind.entries().orElseThrow()));
        };
    }
}
