package org.modestead.host.run;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.time.Instant;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A file is read again when it changed, and only then. */
class FileMarksTest {

    private static final FileTime LONG_AGO = FileTime.from(Instant.parse("2020-01-01T00:00:00Z"));

    @TempDir
    private Path folder;

    private Path file(String text, FileTime changed) throws IOException {
        Path file = Files.writeString(folder.resolve("data.csv"), text);
        Files.setLastModifiedTime(file, changed);
        return file;
    }

    @Test
    void anUnchangedFileIsNotReadAgain() throws IOException {
        FileMarks marks = new FileMarks();
        String before = marks.of(file("aaaa", LONG_AGO));
        // another content behind the same size and time: whoever reads sees it, whoever remembers does not
        assertEquals(before, marks.of(file("bbbb", LONG_AGO)));
        assertNotEquals(before, new FileMarks().of(folder.resolve("data.csv")));
        assertNotEquals(before, marks.of(file("bbbb", FileTime.from(Instant.parse("2020-01-01T00:00:01Z")))), "it changed");
        assertNotEquals(before, marks.of(file("aaaaa", LONG_AGO)), "it is longer");
    }

    @Test
    void aFileThatHasJustChangedIsReadEachTime() throws IOException {
        FileMarks marks = new FileMarks();
        FileTime now = FileTime.from(Instant.now());
        String before = marks.of(file("aaaa", now));
        assertNotEquals(before, marks.of(file("bbbb", now)));
    }

    @Test
    void aFolderIsAllItsFilesAndAMissingFileIsToldOf() throws IOException {
        FileMarks marks = new FileMarks();
        file("aaaa", LONG_AGO);
        String before = marks.of(folder);
        Files.writeString(folder.resolve("more.csv"), "b");
        assertNotEquals(before, marks.of(folder));
        assertEquals(folder.resolve("none") + " missing", marks.of(folder.resolve("none")));
    }
}
