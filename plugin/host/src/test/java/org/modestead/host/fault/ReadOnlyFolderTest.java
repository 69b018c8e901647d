package org.modestead.host.fault;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.engine.Fault;
import org.modestead.host.SmallDisk;
import org.modestead.host.TestWorkflows;
import org.modestead.host.bench.TestBench;
import org.modestead.host.cli.CommandLineHost;
import org.modestead.host.cli.Terminal;

/** Whatever is to be written into a folder on a disk that may only be read is refused with one sentence, and what lies there stays as it is. */
class ReadOnlyFolderTest {

    private static final String SOURCE = "source:table-source:{\"path\": \"../t.csv\"}";
    private static final int EDITS = 3;

    @TempDir
    Path folder;

    private SmallDisk disk;
    private Path work;

    @BeforeEach
    void workflow() throws IOException {
        StringBuilder rows = new StringBuilder("time,x,y\n");
        for (int i = 0; i < 400; i++) {
            rows.append(i).append(',').append(StrictMath.cos(0.3 * i)).append(',').append(StrictMath.sin(0.3 * i)).append('\n');
        }
        Files.writeString(folder.resolve("t.csv"), rows);
        work = Files.createDirectory(folder.resolve("work"));
        disk = SmallDisk.over(Files.createDirectory(folder.resolve("disk")));
    }

    @AfterEach
    void unmount() {
        if (disk != null) {
            disk.close();
        }
    }

    @Test
    void aRunIntoIt() throws IOException {
        TestWorkflows.write(work, List.of(SOURCE, "q:table-query"), List.of("source.table>q.input"));
        Path out = disk.folder().resolve("out");
        assertEquals("", command(0, "run", work.toString(), "--out", out.toString()));
        Map<String, String> before = forbidWriting();
        assertEquals(out + ": the folder " + out + " may not be written; allow writing there or choose another folder.\n",
                command(1, "run", work.toString(), "--out", out.toString()));
        Path fresh = disk.folder().resolve("fresh/out");
        assertEquals(fresh + ": the folder " + disk.folder() + " may not be written; allow writing there or choose another folder.\n",
                command(1, "run", work.toString(), "--out", fresh.toString()));
        assertEquals(before, contents());
    }

    @Test
    void theReference() throws IOException {
        Path pages = disk.folder().resolve("pages");
        Map<String, String> before = forbidWriting();
        assertEquals(pages + ": the file cannot be written (Read-only file system); choose a folder that can be written.\n", command(1, "reference", pages.toString()));
        assertEquals(before, contents());
    }

    @Test
    void tablesAndModelsWrittenByAStep() throws IOException {
        Path target = disk.folder().resolve("kept");
        for (String name : List.of(".csv", ".json", ".parquet")) {
            Files.writeString(disk.folder().resolve("kept" + name), "old");
        }
        Map<String, String> before = forbidWriting();
        for (String name : List.of(".csv", ".json", ".parquet")) {
            TestWorkflows.write(work, List.of(SOURCE, "sink:table-sink:{\"path\": \"" + target + name + "\"}"), List.of("source.table>sink.table"));
            String told = command(2, "run", work.toString());
            assertTrue(told.contains(target + name + ": the folder " + disk.folder() + " may not be written; allow writing there or choose another folder."), told);
        }
        TestWorkflows.write(work, List.of(SOURCE, "b:snapshot-builder:{\"time-column\": \"time\", \"delay-depth\": 4}", "fit:operator-fitter",
                "spectrum:spectrum-extractor:{\"intervals\": \"none\"}", "verdict:wellposedness-checker", "writer:model-writer:{\"file\": \"" + target + ".zip\"}"),
                List.of("source.table>b.table", "b.snapshots>fit.snapshots", "fit.operator>spectrum.operator", "b.snapshots>verdict.snapshots",
                        "fit.operator>verdict.operator", "spectrum.spectrum>verdict.spectrum", "fit.operator>writer.operator", "spectrum.spectrum>writer.spectrum",
                        "verdict.verdict>writer.verdict"));
        String told = command(2, "run", work.toString());
        assertTrue(told.contains("nothing can be written in the folder " + disk.folder() + "; allow writing there or choose another folder."), told);
        assertEquals(before, contents());
    }

    @Test
    void aSaveOfABenchIsRefusedAndTheEditsStay() throws IOException, InterruptedException {
        Path own = Files.createDirectory(disk.folder().resolve("own"));
        TestWorkflows.write(own, List.of("source:table-source:{\"path\": \"" + folder.resolve("t.csv") + "\"}", "b:snapshot-builder"), List.of("source.table>b.table"));
        Map<String, String> before = forbidWriting();
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), folder.resolve("desk"), Optional.of(own))) {
            edit(bench, EDITS);
            TestBench.Reply refused = bench.post("/api/save", "{}");
            assertTrue(refused.status() >= 400, refused.body());
            assertEquals(own.resolve("workflow.json") + ": the folder " + own + " may not be written; allow writing there or choose another folder.",
                    refused.sentence());
            assertEquals(EDITS, depth(bench.get("/api/desk").json()));
        }
        assertEquals(before, contents());
    }

    @Test
    void aDeskThereIsNotTakenUp() throws IOException, InterruptedException {
        Path desk = disk.folder().resolve("desk");
        TestWorkflows.write(work, List.of(SOURCE, "b:snapshot-builder"), List.of("source.table>b.table"));
        try (TestBench bench = TestBench.start(TestWorkflows.allNodes(), desk, Optional.of(work))) {
            edit(bench, EDITS);
        }
        Map<String, String> before = forbidWriting();
        String told = assertThrows(Fault.class, () -> TestBench.start(TestWorkflows.allNodes(), desk, Optional.of(work)).close()).getMessage();
        assertTrue(told.startsWith("desk folder " + desk) && told.contains("Read-only file system"), told);
        assertEquals(before, contents());
    }

    private static void edit(TestBench bench, int depth) throws IOException, InterruptedException {
        String edit = "{\"edits\": [{\"do\": \"set\", \"step\": \"b\", \"typed\": {\"delay-depth\": \"" + depth + "\"}}]}";
        assertEquals(200, bench.post("/api/edit", edit).status());
    }

    private static int depth(JsonNode desk) {
        return TestBench.step(desk, "b").path("settings").path("delay-depth").asInt();
    }

    /** Returns what is said on the error stream but for progress. */
    private static String command(int exit, String... arguments) {
        ByteArrayOutputStream err = new ByteArrayOutputStream();
        Terminal terminal = new Terminal(print(new ByteArrayOutputStream()), print(err), false);
        int found = new CommandLineHost(terminal, TestWorkflows::allNodes).run(arguments);
        String told = err.toString(StandardCharsets.UTF_8).lines().filter(line -> !line.matches("\\w+: (started|done in .*)")).map(line -> line + "\n").reduce("", String::concat);
        assertEquals(exit, found, told);
        return told;
    }

    private static PrintStream print(ByteArrayOutputStream stream) {
        return new PrintStream(stream, true, StandardCharsets.UTF_8);
    }

    private Map<String, String> forbidWriting() throws IOException {
        disk.forbidWriting();
        return contents();
    }

    /** Folders too, and what is hidden. */
    private Map<String, String> contents() throws IOException {
        Map<String, String> contents = new TreeMap<>();
        try (Stream<Path> inside = Files.walk(disk.folder())) {
            for (Path path : inside.toList()) {
                contents.put(path.toString(), Files.isRegularFile(path) ? Files.readString(path) : "");
            }
        }
        return contents;
    }
}
