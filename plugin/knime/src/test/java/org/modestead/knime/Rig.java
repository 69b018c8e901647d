package org.modestead.knime;

import java.util.List;
import java.util.Map;
import org.knime.core.node.ExecutionContext;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeModel;
import org.knime.core.node.NodeSettings;
import org.knime.core.node.port.PortObject;
import org.knime.core.node.port.PortObjectSpec;
import org.modestead.knime.port.StageSpec;
import org.modestead.knime.settings.NativeSettings;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;

/** One native node on a test bench: made by its factory from its id and driven as the platform's engine drives it. */
final class Rig {

    private final NodeDeclaration declaration;
    private final DeclaredNodeModel model;
    private final NodeModel.Engine engine;

    private Rig(String id) throws InvalidSettingsException {
        DeclaredNodeFactory factory = new DeclaredNodeFactory();
        factory.loadAdditionalFactorySettings(new ModesteadNodeSet().getAdditionalSettings(id));
        declaration = node(id).declaration();
        model = factory.createNodeModel();
        engine = new NodeModel.Engine(model);
    }

    static Rig of(String id) throws InvalidSettingsException {
        return new Rig(id);
    }

    static Node node(String id) {
        return NodeOffer.find().find(id).orElseThrow();
    }

    static List<String> ids() {
        return NodeOffer.find().ids();
    }

    NodeDeclaration declaration() {
        return declaration;
    }

    DeclaredNodeModel model() {
        return model;
    }

    NodeModel.Engine engine() {
        return engine;
    }

    /** Sets raw values as a dialog does: written under native keys, validated and loaded. */
    Rig with(Map<String, Object> raw) throws InvalidSettingsException {
        NodeSettings settings = new NodeSettings("model");
        NativeSettings.write(declaration, raw, settings);
        engine.settings(settings);
        return this;
    }

    /** Configures with the specs of objects and runs; specs told must be those that come out. */
    PortObject[] run(PortObject... inputs) throws Exception {
        PortObjectSpec[] specs = new PortObjectSpec[inputs.length];
        for (int i = 0; i < inputs.length; i++) {
            specs[i] = inputs[i] == null ? null : inputs[i].getSpec();
        }
        PortObjectSpec[] told = engine.configure(specs);
        PortObject[] outputs = engine.execute(new ExecutionContext(), inputs);
        for (int i = 0; i < told.length; i++) {
            boolean unknown = told[i] == null || told[i] instanceof StageSpec spec && !spec.outlook().complete();
            if (!unknown && !told[i].equals(outputs[i].getSpec())) {
                throw new AssertionError(declaration.id() + ", output " + declaration.outputs().get(i).id() + ": told " + told[i]
                        + ", came " + outputs[i].getSpec());
            }
        }
        return outputs;
    }

    /** Returns the position of an output. */
    int output(String id) {
        return declaration.outputs().stream().map(Port::id).toList().indexOf(id);
    }
}
