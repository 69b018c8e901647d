package org.knime.core.node.workflow;

import org.knime.core.node.workflow.contextv2.WorkflowContextV2;

/** Signatures of the platform's public class of this name; no behaviour. */
public class WorkflowCreationHelper {
    public WorkflowCreationHelper(final WorkflowContextV2 context) {
        throw new UnsupportedOperationException();
    }
}
