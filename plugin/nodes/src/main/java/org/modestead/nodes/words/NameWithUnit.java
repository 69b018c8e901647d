package org.modestead.nodes.words;

import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A name and the unit in brackets at its end, as in {@code pressure [bar]}.
 *
 * @param name without the unit
 * @param unit may be an empty text; empty where there are no brackets
 */
public record NameWithUnit(String name, Optional<String> unit) {

    private static final Pattern BRACKETS = Pattern.compile("(.*\\S)\\s*\\[([^\\[\\]]*)\\]\\s*");

    /** Reads a name as it is written; without brackets it is the name itself. */
    public static NameWithUnit of(String written) {
        if (written.indexOf('[') < 0) {
            return new NameWithUnit(written, Optional.empty());
        }
        Matcher match = BRACKETS.matcher(written);
        return match.matches() ? new NameWithUnit(match.group(1), Optional.of(match.group(2).strip())) : new NameWithUnit(written, Optional.empty());
    }
}
