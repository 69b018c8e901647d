package org.modestead.host.run;

import java.io.IOException;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.Cancelled;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.host.output.OutputFault;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.RunContext;

/** Does one step: from the cache or by its node, and keeps the result. Whatever happens becomes an outcome. */
final class StepRunner {

    private static final double WORK = 0.9;

    private final Path baseFolder;
    private final Results cache;
    private final StepStore store;
    private final RunListener listener;
    private final CancelSwitch cancel;

    StepRunner(Path baseFolder, Results cache, StepStore store, RunListener listener, CancelSwitch cancel) {
        this.baseFolder = baseFolder;
        this.cache = cache;
        this.store = store;
        this.listener = listener;
        this.cancel = cancel;
    }

    /**
     * What arrives at a step.
     *
     * @param values by input port id
     * @param fingerprints by id of the step that gave them, where known
     */
    record Inputs(Map<String, Object> values, Map<String, String> fingerprints) {}

    /**
     * @param step that ended
     * @param outcome how
     * @param fingerprint of its result, empty when it has none
     */
    record Ended(PlannedStep step, StepOutcome outcome, Optional<String> fingerprint) {}

    Ended run(PlannedStep step, Inputs inputs) {
        long start = System.nanoTime();
        try {
            cancel.check();
            listener.started(step.id());
            Optional<String> fingerprint = Fingerprint.of(step, inputs.fingerprints(), baseFolder);
            Optional<NodeResult> known = fingerprint.flatMap(found -> cache.find(step, found));
            NodeResult result = known.isPresent() ? known.get() : work(step, inputs);
            Optional<StepOutcome> unwritten = keep(step, result);
            if (unwritten.isPresent()) {
                return new Ended(step, unwritten.get(), Optional.empty());
            }
            fingerprint.ifPresent(found -> cache.keep(step, found, result));
            return new Ended(step, new StepOutcome.Done(result, since(start), known.isPresent()), fingerprint);
        } catch (Cancelled stopped) {
            return ended(step, new StepOutcome.Stopped());
        } catch (Fault fault) {
            return ended(step, StepOutcome.Failed.of(step.id(), fault, since(start)));
        } catch (IOException unreadable) {
            return ended(step, new StepOutcome.Failed("step " + step.id() + ": " + unreadable.getMessage()
                    + "; allow reading and writing there.", Optional.empty(), since(start)));
        } catch (OutOfMemoryError memory) {
            return ended(step, new StepOutcome.Failed("step " + step.id() + ": the memory of "
                    + (Runtime.getRuntime().maxMemory() >> 20)
                    + " MB ran out; start Java with more, for example -Xmx4g, or give the "
                    + "step less (fewer rows, landmarks or delays).", Optional.empty(), since(start)));
        } catch (RuntimeException | Error defect) {
            return ended(step, new StepOutcome.Failed("step " + step.id() + ": an error in the program ("
                    + defect.getClass().getSimpleName() + ": " + defect.getMessage() + "); please report it with the log.",
                    Optional.of(defect), since(start)));
        }
    }

    private NodeResult work(PlannedStep step, Inputs inputs) throws IOException {
        RunContext context = new RunContext(progress(step.id()).part(0, WORK), baseFolder, store.folder(step));
        NodeResult result = step.node().run(new NodeInputs(inputs.values()), step.settings(), context);
        for (Port port : step.declaration().outputs()) {
            if (!port.type().valueClass().isInstance(result.outputs().get(port.id()))) {
                throw new IllegalStateException("node " + step.declaration().id() + " gave no " + port.type().title()
                        + " at output " + port.id());
            }
        }
        store.made(result);
        return result;
    }

    private Optional<StepOutcome> keep(PlannedStep step, NodeResult result) {
        try {
            store.keep(step, result, progress(step.id()).part(WORK, 1));
            return Optional.empty();
        } catch (IOException unwritable) {
            cancel.check();
            OutputFault fault = OutputFault.of("results of step " + step.id(), unwritable);
            cancel.cancel(fault.getMessage());
            return Optional.of(new StepOutcome.Unwritten(fault.getMessage()));
        }
    }

    private Progress progress(String step) {
        return new Progress() {
            @Override
            public void report(double fraction, String message) {
                listener.progress(step, fraction, message);
            }

            @Override
            public void checkCancelled() {
                cancel.check();
            }
        };
    }

    /** What goes wrong after the person asked to stop, goes wrong because of it. */
    private Ended ended(PlannedStep step, StepOutcome outcome) {
        return new Ended(step, cancel.reason().isPresent() ? new StepOutcome.Stopped() : outcome, Optional.empty());
    }

    private static Duration since(long start) {
        return Duration.ofNanos(System.nanoTime() - start);
    }
}
