package org.modestead.knime.trial;

import java.io.BufferedWriter;
import java.io.ByteArrayOutputStream;
import java.lang.reflect.Method;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.knime.core.data.DataTableSpec;
import org.knime.core.node.BufferedDataTable;
import org.knime.core.node.ExecutionMonitor;
import org.knime.core.node.NodeFactory;
import org.knime.core.node.NodeModel;
import org.knime.core.node.NodeSettings;
import org.knime.core.node.NodeSettingsWO;
import org.knime.core.node.port.PortObject;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.streamable.InputPortRole;
import org.knime.core.node.streamable.OutputPortRole;
import org.knime.core.node.util.NodeExecutionJobManagerPool;
import org.knime.core.node.workflow.NativeNodeContainer;
import org.knime.core.node.workflow.NodeContainer;
import org.knime.core.node.workflow.NodeContainerState;
import org.knime.core.node.workflow.NodeExecutionJobManagerFactory;
import org.knime.core.node.workflow.NodeID;
import org.knime.core.node.workflow.NodeMessage;
import org.knime.core.node.workflow.NodeUIInformation;
import org.knime.core.node.workflow.WorkflowAnnotationID;
import org.knime.core.node.workflow.WorkflowCreationHelper;
import org.knime.core.node.workflow.WorkflowLoadHelper;
import org.knime.core.node.workflow.WorkflowManager;
import org.knime.core.node.workflow.WorkflowPersistor;
import org.knime.core.node.workflow.contextv2.WorkflowContextV2;

/** One workflow that is open in the platform's engine. */
final class Project {

    private static final int NODE_DISTANCE = 180;
    private static final int NODES_IN_A_ROW = 6;
    private static final int NODE_SIZE = 100;

    /** Below which the platform keeps the settings that a node's own model wrote. */
    private static final String MODEL = "model";

    private static final String STREAMING = "org.knime.core.streaming.SimpleStreamerNodeExecutionJobManagerFactory";

    private final WorkflowManager workflow;

    private Project(WorkflowManager workflow) {
        this.workflow = workflow;
    }

    /**
     * A loaded workflow.
     *
     * @param project that is open now
     * @param complaint what the platform had to say of it, empty when nothing
     */
    record Loaded(Project project, String complaint) {}

    static Project create(Path folder) throws Exception {
        Files.createDirectories(folder);
        Files.createFile(folder.resolve("workflow.knime"));
        WorkflowContextV2 context = WorkflowContextV2.forTemporaryWorkflow(folder, null);
        return new Project(WorkflowManager.ROOT.createAndAddProject(folder.getFileName().toString(), new WorkflowCreationHelper(context)));
    }

    static Loaded load(Path folder) throws Exception {
        WorkflowContextV2 context = WorkflowContextV2.forTemporaryWorkflow(folder, null);
        WorkflowPersistor.WorkflowLoadResult result = WorkflowManager.loadProject(folder.toFile(), new ExecutionMonitor(),
                new WorkflowLoadHelper(context));
        String complaint = result.hasErrors() || result.hasWarningEntries()
                ? result.getFilteredError("", WorkflowPersistor.LoadResultEntry.LoadResultEntryType.Warning) : "";
        return new Loaded(new Project(result.getWorkflowManager()), complaint);
    }

    void close() {
        WorkflowManager.ROOT.removeProject(workflow.getID());
    }

    /** Adds a node of ours by its id, or one of the platform's by the name of its factory; returns its number. */
    int add(String node, String label) throws Exception {
        NodeFactory<?> factory = Offered.factory(node);
        NodeID id = workflow.createAndAddNode(factory);
        int place = id.getIndex() - 1;
        container(id.getIndex()).setUIInformation(NodeUIInformation.builder().setNodeLocation(
                place % NODES_IN_A_ROW * NODE_DISTANCE, place / NODES_IN_A_ROW * NODE_DISTANCE, NODE_SIZE, NODE_SIZE).build());
        return id.getIndex();
    }

    void link(int from, int fromPort, int to, int toPort) {
        workflow.addConnection(container(from).getID(), fromPort, container(to).getID(), toPort);
    }

    /** Changes some of a node's settings, given as path, type and value, three texts each, and applies them all at once. */
    void set(int node, List<String> triples) throws Exception {
        NodeID id = container(node).getID();
        NodeSettings all = settings(id);
        NodeSettings model = all.getNodeSettings(MODEL);
        for (int i = 0; i < triples.size(); i += 3) {
            StoredSetting.write(model, triples.get(i), triples.get(i + 1), triples.get(i + 2));
        }
        workflow.loadNodeSettings(id, all);
    }

    /** Lets flow variables take the place of some of a node's settings; gives the settings with which its model then goes to work. */
    String vary(int node, List<String> triples) throws Exception {
        NodeID id = container(node).getID();
        workflow.addWorkflowVariables(true, Variables.made(triples));
        NodeSettings all = settings(id);
        Variables.use(all, triples);
        workflow.loadNodeSettings(id, all);
        Method save = NodeModel.class.getDeclaredMethod("saveSettingsTo", NodeSettingsWO.class); // protected, and what it writes is what the model has
        save.setAccessible(true);
        NodeSettings used = new NodeSettings("used");
        save.invoke(model(node), used);
        Variables.use(all, List.of());
        workflow.loadNodeSettings(id, all);
        return xml(used);
    }

    /** Returns a node's settings as the platform writes them out. */
    String settings(int node) throws Exception {
        return xml(settings(container(node).getID()).getNodeSettings(MODEL));
    }

    /** Opens a node's dialog, as a person would, and saves from it untouched; returns the settings as they are then written out. */
    String dialog(int node) throws Exception {
        NodeSettings saved = new NodeSettings("node");
        container(node).getDialogPaneWithSettings().finishEditingAndSaveSettingsTo(saved);
        return xml(saved.getNodeSettings(MODEL));
    }

    private static String xml(NodeSettings settings) throws Exception {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        settings.saveToXML(out);
        return out.toString(StandardCharsets.UTF_8);
    }

    private NodeSettings settings(NodeID id) {
        NodeSettings all = new NodeSettings("node");
        workflow.saveNodeSettings(id, all);
        if (!all.containsKey(MODEL)) { // a node that nobody has configured yet
            workflow.saveNodeSettingsToDefault(id);
            workflow.saveNodeSettings(id, all);
        }
        return all;
    }

    /**
     * Puts nodes into a component whose nodes run at once, each handing its rows to the next as they come.
     *
     * @throws IllegalStateException when this installation lacks the extension that does so
     */
    int streamed(List<Integer> nodes) {
        NodeExecutionJobManagerFactory streaming = NodeExecutionJobManagerPool.getJobManagerFactory(STREAMING);
        if (streaming == null) {
            throw new IllegalStateException("no streaming executor is installed");
        }
        NodeID[] ids = nodes.stream().map(number -> container(number).getID()).toArray(NodeID[]::new);
        NodeID folded = workflow.collapseIntoMetaNode(ids, new WorkflowAnnotationID[0], "streamed").getCollapsedMetanodeID();
        NodeID component = workflow.convertMetaNodeToSubNode(folded).getConvertedNodeID();
        workflow.setJobManager(component, streaming.getInstance());
        return component.getIndex();
    }

    /** Returns for each input, then each output of a node what the platform may do with its rows. */
    List<String> roles(int node) {
        NodeModel model = model(node);
        List<String> roles = new ArrayList<>();
        for (InputPortRole role : model.getInputPortRoles()) {
            roles.add("in" + (role.isStreamable() ? " streamed" : " whole") + (role.isDistributable() ? " in parts" : " once"));
        }
        for (OutputPortRole role : model.getOutputPortRoles()) {
            roles.add("out" + (role.isDistributable() ? " in parts" : " once"));
        }
        return roles;
    }

    void executeAll() {
        workflow.executeAllAndWaitUntilDone();
    }

    void start(int node) {
        workflow.executeUpToHere(container(node).getID());
    }

    boolean await(long time, TimeUnit unit) throws InterruptedException {
        return workflow.waitWhileInExecution(time, unit);
    }

    /** Cancels one node and returns the milliseconds until it had stopped. */
    long cancel(int node) throws InterruptedException {
        long asked = System.nanoTime();
        workflow.cancelExecution(container(node));
        workflow.waitWhileInExecution(60, TimeUnit.SECONDS);
        return TimeUnit.NANOSECONDS.toMillis(System.nanoTime() - asked);
    }

    /** Returns state, kind of message and message. */
    List<String> state(int node) {
        NodeContainer container = container(node);
        NodeContainerState state = container.getNodeContainerState();
        String word = state.isExecuted() ? "executed" : state.isExecutionInProgress() ? "executing"
                : state.isConfigured() ? "configured" : state.isIdle() ? "idle" : state.toString();
        NodeMessage message = container.getNodeMessage();
        String text = message.getMessage();
        return List.of(word, message.getMessageType().name().toLowerCase(java.util.Locale.ROOT), text == null ? "" : text);
    }

    /** Returns the class of a port's spec and its text; nothing when there is none yet. */
    List<String> spec(int node, int port) {
        PortObjectSpec spec = container(node).getOutPort(port).getPortObjectSpec();
        return spec == null ? List.of() : List.of(spec.getClass().getName(),
                spec instanceof DataTableSpec table ? TableText.columns(table) : spec.toString());
    }

    /** Returns the class and the summary of a port's object; nothing when there is none yet. */
    List<String> object(int node, int port) {
        PortObject object = container(node).getOutPort(port).getPortObject();
        return object == null ? List.of() : List.of(object.getClass().getName(), object.getSummary());
    }

    /** Writes the table at a port to a file. */
    void table(int node, int port, Path file) throws Exception {
        BufferedDataTable table = (BufferedDataTable) container(node).getOutPort(port).getPortObject();
        Files.createDirectories(file.getParent());
        try (BufferedWriter writer = Files.newBufferedWriter(file)) {
            TableText.write(table, writer);
        }
    }

    void reset(int node) {
        workflow.resetAndConfigureNode(container(node).getID());
    }

    void resetAll() {
        workflow.resetAndConfigureAll();
    }

    void save(Path folder) throws Exception {
        workflow.save(folder.toFile(), new ExecutionMonitor(), true);
    }

    private NodeModel model(int node) {
        return ((NativeNodeContainer) container(node)).getNodeModel();
    }

    private NodeContainer container(int number) {
        List<String> known = new ArrayList<>();
        for (NodeContainer container : workflow.getNodeContainers()) {
            if (container.getID().getIndex() == number) {
                return container;
            }
            known.add(Integer.toString(container.getID().getIndex()));
        }
        throw new IllegalArgumentException("no node " + number + " among " + known);
    }
}
