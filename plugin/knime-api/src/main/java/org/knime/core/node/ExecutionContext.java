package org.knime.core.node;

import org.knime.core.data.DataTableSpec;

/** Signatures of the platform's public class of this name; no behaviour. */
public class ExecutionContext extends ExecutionMonitor {
    protected ExecutionContext() {
        throw new UnsupportedOperationException();
    }

    public BufferedDataContainer createDataContainer(final DataTableSpec spec) {
        throw new UnsupportedOperationException();
    }
}
