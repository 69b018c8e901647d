package org.knime.core.node.workflow.contextv2;

import java.nio.file.Path;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class WorkflowContextV2 {
    private WorkflowContextV2() {
        throw new UnsupportedOperationException();
    }

    public static WorkflowContextV2 forTemporaryWorkflow(final Path workflowFolder, final Path tempFolder) {
        throw new UnsupportedOperationException();
    }
}
