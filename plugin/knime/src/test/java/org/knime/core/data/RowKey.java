package org.knime.core.data;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class RowKey {

    private final String id;

    public RowKey(final String id) {
        this.id = id;
    }

    public String getString() {
        return id;
    }

    public static RowKey createRowKey(final long rowIndex) {
        return new RowKey("Row" + rowIndex);
    }
}
