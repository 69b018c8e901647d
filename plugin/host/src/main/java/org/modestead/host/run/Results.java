package org.modestead.host.run;

import java.util.Optional;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.nodes.contract.NodeResult;

/** Results of earlier runs, by what they depend on. Called from several threads. */
public interface Results {

    /**
     * Returns the result of a step if it is known.
     *
     * @param step that would run otherwise
     * @param fingerprint of its result
     */
    Optional<NodeResult> find(PlannedStep step, String fingerprint);

    /** Keeps a result. */
    void keep(PlannedStep step, String fingerprint, NodeResult result);
}
