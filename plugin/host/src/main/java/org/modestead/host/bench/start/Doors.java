package org.modestead.host.bench.start;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.modestead.host.bench.desk.Desk;
import org.modestead.host.bench.desk.DeskFault;
import org.modestead.host.bench.desk.DeskFolder;
import org.modestead.host.bench.folders.OpenedFolders;
import org.modestead.host.bench.recording.RecordingGuess;
import org.modestead.host.bench.recording.RecordingPlan;
import org.modestead.host.bench.recording.RecordingWish;
import org.modestead.host.workflow.Problem;
import org.modestead.host.workflow.Workflow;
import org.modestead.host.workflow.WorkflowFile;
import org.modestead.nodes.contract.NodeCatalog;

/**
 * Opens desks.
 *
 * @param desks where they are kept
 * @param uploads files that were brought
 * @param folders that are open
 * @param catalog nodes that may be used
 */
public record Doors(DeskFolder desks, Uploads uploads, OpenedFolders folders, NodeCatalog catalog) {

    /** An empty desk. */
    public Desk empty(String name) {
        String called = name.isBlank() ? "New workflow" : name.strip();
        Path folder = desks.fresh(called);
        return desks.begin(folder, new Workflow(called, folder.resolve(WorkflowFile.DEFAULT_NAME), List.of(), List.of()));
    }

    /** A copy of an example. */
    public Desk example(String id) {
        Path folder = desks.fresh(id);
        return desks.begin(folder, Examples.copy(id, folder, catalog));
    }

    /** A desk of another day. */
    public Desk resume(String id) {
        return desks.resume(id);
    }

    /** A workflow file inside the opened folders. */
    public Desk open(String path) {
        return desks.open(folders.inside(path, folders.roots().get(0)));
    }

    /** A workflow that was dropped on the page: its files must be found from the desk's folder, or by full names. */
    public Desk dropped(String text, String name) {
        Path place = desks.root().resolve(WorkflowFile.DEFAULT_NAME);
        WorkflowFile.Reading reading = WorkflowFile.parse(place, text.getBytes(StandardCharsets.UTF_8));
        Optional<Problem> broken = reading.broken();
        Workflow workflow = reading.workflow().filter(found -> broken.isEmpty()).orElseThrow(() -> new DeskFault(name.isBlank() ? "workflow" : name,
                broken.orElseThrow().key() + ": " + broken.get().seen(), broken.get().wanted()));
        return desks.begin(desks.fresh(workflow.name()), workflow);
    }

    /**
     * The steps for a recording that was brought.
     *
     * @param upload its id
     * @param wish what the person said of it
     * @param name of the workflow; empty for the file's
     */
    public Desk recording(String upload, RecordingWish wish, String name) {
        Path brought = uploads.file(upload);
        RecordingGuess guess = RecordingGuess.of(brought, wish);
        if (!guess.problems().isEmpty()) {
            throw new DeskFault(brought.getFileName().toString(), guess.problems().get(0), "correct the columns or the file");
        }
        String file = brought.getFileName().toString();
        String called = name.isBlank() || name.equals(file) ? file.replaceAll("\\.[A-Za-z0-9.]+$", "") : name;
        Path folder = desks.fresh(called);
        Path data = uploads.into(upload, folder.resolve("data"));
        return desks.begin(folder, RecordingPlan.workflow(guess, called, "data/" + data.getFileName(), folder.resolve(WorkflowFile.DEFAULT_NAME)));
    }
}
