package org.modestead.nodes.table;

import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.ZonedDateTime;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.List;
import java.util.Optional;

/** The cells of one column of a {@link MemoryTable}. */
sealed interface ColumnStore {

    /** Appends a cell of the column's type or null. */
    void add(Object cell);

    /** Gives back spare memory; nothing is added afterwards. */
    void seal();

    /** Returns the cell, empty when missing. */
    Optional<Object> cell(int row);

    /** Returns the number; NaN when missing or not a number. */
    double number(int row);

    static ColumnStore of(CellType type) {
        return switch (type) {
            case DOUBLE -> new Doubles();
            case LONG -> new Longs();
            default -> new Objects();
        };
    }

    static boolean fits(CellType type, Object cell) {
        return switch (type) {
            case DOUBLE -> cell instanceof Number;
            case LONG -> cell instanceof Long || cell instanceof Integer;
            case TEXT -> cell instanceof String;
            case FLAG -> cell instanceof Boolean;
            case DATE -> cell instanceof LocalDate;
            case DATE_TIME -> cell instanceof LocalDateTime;
            case ZONED_DATE_TIME -> cell instanceof ZonedDateTime;
            case DOUBLE_LIST, LONG_LIST, TEXT_LIST, FLAG_LIST, DATE_LIST, DATE_TIME_LIST, ZONED_DATE_TIME_LIST ->
                cell instanceof ListCell list && list.holds(type.entries().orElseThrow());
        };
    }

    /** Numbers; NaN is missing. */
    final class Doubles implements ColumnStore {
        private static final int FIRST_CAPACITY = 16;
        private double[] values = new double[FIRST_CAPACITY];
        private int size;

        @Override
        public void add(Object cell) {
            values = size == values.length ? Arrays.copyOf(values, 2 * size) : values;
            values[size++] = cell == null ? Double.NaN : ((Number) cell).doubleValue();
        }

        @Override
        public void seal() {
            values = Arrays.copyOf(values, size);
        }

        @Override
        public Optional<Object> cell(int row) {
            return Double.isNaN(values[row]) ? Optional.empty() : Optional.of(values[row]);
        }

        @Override
        public double number(int row) {
            return values[row];
        }
    }

    /** Whole numbers with a mark for missing ones. */
    final class Longs implements ColumnStore {
        private static final int FIRST_CAPACITY = 16;
        private final BitSet missing = new BitSet();
        private long[] values = new long[FIRST_CAPACITY];
        private int size;

        @Override
        public void add(Object cell) {
            values = size == values.length ? Arrays.copyOf(values, 2 * size) : values;
            missing.set(size, cell == null);
            values[size++] = cell == null ? 0 : ((Number) cell).longValue();
        }

        @Override
        public void seal() {
            values = Arrays.copyOf(values, size);
        }

        @Override
        public Optional<Object> cell(int row) {
            return missing.get(row) ? Optional.empty() : Optional.of(values[row]);
        }

        @Override
        public double number(int row) {
            return missing.get(row) ? Double.NaN : values[row];
        }
    }

    /** Everything else; null is missing. */
    final class Objects implements ColumnStore {
        private final List<Object> values = new ArrayList<>();

        @Override
        public void add(Object cell) {
            values.add(cell);
        }

        @Override
        public void seal() {
            ((ArrayList<Object>) values).trimToSize();
        }

        @Override
        public Optional<Object> cell(int row) {
            return Optional.ofNullable(values.get(row));
        }

        @Override
        public double number(int row) {
            throw new IllegalStateException("the column does not hold numbers");
        }
    }
}
