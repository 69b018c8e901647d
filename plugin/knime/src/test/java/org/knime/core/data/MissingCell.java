package org.knime.core.data;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class MissingCell extends DataCell implements MissingValue {
    private static final long serialVersionUID = 1L;
    private final String error;

    public MissingCell(final String error) {
        super();
        this.error = error;
    }

    @Override
    public String getError() {
        return error;
    }

    @Override
    public boolean isMissing() {
        return true;
    }

    @Override
    public String toString() {
        return "?";
    }
}
