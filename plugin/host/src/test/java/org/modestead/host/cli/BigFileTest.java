package org.modestead.host.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.BufferedWriter;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.ChildProcess;
import org.modestead.host.TestWorkflows;

/** A file three times as large as the memory of Java is read, queried and written row by row. */
class BigFileTest {

    private static final int ROWS = 5_500_000;
    private static final long LEAST_BYTES = 300_000_000;

    @TempDir
    Path folder;

    @Test
    void aFileOf300MegabytesRunsIn96() throws Exception {
        write(folder.resolve("big.csv"));
        assertTrue(Files.size(folder.resolve("big.csv")) > LEAST_BYTES);
        TestWorkflows.write(folder, List.of("source:table-source:{\"path\": \"big.csv\", \"copy\": false, \"memory\": 128}",
                "sum:table-query:{\"sql\": \"SELECT run, count(*) AS n, sum(flow) AS total FROM input GROUP BY run ORDER "
                + "BY run\"}",
                "copy:table-sink:{\"path\": \"copy.csv\"}"),
                List.of("source.table>sum.input", "source.table>copy.table"));
        ChildProcess child = ChildProcess.start(folder, List.of("-Xmx96m"), "run", folder.toString());
        assertEquals(0, child.exit(), child.said());
        assertEquals("run,n,total\n0,2750000,2750000.0\n1,2750000,5500000.0\n",
                Files.readString(folder.resolve("out/sum/table.csv")));
        assertEquals(-1, Files.mismatch(folder.resolve("big.csv"), folder.resolve("copy.csv")), "written as it was read");
        try (Stream<Path> inside = Files.list(folder.resolve("out/source"))) {
            assertEquals(0, inside.count(), "no copy in the results when switched off");
        }
    }

    private static void write(Path file) throws IOException {
        String padding = "pump house north, duty pump " + "x".repeat(12);
        try (BufferedWriter writer = Files.newBufferedWriter(file)) {
            writer.write("time,run,flow,note\n");
            for (int i = 0; i < ROWS; i++) {
                int run = i < ROWS / 2 ? 0 : 1;
                writer.write(i + "," + run + "," + (run + 1) + ",\"" + padding + "\"\n");
            }
        }
    }
}
