package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.Writer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.ChildProcess;
import org.modestead.host.TestWorkflows;

/** A recording of 10^5 short runs, from the file to forecast and report, in a process of 1 GB. */
class ManyRunsTest {

    private static final int RUNS = 100_000;
    private static final int SAMPLES = 6;

    @TempDir
    Path folder;

    @Test
    void manyRunsGoThroughInBoundedMemory() throws IOException, InterruptedException {
        try (Writer rows = Files.newBufferedWriter(folder.resolve("t.csv"))) {
            rows.write("run,time,a,b\n");
            for (int i = 0; i < RUNS * SAMPLES; i++) {
                int run = i / SAMPLES;
                int k = i % SAMPLES;
                double size = StrictMath.exp(-0.02 * k);
                rows.write(run + "," + k + "," + size * StrictMath.cos(0.5 * k + run) + "," + size * StrictMath.sin(0.5 * k + run) + "\n");
            }
        }
        TestWorkflows.write(folder, List.of("source:table-source:{\"path\": \"t.csv\"}",
                "b:snapshot-builder:{\"time-column\": \"time\", \"run-column\": \"run\", \"delay-depth\": 2, \"holdout\": \"run-share\", \"calibration\": \"run-share\"}",
                "fit:operator-fitter", "s:spectrum-extractor", "c:wellposedness-checker", "f:forecast"),
                List.of("source.table>b.table", "b.snapshots>fit.snapshots", "fit.operator>s.operator", "b.snapshots>c.snapshots", "fit.operator>c.operator",
                        "s.spectrum>c.spectrum", "b.snapshots>f.snapshots", "fit.operator>f.operator", "s.spectrum>f.spectrum", "c.verdict>f.verdict"));
        ChildProcess run = ChildProcess.start(folder, List.of("-Xmx1g"), "run", folder.toString());
        assertEquals(0, run.exit(), run.said());
        try (Stream<String> forecast = Files.lines(folder.resolve("out/f/forecast.csv"))) {
            assertTrue(forecast.count() > RUNS, "every run is forecast");
        }
    }
}
