package org.knime.core.data.collection;

import org.knime.core.data.DataCell;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface ListDataValue extends CollectionDataValue {
    DataCell get(int index);
}
