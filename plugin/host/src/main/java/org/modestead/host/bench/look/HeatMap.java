package org.modestead.host.bench.look;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Objects;
import java.util.Set;
import java.util.function.Supplier;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.nodes.render.ColourMap;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/**
 * A matrix to be shown as a map of colours. Large ones are thinned: of every block of entries the one of largest size is
 * kept, with its sign, so that no peak is lost; the range is always that of all entries.
 *
 * @param id unique at its port, lower case with dashes
 * @param title one line
 * @param caption what it shows and how to read it; also the text alternative
 * @param rows what its rows are
 * @param columns what its columns are
 * @param diverging whether the sign of an entry matters: the colours then part at zero
 * @param values every entry; not modified
 */
public record HeatMap(String id, String title, String caption, Side rows, Side columns, boolean diverging, DMatrixRMaj values) {
    /** Most rows and columns that are sent to a page. */
    static final int MOST = 256;

    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    /**
     * One side of a matrix.
     *
     * @param title what is counted
     * @param labels name of each row or column; empty when they are only numbered, from 1
     * @param selections what is selected with each, for example {@code mode:3}; empty when nothing is
     */
    public record Side(String title, List<String> labels, List<String> selections) {

        /** Takes immutable copies. */
        public Side {
            labels = List.copyOf(labels);
            selections = List.copyOf(selections);
        }

        /** A side whose rows or columns are only numbered. */
        static Side numbered(String title) {
            return new Side(title, List.of(), List.of());
        }
    }

    /** Checks that labels and entries agree. */
    public HeatMap {
        Objects.requireNonNull(caption);
        fits(id, rows, values.numRows);
        fits(id, columns, values.numCols);
    }

    private static void fits(String id, Side side, int size) {
        for (List<String> names : List.of(side.labels(), side.selections())) {
            if (!names.isEmpty() && names.size() != size) {
                throw new IllegalArgumentException("matrix " + id + ": " + names.size() + " names for " + size + " " + side.title());
            }
        }
    }

    /**
     * A matrix that can be looked at, and is computed only then.
     *
     * @param id of the matrix
     * @param title of the matrix
     * @param rows how many
     * @param columns how many
     * @param map computes it
     */
    public record Offer(String id, String title, int rows, int columns, Supplier<HeatMap> map) {

        /** Returns what a list of matrices says of each. */
        public ObjectNode headline() {
            return NODES.objectNode().put("id", id).put("title", title).put("rows", rows).put("columns", columns);
        }
    }

    /** Offers a matrix that is there already. */
    Offer offer() {
        return new Offer(id, title, values.numRows, values.numCols, () -> this);
    }

    /** Returns the matrix, thinned to at most {@value #MOST} rows and columns, with the range of all its entries. */
    public ObjectNode json() {
        int everyRow = every(values.numRows);
        int everyColumn = every(values.numCols);
        int shownRows = count(values.numRows, everyRow);
        int shownColumns = count(values.numCols, everyColumn);
        ObjectNode out = offer().headline().put("caption", caption + thinned(everyRow, everyColumn)).put("shownRows", shownRows)
                .put("shownColumns", shownColumns).put("everyRow", everyRow).put("everyColumn", everyColumn).put("rowTitle", rows.title())
                .put("columnTitle", columns.title()).put("diverging", diverging);
        side(out, "row", rows, everyRow);
        side(out, "column", columns, everyColumn);
        range(out);
        ArrayNode all = out.putArray("values");
        for (int i = 0; i < shownRows; i++) {
            ArrayNode row = all.addArray();
            for (int j = 0; j < shownColumns; j++) {
                Numbers.add(row, largest(i * everyRow, everyRow, j * everyColumn, everyColumn));
            }
        }
        return out;
    }

    /** Returns the matrix to be drawn into a file, thinned as {@link #json} is. */
    public ColourMap picture() {
        int everyRow = every(values.numRows);
        int everyColumn = every(values.numCols);
        double[][] shown = new double[count(values.numRows, everyRow)][count(values.numCols, everyColumn)];
        for (int i = 0; i < shown.length; i++) {
            for (int j = 0; j < shown[i].length; j++) {
                shown[i][j] = largest(i * everyRow, everyRow, j * everyColumn, everyColumn);
            }
        }
        double[] finite = Arrays.stream(values.data, 0, values.getNumElements()).filter(Double::isFinite).toArray();
        return new ColourMap(id, title, caption + thinned(everyRow, everyColumn), side(rows, values.numRows, everyRow), side(columns, values.numCols, everyColumn),
                Arrays.stream(finite).min().orElse(Double.NaN), Arrays.stream(finite).max().orElse(Double.NaN), diverging, shown);
    }

    private static ColourMap.Side side(Side side, int size, int every) {
        return new ColourMap.Side(side.title(), IntStream.range(0, size).filter(i -> i % every == 0).mapToObj(i -> name(side, i)).toList());
    }

    private static String name(Side side, int at) {
        return side.labels().isEmpty() ? Integer.toString(at + 1) : side.labels().get(at);
    }

    /** Returns every entry as a table: one row a row, its name first. */
    public Table table() {
        List<Column> heads = new ArrayList<>(List.of(Column.text(rows.title())));
        Set<String> taken = new HashSet<>(Set.of(rows.title()));
        for (int j = 0; j < values.numCols; j++) {
            String name = name(columns, j);
            heads.add(Column.number(taken.add(name) ? name : name + " (" + (j + 1) + ")"));
        }
        MemoryTable.Builder table = MemoryTable.builder(new TableSchema(heads), id);
        for (int i = 0; i < values.numRows; i++) {
            Object[] cells = new Object[heads.size()];
            cells[0] = name(rows, i);
            for (int j = 0; j < values.numCols; j++) {
                cells[j + 1] = values.get(i, j);
            }
            table.row(cells);
        }
        return table.build();
    }

    private static String thinned(int everyRow, int everyColumn) {
        return everyRow == 1 && everyColumn == 1 ? "" : " Of every " + everyRow + " by " + everyColumn
                + " entries the largest one is shown; the range is that of all.";
    }

    private static int every(int size) {
        return Math.max(1, (size + MOST - 1) / MOST);
    }

    private static int count(int size, int every) {
        return (size + every - 1) / every;
    }

    private static void side(ObjectNode out, String name, Side side, int every) {
        out.set(name + "Labels", names(side.labels(), every));
        out.set(name + "Selections", names(side.selections(), every));
    }

    private static ArrayNode names(List<String> names, int every) {
        if (names.isEmpty()) {
            return null;
        }
        ArrayNode out = NODES.arrayNode();
        IntStream.range(0, names.size()).filter(i -> i % every == 0).forEach(i -> out.add(names.get(i)));
        return out;
    }

    private void range(ObjectNode out) {
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        for (int i = 0; i < values.getNumElements(); i++) {
            if (Double.isFinite(values.data[i])) {
                low = Math.min(low, values.data[i]);
                high = Math.max(high, values.data[i]);
            }
        }
        if (low > high) {
            out.putNull("low").putNull("high");
        } else {
            out.put("low", low).put("high", high);
        }
    }

    private double largest(int row, int height, int column, int width) {
        double best = Double.NaN;
        for (int i = row; i < Math.min(row + height, values.numRows); i++) {
            for (int j = column; j < Math.min(column + width, values.numCols); j++) {
                double value = values.unsafe_get(i, j);
                best = Double.isFinite(value) && !(Math.abs(value) <= Math.abs(best)) ? value : best;
            }
        }
        return best;
    }
}
