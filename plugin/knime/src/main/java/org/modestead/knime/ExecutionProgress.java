package org.modestead.knime;

import org.knime.core.node.CanceledExecutionException;
import org.knime.core.node.ExecutionMonitor;
import org.modestead.engine.Cancelled;
import org.modestead.engine.Progress;

/** Passes progress on to the platform and asks it whether to stop. */
record ExecutionProgress(ExecutionMonitor exec) implements Progress {

    @Override
    public void report(double fraction, String message) {
        exec.setProgress(Math.max(0, Math.min(1, fraction)), () -> message);
    }

    @Override
    public void checkCancelled() {
        try {
            exec.checkCanceled();
        } catch (CanceledExecutionException stop) {
            throw new Cancelled("stopped by the person");
        }
    }
}
