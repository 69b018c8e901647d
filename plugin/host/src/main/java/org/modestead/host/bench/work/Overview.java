package org.modestead.host.bench.work;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.modestead.host.bench.check.Inspection;
import org.modestead.host.bench.check.RememberedForesight;
import org.modestead.host.bench.desk.Bands;
import org.modestead.host.bench.desk.StepTitles;
import org.modestead.host.bench.folders.FileSettings;
import org.modestead.host.bench.folders.OpenedFolders;
import org.modestead.host.bench.run.BenchRun;
import org.modestead.host.bench.run.Identities;
import org.modestead.host.bench.run.KeptResults;
import org.modestead.host.bench.run.StepState;
import org.modestead.host.run.FileMarks;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Problem;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Survey;
import org.modestead.host.workflow.Workflow;
import org.modestead.host.workflow.WorkflowChecker;
import org.modestead.nodes.contract.NodeCatalog;

/** Finds out how all steps of a document stand: reads files, so it may take as long as they are large. Thread-safe. */
final class Overview {

    private final NodeCatalog catalog;
    private final KeptResults results;
    private final WorkflowChecker checker;
    private final FileMarks marks = new FileMarks();

    Overview(NodeCatalog catalog, KeptResults results) {
        this.catalog = catalog;
        this.results = results;
        this.checker = new WorkflowChecker(catalog, new RememberedForesight());
    }

    /**
     * What was found out.
     *
     * @param inspection everything wrong, and what is known of columns
     * @param identities what each step's result depends on, where it can be told
     * @param ordered steps band by band
     * @param results of earlier runs
     * @param titles of steps for people, by id
     */
    record Found(Inspection inspection, Map<String, String> identities, List<Step> ordered, KeptResults results, UnaryOperator<String> titles) {

        /** Takes immutable copies. */
        Found {
            identities = Map.copyOf(identities);
            ordered = List.copyOf(ordered);
        }

        /** Returns whether a step has the result that it would give now. */
        boolean fresh(String step) {
            return identity(step).flatMap(this::facts).isPresent();
        }

        Optional<String> identity(String step) {
            return Optional.ofNullable(identities.get(step));
        }

        private Optional<KeptResults.Facts> facts(String id) {
            return results.facts(id);
        }

        /** Returns how long steps took last time. */
        Map<String, Double> seconds(Map<String, String> latest) {
            Map<String, Double> seconds = new LinkedHashMap<>();
            for (Step step : ordered) {
                identity(step.id()).flatMap(this::facts).or(() -> Optional.ofNullable(latest.get(step.id())).flatMap(this::facts))
                        .ifPresent(facts -> seconds.put(step.id(), fresh(step.id()) ? 0.0 : facts.seconds()));
            }
            return seconds;
        }

        Map<String, DeskView.Standing> standing(Workflow workflow, Map<String, String> latest, Map<String, Workbench.Ending> endings,
                Optional<BenchRun> run) {
            Map<String, StepState> working = run.map(BenchRun::states).orElse(Map.of());
            Map<String, DeskView.Standing> standing = new LinkedHashMap<>();
            for (Step step : workflow.steps()) {
                Optional<String> shown = fresh(step.id()) ? identity(step.id())
                        : Optional.ofNullable(latest.get(step.id())).filter(id -> facts(id).filter(known -> known.node().equals(step.node())).isPresent());
                StepState state = working.containsKey(step.id()) ? working.get(step.id())
                        : run.filter(begun -> begun.awaits(step.id())).isPresent() && !fresh(step.id())
                                ? StepState.of(StepState.Kind.WAITING, "It has its turn later in this run.")
                                : state(step.id(), shown, Optional.ofNullable(endings.get(step.id())));
                standing.put(step.id(), new DeskView.Standing(state, shown));
            }
            return standing;
        }

        private StepState state(String step, Optional<String> shown, Optional<Workbench.Ending> ending) {
            if (!inspection.setUp(step)) {
                List<Problem> problems = inspection.byStep().getOrDefault(step, List.of());
                return StepState.of(StepState.Kind.UNSET, problems.isEmpty() ? "It feeds itself in a circle, or takes input from a step that does."
                        : problems.get(0).key() + ": " + problems.get(0).seen() + "; " + problems.get(0).wanted() + ".");
            }
            Optional<String> identity = identity(step);
            Optional<Workbench.Ending> now = ending.filter(found -> identity.filter(found.identity()::equals).isPresent());
            if (fresh(step)) {
                KeptResults.Facts facts = identity.flatMap(this::facts).orElseThrow();
                return StepState.withResult(StepState.Kind.DONE, "", facts.doubts(), facts.seconds());
            } else if (now.isPresent()) {
                return StepState.of(now.get().kind(), now.get().sentence());
            } else if (shown.isPresent()) {
                KeptResults.Facts facts = facts(shown.get()).orElseThrow();
                return StepState.withResult(StepState.Kind.STALE, "What is shown belongs to other settings, inputs or files.", facts.doubts(), facts.seconds());
            }
            return inspection.survey().inputs().getOrDefault(step, Map.of()).values().stream().map(Link.End::step).filter(source -> !fresh(source)).findFirst()
                    .map(source -> StepState.of(StepState.Kind.WAITING, "It waits for " + titles.apply(source) + (inspection.setUp(source) ? "." : ", which is not set up.")))
                    .orElseGet(() -> StepState.of(StepState.Kind.READY, ""));
        }
    }

    Found look(Workflow workflow, OpenedFolders folders) {
        FileSettings files = FileSettings.confine(workflow, catalog, folders);
        Survey whole = checker.survey(files.workflow());
        Survey survey = new Survey(files.merged(whole.problems()), whole.planned(), whole.order(), whole.inputs(), whole.schemas(), whole.outlooks());
        Inspection inspection = Inspection.of(workflow, survey);
        return new Found(inspection, Identities.of(survey, workflow.baseFolder(), marks), Bands.ordered(workflow, catalog), results,
                id -> StepTitles.of(workflow, catalog, id));
    }
}
