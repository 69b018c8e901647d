package org.modestead.host.bench.start;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.security.SecureRandom;
import java.time.Duration;
import java.time.Instant;
import java.util.HexFormat;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.host.bench.desk.DeskFault;
import org.modestead.host.output.WholeFolder;

/**
 * Files that were dropped on the page, each in a folder of its own until a desk takes it.
 *
 * @param folder of all uploads
 * @param limit most bytes of one file
 */
public record Uploads(Path folder, long limit) {

    private static final Duration KEPT = Duration.ofDays(7);
    private static final int ID_BYTES = 8;
    private static final int BUFFER = 1 << 16;
    private static final int LONGEST_NAME = 100;

    /** Told that a file is too large. */
    public static final class TooLarge extends org.modestead.engine.Fault {
        private static final long serialVersionUID = 1L;

        private TooLarge(long limit) {
            super("file", "it is larger than " + (limit >> 20) + " MB", "put it into a folder that is open to the bench, or start it with a larger --upload");
        }
    }

    /** Takes a file; nothing of it stays when it is too large or the sender breaks off. */
    public String take(String name, InputStream in, long announced) {
        if (announced > limit) {
            throw new TooLarge(limit);
        }
        byte[] random = new byte[ID_BYTES];
        new SecureRandom().nextBytes(random);
        String id = "u-" + HexFormat.of().formatHex(random);
        Path file = folder.resolve(id).resolve(plain(name));
        boolean whole = false;
        try {
            tidy();
            Files.createDirectories(file.getParent());
            try (OutputStream out = Files.newOutputStream(file)) {
                copy(in, out);
            }
            whole = true;
            return id;
        } catch (IOException broken) {
            throw new DeskFault("file " + name, "it did not arrive whole (" + broken.getMessage() + ")", "drop it again");
        } finally {
            if (!whole) {
                remove(file.getParent());
            }
        }
    }

    private void copy(InputStream in, OutputStream out) throws IOException {
        byte[] buffer = new byte[BUFFER];
        long all = 0;
        for (int read = in.read(buffer); read >= 0; read = in.read(buffer)) {
            all += read;
            if (all > limit) {
                throw new TooLarge(limit);
            }
            out.write(buffer, 0, read);
        }
    }

    /** Returns the file of an upload. */
    public Path file(String id) {
        Path own = folder.resolve(id);
        if (id.matches("u-[0-9a-f]+") && Files.isDirectory(own)) {
            try (Stream<Path> inside = Files.list(own)) {
                Optional<Path> found = inside.filter(Files::isRegularFile).findFirst();
                if (found.isPresent()) {
                    return found.get();
                }
            } catch (IOException unreadable) {
                throw new DeskFault("file " + id, "it cannot be read (" + unreadable.getMessage() + ")", "drop it again");
            }
        }
        throw new DeskFault("file " + id, "it is no longer there", "drop it again");
    }

    /**
     * Puts an upload beside a workflow.
     *
     * @param target folder, made if missing
     * @return the file there; another name where that one is taken by another file
     */
    public Path into(String id, Path target) {
        Path file = file(id);
        try {
            Files.createDirectories(target);
            String name = file.getFileName().toString();
            int dot = name.lastIndexOf('.');
            Path place = target.resolve(name);
            for (int number = 2; Files.exists(place) && Files.mismatch(place, file) >= 0; number++) {
                place = target.resolve(dot < 0 ? name + "-" + number : name.substring(0, dot) + "-" + number + name.substring(dot));
            }
            Files.copy(file, place, StandardCopyOption.REPLACE_EXISTING);
            return place;
        } catch (IOException unwritable) {
            throw new DeskFault("folder " + target, "the file cannot be put there (" + unwritable.getMessage() + ")", "make room, or allow writing there");
        }
    }

    /** A name that is a name everywhere, and never a path. */
    private static String plain(String name) {
        String last = name.substring(Math.max(name.lastIndexOf('/'), name.lastIndexOf('\\')) + 1);
        String safe = last.replaceAll("[^\\p{L}\\p{N}._ -]", "_").replaceAll("^[. ]+", "").strip();
        String cut = safe.length() > LONGEST_NAME ? safe.substring(safe.length() - LONGEST_NAME) : safe;
        return cut.isEmpty() ? "recording.csv" : cut;
    }

    /** Removes what nobody took for days. */
    private void tidy() throws IOException {
        if (!Files.isDirectory(folder)) {
            return;
        }
        Instant oldest = Instant.now().minus(KEPT);
        try (Stream<Path> all = Files.list(folder)) {
            List<Path> old = all.filter(own -> Instant.ofEpochMilli(own.toFile().lastModified()).isBefore(oldest)).toList();
            old.forEach(Uploads::remove);
        }
    }

    private static void remove(Path folder) {
        if (!Files.isDirectory(folder)) {
            return;
        }
        try {
            WholeFolder.remove(folder);
        } catch (IOException left) {
            // it is tried again when the next file comes
            folder.toFile().deleteOnExit();
        }
    }
}
