package org.modestead.host.bench.work;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.host.bench.check.Inspection;
import org.modestead.host.bench.check.RememberedForesight;
import org.modestead.host.bench.desk.Bands;
import org.modestead.host.bench.desk.Change;
import org.modestead.host.bench.desk.Edit;
import org.modestead.host.bench.desk.EditFault;
import org.modestead.host.bench.desk.Timeline;
import org.modestead.host.bench.run.StepState;
import org.modestead.host.workflow.Problem;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.host.workflow.WorkflowChecker;
import org.modestead.nodes.contract.NodeCatalog;

/** The desk that is open, if one is. Everything that changes it comes here, one after the other. Thread-safe. */
public final class Workbench {

    private final NodeCatalog catalog;
    private final WorkflowChecker checker;
    private Optional<Timeline> timeline = Optional.empty();
    private long revision;

    /** @param catalog nodes that may be used */
    public Workbench(NodeCatalog catalog) {
        this.catalog = catalog;
        this.checker = new WorkflowChecker(catalog, new RememberedForesight());
    }

    /** What an edit gives: the desk after it, and the steps that it made. */
    public record Edited(DeskView view, List<String> made) {}

    /** Opens a document. */
    public synchronized DeskView open(Workflow workflow) {
        timeline = Optional.of(Timeline.begin(workflow));
        revision++;
        return view();
    }

    /** Does edits, all or none, as one step of undo. */
    public synchronized Edited edit(List<Edit> edits, String label) {
        Timeline before = opened();
        Workflow document = before.current();
        List<String> made = new ArrayList<>();
        for (Edit edit : edits) {
            Change change = edit.apply(document, catalog);
            document = change.workflow();
            made.addAll(change.made());
        }
        String words = label.isBlank() ? edits.get(0).words(before.current(), catalog) : label;
        timeline = Optional.of(before.then(document, words));
        revision++;
        return new Edited(view(), made);
    }

    /** Takes the last edit back. */
    public synchronized DeskView undo() {
        timeline = Optional.of(opened().undo());
        revision++;
        return view();
    }

    /** Does again what was taken back. */
    public synchronized DeskView redo() {
        timeline = Optional.of(opened().redo());
        revision++;
        return view();
    }

    private Timeline opened() {
        return timeline.orElseThrow(() -> new EditFault("desk", "none is open", "open one first"));
    }

    /** Returns the desk as it stands. */
    public synchronized DeskView view() {
        return new DeskView(revision, timeline.map(this::open));
    }

    private DeskView.Open open(Timeline timeline) {
        Workflow workflow = timeline.current();
        Inspection inspection = Inspection.of(workflow, checker.survey(workflow), List.of());
        Map<String, DeskView.Standing> standing = new LinkedHashMap<>();
        for (Step step : workflow.steps()) {
            standing.put(step.id(), new DeskView.Standing(state(inspection, step.id()), Optional.empty()));
        }
        Path file = workflow.file();
        return new DeskView.Open("desk", workflow, Bands.ordered(workflow, catalog), false, "not saved in " + file, "", timeline.undoLabel(),
                timeline.redoLabel(), inspection, standing, DeskView.RunView.idle(""));
    }

    private static StepState state(Inspection inspection, String step) {
        if (inspection.setUp(step)) {
            boolean first = inspection.survey().inputs().getOrDefault(step, Map.of()).isEmpty();
            return first ? StepState.of(StepState.Kind.READY, "") : StepState.of(StepState.Kind.WAITING, "A step before it has no result.");
        }
        List<Problem> problems = inspection.byStep().get(step);
        return StepState.of(StepState.Kind.UNSET, problems.isEmpty() ? "" : problems.get(0).seen() + "; " + problems.get(0).wanted() + ".");
    }
}
