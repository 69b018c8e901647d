package org.knime.core.node;

import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.Supplier;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public class ExecutionMonitor {

    private final AtomicBoolean cancelled = new AtomicBoolean();
    private double progress;

    public ExecutionMonitor() {
        // nothing watches
    }

    public void checkCanceled() throws CanceledExecutionException {
        if (cancelled.get()) {
            throw new CanceledExecutionException();
        }
    }

    public void setProgress(final double fraction, final Supplier<String> message) {
        setProgress(fraction);
    }

    public void setProgress(final double fraction) {
        if (fraction < 0 || fraction > 1) {
            throw new IllegalArgumentException("progress " + fraction);
        }
        progress = fraction;
    }

    public ExecutionMonitor createSubProgress(final double share) {
        return this;
    }

    /** What a person does. */
    public void cancel() {
        cancelled.set(true);
    }

    /** The last fraction told. */
    public double progress() {
        return progress;
    }
}
