package org.knime.core.node.workflow;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class NodeContext {

    private NodeContext() {
        throw new UnsupportedOperationException();
    }

    public static NodeContext getContext() {
        throw new UnsupportedOperationException();
    }

    public WorkflowManager getWorkflowManager() {
        throw new UnsupportedOperationException();
    }
}
