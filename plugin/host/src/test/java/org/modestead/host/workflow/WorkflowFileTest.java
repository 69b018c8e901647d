package org.modestead.host.workflow;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.RandomAccessFile;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The file format: what is read, and that nothing the person wrote is dropped in silence. */
class WorkflowFileTest {

    @TempDir
    Path folder;

    @Test
    void readsStepsSettingsAndLinksInFileOrder() throws IOException {
        WorkflowFile.Reading reading = read("""
                {"format": "modestead-workflow/1", "name": "Pumps",
                 "steps": [{"id": "b", "node": "x", "settings": {"rank": 8, "names": ["u", "v"], "none": null}},
                           {"id": "a", "node": "y"}],
                 "links": [{"from": "b.table", "to": "a.input"}]}""");
        assertEquals(List.of(), reading.problems());
        Workflow workflow = reading.workflow().orElseThrow();
        assertEquals("Pumps", workflow.name());
        assertEquals(List.of("b", "a"), workflow.steps().stream().map(Step::id).toList());
        assertEquals(List.of("u", "v"), workflow.steps().get(0).settings().get("names"));
        assertEquals(Map.of(), workflow.steps().get(1).settings());
        assertEquals(List.of("b.table -> a.input"), workflow.links().stream().map(Link::toString).toList());
        assertEquals(folder.toAbsolutePath().normalize(), workflow.baseFolder());
    }

    @Test
    void aFolderStandsForItsWorkflowFile() throws IOException {
        Files.writeString(folder.resolve("workflow.json"), "{\"format\": \"modestead-workflow/1\", \"steps\": [{\"id\": "
                + "\"a\", \"node\": \"x\"}]}");
        assertEquals(folder.getFileName().toString(), WorkflowFile.read(folder).workflow().orElseThrow().name());
    }

    @Test
    void brokenJsonIsNamedByLineAndColumn() throws IOException {
        String sentence = only("{\"format\": \"modestead-workflow/1\",\n \"steps\": [}");
        assertTrue(sentence.startsWith("w.json, line 2, column "), sentence);
        assertTrue(sentence.endsWith("correct the JSON there."), sentence);
        assertTrue(!sentence.contains("\n"), sentence);
    }

    @Test
    void aFieldGivenTwiceIsNamedByLine() throws IOException {
        String sentence = only("{\"format\": \"modestead-workflow/1\",\n \"name\": \"a\",\n \"name\": \"b\"}");
        assertTrue(sentence.startsWith("w.json, line 3, column ") && sentence.contains("name"), sentence);
    }

    @Test
    void textAfterTheEndIsRefused() throws IOException {
        assertTrue(only("{\"format\": \"modestead-workflow/1\"} {}").startsWith("w.json, line 1"));
    }

    @Test
    void everythingWrongIsToldAtOnce() throws IOException {
        List<String> sentences = sentences("""
                {"format": "modestead-workflow/9", "nam": "x", "name": 7,
                 "steps": [{"id": "a b", "node": "x"}, {"id": "c", "node": 3, "setings": {}, "settings": []}, 5,
                           {"id": "d", "node": "x"}, {"id": "D", "node": "x"}],
                 "links": [{"from": "c", "to": "d.x"}, {"from": "c.t", "to": "d.x", "via": "e"}, "c.t"]}""");
        assertEquals(List.of(
                "w.json, field format: the text \"modestead-workflow/9\"; write \"modestead-workflow/1\", the one format "
                + "this release "
                        + "knows.",
                "w.json, field nam: the workflow has no such field, perhaps you meant name; use format, name, steps, links, "
                        + "notes.",
                "w.json, entry 1 of steps, field id: the text \"a b\"; write an id of letters, digits, - and _ in quotes.",
                "w.json, step c, field setings: a step has no such field, perhaps you meant settings; use id, node, "
                + "settings, title, note, place.",
                "w.json, step c, field node: the number 3; write the id of a node in quotes.",
                "w.json, step c, field settings: a list; write an object, {\"key\": value}.",
                "w.json, entry 3 of steps: the number 5; write an object, { ... }.",
                "w.json, step D, field id: a second step with this id; give every step an id of its own (capital letters "
                + "make no "
                        + "difference).",
                "w.json, entry 1 of links, field from: the text \"c\"; write \"step.port\".",
                "w.json, field via: a link (entry 2 of links) has no such field; use from, to.",
                "w.json, entry 3 of links: the text \"c.t\"; write an object, { ... }.",
                "w.json, field name: the number 7; write a name in quotes, or leave the field out."), sentences);
    }

    @Test
    void missingFileFolderAndOtherContentAreNamed() throws IOException {
        assertTrue(WorkflowFile.read(folder.resolve("none.json")).problems().get(0).sentence()
                .contains("there is no such file"));
        assertTrue(WorkflowFile.read(folder).problems().get(0).sentence().contains("the folder holds no workflow.json"));
        assertEquals("w.json: the file holds a list, not an object; begin it with {\"format\": \"modestead-workflow/1\".",
                only("[]"));
        assertTrue(only("").startsWith("w.json: the file holds nothing"));
    }

    private String only(String text) throws IOException {
        List<String> sentences = sentences(text);
        assertEquals(1, sentences.size(), sentences::toString);
        return sentences.get(0);
    }

    private List<String> sentences(String text) throws IOException {
        return read(text).problems().stream().map(Problem::sentence).toList();
    }

    private WorkflowFile.Reading read(String text) throws IOException {
        return WorkflowFile.read(Files.writeString(folder.resolve("w.json"), text));
    }

    @Test
    void aFileLargerThanAnyWorkflowIsRefusedUnread() throws IOException {
        Path file = folder.resolve("workflow.json");
        try (RandomAccessFile sparse = new RandomAccessFile(file.toFile(), "rw")) {
            sparse.setLength(3L << 30);
        }
        assertEquals(List.of(file + ": the file is larger than 16 MB; give a workflow file."),
                WorkflowFile.read(file).problems().stream().map(Problem::sentence).toList());
    }
}
