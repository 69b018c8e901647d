package org.knime.core.data.collection;

import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;
import org.knime.core.data.DataValue;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface CollectionDataValue extends DataValue, Iterable<DataCell> {
    DataType getElementType();

    int size();
}
