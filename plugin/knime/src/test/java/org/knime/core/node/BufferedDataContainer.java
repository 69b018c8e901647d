package org.knime.core.node;

import org.knime.core.data.DataTableSpec;
import org.knime.core.data.container.DataContainer;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public class BufferedDataContainer extends DataContainer {

    public BufferedDataContainer(final DataTableSpec spec) {
        super(spec);
    }

    public BufferedDataTable getTable() {
        return new BufferedDataTable(spec, rows);
    }
}
