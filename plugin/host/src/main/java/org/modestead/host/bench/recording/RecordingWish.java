package org.modestead.host.bench.recording;

import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What a person said of a recording; all that is empty is guessed.
 *
 * @param reading settings of the step that reads the file, by key
 * @param columns what the columns are
 */
public record RecordingWish(Optional<Map<String, Object>> reading, Optional<Roles> columns) {

    /** Nothing was said. */
    public static final RecordingWish NONE = new RecordingWish(Optional.empty(), Optional.empty());

    /**
     * What the columns of a table are.
     *
     * @param time column of the times; empty for none
     * @param timeUnit unit of time; empty when not known
     * @param run column that names the runs; empty for one run
     * @param channels measured quantities
     * @param inputs known inputs
     */
    public record Roles(String time, String timeUnit, String run, List<String> channels, List<String> inputs) {

        /** Takes immutable copies. */
        public Roles {
            channels = List.copyOf(channels);
            inputs = List.copyOf(inputs);
        }
    }
}
