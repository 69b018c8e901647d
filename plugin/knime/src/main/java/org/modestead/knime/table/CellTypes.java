package org.modestead.knime.table;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.knime.core.data.BooleanValue;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;
import org.knime.core.data.DoubleValue;
import org.knime.core.data.LongValue;
import org.knime.core.data.StringValue;
import org.knime.core.data.collection.CollectionDataValue;
import org.knime.core.data.collection.ListDataValue;
import org.knime.core.data.time.localdate.LocalDateValue;
import org.knime.core.data.time.localdatetime.LocalDateTimeValue;
import org.knime.core.data.time.zoneddatetime.ZonedDateTimeValue;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.ListCell;

/**
 * What a column of the platform is to the nodes, and how its cells are read.
 *
 * <p>A type counts as the narrowest kind it can be read as: a true/false cell of the platform can be read as a number too, and a
 * date as text. A set, a list of lists and a list of mixed cells are read as text, their entries in brackets.
 */
final class CellTypes {

    private CellTypes() {}

    /** Returns the kind, empty for a type that the nodes cannot read (pictures, mixed columns). */
    static Optional<CellType> kind(DataType type) {
        if (!type.isCompatible(CollectionDataValue.class)) {
            return single(type);
        }
        Optional<CellType> list = type.isCompatible(ListDataValue.class)
                ? kind(type.getCollectionElementType()).flatMap(CellType::listOf) : Optional.empty();
        return list.or(() -> Optional.of(CellType.TEXT));
    }

    private static Optional<CellType> single(DataType type) {
        if (type.isCompatible(LocalDateValue.class)) {
            return Optional.of(CellType.DATE);
        } else if (type.isCompatible(LocalDateTimeValue.class)) {
            return Optional.of(CellType.DATE_TIME);
        } else if (type.isCompatible(ZonedDateTimeValue.class)) {
            return Optional.of(CellType.ZONED_DATE_TIME);
        } else if (type.isCompatible(BooleanValue.class)) {
            return Optional.of(CellType.FLAG);
        } else if (type.isCompatible(LongValue.class)) {
            return Optional.of(CellType.LONG);
        } else if (type.isCompatible(DoubleValue.class)) {
            return Optional.of(CellType.DOUBLE);
        }
        return type.isCompatible(StringValue.class) ? Optional.of(CellType.TEXT) : Optional.empty();
    }

    /** Reads a cell as the Java type that the kind names; empty when missing. */
    static Optional<Object> read(DataCell cell, CellType kind) {
        if (cell.isMissing()) {
            return Optional.empty();
        }
        return switch (kind) {
            case DOUBLE -> Optional.of(((DoubleValue) cell).getDoubleValue()).filter(value -> !value.isNaN()).map(Object.class::cast);
            case LONG -> Optional.of(((LongValue) cell).getLongValue());
            case FLAG -> Optional.of(((BooleanValue) cell).getBooleanValue());
            case DATE -> Optional.of(((LocalDateValue) cell).getLocalDate());
            case DATE_TIME -> Optional.of(((LocalDateTimeValue) cell).getLocalDateTime());
            case ZONED_DATE_TIME -> Optional.of(((ZonedDateTimeValue) cell).getZonedDateTime());
            case TEXT -> Optional.of(cell instanceof StringValue text ? text.getStringValue() : cell.toString());
            case DOUBLE_LIST, LONG_LIST, TEXT_LIST, FLAG_LIST, DATE_LIST, DATE_TIME_LIST, ZONED_DATE_TIME_LIST ->
                Optional.of(list((ListDataValue) cell, kind.entries().orElseThrow()));
        };
    }

    private static ListCell list(ListDataValue cell, CellType entries) {
        List<Optional<Object>> list = new ArrayList<>(cell.size());
        cell.forEach(entry -> list.add(read(entry, entries)));
        return new ListCell(list);
    }

    /** Reads a number; NaN when missing. */
    static double number(DataCell cell) {
        if (cell.isMissing()) {
            return Double.NaN;
        }
        return cell instanceof DoubleValue number ? number.getDoubleValue() : ((LongValue) cell).getLongValue();
    }
}
