package org.modestead.knime.describe;

import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;

/** Plain text as the well-formed markup that the platform's descriptions allow. */
final class Markup {

    private Markup() {}

    static String text(String plain) {
        return plain.replace("&", "&amp;").replace("<", "&lt;").replace(">", "&gt;");
    }

    static String attribute(String plain) {
        return text(plain).replace("\"", "&quot;");
    }

    /** A paragraph for each part between blank lines. */
    static String paragraphs(String plain) {
        return Arrays.stream(plain.strip().split("\\R\\s*\\R")).map(part -> "<p>" + text(part.strip()) + "</p>")
                .collect(Collectors.joining());
    }

    /** A list of entries that are markup already, empty for none. */
    static String points(List<String> entries) {
        return entries.isEmpty() ? "" : entries.stream().collect(Collectors.joining("</li><li>", "<ul><li>", "</li></ul>"));
    }

    static String bold(String plain) {
        return "<b>" + text(plain) + "</b>";
    }
}
