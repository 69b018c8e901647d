package org.modestead.host.run;

import java.util.Optional;
import java.util.concurrent.atomic.AtomicReference;
import org.modestead.engine.Cancelled;

/** Stops a run from another thread; the first reason given counts. */
public final class CancelSwitch {

    private final AtomicReference<String> reason = new AtomicReference<>();

    /** Asks all work to stop. */
    public void cancel(String why) {
        reason.compareAndSet(null, why);
    }

    /** Returns why work should stop, empty when it should go on. */
    public Optional<String> reason() {
        return Optional.ofNullable(reason.get());
    }

    /** @throws Cancelled if work should stop */
    public void check() {
        String why = reason.get();
        if (why != null) {
            throw new Cancelled(why);
        }
    }
}
