package org.knime.core.node.workflow;

/** Signatures of the platform's public class of this name; no behaviour. */
public class WorkflowAnnotationID {
    public WorkflowAnnotationID(final NodeID wfID, final int index) {
        throw new UnsupportedOperationException();
    }
}
