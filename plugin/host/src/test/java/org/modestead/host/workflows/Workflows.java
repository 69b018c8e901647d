package org.modestead.host.workflows;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.util.List;
import org.modestead.host.run.CancelSwitch;
import org.modestead.host.run.RunListener;
import org.modestead.host.run.RunResult;
import org.modestead.host.run.WorkflowRunner;
import org.modestead.host.workflow.WorkflowChecker;
import org.modestead.host.workflow.WorkflowFile;
import org.modestead.nodes.contract.NodeCatalog;

/** Runs workflows as the command line does. */
final class Workflows {

    private Workflows() {}

    /** Checks and runs a workflow; what is wrong with it fails the test. */
    static RunResult run(Path workflow, Path target) {
        NodeCatalog catalog = NodeCatalog.load(List.of(Workflows.class.getClassLoader()));
        WorkflowChecker.Outcome checked = new WorkflowChecker(catalog).check(WorkflowFile.read(workflow), List.of());
        return checked.plan().map(plan -> WorkflowRunner.once().run(plan, target, RunListener.NONE, new CancelSwitch()))
                .orElseThrow(() -> new AssertionError(checked.problems().toString()));
    }

    static List<Expectation> expectations(Path file) {
        try {
            return Expectation.read(file).expectations();
        } catch (IOException unreadable) {
            throw new UncheckedIOException(unreadable);
        }
    }
}
