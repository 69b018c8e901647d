package org.modestead.nodes.words;

import java.util.List;
import java.util.Locale;

/** Makes sentences of fragments. */
public final class Sentence {
    private Sentence() {}

    /** Returns the text with a capital first letter and a full stop, unless it already ends in one of {@code . ! ?}. */
    public static String of(String text) {
        String trimmed = text.strip();
        if (trimmed.isEmpty()) {
            return trimmed;
        }
        String started = capital(trimmed);
        return ".!?".indexOf(trimmed.charAt(trimmed.length() - 1)) >= 0 ? started : started + ".";
    }

    /** Returns the text with a capital first letter. */
    public static String capital(String text) {
        return text.isEmpty() ? text : text.substring(0, 1).toUpperCase(Locale.ROOT) + text.substring(1);
    }

    /** Returns {@code a, b, c}, or {@code a, b and 3 more} where there are more names than are to be listed. */
    public static String listed(List<String> names, int most) {
        return names.size() <= most ? String.join(", ", names)
                : String.join(", ", names.subList(0, most)) + " and " + (names.size() - most) + " more";
    }

    /** Returns {@code 1 run}, {@code 3 runs}. */
    public static String count(long number, String singular) {
        return number + " " + singular + (number == 1 ? "" : "s");
    }
}
