package org.modestead.host.workflow;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.modestead.host.output.Neighbours;
import org.modestead.nodes.contract.NearestName;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.contract.Visibility;

/** The part of the check that looks at each step alone: its node and its settings. */
final class StepSettings {

    /** What the command line calls a replaced setting. */
    private static final String OPTION = "--set";

    private final Workflow workflow;
    private final NodeCatalog catalog;
    private final List<SettingOverride> overrides;

    StepSettings(Workflow workflow, NodeCatalog catalog, List<SettingOverride> overrides) {
        this.workflow = workflow;
        this.catalog = catalog;
        this.overrides = overrides;
    }

    /**
     * A step whose node is known.
     *
     * @param node of the step
     * @param settings empty when they do not fit
     */
    record Known(Node node, Optional<Settings> settings) {}

    /** Returns the steps with a known node, by id in file order, and adds what is wrong. */
    Map<String, Known> read(List<Problem> problems) {
        Map<String, Known> known = new LinkedHashMap<>();
        for (Step step : workflow.steps()) {
            if (known.containsKey(step.id()) || step.node().isEmpty()) {
                continue;
            }
            Optional<Node> node = catalog.find(step.node());
            if (node.isEmpty()) {
                problems.add(new Problem(workflow.fileName(), step.id(), "field node",
                        "there is no node \"" + step.node() + "\"" + NearestName.hint(step.node(), catalog.ids()),
                        "use one of " + String.join(", ", catalog.ids())));
            } else {
                known.put(step.id(), read(step, node.get(), problems));
            }
        }
        strayOverrides(problems);
        return known;
    }

    private Known read(Step step, Node node, List<Problem> problems) {
        Map<String, Object> stored = new LinkedHashMap<>(step.settings());
        Set<String> replaced = replace(step, node.declaration(), stored, problems);
        SettingsReader.Reading reading = SettingsReader.read(node, stored);
        reading.problems().forEach(found -> problems.add(new Problem(
                replaced.contains(found.key()) ? OPTION : workflow.fileName(), step.id(), "setting " + found.key(),
                found.seen(),
                found.wanted())));
        missingFiles(step.id(), node.declaration(), stored, problems);
        return new Known(node, reading.settings());
    }

    /** Looks for the files to be read, whatever else is wrong with the step. Whether a folder will do is the node's to say. */
    private void missingFiles(String step, NodeDeclaration declaration, Map<String, Object> stored, List<Problem> problems) {
        for (Setting setting : declaration.settings()) {
            boolean read = setting instanceof Setting.File file && file.reading()
                    && Visibility.isShown(declaration, stored, setting);
            if (!read || !(stored.get(setting.key()) instanceof String name) || name.isBlank()) {
                continue;
            }
            Path path = workflow.baseFolder().resolve(name);
            if (!Files.exists(path)) {
                problems.add(new Problem(workflow.fileName(), step, "setting " + setting.key(), "there is no file " + name
                        + Neighbours.hint(path), "name a file relative to " + workflow.baseFolder()
                        + " or with its full path"));
            }
        }
    }

    private Set<String> replace(Step step, NodeDeclaration declaration, Map<String, Object> stored, List<Problem> problems) {
        Set<String> replaced = new HashSet<>();
        for (SettingOverride override : overrides) {
            if (!override.step().equals(step.id())) {
                continue;
            }
            Optional<Setting> setting = declaration.settings().stream()
                    .filter(candidate -> candidate.key().equals(override.key())).findFirst();
            if (setting.isEmpty()) {
                List<String> keys = declaration.settings().stream().map(Setting::key).toList();
                problems.add(new Problem(OPTION, step.id(), "setting " + override.key(), "no setting of that name in "
                        + declaration.id() + NearestName.hint(override.key(), keys), "use one of " + String.join(", ",
                        keys)));
                continue;
            }
            Optional<Object> value = SettingsReader.fromText(setting.get(), override.text());
            value.ifPresentOrElse(given -> stored.put(override.key(), given), () -> stored.remove(override.key()));
            replaced.add(override.key());
        }
        return replaced;
    }

    private void strayOverrides(List<Problem> problems) {
        List<String> ids = new ArrayList<>(workflow.steps().stream().map(Step::id).distinct().toList());
        for (SettingOverride override : overrides) {
            if (!ids.contains(override.step())) {
                problems.add(new Problem(OPTION, "", "", "the workflow has no step \"" + override.step() + "\""
                        + NearestName.hint(override.step(), ids), "use one of " + String.join(", ", ids)));
            }
        }
    }
}
