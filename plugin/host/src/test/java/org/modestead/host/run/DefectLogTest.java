package org.modestead.host.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Errors are logged so that they can be found, and so that no number of them fills the folder. */
class DefectLogTest {

    @TempDir
    Path folder;

    @Test
    void anErrorFromTheSamePlaceIsWrittenOnceWhateverItSays() throws IOException {
        String first = "";
        for (int i = 0; i < 3; i++) {
            String told = DefectLog.write(new IllegalStateException("input " + i), folder);
            first = i == 0 ? told : first;
            assertEquals(first, told);
        }
        assertTrue(Files.readString(Path.of(first.substring("the log ".length()))).contains("IllegalStateException: input 0"), first);
        assertNotEquals(first, DefectLog.write(new IllegalStateException("elsewhere"), folder));
        assertEquals(2, files());
    }

    @Test
    void noMoreThanTheBoundAreKept() throws IOException {
        for (int i = 0; i < DefectLog.MOST + 20; i++) {
            IllegalStateException defect = new IllegalStateException("one");
            defect.setStackTrace(new StackTraceElement[] {new StackTraceElement("Some", "place", "Some.java", i)});
            String told = DefectLog.write(defect, folder);
            assertEquals(i < DefectLog.MOST, told.startsWith("the log "), told);
        }
        assertEquals(DefectLog.MOST, files());
    }

    @Test
    void anErrorWhoseCausesGoInACircleIsWritten() throws IOException {
        IllegalStateException one = new IllegalStateException("one");
        one.initCause(new IllegalArgumentException("two", one));
        assertTrue(DefectLog.write(one, folder).startsWith("the log "));
        assertEquals(1, files());
    }

    private long files() throws IOException {
        try (Stream<Path> inside = Files.list(folder)) {
            return inside.count();
        }
    }
}
