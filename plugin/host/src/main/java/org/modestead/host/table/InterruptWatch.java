package org.modestead.host.table;

import java.sql.SQLException;
import java.sql.Statement;

/**
 * Stops a statement when the thread that waits for it is interrupted. DuckDB computes in native code, which Java cannot
 * interrupt by itself.
 */
final class InterruptWatch {

    private static final long MILLIS_BETWEEN_LOOKS = 50;

    private final Statement statement;
    private final Thread waiting = Thread.currentThread();
    private final Thread watcher = new Thread(this::watch, "interrupt-watch");

    private InterruptWatch(Statement statement) {
        this.statement = statement;
    }

    /** Watches the current thread until closed. */
    static InterruptWatch over(Statement statement) {
        InterruptWatch watch = new InterruptWatch(statement);
        watch.watcher.setDaemon(true);
        watch.watcher.start();
        return watch;
    }

    /** Work that DuckDB does for a statement. */
    @FunctionalInterface
    interface Work<T> {
        T run() throws SQLException;
    }

    /** Does work under a watch and returns its result. */
    static <T> T during(Statement statement, Work<T> work) throws SQLException {
        InterruptWatch watch = over(statement);
        try {
            return work.run();
        } finally {
            watch.close();
        }
    }

    private void watch() {
        try {
            while (true) {
                Thread.sleep(MILLIS_BETWEEN_LOOKS);
                if (waiting.isInterrupted()) {
                    statement.cancel();
                }
            }
        } catch (InterruptedException closed) {
            Thread.currentThread().interrupt();
        } catch (SQLException ended) {
            // A statement that cannot be stopped any more has ended.
            Thread.currentThread().interrupt();
        }
    }

    /** Ends the watch; afterwards the statement may be closed. */
    void close() {
        watcher.interrupt();
        boolean interrupted = Thread.interrupted();
        try {
            watcher.join();
        } catch (InterruptedException again) {
            interrupted = true;
        }
        if (interrupted) {
            waiting.interrupt();
        }
    }
}
