package org.modestead.engine.watch;

import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * What one window shows of the watched modes.
 *
 * @param window where
 * @param modes one entry a watched mode, empty where it was not found
 * @param refused why the window could not be fitted; empty when it was
 */
public record Look(Window window, List<Optional<Sighting>> modes, Optional<String> refused) {

    /** Takes an immutable copy. */
    public Look {
        modes = List.copyOf(modes);
        Objects.requireNonNull(refused);
    }

    /** Returns whether the window was fitted: only then is a mode that was not found a missing one. */
    public boolean fitted() {
        return refused.isEmpty();
    }
}
