package org.modestead.host.workflow;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Objects;

/**
 * One step of a workflow file, as written.
 *
 * @param id unique in the workflow; also the name of the step's result folder
 * @param node id of the node that does the work
 * @param settings as the JSON reader gives them, by key in file order; null values count as not set
 */
public record Step(String id, String node, Map<String, Object> settings) {

    /** Takes an immutable copy. */
    public Step {
        Objects.requireNonNull(id);
        Objects.requireNonNull(node);
        settings = Collections.unmodifiableMap(new LinkedHashMap<>(settings));
    }
}
