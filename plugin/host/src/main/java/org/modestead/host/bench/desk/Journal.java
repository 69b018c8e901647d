package org.modestead.host.bench.desk;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.modestead.host.output.Disk;
import org.modestead.host.output.WholeFile;
import org.modestead.host.workflow.Workflow;
import org.modestead.host.workflow.WorkflowFile;
import org.modestead.host.workflow.WorkflowText;

/**
 * Writes down every edit at once, one line each, so that a killed process loses nothing. A line that was half-written when the process
 * died is left out when the journal is read. Each line tells in short how the desk stands after it, so that a list of desks reads the
 * last line of each and nothing else.
 */
final class Journal implements AutoCloseable {

    /** Name of the file in the desk's folder. */
    static final String NAME = "journal.jsonl";

    private static final String FORMAT = "modestead-desk/1";
    private static final int MOST_KEPT = 200;
    private static final int TAIL = 1 << 14;
    private static final ObjectMapper MAPPER = new ObjectMapper();

    private final FileChannel channel;

    private Journal(FileChannel channel) {
        this.channel = channel;
    }

    /**
     * What a journal tells.
     *
     * @param timeline the document as it is and was
     * @param saved checksum of the document that its file holds; empty when it was never saved
     * @param changed when the last thing happened
     */
    record Told(Timeline timeline, String saved, Instant changed) {}

    /** Begins a journal anew: what is there is replaced in one step. */
    static Journal begin(Path folder, Told told) throws IOException {
        List<Timeline.Moment> moments = told.timeline().moments();
        int now = told.timeline().now();
        int first = Math.max(0, Math.min(now, moments.size() - MOST_KEPT));
        List<ObjectNode> entries = new ArrayList<>();
        entries.add(MAPPER.createObjectNode().put("format", FORMAT).put("file", told.timeline().current().file().toString()).put("saved", told.saved())
                .put("at", at(told.changed())));
        for (int i = first; i < moments.size(); i++) {
            entries.add(edit(moments.get(i).workflow(), moments.get(i).label(), told.changed()));
        }
        for (int i = now; i < moments.size() - 1; i++) {
            entries.add(MAPPER.createObjectNode().put("do", "undo").put("at", at(told.changed())));
        }
        entries.get(entries.size() - 1).set("now", now(told.timeline(), told.saved()));
        Path file = folder.resolve(NAME);
        WholeFile.write(Disk.REAL, file, out -> {
            for (ObjectNode entry : entries) {
                out.write(line(entry).getBytes(StandardCharsets.UTF_8));
            }
        });
        return new Journal(FileChannel.open(file, StandardOpenOption.APPEND));
    }

    /** Reads a journal; empty when the folder holds none that can be read. */
    static Optional<Told> read(Path folder) {
        Path file = folder.resolve(NAME);
        if (!Files.isRegularFile(file)) {
            return Optional.empty();
        }
        try {
            // a line that was torn within a letter is no UTF-8: it must not take the lines before it along
            return new Reader().read(new String(Files.readAllBytes(file), StandardCharsets.UTF_8).lines().toList());
        } catch (IOException unreadable) {
            return Optional.empty();
        }
    }

    /** Returns how a desk stands without reading what led to it; empty where the last line does not tell. */
    static Optional<Glance> glance(Path folder) {
        try (FileChannel journal = FileChannel.open(folder.resolve(NAME), StandardOpenOption.READ)) {
            JsonNode last = MAPPER.readTree(lastLine(journal));
            JsonNode now = last.path("now");
            return now.isObject() ? Optional.of(new Glance(now.path("name").asText(), Path.of(now.path("file").asText()), Instant.parse(last.path("at").asText()),
                    now.path("unsaved").asBoolean(), now.path("steps").asInt(), now.path("untouched").asBoolean())) : Optional.empty();
        } catch (IOException | RuntimeException unreadable) {
            return Optional.empty();
        }
    }

    /**
     * How a desk stands, in short.
     *
     * @param name of the workflow
     * @param file where Save goes
     * @param changed when the last thing happened
     * @param unsaved whether the file holds something else
     * @param steps how many
     * @param untouched whether it was begun empty and nothing was done since
     */
    record Glance(String name, Path file, Instant changed, boolean unsaved, int steps, boolean untouched) {

        static Glance of(Told told) {
            return of(told.timeline(), told.saved(), told.changed());
        }

        private static Glance of(Timeline timeline, String saved, Instant changed) {
            Workflow workflow = timeline.current();
            return new Glance(workflow.name(), workflow.file(), changed, !saved.equals(Desk.checksum(workflow)), workflow.steps().size(),
                    saved.isEmpty() && timeline.moments().size() == 1 && workflow.steps().isEmpty());
        }
    }

    /** Reads from the end, further and further back, until a whole line is there; a half-written last line is none. */
    private static byte[] lastLine(FileChannel journal) throws IOException {
        long size = journal.size();
        for (long want = Math.min(TAIL, size);; want = Math.min(2 * want, size)) {
            ByteBuffer tail = ByteBuffer.allocate(Math.toIntExact(want));
            while (tail.hasRemaining() && journal.read(tail, size - want + tail.position()) >= 0) {
                // on until it is full
            }
            byte[] bytes = tail.array();
            int begin = bytes.length - 1;
            if (begin < 0 || bytes[begin] != '\n') {
                throw new IOException("the last line is not whole");
            }
            while (begin > 0 && bytes[begin - 1] != '\n') {
                begin--;
            }
            if (begin > 0 || want == size) {
                return Arrays.copyOfRange(bytes, begin, bytes.length);
            }
        }
    }

    void edited(Timeline after, String label, String saved) throws IOException {
        append(edit(after.current(), label, Instant.now()), after, saved);
    }

    void did(String what, Timeline after, String saved) throws IOException {
        append(MAPPER.createObjectNode().put("do", what).put("at", at(Instant.now())), after, saved);
    }

    void saved(Timeline after, String checksum) throws IOException {
        append(MAPPER.createObjectNode().put("do", "saved").put("file", after.current().file().toString()).put("saved", checksum).put("at", at(Instant.now())),
                after, checksum);
    }

    private static ObjectNode now(Timeline timeline, String saved) {
        Glance glance = Glance.of(timeline, saved, Instant.EPOCH);
        return MAPPER.createObjectNode().put("name", glance.name()).put("file", glance.file().toString()).put("unsaved", glance.unsaved())
                .put("steps", glance.steps()).put("untouched", glance.untouched());
    }

    private void append(ObjectNode entry, Timeline after, String saved) throws IOException {
        entry.set("now", now(after, saved));
        append(channel, line(entry).getBytes(StandardCharsets.UTF_8));
    }

    /** Appends a line whole or, as far as the disk lets, not at all. */
    private static void append(FileChannel channel, byte[] line) throws IOException {
        ByteBuffer bytes = ByteBuffer.wrap(line);
        long whole = channel.size();
        try {
            while (bytes.hasRemaining()) {
                channel.write(bytes);
            }
            channel.force(false);
        } catch (IOException full) {
            takeBack(channel, whole, full);
            throw full;
        }
    }

    /** Half a line would hide every line that is written after it, once there is room again. */
    private static void takeBack(FileChannel channel, long whole, IOException full) {
        try {
            channel.truncate(whole);
        } catch (IOException broken) {
            full.addSuppressed(broken);
        }
    }

    private static ObjectNode edit(Workflow workflow, String label, Instant when) {
        return MAPPER.createObjectNode().put("do", "edit").put("label", label)
                .put("text", new String(WorkflowText.write(workflow), StandardCharsets.UTF_8)).put("at", at(when));
    }

    private static String at(Instant when) {
        return when.truncatedTo(ChronoUnit.MILLIS).toString();
    }

    private static String line(ObjectNode entry) {
        try {
            return MAPPER.writeValueAsString(entry) + "\n";
        } catch (JsonProcessingException impossible) {
            throw new IllegalStateException("a tree could not be written", impossible);
        }
    }

    @Override
    public void close() throws IOException {
        channel.close();
    }

    /** Follows a journal from its first line on, as far as it can be read. */
    private static final class Reader {
        private Path file = Path.of("");
        private String saved = "";
        private Instant changed = Instant.EPOCH;
        private Optional<Timeline> timeline = Optional.empty();

        Optional<Told> read(List<String> lines) {
            try {
                for (String line : lines) {
                    entry(MAPPER.readTree(line));
                }
            } catch (JsonProcessingException | RuntimeException torn) {
                // the process died while it wrote this line: what stands before it counts
                changed = changed.equals(Instant.EPOCH) ? Instant.now() : changed;
            }
            return timeline.map(found -> new Told(found.in(file), saved, changed));
        }

        private void entry(JsonNode entry) {
            String kind = entry.path("do").asText(entry.path("format").asText());
            switch (kind) {
                case FORMAT, "saved" -> {
                    file = Path.of(entry.path("file").asText());
                    saved = entry.path("saved").asText();
                }
                case "edit" -> {
                    Workflow workflow = WorkflowFile.parse(file, entry.path("text").asText().getBytes(StandardCharsets.UTF_8)).workflow()
                            .orElseThrow(() -> new IllegalArgumentException("no workflow"));
                    timeline = Optional.of(timeline.map(found -> found.then(workflow, entry.path("label").asText()))
                            .orElseGet(() -> Timeline.begin(workflow)));
                }
                case "undo" -> timeline = timeline.map(Timeline::undo);
                case "redo" -> timeline = timeline.map(Timeline::redo);
                default -> throw new IllegalArgumentException("a line of another format");
            }
            changed = Instant.parse(entry.path("at").asText());
        }
    }
}
