package org.modestead.host.output;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;

/**
 * The result folder of a run. Everything is written into a hidden folder beside it and moved to its place only when the
 * run has ended, file by file in one step each; until then, and if the run is cancelled, fails to write or is killed,
 * the results of an earlier run stay as they are.
 */
public final class OutputFolder implements AutoCloseable {

    private final Path folder;
    private final Path staging;
    private final FolderLock lock;
    private final Disk disk;

    private OutputFolder(Path folder, Path staging, FolderLock lock, Disk disk) {
        this.folder = folder;
        this.staging = staging;
        this.lock = lock;
        this.disk = disk;
    }

    /**
     * Claims a result folder. What a killed run left beside it is removed.
     *
     * @param given may be missing, or hold results of an earlier run
     * @param disk where bytes go
     * @throws OutputFault if it cannot be written or another run is writing it
     */
    public static OutputFolder open(Path given, Disk disk) {
        Path folder = given.toAbsolutePath().normalize();
        if (folder.getParent() == null || Files.exists(folder) && !Files.isDirectory(folder)) {
            throw new OutputFault(given.toString(), "this is not a folder that could be replaced", "choose another folder");
        }
        WholeFile.checkTarget(folder.resolve("run.json"), given.toString());
        Path staging = folder.resolveSibling("." + folder.getFileName() + ".part");
        try {
            Files.createDirectories(folder.getParent());
            FolderLock lock = FolderLock.take(folder.resolveSibling("." + folder.getFileName() + ".lock"))
                    .orElseThrow(() -> new OutputFault(given.toString(), "another run is writing this folder",
                            "wait until it ends, or choose another folder"));
            OutputFolder open = new OutputFolder(folder, staging, lock, disk);
            open.clear();
            Files.createDirectory(staging);
            return open;
        } catch (IOException unwritable) {
            throw OutputFault.of(given.toString(), unwritable);
        }
    }

    /** Returns the folder as it will be seen. */
    public Path folder() {
        return folder;
    }

    /** Returns, and makes, the place where a step's files are collected. */
    public Path step(String id) throws IOException {
        return Files.createDirectories(staging.resolve(id));
    }

    /**
     * Writes a file of the results.
     *
     * @param name relative, for example {@code spectrum/modes.csv}
     * @param content writes the bytes
     */
    public void write(String name, WholeFile.Content content) throws IOException {
        Path file = staging.resolve(name);
        Files.createDirectories(file.getParent());
        try (OutputStream out = disk.create(file)) {
            content.write(out);
        }
    }

    /** Returns the files collected so far, relative and sorted. */
    public List<String> files() throws IOException {
        try (Stream<Path> inside = Files.walk(staging)) {
            return inside.filter(Files::isRegularFile).map(file -> staging.relativize(file).toString().replace('\\', '/'))
                    .sorted().toList();
        }
    }

    /**
     * Moves all files to their places; the last one tells that the rest is complete. Where results of an earlier run may lie, an
     * {@link UnfinishedRun} marks the folder meanwhile; what a run that was killed so had moved there goes too.
     *
     * @param begun when the run began, for the mark
     * @param earlier files that an earlier run left and this one did not make: removed, so that the folder tells of one
     *     run only
     * @param last name of the file to be moved last
     */
    public void publish(String begun, List<String> earlier, String last) throws IOException {
        List<String> files = new ArrayList<>(files());
        if (!Files.exists(folder)) {
            Files.move(staging, folder, StandardCopyOption.ATOMIC_MOVE);
            return;
        }
        files.remove(last);
        Set<String> stale = new TreeSet<>(earlier);
        UnfinishedRun.in(folder).ifPresent(killed -> stale.addAll(killed.files()));
        mark(new UnfinishedRun(begun, union(stale, files)));
        for (String name : files) {
            move(name);
        }
        stale.removeAll(files);
        stale.remove(last);
        for (String name : stale) {
            removeStale(folder.resolve(name).normalize());
        }
        move(last);
        Files.delete(folder.resolve(UnfinishedRun.NAME));
    }

    /** What neither run may leave behind: whichever is killed next, the one after it knows all that may lie there. */
    private static List<String> union(Set<String> stale, List<String> files) {
        Set<String> all = new TreeSet<>(stale);
        all.addAll(files);
        return List.copyOf(all);
    }

    private void mark(UnfinishedRun run) throws IOException {
        byte[] mark = run.write();
        write(UnfinishedRun.NAME, out -> out.write(mark));
        move(UnfinishedRun.NAME);
    }

    private void removeStale(Path stale) throws IOException {
        if (stale.startsWith(folder) && !stale.equals(folder)) {
            Files.deleteIfExists(stale);
            removeIfEmpty(stale.getParent());
        }
    }

    private void move(String name) throws IOException {
        Path target = folder.resolve(name);
        Files.createDirectories(target.getParent());
        Files.move(staging.resolve(name), target, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    }

    private void removeIfEmpty(Path inner) throws IOException {
        if (inner.equals(folder) || !Files.isDirectory(inner)) {
            return;
        }
        try (Stream<Path> inside = Files.list(inner)) {
            if (inside.findAny().isPresent()) {
                return;
            }
        }
        Files.delete(inner);
    }

    private void clear() throws IOException {
        if (Files.exists(staging)) {
            WholeFolder.remove(staging);
        }
    }

    /** Removes what was not published and lets others write. */
    @Override
    public void close() {
        try {
            clear();
            lock.close();
        } catch (IOException left) {
            throw OutputFault.of(staging.toString(), left);
        }
    }
}
