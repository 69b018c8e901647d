package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.locks.LockSupport;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.ChildProcess;
import org.modestead.host.TestWorkflows;
import org.modestead.host.output.UnfinishedRun;

/**
 * Processes that are killed at a moment drawn from a seed, over and over in the same folders: every file of a run is the one of before or
 * the new one, every edit and every save that was answered is there. {@code -Dkills=100} kills more often than the ordinary build, half
 * of them runs, half of them benches in the middle of edits and saves.
 */
class RandomKillsTest {

    private static final long SEED = 20261203;
    private static final int KILLS = Integer.getInteger("kills", 4);
    /** Half of the runs are killed while they move their files, which takes about so long, the others anywhere. */
    private static final int MOST_NANOS_OF_PUBLISHING = 5_000_000;
    /** Less to compile: a process of these is ready in half the time. */
    private static final List<String> QUICK = List.of("-Xmx256m", "-XX:TieredStopAtLevel=1", "-XX:+UseSerialGC");

    @TempDir
    Path folder;

    @BeforeEach
    void workflow() throws IOException {
        for (String name : List.of("old", "new")) {
            StringBuilder rows = new StringBuilder("time,x\n");
            for (int i = 0; i < 400; i++) {
                rows.append(i).append(',').append(StrictMath.cos((name.equals("old") ? 0.3 : 0.4) * i)).append('\n');
            }
            Files.writeString(folder.resolve(name + ".csv"), rows);
        }
        TestWorkflows.write(folder, List.of("source:table-source:{\"path\": \"old.csv\"}", "b:snapshot-builder:{\"time-column\": \"time\", \"delay-depth\": 4}",
                "fit:operator-fitter", "spectrum:spectrum-extractor:{\"intervals\": \"none\"}"),
                List.of("source.table>b.table", "b.snapshots>fit.snapshots", "fit.operator>spectrum.operator"));
    }

    @Test
    void everyFileOfARunIsTheOldOrTheNewOne() throws IOException, InterruptedException {
        long began = System.nanoTime();
        Map<String, String> oldFiles = finished("old");
        Map<String, String> newFiles = finished("new");
        long lasts = (System.nanoTime() - began) / 2;
        assertEquals(oldFiles.keySet(), newFiles.keySet());
        Random random = new Random(SEED);
        int mixed = 0;
        int marks = 0;
        for (int k = 0; k < KILLS / 2; k++) {
            ChildProcess run = start(k % 2 == 0 ? "old" : "new");
            if (k % 4 < 2) {
                run.process().waitFor((long) ((0.3 + 0.8 * random.nextDouble()) * lasts), TimeUnit.NANOSECONDS);
            } else {
                awaitPublishing(run.process());
                LockSupport.parkNanos(random.nextInt(MOST_NANOS_OF_PUBLISHING));
            }
            run.process().destroyForcibly().waitFor();
            Map<String, String> found = contents();
            boolean marked = found.remove(UnfinishedRun.NAME) != null;
            assertEquals(oldFiles.keySet(), found.keySet(), "kill " + k);
            boolean isMixed = isMixed(found, oldFiles, newFiles, "kill " + k);
            assertTrue(marked || !isMixed, "kill " + k + ": files of two runs lie beside each other unmarked");
            mixed += isMixed ? 1 : 0;
            marks += marked ? 1 : 0;
            new ObjectMapper().readTree(found.get("run.json"));
            assertTrue(found.get("report.html").strip().endsWith("</html>"), "kill " + k);
        }
        System.out.println(KILLS / 2 + " runs of " + lasts / 1_000_000 + " ms killed; then " + mixed + " folders held whole files of two runs, and " + marks + " were marked");
        boolean marked = Files.exists(folder.resolve("out").resolve(UnfinishedRun.NAME));
        ChildProcess after = start("new");
        assertEquals(0, after.exit(), after.said());
        assertEquals(marked, after.said().contains("files of two runs may lie beside each other"), after.said());
        assertEquals(tables(newFiles).toList(), tables(contents()).toList(), "the run after takes no harm");
        try (Stream<Path> beside = Files.list(folder)) {
            assertEquals(List.of(), beside.filter(path -> path.getFileName().toString().startsWith(".")).toList());
        }
    }

    @Test
    void theRunAfterAndWhoReadsTheFilesSayThatAFolderIsMixed() throws IOException, InterruptedException {
        finished("old");
        Files.writeString(folder.resolve("out").resolve(UnfinishedRun.NAME),
                "{\"format\": \"modestead-unfinished-run/1\", \"begun\": \"2026-12-04T03:00:00Z\", \"files\": [\"gone/table.csv\"]}");
        Files.writeString(Files.createDirectories(folder.resolve("out/gone")).resolve("table.csv"), "of the killed run");
        Files.createDirectory(folder.resolve("reader"));
        TestWorkflows.write(folder.resolve("reader"), List.of("source:table-source:{\"path\": \"../out/spectrum/modes.csv\"}"), List.of());
        String told = folder.resolve("out") + ": a run begun at 2026-12-04T03:00:00Z did not come to the end of moving its files here";
        assertTrue(finishedReader().contains(told));
        ChildProcess after = start("new");
        assertEquals(0, after.exit(), after.said());
        assertTrue(after.said().contains(told), after.said());
        assertEquals(Optional.empty(), UnfinishedRun.in(folder.resolve("out")));
        assertTrue(Files.notExists(folder.resolve("out/gone")), "what the killed run had moved there is gone");
        assertTrue(!finishedReader().contains("did not come to the end"));
    }

    /** Returns the record of a workflow that reads a table of the folder. */
    private String finishedReader() throws IOException, InterruptedException {
        ChildProcess run = ChildProcess.start(folder.resolve("said"), QUICK, "run", folder.resolve("reader").toString());
        assertEquals(0, run.exit(), run.said());
        return Files.readString(folder.resolve("reader/out/run.json"));
    }

    private static Stream<Map.Entry<String, String>> tables(Map<String, String> files) {
        return files.entrySet().stream().filter(file -> file.getKey().endsWith(".csv"));
    }

    /** The record is written last, just before files move to their places. */
    private void awaitPublishing(Process run) {
        while (run.isAlive() && !Files.exists(folder.resolve(".out.part").resolve("run.json"))) {
            Thread.onSpinWait();
        }
    }

    private static boolean isMixed(Map<String, String> found, Map<String, String> oldFiles, Map<String, String> newFiles, String kill) {
        Set<Boolean> seen = new HashSet<>();
        tables(found).forEach(file -> {
            boolean old = file.getValue().equals(oldFiles.get(file.getKey()));
            boolean fresh = file.getValue().equals(newFiles.get(file.getKey()));
            assertTrue(old || fresh, kill + ": " + file.getKey() + " is neither old nor new");
            if (old != fresh) {
                seen.add(old);
            }
        });
        return seen.size() > 1;
    }

    private ChildProcess start(String data) throws IOException {
        return ChildProcess.start(Files.createDirectories(folder.resolve("said")), QUICK, "run", folder.toString(), "--set", "source.path=" + data + ".csv");
    }

    private Map<String, String> finished(String data) throws IOException, InterruptedException {
        ChildProcess run = start(data);
        assertEquals(0, run.exit(), run.said());
        return contents();
    }

    private Map<String, String> contents() throws IOException {
        Map<String, String> files = new TreeMap<>();
        try (Stream<Path> inside = Files.walk(folder.resolve("out"))) {
            for (Path file : inside.filter(Files::isRegularFile).toList()) {
                files.put(folder.resolve("out").relativize(file).toString(), Files.readString(file));
            }
        }
        return files;
    }

    @Test
    void everyAnsweredEditAndSaveIsThere() throws IOException, InterruptedException {
        Random random = new Random(SEED);
        KilledBench bench = new KilledBench(folder, QUICK);
        for (int k = 0; k < (KILLS + 1) / 2; k++) {
            bench.killedAfter(random.nextInt(600));
            bench.check("kill " + k);
        }
        System.out.println((KILLS + 1) / 2 + " benches killed; " + bench.words());
    }
}
