package org.modestead.engine.recording;

import java.util.List;
import java.util.Objects;

/**
 * What was logged: one or more runs of the same channels, before any preparation.
 *
 * @param channels the n measured quantities, in column order, at least one
 * @param inputs the q known inputs, in column order, possibly none
 * @param runs at least one; each with n columns of values and q of inputs
 * @param time how times were written
 */
public record Recording(List<Channel> channels, List<Channel> inputs, List<Run> runs, TimeAxis time) {

    /** Takes immutable copies and checks the shapes. */
    public Recording {
        channels = List.copyOf(channels);
        inputs = List.copyOf(inputs);
        runs = List.copyOf(runs);
        Objects.requireNonNull(time);
        for (Run run : runs) {
            if (run.values().numCols != channels.size() || run.inputs().numCols != inputs.size()) {
                throw new IllegalArgumentException("run " + run.id() + " has " + run.values().numCols + " channels and "
                        + run.inputs().numCols + " inputs, the recording " + channels.size() + " and " + inputs.size());
            }
        }
    }
}
