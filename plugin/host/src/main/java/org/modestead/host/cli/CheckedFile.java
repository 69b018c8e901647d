package org.modestead.host.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.modestead.host.workflow.Problem;
import org.modestead.host.workflow.SettingOverride;
import org.modestead.host.workflow.WorkflowChecker;
import org.modestead.host.workflow.WorkflowFile;
import org.modestead.nodes.contract.NodeCatalog;

/** Reads and checks the workflow that a command was given. */
final class CheckedFile {

    private CheckedFile() {}

    static WorkflowChecker.Outcome check(NodeCatalog catalog, Path file, List<String> set) {
        List<Problem> problems = new ArrayList<>();
        List<SettingOverride> overrides = new ArrayList<>();
        for (String typed : set) {
            SettingOverride.parse(typed).ifPresentOrElse(overrides::add, () -> problems.add(
                    new Problem("--set", "", "", "\"" + typed + "\" is not of the form step.key=value",
                            "write for example --set fit.rank=8")));
        }
        WorkflowChecker.Outcome outcome = new WorkflowChecker(catalog).check(WorkflowFile.read(file), overrides);
        if (problems.isEmpty()) {
            return outcome;
        }
        problems.addAll(outcome.problems());
        return new WorkflowChecker.Outcome(java.util.Optional.empty(), problems);
    }

    /** Tells what is wrong, one sentence a line. */
    static void tell(Terminal terminal, List<Problem> problems) {
        problems.forEach(problem -> terminal.err().println(problem.sentence()));
        terminal.err().println(problems.size() == 1 ? "1 problem; nothing was run."
                : problems.size() + " problems; nothing was run.");
    }
}
