package org.knime.core.node;

import org.knime.core.data.DataTableSpec;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public class ExecutionContext extends ExecutionMonitor {

    public ExecutionContext() {
        super();
    }

    public BufferedDataContainer createDataContainer(final DataTableSpec spec) {
        return new BufferedDataContainer(spec);
    }
}
