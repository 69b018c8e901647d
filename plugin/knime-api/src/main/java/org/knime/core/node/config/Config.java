package org.knime.core.node.config;

import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.config.base.ConfigBase;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class Config extends ConfigBase implements ConfigRO, ConfigWO {
    @Override
    public final Config getConfig(final String key) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    @Override
    public final Config addConfig(final String key) {
        throw new UnsupportedOperationException();
    }
}
