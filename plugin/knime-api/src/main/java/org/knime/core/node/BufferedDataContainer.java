package org.knime.core.node;

import org.knime.core.data.container.DataContainer;

/** Signatures of the platform's public class of this name; no behaviour. */
public class BufferedDataContainer extends DataContainer {
    protected BufferedDataContainer() {
        throw new UnsupportedOperationException();
    }

    public BufferedDataTable getTable() {
        throw new UnsupportedOperationException();
    }
}
