package org.modestead.nodes.modelfile;

import java.io.EOFException;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.time.LocalDateTime;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.function.Function;
import java.util.zip.ZipEntry;
import java.util.zip.ZipException;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;
import org.modestead.engine.modelfile.FieldsReader;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.engine.modelfile.Stored;

/**
 * The container: a zip whose first entry {@value #INDEX} holds the tree as JSON; every array stands there as a reference to an NPY entry.
 * Entries are stored, not deflated, because a deflater gives other bytes in another Java, and noise does not shrink anyway. No name
 * in a file is ever used as a path.
 */
final class ModelFile {

    static final String INDEX = "model.json";
    static final String FORMAT = "modestead-model";
    static final int VERSION = 1;

    private static final int LARGEST_INDEX = 1 << 26;
    /** The first moment that a zip can tell without a time zone. */
    private static final LocalDateTime TIME = LocalDateTime.of(1980, 2, 1, 0, 0);

    private ModelFile() {}

    static void write(String kind, Stored.Fields content, OutputStream out) throws IOException {
        Map<String, ArrayReferences.Entry> arrays = new LinkedHashMap<>();
        Map<String, Stored> file = new LinkedHashMap<>();
        file.put("format", new Stored.Text(FORMAT));
        file.put("version", new Stored.Whole(VERSION));
        file.put("kind", new Stored.Text(kind));
        file.put("written_by", new Stored.Text(Release.name()));
        file.put("content", ArrayReferences.replace(content, "", arrays));
        byte[] index = JsonTree.write(new Stored.Fields(file));
        Checksum sum = new Checksum();
        sum.write(index, 0, index.length);
        ZipOutputStream zip = new ZipOutputStream(out);
        zip.putNextEntry(entry(INDEX, sum));
        zip.write(index);
        for (Map.Entry<String, ArrayReferences.Entry> array : arrays.entrySet()) {
            zip.putNextEntry(entry(array.getKey(), array.getValue().sum()));
            NpyArray.write(array.getValue().array(), zip);
        }
        zip.closeEntry();
        zip.finish();
    }

    /** A stored entry tells size and checksum before its data. */
    private static ZipEntry entry(String name, Checksum sum) {
        ZipEntry entry = new ZipEntry(name);
        entry.setMethod(ZipEntry.STORED);
        entry.setSize(sum.count());
        entry.setCrc(sum.crc());
        entry.setTimeLocal(TIME);
        return entry;
    }

    static <T> T read(String kind, InputStream in, Function<FieldsReader, T> read) throws IOException {
        try {
            ZipEnd end = new ZipEnd(in);
            ZipInputStream zip = new ZipInputStream(end);
            ArrayReferences references = ArrayReferences.in(index(kind, zip));
            Stored.Fields content = references.resolved(arrays(zip, references));
            end.require();
            return made(content, read);
        } catch (ZipException | EOFException | IllegalArgumentException broken) {
            throw notWhole(broken);
        }
    }

    /** Reads what stands in the index alone, where the arrays are references; neither they nor the end of the file are looked at. */
    static <T> T peek(String kind, InputStream in, Function<FieldsReader, T> read) throws IOException {
        try {
            return made(index(kind, new ZipInputStream(in)), read);
        } catch (ZipException | EOFException | IllegalArgumentException broken) {
            throw notWhole(broken);
        }
    }

    private static <T> T made(Stored.Fields content, Function<FieldsReader, T> read) {
        return new FieldsReader("model file", new Stored.Fields(Map.of("content", content))).object("content", read);
    }

    private static ModelFileFault notWhole(Exception broken) {
        return new ModelFileFault("model file", "it is not a whole zip file (" + broken.getMessage() + ")",
                "take a file that was written to its end and not changed since");
    }

    private static Stored.Fields index(String kind, ZipInputStream zip) throws IOException {
        ZipEntry first = zip.getNextEntry();
        if (first == null || !first.getName().equals(INDEX)) {
            throw new ModelFileFault("model file", first == null ? "it is no zip file" : "its first entry is " + shortened(first.getName()),
                    "take a model file: a zip whose first entry is " + INDEX);
        }
        byte[] index = zip.readNBytes(LARGEST_INDEX);
        if (zip.read() >= 0) {
            throw new ModelFileFault("model file", INDEX + " is longer than " + LARGEST_INDEX + " bytes", "take a smaller file");
        }
        FieldsReader file = new FieldsReader(INDEX, JsonTree.read(index));
        requireKnown(kind, file);
        return file.object("content", FieldsReader::fields);
    }

    private static void requireKnown(String kind, FieldsReader file) {
        if (!file.text("format").equals(FORMAT)) {
            throw file.wrong("format", "the format " + shortened(file.text("format")), FORMAT);
        }
        long version = file.whole("version");
        if (version != VERSION) {
            throw new ModelFileFault("model file", "it has version " + version + " of the format",
                    version > VERSION ? "open it with a newer Modestead, this one reads version " + VERSION : "versions begin with 1");
        }
        if (!file.text("kind").equals(kind)) {
            throw new ModelFileFault("model file", "it holds a value of kind " + shortened(file.text("kind")), "take one that holds a value of kind "
                    + kind);
        }
    }

    private static Map<String, Stored> arrays(ZipInputStream zip, ArrayReferences references) throws IOException {
        Map<String, Stored> found = new HashMap<>();
        for (ZipEntry entry = zip.getNextEntry(); entry != null; entry = zip.getNextEntry()) {
            ArrayReferences.Reference reference = references.of(entry.getName()).orElseThrow(() -> new ModelFileFault("model file",
                    "an entry that " + INDEX + " does not name", "take a file that nothing was added to"));
            if (entry.getSize() >= 0 && entry.getSize() != NpyArray.size(reference.shape())) {
                throw new ModelFileFault("model file, " + reference.entry(), "an entry of " + entry.getSize() + " bytes",
                        NpyArray.size(reference.shape()) + " bytes are expected there");
            }
            if (found.put(reference.entry(), NpyArray.read(reference, zip)) != null) {
                throw new ModelFileFault("model file, " + reference.entry(), "it is there twice", "take a file that nothing was added to");
            }
        }
        return found;
    }

    static String shortened(String text) {
        return text.length() <= 60 ? text : text.substring(0, 60) + "...";
    }
}
