package org.modestead.host.workflow;

import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * One thing wrong with a workflow, before anything ran.
 *
 * @param file the workflow file, or the command line option that is wrong
 * @param step id of the step, empty when it is not about one
 * @param key what it is about, for example {@code setting rank}, {@code link a.table -> b.table} or {@code line 3, column
 * 7};
 *     may be empty
 * @param seen what was found, with the value
 * @param wanted what would be right, as an instruction
 */
public record Problem(String file, String step, String key, String seen, String wanted) {

    /** Returns one sentence with where, what was seen and what would be right. */
    public String sentence() {
        String where = Stream.of(file, step.isEmpty() ? "" : "step " + step, key)
                .filter(part -> !part.isEmpty())
                .collect(Collectors.joining(", "));
        return where + ": " + seen + "; " + wanted + ".";
    }

}
