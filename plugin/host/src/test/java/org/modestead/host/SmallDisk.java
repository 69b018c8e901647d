package org.modestead.host;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.concurrent.TimeUnit;

/**
 * A file system of one megabyte in memory, gone when it is closed. Where none can be mounted, the test is skipped and says so.
 *
 * @param folder that shows it
 */
public record SmallDisk(Path folder) implements AutoCloseable {

    private static final int SIZE = 1 << 20;
    private static final int PIECE = 1 << 10;

    /** Puts it over a folder. */
    public static SmallDisk over(Path folder) {
        assumeTrue(command("mount", "-t", "tmpfs", "-o", "size=" + SIZE, "tmpfs", folder.toString()) == 0,
                "a small file system can be mounted (needs root on Linux)");
        return new SmallDisk(folder);
    }

    /** Writes a file until nothing more goes in; only the last pages of other files still have room. */
    public void fill(String name) {
        try (var channel = Files.newByteChannel(folder.resolve(name), StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE)) {
            for (int written = 0; written < SIZE; written += PIECE) {
                channel.write(ByteBuffer.allocate(PIECE));
            }
        } catch (IOException full) {
            assertEquals("No space left on device", full.getMessage());
        }
    }

    /** From now on nobody may write on it, the superuser neither; nothing on it may be open for writing. */
    public void forbidWriting() {
        assertEquals(0, command("mount", "-o", "remount,ro", folder.toString()), "nothing on the small disk is being written");
    }

    @Override
    public void close() {
        assertEquals(0, command("umount", folder.toString()), "nothing on the small disk is open any more");
    }

    private static int command(String... words) {
        try {
            Process process = new ProcessBuilder(words).redirectErrorStream(true).start();
            return process.waitFor(10, TimeUnit.SECONDS) ? process.exitValue() : -1;
        } catch (IOException unknown) {
            return -1;
        } catch (InterruptedException stopped) {
            Thread.currentThread().interrupt();
            throw new UncheckedIOException(new IOException("interrupted", stopped));
        }
    }
}
