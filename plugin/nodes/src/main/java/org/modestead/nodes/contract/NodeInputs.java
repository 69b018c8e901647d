package org.modestead.nodes.contract;

import java.util.Map;
import java.util.Optional;

/**
 * Values of the connected input ports.
 *
 * @param values by port id; each an instance of its {@link PortType#valueClass()}
 */
public record NodeInputs(Map<String, Object> values) {

    /** Takes an immutable copy. */
    public NodeInputs {
        values = Map.copyOf(values);
    }

    /**
     * Returns the value of a connected port.
     *
     * @throws IllegalStateException if nothing is connected there: the host should have refused to run
     */
    public <T> T get(String port, Class<T> type) {
        return find(port, type).orElseThrow(() -> new IllegalStateException("nothing is connected to port " + port));
    }

    /** Returns the value of a port that may be unconnected. */
    public <T> Optional<T> find(String port, Class<T> type) {
        return Optional.ofNullable(values.get(port)).map(type::cast);
    }
}
