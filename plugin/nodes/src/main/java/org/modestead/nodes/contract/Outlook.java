package org.modestead.nodes.contract;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;

/**
 * What is known of a value before it is there: of which recording it will be made. Enough for a node downstream to tell the
 * columns of its tables, and which columns new data must have.
 *
 * @param channels measured quantities in order; empty when not known
 * @param inputs known inputs in order
 * @param time time axis; empty when only the data tell, as with dates written as text
 */
public record Outlook(List<Channel> channels, List<Channel> inputs, Optional<TimeAxis> time) {

    /** Nothing is known. */
    public static final Outlook NONE = new Outlook(List.of(), List.of(), Optional.empty());

    /** Takes immutable copies. */
    public Outlook {
        channels = List.copyOf(channels);
        inputs = List.copyOf(inputs);
        Objects.requireNonNull(time);
    }

    /** Returns what a value that is there tells, empty where it tells less than what it was made from. */
    public static Optional<Outlook> of(Object value) {
        if (value instanceof Snapshots snapshots) {
            return Optional.of(new Outlook(snapshots.channels(), snapshots.inputs(), Optional.of(snapshots.time())));
        }
        if (value instanceof Model model) {
            return of(model.operator());
        }
        return value instanceof FittedOperator operator ? of(operator.snapshots()) : Optional.empty();
    }

    /** Returns whether all is known that there is to know. */
    public boolean complete() {
        return !channels.isEmpty() && time.isPresent();
    }
}
