package org.modestead.knime.settings;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeSettingsRO;
import org.modestead.knime.columns.ColumnRules;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.SettingsReader;

/** Loads what a workflow stores, brings older versions forward, and refuses what does not fit. */
public final class StoredSettings {

    private StoredSettings() {}

    /**
     * Refuses values that do not fit. What is not set passes: a node that was put into a workflow and never configured is saved and
     * loaded like any other, and {@code configure} says what it lacks.
     *
     * @throws InvalidSettingsException with one sentence a problem
     */
    public static void validate(Node node, NodeSettingsRO settings) throws InvalidSettingsException {
        Map<String, Object> raw = load(node, settings);
        ColumnRules.Resolved resolved = ColumnRules.resolved(node.declaration(), raw, Map.of());
        CheckedSettings.refuse(node.declaration(), resolved.problems());
        List<SettingProblem> problems = SettingsReader.read(node, resolved.values()).problems();
        CheckedSettings.refuse(node.declaration(), problems.stream().filter(problem -> isSet(resolved.values(), problem)).toList());
    }

    /**
     * Returns raw values of today's version. Settings of a newer release keep its version number, by which they are refused later.
     */
    public static Map<String, Object> load(Node node, NodeSettingsRO settings) {
        NodeDeclaration declaration = node.declaration();
        Map<String, Object> raw = NativeSettings.read(declaration, settings);
        if (!(raw.get(SettingsReader.VERSION) instanceof Integer version) || version > declaration.settingsVersion()) {
            return raw;
        }
        raw.remove(SettingsReader.VERSION);
        Map<String, Object> today = new LinkedHashMap<>(node.upgrade(Map.copyOf(raw), version));
        today.keySet().retainAll(ColumnRules.keys(declaration));
        return today;
    }

    private static boolean isSet(Map<String, Object> values, SettingProblem problem) {
        Object value = values.get(problem.key());
        return value != null && !(value instanceof List<?> list && list.isEmpty());
    }
}
