package org.modestead.knime.dialog;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import org.modestead.knime.columns.ColumnRules;
import org.modestead.nodes.contract.ColumnChecks;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.contract.Visibility;
import org.modestead.nodes.table.TableSchema;

/**
 * Settings of one node while they are edited, wrong ones included. Everything that is said of them comes from the checks that a
 * workflow runs through as well, so a dialog and a workflow never disagree.
 *
 * @param node whose settings they are
 * @param declaration of the node
 * @param values raw values by key, with rules of column lists; an absent key is not set, so its default holds
 * @param inputs schemas of connected input tables, by port id, where known
 */
record Draft(Node node, NodeDeclaration declaration, Map<String, Object> values, Map<String, TableSchema> inputs) {

    /** Takes immutable copies. */
    Draft {
        values = Map.copyOf(values);
        inputs = Map.copyOf(inputs);
    }

    /**
     * What is to be said of a draft.
     *
     * @param problems everything wrong, in the order of the checks; empty when a workflow would accept the settings
     * @param shown settings that take part, in dialog order; a wrong value counts as its default, as when a workflow is read
     */
    record Judgement(List<SettingProblem> problems, List<Setting> shown) {}

    /**
     * Returns the draft of stored settings: those of an older version are brought forward, nothing else is changed.
     *
     * @param stored raw values by key; may be wrong
     */
    static Draft of(Node node, Map<String, Object> stored, Map<String, TableSchema> inputs) {
        NodeDeclaration declaration = node.declaration();
        Map<String, Object> known = new HashMap<>(stored);
        known.values().removeIf(Objects::isNull);
        Object version = known.remove(SettingsReader.VERSION);
        boolean older = version instanceof Integer number && number >= 1 && number < declaration.settingsVersion();
        return new Draft(node, declaration, older ? node.upgrade(Map.copyOf(known), (Integer) version) : known, inputs);
    }

    /** Returns the raw value, empty when not set. */
    Optional<Object> value(String key) {
        return Optional.ofNullable(values.get(key));
    }

    /** Returns the draft with one value set, or not set when empty. */
    Draft with(String key, Optional<Object> value) {
        Map<String, Object> changed = new HashMap<>(values);
        value.ifPresentOrElse(given -> changed.put(key, given), () -> changed.remove(key));
        return new Draft(node, declaration, changed, inputs);
    }

    /** Judges the draft as a workflow would; missing columns are told beside other faults, not after them. */
    Judgement judge() {
        ColumnRules.Resolved resolved = ColumnRules.resolved(declaration, values, inputs);
        SettingsReader.Reading reading = read(resolved.values());
        Map<String, Object> good = new HashMap<>(resolved.values());
        reading.problems().forEach(problem -> good.remove(problem.key()));
        List<SettingProblem> problems = new ArrayList<>(resolved.problems());
        problems.addAll(reading.problems());
        reading.settings().or(() -> read(good).settings())
                .ifPresent(settings -> problems.addAll(ColumnChecks.check(declaration, settings, inputs)));
        if (problems.isEmpty()) {
            reading.settings().ifPresent(settings -> problems.addAll(node.check(inputs, settings)));
        }
        return new Judgement(problems, declaration.settings().stream()
                .filter(setting -> Visibility.isShown(declaration, good, setting)).toList());
    }

    /** Returns stored keys that the node does not know. */
    List<String> unknownKeys() {
        Set<String> known = ColumnRules.keys(declaration);
        return values.keySet().stream().filter(key -> !known.contains(key)).sorted().toList();
    }

    private SettingsReader.Reading read(Map<String, Object> raw) {
        return SettingsReader.read(declaration, raw, declaration.settingsVersion());
    }
}
