package org.modestead.host.bench.folders;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.host.workflow.Problem;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingProblem;

/**
 * A workflow whose files outside the opened folders are taken away before anything looks at them.
 *
 * @param workflow without those settings
 * @param problems what is told of each
 */
public record FileSettings(Workflow workflow, List<Problem> problems) {

    /** Takes an immutable copy. */
    public FileSettings {
        problems = List.copyOf(problems);
    }

    /** Takes away what lies outside. */
    public static FileSettings confine(Workflow workflow, NodeCatalog catalog, OpenedFolders folders) {
        List<Problem> problems = new ArrayList<>();
        List<Step> steps = workflow.steps().stream().map(step -> confined(step, workflow, catalog, folders, problems)).toList();
        return new FileSettings(workflow.with(steps, workflow.links()), problems);
    }

    private static Step confined(Step step, Workflow workflow, NodeCatalog catalog, OpenedFolders folders, List<Problem> problems) {
        Map<String, Object> kept = new LinkedHashMap<>(step.settings());
        for (SettingProblem problem : catalog.find(step.node()).map(node -> problems(step, workflow.baseFolder(), node.declaration(), folders))
                .orElse(List.of())) {
            kept.remove(problem.key());
            problems.add(new Problem(workflow.fileName(), step.id(), "setting " + problem.key(), problem.seen(), problem.wanted()));
        }
        return kept.size() == step.settings().size() ? step : step.with(kept);
    }

    /** Tells which files that a step names lie outside. */
    public static List<SettingProblem> problems(Step step, Path baseFolder, NodeDeclaration declaration, OpenedFolders folders) {
        List<SettingProblem> problems = new ArrayList<>();
        for (Setting setting : declaration.settings()) {
            if (setting instanceof Setting.File && step.settings().get(setting.key()) instanceof String name && !name.isBlank()) {
                try {
                    folders.inside(name, baseFolder);
                } catch (FolderFault outside) {
                    problems.add(new SettingProblem(setting.key(), name + ": " + outside.seen(), outside.wanted()));
                }
            }
        }
        return problems;
    }

    /** Returns the problems of a check without those that are told here better. */
    public List<Problem> merged(List<Problem> found) {
        List<Problem> merged = new ArrayList<>(problems);
        found.stream().filter(problem -> problems.stream().noneMatch(own -> own.step().equals(problem.step()) && own.key().equals(problem.key())))
                .forEach(merged::add);
        return merged;
    }
}
