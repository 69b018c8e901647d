package org.modestead.host.bench.recording;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.modestead.host.table.TableQuery;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/**
 * A table with one row a reading: a column of texts names what another one measures, and the time stands still from name to name. A query
 * makes of it one row a time and one column a name.
 *
 * @param names column that names what is measured
 * @param value column of the readings
 * @param channels different names, in the order in which they come
 * @param kept columns that say where a reading belongs, such as run and time, in the order of the table
 */
public record LongForm(String names, String value, List<String> channels, List<String> kept) {

    /** Takes immutable copies. */
    public LongForm {
        channels = List.copyOf(channels);
        kept = List.copyOf(kept);
    }

    private static final int MOST_CHANNELS = 64;
    /** From row to row a name changes nearly always, a time once in as many rows as there are names. */
    private static final double NEARLY = 0.9;
    private static final double ONCE_A_ROUND = 1.5;

    /** Returns how a table is long; empty for one with a column a channel. */
    static Optional<LongForm> of(Table table, TableScan scan) {
        double steps = scan.rows() - 1.0;
        return scan.columns().stream().filter(facts -> facts.column().type() == CellType.TEXT && facts.missing() == 0 && facts.distinct() >= 2
                && facts.distinct() <= MOST_CHANNELS && facts.changes() > NEARLY * steps).max(Comparator.comparingInt(ColumnFacts::distinct))
                .flatMap(names -> of(table, scan, names));
    }

    private static Optional<LongForm> of(Table table, TableScan scan, ColumnFacts names) {
        double round = ONCE_A_ROUND * scan.rows() / names.distinct();
        List<ColumnFacts> slow = scan.columns().stream().filter(facts -> facts.missing() == 0 && facts.changes() <= round).toList();
        List<ColumnFacts> readings = scan.columns().stream().filter(facts -> facts.column().type().isNumber() && !slow.contains(facts) && !counts(facts)).toList();
        boolean timed = slow.stream().anyMatch(facts -> facts.column().type().isTime() && facts.changes() * ONCE_A_ROUND * names.distinct() >= scan.rows());
        return readings.size() != 1 || !timed ? Optional.empty() : Optional.of(new LongForm(names.column().name(), readings.get(0).column().name(),
                channels(table, names.column().name()), slow.stream().map(facts -> facts.column().name()).toList()));
    }

    /** Whether a column numbers the rows. */
    private static boolean counts(ColumnFacts facts) {
        return facts.whole() && facts.rises() >= facts.cells() - 1;
    }

    private static List<String> channels(Table table, String names) {
        int column = table.schema().indexOf(names).orElseThrow();
        Set<String> found = new LinkedHashSet<>();
        try (RowCursor cursor = table.open()) {
            while (cursor.next() && cursor.row() <= TableScan.MOST_ROWS) {
                found.add(cursor.text(column));
            }
        }
        return List.copyOf(found);
    }

    /** Returns the query, in which the table is called input. */
    public String sql() {
        String where = kept.stream().map(LongForm::quoted).collect(Collectors.joining(", "));
        List<String> columns = new ArrayList<>();
        channels.forEach(channel -> columns.add("max(CASE WHEN " + quoted(names) + " = '" + channel.replace("'", "''") + "' THEN " + quoted(value) + " END) AS "
                + quoted(channel)));
        return "SELECT " + Stream.concat(Stream.of(where), columns.stream()).collect(Collectors.joining(",\n  ")) + "\nFROM input GROUP BY " + where
                + "\nORDER BY " + where;
    }

    private static String quoted(String name) {
        return '"' + name.replace("\"", "\"\"") + '"';
    }

    /** Returns the table with one row a time. */
    Table wide(Table table, RunContext context) {
        Settings settings = SettingsReader.read(new TableQuery(), Map.of("sql", sql())).settings().orElseThrow();
        return (Table) new TableQuery().run(new NodeInputs(Map.of("input", table)), settings, context).outputs().get("table");
    }

    /** Returns what was done, in a sentence. */
    public String words() {
        return "Column " + names + " names what column " + value + " measures: each of its " + channels.size() + " names becomes a column.";
    }
}
