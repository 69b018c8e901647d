package org.modestead.engine.modelfile;

import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Complex;

/** Collects the fields of one value, in order. */
public final class FieldsWriter {

    private final Map<String, Stored> fields = new LinkedHashMap<>();

    /** Adds anything. */
    public FieldsWriter put(String name, Stored value) {
        if (fields.put(name, value) != null) {
            throw new IllegalArgumentException("two fields " + name);
        }
        return this;
    }

    /** Adds what may not be there; nothing is written then. */
    public <T> FieldsWriter put(String name, Optional<T> value, Function<T, ? extends Stored> form) {
        value.ifPresent(there -> put(name, form.apply(there)));
        return this;
    }

    /** Adds a text. */
    public FieldsWriter text(String name, String value) {
        return put(name, new Stored.Text(value));
    }

    /** Adds a number. */
    public FieldsWriter number(String name, double value) {
        return put(name, new Stored.Number(value));
    }

    /** Adds a whole number. */
    public FieldsWriter whole(String name, long value) {
        return put(name, new Stored.Whole(value));
    }

    /** Adds yes or no. */
    public FieldsWriter flag(String name, boolean value) {
        return put(name, new Stored.Flag(value));
    }

    /** Adds one of a few choices, by its name in lower case with dashes. */
    public FieldsWriter choice(String name, Enum<?> value) {
        return text(name, word(value));
    }

    /** Adds a complex number as fields {@code re} and {@code im}. */
    public FieldsWriter complex(String name, Complex value) {
        return put(name, new FieldsWriter().number("re", value.re()).number("im", value.im()).done());
    }

    /** Adds a list of texts. */
    public FieldsWriter texts(String name, List<String> values) {
        return list(name, values, Stored.Text::new);
    }

    /** Adds a list. */
    public <T> FieldsWriter list(String name, List<T> values, Function<T, ? extends Stored> form) {
        return put(name, new Stored.Items(values.stream().<Stored>map(form).toList()));
    }

    /** Adds a list of whole numbers. */
    public FieldsWriter wholes(String name, List<Integer> values) {
        return list(name, values, value -> new Stored.Whole(value));
    }

    /** Adds a vector; the array itself is kept. */
    public FieldsWriter vector(String name, double[] values) {
        return put(name, new Stored.Numbers(false, List.of(), List.of(values.length), List.of(values)));
    }

    /** Adds vectors that a file holds one after the other. */
    public FieldsWriter vectors(String name, List<double[]> pieces) {
        return put(name, new Stored.Numbers(false, List.of(), pieces.stream().map(piece -> piece.length).toList(), pieces));
    }

    /** Adds complex numbers. */
    public FieldsWriter complexVector(String name, List<Complex> values) {
        double[] pairs = new double[2 * values.size()];
        for (int i = 0; i < values.size(); i++) {
            pairs[2 * i] = values.get(i).re();
            pairs[2 * i + 1] = values.get(i).im();
        }
        return put(name, new Stored.Numbers(true, List.of(), List.of(values.size()), List.of(pairs)));
    }

    /** Adds a matrix; its numbers are kept, not copied. */
    public FieldsWriter matrix(String name, DMatrixRMaj a) {
        return matrices(name, a.numCols, List.of(a));
    }

    /** Adds matrices of as many columns that a file holds one below the other. */
    public FieldsWriter matrices(String name, int columns, List<DMatrixRMaj> pieces) {
        return put(name, new Stored.Numbers(false, List.of(columns), pieces.stream().map(a -> a.numRows).toList(),
                pieces.stream().map(a -> exactly(a.data, a.numRows * a.numCols)).toList()));
    }

    /** Adds a complex matrix; its numbers are kept, not copied. */
    public FieldsWriter complexMatrix(String name, ZMatrixRMaj a) {
        return put(name, new Stored.Numbers(true, List.of(a.numCols), List.of(a.numRows), List.of(exactly(a.data, 2 * a.numRows * a.numCols))));
    }

    /** A matrix that was reshaped to fewer entries keeps its longer array. */
    private static double[] exactly(double[] data, int length) {
        return data.length == length ? data : Arrays.copyOf(data, length);
    }

    /** Returns the word of a choice in a file. */
    static String word(Enum<?> value) {
        return value.name().toLowerCase(Locale.ROOT).replace('_', '-');
    }

    /** Returns the fields. */
    public Stored.Fields done() {
        return new Stored.Fields(fields);
    }
}
