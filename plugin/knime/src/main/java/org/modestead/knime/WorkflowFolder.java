package org.modestead.knime;

import java.io.File;
import java.nio.file.Path;
import java.util.Optional;
import org.knime.core.node.workflow.NodeContext;
import org.knime.core.node.workflow.WorkflowContext;
import org.knime.core.node.workflow.WorkflowManager;

/** The folder against which file settings are resolved: that of the workflow the running node is in. */
final class WorkflowFolder {

    private WorkflowFolder() {}

    /** Returns the workflow's folder, or the person's own where the node is in no saved workflow. */
    static Path find() {
        return Optional.ofNullable(NodeContext.getContext()).map(NodeContext::getWorkflowManager).map(WorkflowManager::getContext)
                .map(WorkflowContext::getCurrentLocation).map(File::toPath).orElseGet(() -> Path.of(System.getProperty("user.home")));
    }
}
