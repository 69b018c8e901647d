package org.knime.core.node.util;

import org.knime.core.node.workflow.NodeExecutionJobManagerFactory;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class NodeExecutionJobManagerPool {
    private NodeExecutionJobManagerPool() {
        throw new UnsupportedOperationException();
    }

    public static NodeExecutionJobManagerFactory getJobManagerFactory(final String id) {
        throw new UnsupportedOperationException();
    }
}
