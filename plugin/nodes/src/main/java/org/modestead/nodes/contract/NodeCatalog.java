package org.modestead.nodes.contract;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.ServiceConfigurationError;
import java.util.ServiceLoader;

/** The nodes that a host offers, in the order of {@link NodeDeclaration.Stage} and, within a stage, as found. */
public final class NodeCatalog {

    private final Map<String, Node> byId;

    private NodeCatalog(Map<String, Node> byId) {
        this.byId = byId;
    }

    /**
     * Makes a catalog of given nodes.
     *
     * @throws CatalogFault if two have the same id
     */
    public static NodeCatalog of(List<Node> nodes) {
        List<Node> ordered = new ArrayList<>(nodes);
        ordered.sort(Comparator.comparing(node -> node.declaration().stage()));
        Map<String, Node> byId = new LinkedHashMap<>();
        for (Node node : ordered) {
            String id = node.declaration().id();
            Node other = byId.putIfAbsent(id, node);
            if (other != null) {
                throw new CatalogFault("node " + id, "two nodes with this id, " + other.getClass().getName() + " and "
                        + node.getClass().getName(), "remove one of them or give it another id");
            }
        }
        return new NodeCatalog(byId);
    }

    /**
     * Finds nodes through {@link ServiceLoader}.
     *
     * @param loaders asked in this order; a class that several of them see counts once
     * @throws CatalogFault if a node cannot be made or two have the same id
     */
    public static NodeCatalog load(List<ClassLoader> loaders) {
        Map<Class<?>, Node> found = new LinkedHashMap<>();
        try {
            for (ClassLoader loader : loaders) {
                ServiceLoader.load(Node.class, loader).forEach(node -> found.putIfAbsent(node.getClass(), node));
            }
        } catch (ServiceConfigurationError broken) {
            throw new CatalogFault("nodes on the class path", String.valueOf(broken.getMessage()),
                    "remove or repair the extension that brings it");
        }
        return of(List.copyOf(found.values()));
    }

    /** Returns all nodes in order. */
    public List<Node> nodes() {
        return List.copyOf(byId.values());
    }

    /** Returns the ids in order. */
    public List<String> ids() {
        return List.copyOf(byId.keySet());
    }

    /** Returns the node of an id. */
    public Optional<Node> find(String id) {
        return Optional.ofNullable(byId.get(id));
    }

    /** Returns the known id that a mistyped one probably means. */
    public Optional<String> nearest(String id) {
        return NearestName.of(id, byId.keySet());
    }
}
