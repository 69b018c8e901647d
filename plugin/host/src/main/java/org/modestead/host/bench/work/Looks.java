package org.modestead.host.bench.work;

import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.function.Function;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.host.bench.desk.DeskFault;
import org.modestead.host.bench.folders.FileSettings;
import org.modestead.host.bench.folders.OpenedFolders;
import org.modestead.host.bench.run.KeptResults;
import org.modestead.host.run.RunDocument;
import org.modestead.host.run.RunResult;
import org.modestead.host.run.StepOutcome;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.host.workflow.RunPlan;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.document.ReportDocument;

/** The results of the open desk, to be looked at: of each step, of those that feed it, and all of them as a report. Thread-safe. */
public final class Looks {

    private final Workbench workbench;
    private final KeptResults results;

    Looks(Workbench workbench, KeptResults results) {
        this.workbench = workbench;
        this.results = results;
    }

    /**
     * A result that is looked at.
     *
     * @param id names it
     * @param step as it stands
     * @param node of the step
     * @param result what the node gave
     * @param stale whether it belongs to other settings, inputs or files
     */
    public record Looked(String id, Step step, Node node, NodeResult result, boolean stale) {}

    /**
     * Returns the result of a step; one that costs nothing to make is made again where it was not kept.
     *
     * @throws DeskFault if there is none
     */
    public Looked look(String id) {
        Workbench.Shown shown = workbench.shown(id);
        String result = shown.result().orElseThrow(() -> new DeskFault("step " + id, "it has no result", "run it first"));
        Optional<NodeResult> kept = results.find(shown.node().declaration(), result);
        boolean fresh = shown.known().identity(id).filter(result::equals).isPresent();
        if (kept.isEmpty() && fresh && results.facts(result).filter(KeptResults.Facts::anew).isPresent()) {
            kept = Optional.of(madeAnew(shown.known().inspection().survey().planned().get(id), result));
        }
        NodeResult found = kept.orElseThrow(() -> gone(id));
        if (results.facts(result).filter(KeptResults.Facts::anew).isPresent()) {
            filesStayInside(id);
        }
        return new Looked(result, shown.step(), shown.node(), found, !fresh);
    }

    /** Tables that are read late are read now: what has become a link out of the opened folders since the check is refused. */
    private void filesStayInside(String id) {
        Workflow workflow = workbench.workflow();
        OpenedFolders folders = workbench.folders();
        Map<String, PlannedStep> planned = workbench.found().inspection().survey().planned();
        Deque<String> waiting = new ArrayDeque<>(List.of(id));
        Set<String> seen = new HashSet<>(waiting);
        while (!waiting.isEmpty()) {
            String step = waiting.remove();
            PlannedStep plan = planned.get(step);
            if (plan != null) {
                FileSettings.problems(workbench.step(step), workflow.baseFolder(), plan.declaration(), folders).stream().findFirst().ifPresent(problem -> {
                    throw new DeskFault("step " + step + ", setting " + problem.key(), problem.seen(), problem.wanted());
                });
                plan.inputs().values().stream().map(Link.End::step).filter(seen::add).forEach(waiting::add);
            }
        }
    }

    private DeskFault gone(String id) {
        workbench.lost();
        return new DeskFault("step " + id, "its result is no longer kept", "run it again");
    }

    private NodeResult madeAnew(PlannedStep step, String result) {
        Map<String, Object> inputs = new HashMap<>();
        step.inputs().forEach((port, source) -> inputs.put(port, look(source.step()).result().outputs().get(source.port())));
        Path folder = workbench.workflow().baseFolder();
        NodeResult made = step.node().run(new NodeInputs(inputs), step.settings(), new RunContext(Progress.NONE, folder, folder));
        results.remember(result, made);
        return made;
    }

    /**
     * Asks the results that feed a step, the nearest first, until one answers.
     *
     * @param id of the step
     * @param question put to each result
     */
    public <T> Optional<T> upstream(String id, Function<NodeResult, Optional<T>> question) {
        Map<String, Map<String, Link.End>> inputs = workbench.found().inspection().survey().inputs();
        Deque<String> waiting = new ArrayDeque<>(List.of(id));
        Set<String> seen = new HashSet<>(waiting);
        while (!waiting.isEmpty()) {
            for (Link.End source : new TreeMap<>(inputs.getOrDefault(waiting.remove(), Map.of())).values()) {
                if (seen.add(source.step())) {
                    waiting.add(source.step());
                    Optional<T> answer = answer(source.step(), question);
                    if (answer.isPresent()) {
                        return answer;
                    }
                }
            }
        }
        return Optional.empty();
    }

    private <T> Optional<T> answer(String step, Function<NodeResult, Optional<T>> question) {
        try {
            return question.apply(look(step).result());
        } catch (Fault nothingThere) {
            return Optional.empty();
        }
    }

    /** Returns the report of all results on the desk; what has none is told in it. */
    public ReportDocument report() {
        Workflow workflow = workbench.workflow();
        Overview.Found known = workbench.found();
        Map<String, StepOutcome> outcomes = new LinkedHashMap<>();
        List<PlannedStep> order = new ArrayList<>();
        for (String id : known.inspection().survey().order()) {
            PlannedStep step = known.inspection().survey().planned().get(id);
            if (step != null) {
                order.add(step);
                outcomes.put(id, known.fresh(id) ? new StepOutcome.Done(look(id).result(), Duration.ZERO, true)
                        : new StepOutcome.Failed("step " + id + ": it has no result that belongs to what is set; run it.", Optional.empty(), Duration.ZERO));
            }
        }
        return RunDocument.of(new RunResult(new RunPlan(workflow, order, order), outcomes, workflow.baseFolder(), Duration.ZERO, false));
    }
}
