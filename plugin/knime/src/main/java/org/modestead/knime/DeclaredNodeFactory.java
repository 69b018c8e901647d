package org.modestead.knime;

import java.util.Optional;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeDescription;
import org.knime.core.node.NodeDialogPane;
import org.knime.core.node.NodeFactory;
import org.knime.core.node.NodeView;
import org.knime.core.node.ParameterizedNodeFactory;
import org.knime.core.node.config.ConfigRO;
import org.knime.core.node.config.ConfigWO;
import org.modestead.knime.describe.DeclaredDescription;
import org.modestead.knime.dialog.DeclaredDialog;
import org.modestead.knime.view.ResultView;
import org.modestead.nodes.contract.Node;

/**
 * Makes the native node for one declaration. The only class that knows how the platform makes nodes, dialogs and views: where that
 * changes from release to release, it changes here.
 */
public final class DeclaredNodeFactory extends NodeFactory<DeclaredNodeModel> implements ParameterizedNodeFactory {

    /** Key of the factory settings under which the node's id is kept. */
    static final String NODE = "node";

    private Optional<Node> node = Optional.empty();

    /** Made by the platform; which node it stands for is told by {@link #loadAdditionalFactorySettings}. */
    public DeclaredNodeFactory() {
        super(true);
    }

    @Override
    public void loadAdditionalFactorySettings(ConfigRO config) throws InvalidSettingsException {
        String id = config.getString(NODE);
        node = NodeOffer.find().find(id);
        if (node.isEmpty()) {
            throw new InvalidSettingsException("There is no node " + id + " in this installation; install the release, or the extension,"
                    + " that brings it.");
        }
        super.loadAdditionalFactorySettings(config);
    }

    @Override
    public void saveAdditionalFactorySettings(ConfigWO config) {
        config.addString(NODE, getFactoryIdUniquifier());
        super.saveAdditionalFactorySettings(config);
    }

    @Override
    public String getFactoryIdUniquifier() {
        return node().declaration().id();
    }

    @Override
    protected NodeDescription createNodeDescription() {
        return new DeclaredDescription(node().declaration());
    }

    @Override
    public DeclaredNodeModel createNodeModel() {
        return new DeclaredNodeModel(node());
    }

    @Override
    protected int getNrNodeViews() {
        return 1;
    }

    @Override
    public NodeView<DeclaredNodeModel> createNodeView(int viewIndex, DeclaredNodeModel nodeModel) {
        return new ResultView<>(nodeModel, nodeModel::shown);
    }

    @Override
    protected boolean hasDialog() {
        return true;
    }

    @Override
    protected NodeDialogPane createNodeDialogPane() {
        return new DeclaredDialog(node());
    }

    private Node node() {
        return node.orElseThrow(() -> new IllegalStateException("the factory has not been told which node it stands for"));
    }
}
