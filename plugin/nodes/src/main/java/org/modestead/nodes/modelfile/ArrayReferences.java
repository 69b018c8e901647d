package org.modestead.nodes.modelfile;

import java.io.IOException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.modelfile.FieldsReader;
import org.modestead.engine.modelfile.FieldsWriter;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.engine.modelfile.Stored;

/**
 * The places of a tree where an array stands in an entry of its own, told by the fields {@code npy} (name of the entry), {@code dtype},
 * {@code shape}, {@code sha256} of the entry, and {@code pieces}, the rows of each piece where the array is held in pieces.
 *
 * @param tree with references
 * @param byEntry the references
 */
record ArrayReferences(Stored.Fields tree, Map<String, Reference> byEntry) {

    private static final String ENTRY = "npy";
    /** Share of the memory that the arrays of one file may fill. */
    private static final double MEMORY = 0.75;

    /**
     * One of them.
     *
     * @param entry name
     * @param shape of the array
     * @param sha256 of the entry, hexadecimal digits
     */
    record Reference(String entry, ArrayShape shape, String sha256) {}

    /**
     * An array to be written.
     *
     * @param array as it is held
     * @param sum of its bytes in a file
     */
    record Entry(Stored array, Checksum sum) {}

    /** Returns a tree with references in the places of arrays, which are collected by entry. */
    static Stored replace(Stored tree, String path, Map<String, Entry> arrays) throws IOException {
        if (tree instanceof Stored.Fields fields) {
            Map<String, Stored> out = new LinkedHashMap<>();
            for (Map.Entry<String, Stored> field : fields.byName().entrySet()) {
                out.put(field.getKey(), replace(field.getValue(), path.isEmpty() ? field.getKey() : path + "/" + field.getKey(), arrays));
            }
            return new Stored.Fields(out);
        }
        if (tree instanceof Stored.Items list) {
            List<Stored> out = new ArrayList<>();
            for (Stored item : list.items()) {
                out.add(replace(item, path + "/" + out.size(), arrays));
            }
            return new Stored.Items(out);
        }
        if (tree instanceof Stored.Numbers || tree instanceof Stored.Wholes) {
            Checksum sum = new Checksum();
            NpyArray.write(tree, sum);
            String entry = path + ".npy";
            arrays.put(entry, new Entry(tree, sum));
            return reference(entry, ArrayShape.of(tree), sum);
        }
        return tree;
    }

    private static Stored.Fields reference(String entry, ArrayShape shape, Checksum sum) {
        FieldsWriter out = new FieldsWriter().text(ENTRY, entry).text("dtype", shape.type().word())
                .list("shape", shape.dimensions(), Stored.Whole::new);
        if (shape.pieces().size() != 1) {
            out.wholes("pieces", shape.pieces());
        }
        return out.text("sha256", sum.sha256()).done();
    }

    /**
     * Finds the references of a tree.
     *
     * @throws ModelFileFault if one of them is not as it should be, or if all arrays together are larger than memory allows
     */
    static ArrayReferences in(Stored.Fields tree) {
        Map<String, Reference> found = new LinkedHashMap<>();
        collect(tree, "content", found);
        double bytes = found.values().stream().mapToDouble(reference -> NpyArray.size(reference.shape())).sum();
        double limit = MEMORY * Runtime.getRuntime().maxMemory();
        if (bytes > limit) {
            throw new ModelFileFault("model file", Math.round(bytes / 1e6) + " MB of numbers", "give Java more memory: at most "
                    + Math.round(limit / 1e6) + " MB are read now");
        }
        return new ArrayReferences(tree, found);
    }

    private static void collect(Stored tree, String path, Map<String, Reference> found) {
        if (tree instanceof Stored.Fields fields && fields.byName().containsKey(ENTRY)) {
            Reference reference = FieldsReader.made(new FieldsReader(path, fields), ArrayReferences::read);
            if (found.put(reference.entry(), reference) != null) {
                throw new ModelFileFault(path, "the array " + ModelFile.shortened(reference.entry()) + " is named twice", "name each once");
            }
        } else if (tree instanceof Stored.Fields fields) {
            fields.byName().forEach((name, value) -> collect(value, path + "." + name, found));
        } else if (tree instanceof Stored.Items list) {
            for (int i = 0; i < list.items().size(); i++) {
                collect(list.items().get(i), path + "[" + i + "]", found);
            }
        }
    }

    private static Reference read(FieldsReader in) {
        return new Reference(in.text(ENTRY), ArrayShape.read(in), in.text("sha256"));
    }

    Optional<Reference> of(String entry) {
        return Optional.ofNullable(byEntry.get(entry));
    }

    /** Returns the tree with the arrays in their places. */
    Stored.Fields resolved(Map<String, Stored> arrays) {
        byEntry.keySet().stream().filter(entry -> !arrays.containsKey(entry)).findFirst().ifPresent(missing -> {
            throw new ModelFileFault("model file", "the entry " + ModelFile.shortened(missing) + " is missing",
                    "take a file that nothing was taken out of");
        });
        return (Stored.Fields) resolved(tree, arrays);
    }

    private static Stored resolved(Stored tree, Map<String, Stored> arrays) {
        if (tree instanceof Stored.Fields fields) {
            if (fields.byName().get(ENTRY) instanceof Stored.Text entry) {
                return arrays.get(entry.value());
            }
            Map<String, Stored> out = new LinkedHashMap<>();
            fields.byName().forEach((name, value) -> out.put(name, resolved(value, arrays)));
            return new Stored.Fields(out);
        }
        return tree instanceof Stored.Items list ? new Stored.Items(list.items().stream().map(item -> resolved(item, arrays)).toList()) : tree;
    }
}
