package org.modestead.knime.dialog;

import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.knime.core.data.DataTableSpec;
import org.knime.core.node.FlowVariableModel;
import org.knime.core.node.FlowVariableModelButton;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeDialogPane;
import org.knime.core.node.NodeSettingsRO;
import org.knime.core.node.NodeSettingsWO;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.workflow.FlowVariable;
import org.knime.core.node.workflow.VariableType;
import org.modestead.knime.settings.NativeSettings;
import org.modestead.knime.table.TableSpecs;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.table.TableSchema;

/**
 * The platform's dialog of a node: hands settings, table specs and flow variables to the {@link SettingsForm} and back. It opens
 * whatever is stored, and refuses only values that were typed wrong here.
 */
public final class DeclaredDialog extends NodeDialogPane {

    private final Node node;
    private final SettingsForm form;
    private final Map<String, FlowVariableModel> variables = new LinkedHashMap<>();

    /** @param node whose settings are shown */
    public DeclaredDialog(Node node) {
        this.node = node;
        this.form = new SettingsForm(node);
        for (Setting setting : node.declaration().settings()) {
            FlowVariableModel variable = createFlowVariableModel(new String[] {setting.key()}, type(setting));
            FlowVariableModelButton button = new FlowVariableModelButton(variable);
            button.getAccessibleContext().setAccessibleName("Flow variable for " + setting.common().label());
            form.accessory(setting.key(), button);
            variable.addChangeListener(event -> form.lock(setting.key(), reason(variable)));
            variables.put(setting.key(), variable);
        }
        addTab("Settings", form.component(), false);
    }

    @Override
    protected void loadSettingsFrom(NodeSettingsRO settings, PortObjectSpec[] specs) {
        form.load(NativeSettings.read(node.declaration(), settings), schemas(specs));
        variables.forEach((key, variable) -> form.lock(key, reason(variable)));
    }

    @Override
    protected void saveSettingsTo(NodeSettingsWO settings) throws InvalidSettingsException {
        List<String> refusals = form.refusals();
        if (!refusals.isEmpty()) {
            throw new InvalidSettingsException(String.join("\n", refusals));
        }
        NativeSettings.write(node.declaration(), form.values(), settings);
    }

    private Map<String, TableSchema> schemas(PortObjectSpec[] specs) {
        Map<String, TableSchema> schemas = new HashMap<>();
        List<Port> inputs = node.declaration().inputs();
        for (int i = 0; i < inputs.size() && i < specs.length; i++) {
            if (specs[i] instanceof DataTableSpec table && table.getNumColumns() > 0) {
                schemas.put(inputs.get(i).id(), TableSpecs.schema(table));
            }
        }
        return schemas;
    }

    private static Optional<String> reason(FlowVariableModel variable) {
        if (!variable.isVariableReplacementEnabled()) {
            return Optional.empty();
        }
        String value = variable.getVariableValue().map(FlowVariable::getValueAsString).map(text -> ", now " + text).orElse("");
        return Optional.of("Set by the flow variable " + variable.getInputVariableName() + value + ".");
    }

    private static VariableType<?> type(Setting setting) {
        if (setting instanceof Setting.Number) {
            return VariableType.DoubleType.INSTANCE;
        } else if (setting instanceof Setting.Whole) {
            return VariableType.LongType.INSTANCE;
        } else if (setting instanceof Setting.Flag) {
            return VariableType.BooleanType.INSTANCE;
        } else if (setting instanceof Setting.Numbers) {
            return VariableType.DoubleArrayType.INSTANCE;
        }
        boolean list = setting instanceof Setting.Columns || setting instanceof Setting.Texts;
        return list ? VariableType.StringArrayType.INSTANCE : VariableType.StringType.INSTANCE;
    }
}
