package org.modestead.host.table;

import java.sql.SQLException;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.Iterator;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.modestead.nodes.table.CellType;

/**
 * Finds what the columns of a text table hold. More than half of a column's cells decide, so that one wrong cell is an
 * error to be named and not a column that silently becomes text.
 *
 * <p>The first {@value #SAMPLE} rows decide; columns that look whole or empty there are looked at to the end, since a
 * single 1.5 makes them numbers.
 */
final class TextTyper {

    static final int SAMPLE = 20480;

    /** Columns counted by one query: the database plans a query in a time that grows with the square of what it counts. */
    private static final int AT_ONCE = 250;

    private static final List<CellType> NUMBERS = List.of(CellType.DOUBLE, CellType.LONG);
    private static final List<CellType> OTHERS = List.of(CellType.FLAG, CellType.DATE, CellType.DATE_TIME, CellType.ZONED_DATE_TIME);

    private final Database database;
    private final String read;
    private final TextRules rules;

    /**
     * @param database in which the SQL runs
     * @param read table expression that gives all columns as texts
     * @param rules how texts become cells
     */
    TextTyper(Database database, String read, TextRules rules) {
        this.database = database;
        this.read = read;
        this.rules = rules;
    }

    /**
     * What a column holds.
     *
     * @param type of its cells
     * @param cells how many are not missing, in the rows looked at
     * @param misfits how many of these are not of the type
     */
    record Found(CellType type, long cells, long misfits) {}

    /** The rows counted, and what each column holds. */
    record Result(long rows, List<Found> columns) {

        Result {
            columns = List.copyOf(columns);
        }
    }

    Result types(List<String> names) throws SQLException {
        Result sample = look(names, "(SELECT * FROM " + read + " LIMIT " + SAMPLE + ")");
        if (sample.rows() < SAMPLE) {
            return sample;
        }
        List<String> open = new ArrayList<>();
        for (int j = 0; j < names.size(); j++) {
            Found found = sample.columns().get(j);
            if (found.type() == CellType.LONG || found.cells() == 0) {
                open.add(names.get(j));
            }
        }
        return open.isEmpty() ? sample : merge(names, sample, open, look(open, read));
    }

    private static Result merge(List<String> names, Result sample, List<String> open, Result whole) {
        List<Found> merged = new ArrayList<>();
        for (int j = 0; j < names.size(); j++) {
            int at = open.indexOf(names.get(j));
            merged.add(at < 0 ? sample.columns().get(j) : whole.columns().get(at));
        }
        return new Result(whole.rows(), merged);
    }

    /** What no number decides is looked at once more, for the other types: they cost several times what numbers do. */
    private Result look(List<String> names, String rows) throws SQLException {
        Counts numbers = count(names, NUMBERS, rows);
        List<String> undecided = IntStream.range(0, names.size()).filter(j -> !numbers.decides(j)).mapToObj(names::get).toList();
        Iterator<Map<CellType, Long>> others = (undecided.isEmpty() ? List.<Map<CellType, Long>>of() : count(undecided, OTHERS, rows).fitting()).iterator();
        List<Found> found = new ArrayList<>();
        for (int j = 0; j < names.size(); j++) {
            String name = names.get(j);
            long cells = numbers.cells().get(j);
            Map<CellType, Long> fitting = new EnumMap<>(numbers.fitting().get(j));
            if (!numbers.decides(j)) {
                fitting.putAll(others.next());
            }
            CellType type = rules.textColumns().contains(name) ? CellType.TEXT : type(cells, fitting);
            found.add(new Found(type, cells, cells - fitting.getOrDefault(type, cells)));
        }
        return new Result(numbers.rows(), found);
    }

    /** Of each column, how many cells are not missing and how many of them fit each type that was tried. */
    private record Counts(long rows, List<Long> cells, List<Map<CellType, Long>> fitting) {
        boolean decides(int column) {
            return areNumbers(cells.get(column), fitting.get(column));
        }

        /** Returns these columns and further ones of the same rows. */
        Counts and(Counts further) {
            return new Counts(further.rows(), joined(cells, further.cells()), joined(fitting, further.fitting()));
        }

        private static <T> List<T> joined(List<T> first, List<T> then) {
            return Stream.concat(first.stream(), then.stream()).toList();
        }
    }

    private Counts count(List<String> names, List<CellType> types, String rows) throws SQLException {
        Counts all = new Counts(0, List.of(), List.of());
        for (int from = 0; from < names.size(); from += AT_ONCE) {
            all = all.and(countAtOnce(names.subList(from, Math.min(names.size(), from + AT_ONCE)), types, rows));
        }
        return all;
    }

    private Counts countAtOnce(List<String> names, List<CellType> types, String rows) throws SQLException {
        String counts = names.stream().map(name -> counts(name, types)).collect(Collectors.joining(", "));
        return database.one("SELECT count(*), " + counts + " FROM " + rows, row -> {
            List<Long> cells = new ArrayList<>();
            List<Map<CellType, Long>> fitting = new ArrayList<>();
            int next = 2;
            for (int j = 0; j < names.size(); j++) {
                cells.add(row.getLong(next++));
                Map<CellType, Long> fits = new EnumMap<>(CellType.class);
                for (CellType type : types) {
                    fits.put(type, row.getLong(next++));
                }
                fitting.add(fits);
            }
            return new Counts(row.getLong(1), cells, fitting);
        });
    }

    private String counts(String name, List<CellType> types) {
        return "count(" + Sql.name(name) + "), " + types.stream()
                .map(type -> "count(" + rules.parsed(type, name) + ")").collect(Collectors.joining(", "));
    }

    private static boolean areNumbers(long cells, Map<CellType, Long> fitting) {
        return cells == 0 || 2 * fitting.get(CellType.DOUBLE) > cells;
    }

    private static CellType type(long cells, Map<CellType, Long> fitting) {
        if (areNumbers(cells, fitting)) {
            return cells > 0 && fitting.get(CellType.LONG).equals(fitting.get(CellType.DOUBLE)) ? CellType.LONG : CellType.DOUBLE;
        }
        for (CellType time : List.of(CellType.DATE, CellType.DATE_TIME, CellType.ZONED_DATE_TIME)) {
            if (2 * fitting.get(time) > cells) {
                return time;
            }
        }
        return fitting.get(CellType.FLAG) == cells ? CellType.FLAG : CellType.TEXT;
    }
}
