package org.modestead.host.run;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.BasicFileAttributes;
import java.nio.file.attribute.FileTime;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.util.HexFormat;
import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.host.output.UnfinishedRun;
import org.modestead.host.recent.RecentAnswers;

/**
 * What stands for a file that a step reads: place, size, time of change and a digest of its content. A file that has not changed since it
 * was digested is not read again. Thread-safe; no lock is held while a file is read.
 */
public final class FileMarks {

    /** Larger files count by size and time of change alone: reading them would cost more than it saves. */
    private static final long LARGEST_HASHED = 16L << 20;

    /** A file that changed this shortly before it was read may change again within one tick of the clock of its file system. */
    private static final long UNSETTLED_MILLIS = 2_000;

    private static final int MOST = 1000;

    private final RecentAnswers<Path, Known> known = new RecentAnswers<>(MOST);

    /** Remembers nothing yet. */
    public FileMarks() {}

    private record Known(long size, FileTime changed, String digest) {}

    /** Returns the mark of a file, or of all files in a folder, which is read as the table of its files. */
    String of(Path path) throws IOException {
        if (Files.isDirectory(path)) {
            StringBuilder files = new StringBuilder(path.toAbsolutePath().normalize().toString());
            try (Stream<Path> found = Files.list(path)) {
                for (Path file : found.filter(Files::isRegularFile).sorted().toList()) {
                    files.append(' ').append(file(file));
                }
            }
            return files.toString();
        }
        return Files.isRegularFile(path) ? file(path) : path + " missing";
    }

    private String file(Path path) throws IOException {
        Path place = path.toAbsolutePath().normalize();
        BasicFileAttributes facts = Files.readAttributes(path, BasicFileAttributes.class);
        return place + " " + facts.size() + " " + facts.lastModifiedTime().toMillis() + " " + (facts.size() <= LARGEST_HASHED ? digest(place, facts) : "")
                + (UnfinishedRun.doubtOf(place).isPresent() ? " unfinished" : "");
    }

    private String digest(Path place, BasicFileAttributes facts) throws IOException {
        Optional<Known> before = known.find(place).filter(mark -> mark.size() == facts.size() && mark.changed().equals(facts.lastModifiedTime()));
        if (before.isPresent()) {
            return before.get().digest();
        }
        long begun = System.currentTimeMillis();
        MessageDigest digest = Fingerprint.sha256();
        try (InputStream in = new DigestInputStream(Files.newInputStream(place), digest)) {
            in.transferTo(OutputStream.nullOutputStream());
        }
        String content = HexFormat.of().formatHex(digest.digest());
        if (begun - facts.lastModifiedTime().toMillis() > UNSETTLED_MILLIS) {
            known.keep(place, new Known(facts.size(), facts.lastModifiedTime(), content));
        }
        return content;
    }
}
