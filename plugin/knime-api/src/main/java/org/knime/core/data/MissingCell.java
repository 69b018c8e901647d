package org.knime.core.data;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class MissingCell extends DataCell implements MissingValue {
    private static final long serialVersionUID = 1L;

    public MissingCell(final String error) {
        throw new UnsupportedOperationException();
    }

    @Override
    public String getError() {
        throw new UnsupportedOperationException();
    }

    @Override
    public String toString() {
        throw new UnsupportedOperationException();
    }
}
