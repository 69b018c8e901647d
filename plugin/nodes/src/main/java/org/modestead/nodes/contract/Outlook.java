package org.modestead.nodes.contract;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;

/**
 * What is known of a value before it is there: of which recording it will be made, and which kernel it will be. Enough for a node downstream to tell
 * the columns of its tables, and which columns new data must have.
 *
 * @param channels measured quantities in order; empty when not known
 * @param inputs known inputs in order
 * @param time time axis; empty when only the data tell, as with dates written as text
 * @param kernel the kernel in words; empty when it is none, or when it is chosen from the data
 */
public record Outlook(List<Channel> channels, List<Channel> inputs, Optional<TimeAxis> time, Optional<String> kernel) {

    /** Nothing is known. */
    public static final Outlook NONE = new Outlook(List.of(), List.of(), Optional.empty());

    /** Takes immutable copies. */
    public Outlook {
        channels = List.copyOf(channels);
        inputs = List.copyOf(inputs);
        Objects.requireNonNull(time);
        Objects.requireNonNull(kernel);
    }

    /** Of a value that is no kernel. */
    public Outlook(List<Channel> channels, List<Channel> inputs, Optional<TimeAxis> time) {
        this(channels, inputs, time, Optional.empty());
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

    /** Returns this outlook on a kernel that is described by these words. */
    public Outlook withKernel(String words) {
        return new Outlook(channels, inputs, time, Optional.of(words));
    }

    /** Returns what is known once the value is there: all that was known before, and what the value tells. */
    public Outlook completedBy(Object value) {
        if (value instanceof Kernel chosen) {
            return withKernel(chosen.spec().label());
        }
        return complete() ? this : of(value).orElse(this);
    }

    /** Returns whether all is known of the recording that there is to know. */
    public boolean complete() {
        return !channels.isEmpty() && time.isPresent();
    }
}
