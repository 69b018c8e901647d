package org.modestead.host.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.engine.FitFault;
import org.modestead.host.FakeNode;
import org.modestead.host.TestWorkflows;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;

/** Commands, exit codes, and what is said where. */
class CommandLineTest {

    @TempDir
    Path folder;

    private final ByteArrayOutputStream out = new ByteArrayOutputStream();
    private final ByteArrayOutputStream err = new ByteArrayOutputStream();
    private final List<Node> nodes = List.of(
            new FakeNode("source", (inputs, settings, context) -> settings.whole("level")),
            new FakeNode("pass", (inputs, settings, context) -> 0),
            new FakeNode("fail", (inputs, settings, context) -> {
                throw new FitFault("rank", "the rank 9 is above 4", "choose at most 4");
            }),
            new FakeNode("defect", (inputs, settings, context) -> {
                throw new IllegalStateException("a slip");
            }));

    @Test
    void runWritesResultsBesideTheWorkflowAndExitsWith0() throws IOException {
        TestWorkflows.write(folder, List.of("a:source", "b:pass"), List.of("a.table>b.a"));
        assertEquals(0, run("run", folder.toString()));
        assertEquals("value\n1.0\n", Files.readString(folder.resolve("out/a/table.csv")));
        assertTrue(out().endsWith("Report: " + folder.resolve("out/report.html") + "\n"), this::out);
        assertEquals("a: started\na: done in 0.0 s\nb: started\nb: done in 0.0 s\n",
                err().replaceAll("\\d\\.\\d s", "0.0 s"));
    }

    @Test
    void onlyTheTablesAskedForAreWrittenAndNoReport() throws IOException {
        TestWorkflows.write(folder, List.of("a:source", "b:pass"), List.of("a.table>b.a"));
        assertEquals(0, run("run", folder.toString(), "--only", "b.table"));
        assertTrue(Files.exists(folder.resolve("out/b/table.csv")));
        assertFalse(Files.exists(folder.resolve("out/a/table.csv")));
        assertFalse(Files.exists(folder.resolve("out/report.html")));
        assertEquals(2, run("run", folder.toString(), "--only", "b.tabel"));
        assertTrue(err().contains("--only b.tabel: no step gives such a table; there are a.table, b.table.\n"), this::err);
    }

    @Test
    void settingsAndFolderOfTheCommandLineCount() throws IOException {
        TestWorkflows.write(folder, List.of("a:source"), List.of());
        assertEquals(0, run("run", folder.resolve("workflow.json").toString(), "--out", folder.resolve("x/y")
                .toString(), "--set",
                "a.level=42"));
        assertEquals("value\n42.0\n", Files.readString(folder.resolve("x/y/a/table.csv")));
    }

    @Test
    void aFailedStepIsOneSentenceAndExitsWith1() throws IOException {
        TestWorkflows.write(folder, List.of("f:fail", "g:pass", "a:source"), List.of("f.table>g.a"));
        assertEquals(1, run("run", folder.toString()));
        assertTrue(err().contains("step f, rank: the rank 9 is above 4; choose at most 4.\n"), this::err);
        assertTrue(err().contains("step g: left out, because step f gave no result.\n"), this::err);
        assertTrue(err().contains("The results of the other steps are in " + folder.resolve("out") + ".\n"), this::err);
        assertTrue(Files.exists(folder.resolve("out/a/table.csv")));
        assertFalse(err().contains("\tat "), "no stack trace");
        assertTrue(Files.readString(folder.resolve("out/report.html")).contains("These results are not complete"));
    }

    @Test
    void aDefectIsOneSentenceWithALogThatHoldsTheDetails() throws IOException {
        TestWorkflows.write(folder, List.of("d:defect"), List.of());
        assertEquals(1, run("run", folder.toString()));
        assertTrue(err().contains("step d: an error in the program (IllegalStateException: a slip); please report it with "
                + "the log."),
                this::err);
        assertFalse(err().contains("\tat "), "no stack trace");
        String log = err().replaceAll("(?s).*Details: the log (\\S+)\\..*", "$1");
        assertTrue(Files.readString(Path.of(log)).contains("\tat org.modestead.host"), log);
        Files.delete(Path.of(log));
    }

    @Test
    void aWrongWorkflowIsToldWholeAndExitsWith2BeforeAnythingRuns() throws IOException {
        TestWorkflows.write(folder, List.of("a:sorce", "b:pass:{\"level\": 101}"), List.of("a.table>other.a"));
        assertEquals(2, run("run", folder.toString(), "--set", "b.levl=1", "--set", "nonsense"));
        assertEquals("""
                --set: "nonsense" is not of the form step.key=value; write for example --set fit.rank=8.
                workflow.json, step a, field node: there is no node "sorce", perhaps you meant source; use one of source, pass, \
                fail, defect.
                --set, step b, setting levl: no setting of that name in pass, perhaps you meant level; use one of level.
                workflow.json, step b, setting level: the number 101; use a whole number at least 0 and at most 100.
                workflow.json, link a.table -> other.a: there is no step "other"; use one of a, b.
                5 problems; nothing was run.
                """, err());
        assertFalse(Files.exists(folder.resolve("out")));
    }

    @Test
    void checkTellsWhatWouldRun() throws IOException {
        Path file = TestWorkflows.write(folder, List.of("a:source", "b:pass"), List.of("a.table>b.a"));
        assertEquals(0, run("check", file.toString()));
        assertEquals("workflow.json: nothing wrong; 2 steps would run.\n", out());
        assertEquals(2, run("check", file.toString(), "--set", "a.level=x"));
        assertTrue(err().startsWith("--set, step a, setting level: the text \"x\"; use a whole number"), this::err);
        assertFalse(Files.exists(folder.resolve("out")));
    }

    @Test
    void nodesListsAndExplains() {
        assertEquals(0, run("nodes"));
        assertEquals("Data\n  source  Serves a test.\n  pass    Serves a test.\n  fail    Serves a test.\n  defect  Serves "
                + "a test.\n",
                out());
        out.reset();
        assertEquals(0, run("nodes", "source"));
        assertTrue(out().contains("    level: whole number, at least 0 and at most 100, default 1.\n        A number.\n"),
                this::out);
        assertEquals(2, run("nodes", "sourc"));
        assertTrue(err().startsWith("There is no node \"sourc\", perhaps you meant source; use one of "), this::err);
    }

    @Test
    void everyRealNodeHasAPageWithinTheWidth() {
        for (Node node : TestWorkflows.allNodes().nodes()) {
            List<String> page = NodePage.lines(node.declaration());
            node.declaration().settings().forEach(setting -> assertTrue(
                    page.stream().anyMatch(line -> line.startsWith("    " + setting.key() + ": ")), setting.key()));
            page.forEach(line -> assertTrue(line.length() <= Paragraphs.WIDTH, line));
        }
    }

    @Test
    void helpVersionAndWrongCommandsAreAnswered() {
        assertEquals(0, run("--help"));
        assertTrue(out().contains("Exit codes: 0 done, 1 a step failed"), this::out);
        out.reset();
        assertEquals(0, run("--version"));
        assertTrue(out().startsWith("Modestead "), this::out);
        assertEquals(0, run("run", "--help"));
        assertEquals(2, run());
        assertEquals("A command is missing: run, check, nodes, reference or bench.\nTry: modestead --help\n", err());
        assertEquals(2, run("rnu"));
        assertEquals(2, run("run"));
        assertEquals(2, run("run", "none", "--oot"));
    }

    @Test
    void aBusyFolderIsRefusedInASentence() throws IOException {
        TestWorkflows.write(folder, List.of("a:source"), List.of());
        Files.writeString(folder.resolve("out"), "a file");
        assertEquals(1, run("run", folder.toString()));
        assertTrue(err().contains("this is not a folder that could be replaced; choose another folder."), this::err);
    }

    @Test
    void aPersonWatchingSeesOneLineThatIsClearedAtTheEnd() throws IOException {
        TestWorkflows.write(folder, List.of("a:source", "f:fail"), List.of());
        Terminal terminal = new Terminal(print(out), print(err), true);
        assertEquals(1, new CommandLineHost(terminal, () -> NodeCatalog.of(nodes)).run("run", folder.toString()));
        assertTrue(err().contains("\r["), this::err);
        assertTrue(err().contains("\rf: failed\n"), this::err);
    }

    private int run(String... arguments) {
        err.reset();
        Terminal terminal = new Terminal(print(out), print(err), false);
        return new CommandLineHost(terminal, () -> NodeCatalog.of(nodes)).run(arguments);
    }

    private static PrintStream print(ByteArrayOutputStream stream) {
        return new PrintStream(stream, true, StandardCharsets.UTF_8);
    }

    private String out() {
        return out.toString(StandardCharsets.UTF_8).replace("\r\n", "\n");
    }

    private String err() {
        return err.toString(StandardCharsets.UTF_8).replace("\r\n", "\n");
    }
}
