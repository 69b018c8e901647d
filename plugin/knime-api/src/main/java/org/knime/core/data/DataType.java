package org.knime.core.data;

import java.util.Optional;
import org.knime.core.node.ExecutionContext;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class DataType {
    private DataType() {
        throw new UnsupportedOperationException();
    }

    public static DataType getType(final Class<? extends DataCell> cell) {
        throw new UnsupportedOperationException();
    }

    public static DataCell getMissingCell() {
        throw new UnsupportedOperationException();
    }

    public boolean isCompatible(final Class<? extends DataValue> valueClass) {
        throw new UnsupportedOperationException();
    }

    public boolean isCollectionType() {
        throw new UnsupportedOperationException();
    }

    public DataType getCollectionElementType() {
        throw new UnsupportedOperationException();
    }

    public Class<? extends DataValue> getPreferredValueClass() {
        throw new UnsupportedOperationException();
    }

    public Optional<DataCellFactory> getCellFactory(final ExecutionContext exec) {
        throw new UnsupportedOperationException();
    }

    public String getName() {
        throw new UnsupportedOperationException();
    }
}
