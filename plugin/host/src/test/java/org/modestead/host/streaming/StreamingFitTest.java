package org.modestead.host.streaming;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.ChildProcess;
import org.modestead.host.TestWorkflows;

/** A folder of Parquet files that would not fit into memory is fitted in one pass, and later steps take the result like any other. */
class StreamingFitTest {

    /** {@code -Dstreaming.rows=10000000} for a long one. */
    private static final long ROWS = Long.getLong("streaming.rows", 1_000_000);
    private static final String SETTINGS = "{\"time-column\": \"time\", \"time-unit\": \"s\", \"run-column\": \"run\", \"delay-depth\": 8,"
            + " \"rank-rule\": \"fixed\", \"rank\": 4, \"stretch\": 1000, \"kept-samples\": 20000, \"seed\": 3}";

    private static final String FITTED = "fit: done in";

    @TempDir
    Path folder;

    /** In memory the rows alone would take 5 numbers of 8 bytes each, several times over; here memory is flat from a third of the rows on. */
    @Test
    void memoryDoesNotGrowWithRows() throws Exception {
        LongRecording.write(folder.resolve("data"), ROWS, Math.min(ROWS / 4, 1_250_000));
        TestWorkflows.write(folder, List.of("source:table-source:{\"path\": \"data\", \"copy\": false, \"memory\": 128}",
                "fit:streaming-fit:" + SETTINGS, "spectrum:spectrum-extractor:{}", "check:wellposedness-checker:{}",
                "forecast:forecast:{}"),
                List.of("source.table>fit.table", "fit.operator>spectrum.operator", "fit.snapshots>check.snapshots", "fit.operator>check.operator",
                        "spectrum.spectrum>check.spectrum", "fit.snapshots>forecast.snapshots", "fit.operator>forecast.operator",
                        "spectrum.spectrum>forecast.spectrum", "check.verdict>forecast.verdict"));
        ChildProcess child = ChildProcess.start(folder, List.of(ROWS > 1_000_000 ? "-Xmx256m" : "-Xmx80m", "-Xss1m"), "run", folder.toString());
        List<Long> used = watch(child);
        assertEquals(0, child.exit(), child.said());
        String fitted = child.said().lines().filter(line -> line.contains(FITTED)).findFirst().orElseThrow();
        System.out.println(ROWS + " rows, " + fitted.strip() + ", resident megabytes meanwhile " + used);
        if (!used.isEmpty()) {
            requireFlat(used);
        }
        modesAreFound();
    }

    /** Java and DuckDB have their limits; what a Java takes besides, code and stacks, is about as much again. Long runs show a slope. */
    private static void requireFlat(List<Long> used) {
        int quarter = used.size() / 4;
        long before = used.subList(quarter, 2 * quarter).stream().mapToLong(Long::longValue).max().orElse(0);
        long after = used.subList(2 * quarter, used.size()).stream().mapToLong(Long::longValue).max().orElse(0);
        assertTrue(ROWS > 1_000_000 ? after < 1.15 * before : after < 400, "resident megabytes " + used);
    }

    /** Resident megabytes every half second while rows are read, where the system tells them. */
    private static List<Long> watch(ChildProcess child) throws Exception {
        List<Long> used = new ArrayList<>();
        Path status = Path.of("/proc", Long.toString(child.process().pid()), "status");
        while (child.process().isAlive() && Files.exists(status) && !child.said().contains(FITTED)) {
            Files.readAllLines(status).stream().filter(line -> line.startsWith("VmRSS:"))
                    .forEach(line -> used.add(Long.parseLong(line.replaceAll("\\D", "")) / 1024));
            Thread.sleep(500);
        }
        return used;
    }

    private void modesAreFound() throws Exception {
        List<String> lines = Files.readAllLines(folder.resolve("out/check/modes.csv"));
        List<String> head = List.of(lines.get(0).split(","));
        Map<Double, Double> found = lines.stream().skip(1).map(line -> line.split(",")).collect(Collectors.toMap(
                cells -> Double.parseDouble(cells[head.indexOf("frequency")]), cells -> Double.parseDouble(cells[head.indexOf("lambda_real")])));
        // the motion is exactly linear between restarts: only rounding is left
        assertTrue(found.entrySet().stream().anyMatch(mode -> near(mode, 0.5, -0.05)), found.toString());
        assertTrue(found.entrySet().stream().anyMatch(mode -> near(mode, 1.3, -0.12)), found.toString());
        assertTrue(lines.stream().skip(1).allMatch(line -> line.contains("stands") || line.contains("settles")), lines.toString());
        assertTrue(Files.size(folder.resolve("out/forecast/scores.csv")) > 100);
    }

    private static boolean near(Map.Entry<Double, Double> mode, double frequency, double rate) {
        return Math.abs(mode.getKey() - frequency) < 1e-6 && Math.abs(mode.getValue() - rate) < 1e-6;
    }
}
