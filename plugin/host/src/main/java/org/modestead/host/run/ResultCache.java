package org.modestead.host.run;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.nodes.contract.NodeResult;

/**
 * Results of earlier runs in memory, by what they depend on. Bounded: the result unused for longest goes first.
 * Thread-safe.
 */
public final class ResultCache implements Results {

    private final int capacity;
    private final Map<String, NodeResult> results = new LinkedHashMap<>(16, 0.75f, true);

    /** @param capacity most results kept; 0 keeps none */
    public ResultCache(int capacity) {
        this.capacity = capacity;
    }

    @Override
    public synchronized Optional<NodeResult> find(PlannedStep step, String fingerprint) {
        return Optional.ofNullable(results.get(fingerprint));
    }

    @Override
    public synchronized void keep(PlannedStep step, String fingerprint, NodeResult result) {
        results.put(fingerprint, result);
        while (results.size() > capacity) {
            results.remove(results.keySet().iterator().next());
        }
    }
}
