package org.modestead.host.workflow;

import java.util.Optional;

/**
 * What carries the value of an output port to an input port.
 *
 * @param from output
 * @param to input
 */
public record Link(End from, End to) {

    /**
     * One end, written {@code step.port}.
     *
     * @param step id of the step
     * @param port id of the port
     */
    public record End(String step, String port) {

        /** Reads an end as it is written; empty when it is written otherwise. */
        public static Optional<End> read(String text) {
            String[] parts = text.split("\\.", -1);
            return parts.length == 2 && !parts[0].isBlank() && !parts[1].isBlank() ? Optional.of(new End(parts[0], parts[1])) : Optional.empty();
        }

        @Override
        public String toString() {
            return step + "." + port;
        }
    }

    @Override
    public String toString() {
        return from + " -> " + to;
    }
}
