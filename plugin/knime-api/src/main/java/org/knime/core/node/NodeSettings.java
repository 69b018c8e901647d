package org.knime.core.node;

import java.io.IOException;
import java.io.InputStream;
import org.knime.core.node.config.Config;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class NodeSettings extends Config implements NodeSettingsRO, NodeSettingsWO {
    public NodeSettings(final String key) {
        throw new UnsupportedOperationException();
    }

    public static NodeSettingsRO loadFromXML(final InputStream in) throws IOException {
        throw new UnsupportedOperationException();
    }

    @Override
    public NodeSettingsWO addNodeSettings(final String key) {
        throw new UnsupportedOperationException();
    }

    @Override
    public NodeSettings getNodeSettings(final String key) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }
}
