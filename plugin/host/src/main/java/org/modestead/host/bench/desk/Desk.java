package org.modestead.host.bench.desk;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.time.Instant;
import java.time.ZoneId;
import java.time.format.DateTimeFormatter;
import java.util.HexFormat;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.function.UnaryOperator;
import org.modestead.host.output.Disk;
import org.modestead.host.output.FolderLock;
import org.modestead.host.output.WholeFile;
import org.modestead.host.workflow.Workflow;
import org.modestead.host.workflow.WorkflowText;

/**
 * A document that is open, with its past and its journal. Whatever happens to it is on disk before the method returns. Not for use by
 * several threads.
 */
public final class Desk implements AutoCloseable {

    /** Name of the file that tells the latest result of each step. */
    static final String LATEST = "latest.json";
    private static final DateTimeFormatter CLOCK = DateTimeFormatter.ofPattern("HH:mm", Locale.ROOT);
    private static final ObjectMapper MAPPER = new ObjectMapper();

    private final Path folder;
    private final FolderLock lock;
    private final String recovered;
    private final Map<String, String> latest;
    private Journal journal;
    private Timeline timeline;
    private String saved;
    private Instant changed;

    private Desk(Path folder, FolderLock lock, Journal journal, Journal.Told told, String recovered, Map<String, String> latest) {
        this.folder = folder;
        this.lock = lock;
        this.journal = journal;
        this.recovered = recovered;
        this.latest = latest;
        this.timeline = told.timeline();
        this.saved = told.saved();
        this.changed = told.changed();
    }

    /**
     * Begins a desk.
     *
     * @param folder of the desk, made if missing
     * @param workflow the document, with the file where Save goes
     * @param saved whether that file holds it
     */
    static Desk begin(Path folder, Workflow workflow, boolean saved) {
        return open(folder, new Journal.Told(Timeline.begin(workflow), saved ? checksum(workflow) : "", Instant.now()), "");
    }

    /**
     * Goes on with a desk of an earlier process.
     *
     * @throws DeskFault if it cannot be read
     */
    static Desk resume(Path folder) {
        Journal.Told told = Journal.read(folder)
                .orElseThrow(() -> new DeskFault("desk " + folder.getFileName(), "its journal cannot be read", "begin a new one"));
        boolean same = checksum(told.timeline().current()).equals(told.saved());
        return open(folder, told, same ? "" : "Unsaved work of " + clock(told.changed()) + " was taken up again.");
    }

    private static Desk open(Path folder, Journal.Told told, String recovered) {
        try {
            Files.createDirectories(folder);
            FolderLock lock = FolderLock.take(folder.resolve(".lock")).orElseThrow(() -> new DeskFault("desk " + folder.getFileName(),
                    "another bench has it open", "go on there, or close that bench"));
            return begun(folder, lock, told, recovered);
        } catch (IOException unwritable) {
            throw unkept(folder, unwritable);
        }
    }

    /** A desk whose journal cannot be begun lets others try. */
    private static Desk begun(Path folder, FolderLock lock, Journal.Told told, String recovered) throws IOException {
        boolean begun = false;
        try {
            Desk desk = new Desk(folder, lock, Journal.begin(folder, told), told, recovered, readLatest(folder));
            begun = true;
            return desk;
        } finally {
            if (!begun) {
                lock.close();
            }
        }
    }

    /** Returns its id in the desk folder. */
    public String id() {
        return folder.getFileName().toString();
    }

    /** Returns the document as it is and was. */
    public Timeline timeline() {
        return timeline;
    }

    /** Returns a sentence when unsaved work of an earlier process was taken up; else an empty text. */
    public String recovered() {
        return recovered;
    }

    /** Goes on with a changed document. */
    public void edit(Workflow workflow, String label) {
        Timeline after = timeline.then(workflow, label);
        keep(() -> journal.edited(after, label, saved));
        timeline = after;
    }

    /** Takes the last edit back. */
    public void undo() {
        Timeline before = timeline.undo();
        keep(() -> journal.did("undo", before, saved));
        timeline = before;
    }

    /** Does again what was taken back. */
    public void redo() {
        Timeline after = timeline.redo();
        keep(() -> journal.did("redo", after, saved));
        timeline = after;
    }

    /**
     * Writes the document to a file, where Save goes from now on.
     *
     * @param way gives the document, as it is and was, in the file where it is to go
     */
    public void save(UnaryOperator<Workflow> way) {
        Timeline there = timeline.moved(way);
        Workflow document = there.current();
        Path file = document.file();
        try {
            WholeFile.checkTarget(file, file.toString());
            WholeFile.write(Disk.REAL, file, out -> out.write(WorkflowText.write(document)));
        } catch (IOException unwritable) {
            throw new DeskFault("file " + file, "it cannot be written (" + unwritable.getMessage() + ")", "save under another name");
        }
        String sum = checksum(document);
        keep(() -> written(there, sum));
        timeline = there;
        saved = sum;
    }

    /** A line tells that it was saved; where the way there changed the document, as it is or was, the journal is begun anew. */
    private void written(Timeline there, String sum) throws IOException {
        if (there.equals(timeline.in(there.current().file()))) {
            journal.saved(there, sum);
            return;
        }
        Journal before = journal;
        journal = Journal.begin(folder, new Journal.Told(there, sum, Instant.now()));
        before.close();
    }

    /** Returns whether the file holds the document as it is. */
    public boolean isSaved() {
        return saved.equals(checksum(timeline.current()));
    }

    /** Says so in words. */
    public String savedWords() {
        return isSaved() ? "saved" : (saved.isEmpty() ? "not saved yet, kept since " : "not saved, kept since ") + clock(changed);
    }

    /** Returns the latest result of each step, by step id. */
    public Map<String, String> latest() {
        return Map.copyOf(latest);
    }

    /** Remembers the latest result of steps. */
    public void latest(Map<String, String> results) {
        latest.putAll(results);
        try {
            byte[] bytes = MAPPER.writeValueAsBytes(latest);
            WholeFile.write(Disk.REAL, folder.resolve(LATEST), out -> out.write(bytes));
        } catch (IOException unwritable) {
            throw unkept(folder, unwritable);
        }
    }

    private static Map<String, String> readLatest(Path folder) {
        Map<String, String> latest = new TreeMap<>();
        try {
            JsonNode root = Files.isRegularFile(folder.resolve(LATEST)) ? MAPPER.readTree(folder.resolve(LATEST).toFile()) : MAPPER.nullNode();
            root.properties().forEach(entry -> latest.put(entry.getKey(), entry.getValue().asText()));
        } catch (IOException broken) {
            // only what is out of date is looked up here: without it, less can be looked at
            latest.clear();
        }
        return latest;
    }

    private void keep(Keeping keeping) {
        try {
            keeping.keep();
            changed = Instant.now();
        } catch (IOException unwritable) {
            throw unkept(folder, unwritable);
        }
    }

    private interface Keeping {
        void keep() throws IOException;
    }

    private static DeskFault unkept(Path folder, IOException unwritable) {
        return new DeskFault("desk folder " + folder, "it cannot be written (" + unwritable.getMessage() + ")", "make room or allow writing there; nothing was changed");
    }

    static String clock(Instant when) {
        return CLOCK.format(when.atZone(ZoneId.systemDefault()));
    }

    static String checksum(Workflow workflow) {
        try {
            return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(WorkflowText.write(workflow)));
        } catch (NoSuchAlgorithmException impossible) {
            throw new IllegalStateException("every Java has SHA-256", impossible);
        }
    }

    /** Lets another process open it. What was not saved stays kept. */
    @Override
    public void close() {
        try {
            journal.close();
            lock.close();
        } catch (IOException left) {
            throw unkept(folder, left);
        }
    }

    /** Tells of a desk in a folder without opening it: what is there, when it changed, whether it was saved. */
    static Optional<DeskFolder.Kept> glance(Path folder) {
        return Journal.glance(folder).or(() -> Journal.read(folder).map(Journal.Glance::of)).map(seen -> new DeskFolder.Kept(folder.getFileName().toString(),
                seen.name(), seen.file(), seen.changed(), seen.unsaved(), seen.steps(), seen.untouched()));
    }
}
