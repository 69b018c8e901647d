package org.modestead.host.workflow;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;

/** What is written is what was read, in the form in which people write it. */
class WorkflowTextTest {

    @Test
    void everyTestWorkflowIsTheSameAfterwards() throws IOException {
        try (var folders = Files.list(Path.of("..", "..", "test-workflows"))) {
            for (Path folder : folders.filter(path -> Files.exists(path.resolve("workflow.json"))).toList()) {
                Workflow workflow = WorkflowFile.read(folder).workflow().orElseThrow();
                assertEquals(workflow, WorkflowFile.parse(workflow.file(), WorkflowText.write(workflow)).workflow().orElseThrow(), folder.toString());
            }
        }
    }

    @Test
    void titlesNotesAndPlacesAreKept() {
        Path file = Path.of("/w/workflow.json");
        Step step = new Step("a", "table-source", Map.of("path", "x \"y\".csv"), new StepLabel("My file", "line 1\nline 2", OptionalInt.of(3)));
        Workflow workflow = new Workflow("n", file, List.of(step), List.of(), "remarks");
        String text = new String(WorkflowText.write(workflow), StandardCharsets.UTF_8);
        assertEquals(workflow, WorkflowFile.parse(file, text.getBytes(StandardCharsets.UTF_8)).workflow().orElseThrow());
        assertTrue(text.contains("\n    {\"id\": \"a\", \"node\": \"table-source\", \"title\": \"My file\", \"note\": \"line 1\\nline 2\", \"place\": 3, \"settings\": {\"path\": "
                + "\"x \\\"y\\\".csv\"}}\n"), text);
    }

    @Test
    void wrongLabelsAreProblems() {
        WorkflowFile.Reading reading = WorkflowFile.parse(Path.of("/w/workflow.json"), ("{\"format\": \"modestead-workflow/1\", \"notes\": 5, \"steps\": ["
                + "{\"id\": \"a\", \"node\": \"x\", \"title\": 7, \"place\": -1}]}").getBytes(StandardCharsets.UTF_8));
        assertEquals(List.of("workflow.json, step a, field place: the number -1; write a whole number from 0, the order among the steps of its stage.",
                "workflow.json, step a, field title: the number 7; write a text in quotes, or leave the field out.",
                "workflow.json, field notes: the number 5; write a text in quotes, or leave the field out."),
                reading.problems().stream().map(Problem::sentence).toList());
    }
}
