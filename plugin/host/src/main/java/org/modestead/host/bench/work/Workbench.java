package org.modestead.host.bench.work;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.concurrent.TimeUnit;
import java.util.function.Function;
import java.util.function.Supplier;
import org.modestead.host.bench.check.DialogData;
import org.modestead.host.bench.check.Fitting;
import org.modestead.host.bench.desk.Change;
import org.modestead.host.bench.desk.Desk;
import org.modestead.host.bench.desk.DeskFault;
import org.modestead.host.bench.desk.Edit;
import org.modestead.host.bench.desk.EditFault;
import org.modestead.host.bench.desk.LinkRules;
import org.modestead.host.bench.desk.StepEdit;
import org.modestead.host.bench.folders.FileSettings;
import org.modestead.host.bench.folders.MovedFiles;
import org.modestead.host.bench.folders.OpenedFolders;
import org.modestead.host.bench.run.BenchRun;
import org.modestead.host.bench.run.KeptResults;
import org.modestead.host.bench.run.Spans;
import org.modestead.host.bench.run.StepState;
import org.modestead.host.run.DefectLog;
import org.modestead.host.run.StepOutcome;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.host.workflow.RunPlan;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.words.Sentence;

/**
 * The desk that is open, if one is. Everything that changes it comes here, one after the other; whoever watches is told of every
 * change by a number that rises. What must be read of files to tell how steps stand is read without holding up anything else: a stop, or
 * the progress of a run, never waits for a file. Thread-safe.
 */
public final class Workbench implements AutoCloseable, BenchRun.Watcher {

    private final NodeCatalog catalog;
    private final KeptResults results;
    private final Overview overview;
    private final Looks looks;
    private OpenedFolders folders;
    private Optional<Desk> desk = Optional.empty();
    private Optional<BenchRun> run = Optional.empty();
    private Map<String, String> running = Map.of();
    private final Map<String, Ending> endings = new HashMap<>();
    private String last = "";
    private long revision;
    /** Rises with everything that makes {@link #found} out of date. */
    private long document;
    /** Held while files are read; never taken by who holds the workbench itself. */
    private final Object reading = new Object();
    private Optional<Overview.Found> found = Optional.empty();
    private Optional<DeskView> view = Optional.empty();

    /**
     * @param catalog nodes that may be used
     * @param results of earlier runs
     * @param folders that are open whatever workflow is
     */
    public Workbench(NodeCatalog catalog, KeptResults results, OpenedFolders folders) {
        this.catalog = catalog;
        this.results = results;
        this.folders = folders;
        this.overview = new Overview(catalog, results);
        this.looks = new Looks(this, results);
    }

    /** How a step ended without a result. */
    record Ending(String identity, StepState.Kind kind, String sentence) {}

    /** What an edit gives: the desk after it, and the steps that it made. */
    public record Edited(DeskView view, List<String> made) {

        /** Takes an immutable copy. */
        public Edited {
            made = List.copyOf(made);
        }
    }

    /** Puts another desk in the place of the one that is open, which is kept; where that cannot be, the open one stays. */
    public DeskView open(Supplier<Desk> opened) {
        Desk next;
        try {
            next = opened.get();
        } catch (DeskFault fault) {
            DeskView view = view();
            if (view.desk().filter(open -> fault.where().equals("desk " + open.id())).isPresent()) {
                return view;
            }
            throw fault;
        }
        leave();
        synchronized (this) {
            desk = Optional.of(next);
            changed();
        }
        return view();
    }

    /** Goes back to the start page; the desk is kept. */
    public DeskView leave() {
        stop();
        synchronized (this) {
            desk.ifPresent(Desk::close);
            desk = Optional.empty();
            endings.clear();
            last = "";
            changed();
        }
        return view();
    }

    /** Does edits, all or none, as one step of undo. */
    public Edited edit(List<Edit> edits, String label) {
        List<String> made = made(edits, label);
        return new Edited(view(), made);
    }

    private synchronized List<String> made(List<Edit> edits, String label) {
        Desk opened = opened();
        Workflow before = opened.timeline().current();
        Workflow document = before;
        List<String> made = new ArrayList<>();
        Map<String, String> latest = opened.latest();
        for (Edit edit : edits) {
            Change change = edit.apply(document, catalog);
            document = change.workflow();
            made.addAll(change.made());
            if (edit instanceof StepEdit.Rename rename && latest.containsKey(rename.step())) {
                opened.latest(Map.of(rename.id(), latest.get(rename.step())));
            }
        }
        if (!document.equals(before)) {
            opened.edit(document, label.isBlank() ? edits.get(0).words(before, catalog) : label);
            changed();
        }
        return made;
    }

    /** Takes the last edit back. */
    public DeskView undo() {
        synchronized (this) {
            opened().undo();
            changed();
        }
        return view();
    }

    /** Does again what was taken back. */
    public DeskView redo() {
        synchronized (this) {
            opened().redo();
            changed();
        }
        return view();
    }

    /**
     * Writes the workflow to its file, or to another one.
     *
     * @param name of another file; empty for its own
     */
    public Saved save(String name) {
        String told = write(name);
        return new Saved(view(), told);
    }

    /** What saving gives: the desk after it, and a sentence on what was changed for it; empty when nothing was. */
    public record Saved(DeskView view, String told) {}

    private synchronized String write(String name) {
        Desk opened = opened();
        Workflow document = opened.timeline().current();
        Path file = name.isBlank() ? document.file() : folders(document).inside(name, document.baseFolder());
        if (!file.getFileName().toString().endsWith(".json")) {
            throw new DeskFault("file " + file, "its name does not end in .json", "save as workflow.json");
        }
        opened.save(new MovedFiles(catalog, file)::moved);
        // the files of the steps are still there, and a person opened that folder
        folders = folders(document);
        changed();
        return MovedFiles.told(document, opened.timeline().current());
    }

    /**
     * Runs steps and all they need.
     *
     * @param steps to be run; empty for everything that is set up
     * @param again whether these run even though they have a result
     */
    public DeskView run(List<String> steps, boolean again) {
        synchronized (this) {
            idle();
            outdated();
        }
        withFound(known -> begun(known, steps, again)).ifPresent(BenchRun::start);
        return view();
    }

    private void idle() {
        if (run.isPresent()) {
            throw new DeskFault("run", "one is going on", "wait for its end, or stop it");
        }
    }

    /** Returns the run that is to be started; empty when there is nothing to do. */
    private Optional<BenchRun> begun(Overview.Found known, List<String> steps, boolean again) {
        idle();
        Desk opened = opened();
        RunPlan plan = new Plans(known, opened.timeline().current()).plan(steps, again);
        if (plan.steps().isEmpty()) {
            last = "Everything is up to date.";
            told();
            return Optional.empty();
        }
        running = known.identities();
        plan.steps().forEach(step -> endings.remove(step.id()));
        run = Optional.of(new BenchRun(plan, known.seconds(opened.latest()), results, again ? Set.copyOf(steps) : Set.of(), this));
        last = "";
        told();
        return run;
    }

    /** Stops what runs; over within a second. */
    public DeskView stop() {
        Optional<BenchRun> going;
        synchronized (this) {
            going = run;
        }
        going.ifPresent(BenchRun::stop);
        return view();
    }

    @Override
    public synchronized void began() {
        told();
    }

    @Override
    public synchronized void ended(PlannedStep step, StepOutcome outcome) {
        String identity = running.getOrDefault(step.id(), "");
        if (outcome instanceof StepOutcome.Done done) {
            if (!done.cached() || results.facts(identity).isEmpty()) {
                results.keep(step.declaration(), identity, done.result(), done.time().toNanos() / 1e9);
            }
            desk.ifPresent(opened -> opened.latest(Map.of(step.id(), identity)));
        } else if (outcome instanceof StepOutcome.Failed failed) {
            endings.put(step.id(), new Ending(identity, StepState.Kind.FAILED, failed.sentence()));
            failed.defect().ifPresent(DefectLog::write);
        }
        told();
    }

    @Override
    public synchronized void over(BenchRun from, Map<String, StepOutcome> outcomes, boolean stopped) {
        if (stopped) {
            from.states().keySet().forEach(step -> endings.put(step, new Ending(running.getOrDefault(step, ""), StepState.Kind.STOPPED,
                    "You stopped the run before this step was done. What was done before it is kept; run to here to go on.")));
        }
        long failed = outcomes.values().stream().filter(StepOutcome.Failed.class::isInstance).count();
        long done = outcomes.values().stream().filter(StepOutcome.Done.class::isInstance).count();
        last = stopped ? "Stopped." : failed > 0 ? Sentence.count(failed, "step") + " failed, " + done + " done."
                : Sentence.count(done, "step") + " done.";
        run = Optional.empty();
        changed();
    }

    private Desk opened() {
        return desk.orElseThrow(() -> new DeskFault("desk", "none is open", "open one first"));
    }

    private OpenedFolders folders(Workflow workflow) {
        return folders.and(workflow.baseFolder());
    }

    /** Returns the folders that are open now. */
    public synchronized OpenedFolders folders() {
        return desk.map(opened -> folders(opened.timeline().current())).orElse(folders);
    }

    /** The document or its files may be others now. */
    private void changed() {
        outdated();
        told();
    }

    private void outdated() {
        found = Optional.empty();
        document++;
    }

    /** A result that was told of is not there any more. */
    synchronized void lost() {
        told();
    }

    /** Something is to be told, but the document is the same. */
    private void told() {
        revision++;
        view = Optional.empty();
        notifyAll();
    }

    /** Returns the desk as it stands. */
    public DeskView view() {
        while (true) {
            read();
            synchronized (this) {
                if (view.isPresent() || desk.isEmpty() || found.isPresent()) {
                    return viewOf(found);
                }
            }
        }
    }

    private DeskView viewOf(Optional<Overview.Found> known) {
        DeskView now = view.orElseGet(() -> new DeskView(revision, desk.map(opened -> look(opened, known.orElseThrow()))));
        view = Optional.of(now);
        return now;
    }

    /** Returns all that is known of the document as it stands. */
    Overview.Found found() {
        return withFound(known -> known);
    }

    /** Asks, with the workbench held, something of what is known of the document as it stands. */
    private <T> T withFound(Function<Overview.Found, T> question) {
        while (true) {
            read();
            synchronized (this) {
                opened();
                if (found.isPresent()) {
                    return question.apply(found.get());
                }
            }
        }
    }

    /** Finds out what is not known of the open document; files are read while nobody waits but who needs what they tell. */
    private void read() {
        synchronized (reading) {
            Workflow workflow;
            OpenedFolders open;
            long before;
            synchronized (this) {
                if (desk.isEmpty() || found.isPresent()) {
                    return;
                }
                workflow = workflow();
                open = folders(workflow);
                before = document;
            }
            Overview.Found now = overview.look(workflow, open);
            synchronized (this) {
                if (document == before) {
                    found = Optional.of(now);
                }
            }
        }
    }

    /** Returns whether a desk is open; nothing is read for the answer. */
    public synchronized boolean isOpen() {
        return desk.isPresent();
    }

    /** Returns the document as it stands. */
    public synchronized Workflow workflow() {
        return opened().timeline().current();
    }

    /**
     * A step and what is shown of it.
     *
     * @param step as it stands
     * @param node of the step
     * @param known of the document
     * @param result names the result that can be looked at; empty without one
     */
    record Shown(Step step, Node node, Overview.Found known, Optional<String> result) {}

    /** Returns a step and what is shown of it, all of one moment. */
    Shown shown(String id) {
        return withFound(known -> {
            Step step = step(id);
            return new Shown(step, node(step), known, viewOf(found).desk().orElseThrow().standing().get(id).result());
        });
    }

    private Node node(Step step) {
        return catalog.find(step.node()).orElseThrow(() -> new DeskFault("step " + step.id(), "its node is not known", "remove the step"));
    }

    /** Returns the results of the open desk, to be looked at. */
    public Looks looks() {
        return looks;
    }

    /** Returns a step as it stands. */
    public synchronized Step step(String id) {
        return workflow().step(id).orElseThrow(() -> new DeskFault("step " + id, "there is no such step", "choose one that is there"));
    }

    /**
     * Returns what a dialog shows.
     *
     * @param id of the step
     * @param typed in the dialog so far
     */
    public DialogData dialog(String id, Map<String, Object> typed) {
        // judged when the workbench is free again: a file that was typed may be large
        return withFound(known -> {
            Step step = step(id);
            Node node = node(step);
            Workflow workflow = workflow();
            return (Supplier<DialogData>) () -> DialogData.of(step, node, typed, known.inspection().survey(),
                    changed -> FileSettings.problems(changed, workflow.baseFolder(), node.declaration(), folders(workflow)));
        }).get();
    }

    /** Returns what fits an end of a link. */
    public synchronized Fitting fitting(Link.End end, boolean output) {
        return Fitting.of(workflow(), catalog, end, output);
    }

    /** Returns why a link may not be drawn, empty when it may. */
    public synchronized Optional<EditFault> refusal(Link link) {
        return LinkRules.refusal(workflow(), catalog, link);
    }

    /**
     * Waits for a change.
     *
     * @param known revision that is known
     * @param millis longest to wait
     * @return the desk when it changed, empty when it did not
     */
    public Optional<DeskView> await(long known, long millis) throws InterruptedException {
        long end = System.nanoTime() + TimeUnit.MILLISECONDS.toNanos(millis);
        synchronized (this) {
            while (revision == known) {
                long left = TimeUnit.NANOSECONDS.toMillis(end - System.nanoTime() + 999_999);
                if (left <= 0) {
                    return Optional.empty();
                }
                wait(left);
            }
        }
        return Optional.of(view());
    }

    /** How the work of a run goes on. */
    public record Going(long revision, DeskView.RunView run, Map<String, StepState> states) {}

    /** Returns how the work goes on, empty when nothing runs. */
    public synchronized Optional<Going> going() {
        return run.map(begun -> new Going(revision, runView(), begun.states()));
    }

    private DeskView.Open look(Desk opened, Overview.Found known) {
        Workflow workflow = opened.timeline().current();
        return new DeskView.Open(opened.id(), workflow, known.ordered(), opened.isSaved(), opened.savedWords(), opened.recovered(),
                opened.timeline().undoLabel(), opened.timeline().redoLabel(), known.inspection(),
                known.standing(workflow, opened.latest(), endings, run), runView());
    }

    private DeskView.RunView runView() {
        if (run.isEmpty()) {
            return DeskView.RunView.idle(last);
        }
        BenchRun begun = run.get();
        OptionalDouble left = begun.secondsLeft();
        String words = begun.isStopping() ? "stopping" : begun.isKeeping() ? "keeping the results" : "running, " + (int) Math.floor(100 * begun.fraction()) + " %"
                + (left.isPresent() ? ", about " + Spans.words(left.getAsDouble()) + " left" : "");
        return new DeskView.RunView(true, words, begun.fraction(), left, begun.isStopping(), "");
    }

    /** Stops what runs and closes the desk; all is kept. */
    @Override
    public void close() {
        leave();
        results.close();
    }
}
