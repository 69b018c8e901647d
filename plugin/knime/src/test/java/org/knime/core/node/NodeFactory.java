package org.knime.core.node;

import org.knime.core.node.config.ConfigRO;
import org.knime.core.node.config.ConfigWO;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public abstract class NodeFactory<T extends NodeModel> {

    private NodeDescription description;

    protected NodeFactory(final boolean lazyInitialization) {
        // initialised when its settings are loaded
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
        init();
    }

    public void saveAdditionalFactorySettings(final ConfigWO config) {
        // nothing by itself
    }

    public synchronized void init() {
        description = createNodeDescription();
    }

    /** The description, as the platform reads it. */
    public final NodeDescription description() {
        return description;
    }

    /** Views that the factory says it makes. */
    public final int views() {
        return getNrNodeViews();
    }

    /** What a node is for; sets its colour. */
    public enum NodeType {
        Source, Sink, Learner, Predictor, Manipulator, Visualizer, Widget, Meta, LoopStart, LoopEnd, ScopeStart, ScopeEnd, QuickForm,
        Configuration, Other, Missing, Unknown, Subnode, VirtualIn, VirtualOut, Container
    }
}
