package org.modestead.host;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.modestead.host.workflow.Problem;
import org.modestead.host.workflow.RunPlan;
import org.modestead.host.workflow.SettingOverride;
import org.modestead.host.workflow.WorkflowChecker;
import org.modestead.host.workflow.WorkflowFile;
import org.modestead.nodes.contract.NodeCatalog;

/** Writes and checks small workflow files in tests. */
public final class TestWorkflows {

    private TestWorkflows() {}

    /** All nodes that the host offers. */
    public static NodeCatalog allNodes() {
        return NodeCatalog.load(List.of(TestWorkflows.class.getClassLoader()));
    }

    /** A workflow text of steps {@code id:node} or {@code id:node:{settings}} and links {@code a.x>b.y}. */
    public static String text(List<String> steps, List<String> links) {
        List<String> written = new ArrayList<>();
        for (String step : steps) {
            String[] parts = step.split(":", 3);
            written.add("{\"id\": \"" + parts[0] + "\", \"node\": \"" + parts[1] + "\""
                    + (parts.length > 2 ? ", \"settings\": " + parts[2] : "") + "}");
        }
        List<String> joined = links.stream().map(link -> link.split(">"))
                .map(ends -> "{\"from\": \"" + ends[0] + "\", \"to\": \"" + ends[1] + "\"}").toList();
        return "{\"format\": \"modestead-workflow/1\", \"name\": \"test\", \"steps\": [" + String.join(",\n", written)
                + "], \"links\": [" + String.join(",\n", joined) + "]}";
    }

    /** Writes {@code workflow.json} into a folder. */
    public static Path write(Path folder, List<String> steps, List<String> links) throws IOException {
        return Files.writeString(folder.resolve("workflow.json"), text(steps, links));
    }

    /** Returns the plan of a workflow that must be right. */
    public static RunPlan plan(Path file, NodeCatalog nodes, String... set) {
        WorkflowChecker.Outcome outcome = check(file, nodes, set);
        return outcome.plan().orElseThrow(() -> new AssertionError(sentences(outcome.problems())));
    }

    /** Returns what is wrong with a workflow, one sentence a problem. */
    public static List<String> problems(Path file, NodeCatalog nodes, String... set) {
        return sentences(check(file, nodes, set).problems());
    }

    private static WorkflowChecker.Outcome check(Path file, NodeCatalog nodes, String... set) {
        List<SettingOverride> overrides = List.of(set).stream().map(text -> SettingOverride.parse(text).orElseThrow())
                .toList();
        return new WorkflowChecker(nodes).check(WorkflowFile.read(file), overrides);
    }

    private static List<String> sentences(List<Problem> problems) {
        return problems.stream().map(Problem::sentence).toList();
    }
}
