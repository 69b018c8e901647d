package org.knime.core.node.workflow;

import org.knime.core.node.NodeModel;

/** Signatures of the platform's public class of this name; no behaviour. */
public class NativeNodeContainer extends SingleNodeContainer {
    NativeNodeContainer() {
        throw new UnsupportedOperationException();
    }

    public NodeModel getNodeModel() {
        throw new UnsupportedOperationException();
    }

    @Override
    public String getName() {
        throw new UnsupportedOperationException();
    }

    @Override
    public NodeOutPort getOutPort(final int index) {
        throw new UnsupportedOperationException();
    }

    @Override
    public int getNrOutPorts() {
        throw new UnsupportedOperationException();
    }
}
