package org.knime.core.node;

import java.util.function.Supplier;

/** Signatures of the platform's public class of this name; no behaviour. */
public class ExecutionMonitor {
    public ExecutionMonitor() {
        throw new UnsupportedOperationException();
    }

    public void checkCanceled() throws CanceledExecutionException {
        throw new UnsupportedOperationException();
    }

    public void setProgress(final double progress, final Supplier<String> message) {
        throw new UnsupportedOperationException();
    }

    public void setProgress(final double progress) {
        throw new UnsupportedOperationException();
    }

    public ExecutionMonitor createSubProgress(final double share) {
        throw new UnsupportedOperationException();
    }
}
