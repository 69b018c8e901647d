package org.modestead.host.workflow;

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
