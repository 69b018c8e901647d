package org.knime.core.data;

import java.util.Iterator;
import java.util.List;
import javax.swing.JComponent;
import org.knime.core.node.port.PortObjectSpec;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class DataTableSpec implements PortObjectSpec, Iterable<DataColumnSpec> {

    private final List<DataColumnSpec> columns;

    public DataTableSpec(final DataColumnSpec... columns) {
        this.columns = List.of(columns);
    }

    public int getNumColumns() {
        return columns.size();
    }

    public DataColumnSpec getColumnSpec(final int index) {
        return columns.get(index);
    }

    public DataColumnSpec getColumnSpec(final String name) {
        int index = findColumnIndex(name);
        return index < 0 ? null : columns.get(index);
    }

    public int findColumnIndex(final String name) {
        return columns.stream().map(DataColumnSpec::getName).toList().indexOf(name);
    }

    @Override
    public Iterator<DataColumnSpec> iterator() {
        return columns.iterator();
    }

    @Override
    public JComponent[] getViews() {
        return new JComponent[0];
    }

    @Override
    public boolean equals(final Object other) {
        return other instanceof DataTableSpec spec && spec.columns.equals(columns);
    }

    @Override
    public int hashCode() {
        return columns.hashCode();
    }

    @Override
    public String toString() {
        return columns.toString();
    }
}
