package org.modestead.nodes.table;

/**
 * Name and type of one column.
 *
 * @param name unique in its table
 * @param type what the cells are
 */
public record Column(String name, CellType type) {

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
