package org.modestead.engine.battery;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.function.Function;
import org.modestead.engine.wellposed.Grade;

/** Verdict wanted against verdict given, counted. */
record Confusion(List<Trial.Outcome> outcomes) {

    /** The whole report: both parts, each by noise and by number of runs. */
    String report() {
        StringBuilder out = new StringBuilder();
        for (boolean calibrating : new boolean[] {true, false}) {
            List<Trial.Outcome> half = outcomes.stream().filter(o -> o.trial().truth().calibrates() == calibrating).toList();
            String name = calibrating ? "calibration part" : "reporting part";
            split(out, half, name, "noise", o -> o.trial().noise());
            split(out, half, name, "runs", o -> o.trial().runs());
        }
        return out.toString();
    }

    /** Shares of right verdicts as a table for the README: by noise, each by number of runs. */
    String summary() {
        StringBuilder out = new StringBuilder(String.format(Locale.ROOT, "%n| part | noise |"));
        Set<Integer> runs = new LinkedHashSet<>(outcomes.stream().map(o -> o.trial().runs()).toList());
        runs.forEach(count -> out.append(' ').append(count).append(" runs |"));
        out.append(String.format(Locale.ROOT, " all | `stands` without a mode |%n|---|---:|")).append("---:|".repeat(runs.size() + 2));
        for (boolean calibrating : new boolean[] {true, false}) {
            for (double noise : new LinkedHashSet<>(outcomes.stream().map(o -> o.trial().noise()).toList())) {
                List<Trial.Outcome> row = outcomes.stream().filter(o -> o.trial().truth().calibrates() == calibrating
                        && o.trial().noise() == noise).toList();
                out.append(String.format(Locale.ROOT, "%n| %s | %.1f %% |", calibrating ? "calibration" : "reporting", 100 * noise));
                runs.forEach(count -> out.append(String.format(Locale.ROOT, " %.1f %% |", right(row.stream().filter(o ->
                        o.trial().runs() == count).toList()))));
                out.append(String.format(Locale.ROOT, " %.1f %% | %d of %d |", right(row), row.stream().filter(Trial.Outcome::falseReport).count(),
                        row.stream().filter(o -> o.trial().truth().truth().forbidsReport()).count()));
            }
        }
        return out.append(System.lineSeparator()).toString();
    }

    private static double right(List<Trial.Outcome> part) {
        return 100.0 * part.stream().filter(Trial.Outcome::right).count() / part.size();
    }

    /** One line a case, one column a noise level, one sign a trial (runs, then seeds); a dot where the verdict is right. */
    String byCase() {
        StringBuilder out = new StringBuilder("S stands, s settles, u undecided, d drifts, a absent, - refused, . right; C calibrates, R reports\n");
        for (String id : new LinkedHashSet<>(outcomes.stream().map(o -> o.trial().truth().id()).toList())) {
            List<Trial.Outcome> own = outcomes.stream().filter(o -> o.trial().truth().id().equals(id)).toList();
            Case known = own.get(0).trial().truth();
            out.append(String.format(Locale.ROOT, "%s %-58s %-17s", known.calibrates() ? "C" : "R", id,
                    known.truth().word()));
            for (double noise : new LinkedHashSet<>(own.stream().map(o -> o.trial().noise()).toList())) {
                out.append("  ");
                own.stream().filter(o -> o.trial().noise() == noise).forEach(o -> out.append(o.right() ? "." : sign(o)));
            }
            out.append(System.lineSeparator());
        }
        return out.toString();
    }

    private static String sign(Trial.Outcome outcome) {
        return outcome.given().map(grade -> grade == Grade.STANDS ? "S" : grade.word().substring(0, 1)).orElse("-");
    }

    private static void split(StringBuilder out, List<Trial.Outcome> half, String name, String by,
            Function<Trial.Outcome, Object> key) {
        Set<Object> keys = new LinkedHashSet<>(half.stream().map(key).toList());
        for (Object value : keys) {
            List<Trial.Outcome> part = half.stream().filter(o -> key.apply(o).equals(value)).toList();
            long right = part.stream().filter(Trial.Outcome::right).count();
            long falseReports = part.stream().filter(Trial.Outcome::falseReport).count();
            out.append(String.format(Locale.ROOT,
                    "%n%s, %s %s: %d of %d right (%.1f %%), stands where there is no mode: %d%n", name, by, value,
                    right, part.size(), 100.0 * right / part.size(), falseReports));
            table(out, part);
        }
    }

    private static void table(StringBuilder out, List<Trial.Outcome> part) {
        List<String> given = new ArrayList<>();
        for (Grade grade : Grade.values()) {
            given.add(grade.word());
        }
        given.add("refused");
        out.append(String.format(Locale.ROOT, "| %-18s|", "wanted \\ given"));
        given.forEach(word -> out.append(String.format(Locale.ROOT, " %9s |", word)));
        out.append(String.format(Locale.ROOT,
                "%n|---|")).append("---:|".repeat(given.size())).append(System.lineSeparator());
        for (Truth truth : Truth.values()) {
            out.append(String.format(Locale.ROOT, "| %-18s|", truth.word()));
            for (String word : given) {
                out.append(String.format(Locale.ROOT, " %9d |", part.stream().filter(o -> o.trial().truth().truth() == truth
                        && o.given().map(Grade::word).orElse("refused").equals(word)).count()));
            }
            out.append(System.lineSeparator());
        }
    }
}
