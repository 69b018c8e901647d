package org.modestead.nodes.contract;

import java.util.Collection;
import java.util.Comparator;
import java.util.Locale;
import java.util.Optional;

/**
 * Finds what a person probably meant when a name is unknown: the known name with the smallest edit distance
 * (insert, delete, replace; Levenshtein 1966), ignoring case.
 */
public final class NearestName {

    private static final int LETTERS_PER_EDIT = 3;

    private NearestName() {}

    /**
     * Returns the nearest known name, if it is near enough to be worth naming: at most one edit per three letters,
     * or one of the two begins with the other.
     *
     * @param name as written
     * @param known in the order in which ties are decided
     */
    public static Optional<String> of(String name, Collection<String> known) {
        String wanted = name.toLowerCase(Locale.ROOT);
        return known.stream()
                .filter(candidate -> near(wanted, candidate.toLowerCase(Locale.ROOT)))
                .min(Comparator.comparingInt(candidate -> distance(wanted, candidate.toLowerCase(Locale.ROOT))));
    }

    /** Returns {@code ", perhaps you meant x"} or an empty text. */
    public static String hint(String name, Collection<String> known) {
        return of(name, known).map(found -> ", perhaps you meant " + found).orElse("");
    }

    private static boolean near(String a, String b) {
        int allowed = Math.max(1, (Math.max(a.length(), b.length()) + 1) / LETTERS_PER_EDIT);
        boolean begins = Math.min(a.length(), b.length()) >= LETTERS_PER_EDIT && (a.startsWith(b) || b.startsWith(a));
        return begins || distance(a, b) <= allowed;
    }

    private static int distance(String a, String b) {
        int[] row = new int[b.length() + 1];
        for (int j = 0; j <= b.length(); j++) {
            row[j] = j;
        }
        for (int i = 1; i <= a.length(); i++) {
            int diagonal = row[0];
            row[0] = i;
            for (int j = 1; j <= b.length(); j++) {
                int replaced = diagonal + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
                diagonal = row[j];
                row[j] = Math.min(replaced, 1 + Math.min(row[j], row[j - 1]));
            }
        }
        return row[b.length()];
    }
}
