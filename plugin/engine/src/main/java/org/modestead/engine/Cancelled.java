package org.modestead.engine;

/** The person asked to stop; thrown by {@link Progress#checkCancelled()} from the innermost loop that polls it. */
public final class Cancelled extends RuntimeException {
    private static final long serialVersionUID = 1L;

    /** @param reason why, shown to the person; not null */
    public Cancelled(String reason) {
        super(reason, null, false, false);
    }
}
