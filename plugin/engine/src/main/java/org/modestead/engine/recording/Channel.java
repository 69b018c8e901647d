package org.modestead.engine.recording;

import java.util.Objects;

/**
 * One measured quantity.
 *
 * @param name as in the table it came from, not empty
 * @param unit as written by the user or in the column name's brackets, empty when unknown
 */
public record Channel(String name, String unit) {

    /** Checks that the name is not empty and the unit is there. */
    public Channel {
        if (name.isEmpty()) {
            throw new IllegalArgumentException("a channel needs a name");
        }
        Objects.requireNonNull(unit);
    }

    /** Returns {@code name [unit]}, or the name alone when the unit is unknown. */
    public String label() {
        return unit.isEmpty() ? name : name + " [" + unit + "]";
    }
}
