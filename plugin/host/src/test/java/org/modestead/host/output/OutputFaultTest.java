package org.modestead.host.output;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileSystemException;
import org.junit.jupiter.api.Test;

/** Each way in which a system refuses to write more is told in words. */
class OutputFaultTest {

    private static final String NOTHING_LEFT = "; make room or choose a folder on another disk; nothing half-written was left.";

    @Test
    void noRoomOfAnyKind() {
        assertTold("the disk is full (No space left on device)" + NOTHING_LEFT, new IOException("No space left on device"));
        assertTold("the share of the disk that this person may use is full (Disk quota exceeded)" + NOTHING_LEFT, new IOException("Disk quota exceeded"));
        assertTold("the file would be larger than this system allows (File too large); allow larger files, or choose a folder on another disk; "
                + "nothing half-written was left.", new IOException("File too large"));
        assertTold("the share of the disk that this person may use is full (x: Disk quota exceeded)" + NOTHING_LEFT,
                new FileSystemException("x", null, "Disk quota exceeded"));
    }

    @Test
    void notAllowed() {
        assertTold("the file may not be written; allow writing there or choose another folder.", new AccessDeniedException("x"));
        assertTold("the file cannot be written (Read-only file system); choose a folder that can be written.",
                new FileSystemException("x", null, "Read-only file system"));
    }

    private static void assertTold(String sentence, IOException failure) {
        assertEquals("out: " + sentence, OutputFault.of("out", failure).getMessage());
    }
}
