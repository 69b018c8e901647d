package org.modestead.host.output;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.channels.OverlappingFileLockException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Optional;
import java.util.concurrent.ThreadLocalRandom;

/** Keeps two processes from writing one result folder; let go by the system even when the process is killed. */
public final class FolderLock implements AutoCloseable {

    private static final int LONGEST_MARK = 1 << 16;

    private final Path file;
    private final FileChannel channel;

    private FolderLock(Path file, FileChannel channel) {
        this.file = file;
        this.channel = channel;
    }

    /** Takes the lock, or returns empty when another process or run has it. */
    public static Optional<FolderLock> take(Path file) throws IOException {
        while (true) {
            FileChannel channel = FileChannel.open(file, StandardOpenOption.CREATE, StandardOpenOption.READ,
                    StandardOpenOption.WRITE);
            boolean held = false;
            try {
                FileLock lock = channel.tryLock();
                if (lock == null) {
                    return Optional.empty();
                }
                // The holder before may have removed the file between our opening and our locking it: then try again.
                held = owns(file, channel);
                if (held) {
                    return Optional.of(new FolderLock(file, channel));
                }
            } catch (OverlappingFileLockException sameProcess) {
                return Optional.empty();
            } finally {
                if (!held) {
                    channel.close();
                }
            }
        }
    }

    /**
     * Tells whether the name still leads to the locked file, by giving the file a length that no other has. It must not
     * be opened a second time: POSIX lets a lock go when any of a process's handles of the file is closed.
     */
    private static boolean owns(Path file, FileChannel channel) throws IOException {
        int length = ThreadLocalRandom.current().nextInt(1, LONGEST_MARK);
        channel.truncate(0);
        channel.write(ByteBuffer.wrap(" ".repeat(length).getBytes(StandardCharsets.UTF_8)), 0);
        return Files.exists(file) && Files.size(file) == length;
    }

    @Override
    public void close() throws IOException {
        Files.deleteIfExists(file);
        channel.close();
    }
}
