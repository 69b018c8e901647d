package org.knime.core.data;

import java.util.List;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class DataColumnSpec {
    private DataColumnSpec() {
        throw new UnsupportedOperationException();
    }

    public String getName() {
        throw new UnsupportedOperationException();
    }

    public List<String> getElementNames() {
        throw new UnsupportedOperationException();
    }

    public DataType getType() {
        throw new UnsupportedOperationException();
    }
}
