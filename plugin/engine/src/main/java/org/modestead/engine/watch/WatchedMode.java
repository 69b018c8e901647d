package org.modestead.engine.watch;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.spectrum.Mode;

/**
 * A stored mode that is watched.
 *
 * @param mode stored
 * @param cycles how many of its cycles a window holds
 * @param windows fitted windows of the model's recordings
 * @param found in how many of them it was found
 * @param missingInARow windows in a row that must miss it to be an alarm; 0 where it is found too rarely to tell
 * @param references by quantity, only those with limits
 */
public record WatchedMode(Mode mode, double cycles, int windows, int found, int missingInARow, Map<Quantity, Reference> references) {

    /** Takes an immutable copy. */
    public WatchedMode {
        references = Map.copyOf(references);
    }

    /** Returns the limits of a quantity, where there are some. */
    public Optional<Reference> reference(Quantity quantity) {
        return Optional.ofNullable(references.get(quantity));
    }

    /** Returns the quantities that have limits, in order. */
    public List<Quantity> quantities() {
        return List.of(Quantity.values()).stream().filter(references::containsKey).toList();
    }
}
