package org.modestead.knime;

import java.util.ArrayList;
import java.util.List;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;

/**
 * The nodes that this platform is offered: all that are found, whichever bundle brings them. Nodes that read and write tables are the
 * embedded host's own and not there: the platform has better ones.
 */
final class NodeOffer {

    private NodeOffer() {}

    /**
     * Finds the nodes. Service files are read through the class loader of the nodes' own bundle and through the thread's: an OSGi
     * bundle sees its own service files only.
     */
    static NodeCatalog find() {
        List<ClassLoader> loaders = new ArrayList<>(List.of(Node.class.getClassLoader()));
        ClassLoader context = Thread.currentThread().getContextClassLoader();
        if (context != null) {
            loaders.add(context);
        }
        return NodeCatalog.load(loaders);
    }
}
