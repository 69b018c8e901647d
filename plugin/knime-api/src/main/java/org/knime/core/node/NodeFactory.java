package org.knime.core.node;

import org.knime.core.node.config.ConfigRO;
import org.knime.core.node.config.ConfigWO;
import org.w3c.dom.Element;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class NodeFactory<T extends NodeModel> {
    protected NodeFactory() {
        throw new UnsupportedOperationException();
    }

    protected NodeFactory(final boolean lazyInitialization) {
        throw new UnsupportedOperationException();
    }

    public abstract T createNodeModel();

    protected abstract int getNrNodeViews();

    public abstract NodeView<T> createNodeView(int viewIndex, T nodeModel);

    protected abstract boolean hasDialog();

    protected abstract NodeDialogPane createNodeDialogPane();

    protected NodeDescription createNodeDescription() {
        throw new UnsupportedOperationException();
    }

    public void loadAdditionalFactorySettings(final ConfigRO config) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    public void saveAdditionalFactorySettings(final ConfigWO config) {
        throw new UnsupportedOperationException();
    }

    public synchronized void init() {
        throw new UnsupportedOperationException();
    }

    public final String getNodeName() {
        throw new UnsupportedOperationException();
    }

    public Element getXMLDescription() {
        throw new UnsupportedOperationException();
    }

    /** What a node is for; sets its colour. */
    public enum NodeType {
        Source, Sink, Learner, Predictor, Manipulator, Visualizer, Widget, Meta, LoopStart, LoopEnd, ScopeStart, ScopeEnd, QuickForm,
        Configuration, Other, Missing, Unknown, Subnode, VirtualIn, VirtualOut, Container
    }
}
