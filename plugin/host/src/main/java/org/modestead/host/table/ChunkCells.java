package org.modestead.host.table;

import java.util.Optional;
import java.util.Set;
import org.duckdb.DuckDBReadableVector;
import org.modestead.nodes.table.CellType;

/** The cells of one column in one chunk of rows, copied out of DuckDB's memory. */
sealed interface ChunkCells {

    /** The types that can be copied. */
    Set<CellType> TYPES = Set.of(CellType.DOUBLE, CellType.LONG, CellType.TEXT, CellType.FLAG, CellType.DATE, CellType.DATE_TIME);

    /** Returns the number, NaN where missing. */
    double number(int row);

    /** Returns the cell, empty where missing. */
    Optional<Object> cell(int row);

    /**
     * Copies a column.
     *
     * @param type of the column, one of {@link #TYPES}
     * @param rows how many of the first are wanted
     */
    static ChunkCells of(DuckDBReadableVector vector, CellType type, int rows) {
        return switch (type) {
            case DOUBLE -> Numbers.of(vector, rows);
            case LONG -> Wholes.of(vector, rows);
            default -> Others.of(vector, type, rows);
        };
    }

    /** @param values NaN where missing */
    record Numbers(double[] values) implements ChunkCells {

        static Numbers of(DuckDBReadableVector vector, int rows) {
            double[] values = new double[rows];
            for (int i = 0; i < rows; i++) {
                values[i] = vector.getDouble(i, Double.NaN);
            }
            return new Numbers(values);
        }

        @Override
        public double number(int row) {
            return values[row];
        }

        @Override
        public Optional<Object> cell(int row) {
            return Double.isNaN(values[row]) ? Optional.empty() : Optional.of(values[row]);
        }
    }

    /** @param missing which there are not */
    record Wholes(long[] values, boolean[] missing) implements ChunkCells {

        static Wholes of(DuckDBReadableVector vector, int rows) {
            long[] values = new long[rows];
            boolean[] missing = new boolean[rows];
            for (int i = 0; i < rows; i++) {
                missing[i] = vector.isNull(i);
                values[i] = vector.getLong(i, 0);
            }
            return new Wholes(values, missing);
        }

        @Override
        public double number(int row) {
            return missing[row] ? Double.NaN : values[row];
        }

        @Override
        public Optional<Object> cell(int row) {
            return missing[row] ? Optional.empty() : Optional.of(values[row]);
        }
    }

    /** @param values null where missing; not handed out */
    record Others(Object[] values) implements ChunkCells {

        static Others of(DuckDBReadableVector vector, CellType type, int rows) {
            Object[] values = new Object[rows];
            for (int i = 0; i < rows; i++) {
                values[i] = vector.isNull(i) ? null : value(vector, type, i);
            }
            return new Others(values);
        }

        private static Object value(DuckDBReadableVector vector, CellType type, int row) {
            return switch (type) {
                case TEXT -> vector.getString(row);
                case FLAG -> vector.getBoolean(row);
                case DATE -> vector.getLocalDate(row);
                case DATE_TIME -> vector.getLocalDateTime(row);
                default -> throw new IllegalArgumentException("no cells of type " + type);
            };
        }

        @Override
        public double number(int row) {
            throw new IllegalStateException("not a column of numbers");
        }

        @Override
        public Optional<Object> cell(int row) {
            return Optional.ofNullable(values[row]);
        }
    }
}
