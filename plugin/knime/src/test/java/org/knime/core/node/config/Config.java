package org.knime.core.node.config;

import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.config.base.ConfigBase;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public abstract class Config extends ConfigBase implements ConfigRO, ConfigWO {

    protected Config(final String name) {
        super(name);
    }

    @Override
    public final Config getConfig(final String key) throws InvalidSettingsException {
        if (entries.get(key) instanceof Config config) {
            return config;
        }
        throw new InvalidSettingsException("no part " + key);
    }

    @Override
    public final Config addConfig(final String key) {
        Config made = (Config) child(key);
        entries.put(key, made);
        return made;
    }
}
