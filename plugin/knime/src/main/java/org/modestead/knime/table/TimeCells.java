package org.modestead.knime.table;

import java.util.Optional;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataCellFactory;
import org.knime.core.data.DataType;
import org.knime.core.data.DataTypeRegistry;
import org.knime.core.data.DataValue;
import org.knime.core.data.time.localdate.LocalDateValue;
import org.knime.core.data.time.localdatetime.LocalDateTimeValue;
import org.knime.core.data.time.zoneddatetime.ZonedDateTimeValue;
import org.knime.core.node.ExecutionContext;
import org.modestead.nodes.table.CellType;

/**
 * Date and time cells. The core knows what such cells hold, but another bundle brings the cells themselves and may be absent;
 * they are asked for through the platform's register of types, and where there is none times are written as text.
 */
final class TimeCells {

    private TimeCells() {}

    /** Returns the platform's type for a kind of time, empty where this installation has none. */
    static Optional<DataType> type(CellType kind) {
        Class<? extends DataValue> value = valueClass(kind);
        return DataTypeRegistry.getInstance().availableDataTypes().stream()
                .filter(type -> value.equals(type.getPreferredValueClass())).findFirst();
    }

    /** Returns the maker of cells of a time type from ISO text. */
    static Optional<DataCellFactory.FromString> factory(DataType type, ExecutionContext exec) {
        return type.getCellFactory(exec).filter(DataCellFactory.FromString.class::isInstance)
                .map(DataCellFactory.FromString.class::cast);
    }

    /** Makes a cell of a date, date-time or zoned date-time, each of which writes itself as ISO text. */
    static DataCell cell(DataCellFactory.FromString factory, Object time) {
        return factory.createCell(time.toString());
    }

    private static Class<? extends DataValue> valueClass(CellType kind) {
        return switch (kind) {
            case DATE -> LocalDateValue.class;
            case DATE_TIME -> LocalDateTimeValue.class;
            case ZONED_DATE_TIME -> ZonedDateTimeValue.class;
            default -> throw new IllegalArgumentException(kind + " is no time");
        };
    }
}
