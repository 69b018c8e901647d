package org.knime.core.node;

import org.knime.core.node.config.ConfigWO;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface NodeSettingsWO extends ConfigWO {
    NodeSettingsWO addNodeSettings(String key);
}
