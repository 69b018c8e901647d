package org.modestead.host.run;

import java.util.List;
import java.util.Optional;
import java.util.concurrent.CopyOnWriteArrayList;
import java.util.concurrent.atomic.AtomicReference;
import org.modestead.engine.Cancelled;

/** Stops a run from another thread; the first reason given counts. */
public final class CancelSwitch {

    private final AtomicReference<String> reason = new AtomicReference<>();
    private final List<Thread> workers = new CopyOnWriteArrayList<>();

    /** Asks all work to stop: what polls {@link #check()} and what waits and can be interrupted. */
    public void cancel(String why) {
        reason.compareAndSet(null, why);
        workers.forEach(Thread::interrupt);
    }

    /** Names a thread that works for the run and is to be interrupted. */
    void works(Thread worker) {
        workers.add(worker);
        if (reason.get() != null) {
            worker.interrupt();
        }
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
