package org.knime.core.node.config;

import org.knime.core.node.config.base.ConfigBaseWO;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface ConfigWO extends ConfigBaseWO {
    Config addConfig(String key);
}
