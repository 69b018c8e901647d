package org.modestead.engine;

import java.util.Objects;

/**
 * A numerical or data doubt that does not stop the work but must reach the report.
 *
 * @param code short stable identifier, lower case with dashes, for example {@code ill-conditioned}
 * @param sentence one sentence with the figures, in plain words
 */
public record Doubt(String code, String sentence) {

    /** Checks that both parts are there. */
    public Doubt {
        Objects.requireNonNull(code);
        Objects.requireNonNull(sentence);
    }
}
