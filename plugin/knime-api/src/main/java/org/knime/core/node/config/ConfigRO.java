package org.knime.core.node.config;

import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.config.base.ConfigBaseRO;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface ConfigRO extends ConfigBaseRO {
    Config getConfig(String key) throws InvalidSettingsException;
}
