package org.modestead.host.run;

import java.io.IOException;
import java.nio.file.Path;
import org.modestead.engine.Progress;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.nodes.contract.NodeResult;

/** Where the results of steps are kept as they come. Called from several threads. */
public interface StepStore {

    /** Returns a folder for files that the node itself writes. */
    Path folder(PlannedStep step) throws IOException;

    /**
     * Looks at a result that a step has just given, not at one that was known, before it counts as done.
     *
     * @throws org.modestead.engine.Fault if it is not what it says; the step fails with that
     */
    default void made(NodeResult result) {}

    /**
     * Keeps a step's result.
     *
     * @throws IOException if it cannot be written
     */
    void keep(PlannedStep step, NodeResult result, Progress progress) throws IOException;
}
