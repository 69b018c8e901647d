package org.modestead.host.run;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.DirectoryIteratorException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Optional;

/**
 * Writes what a programmer needs of an error to a file, so that a person need not see it. An error of the same kind, from the same place in the
 * program, is written once, and no more than {@value #MOST} files are kept, so that no number of errors fills the folder.
 */
public final class DefectLog {

    /** Files that one temporary folder holds at most. */
    static final int MOST = 100;

    private static final String NAME = "modestead-error-";
    private static final int DIGITS = 12;
    private static final int DEEPEST = 50;

    private DefectLog() {}

    /** Writes the log, if none tells of the same error already; returns how to find it. */
    public static String write(Throwable defect) {
        return write(defect, Path.of(System.getProperty("java.io.tmpdir")));
    }

    /** Writes the log to a folder. */
    static String write(Throwable defect, Path folder) {
        try {
            String name = NAME + place(defect) + "-";
            List<Path> kept = kept(folder);
            Optional<Path> known = kept.stream().filter(file -> file.getFileName().toString().startsWith(name)).findFirst();
            if (known.isEmpty() && kept.size() >= MOST) {
                return "this sentence (" + folder + " holds " + MOST + " files " + NAME + "*.log already; remove them to have a new one)";
            }
            return "the log " + (known.isPresent() ? known.get() : fresh(defect, Files.createTempFile(folder, name, ".log")));
        } catch (IOException unwritable) {
            return "this sentence (no log could be written: " + unwritable.getMessage() + ")";
        }
    }

    private static Path fresh(Throwable defect, Path file) throws IOException {
        try (PrintWriter writer = new PrintWriter(Files.newBufferedWriter(file))) {
            writer.println(versions());
            defect.printStackTrace(writer);
        }
        return file;
    }

    private static List<Path> kept(Path folder) throws IOException {
        List<Path> kept = new ArrayList<>();
        try (DirectoryStream<Path> found = Files.newDirectoryStream(folder, NAME + "*.log")) {
            found.forEach(file -> {
                if (Files.isRegularFile(file, LinkOption.NOFOLLOW_LINKS) && Files.isReadable(file)) {
                    kept.add(file);
                }
            });
        } catch (DirectoryIteratorException unreadable) {
            throw unreadable.getCause();
        }
        return kept;
    }

    /** Names the place of an error by the digest of its trace; its words are left out, since they may hold anything that was read. */
    private static String place(Throwable defect) {
        MessageDigest digest = Fingerprint.sha256();
        digest.update(versions().getBytes(StandardCharsets.UTF_8));
        int depth = 0;
        // a cause may lead back to itself
        for (Throwable cause = defect; cause != null && depth < DEEPEST; cause = cause.getCause(), depth++) {
            digest.update(cause.getClass().getName().getBytes(StandardCharsets.UTF_8));
            for (StackTraceElement frame : cause.getStackTrace()) {
                digest.update(frame.toString().getBytes(StandardCharsets.UTF_8));
            }
        }
        return HexFormat.of().formatHex(digest.digest()).substring(0, DIGITS);
    }

    private static String versions() {
        return "Modestead " + Versions.modestead() + ", Java " + System.getProperty("java.version");
    }
}
