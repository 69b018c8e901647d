package org.knime.core.node.workflow;

import org.knime.core.node.workflow.contextv2.WorkflowContextV2;

/** Signatures of the platform's public class of this name; no behaviour. */
public class WorkflowLoadHelper {
    public WorkflowLoadHelper(final WorkflowContextV2 workflowContext) {
        throw new UnsupportedOperationException();
    }
}
