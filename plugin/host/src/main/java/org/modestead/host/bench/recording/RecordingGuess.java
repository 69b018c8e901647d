package org.modestead.host.bench.recording;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.Consumer;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.host.table.TableFault;
import org.modestead.host.table.TableSource;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.words.Sentence;

/**
 * What a file seems to hold: how it is written, which column is what, how many runs at which step. Whatever a person said counts, the
 * rest is guessed. What stands in the way of a first look at its modes is told in sentences.
 *
 * @param file that was looked at
 * @param reading settings of the step that reads it, by key
 * @param longForm how one row a reading becomes one row a time; empty where there is one row a time
 * @param roles of the columns, of one row a time
 * @param columns what was seen in each
 * @param why each column has its part, by name
 * @param rows looked at
 * @param whole whether these are all
 * @param runs with their rows
 * @param sentences what was found, in words
 * @param problems what stands in the way; empty when the steps can be laid out
 * @param figure the recording, thinned; empty where there is nothing to draw
 */
public record RecordingGuess(Path file, Map<String, Object> reading, Optional<LongForm> longForm, RecordingWish.Roles roles, List<ColumnFacts> columns, Map<String, String> why, long rows,
        boolean whole, RunScan runs, List<String> sentences, List<String> problems, Optional<Figure> figure) {

    private static final int FEWEST_ROWS = 20;
    private static final int MOST_TEXTS = 8;
    private static final String MISSING = "missing";
    private static final List<String> STANDARD_MISSING = ((Setting.Texts) new TableSource().declaration().settings().stream()
            .filter(setting -> setting.key().equals(MISSING)).findFirst().orElseThrow()).initial();
    private static final RecordingWish.Roles NO_ROLES = new RecordingWish.Roles("", "", "", List.of(), List.of());

    /** Takes immutable copies. */
    public RecordingGuess {
        reading = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(reading));
        columns = List.copyOf(columns);
        why = Map.copyOf(why);
        sentences = List.copyOf(sentences);
        problems = List.copyOf(problems);
    }

    /** Looks at a file. */
    public static RecordingGuess of(Path file, RecordingWish wish) {
        Map<String, Object> reading = new LinkedHashMap<>();
        try {
            reading.putAll(wish.reading().isPresent() ? wish.reading().get() : ReadingGuess.of(file));
            Scanned scanned = scan(file, reading);
            return of(file, reading, scanned, wish.columns());
        } catch (Fault fault) {
            return nothing(file, reading, fault.getMessage());
        } catch (IOException unreadable) {
            return nothing(file, reading, file.getFileName() + ": the file cannot be read (" + unreadable.getMessage() + ").");
        }
    }

    /** A table with one row a time, what was seen in it, and how it became so. */
    private record Scanned(Table table, TableScan scan, Optional<LongForm> longForm) {

        static Scanned of(Path file, Table table) {
            TableScan scan = TableScan.of(table);
            Optional<LongForm> found = LongForm.of(table, scan);
            Table wide = found.map(form -> form.wide(table, context(file))).orElse(table);
            return new Scanned(wide, found.isEmpty() ? scan : TableScan.of(wide), found);
        }
    }

    /** Reads a table; texts in columns of numbers, such as "sensor off", count as missing cells from then on, as long as they are few different ones. */
    private static Scanned scan(Path file, Map<String, Object> reading) {
        for (int found = 0;; found++) {
            try {
                return Scanned.of(file, open(file, reading));
            } catch (TableFault fault) {
                List<Object> missing = new ArrayList<>(reading.get(MISSING) instanceof List<?> texts ? texts : STANDARD_MISSING);
                if (fault.misfit().isEmpty() || found == MOST_TEXTS || missing.contains(fault.misfit().get())) {
                    throw fault;
                }
                missing.add(fault.misfit().get());
                reading.put(MISSING, missing);
            }
        }
    }

    private static RecordingGuess nothing(Path file, Map<String, Object> reading, String problem) {
        return new RecordingGuess(file, reading, Optional.empty(), NO_ROLES, List.of(), Map.of(), 0, true, new RunScan(List.of(), java.util.OptionalLong.empty()), List.of(),
                List.of(problem), Optional.empty());
    }

    private static Table open(Path file, Map<String, Object> reading) {
        Map<String, Object> stored = new LinkedHashMap<>(reading);
        stored.put("path", file.getFileName().toString());
        SettingsReader.Reading read = SettingsReader.read(new TableSource(), stored);
        Settings settings = read.settings().orElseThrow(() -> new RecordingFault("setting " + read.problems().get(0).key(), read.problems().get(0).seen(),
                read.problems().get(0).wanted()));
        return (Table) new TableSource().run(new NodeInputs(Map.of()), settings, context(file)).outputs().get("table");
    }

    private static RunContext context(Path file) {
        return new RunContext(Progress.NONE, file.getParent(), file.getParent());
    }

    private static RecordingGuess of(Path file, Map<String, Object> reading, Scanned scanned, Optional<RecordingWish.Roles> wished) {
        Table table = scanned.table();
        TableScan scan = scanned.scan();
        RoleGuess.Guessed guessed = RoleGuess.of(scan);
        RecordingWish.Roles roles = wished.map(said -> known(said, table)).orElse(guessed.roles());
        RunScan runs = RunScan.of(table, roles, RecordingPicture.MOST_CHANNELS);
        List<ColumnFacts> channels = roles.channels().stream().flatMap(name -> scan.columns().stream().filter(facts -> facts.column().name().equals(name))).toList();
        Optional<CellType> time = type(scan.columns(), roles.time());
        RecordingGuess guess = new RecordingGuess(file, reading, scanned.longForm(), roles, scan.columns(), guessed.why(), scan.rows(), scan.whole(), runs, List.of(), List.of(),
                RecordingPicture.of(runs, roles, channels, time));
        return new RecordingGuess(file, reading, scanned.longForm(), roles, scan.columns(), guessed.why(), scan.rows(), scan.whole(), runs, guess.words(), guess.hindrances(time),
                guess.figure());
    }

    private static Optional<CellType> type(List<ColumnFacts> columns, String name) {
        return columns.stream().filter(facts -> facts.column().name().equals(name)).map(facts -> facts.column().type()).findFirst();
    }

    private static RecordingWish.Roles known(RecordingWish.Roles roles, Table table) {
        List<String> names = table.schema().names();
        return new RecordingWish.Roles(names.contains(roles.time()) ? roles.time() : "", roles.timeUnit(), names.contains(roles.run()) ? roles.run() : "",
                roles.channels().stream().filter(names::contains).toList(), roles.inputs().stream().filter(names::contains).toList());
    }

    /** Returns the part of a column: time, run, channel, input or none. */
    public String role(String column) {
        return column.equals(roles.time()) ? "time" : column.equals(roles.run()) ? "run" : roles.channels().contains(column) ? "channel"
                : roles.inputs().contains(column) ? "input" : "none";
    }

    /**
     * A column as a person is shown it.
     *
     * @param name in the table
     * @param title name without its unit
     * @param unit behind the name; empty without one
     * @param type of the cells
     * @param missing cells
     * @param low smallest value; NaN where there is none
     * @param high largest
     * @param role time, run, channel, input or none
     * @param why it was taken so
     */
    public record ShownColumn(String name, String title, String unit, CellType type, long missing, double low, double high, String role, String why) {}

    /** Hands over each column in the order of the table. */
    public void eachColumn(Consumer<ShownColumn> taker) {
        columns.forEach(facts -> taker.accept(new ShownColumn(facts.column().name(), facts.title(), facts.unit(), facts.column().type(), facts.missing(), facts.low(),
                facts.high(), role(facts.column().name()), why.getOrDefault(facts.column().name(), ""))));
    }

    /** Returns the middle step in the unit of time; NaN without one. */
    public double step() {
        Optional<CellType> type = type(columns, roles.time());
        double seconds = type.isEmpty() || type.get().isNumber() ? 1 : switch (roles.timeUnit()) {
            case "min" -> 60;
            case "h" -> 3600;
            case "d" -> type.get() == CellType.DATE ? 1 : 86_400;
            case "week" -> type.get() == CellType.DATE ? 7 : 7 * 86_400;
            case "year" -> type.get() == CellType.DATE ? 365.25 : 365.25 * 86_400;
            default -> 1;
        };
        return runs.step() / seconds;
    }

    private List<String> words() {
        List<String> words = new ArrayList<>();
        String unit = roles.timeUnit().isEmpty() ? "" : " " + roles.timeUnit();
        double step = step();
        words.add((whole ? "" : "The first ") + rows + " rows in " + Sentence.count(runs.runs().size(), "run") + (roles.time().isEmpty() || Double.isNaN(step) ? "."
                : (runs.isEven() ? ", every " : ", about every ") + String.format(Locale.ROOT, "%.4g", step).replaceAll("(\\.\\d*?)0+$", "$1").replaceAll("\\.$", "")
                        + unit + "."));
        long gaps = roles.time().isEmpty() ? 0 : runs.gaps();
        if (gaps > 0) {
            words.add(Sentence.count(gaps, "pause") + ": runs are split there.");
        }
        longForm.ifPresent(form -> words.add(form.words()));
        missingTexts().ifPresent(words::add);
        words.add(roles.time().isEmpty() ? "No column of times was found: rows count as evenly spaced." : "The time stands in column " + roles.time()
                + (roles.timeUnit().isEmpty() ? "; its unit is not told: write it, so that rates have one." : "."));
        words.add(Sentence.count(roles.channels().size(), "channel")
                + (roles.inputs().isEmpty() ? "" : " and " + Sentence.count(roles.inputs().size(), "known input")) + ".");
        return words;
    }

    private Optional<String> missingTexts() {
        List<String> texts = reading.get(MISSING) instanceof List<?> all ? all.stream().filter(text -> !STANDARD_MISSING.contains(text))
                .map(text -> "\"" + text + "\"").toList() : List.of();
        return texts.isEmpty() ? Optional.empty() : Optional.of("Cells that hold " + String.join(" or ", texts) + " count as missing.");
    }

    private List<String> hindrances(Optional<CellType> time) {
        List<String> problems = new ArrayList<>();
        if (roles.channels().isEmpty()) {
            problems.add("No channel: take at least one column of numbers as a channel.");
        }
        for (String name : roles.channels()) {
            columns.stream().filter(facts -> facts.column().name().equals(name) && !facts.column().type().isNumber()).findFirst()
                    .ifPresent(facts -> problems.add("Column " + name + " holds " + facts.column().type().title() + "s: it cannot be a channel."));
        }
        if (time.filter(type -> !type.isTime()).isPresent()) {
            problems.add("Column " + roles.time() + " holds " + time.get().title() + "s that are no times: write them as 2015-06-30T12:00:00, or tell the time format.");
        } else if (!roles.time().isEmpty() && runs.fall().isPresent()) {
            problems.add("The time " + roles.time() + " falls back or stands still at row " + runs.fall().getAsLong() + (roles.run().isEmpty()
                    ? ": name the column that tells the runs apart, or take another column as time." : " within its run: take another column as time."));
        }
        if (rows < FEWEST_ROWS) {
            problems.add(rows + " rows are too few: give at least " + FEWEST_ROWS + ".");
        }
        return problems;
    }
}
