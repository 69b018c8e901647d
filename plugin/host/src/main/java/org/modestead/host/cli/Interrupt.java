package org.modestead.host.cli;

import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import org.modestead.host.run.CancelSwitch;

/**
 * Stops a run when the person presses Ctrl-C or the system asks the process to end: asks all steps to stop and holds
 * the process back until the run has tidied up.
 */
final class Interrupt implements AutoCloseable {

    private static final long LONGEST_WAIT_SECONDS = 20;

    private final CancelSwitch cancel;
    private final Terminal terminal;
    private final CountDownLatch tidy = new CountDownLatch(1);
    private volatile boolean written;
    private final Thread hook = new Thread(this::stop, "stop");

    private Interrupt(CancelSwitch cancel, Terminal terminal) {
        this.cancel = cancel;
        this.terminal = terminal;
    }

    static Interrupt on(CancelSwitch cancel, Terminal terminal) {
        Interrupt interrupt = new Interrupt(cancel, terminal);
        Runtime.getRuntime().addShutdownHook(interrupt.hook);
        return interrupt;
    }

    /**
     * Tells that the run has ended and tidied up.
     *
     * @param kept whether it had written its results before it could be stopped
     */
    void ended(boolean kept) {
        written = kept;
        tidy.countDown();
    }

    private void stop() {
        cancel.cancel("the process was asked to end");
        terminal.err().println();
        terminal.err().println("Stopping ...");
        try {
            boolean done = tidy.await(LONGEST_WAIT_SECONDS, TimeUnit.SECONDS);
            String state = written ? "Stopped, but the run had just written its results."
                    : "Stopped; the result folder is as it was before.";
            terminal.err().println(done ? state : "Stopped without waiting for a step that did not react; the result "
                    + "folder is as it was before.");
        } catch (InterruptedException hurried) {
            Thread.currentThread().interrupt();
        }
    }

    @Override
    public void close() {
        tidy.countDown();
        try {
            Runtime.getRuntime().removeShutdownHook(hook);
        } catch (IllegalStateException shuttingDown) {
            // The hook is running: it has been told that the run ended.
            Thread.onSpinWait();
        }
    }
}
