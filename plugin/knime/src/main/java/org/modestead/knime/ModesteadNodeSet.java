package org.modestead.knime;

import java.util.Collection;
import java.util.List;
import java.util.Locale;
import org.knime.core.node.NodeFactory;
import org.knime.core.node.NodeModel;
import org.knime.core.node.NodeSetFactory;
import org.knime.core.node.NodeSettings;
import org.knime.core.node.config.ConfigRO;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;

/**
 * Offers every node that is found as one of the platform's: the same factory class, told by its settings which node it stands for.
 * The class names and the ids are what saved workflows hold: they never change.
 */
public final class ModesteadNodeSet implements NodeSetFactory {

    private static final String CATEGORY = "/community/modestead/";

    private final NodeCatalog catalog = NodeOffer.find();

    @Override
    public Collection<String> getNodeFactoryIds() {
        return catalog.ids();
    }

    @Override
    public Class<? extends NodeFactory<? extends NodeModel>> getNodeFactory(String id) {
        return DeclaredNodeFactory.class;
    }

    /** One category a stage; they are registered in plugin.xml. */
    @Override
    public String getCategoryPath(String id) {
        return CATEGORY + declaration(id).stage().name().toLowerCase(Locale.ROOT);
    }

    /** Nodes of a stage stand in working order: each after the one before. */
    @Override
    public String getAfterID(String id) {
        List<String> sameStage = catalog.nodes().stream().map(Node::declaration)
                .filter(other -> other.stage() == declaration(id).stage()).map(NodeDeclaration::id).toList();
        int at = sameStage.indexOf(id);
        return at == 0 ? "" : DeclaredNodeFactory.class.getName() + "#" + sameStage.get(at - 1);
    }

    @Override
    public ConfigRO getAdditionalSettings(String id) {
        NodeSettings settings = new NodeSettings("node");
        settings.addString(DeclaredNodeFactory.NODE, id);
        return settings;
    }

    private NodeDeclaration declaration(String id) {
        return catalog.find(id).map(Node::declaration)
                .orElseThrow(() -> new IllegalArgumentException("there is no node " + id));
    }
}
