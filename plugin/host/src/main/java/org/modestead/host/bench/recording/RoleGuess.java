package org.modestead.host.bench.recording;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.modestead.nodes.table.CellType;

/** Guesses what the columns of a recording are: its time, its runs, measured channels, known inputs, and what takes no part. */
final class RoleGuess {

    private static final Set<String> TIME_WORDS = Set.of("t", "time", "times", "timestamp", "date", "datetime", "datum", "zeit", "sec", "secs", "second", "seconds",
            "year", "jahr", "month", "day", "hour", "elapsed", "clock", "when");
    private static final Set<String> RUN_WORDS = Set.of("run", "runs", "trial", "test", "experiment", "batch", "lauf", "versuch", "cycle", "segment", "episode",
            "session", "recording", "campaign", "shot");
    private static final Set<String> INPUT_WORDS = Set.of("input", "inputs", "gate", "valve", "setpoint", "set", "command", "cmd", "control", "ref", "reference",
            "demand", "pump", "actuator", "stellgroesse", "soll", "u");
    private static final Set<String> COUNTER_WORDS = Set.of("id", "index", "idx", "row", "no", "nr", "number", "sample", "count", "nummer", "n");
    private static final double STEADY = 0.9;

    private final TableScan scan;
    private final Map<String, String> why = new LinkedHashMap<>();

    private RoleGuess(TableScan scan) {
        this.scan = scan;
    }

    /**
     * What was guessed.
     *
     * @param roles of the columns
     * @param why each column has its part, by name
     */
    record Guessed(RecordingWish.Roles roles, Map<String, String> why) {}

    static Guessed of(TableScan scan) {
        return new RoleGuess(scan).guess();
    }

    private Guessed guess() {
        Optional<ColumnFacts> time = time();
        Optional<ColumnFacts> run = run(time);
        List<String> channels = new ArrayList<>();
        List<String> inputs = new ArrayList<>();
        for (ColumnFacts facts : scan.columns()) {
            String name = facts.column().name();
            if (time.filter(facts::equals).isPresent() || run.filter(facts::equals).isPresent()) {
                continue;
            }
            if (!facts.column().type().isNumber()) {
                why.put(name, "it holds " + facts.column().type().title() + "s, which are not measured");
            } else if (facts.isConstant()) {
                why.put(name, "it never changes");
            } else if (isCounter(facts)) {
                why.put(name, "it only counts the rows");
            } else if (hasWord(facts, INPUT_WORDS)) {
                inputs.add(name);
                why.put(name, "its name says that it is set, not measured");
            } else {
                channels.add(name);
                why.put(name, "it holds numbers that change");
            }
        }
        if (channels.isEmpty() && !inputs.isEmpty()) {
            channels.addAll(inputs);
            inputs.clear();
        }
        String unit = time.map(this::timeUnit).orElse("");
        return new Guessed(new RecordingWish.Roles(time.map(facts -> facts.column().name()).orElse(""), unit, run.map(facts -> facts.column().name()).orElse(""),
                channels, inputs), why);
    }

    private Optional<ColumnFacts> time() {
        Optional<ColumnFacts> found = scan.columns().stream().filter(facts -> timeScore(facts) > 0)
                .max(Comparator.comparingDouble(this::timeScore).thenComparing(facts -> -scan.columns().indexOf(facts)));
        found.ifPresent(facts -> why.put(facts.column().name(), (hasWord(facts, TIME_WORDS) ? "its name says time, and it rises" : "it rises from row to row")
                + (facts.falls() > 0 ? " within each run" : "")));
        return found;
    }

    /** A time rises nearly everywhere; where runs follow each other it falls back once a run. */
    private double timeScore(ColumnFacts facts) {
        CellType type = facts.column().type();
        long steps = Math.max(1, facts.cells() - 1);
        double rising = facts.rises() / (double) steps;
        boolean named = hasWord(facts, TIME_WORDS);
        boolean calendar = type.isTime() && !type.isNumber();
        if (!type.isTime() || facts.isConstant() || facts.missing() > facts.cells() / 10 || rising + (named || calendar ? 0.6 : 0.05) < 1) {
            return 0;
        }
        boolean first = scan.columns().indexOf(facts) == 0;
        double score = rising + (named ? 3 : 0) + (calendar ? 4 : 0) + (first ? 1 : 0) - (hasWord(facts, COUNTER_WORDS) && !named ? 2.5 : 0);
        return named || calendar || first || rising > 0.999 ? Math.max(score, 0) : 0;
    }

    private Optional<ColumnFacts> run(Optional<ColumnFacts> time) {
        Optional<ColumnFacts> found = scan.columns().stream().filter(facts -> !time.filter(facts::equals).isPresent()).filter(facts -> namesRuns(facts, time)).findFirst();
        found.ifPresent(facts -> why.put(facts.column().name(), facts.distinct() + " different values, each for a stretch of rows"));
        return found;
    }

    private boolean namesRuns(ColumnFacts facts, Optional<ColumnFacts> time) {
        CellType type = facts.column().type();
        boolean usable = facts.whole() || type == CellType.TEXT || type == CellType.FLAG || type == CellType.DATE;
        boolean named = hasWord(facts, RUN_WORDS);
        if (!usable || facts.missing() > 0 || facts.distinct() < (named ? 1 : 2) || facts.distinct() > Math.max(1, scan.rows() / 4)) {
            return false;
        }
        boolean blocks = facts.changes() == facts.distinct() - 1L;
        boolean resets = time.filter(found -> found.falls() >= 1 && 2 * found.falls() >= facts.changes() && found.falls() <= facts.changes()).isPresent();
        return named || blocks && resets || blocks && type == CellType.TEXT && 5L * facts.distinct() <= scan.rows();
    }

    private boolean isCounter(ColumnFacts facts) {
        return hasWord(facts, COUNTER_WORDS) && facts.column().type() == CellType.LONG && facts.rises() >= STEADY * (facts.cells() - 1);
    }

    private static boolean hasWord(ColumnFacts facts, Set<String> words) {
        String name = facts.title().replaceAll("([a-z])([A-Z])", "$1 $2").toLowerCase(Locale.ROOT);
        for (String word : name.split("[^\\p{L}]+")) {
            if (words.contains(word)) {
                return true;
            }
        }
        return false;
    }

    private String timeUnit(ColumnFacts facts) {
        CellType type = facts.column().type();
        if (type == CellType.DATE) {
            return "d";
        } else if (!type.isNumber()) {
            double step = (facts.high() - facts.low()) / Math.max(1, facts.rises());
            return step >= 86_400 * 0.9 ? "d" : step >= 3600 * 0.9 ? "h" : step >= 60 * 0.9 ? "min" : "s";
        }
        String name = facts.title().toLowerCase(Locale.ROOT);
        return !facts.unit().isEmpty() ? facts.unit() : name.matches(".*(_|\\b)(s|sec|secs|seconds?)") ? "s" : name.matches(".*(_|\\b)(ms|msec|milliseconds?)") ? "ms"
                : name.matches(".*(_|\\b)(min|minutes?)") ? "min" : name.matches(".*(_|\\b)(h|hours?)") ? "h" : name.matches(".*(_|\\b)(d|days?)") ? "d"
                        : name.matches(".*(_|\\b)(years?|jahr)") ? "year" : "";
    }
}
