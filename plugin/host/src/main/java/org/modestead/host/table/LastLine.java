package org.modestead.host.table;

import java.io.IOException;
import java.io.InputStream;
import java.io.RandomAccessFile;
import java.nio.file.Files;
import java.util.stream.IntStream;
import java.util.zip.GZIPInputStream;

/**
 * Looks whether the last line of a CSV file has an end within reason. DuckDB refuses a line that is somewhat too long, but leaves out one
 * of tens of MB at the end of a file and says nothing. Only a pass over the whole text tells of a file that is gzipped.
 */
final class LastLine {

    /** Twice what DuckDB takes as one line, because a letter in UTF-16 takes twice the room; what is shorter it refuses itself. */
    static final int LONGEST = 2 * CsvRecords.LONGEST;

    /** No deflated byte stands for more. */
    private static final long MOST_UNPACKED = 1032;
    private static final int BLOCK = 1 << 16;

    private LastLine() {}

    /** @throws TableFault if the last line is longer than any table's, or the file cannot be read */
    static void requireEnd(CsvFormat format) {
        if (!Files.isRegularFile(format.path())) {
            return;
        }
        try {
            if (format.path().toString().endsWith(".gz") ? isLongPacked(format) : isLong(format)) {
                throw new TableFault(format.shown() + ", last line", "this line is longer than " + LONGEST + " bytes",
                        "check that lines end by line feeds, and that the file is a table");
            }
        } catch (IOException unreadable) {
            throw new TableFault(format.shown(), "the file cannot be read (" + unreadable.getMessage() + ")", "check that it is complete");
        }
    }

    private static boolean isLong(CsvFormat format) throws IOException {
        try (RandomAccessFile file = new RandomAccessFile(format.path().toFile(), "r")) {
            if (file.length() <= LONGEST) {
                return false;
            }
            byte[] last = new byte[LONGEST];
            file.seek(file.length() - LONGEST);
            file.readFully(last);
            int end = LONGEST;
            while (end > 0 && last[end - 1] <= '\r' && last[end - 1] >= 0) {
                end--;
            }
            return IntStream.range(0, end).noneMatch(i -> isEnd(last[i]));
        }
    }

    private static boolean isLongPacked(CsvFormat format) throws IOException {
        if (Files.size(format.path()) * MOST_UNPACKED <= LONGEST) {
            return false;
        }
        long line = 0;
        long lastWritten = 0;
        byte[] block = new byte[BLOCK];
        try (InputStream text = new GZIPInputStream(Files.newInputStream(format.path()), BLOCK)) {
            // what was interrupted ends when the database is asked next
            for (int length = text.read(block); length >= 0 && !Thread.currentThread().isInterrupted(); length = text.read(block)) {
                for (int i = 0; i < length; i++) {
                    line = isEnd(block[i]) ? 0 : line + 1;
                    lastWritten = line > 0 ? line : lastWritten;
                }
            }
        }
        return lastWritten > LONGEST;
    }

    private static boolean isEnd(byte letter) {
        return letter == '\n' || letter == '\r';
    }
}
