package org.modestead.host.table;

import java.sql.SQLException;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/** What DuckDB says when it refuses, cut down to the part that helps a person. */
record DuckDbMessage(String text) {

    private static final Pattern KIND = Pattern.compile("^(?:(?:[A-Z][A-Za-z ]* Error|[A-Za-z]+Exception): *)+");
    private static final Pattern LINE = Pattern.compile("CSV Error on Line: (\\d+)");
    private static final Pattern CELLS = Pattern.compile("Expected Number of Columns: (\\d+) Found: (\\d+)");

    static DuckDbMessage of(SQLException failure) {
        String text = String.valueOf(failure.getMessage());
        int inner = text.lastIndexOf("\nError: ");
        return new DuckDbMessage(inner < 0 ? text : text.substring(inner + "\nError: ".length()));
    }

    /** Returns the message in one line, without kind, position in generated SQL, and advice meant for programmers. */
    String brief() {
        String body = text.lines().takeWhile(line -> !line.startsWith("LINE ") && !line.startsWith("Possible "))
                .map(String::strip).filter(line -> !line.isEmpty()).limit(3).collect(Collectors.joining(" "));
        String plain = KIND.matcher(body).replaceFirst("");
        while (plain.endsWith(".") || plain.endsWith("!")) {
            plain = plain.substring(0, plain.length() - 1);
        }
        return plain.isEmpty() ? "DuckDB refused" : plain;
    }

    /** Returns the record of a CSV file that it is about, the header being 1; 0 when it names none. */
    long record() {
        Matcher found = LINE.matcher(text);
        return found.find() ? Long.parseLong(found.group(1)) : 0;
    }

    /** Returns the number of cells found in a row of the wrong length; -1 when it is not about that. */
    int cellsFound() {
        Matcher found = CELLS.matcher(text);
        return found.find() ? Integer.parseInt(found.group(2)) : -1;
    }

    boolean isAbout(String words) {
        return text.toLowerCase(Locale.ROOT).contains(words);
    }
}
