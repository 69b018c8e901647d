package org.modestead.nodes.modelfile;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.modestead.engine.modelfile.FieldsReader;
import org.modestead.engine.modelfile.Stored;

/**
 * Type and shape of an array.
 *
 * @param type of an entry
 * @param row shape of a row
 * @param pieces rows of each piece
 */
record ArrayShape(Type type, List<Integer> row, List<Integer> pieces) {

    private static final int MOST_DIMENSIONS = 4;

    /** Types of entries. */
    enum Type {
        /** 64-bit floating point. */
        REAL("<f8", 1),
        /** Two of them. */
        COMPLEX("<c16", 2),
        /** 64-bit whole numbers. */
        WHOLE("<i8", 1);

        private final String word;
        private final int numbers;

        Type(String word, int numbers) {
            this.word = word;
            this.numbers = numbers;
        }

        /** Returns the name in NPY headers. */
        String word() {
            return word;
        }

        /** Returns how many 8-byte numbers an entry is. */
        int numbers() {
            return numbers;
        }
    }

    static ArrayShape of(Stored array) {
        if (array instanceof Stored.Numbers numbers) {
            return new ArrayShape(numbers.complex() ? Type.COMPLEX : Type.REAL, numbers.row(), numbers.rows());
        }
        Stored.Wholes wholes = (Stored.Wholes) array;
        return new ArrayShape(Type.WHOLE, wholes.columns() == 1 ? List.of() : List.of(wholes.columns()),
                List.of(wholes.values().length / wholes.columns()));
    }

    static ArrayShape read(FieldsReader in) {
        String word = in.text("dtype");
        Type type = Stream.of(Type.values()).filter(one -> one.word().equals(word)).findFirst()
                .orElseThrow(() -> in.wrong("dtype", "the type " + ModelFile.shortened(word), "<f8, <c16 or <i8"));
        List<Integer> shape = in.wholes("shape", 0, Integer.MAX_VALUE - 8);
        if (shape.isEmpty() || shape.size() > MOST_DIMENSIONS) {
            throw in.wrong("shape", shape.size() + " dimensions", "one to " + MOST_DIMENSIONS);
        }
        List<Integer> pieces = in.has("pieces") ? in.wholes("pieces", 0, Integer.MAX_VALUE - 8) : shape.subList(0, 1);
        ArrayShape out = new ArrayShape(type, shape.subList(1, shape.size()), pieces);
        if (out.rows() != shape.get(0)) {
            throw in.wrong("pieces", out.rows() + " rows", shape.get(0) + " rows");
        }
        if (type == Type.WHOLE && (pieces.size() != 1 || shape.size() > 2 || out.row().contains(0))) {
            throw in.wrong("shape", shape + " in " + pieces.size() + " pieces", "one piece of one or two dimensions");
        }
        for (int rows : pieces) {
            if (out.numbers(rows) > Integer.MAX_VALUE - 8) {
                throw in.wrong("shape", rows + " rows of " + out.row(), "a piece of at most 2147483639 numbers");
            }
        }
        return out;
    }

    /** Returns the number of rows of all pieces. */
    long rows() {
        return pieces.stream().mapToLong(Integer::longValue).sum();
    }

    /** Returns how many 8-byte numbers some rows are; more than any array where that is past counting. */
    double numbers(double rows) {
        return row.stream().mapToDouble(Integer::doubleValue).reduce(rows * type.numbers(), (a, b) -> a * b);
    }

    /** Returns the shape with the rows first. */
    List<Long> dimensions() {
        List<Long> out = new ArrayList<>(List.of(rows()));
        row.forEach(size -> out.add(size.longValue()));
        return out;
    }
}
