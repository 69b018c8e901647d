package org.modestead.host.bench.run;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import org.modestead.engine.Progress;
import org.modestead.host.run.CancelSwitch;
import org.modestead.host.run.Results;
import org.modestead.host.run.RunListener;
import org.modestead.host.run.StepOutcome;
import org.modestead.host.run.StepStore;
import org.modestead.host.run.StepsRun;
import org.modestead.host.table.AllRows;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.host.workflow.RunPlan;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.table.Table;

/**
 * One run in the background. Stopped, it is over at once: work that does not ask whether to stop for a quarter of a second, such as the
 * factorisation of a large matrix, is left to end by itself, and what it gives is thrown away.
 */
public final class BenchRun {

    private static final long PATIENCE_MILLIS = 250;
    private static final double EARLY = 0.02;
    private static final double FIRST_SECOND = 1;

    private final RunPlan plan;
    private final Map<String, Double> expected;
    private final KeptResults kept;
    private final Results results;
    private volatile boolean keeping;
    private final Watcher watcher;
    private final CancelSwitch cancel = new CancelSwitch();
    private final CountDownLatch over = new CountDownLatch(1);
    private final Map<String, Work> working = new ConcurrentHashMap<>();
    private final Set<String> ended = ConcurrentHashMap.newKeySet();

    /** Hears how a run goes; called from its threads, one call at a time for the end. */
    public interface Watcher {

        /** A step began, or all have ended and their results are being written. */
        void began();

        /** A step ended. */
        void ended(PlannedStep step, StepOutcome outcome);

        /** The run is over; nothing more comes from it. */
        void over(BenchRun run, Map<String, StepOutcome> outcomes, boolean stopped);
    }

    private record Work(long since, double fraction, String message) {}

    /**
     * @param plan with nothing wrong
     * @param expected seconds that steps took last time, where known
     * @param kept results of earlier runs
     * @param again steps that run even though their result is known
     * @param watcher hears how it goes
     */
    public BenchRun(RunPlan plan, Map<String, Double> expected, KeptResults kept, Set<String> again, Watcher watcher) {
        this.plan = plan;
        this.expected = Map.copyOf(expected);
        this.watcher = watcher;
        this.kept = kept;
        this.results = new Results() {
            @Override
            public Optional<NodeResult> find(PlannedStep step, String fingerprint) {
                return again.contains(step.id()) ? Optional.empty() : kept.find(step.declaration(), fingerprint);
            }

            @Override
            public void keep(PlannedStep step, String fingerprint, NodeResult result) {
                // the watcher keeps it, with the time it took
            }
        };
    }

    /** Starts it. */
    public void start() {
        Thread thread = new Thread(this::work, "run");
        thread.setDaemon(true);
        thread.start();
    }

    private void work() {
        Map<String, StepOutcome> outcomes = new LinkedHashMap<>();
        try {
            outcomes.putAll(StepsRun.run(plan, results, new NoStore(), new Listener(), cancel, Runtime.getRuntime().availableProcessors()));
            settle();
        } finally {
            finish(outcomes);
        }
    }

    /** What is told to be done is not lost with the process: the run is over when its results lie on disk. */
    private void settle() {
        keeping = !kept.isSettled();
        try {
            synchronized (over) {
                if (keeping && over.getCount() > 0) {
                    watcher.began();
                }
            }
            kept.settle();
        } catch (InterruptedException hurried) {
            Thread.currentThread().interrupt();
        }
    }

    /** Returns whether all steps have ended and their results are being written. */
    public boolean isKeeping() {
        return keeping;
    }

    private void finish(Map<String, StepOutcome> outcomes) {
        synchronized (over) {
            if (over.getCount() > 0) {
                over.countDown();
                watcher.over(this, outcomes, cancel.reason().isPresent());
            }
        }
    }

    /** Asks it to stop and returns when it is over, at the latest after that time. */
    public void stop() {
        cancel.cancel("stopped by the person");
        try {
            over.await(PATIENCE_MILLIS, TimeUnit.MILLISECONDS);
        } catch (InterruptedException hurried) {
            Thread.currentThread().interrupt();
        }
        finish(Map.of());
    }

    /** Returns whether it was asked to stop. */
    public boolean isStopping() {
        return cancel.reason().isPresent();
    }

    /** Returns whether a step takes part and has not ended. */
    public boolean awaits(String step) {
        return plan.order().stream().anyMatch(planned -> planned.id().equals(step)) && !ended.contains(step);
    }

    /** Returns the states of the steps that are at work. */
    public Map<String, StepState> states() {
        Map<String, StepState> states = new LinkedHashMap<>();
        for (PlannedStep step : plan.order()) {
            Work work = working.get(step.id());
            if (work != null) {
                states.put(step.id(), StepState.running(work.fraction(), work.message(), left(step.id(), work)));
            }
        }
        return states;
    }

    private OptionalDouble left(String step, Work work) {
        double spent = seconds(work.since());
        if (work.fraction() > EARLY && spent > FIRST_SECOND) {
            return OptionalDouble.of(spent * (1 - work.fraction()) / work.fraction());
        }
        double before = expected.getOrDefault(step, 0.0);
        return before > spent + FIRST_SECOND ? OptionalDouble.of(before - spent) : OptionalDouble.empty();
    }

    /** Returns how much of it is done, in [0, 1], each step weighed by the time it took before. */
    public double fraction() {
        double done = 0;
        double all = 0;
        for (PlannedStep step : plan.order()) {
            double weight = Math.max(0.05, expected.getOrDefault(step.id(), FIRST_SECOND));
            all += weight;
            Work work = working.get(step.id());
            done += ended.contains(step.id()) ? weight : work == null ? 0 : weight * work.fraction();
        }
        return all == 0 ? 1 : done / all;
    }

    /** Returns the seconds that are left, where that can be told: of all steps to come it is known what they took before. */
    public OptionalDouble secondsLeft() {
        double left = 0;
        for (PlannedStep step : plan.order()) {
            Work work = working.get(step.id());
            OptionalDouble own = ended.contains(step.id()) ? OptionalDouble.of(0) : work != null ? left(step.id(), work)
                    : expected.containsKey(step.id()) ? OptionalDouble.of(expected.get(step.id())) : OptionalDouble.empty();
            if (own.isEmpty()) {
                return own;
            }
            left += own.getAsDouble();
        }
        return OptionalDouble.of(left);
    }

    private static double seconds(long since) {
        return (System.nanoTime() - since) / 1e9;
    }

    /** Passes on what is heard as long as the run is not over. */
    private final class Listener implements RunListener {
        @Override
        public void started(String step) {
            working.put(step, new Work(System.nanoTime(), 0, ""));
            synchronized (over) {
                if (over.getCount() > 0) {
                    watcher.began();
                }
            }
        }

        @Override
        public void progress(String step, double fraction, String message) {
            working.computeIfPresent(step, (id, work) -> new Work(work.since(), Math.max(work.fraction(), Math.min(1, fraction)), message));
        }

        @Override
        public void ended(String step, StepOutcome outcome) {
            working.remove(step);
            ended.add(step);
            synchronized (over) {
                if (over.getCount() > 0) {
                    PlannedStep planned = plan.order().stream().filter(found -> found.id().equals(step)).findFirst().orElseThrow();
                    watcher.ended(planned, outcome);
                }
            }
        }
    }

    /** The bench keeps results itself; a step's own files go where its settings say. */
    private static final class NoStore implements StepStore {
        @Override
        public Path folder(PlannedStep step) throws java.io.IOException {
            return Files.createDirectories(Path.of(System.getProperty("java.io.tmpdir"), "modestead-bench-steps"));
        }

        /** Nothing is written here for which rows would be read: a query that fails at one must fail as its own step, not as the next one. */
        @Override
        public void made(NodeResult result) {
            result.outputs().values().stream().filter(Table.class::isInstance).map(Table.class::cast).forEach(AllRows::demand);
        }

        @Override
        public void keep(PlannedStep step, NodeResult result, Progress progress) {
            progress.report(1, "done");
        }
    }
}
