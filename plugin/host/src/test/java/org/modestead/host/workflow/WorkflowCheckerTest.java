package org.modestead.host.workflow;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;

/** What a workflow can be wrong in, against the real nodes: each kind in one sentence with place, value and remedy. */
class WorkflowCheckerTest {

    @TempDir
    Path folder;

    @BeforeEach
    void data() throws IOException {
        Files.writeString(folder.resolve("pumps.csv"), "time,flow,note\n0,1.5,a\n1,2.5,b\n2,1.0,c\n");
    }

    @Test
    void aRightWorkflowIsPlannedInRunningOrder() throws IOException {
        Path file = TestWorkflows.write(folder, List.of("build:snapshot-builder:{\"time-column\": \"time\", \"channels\": "
                + "[\"flow\"]}",
                "source:table-source:{\"path\": \"pumps.csv\"}"), List.of("source.table>build.table"));
        RunPlan plan = TestWorkflows.plan(file, TestWorkflows.allNodes());
        assertEquals(List.of("source", "build"), plan.order().stream().map(PlannedStep::id).toList());
        assertEquals(List.of("build", "source"), plan.steps().stream().map(PlannedStep::id).toList());
    }

    @Test
    void unknownNodeIsNamedWithTheNearest() throws IOException {
        assertStarts("workflow.json, step s, field node: there is no node \"table-sorce\", perhaps you meant table-source; "
                + "use one of ",
                only(List.of("s:table-sorce"), List.of()));
    }

    @Test
    void unknownSettingIsNamedWithTheNearest() throws IOException {
        assertStarts("workflow.json, step s, setting delimitr: no setting of that name in table-source, perhaps you meant "
                + "delimiter; "
                + "use one of path, ", only(List.of("s:table-source:{\"path\": \"pumps.csv\", \"delimitr\": \"x\"}"),
                List.of()));
    }

    @Test
    void wrongTypeRangeAndChoiceAreNamedWithTheValue() throws IOException {
        List<String> problems = problems(List.of("s:table-source:{\"path\": \"pumps.csv\", \"header\": \"yes\", "
                + "\"memory\": 3, "
                + "\"decimal\": \"dot\"}"), List.of());
        assertEquals(List.of(
                "workflow.json, step s, setting header: the text \"yes\"; use true or false, without quotes.",
                "workflow.json, step s, setting decimal: the text \"dot\"; use one of point, comma.",
                "workflow.json, step s, setting memory: the number 3; use a whole number at least 128 and at most 1048576 "
                + "MB."),
                problems);
    }

    @Test
    void missingFileIsNamedEvenWhenOtherSettingsAreWrong() throws IOException {
        List<String> problems = problems(List.of("s:table-source:{\"path\": \"pump.csv\", \"memory\": \"x\"}"), List.of());
        assertEquals(2, problems.size(), problems::toString);
        assertStarts("workflow.json, step s, setting path: there is no file pump.csv, perhaps you meant pumps.csv; name a "
                + "file relative "
                + "to ", problems.get(1));
    }

    @Test
    void aMissingFileIsToldOnce() throws IOException {
        List<String> problems = problems(List.of("s:table-source:{\"path\": \"nothing.csv\"}"), List.of());
        assertEquals(1, problems.size(), problems::toString);
        assertStarts("workflow.json, step s, setting path: there is no file nothing.csv", problems.get(0));
    }

    @Test
    void unknownStepAndPortOfALinkAreNamed() throws IOException {
        List<String> steps = List.of("s:table-source:{\"path\": \"pumps.csv\"}", "q:table-query");
        assertEquals("workflow.json, link other.table -> q.input: there is no step \"other\"; use one of s, q.",
                problems(steps, List.of("other.table>q.input")).get(0));
        assertEquals("workflow.json, link s.tabl -> q.input: step s has no output \"tabl\", perhaps you meant table; use "
                + "one of table.",
                problems(steps, List.of("s.tabl>q.input")).get(0));
        assertEquals("workflow.json, link s.table -> s.table: step s has no input \"table\"; remove the link: the step has "
                + "no input.",
                problems(steps, List.of("s.table>q.input", "s.table>s.table")).get(0));
    }

    @Test
    void aPortOfAnotherTypeIsRefusedInWords() throws IOException {
        List<String> problems = problems(List.of("s:table-source:{\"path\": \"pumps.csv\"}", "f:operator-fitter"),
                List.of("s.table>f.snapshots"));
        assertEquals("workflow.json, link s.table -> f.snapshots: a Table cannot feed an input that takes Snapshots; link "
                + "an output of type "
                + "Snapshots to f.snapshots.", problems.get(0));
    }

    @Test
    void twoLinksIntoOneInputAreNamed() throws IOException {
        assertEquals("workflow.json, link t.table -> q.input: input q.input is already fed by s.table; keep one of the two "
                + "links.",
                only(List.of("s:table-source:{\"path\": \"pumps.csv\"}", "t:table-source:{\"path\": "
                + "\"pumps.csv\"}", "q:table-query"),
                        List.of("s.table>q.input", "t.table>q.input")));
    }

    @Test
    void aMissingLinkIsNamedWithWhatWouldFit() throws IOException {
        assertEquals("workflow.json, step q, input input: nothing is linked to it; link an output of type Table to "
                + "q.input, for example "
                + "s.table.", only(List.of("s:table-source:{\"path\": \"pumps.csv\"}", "q:table-query"), List.of()));
    }

    @Test
    void aCircleIsNamedByItsSteps() throws IOException {
        List<String> problems = problems(List.of("a:table-query", "b:table-query", "c:table-query", "d:table-query"),
                List.of("a.table>b.input", "b.table>c.input", "c.table>a.input", "c.table>d.input"));
        assertEquals(List.of("workflow.json, links: the steps a -> b -> c -> a feed each other in a circle; remove one of "
                + "the links "
                + "between them."), problems);
    }

    @Test
    void columnsAreHeldAgainstTheFileAndTheQuery() throws IOException {
        List<String> steps = List.of("s:table-source:{\"path\": \"pumps.csv\"}",
                "q:table-query:{\"sql\": \"SELECT time, flow AS pumped, note FROM input\"}",
                "b:snapshot-builder:{\"time-column\": \"tme\", \"channels\": [\"flow\", \"pumped\"]}");
        List<String> problems = problems(steps, List.of("s.table>q.input", "q.table>b.table"));
        assertEquals(2, problems.size(), problems::toString);
        assertStarts("workflow.json, step b, setting time-column: the input has no column tme, perhaps you meant time;",
                problems.get(0));
        assertStarts("workflow.json, step b, setting channels: the input has no column flow; choose a column of type ",
                problems.get(1));
        assertTrue(problems.get(1).contains("pumped"), problems.get(1));
    }

    @Test
    void aBrokenFileIsToldBeforeRunning() throws IOException {
        Files.writeString(folder.resolve("pumps.csv"), "time,flow\n0,1\n1,x\n2,3\n");
        assertStarts("workflow.json, step s, pumps.csv, row 2 (line 3), column flow: the text \"x\"",
                only(List.of("s:table-source:{\"path\": \"pumps.csv\"}"), List.of()));
    }

    @Test
    void aWrongQueryIsToldBeforeRunning() throws IOException {
        List<String> steps = List.of("s:table-source:{\"path\": \"pumps.csv\"}", "q:table-query:{\"sql\": \"SELECT flwo "
                + "FROM input\"}",
                "p:table-query:{\"sql\": \"DROP TABLE input\"}", "r:table-query:{\"sql\": \"SELECT 1;\\n SELECT , 2\"}");
        List<String> problems = problems(steps, List.of("s.table>q.input", "s.table>p.input", "s.table>r.input"));
        assertEquals(3, problems.size(), problems::toString);
        assertTrue(problems.get(0).contains("flwo") && problems.get(0).endsWith("correct the query."), problems.get(0));
        assertEquals("workflow.json, step p, setting sql: the query is not a SELECT; write one SELECT over input, input2 "
                + "and input3.",
                problems.get(1));
        assertTrue(problems.get(2).contains("at line 2, column "), problems.get(2));
    }

    @Test
    void settingsOfTheCommandLineReplaceAndAreChecked() throws IOException {
        Path file = TestWorkflows.write(folder, List.of("s:table-source:{\"path\": \"none.csv\"}"), List.of());
        RunPlan plan = TestWorkflows.plan(file,
                TestWorkflows.allNodes(), "s.path=pumps.csv", "s.missing=a,b", "s.header=true");
        assertEquals(List.of("a", "b"), plan.steps().get(0).settings().texts("missing"));
        List<String> problems = TestWorkflows.problems(file,
                TestWorkflows.allNodes(), "s.path=pumps.csv", "s.memory=much", "s.hedar=true",
                "other.path=x");
        assertEquals(3, problems.size(), problems::toString);
        assertStarts("--set, step s, setting hedar: no setting of that name in table-source, perhaps you meant header",
                problems.get(0));
        assertStarts("--set, step s, setting memory: the text \"much\"", problems.get(1));
        assertEquals("--set: the workflow has no step \"other\"; use one of s.", problems.get(2));
    }

    private String only(List<String> steps, List<String> links) throws IOException {
        List<String> problems = problems(steps, links);
        assertEquals(1, problems.size(), problems::toString);
        return problems.get(0);
    }

    private List<String> problems(List<String> steps, List<String> links) throws IOException {
        List<String> problems = TestWorkflows.problems(TestWorkflows.write(folder, steps, links), TestWorkflows.allNodes());
        problems.forEach(sentence -> assertTrue(!sentence.contains("\n"), "one sentence"));
        return problems;
    }

    private static void assertStarts(String beginning, String text) {
        assertTrue(text.startsWith(beginning), text);
    }
}
