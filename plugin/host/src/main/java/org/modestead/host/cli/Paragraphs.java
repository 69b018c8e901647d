package org.modestead.host.cli;

import java.util.ArrayList;
import java.util.List;

/** Breaks running text into lines of at most {@value #WIDTH} letters. */
final class Paragraphs {

    static final int WIDTH = 96;
    private static final int DEEPEST = 40;

    private Paragraphs() {}

    /** Returns the text with {@code first} before its first line and as many blanks before the others. */
    static List<String> hanging(String first, String text) {
        String indent = " ".repeat(Math.min(first.length(), DEEPEST));
        List<String> lines = new ArrayList<>();
        StringBuilder line = new StringBuilder(first);
        boolean empty = true;
        for (String word : text.strip().split("\\s+")) {
            if (!empty && line.length() + 1 + word.length() > WIDTH) {
                lines.add(line.toString().stripTrailing());
                line = new StringBuilder(indent);
                empty = true;
            }
            line.append(empty ? "" : " ").append(word);
            empty = false;
        }
        lines.add(line.toString().stripTrailing());
        return lines;
    }
}
