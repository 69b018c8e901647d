package org.modestead.engine.modelfile;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.Fault;
import org.modestead.engine.linalg.Complex;

/**
 * Reads the fields of one value; every other form than the one asked for is a {@link ModelFileFault} that names the place. Fields that are
 * not asked for are left alone.
 *
 * @param path place in the file, for example {@code content.operator}
 * @param fields there
 */
public record FieldsReader(String path, Stored.Fields fields) {

    /** Returns whether there is a field. */
    public boolean has(String name) {
        return fields.byName().containsKey(name);
    }

    /** Returns a text. */
    public String text(String name) {
        return get(name, Stored.Text.class, "a text").value();
    }

    /** Returns yes or no. */
    public boolean flag(String name) {
        return get(name, Stored.Flag.class, "true or false").value();
    }

    /** Returns a number; NaN and the infinities stand as texts. */
    public double number(String name) {
        return number(value(name), place(name));
    }

    /** Returns a number that may be missing. */
    public OptionalDouble optionalNumber(String name) {
        return has(name) ? OptionalDouble.of(number(name)) : OptionalDouble.empty();
    }

    /** Returns a whole number. */
    public long whole(String name) {
        return get(name, Stored.Whole.class, "a whole number").value();
    }

    /** Returns a whole number within limits. */
    public int count(String name, int least, int most) {
        return within(whole(name), least, most, place(name));
    }

    /** Returns a choice. */
    public <E extends Enum<E>> E choice(String name, Class<E> type) {
        String word = text(name);
        return Arrays.stream(type.getEnumConstants()).filter(one -> FieldsWriter.word(one).equals(word)).findFirst()
                .orElseThrow(() -> wrong(name, seen(new Stored.Text(word)), "one of "
                        + String.join(", ", Arrays.stream(type.getEnumConstants()).map(FieldsWriter::word).toList())));
    }

    /** Returns a complex number. */
    public Complex complex(String name) {
        return object(name, parts -> new Complex(parts.number("re"), parts.number("im")));
    }

    /** Returns a list of texts. */
    public List<String> texts(String name) {
        return list(name, (item, place) -> {
            if (item instanceof Stored.Text text) {
                return text.value();
            }
            throw new ModelFileFault(place, seen(item), "a text is expected there");
        });
    }

    /** Returns a list of whole numbers within limits. */
    public List<Integer> wholes(String name, int least, int most) {
        return list(name, (item, place) -> {
            if (item instanceof Stored.Whole whole) {
                return within(whole.value(), least, most, place);
            }
            throw new ModelFileFault(place, seen(item), "a whole number is expected there");
        });
    }

    /** Returns a list of numbers. */
    public List<Double> numbers(String name) {
        return list(name, FieldsReader::number);
    }

    /** Returns a value that has fields of its own. */
    public <T> T object(String name, Function<FieldsReader, T> read) {
        return made(new FieldsReader(place(name), get(name, Stored.Fields.class, "fields by name")), read);
    }

    /** Returns a value that may be missing. */
    public <T> Optional<T> optional(String name, Function<FieldsReader, T> read) {
        return has(name) ? Optional.of(object(name, read)) : Optional.empty();
    }

    /** Returns a list of values that have fields of their own. */
    public <T> List<T> objects(String name, Function<FieldsReader, T> read) {
        return list(name, (item, place) -> {
            if (item instanceof Stored.Fields own) {
                return made(new FieldsReader(place, own), read);
            }
            throw new ModelFileFault(place, seen(item), "fields by name are expected there");
        });
    }

    /** Returns a vector. */
    public double[] vector(String name) {
        return single(numbers(name, false, 0), name);
    }

    /** Returns a vector of a known length. */
    public double[] vector(String name, int length) {
        double[] out = vector(name);
        if (out.length != length) {
            throw wrong(name, out.length + " numbers", length + " numbers");
        }
        return out;
    }

    /** Returns the pieces of a vector. */
    public List<double[]> vectors(String name) {
        return numbers(name, false, 0).pieces();
    }

    /** Returns complex numbers. */
    public List<Complex> complexVector(String name) {
        return complexes(single(numbers(name, true, 0), name));
    }

    /** Returns the pieces of a vector of complex numbers. */
    public List<List<Complex>> complexVectors(String name) {
        return numbers(name, true, 0).pieces().stream().map(FieldsReader::complexes).toList();
    }

    /** Returns a matrix. */
    public DMatrixRMaj matrix(String name) {
        List<DMatrixRMaj> pieces = matrices(name);
        if (pieces.size() != 1) {
            throw wrong(name, pieces.size() + " pieces", "one piece");
        }
        return pieces.get(0);
    }

    /** Returns a matrix of a known shape. */
    public DMatrixRMaj matrix(String name, int rows, int columns) {
        DMatrixRMaj out = matrix(name);
        if (out.numRows != rows || out.numCols != columns) {
            throw wrong(name, "a matrix of " + out.numRows + " x " + out.numCols, "one of " + rows + " x " + columns);
        }
        return out;
    }

    /** Returns the pieces of a matrix. */
    public List<DMatrixRMaj> matrices(String name) {
        Stored.Numbers found = numbers(name, false, 1);
        return IntStream.range(0, found.pieces().size())
                .mapToObj(i -> DMatrixRMaj.wrap(found.rows().get(i), found.row().get(0), found.pieces().get(i))).toList();
    }

    /** Returns a complex matrix of a known shape. */
    public ZMatrixRMaj complexMatrix(String name, int rows, int columns) {
        Stored.Numbers found = numbers(name, true, 1);
        if (found.totalRows() != rows || found.row().get(0) != columns) {
            throw wrong(name, "a matrix of " + found.totalRows() + " x " + found.row().get(0), "one of " + rows + " x " + columns);
        }
        ZMatrixRMaj out = new ZMatrixRMaj(rows, columns);
        out.data = single(found, name);
        return out;
    }

    /** Returns a matrix of whole numbers. */
    public Stored.Wholes wholeMatrix(String name) {
        return get(name, Stored.Wholes.class, "an array of whole numbers");
    }

    /** Returns a vector of whole numbers of a known length. */
    public long[] wholeVector(String name, int length) {
        Stored.Wholes found = wholeMatrix(name);
        if (found.columns() != 1 || found.values().length != length) {
            throw wrong(name, found.values().length + " numbers", length + " numbers");
        }
        return found.values();
    }

    /** Returns the fault of a field that is not as it should be. */
    public ModelFileFault wrong(String name, String seen, String wanted) {
        return new ModelFileFault(place(name), seen, wanted + " is expected there");
    }

    /** Reads a value; what its own checks refuse is a fault of the file. */
    public static <T> T made(FieldsReader own, Function<FieldsReader, T> read) {
        try {
            return read.apply(own);
        } catch (ModelFileFault fault) {
            throw fault;
        } catch (Fault | IllegalArgumentException refused) {
            throw new ModelFileFault(own.path(), String.valueOf(refused.getMessage()), "write the file again");
        }
    }

    private interface ItemForm<T> {
        T read(Stored item, String place);
    }

    private <T> List<T> list(String name, ItemForm<T> form) {
        List<Stored> items = get(name, Stored.Items.class, "a list").items();
        List<T> out = new ArrayList<>(items.size());
        for (int i = 0; i < items.size(); i++) {
            out.add(form.read(items.get(i), place(name) + "[" + i + "]"));
        }
        return out;
    }

    private Stored.Numbers numbers(String name, boolean complex, int rowDimensions) {
        Stored.Numbers found = get(name, Stored.Numbers.class, "an array");
        if (found.complex() != complex || found.row().size() != rowDimensions) {
            throw wrong(name, "an array of " + (1 + found.row().size()) + " dimensions" + (found.complex() ? ", complex" : ""),
                    "one of " + (1 + rowDimensions) + (complex ? ", complex" : ""));
        }
        return found;
    }

    private double[] single(Stored.Numbers found, String name) {
        if (found.pieces().size() != 1) {
            throw wrong(name, found.pieces().size() + " pieces", "one piece");
        }
        return found.pieces().get(0);
    }

    private static List<Complex> complexes(double[] pairs) {
        return IntStream.range(0, pairs.length / 2).mapToObj(i -> new Complex(pairs[2 * i], pairs[2 * i + 1])).toList();
    }

    private <T extends Stored> T get(String name, Class<T> type, String wanted) {
        Stored found = value(name);
        if (!type.isInstance(found)) {
            throw wrong(name, seen(found), wanted);
        }
        return type.cast(found);
    }

    private Stored value(String name) {
        Stored found = fields.byName().get(name);
        if (found == null) {
            throw new ModelFileFault(path, "the field " + name + " is missing", "the file must be whole and of a version that is known here");
        }
        return found;
    }

    private String place(String name) {
        return path + "." + name;
    }

    private static int within(long value, int least, int most, String place) {
        if (value < least || value > most) {
            throw new ModelFileFault(place, "the number " + value, "a whole number from " + least + " to " + most + " is expected there");
        }
        return (int) value;
    }

    private static double number(Stored found, String place) {
        if (found instanceof Stored.Number number) {
            return number.value();
        }
        if (found instanceof Stored.Whole whole) {
            return whole.value();
        }
        if (found instanceof Stored.Text text) {
            switch (text.value()) {
                case "NaN" -> {
                    return Double.NaN;
                }
                case "Infinity" -> {
                    return Double.POSITIVE_INFINITY;
                }
                case "-Infinity" -> {
                    return Double.NEGATIVE_INFINITY;
                }
                default -> throw new ModelFileFault(place, seen(found), "a number is expected there");
            }
        }
        throw new ModelFileFault(place, seen(found), "a number is expected there");
    }

    private static String seen(Stored found) {
        if (found instanceof Stored.Text text) {
            return "the text \"" + (text.value().length() <= 40 ? text.value() : text.value().substring(0, 40) + "...") + "\"";
        }
        if (found instanceof Stored.Whole whole) {
            return "the number " + whole.value();
        }
        if (found instanceof Stored.Number number) {
            return "the number " + number.value();
        }
        return found instanceof Stored.Flag flag ? Boolean.toString(flag.value()) : found instanceof Stored.Items ? "a list"
                : found instanceof Stored.Fields ? "fields by name" : "an array";
    }
}
