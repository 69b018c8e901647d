package org.modestead.nodes.table;

import java.util.List;

/**
 * Name and type of one column.
 *
 * @param name unique in its table
 * @param type what the cells are
 * @param entries names of the entries of a column of lists, where the table tells them; empty otherwise
 */
public record Column(String name, CellType type, List<String> entries) {

    /** Takes an immutable copy. */
    public Column {
        entries = List.copyOf(entries);
    }

    /** A column whose entries, if it holds lists, have no names. */
    public Column(String name, CellType type) {
        this(name, type, List.of());
    }

    /** A column of numbers. */
    public static Column number(String name) {
        return new Column(name, CellType.DOUBLE);
    }

    /** A column of whole numbers. */
    public static Column whole(String name) {
        return new Column(name, CellType.LONG);
    }

    /** A column of texts. */
    public static Column text(String name) {
        return new Column(name, CellType.TEXT);
    }

    /** A column of true or false. */
    public static Column flag(String name) {
        return new Column(name, CellType.FLAG);
    }
}
