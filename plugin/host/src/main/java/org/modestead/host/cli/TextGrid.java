package org.modestead.host.cli;

import java.util.ArrayList;
import java.util.List;

/** Rows of texts with columns aligned: the first to the left, all others to the right. */
final class TextGrid {

    private final List<List<String>> rows = new ArrayList<>();

    void row(List<String> cells) {
        rows.add(List.copyOf(cells));
    }

    /** Returns the lines, each with {@code indent} before it. */
    List<String> lines(String indent) {
        int columns = rows.stream().mapToInt(List::size).max().orElse(0);
        int[] widths = new int[columns];
        for (List<String> row : rows) {
            for (int j = 0; j < row.size(); j++) {
                widths[j] = Math.max(widths[j], width(row.get(j)));
            }
        }
        return rows.stream().map(row -> line(indent, row, widths)).toList();
    }

    private static String line(String indent, List<String> row, int[] widths) {
        StringBuilder line = new StringBuilder(indent);
        for (int j = 0; j < row.size(); j++) {
            String space = " ".repeat(widths[j] - width(row.get(j)));
            line.append(j == 0 ? "" : "  ").append(j == 0 ? row.get(j) + space : space + row.get(j));
        }
        return line.toString().stripTrailing();
    }

    private static int width(String text) {
        return text.codePointCount(0, text.length());
    }
}
