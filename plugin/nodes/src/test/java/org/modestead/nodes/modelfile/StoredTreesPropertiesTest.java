package org.modestead.nodes.modelfile;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import org.modestead.engine.modelfile.FieldsReader;
import org.modestead.engine.modelfile.Stored;

/** Any tree comes back as it was: every text, every bit of every number, every shape, empty ones included. */
class StoredTreesPropertiesTest {

    private static final String[] TEXTS = {"", "x", "Prüfstand", "\u0000\u001f\"\\/", "\ud83d\ude00", "\ud83d", "\udc00 alone", "NaN", "a\r\nb", "\u2028"};

    @Property(tries = 300, seed = "20261201")
    void anyTreeComesBack(@ForAll long seed) throws IOException {
        Stored.Fields tree = fields(new Random(seed), 4);
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        ModelFile.write("any", tree, out);
        Stored.Fields back = ModelFile.read("any", new ByteArrayInputStream(out.toByteArray()), FieldsReader::fields);
        assertSame(tree, back);
        ByteArrayOutputStream again = new ByteArrayOutputStream();
        ModelFile.write("any", back, again);
        assertArrayEquals(out.toByteArray(), again.toByteArray());
    }

    private static Stored.Fields fields(Random random, int depth) {
        Map<String, Stored> out = new LinkedHashMap<>();
        for (int i = random.nextInt(6); i >= 0; i--) {
            out.put("f" + i, any(random, depth - 1));
        }
        return new Stored.Fields(out);
    }

    private static Stored any(Random random, int depth) {
        return switch (random.nextInt(depth > 0 ? 9 : 7)) {
            case 0 -> new Stored.Text(TEXTS[random.nextInt(TEXTS.length)]);
            case 1 -> new Stored.Flag(random.nextBoolean());
            case 2 -> new Stored.Whole(random.nextInt(4) == 0 ? random.nextLong() : random.nextInt(100));
            case 3, 4 -> new Stored.Number(number(random));
            case 5 -> numbers(random);
            case 6 -> new Stored.Wholes(1 + random.nextInt(3), random.longs(6 * (long) random.nextInt(4)).toArray());
            case 7 -> new Stored.Items(new ArrayList<>(List.of(any(random, depth - 1), any(random, depth - 1))).subList(0, random.nextInt(3)));
            default -> fields(random, depth);
        };
    }

    /** Numbers of all sizes, infinite ones included; NaN is one number in JSON. */
    private static double number(Random random) {
        double[] odd = {0.0, -0.0, Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY, Double.MIN_VALUE, Double.MAX_VALUE, 2e-3, 1e23, 0.1};
        double any = Double.longBitsToDouble(random.nextLong());
        return random.nextBoolean() ? odd[random.nextInt(odd.length)] : Double.isNaN(any) ? 1 : any;
    }

    private static Stored.Numbers numbers(Random random) {
        boolean complex = random.nextBoolean();
        List<Integer> row = random.nextBoolean() ? List.of() : List.of(random.nextInt(4));
        int width = (complex ? 2 : 1) * row.stream().reduce(1, (a, b) -> a * b);
        List<Integer> rows = new ArrayList<>();
        List<double[]> pieces = new ArrayList<>();
        for (int i = random.nextInt(4); i > 0; i--) {
            rows.add(random.nextInt(5) * random.nextInt(4));
            pieces.add(random.longs((long) width * rows.get(rows.size() - 1)).mapToDouble(Double::longBitsToDouble).toArray());
        }
        return new Stored.Numbers(complex, row, rows, pieces);
    }

    private static void assertSame(Stored a, Stored b) {
        if (a instanceof Stored.Fields fields) {
            assertEquals(new ArrayList<>(fields.byName().keySet()), new ArrayList<>(((Stored.Fields) b).byName().keySet()));
            fields.byName().forEach((name, value) -> assertSame(value, ((Stored.Fields) b).byName().get(name)));
        } else if (a instanceof Stored.Items items) {
            assertEquals(items.items().size(), ((Stored.Items) b).items().size());
            for (int i = 0; i < items.items().size(); i++) {
                assertSame(items.items().get(i), ((Stored.Items) b).items().get(i));
            }
        } else if (a instanceof Stored.Numbers numbers) {
            Stored.Numbers other = (Stored.Numbers) b;
            assertEquals(List.of(numbers.complex(), numbers.row(), numbers.rows()), List.of(other.complex(), other.row(), other.rows()));
            for (int i = 0; i < numbers.pieces().size(); i++) {
                assertArrayEquals(bits(numbers.pieces().get(i)), bits(other.pieces().get(i)));
            }
        } else if (a instanceof Stored.Wholes wholes) {
            assertEquals(wholes.columns(), ((Stored.Wholes) b).columns());
            assertArrayEquals(wholes.values(), ((Stored.Wholes) b).values());
        } else if (a instanceof Stored.Number number && !Double.isFinite(number.value())) {
            assertEquals(new Stored.Text(Double.toString(number.value())), b);
        } else {
            assertEquals(a, b);
        }
    }

    private static long[] bits(double[] numbers) {
        return Arrays.stream(numbers).mapToLong(Double::doubleToRawLongBits).toArray();
    }
}
