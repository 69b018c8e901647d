package org.modestead.engine.modelfile;

import java.io.Serializable;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/**
 * A value as a tree: texts, numbers, lists, fields by name, and arrays at the leaves. Arrays are those of the value itself, not copies. Serialisable,
 * so that a value can travel as its tree between machines of one job; a file has another form.
 */
public sealed interface Stored extends Serializable {

    /** A text. */
    record Text(String value) implements Stored {
        /** Checks that it is there. */
        public Text {
            Objects.requireNonNull(value);
        }
    }

    /** Yes or no. */
    record Flag(boolean value) implements Stored {}

    /** A whole number. */
    record Whole(long value) implements Stored {}

    /** A number, which may be NaN or infinite. */
    record Number(double value) implements Stored {}

    /** A list. */
    record Items(List<Stored> items) implements Stored {
        /** Takes an immutable copy. */
        public Items {
            items = List.copyOf(items);
        }
    }

    /** Fields by name, in the order in which they are written. */
    record Fields(Map<String, Stored> byName) implements Stored {
        /** Takes an immutable copy. */
        public Fields {
            byName = Collections.unmodifiableMap(new LinkedHashMap<>(byName));
        }
    }

    /**
     * An array of real or complex numbers in rows. It may be held in several pieces, each of whole rows, as runs are; a file holds them
     * one after the other.
     *
     * @param complex whether each entry is two numbers, real part first
     * @param row shape of a row: empty for a vector, its number of columns for a matrix
     * @param rows of each piece
     * @param pieces in row order, each of its rows times the entries of a row (times two where complex)
     */
    record Numbers(boolean complex, List<Integer> row, List<Integer> rows, List<double[]> pieces) implements Stored {
        /** Takes immutable copies and checks the sizes. */
        public Numbers {
            row = List.copyOf(row);
            rows = List.copyOf(rows);
            pieces = List.copyOf(pieces);
            long width = width(complex, row);
            if (rows.size() != pieces.size()) {
                throw new IllegalArgumentException(pieces.size() + " pieces with rows for " + rows.size());
            }
            for (int i = 0; i < rows.size(); i++) {
                if (pieces.get(i).length != rows.get(i) * width) {
                    throw new IllegalArgumentException("a piece of " + pieces.get(i).length + " numbers, not " + rows.get(i) + " x " + width);
                }
            }
        }

        /** Returns how many numbers a row has, parts of complex ones counted apart. */
        static long width(boolean complex, List<Integer> row) {
            return row.stream().mapToLong(Integer::longValue).reduce(complex ? 2 : 1, Math::multiplyExact);
        }

        /** Returns the number of rows of all pieces. */
        public long totalRows() {
            return rows.stream().mapToLong(Integer::longValue).sum();
        }
    }

    /**
     * A matrix of whole numbers.
     *
     * @param columns of each row
     * @param values row after row
     */
    record Wholes(int columns, long[] values) implements Stored {
        /** Checks the size. */
        public Wholes {
            if (columns < 1 || values.length % columns != 0) {
                throw new IllegalArgumentException(values.length + " numbers in rows of " + columns);
            }
        }
    }
}
