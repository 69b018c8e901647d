package org.modestead.nodes.modelfile;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.nodes.contract.PortType;

/** Whatever happens to a file: it is read, or refused with the one fault. */
class MutatedFilesPropertiesTest {

    private static final List<PortType> TYPES = new ArrayList<>();
    private static final List<byte[]> FILES = new ArrayList<>();

    static {
        for (StoredFits fit : List.of(StoredFits.TOTAL_LEAST_SQUARES, StoredFits.GENERATOR, StoredFits.DRIVEN_DICTIONARY, StoredFits.EXTRAPOLATED)) {
            TYPES.add(PortType.OPERATOR);
            FILES.add(PortFilesTest.written(PortType.OPERATOR, fit.operator(fit.snapshots()).outputs().get("operator")));
        }
        TYPES.add(PortType.SNAPSHOTS);
        FILES.add(PortFilesTest.written(PortType.SNAPSHOTS, StoredFits.DRIVEN.snapshots()));
    }

    private static final String[] WORDS = {"0", "-1", "1", "2147483647", "9223372036854775807", "1e308", "-0.0", "\"NaN\"", "\"\"", "\"linear\"",
        "true", "null", "[]", "{}", "[ 0 ]", "[ -1 ]", "[ 2147483639 ]", "[ 1, 2 ]", "{ \"npy\" : 1 }", "\"<f8\"", "\"<c16\"", "\"<i8\"",
        "\"\\ud800\"", "\"generator\"", "\"monomials\""};

    /** Bytes anywhere: mostly seen by the zip reader. */
    @Property(tries = 300, seed = "20261201")
    void changedBytes(@ForAll @IntRange(min = 0, max = 4) int file, @ForAll long seed) throws IOException {
        Random random = new Random(seed);
        byte[] bytes = FILES.get(file).clone();
        for (int k = random.nextInt(6); k >= 0; k--) {
            int at = random.nextInt(3) == 0 ? random.nextInt(bytes.length) : random.nextInt(Math.min(bytes.length, 2000));
            bytes[at] = (byte) (random.nextBoolean() ? random.nextInt(256) : bytes[at] ^ 1 << random.nextInt(8));
        }
        readOrRefused(TYPES.get(file), bytes);
    }

    /** Words of the index exchanged, under right checksums of the zip: seen by every reader of a field. */
    @Property(tries = 600, seed = "20261201")
    void changedWords(@ForAll @IntRange(min = 0, max = 4) int file, @ForAll long seed) throws IOException {
        Random random = new Random(seed);
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        try (ZipInputStream in = new ZipInputStream(new ByteArrayInputStream(FILES.get(file))); ZipOutputStream zip = new ZipOutputStream(out)) {
            for (ZipEntry entry = in.getNextEntry(); entry != null; entry = in.getNextEntry()) {
                byte[] content = in.readAllBytes();
                zip.putNextEntry(new ZipEntry(entry.getName()));
                zip.write(entry.getName().equals("model.json") ? changed(content, random) : content);
            }
        }
        readOrRefused(TYPES.get(file), out.toByteArray());
    }

    private static byte[] changed(byte[] index, Random random) {
        String[] lines = new String(index, StandardCharsets.US_ASCII).split("\n");
        for (int k = random.nextInt(3); k >= 0; k--) {
            int at = random.nextInt(lines.length);
            int colon = lines[at].indexOf(" : ");
            if (colon > 0 && !lines[at].endsWith("{") && !lines[at].endsWith("[")) {
                boolean comma = lines[at].endsWith(",");
                String word = random.nextInt(4) > 0 ? WORDS[random.nextInt(WORDS.length)] : value(lines[random.nextInt(lines.length)]);
                lines[at] = lines[at].substring(0, colon + 3) + word + (comma ? "," : "");
            } else if (random.nextInt(4) == 0) {
                lines[at] = "";
            }
        }
        return String.join("\n", lines).getBytes(StandardCharsets.US_ASCII);
    }

    private static String value(String line) {
        int colon = line.indexOf(" : ");
        String value = colon < 0 ? "0" : line.substring(colon + 3);
        return value.endsWith(",") ? value.substring(0, value.length() - 1) : value;
    }

    private static void readOrRefused(PortType type, byte[] bytes) throws IOException {
        try {
            PortFiles.read(type, new ByteArrayInputStream(bytes));
        } catch (ModelFileFault refused) {
            if (refused.getMessage().isBlank()) {
                throw new AssertionError("a refusal without a sentence");
            }
        }
    }
}
