package org.modestead.host.table;

import java.io.IOException;
import java.io.RandomAccessFile;
import java.nio.file.Files;
import java.util.stream.IntStream;

/**
 * Looks whether the last line of a CSV file has an end within reason. DuckDB refuses a line that is somewhat too long, but leaves out one
 * of tens of MB at the end of a file and says nothing. Files that are gzipped are not looked at: only a pass over the whole text would tell.
 */
final class LastLine {

    /** Twice what DuckDB takes as one line, because a letter in UTF-16 takes twice the room; what is shorter it refuses itself. */
    static final int LONGEST = 2 * CsvRecords.LONGEST;

    private LastLine() {}

    /** @throws TableFault if the last line is longer than any table's */
    static void requireEnd(CsvFormat format) {
        if (format.path().toString().endsWith(".gz") || !Files.isRegularFile(format.path())) {
            return;
        }
        try (RandomAccessFile file = new RandomAccessFile(format.path().toFile(), "r")) {
            if (file.length() <= LONGEST) {
                return;
            }
            byte[] last = new byte[LONGEST];
            file.seek(file.length() - LONGEST);
            file.readFully(last);
            int end = LONGEST;
            while (end > 0 && last[end - 1] <= '\r' && last[end - 1] >= 0) {
                end--;
            }
            if (IntStream.range(0, end).noneMatch(i -> last[i] == '\n' || last[i] == '\r')) {
                throw new TableFault(format.shown() + ", last line", "this line is longer than " + LONGEST + " bytes",
                        "check that lines end by line feeds, and that the file is a table");
            }
        } catch (IOException unreadable) {
            throw new TableFault(format.shown(), "the file cannot be read (" + unreadable.getMessage() + ")", "check that it is complete");
        }
    }
}
