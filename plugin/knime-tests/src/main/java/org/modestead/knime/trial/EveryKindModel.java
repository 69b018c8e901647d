package org.modestead.knime.trial;

import java.io.File;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataCellFactory;
import org.knime.core.data.DataColumnSpec;
import org.knime.core.data.DataColumnSpecCreator;
import org.knime.core.data.DataTableSpec;
import org.knime.core.data.DataType;
import org.knime.core.data.DataTypeRegistry;
import org.knime.core.data.RowKey;
import org.knime.core.data.collection.CollectionCellFactory;
import org.knime.core.data.collection.ListCell;
import org.knime.core.data.def.BooleanCell;
import org.knime.core.data.def.DefaultRow;
import org.knime.core.data.def.DoubleCell;
import org.knime.core.data.def.IntCell;
import org.knime.core.data.def.LongCell;
import org.knime.core.data.def.StringCell;
import org.knime.core.data.time.localdate.LocalDateValue;
import org.knime.core.data.time.localdatetime.LocalDateTimeValue;
import org.knime.core.data.time.zoneddatetime.ZonedDateTimeValue;
import org.knime.core.node.BufferedDataContainer;
import org.knime.core.node.BufferedDataTable;
import org.knime.core.node.ExecutionContext;
import org.knime.core.node.ExecutionMonitor;
import org.knime.core.node.NodeModel;
import org.knime.core.node.NodeSettingsRO;
import org.knime.core.node.NodeSettingsWO;
import org.knime.core.node.port.PortObject;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.port.PortType;
import org.knime.core.node.port.PortTypeRegistry;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.RowCursor;

/** Makes the table of {@link EveryKind} out of the platform's own cells. */
final class EveryKindModel extends NodeModel {

    EveryKindModel() {
        super(new PortType[0], new PortType[] {PortTypeRegistry.getInstance().getPortType(BufferedDataTable.class, false)});
    }

    @Override
    protected PortObjectSpec[] configure(PortObjectSpec[] inSpecs) {
        return new PortObjectSpec[] {spec()};
    }

    private static DataTableSpec spec() {
        return new DataTableSpec(EveryKind.schema().columns().stream().map(column -> {
            DataColumnSpecCreator creator = new DataColumnSpecCreator(column.name(), type(column));
            creator.setElementNames(column.entries().toArray(String[]::new));
            return creator.createSpec();
        }).toArray(DataColumnSpec[]::new));
    }

    @Override
    protected PortObject[] execute(PortObject[] inObjects, ExecutionContext exec) {
        BufferedDataContainer container = exec.createDataContainer(spec());
        List<Column> columns = EveryKind.schema().columns();
        try (RowCursor cursor = EveryKind.table().open()) {
            while (cursor.next()) {
                List<DataCell> cells = new ArrayList<>();
                for (int j = 0; j < columns.size(); j++) {
                    cells.add(cell(type(columns.get(j)), cursor.cell(j), exec));
                }
                container.addRowToTable(new DefaultRow(RowKey.createRowKey(cursor.row() - 1), cells.toArray(DataCell[]::new)));
            }
        }
        container.close();
        return new PortObject[] {container.getTable()};
    }

    private static DataCell cell(DataType type, Optional<Object> value, ExecutionContext exec) {
        if (value.isEmpty()) {
            return DataType.getMissingCell();
        } else if (value.get() instanceof org.modestead.nodes.table.ListCell list) {
            return CollectionCellFactory.createListCell(list.entries().stream().map(entry -> cell(type.getCollectionElementType(), entry, exec)).toList());
        } else if (value.get() instanceof Double number) {
            return new DoubleCell(number);
        } else if (value.get() instanceof Long whole) {
            return type.equals(IntCell.TYPE) ? new IntCell(whole.intValue()) : new LongCell(whole);
        } else if (value.get() instanceof Boolean flag) {
            return flag ? BooleanCell.TRUE : BooleanCell.FALSE;
        }
        return value.get() instanceof String text ? new StringCell(text)
                : ((DataCellFactory.FromString) type.getCellFactory(exec).orElseThrow()).createCell(value.get().toString());
    }

    private static DataType type(Column column) {
        return column.name().equals("int") ? IntCell.TYPE : type(column.type());
    }

    private static DataType type(CellType type) {
        return switch (type) {
            case DOUBLE -> DoubleCell.TYPE;
            case LONG -> LongCell.TYPE;
            case TEXT -> StringCell.TYPE;
            case FLAG -> BooleanCell.TYPE;
            case DATE -> time(LocalDateValue.class);
            case DATE_TIME -> time(LocalDateTimeValue.class);
            case ZONED_DATE_TIME -> time(ZonedDateTimeValue.class);
            default -> ListCell.getCollectionType(type(type.entries().orElseThrow()));
        };
    }

    private static DataType time(Class<?> value) {
        return DataTypeRegistry.getInstance().availableDataTypes().stream().filter(type -> value.equals(type.getPreferredValueClass())).findFirst()
                .orElseThrow();
    }

    @Override
    protected void saveSettingsTo(NodeSettingsWO settings) {
        // there are none
    }

    @Override
    protected void validateSettings(NodeSettingsRO settings) {
        // there are none
    }

    @Override
    protected void loadValidatedSettingsFrom(NodeSettingsRO settings) {
        // there are none
    }

    @Override
    protected void reset() {
        // nothing is kept
    }

    @Override
    protected void loadInternals(File folder, ExecutionMonitor exec) {
        // nothing is kept
    }

    @Override
    protected void saveInternals(File folder, ExecutionMonitor exec) {
        // nothing is kept
    }
}
