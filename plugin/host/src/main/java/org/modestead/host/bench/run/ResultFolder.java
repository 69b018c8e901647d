package org.modestead.host.bench.run;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.BufferedInputStream;
import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.attribute.FileTime;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.engine.Fault;
import org.modestead.host.output.Forced;
import org.modestead.host.output.WholeFolder;
import org.modestead.host.table.KeptTable;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.files.PartName;
import org.modestead.nodes.modelfile.PortFiles;
import org.modestead.nodes.modelfile.ResultFile;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/**
 * Results on disk, one folder each: {@code facts.json}, which tells that the rest is complete, {@code result.zip} with pictures and
 * sentences, one file a port. Tables that are made anew from files or queries are not copied: their step is run again, which costs
 * nothing. When all together grow beyond the limit, those unused for longest go. Results of other builds of the program are of no use
 * to this one and lie apart.
 *
 * @param root of all results
 * @param build tells one build of the program from another
 * @param limit most bytes of all results together
 */
public record ResultFolder(Path root, String build, long limit) {

    private static final ObjectMapper MAPPER = new ObjectMapper();
    private static final String FACTS = "facts.json";
    private static final String RESULT = "result.zip";

    /** Returns whether a result is there now. */
    boolean has(String id) {
        return Files.isRegularFile(folder(id).resolve(FACTS));
    }

    /** Returns what is known of a result, empty when there is none. */
    Optional<KeptResults.Facts> facts(String id) {
        return index(id).map(index -> new KeptResults.Facts(index.path("node").asText(), index.path("seconds").asDouble(),
                Instant.parse(index.path("made").asText()), index.path("doubts").asInt(), index.path("anew").asBoolean()));
    }

    private Optional<JsonNode> index(String id) {
        Path file = folder(id).resolve(FACTS);
        try {
            return Files.isRegularFile(file) ? Optional.of(MAPPER.readTree(file.toFile())) : Optional.empty();
        } catch (IOException broken) {
            return Optional.empty();
        }
    }

    /** Reads a result; empty when it is not there whole, so that the step must run again. */
    Optional<NodeResult> read(NodeDeclaration declaration, String id) {
        if (!has(id)) {
            return Optional.empty();
        }
        try {
            JsonNode index = index(id).orElseThrow(() -> new IOException("its facts cannot be read"));
            if (index.path("anew").asBoolean()) {
                return Optional.empty();
            }
            checkSizes(folder(id), index.path("bytes"));
            Map<String, Object> outputs = new HashMap<>();
            for (Port port : declaration.outputs()) {
                outputs.put(port.id(), port.type() == PortType.TABLE ? table(id, port, index.path("tables").path(port.id())) : value(id, port));
            }
            Files.setLastModifiedTime(folder(id).resolve(FACTS), FileTime.from(Instant.now()));
            ResultFile shown = shown(id);
            return Optional.of(new NodeResult(outputs, shown.figures(), shown.summary(), shown.doubts(), shown.document()));
        } catch (IOException | Fault broken) {
            remove(folder(id));
            return Optional.empty();
        }
    }

    /** Tables are read late: that they are whole is seen from their size. */
    private static void checkSizes(Path folder, JsonNode bytes) throws IOException {
        for (Map.Entry<String, JsonNode> file : bytes.properties()) {
            if (Files.size(folder.resolve(file.getKey())) != file.getValue().asLong()) {
                throw new IOException(file.getKey() + " is not whole");
            }
        }
    }

    private ResultFile shown(String id) throws IOException {
        try (InputStream in = new BufferedInputStream(Files.newInputStream(folder(id).resolve(RESULT)))) {
            return ResultFile.read(in);
        }
    }

    private Object value(String id, Port port) throws IOException {
        try (InputStream in = new BufferedInputStream(Files.newInputStream(folder(id).resolve(port.id() + ".zip")))) {
            return PortFiles.read(port.type(), in);
        }
    }

    private Table table(String id, Port port, JsonNode known) throws IOException {
        List<Column> columns = new ArrayList<>();
        known.path("columns").forEach(column -> columns.add(new Column(column.path("name").asText(), CellType.valueOf(column.path("type").asText()))));
        return KeptTable.read(folder(id).resolve(port.id() + ".parquet"), new TableSchema(columns), known.path("origin").asText());
    }

    /**
     * Writes a result, whole or not at all; it is on the disk itself before this returns, and in the place of an older one of the same
     * name, which may have been damaged. What cannot be written, or is larger than all results together may be, is not kept: the step
     * runs again in another process.
     */
    void write(NodeDeclaration declaration, String id, NodeResult result, KeptResults.Facts facts) {
        Path folder = folder(id);
        Path part = PartName.of(folder);
        try {
            remove(part);
            Files.createDirectories(part);
            fill(part, declaration, result, facts);
            if (size(part) <= limit) {
                Forced.files(part);
                remove(folder);
                Files.move(part, folder, StandardCopyOption.ATOMIC_MOVE);
                Forced.names(folder.getParent());
                shrink();
            }
        } catch (IOException | Fault unwritable) {
            // a full disk or a part of another extension: the result stays in memory
            remove(folder);
        } finally {
            remove(part);
        }
    }

    private static void fill(Path part, NodeDeclaration declaration, NodeResult result, KeptResults.Facts facts) throws IOException {
        ObjectNode index = MAPPER.createObjectNode().put("node", facts.node()).put("seconds", facts.seconds()).put("made", facts.made().toString())
                .put("doubts", facts.doubts());
        ObjectNode tables = index.putObject("tables");
        index.put("anew", facts.anew());
        for (Port port : facts.anew() ? List.<Port>of() : declaration.outputs()) {
            Object value = result.outputs().get(port.id());
            if (value instanceof Table table) {
                KeptTable.write(table, part.resolve(port.id() + ".parquet"));
                ObjectNode known = tables.putObject(port.id()).put("origin", table.origin());
                ArrayNode columns = known.putArray("columns");
                table.schema().columns().forEach(column -> columns.addObject().put("name", column.name()).put("type", column.type().name()));
            } else {
                try (OutputStream out = new BufferedOutputStream(Files.newOutputStream(part.resolve(port.id() + ".zip")))) {
                    PortFiles.write(port.type(), value, out);
                }
            }
        }
        try (OutputStream out = new BufferedOutputStream(Files.newOutputStream(part.resolve(RESULT)))) {
            ResultFile.write(ResultFile.of(result), out);
        }
        ObjectNode bytes = index.putObject("bytes");
        try (Stream<Path> files = Files.list(part)) {
            files.sorted().forEach(file -> bytes.put(file.getFileName().toString(), file.toFile().length()));
        }
        Files.write(part.resolve(FACTS), MAPPER.writeValueAsBytes(index));
    }

    static boolean isMadeAnew(NodeResult result) {
        return result.outputs().values().stream().anyMatch(value -> value instanceof Table table && KeptTable.isMadeAnew(table));
    }

    private Path folder(String id) {
        return root.resolve(build).resolve(id);
    }

    /** Removes what other builds left, and what was unused for longest where all is too large. */
    void shrink() throws IOException {
        if (!Files.isDirectory(root)) {
            return;
        }
        try (Stream<Path> builds = Files.list(root)) {
            builds.filter(other -> !other.getFileName().toString().equals(build)).toList().forEach(ResultFolder::remove);
        }
        PartName.abandonedIn(root.resolve(build)).forEach(ResultFolder::remove);
        List<Path> folders;
        try (Stream<Path> found = Files.list(root.resolve(build))) {
            folders = found.filter(folder -> Files.isRegularFile(folder.resolve(FACTS)))
                    .sorted(Comparator.comparing(folder -> folder.resolve(FACTS).toFile().lastModified())).toList();
        }
        long all = 0;
        for (Path folder : folders) {
            all += size(folder);
        }
        for (Path folder : folders) {
            if (all <= limit) {
                break;
            }
            all -= size(folder);
            remove(folder);
        }
    }

    private static long size(Path folder) throws IOException {
        try (Stream<Path> files = Files.list(folder)) {
            return files.mapToLong(file -> file.toFile().length()).sum();
        }
    }

    private static void remove(Path folder) {
        if (!Files.exists(folder)) {
            return;
        }
        try {
            WholeFolder.remove(folder);
        } catch (IOException left) {
            // without its facts a result counts as not there
            folder.resolve(FACTS).toFile().delete();
        }
    }
}
