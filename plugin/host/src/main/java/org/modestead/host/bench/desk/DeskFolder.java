package org.modestead.host.bench.desk;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.SecureRandom;
import java.time.Instant;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.host.output.WholeFolder;
import org.modestead.host.workflow.Problem;
import org.modestead.host.workflow.Workflow;
import org.modestead.host.workflow.WorkflowFile;

/**
 * Where the bench keeps desks, uploads and results, of all processes and days.
 *
 * @param root absolute
 */
public record DeskFolder(Path root) {

    private static final int LONGEST_SLUG = 32;
    private static final int ID_LETTERS = 4;

    /** Takes the absolute folder. */
    public DeskFolder {
        root = root.toAbsolutePath().normalize();
    }

    /** The usual one, under the person's home. */
    public static DeskFolder usual() {
        return new DeskFolder(Path.of(System.getProperty("user.home"), ".modestead", "bench"));
    }

    /**
     * A desk that is not open.
     *
     * @param id of the desk
     * @param name of the workflow
     * @param file where Save goes
     * @param changed when it changed last
     * @param unsaved whether the file holds something else
     * @param steps how many
     * @param untouched whether it was begun empty and nothing was done since
     */
    public record Kept(String id, String name, Path file, Instant changed, boolean unsaved, int steps, boolean untouched) {}

    private Path all() {
        return root.resolve("desks");
    }

    /** Returns where the desk of an id lies. */
    public Path place(String id) {
        return all().resolve(id);
    }

    /** Returns the desks that hold work, the one changed last first; one that was begun empty and left so is none. */
    public List<Kept> desks() {
        Path desks = all();
        if (!Files.isDirectory(desks)) {
            return List.of();
        }
        try (Stream<Path> folders = Files.list(desks)) {
            return folders.filter(Files::isDirectory).sorted().flatMap(folder -> Desk.glance(folder).stream()).filter(kept -> !kept.untouched())
                    .sorted(Comparator.comparing(Kept::changed).reversed()).toList();
        } catch (IOException unreadable) {
            throw new DeskFault("desk folder " + desks, "it cannot be read (" + unreadable.getMessage() + ")", "allow reading it");
        }
    }

    /** Returns where uploads wait until a desk takes them. */
    public Path uploads() {
        return root.resolve("uploads");
    }

    /** Returns where results are kept. */
    public Path results() {
        return root.resolve("results");
    }

    /** Returns whether a file is the bench's own bookkeeping, of no use to a person who looks for tables. */
    public boolean keepsBooksIn(Path file) {
        boolean top = root.equals(file.getParent());
        boolean inDesk = file.startsWith(all()) && file.getNameCount() == root.getNameCount() + 3;
        String name = file.getFileName().toString();
        return top && !file.equals(all()) || inDesk && (name.equals(Journal.NAME) || name.equals(Desk.LATEST));
    }

    /** Makes the folder of a new desk, for files that shall lie beside its workflow. */
    public Path fresh(String name) {
        SecureRandom random = new SecureRandom();
        String slug = slug(name);
        try {
            while (true) {
                Path folder = place(slug + "-" + letters(random.nextLong()));
                if (!Files.exists(folder)) {
                    return Files.createDirectories(folder);
                }
            }
        } catch (IOException unwritable) {
            throw new DeskFault("desk folder " + root, "it cannot be written (" + unwritable.getMessage() + ")",
                    "allow writing there, or choose another one with --desk");
        }
    }

    /** Begins a desk in a folder that {@link #fresh} made; its file lies in the same folder. */
    public Desk begin(Path folder, Workflow workflow) {
        return Desk.begin(folder, workflow.in(folder.resolve(WorkflowFile.DEFAULT_NAME)), false);
    }

    /**
     * Opens a workflow file; unsaved work on it from an earlier process is taken up.
     *
     * @param given a file, or a folder that holds a workflow.json
     * @throws DeskFault if the file cannot be read without losing something
     */
    public Desk open(Path given) {
        WorkflowFile.Reading reading = WorkflowFile.read(given);
        Optional<Problem> broken = reading.broken();
        Workflow workflow = reading.workflow().filter(found -> broken.isEmpty()).orElseThrow(() -> {
            Problem problem = broken.orElseThrow();
            String where = Stream.of(given.toString(), problem.step().isEmpty() ? "" : "step " + problem.step(), problem.key())
                    .filter(part -> !part.isEmpty()).reduce((a, b) -> a + ", " + b).orElseThrow();
            return new DeskFault(where, problem.seen(), problem.wanted());
        });
        Path folder = of(workflow.file());
        boolean unsaved = Desk.glance(folder).filter(kept -> kept.file().equals(workflow.file())).map(Kept::unsaved).orElse(false);
        return unsaved ? Desk.resume(folder) : Desk.begin(folder, workflow, true);
    }

    /**
     * Goes on with a desk.
     *
     * @throws DeskFault if there is none of that id
     */
    public Desk resume(String id) {
        return Desk.resume(folder(id));
    }

    /** Removes a desk with what lies in its folder; files elsewhere stay. */
    public void forget(String id) {
        Path folder = folder(id);
        try {
            WholeFolder.remove(folder);
        } catch (IOException left) {
            throw new DeskFault("desk " + id, "it cannot be removed (" + left.getMessage() + ")", "allow writing in " + folder);
        }
    }

    private Path folder(String id) {
        Path folder = place(id);
        if (!id.matches("[a-z0-9-]+") || !Files.isDirectory(folder)) {
            throw new DeskFault("desk " + id, "there is none of this name", "choose one that is there");
        }
        return folder;
    }

    /** A file that lies in a desk's own folder is that desk's; another one has a desk of its own, always the same. */
    private Path of(Path file) {
        Path desks = all();
        Path owner = file.getParent();
        if (owner != null && desks.equals(owner.getParent()) && file.getFileName().toString().equals(WorkflowFile.DEFAULT_NAME)) {
            return owner;
        }
        String name = owner == null || owner.getFileName() == null ? "workflow" : owner.getFileName().toString();
        return desks.resolve(slug(name) + "-" + letters(hash(file.toString())));
    }

    private static long hash(String text) {
        long hash = 1125899906842597L;
        for (int i = 0; i < text.length(); i++) {
            hash = 31 * hash + text.charAt(i);
        }
        return hash * 0x9E3779B97F4A7C15L;
    }

    private static String letters(long number) {
        String text = Long.toUnsignedString(number, Character.MAX_RADIX);
        String tail = text.substring(Math.max(0, text.length() - ID_LETTERS));
        return "0".repeat(ID_LETTERS - tail.length()) + tail;
    }

    private static String slug(String name) {
        String plain = name.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-").replaceAll("^-+|-+$", "");
        String cut = plain.substring(0, Math.min(plain.length(), LONGEST_SLUG)).replaceAll("-+$", "");
        return cut.isEmpty() ? "desk" : cut;
    }
}
