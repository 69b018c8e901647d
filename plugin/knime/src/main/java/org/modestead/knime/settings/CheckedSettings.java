package org.modestead.knime.settings;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.knime.core.node.InvalidSettingsException;
import org.modestead.knime.columns.ColumnRules;
import org.modestead.nodes.contract.ColumnChecks;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.TableSchema;

/** Turns raw values into settings that fit, or into the platform's exception with everything that is wrong. */
public final class CheckedSettings {

    private CheckedSettings() {}

    /**
     * Resolves column rules and checks each setting against its declaration.
     *
     * @param node whose settings they are
     * @param raw as {@link NativeSettings#read} gives them
     * @param inputs schemas of connected input tables, by port id, where known
     * @throws InvalidSettingsException with one sentence a problem
     */
    public static Settings read(Node node, Map<String, Object> raw, Map<String, TableSchema> inputs) throws InvalidSettingsException {
        ColumnRules.Resolved resolved = ColumnRules.resolved(node.declaration(), raw, inputs);
        refuse(node.declaration(), resolved.problems());
        SettingsReader.Reading reading = SettingsReader.read(node, resolved.values());
        refuse(node.declaration(), reading.problems());
        return reading.settings().orElseThrow();
    }

    /**
     * Checks settings against each other and against the columns that arrive.
     *
     * @param inputs schemas of connected input tables, by port id
     * @throws InvalidSettingsException with one sentence a problem
     */
    public static void check(Node node, Settings settings, Map<String, TableSchema> inputs) throws InvalidSettingsException {
        List<SettingProblem> problems = new ArrayList<>(ColumnChecks.check(node.declaration(), settings, inputs));
        if (problems.isEmpty()) {
            problems.addAll(node.check(inputs, settings));
        }
        refuse(node.declaration(), problems);
    }

    static void refuse(NodeDeclaration declaration, List<SettingProblem> problems) throws InvalidSettingsException {
        if (!problems.isEmpty()) {
            throw new InvalidSettingsException(problems.stream().map(problem -> sentence(declaration, problem))
                    .collect(Collectors.joining("\n")));
        }
    }

    private static String sentence(NodeDeclaration declaration, SettingProblem problem) {
        String label = declaration.settings().stream().filter(setting -> setting.key().equals(problem.key())).findFirst()
                .map(setting -> "Setting \"" + setting.common().label() + "\"").orElse("Setting " + problem.key());
        return label + ": " + problem.seen() + "; " + problem.wanted() + ".";
    }
}
