package org.knime.core.node;

import java.awt.Component;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class NodeView<T extends NodeModel> extends AbstractNodeView<T> {
    protected NodeView(final T nodeModel) {
        super(nodeModel);
    }

    protected T getNodeModel() {
        throw new UnsupportedOperationException();
    }

    protected final void setComponent(final Component component) {
        throw new UnsupportedOperationException();
    }

    protected final void setShowNODATALabel(final boolean show) {
        throw new UnsupportedOperationException();
    }

    protected abstract void onClose();

    protected abstract void onOpen();
}
