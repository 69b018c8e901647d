package org.knime.core.node;

import org.knime.core.node.config.ConfigRO;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface NodeSettingsRO extends ConfigRO {
    NodeSettingsRO getNodeSettings(String key) throws InvalidSettingsException;
}
