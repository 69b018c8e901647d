package org.knime.core.node.workflow;

import java.io.File;
import java.io.IOException;
import java.util.Collection;
import java.util.concurrent.TimeUnit;
import org.knime.core.node.CanceledExecutionException;
import org.knime.core.node.ExecutionMonitor;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeFactory;
import org.knime.core.node.NodeSettingsRO;
import org.knime.core.node.NodeSettingsWO;
import org.knime.core.node.workflow.action.CollapseIntoMetaNodeResult;
import org.knime.core.node.workflow.action.MetaNodeToSubNodeResult;
import org.knime.core.util.LockFailedException;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class WorkflowManager extends NodeContainer {
    public static final WorkflowManager ROOT = null;

    private WorkflowManager() {
        throw new UnsupportedOperationException();
    }

    public WorkflowManager createAndAddProject(final String name, final WorkflowCreationHelper creationHelper) {
        throw new UnsupportedOperationException();
    }

    public void removeProject(final NodeID id) {
        throw new UnsupportedOperationException();
    }

    public NodeID createAndAddNode(final NodeFactory<?> factory) {
        throw new UnsupportedOperationException();
    }

    public ConnectionContainer addConnection(final NodeID source, final int sourcePort, final NodeID dest, final int destPort) {
        throw new UnsupportedOperationException();
    }

    public Collection<NodeContainer> getNodeContainers() {
        throw new UnsupportedOperationException();
    }

    public NodeContainer getNodeContainer(final NodeID id) {
        throw new UnsupportedOperationException();
    }

    public void loadNodeSettings(final NodeID id, final NodeSettingsRO settings) throws InvalidSettingsException {
        throw new UnsupportedOperationException();
    }

    public void saveNodeSettings(final NodeID id, final NodeSettingsWO settings) {
        throw new UnsupportedOperationException();
    }

    public void saveNodeSettingsToDefault(final NodeID id) {
        throw new UnsupportedOperationException();
    }

    public void executeUpToHere(final NodeID... ids) {
        throw new UnsupportedOperationException();
    }

    public boolean executeAllAndWaitUntilDone() {
        throw new UnsupportedOperationException();
    }

    public boolean waitWhileInExecution(final long time, final TimeUnit unit) throws InterruptedException {
        throw new UnsupportedOperationException();
    }

    public void cancelExecution(final NodeContainer nc) {
        throw new UnsupportedOperationException();
    }

    public void resetAndConfigureNode(final NodeID id) {
        throw new UnsupportedOperationException();
    }

    public void resetAndConfigureAll() {
        throw new UnsupportedOperationException();
    }

    public void addWorkflowVariables(final boolean skipReset, final FlowVariable... newVars) {
        throw new UnsupportedOperationException();
    }

    public CollapseIntoMetaNodeResult collapseIntoMetaNode(final NodeID[] orgIDs, final WorkflowAnnotationID[] orgAnnoIDs, final String name) {
        throw new UnsupportedOperationException();
    }

    public MetaNodeToSubNodeResult convertMetaNodeToSubNode(final NodeID wfmID) {
        throw new UnsupportedOperationException();
    }

    public void setJobManager(final NodeID nodeID, final NodeExecutionJobManager jobMgr) {
        throw new UnsupportedOperationException();
    }

    public void save(final File directory, final ExecutionMonitor exec, final boolean isSaveData)
            throws IOException, CanceledExecutionException, LockFailedException {
        throw new UnsupportedOperationException();
    }

    public static WorkflowPersistor.WorkflowLoadResult loadProject(final File directory, final ExecutionMonitor exec,
            final WorkflowLoadHelper loadHelper) throws IOException, InvalidSettingsException, CanceledExecutionException,
            UnsupportedWorkflowVersionException, LockFailedException {
        throw new UnsupportedOperationException();
    }

    @Override
    public String getName() {
        throw new UnsupportedOperationException();
    }

    @Override
    public NodeOutPort getOutPort(final int index) {
        throw new UnsupportedOperationException();
    }

    @Override
    public int getNrOutPorts() {
        throw new UnsupportedOperationException();
    }

    public WorkflowContext getContext() {
        throw new UnsupportedOperationException();
    }
}
