package org.modestead.host.table;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.sun.management.ThreadMXBean;
import java.io.IOException;
import java.io.OutputStream;
import java.lang.management.ManagementFactory;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Arrays;
import java.util.List;
import java.util.zip.GZIPOutputStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A line, a quoted cell or bytes without end, which a small compressed file can hold, are refused with a sentence in bounded memory. */
class EndlessLineTest {

    private static final int LENGTH = 128 << 20;
    /** The header is looked at by up to six passes of a few MB each; gathering the line would allocate several times its 134 MB. */
    private static final long MOST_BYTES = 100_000_000;

    @TempDir
    Path folder;

    @Test
    void aLineWithoutEnd() throws IOException {
        assertRefused(bomb("", 'x', ""), "t.csv.gz, line 1: this line is longer than 2000000 characters; "
                + "check that lines end by line feeds, and that the file is a table.");
    }

    @Test
    void aLineWithoutEndAfterAHeader() throws IOException {
        assertRefused(bomb("time,flow\n0,1\n", 'x', "\n2,3\n"), "t.csv.gz, line 3: this line is longer than 2000000 characters; "
                + "check that lines end by line feeds, and that the file is a table.");
    }

    @Test
    void aQuotedCellThatNeverCloses() throws IOException {
        assertRefused(bomb("time,flow\n0,\"", '\n', ""), "t.csv.gz, line 2: a quote \" opens here and does not close within 2000000 characters; "
                + "close it, or write \"\" for a quote inside quotes.");
    }

    @Test
    void aSkippedLineWithoutEndIsSkipped() throws IOException {
        Path file = bomb("", 'x', "\ntime,flow\n0,1\n");
        long before = allocated();
        assertEquals(List.of("0|1"), Steps.rows(Steps.source(folder, file.getFileName().toString(), "skip-lines", 1)));
        assertTrue(allocated() - before < MOST_BYTES, (allocated() - before) + " bytes");
    }

    /** What is not text is looked for without gathering its line. */
    @Test
    void aByteThatIsNotTextAtTheEndOfALongLine() throws IOException {
        Path file = bomb("time,flow\n", 'x', "");
        try (OutputStream end = new GZIPOutputStream(Files.newOutputStream(file, StandardOpenOption.APPEND))) {
            end.write(0xff);
        }
        long before = allocated();
        assertEquals(2, EncodingScan.firstBadLine(new CsvFormat(file, "t.csv.gz", ',', true, StandardCharsets.UTF_8, 0)).orElseThrow());
        assertTrue(allocated() - before < MOST_BYTES, (allocated() - before) + " bytes");
    }

    /** The database would leave it out and say nothing. */
    @Test
    void aLastLineOfFortyMegabytesInAPlainFile() throws IOException {
        for (String end : List.of("", "\n", "\r\n")) {
            Path file = folder.resolve("t.csv");
            byte[] block = new byte[40 << 20];
            Arrays.fill(block, (byte) '1');
            Files.writeString(file, "time,flow\n0,1\n2,");
            Files.write(file, block, StandardOpenOption.APPEND);
            Files.writeString(file, end, StandardOpenOption.APPEND);
            assertRefused(file, "t.csv, last line: this line is longer than 4000000 bytes; "
                    + "check that lines end by line feeds, and that the file is a table.");
        }
    }

    /** The database would leave out this one too. */
    @Test
    void aLastLineOfFortyMegabytesInAPackedFile() throws IOException {
        for (String end : List.of("", "\n", "\r\n")) {
            assertRefused(packed("time,flow\n0,1\n2,", '1', 40, end), "t.csv.gz, last line: this line is longer than 4000000 bytes; "
                    + "check that lines end by line feeds, and that the file is a table.");
        }
        assertEquals(List.of("0|1", "2|" + "1".repeat(1 << 20)),
                Steps.rows(Steps.source(folder, packed("time,flow\n0,1\n2,", '1', 1, "\n").getFileName().toString(), "text-columns", List.of("flow"))));
    }

    /** Its line feeds end no line; such a last line is not left out either, whether its quote closes or not. */
    @Test
    void aQuotedLastCellOfFortyMegabytesOfLineFeeds() throws IOException {
        String rows = "0,1\n".repeat(3000);
        for (String end : List.of("", "\"", "\"\n")) {
            Path plain = folder.resolve("t.csv");
            byte[] block = new byte[40 << 20];
            Arrays.fill(block, (byte) '\n');
            Files.writeString(plain, "time,note\n" + rows + "2,\"x");
            Files.write(plain, block, StandardOpenOption.APPEND);
            Files.writeString(plain, "x" + end, StandardOpenOption.APPEND);
            String told = ", line 3002: a quote \" opens here and does not close within 2000000 characters; close it, or write \"\" for a quote inside quotes.";
            assertRefused(plain, "t.csv" + told);
            assertRefused(packed("time,note\n" + rows + "2,\"x", '\n', 40, "x" + end), "t.csv.gz" + told);
        }
    }

    /** What the database refuses by itself begins below what is looked for. */
    @Test
    void aLastLineOfThreeMegabytesIsRefusedAndOneOfOneIsRead() throws IOException {
        Files.writeString(folder.resolve("t.csv"), "time,note\n0,a\n2," + "x".repeat(3_900_000));
        assertThrows(TableFault.class, () -> Steps.rows(Steps.source(folder, "t.csv")));
        Files.writeString(folder.resolve("t.csv"), "time,note\n0,a\n2," + "x".repeat(1_000_000));
        assertEquals(2, Steps.rows(Steps.source(folder, "t.csv")).size());
        Files.writeString(folder.resolve("t.csv"), "time,note\n0,a\n" + "2,x\n".repeat(1_200_000));
        assertEquals(1_200_001, Steps.rows(Steps.source(folder, "t.csv")).size());
    }

    @Test
    void aLetterCutByABlockIsText() throws IOException {
        Path file = folder.resolve("t.csv");
        Files.writeString(file, "x" + "\u00e9".repeat(100_000) + "\n\u20ac" + "\ud83d\ude00".repeat(50_000) + "\n");
        CsvFormat format = new CsvFormat(file, "t.csv", ',', true, StandardCharsets.UTF_8, 0);
        assertTrue(EncodingScan.firstBadLine(format).isEmpty());
        Files.write(file, new byte[] {(byte) 0xe2, (byte) 0x82}, StandardOpenOption.APPEND);
        assertEquals(3, EncodingScan.firstBadLine(format).orElseThrow(), "a letter cut by the end");
    }

    private void assertRefused(Path file, String sentence) {
        long before = allocated();
        String told = assertThrows(TableFault.class, () -> Steps.rows(Steps.source(folder, file.getFileName().toString()))).getMessage();
        assertTrue(allocated() - before < MOST_BYTES, (allocated() - before) + " bytes");
        assertEquals(sentence, told);
    }

    private static long allocated() {
        return ((ThreadMXBean) ManagementFactory.getThreadMXBean()).getThreadAllocatedBytes(Thread.currentThread().getId());
    }

    private Path bomb(String head, char filler, String tail) throws IOException {
        return packed(head, filler, LENGTH >> 20, tail);
    }

    private Path packed(String head, char filler, int blocks, String tail) throws IOException {
        Path file = folder.resolve("t.csv.gz");
        byte[] block = new byte[1 << 20];
        Arrays.fill(block, (byte) filler);
        try (OutputStream out = new GZIPOutputStream(Files.newOutputStream(file), 1 << 16)) {
            out.write(head.getBytes(StandardCharsets.UTF_8));
            for (int k = 0; k < blocks; k++) {
                out.write(block);
            }
            out.write(tail.getBytes(StandardCharsets.UTF_8));
        }
        return file;
    }
}
