package org.knime.core.data;

import java.util.Iterator;
import javax.swing.JComponent;
import org.knime.core.node.port.PortObjectSpec;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class DataTableSpec implements PortObjectSpec, Iterable<DataColumnSpec> {
    public DataTableSpec(final DataColumnSpec... columns) {
        throw new UnsupportedOperationException();
    }

    public int getNumColumns() {
        throw new UnsupportedOperationException();
    }

    public DataColumnSpec getColumnSpec(final int index) {
        throw new UnsupportedOperationException();
    }

    public DataColumnSpec getColumnSpec(final String name) {
        throw new UnsupportedOperationException();
    }

    public int findColumnIndex(final String name) {
        throw new UnsupportedOperationException();
    }

    @Override
    public Iterator<DataColumnSpec> iterator() {
        throw new UnsupportedOperationException();
    }

    @Override
    public JComponent[] getViews() {
        throw new UnsupportedOperationException();
    }
}
