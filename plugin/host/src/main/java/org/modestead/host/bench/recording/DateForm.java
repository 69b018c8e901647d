package org.modestead.host.bench.recording;

import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Guesses how dates are written that are not written as ISO 8601 does. */
final class DateForm {

    private static final Pattern ISO = Pattern.compile("\\d{4}-\\d{2}-\\d{2}([T ]\\d{2}:\\d{2}.*)?");
    private static final Pattern OTHER = Pattern.compile("(\\d{1,4})([./-])(\\d{1,2})\\2(\\d{2,4})(?:[ T](\\d{1,2}:\\d{2})(:\\d{2})?([.,]\\d+)?)?");
    private static final int LARGEST_MONTH = 12;

    private DateForm() {}

    /** Returns whether a text is a date or a date-time in one of the ways that are known here. */
    static boolean isMoment(String cell) {
        return ISO.matcher(cell).matches() || OTHER.matcher(cell).matches();
    }

    /** Returns the form in strptime codes; empty when all is ISO 8601 or there are no dates. */
    static Optional<String> of(List<List<String>> rows) {
        int columns = rows.stream().mapToInt(List::size).max().orElse(0);
        for (int j = 0; j < columns; j++) {
            int column = j;
            List<Matcher> moments = rows.stream().filter(row -> row.size() > column).map(row -> row.get(column))
                    .filter(cell -> !cell.isEmpty() && !ISO.matcher(cell).matches()).map(OTHER::matcher).filter(Matcher::matches).toList();
            if (!moments.isEmpty() && 2 * moments.size() > rows.size()) {
                return Optional.of(form(moments));
            }
        }
        return Optional.empty();
    }

    private static String form(List<Matcher> moments) {
        Matcher first = moments.get(0);
        String mark = first.group(2);
        String day;
        if (first.group(1).length() == 4) {
            day = "%Y" + mark + "%m" + mark + "%d";
        } else {
            String year = first.group(4).length() == 4 ? "%Y" : "%y";
            boolean monthFirst = moments.stream().anyMatch(moment -> Integer.parseInt(moment.group(3)) > LARGEST_MONTH)
                    || mark.equals("/") && moments.stream().noneMatch(moment -> Integer.parseInt(moment.group(1)) > LARGEST_MONTH) && moves(moments);
            day = (monthFirst ? "%m" + mark + "%d" : "%d" + mark + "%m") + mark + year;
        }
        String clock = first.group(5) == null ? "" : " %H:%M" + (first.group(6) == null ? "" : ":%S") + (first.group(7) == null ? "" : first.group(7).charAt(0) + "%f");
        return day + clock;
    }

    /** With slashes and no number above twelve, the part that changes from row to row more often is the day. */
    private static boolean moves(List<Matcher> moments) {
        long second = moments.stream().map(moment -> moment.group(3)).distinct().count();
        long first = moments.stream().map(moment -> moment.group(1)).distinct().count();
        return second > first;
    }
}
