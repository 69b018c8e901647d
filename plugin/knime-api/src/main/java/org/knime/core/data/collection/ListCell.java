package org.knime.core.data.collection;

import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class ListCell extends DataCell implements ListDataValue {
    private static final long serialVersionUID = 1L;

    public static final DataType getCollectionType(final DataType elementType) {
        throw new UnsupportedOperationException();
    }
}
