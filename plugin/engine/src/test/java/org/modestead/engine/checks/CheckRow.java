package org.modestead.engine.checks;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A row of {@code checks.csv}, the table of check values.
 *
 * @param id section of the list of checks, such as C2.5
 * @param quantity what is checked
 * @param input of what
 * @param expected value
 * @param tolerances one, or one a way of finding the value
 */
record CheckRow(String id, String quantity, String input, double expected, List<Tolerance> tolerances) {

    private static final Pattern CELL = Pattern.compile("\"((?:[^\"]|\"\")*)\"(?:,|$)|([^,]*)(?:,|$)");

    /** Reads the whole table. */
    static List<CheckRow> all() {
        var stream = Objects.requireNonNull(CheckRow.class.getResourceAsStream("/checks/checks.csv"));
        try (BufferedReader reader = new BufferedReader(new InputStreamReader(stream, StandardCharsets.UTF_8))) {
            return reader.lines().skip(1).map(CheckRow::cells).map(cells -> new CheckRow(cells.get(0), cells.get(1),
                    cells.get(2), Double.parseDouble(cells.get(3)), Tolerance.read(cells.get(4)))).toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static List<String> cells(String line) {
        List<String> out = new ArrayList<>();
        Matcher matcher = CELL.matcher(line);
        while (out.size() < 6 && matcher.find()) {
            out.add(matcher.group(1) == null ? matcher.group(2) : matcher.group(1).replace("\"\"", "\""));
        }
        return out;
    }

    /** By which a row is named in reports. */
    String name() {
        return id + " " + quantity + ": " + input;
    }

    /** The number that follows a word in the input, for example 0.1 after {@code mu=}. */
    double after(String word) {
        return firstNumber(input.substring(input.indexOf(word) + word.length()));
    }

    /** The number at the end of the quantity, for example 2 of {@code rate2}. */
    int ordinal() {
        return (int) firstNumber(quantity.replaceFirst("^[^0-9]*", ""));
    }

    private static double firstNumber(String text) {
        Matcher matcher = Pattern.compile("^ *(-?[0-9.]+)").matcher(text);
        if (!matcher.find()) {
            throw new IllegalArgumentException("no number at the start of '" + text + "'");
        }
        return Double.parseDouble(matcher.group(1));
    }
}
