package org.knime.core.data.collection;

import java.util.Iterator;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;

/** Signatures of the platform's public class of this name; no behaviour. */
public class ListCell extends DataCell implements ListDataValue {
    private static final long serialVersionUID = 1L;

    ListCell() {
        throw new UnsupportedOperationException();
    }

    public static final DataType getCollectionType(final DataType elementType) {
        throw new UnsupportedOperationException();
    }

    @Override
    public DataType getElementType() {
        throw new UnsupportedOperationException();
    }

    @Override
    public Iterator<DataCell> iterator() {
        throw new UnsupportedOperationException();
    }

    @Override
    public DataCell get(final int index) {
        throw new UnsupportedOperationException();
    }

    @Override
    public int size() {
        throw new UnsupportedOperationException();
    }

    @Override
    public String toString() {
        throw new UnsupportedOperationException();
    }
}
