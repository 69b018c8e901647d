package org.modestead.host.workflow;

import com.fasterxml.jackson.core.JsonProcessingException;

/** What is wrong with a text that should be JSON, in the words of the library that read it. */
public final class JsonWords {

    private JsonWords() {}

    /** Returns one line; a limit is named without the library's setting for it, which a person cannot change. */
    public static String of(JsonProcessingException broken) {
        return broken.getOriginalMessage().lines().findFirst().orElse("broken JSON").replaceAll(", from `[^`]*`", "");
    }
}
