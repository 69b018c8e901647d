package org.modestead.host.workflow;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Objects;
import java.util.regex.Pattern;

/**
 * One step of a workflow file, as written.
 *
 * @param id unique in the workflow; also the name of the step's result folder
 * @param node id of the node that does the work
 * @param settings as the JSON reader gives them, by key in file order; null values count as not set
 * @param label what people wrote on it; says nothing to a run
 */
public record Step(String id, String node, Map<String, Object> settings, StepLabel label) {

    private static final Pattern ID = Pattern.compile("[A-Za-z0-9][A-Za-z0-9_-]*");

    /** Takes an immutable copy. */
    public Step {
        Objects.requireNonNull(id);
        Objects.requireNonNull(node);
        Objects.requireNonNull(label);
        settings = Collections.unmodifiableMap(new LinkedHashMap<>(settings));
    }

    /** A step on which nobody wrote anything. */
    public Step(String id, String node, Map<String, Object> settings) {
        this(id, node, settings, StepLabel.NONE);
    }

    /** Returns whether a text may be the id of a step. */
    public static boolean isId(String text) {
        return ID.matcher(text).matches();
    }

    /** The same step with other settings. */
    public Step with(Map<String, Object> other) {
        return new Step(id, node, other, label);
    }

    /** The same step with another label. */
    public Step with(StepLabel other) {
        return new Step(id, node, settings, other);
    }

    /** The same step under another id. */
    public Step named(String other) {
        return new Step(other, node, settings, label);
    }
}
