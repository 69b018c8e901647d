package org.modestead.nodes.table;

import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * A cell that holds a list.
 *
 * @param entries in order, each of the Java type that {@link CellType#entries()} names; an empty one is missing
 */
public record ListCell(List<Optional<Object>> entries) {

    /** Takes an immutable copy. */
    public ListCell {
        entries = List.copyOf(entries);
    }

    /** A list without missing entries. */
    public static ListCell of(Object... entries) {
        return new ListCell(List.of(entries).stream().map(Optional::of).toList());
    }

    /** Returns a list of numbers as such; NaN where an entry is missing. */
    public double[] numbers() {
        return entries.stream().mapToDouble(entry -> entry.map(number -> ((Number) number).doubleValue()).orElse(Double.NaN)).toArray();
    }

    /** Returns whether every entry that is there has a type. */
    boolean holds(CellType type) {
        return entries.stream().allMatch(entry -> entry.isEmpty() || ColumnStore.fits(type, entry.get()));
    }

    /** Returns the entries in brackets, such as {@code [1.5, , 2.0]}; a missing one is empty. */
    @Override
    public String toString() {
        return entries.stream().map(entry -> entry.map(Object::toString).orElse("")).collect(Collectors.joining(", ", "[", "]"));
    }
}
