package org.modestead.host.bench.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Random;
import java.util.stream.Stream;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import net.jqwik.api.lifecycle.AfterProperty;
import net.jqwik.api.lifecycle.BeforeProperty;
import org.modestead.host.TestWorkflows;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.host.workflow.WorkflowFile;
import org.modestead.host.workflow.WorkflowText;
import org.modestead.nodes.contract.NodeCatalog;

/** Whatever is done can be undone and done again, and is on disk before the next thing happens. */
class TimelinePropertiesTest {

    private static final NodeCatalog NODES = TestWorkflows.allNodes();
    /** Cut within the second letter of the word, of which only the first of two bytes is there. */
    private static final byte[] HALF_A_LINE = Arrays.copyOf("{\"do\":\"edit\",\"label\":\"d\u00e9".getBytes(StandardCharsets.UTF_8), 24);
    private Path root;

    @BeforeProperty
    void make() throws IOException {
        root = Files.createTempDirectory("modestead-desks");
    }

    @AfterProperty
    void remove() throws IOException {
        try (Stream<Path> all = Files.walk(root)) {
            for (Path path : all.sorted(Comparator.reverseOrder()).toList()) {
                Files.delete(path);
            }
        }
    }

    @Property(tries = 25, seed = "20261201")
    void undoingAllEditsGivesTheStartAndRedoingThemTheEnd(@ForAll long seed, @ForAll @IntRange(min = 1, max = 40) int edits) {
        Timeline timeline = Timeline.begin(start());
        List<Workflow> passed = new ArrayList<>(List.of(timeline.current()));
        Random random = new Random(seed);
        for (int i = 0; i < edits; i++) {
            timeline = edited(timeline, random);
            passed.add(timeline.current());
        }
        int moments = timeline.moments().size();
        for (int i = moments - 2; i >= 0; i--) {
            timeline = timeline.undo();
        }
        assertEquals(start(), timeline.current());
        assertTrue(timeline.undoLabel().isEmpty());
        while (timeline.redoLabel().isPresent()) {
            timeline = timeline.redo();
        }
        assertEquals(passed.get(passed.size() - 1), timeline.current());
    }

    @Property(tries = 15, seed = "20261201")
    void aDeskThatIsTakenUpAgainStandsWhereItWasLeft(@ForAll long seed, @ForAll @IntRange(min = 1, max = 25) int actions) throws IOException {
        DeskFolder folder = new DeskFolder(root);
        Path own = folder.fresh("property");
        Random random = new Random(seed);
        Desk desk = folder.begin(own, start());
        for (int i = 0; i < actions; i++) {
            act(desk, random);
        }
        Timeline left = desk.timeline();
        // the process is gone without closing anything: its lock goes with it, here by hand; the last line is cut in two
        Files.deleteIfExists(own.resolve(".lock"));
        Path journal = own.resolve("journal.jsonl");
        Files.write(journal, HALF_A_LINE, java.nio.file.StandardOpenOption.APPEND);
        try (Desk again = Desk.resume(own)) {
            assertEquals(left, again.timeline());
            assertEquals(left.undoLabel(), again.timeline().undoLabel());
            assertEquals(left.redoLabel(), again.timeline().redoLabel());
        }
        desk.close();
    }

    @Property(tries = 25, seed = "20261201")
    void theFileThatIsSavedHoldsTheDocument(@ForAll long seed, @ForAll @IntRange(min = 1, max = 30) int edits) {
        Timeline timeline = Timeline.begin(start());
        Random random = new Random(seed);
        for (int i = 0; i < edits; i++) {
            timeline = edited(timeline, random);
        }
        Workflow written = timeline.current();
        byte[] bytes = WorkflowText.write(written);
        assertEquals(written, WorkflowFile.parse(written.file(), bytes).workflow().orElseThrow(), () -> new String(bytes, StandardCharsets.UTF_8));
        assertEquals(new String(bytes, StandardCharsets.UTF_8), new String(WorkflowText.write(WorkflowFile.parse(written.file(), bytes).workflow().orElseThrow()),
                StandardCharsets.UTF_8));
    }

    private static Workflow start() {
        return new Workflow("start", Path.of("/desk/workflow.json"), List.of(), List.of());
    }

    private static void act(Desk desk, Random random) {
        int choice = random.nextInt(10);
        if (choice == 0 && desk.timeline().undoLabel().isPresent()) {
            desk.undo();
        } else if (choice == 1 && desk.timeline().redoLabel().isPresent()) {
            desk.redo();
        } else {
            Workflow before = desk.timeline().current();
            Timeline after = edited(desk.timeline(), random);
            if (!after.current().equals(before)) {
                desk.edit(after.current(), after.undoLabel().orElseThrow());
            }
        }
    }

    /** Does a random edit; one that is refused changes nothing. */
    private static Timeline edited(Timeline timeline, Random random) {
        Edit edit = edit(timeline.current(), random);
        try {
            Change change = edit.apply(timeline.current(), NODES);
            return timeline.then(change.workflow(), edit.words(timeline.current(), NODES));
        } catch (EditFault refused) {
            return timeline;
        }
    }

    private static Edit edit(Workflow workflow, Random random) {
        List<String> ids = workflow.steps().stream().map(Step::id).toList();
        String some = ids.isEmpty() ? "none" : ids.get(random.nextInt(ids.size()));
        String other = ids.isEmpty() ? "none" : ids.get(random.nextInt(ids.size()));
        List<String> nodes = NODES.ids();
        return switch (random.nextInt(13)) {
            case 0, 1, 2 -> new StepEdit.Add(nodes.get(random.nextInt(nodes.size())), "", random.nextBoolean() ? "a title, \"quoted\"" : "", Map.of(), OptionalInt.empty(),
                    Optional.empty(), Optional.empty());
            case 3 -> new StepEdit.Remove(List.of(some));
            case 4 -> new StepEdit.Copy(List.of(some, other).stream().distinct().toList());
            case 5 -> new StepEdit.Rename(some, "renamed-" + random.nextInt(5));
            case 6, 7 -> anyLink(workflow, some, other, random);
            case 8 -> workflow.links().isEmpty() ? new LabelEdit.Notes("line 1\nline 2 \u00e9") : new LinkEdit.Disconnect(workflow.links().get(random.nextInt(workflow.links().size())));
            case 9 -> new SettingEdit.Replace(some, Map.of("rank", random.nextInt(9), "list", List.of(1.5, "x"), "flag", random.nextBoolean()));
            case 10 -> new LabelEdit.Note(some, "note " + random.nextInt());
            case 11 -> new LabelEdit.Move(some, random.nextInt(4));
            default -> new LabelEdit.Name("name " + random.nextInt(3));
        };
    }

    private static Edit anyLink(Workflow workflow, String from, String to, Random random) {
        List<String> outputs = workflow.step(from).map(step -> NODES.find(step.node()).orElseThrow().declaration().outputs().stream().map(port -> port.id()).toList())
                .orElse(List.of());
        List<String> inputs = workflow.step(to).map(step -> NODES.find(step.node()).orElseThrow().declaration().inputs().stream().map(port -> port.id()).toList())
                .orElse(List.of());
        if (outputs.isEmpty() || inputs.isEmpty()) {
            return new LabelEdit.Title(from, "t");
        }
        return new LinkEdit.Connect(new Link(new Link.End(from, outputs.get(random.nextInt(outputs.size()))),
                new Link.End(to, inputs.get(random.nextInt(inputs.size())))), random.nextBoolean());
    }
}
