package org.modestead.engine;

/** The person asked to stop; thrown by {@link Progress#checkCancelled()} from the innermost loop that polls it. */
public final class Cancelled extends RuntimeException {
    private static final long serialVersionUID = 1L;

    /**
     * For work that is too deep to be handed a {@link Progress}: a host that stops a run also interrupts its threads.
     *
     * @throws Cancelled if the current thread is interrupted; it stays so
     */
    public static void ifInterrupted() {
        if (Thread.currentThread().isInterrupted()) {
            throw new Cancelled("interrupted");
        }
    }

    /** @param reason why, shown to the person; not null */
    public Cancelled(String reason) {
        super(reason, null, false, false);
    }
}
