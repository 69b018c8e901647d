package org.modestead.engine.checks;

import java.util.Arrays;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * How far a found value may be from a check value, as the table of checks writes it, such as {@code 1e-8 rel},
 * {@code 3 sd=0.323} (three deviations together), {@code 1e-6 rel varpro; 3.0 delay fit}.
 *
 * @param bound largest error
 * @param relative whether it is meant as a share of the expected value
 * @param kind which way of finding the value it is for, in the words of the table; empty where there is one for all
 */
record Tolerance(double bound, boolean relative, String kind) {

    private static final Pattern WRITTEN = Pattern.compile(
            "(?:.*sd=)?([0-9.]+(?:e-?[0-9]+)?)( rel)?(?: abs)?(?: ([^(]+))?(?: *\\(.*\\))?");

    /** Reads a cell: one tolerance, or several for different ways, separated by a semicolon. */
    static List<Tolerance> read(String cell) {
        List<Tolerance> parts = Arrays.stream(cell.split(";")).map(String::strip).map(Tolerance::one).toList();
        return parts.size() > 1 ? parts : List.of(new Tolerance(parts.get(0).bound, parts.get(0).relative, ""));
    }

    private static Tolerance one(String written) {
        Matcher matcher = WRITTEN.matcher(written);
        if (!matcher.matches()) {
            throw new IllegalArgumentException("tolerance " + written);
        }
        return new Tolerance(Double.parseDouble(matcher.group(1)), matcher.group(2) != null,
                matcher.group(3) == null ? "" : matcher.group(3).strip());
    }

    boolean holds(double expected, double found) {
        return Math.abs(found - expected) <= bound * (relative ? Math.abs(expected) : 1);
    }
}
