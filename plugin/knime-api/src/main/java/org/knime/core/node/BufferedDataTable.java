package org.knime.core.node;

import javax.swing.JComponent;
import org.knime.core.data.DataTable;
import org.knime.core.data.DataTableSpec;
import org.knime.core.data.container.CloseableRowIterator;
import org.knime.core.node.port.PortObject;
import org.knime.core.node.port.PortType;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class BufferedDataTable implements DataTable, PortObject {
    public static final PortType TYPE = null;

    public static final PortType TYPE_OPTIONAL = null;

    private BufferedDataTable() {
        throw new UnsupportedOperationException();
    }

    @Override
    public DataTableSpec getDataTableSpec() {
        throw new UnsupportedOperationException();
    }

    @Override
    public DataTableSpec getSpec() {
        throw new UnsupportedOperationException();
    }

    @Override
    public String getSummary() {
        throw new UnsupportedOperationException();
    }

    public CloseableRowIterator iterator() {
        throw new UnsupportedOperationException();
    }

    public long size() {
        throw new UnsupportedOperationException();
    }

    @Override
    public JComponent[] getViews() {
        throw new UnsupportedOperationException();
    }
}
