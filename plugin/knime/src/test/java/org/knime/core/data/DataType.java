package org.knime.core.data;

import java.util.Objects;
import java.util.Optional;
import org.knime.core.node.ExecutionContext;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class DataType {

    private final Class<? extends DataCell> cell;
    private final DataType element;

    private DataType(final Class<? extends DataCell> cell, final DataType element) {
        this.cell = cell;
        this.element = element;
    }

    public static DataType getType(final Class<? extends DataCell> cell) {
        return new DataType(cell, null);
    }

    public static DataType getType(final Class<? extends DataCell> cell, final DataType element) {
        return new DataType(cell, element);
    }

    public static DataCell getMissingCell() {
        return new MissingCell(null);
    }

    public boolean isCompatible(final Class<? extends DataValue> valueClass) {
        return valueClass.isAssignableFrom(cell);
    }

    public boolean isCollectionType() {
        return element != null;
    }

    public DataType getCollectionElementType() {
        return element;
    }

    @SuppressWarnings("unchecked")
    public Class<? extends DataValue> getPreferredValueClass() {
        return (Class<? extends DataValue>) cell.getInterfaces()[0];
    }

    public Optional<DataCellFactory> getCellFactory(final ExecutionContext exec) {
        return TimeCell.factory(this);
    }

    public String getName() {
        return cell.getSimpleName();
    }

    @Override
    public boolean equals(final Object other) {
        return other instanceof DataType type && type.cell == cell && Objects.equals(type.element, element);
    }

    @Override
    public int hashCode() {
        return cell.hashCode();
    }

    @Override
    public String toString() {
        return getName();
    }
}
