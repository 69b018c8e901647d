package org.modestead.nodes.report;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Objects;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeResult;

/**
 * What one step of a workflow did. Holds no times of day and no durations, so that the same work gives the same report.
 *
 * @param stepId the step's name in the workflow
 * @param nodeTitle title of its node
 * @param stage part of the work
 * @param result what it gave back
 * @param settings as they stand in the workflow file with defaults filled in, in the order in which they are to be read
 */
public record StepAccount(String stepId, String nodeTitle, NodeDeclaration.Stage stage, NodeResult result,
        Map<String, String> settings) {

    /** Takes an immutable copy that keeps the order of the settings. */
    public StepAccount {
        Objects.requireNonNull(stepId);
        Objects.requireNonNull(nodeTitle);
        Objects.requireNonNull(stage);
        Objects.requireNonNull(result);
        settings = Collections.unmodifiableMap(new LinkedHashMap<>(settings));
    }
}
