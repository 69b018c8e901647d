package org.modestead.spark;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.json.JsonWriteFeature;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.time.LocalDateTime;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.zip.CRC32;
import java.util.zip.ZipEntry;
import java.util.zip.ZipOutputStream;
import org.modestead.engine.modelfile.Stored;
import org.modestead.engine.modelfile.StoredMoments;
import org.modestead.engine.moments.Moments;

/**
 * Writes sums in the open form of model files (see DEVELOPERS.md): a zip of {@code model.json} and NPY arrays. Only what a file of moments holds:
 * real and whole numbers. The job knows nothing of the nodes, so it writes by itself what they read; the tests read it with them.
 */
final class MomentsFile {

    private static final byte[] MAGIC = {(byte) 0x93, 'N', 'U', 'M', 'P', 'Y', 1, 0};
    private static final int ALIGNMENT = 64;

    private MomentsFile() {}

    static void write(Moments moments, OutputStream out) throws IOException {
        Map<String, byte[]> arrays = new LinkedHashMap<>();
        Stored.Fields content = (Stored.Fields) referring(StoredMoments.of(moments), "content", arrays);
        Map<String, Stored> file = new LinkedHashMap<>();
        file.put("format", new Stored.Text("modestead-model"));
        file.put("version", new Stored.Whole(1));
        file.put("kind", new Stored.Text("moments"));
        file.put("written_by", new Stored.Text("Modestead for Apache Spark " + Optional.ofNullable(MomentsFile.class.getPackage()
                .getImplementationVersion()).orElse("development build")));
        file.put("content", content);
        ZipOutputStream zip = new ZipOutputStream(out);
        entry(zip, "model.json", json(new Stored.Fields(file)));
        for (Map.Entry<String, byte[]> array : arrays.entrySet()) {
            entry(zip, array.getKey(), array.getValue());
        }
        zip.finish();
    }

    private static void entry(ZipOutputStream zip, String name, byte[] bytes) throws IOException {
        CRC32 crc = new CRC32();
        crc.update(bytes);
        ZipEntry entry = new ZipEntry(name);
        entry.setMethod(ZipEntry.STORED);
        entry.setSize(bytes.length);
        entry.setCrc(crc.getValue());
        entry.setTimeLocal(LocalDateTime.of(1980, 2, 1, 0, 0));
        zip.putNextEntry(entry);
        zip.write(bytes);
    }

    /** The tree with references in the places of arrays. */
    private static Stored referring(Stored tree, String path, Map<String, byte[]> arrays) {
        if (tree instanceof Stored.Fields fields) {
            Map<String, Stored> out = new LinkedHashMap<>();
            fields.byName().forEach((name, value) -> out.put(name, referring(value, path + "/" + name, arrays)));
            return new Stored.Fields(out);
        }
        if (tree instanceof Stored.Items list) {
            List<Stored> out = new ArrayList<>();
            list.items().forEach(item -> out.add(referring(item, path + "/" + out.size(), arrays)));
            return new Stored.Items(out);
        }
        if (tree instanceof Stored.Numbers numbers) {
            List<Long> shape = new ArrayList<>(List.of(numbers.totalRows()));
            numbers.row().forEach(size -> shape.add(size.longValue()));
            int length = numbers.pieces().stream().mapToInt(piece -> piece.length).sum();
            ByteBuffer bytes = npy("<f8", shape, length);
            numbers.pieces().forEach(piece -> put(bytes, piece));
            return reference(path + ".npy", "<f8", shape, numbers.rows(), bytes.array(), arrays);
        }
        if (tree instanceof Stored.Wholes wholes) {
            List<Long> shape = new ArrayList<>(List.of((long) wholes.values().length / wholes.columns()));
            if (wholes.columns() > 1) {
                shape.add((long) wholes.columns());
            }
            ByteBuffer bytes = npy("<i8", shape, wholes.values().length);
            for (long value : wholes.values()) {
                bytes.putLong(value);
            }
            return reference(path + ".npy", "<i8", shape, List.of(shape.get(0).intValue()), bytes.array(), arrays);
        }
        return tree;
    }

    private static void put(ByteBuffer bytes, double[] piece) {
        for (double value : piece) {
            bytes.putDouble(value);
        }
    }

    private static Stored reference(String entry, String type, List<Long> shape, List<Integer> pieces, byte[] bytes, Map<String, byte[]> arrays) {
        arrays.put(entry, bytes);
        Map<String, Stored> out = new LinkedHashMap<>();
        out.put("npy", new Stored.Text(entry));
        out.put("dtype", new Stored.Text(type));
        out.put("shape", new Stored.Items(shape.stream().<Stored>map(Stored.Whole::new).toList()));
        if (pieces.size() != 1) {
            out.put("pieces", new Stored.Items(pieces.stream().<Stored>map(rows -> new Stored.Whole(rows)).toList()));
        }
        out.put("sha256", new Stored.Text(sha256(bytes)));
        return new Stored.Fields(out);
    }

    /** Returns the start of an NPY file, with room for its numbers. */
    private static ByteBuffer npy(String type, List<Long> shape, int numbers) {
        String header = "{'descr': '" + type + "', 'fortran_order': False, 'shape': (" + shape.stream().map(String::valueOf)
                .collect(Collectors.joining(", ")) + (shape.size() == 1 ? "," : "") + "), }";
        int plain = MAGIC.length + Short.BYTES + header.length() + 1;
        int length = (plain + ALIGNMENT - 1) / ALIGNMENT * ALIGNMENT;
        String padded = header + " ".repeat(length - plain) + "\n";
        return ByteBuffer.allocate(length + Double.BYTES * numbers).order(ByteOrder.LITTLE_ENDIAN).put(MAGIC).putShort((short) padded.length())
                .put(padded.getBytes(StandardCharsets.US_ASCII));
    }

    private static String sha256(byte[] bytes) {
        try {
            return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
        } catch (NoSuchAlgorithmException impossible) {
            throw new IllegalStateException("every Java has SHA-256", impossible);
        }
    }

    private static byte[] json(Stored tree) throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        JsonFactory factory = JsonFactory.builder().enable(JsonWriteFeature.ESCAPE_NON_ASCII).build();
        try (JsonGenerator generator = factory.createGenerator(out)) {
            generator.useDefaultPrettyPrinter();
            write(tree, generator);
        }
        return out.toByteArray();
    }

    private static void write(Stored value, JsonGenerator out) throws IOException {
        if (value instanceof Stored.Fields fields) {
            out.writeStartObject();
            for (Map.Entry<String, Stored> field : fields.byName().entrySet()) {
                out.writeFieldName(field.getKey());
                write(field.getValue(), out);
            }
            out.writeEndObject();
        } else if (value instanceof Stored.Items list) {
            out.writeStartArray();
            for (Stored item : list.items()) {
                write(item, out);
            }
            out.writeEndArray();
        } else if (value instanceof Stored.Flag flag) {
            out.writeBoolean(flag.value());
        } else if (value instanceof Stored.Whole whole) {
            out.writeNumber(whole.value());
        } else if (value instanceof Stored.Number number && Double.isFinite(number.value())) {
            out.writeNumber(number.value());
        } else {
            out.writeString(value instanceof Stored.Number number ? Double.toString(number.value()) : ((Stored.Text) value).value());
        }
    }
}
