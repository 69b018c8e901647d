package org.knime.core.node.workflow;

import org.knime.core.node.NodeDialogPane;
import org.knime.core.node.NotConfigurableException;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class NodeContainer {
    public final NodeID getID() {
        throw new UnsupportedOperationException();
    }

    public final NodeMessage getNodeMessage() {
        throw new UnsupportedOperationException();
    }

    public NodeContainerState getNodeContainerState() {
        throw new UnsupportedOperationException();
    }

    public void setUIInformation(final NodeUIInformation uiInformation) {
        throw new UnsupportedOperationException();
    }

    public NodeDialogPane getDialogPaneWithSettings() throws NotConfigurableException {
        throw new UnsupportedOperationException();
    }

    public abstract String getName();

    public abstract NodeOutPort getOutPort(int index);

    public abstract int getNrOutPorts();
}
