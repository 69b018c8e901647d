package org.knime.core.node.extension;

import java.util.Optional;
import org.knime.core.node.NodeFactory;
import org.knime.core.node.NodeModel;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class NodeFactoryProvider {
    private NodeFactoryProvider() {
        throw new UnsupportedOperationException();
    }

    public static synchronized NodeFactoryProvider getInstance() {
        throw new UnsupportedOperationException();
    }

    public <T extends NodeModel> Optional<NodeFactory<T>> getNodeFactory(final String factoryClassName)
            throws InstantiationException, IllegalAccessException, InvalidNodeFactoryExtensionException {
        throw new UnsupportedOperationException();
    }
}
