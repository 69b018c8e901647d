package org.knime.core.data;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class RowKey {
    public RowKey(final String id) {
        throw new UnsupportedOperationException();
    }

    public String getString() {
        throw new UnsupportedOperationException();
    }

    public static RowKey createRowKey(final long rowIndex) {
        throw new UnsupportedOperationException();
    }
}
