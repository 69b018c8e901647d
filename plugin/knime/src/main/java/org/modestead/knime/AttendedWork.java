package org.modestead.knime;

import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import java.util.function.Supplier;
import org.modestead.engine.Cancelled;
import org.modestead.engine.Progress;

/**
 * Work on a thread of its own that is left when the person asks to stop. Between two questions whether to stop, a factorisation of a large matrix
 * may take seconds; the node is ready again at once, and the work ends by itself
 * at its next question or matrix product, its result thrown away.
 */
final class AttendedWork {

    private static final long MILLISECONDS = 50;

    private AttendedWork() {}

    /**
     * Waits for the result.
     *
     * @param work asks the same progress
     * @param progress asked here as well
     * @param name of the thread
     * @return what the work gives
     * @throws Cancelled when the person asked to stop
     */
    static <T> T result(Supplier<T> work, Progress progress, String name) {
        FutureTask<T> task = new FutureTask<>(work::get);
        Thread thread = new Thread(task, name);
        thread.setDaemon(true);
        thread.setContextClassLoader(Thread.currentThread().getContextClassLoader());
        thread.start();
        try {
            while (true) {
                try {
                    return task.get(MILLISECONDS, TimeUnit.MILLISECONDS);
                } catch (TimeoutException notYet) {
                    progress.checkCancelled();
                }
            }
        } catch (ExecutionException failed) {
            throw thrown(failed.getCause());
        } catch (InterruptedException stop) {
            Thread.currentThread().interrupt();
            throw new Cancelled("stopped by the platform");
        } finally {
            // what nobody waits for any more is interrupted; work that is done is not
            task.cancel(true);
        }
    }

    private static RuntimeException thrown(Throwable cause) {
        if (cause instanceof Error error) {
            throw error;
        }
        return (RuntimeException) cause;
    }
}
