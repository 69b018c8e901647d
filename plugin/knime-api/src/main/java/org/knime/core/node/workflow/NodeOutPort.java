package org.knime.core.node.workflow;

import org.knime.core.node.port.PortObject;
import org.knime.core.node.port.PortObjectSpec;

/** Signatures of the platform's public interface of this name; no behaviour. */
public interface NodeOutPort extends NodePort {
    PortObjectSpec getPortObjectSpec();

    PortObject getPortObject();
}
