package org.knime.core.data;

import java.util.Collection;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class DataTypeRegistry {
    private DataTypeRegistry() {
        throw new UnsupportedOperationException();
    }

    public static DataTypeRegistry getInstance() {
        throw new UnsupportedOperationException();
    }

    public synchronized Collection<DataType> availableDataTypes() {
        throw new UnsupportedOperationException();
    }
}
