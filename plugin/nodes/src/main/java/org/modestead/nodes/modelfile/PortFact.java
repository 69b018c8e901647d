package org.modestead.nodes.modelfile;

import java.util.Objects;

/**
 * One line about what a port carries.
 *
 * @param item what, for example {@code channels}
 * @param value how much, for example {@code 2: level [m], flow [l/s]}
 */
public record PortFact(String item, String value) {

    /** Checks that both parts are there. */
    public PortFact {
        Objects.requireNonNull(item);
        Objects.requireNonNull(value);
    }
}
