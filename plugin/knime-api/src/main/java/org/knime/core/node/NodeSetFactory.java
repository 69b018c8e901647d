package org.knime.core.node;

import java.util.Collection;
import org.knime.core.node.config.ConfigRO;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface NodeSetFactory {
    Collection<String> getNodeFactoryIds();

    Class<? extends NodeFactory<? extends NodeModel>> getNodeFactory(String id);

    String getCategoryPath(String id);

    String getAfterID(String id);

    ConfigRO getAdditionalSettings(String id);

    default boolean isHidden() {
        return false;
    }
}
