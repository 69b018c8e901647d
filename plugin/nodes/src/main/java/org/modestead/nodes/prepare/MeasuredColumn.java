package org.modestead.nodes.prepare;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.IntStream;
import org.modestead.engine.recording.Channel;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.words.NameWithUnit;

/**
 * A column of the table and the names of the channels it gives: one, or one an entry where it holds lists.
 *
 * <p>Entries are called as the table calls them. Where it does not say, or where another column has such a name already, they have
 * the name of their column and their number: {@code accel [m/s2]} gives {@code accel 1 [m/s2]}, {@code accel 2 [m/s2]} and so on.
 *
 * @param column its name in the table
 * @param names as columns of single numbers would have them, with units in brackets
 */
record MeasuredColumn(String column, List<String> names) {

    /** Takes an immutable copy. */
    MeasuredColumn {
        names = List.copyOf(names);
    }

    /**
     * Returns the channels of a column of the table.
     *
     * @param column of single numbers, or of lists
     * @param width entries of each list; without meaning for single numbers
     * @param schema of its table
     */
    static MeasuredColumn of(Column column, int width, TableSchema schema) {
        if (column.type().entries().isEmpty()) {
            return new MeasuredColumn(column.name(), List.of(column.name()));
        }
        Set<String> taken = new HashSet<>(schema.names());
        schema.columns().stream().filter(other -> !other.equals(column)).forEach(other -> taken.addAll(other.entries()));
        boolean told = column.entries().size() == width && new HashSet<>(column.entries()).size() == width
                && column.entries().stream().noneMatch(entry -> entry.isBlank() || taken.contains(entry));
        List<String> numbered = numbered(column.name(), " ", width);
        return new MeasuredColumn(column.name(), told ? column.entries()
                : numbered.stream().anyMatch(taken::contains) ? numbered(column.name(), " entry ", width) : numbered);
    }

    private static List<String> numbered(String column, String between, int width) {
        String unit = bracketed(column).map(found -> " [" + found + "]").orElse("");
        return IntStream.rangeClosed(1, width).mapToObj(i -> base(column) + between + i + unit).toList();
    }

    /**
     * Returns name and unit of all channels of some columns. Where dropping the unit from the names would make two of them equal, the
     * names stay as they are in the table.
     *
     * @param columns in order
     * @param units by name of a column, of a channel, or of either without its unit; others are read from {@code name [unit]}
     */
    static List<Channel> channels(List<MeasuredColumn> columns, Map<String, String> units) {
        List<Channel> whole = new ArrayList<>();
        for (MeasuredColumn column : columns) {
            column.names.forEach(name -> whole.add(new Channel(name, column.unit(name, units))));
        }
        boolean unique = whole.stream().map(channel -> base(channel.name())).distinct().count() == whole.size();
        return unique ? whole.stream().map(channel -> new Channel(base(channel.name()), channel.unit())).toList() : whole;
    }

    private String unit(String name, Map<String, String> units) {
        for (String asked : List.of(name, base(name), column, base(column))) {
            if (units.containsKey(asked)) {
                return units.get(asked);
            }
        }
        return bracketed(name).or(() -> bracketed(column)).orElse("");
    }

    /** Returns a name without the unit in brackets at its end. */
    static String base(String name) {
        return NameWithUnit.of(name).name();
    }

    private static Optional<String> bracketed(String name) {
        return NameWithUnit.of(name).unit();
    }
}
