package org.modestead.knime.trial;

import java.util.List;
import org.knime.core.node.NodeFactory;
import org.knime.core.node.extension.NodeFactoryProvider;
import org.modestead.knime.DeclaredNodeFactory;
import org.modestead.knime.ModesteadNodeSet;

/** The nodes that the platform offers. */
final class Offered {

    private Offered() {}

    static List<String> ids() {
        return new ModesteadNodeSet().getNodeFactoryIds().stream().filter(id -> !id.equals(EchoNode.ID)).toList();
    }

    /** Makes a factory as the platform does: by class name through its extension points, then with the stored settings. */
    static NodeFactory<?> factory(String node) throws Exception {
        boolean platforms = node.contains(".");
        String name = platforms ? node : DeclaredNodeFactory.class.getName();
        NodeFactory<?> factory = NodeFactoryProvider.getInstance().getNodeFactory(name)
                .orElseThrow(() -> new IllegalArgumentException("the platform offers no " + name));
        if (!platforms) {
            factory.loadAdditionalFactorySettings(new ModesteadNodeSet().getAdditionalSettings(node));
        }
        return factory;
    }

    /** Returns the title and the XML element name of a node's description, which the platform has read by then. */
    static List<String> description(String node) throws Exception {
        NodeFactory<?> factory = factory(node);
        return List.of(factory.getNodeName(), factory.getXMLDescription().getTagName());
    }
}
