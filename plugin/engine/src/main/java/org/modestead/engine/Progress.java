package org.modestead.engine;

/**
 * How long work tells how far it is and learns that it should stop. The only thing the numerics know of a host, but for the interrupt of
 * its thread, at which matrix products end ({@link Cancelled#ifInterrupted()}).
 *
 * <p>Every loop of unbounded length calls {@link #checkCancelled()}; implementations must be cheap and thread-safe.
 */
public interface Progress {

    /** Ignores reports and is never cancelled. */
    Progress NONE = new Progress() {
        @Override
        public void report(double fraction, String message) {
            // nobody watches
        }

        @Override
        public void checkCancelled() {
            // nobody can stop it
        }
    };

    /**
     * @param fraction done so far, in [0, 1], never falling
     * @param message what is being done, in a few words; not null
     */
    void report(double fraction, String message);

    /** @throws Cancelled if the person asked to stop */
    void checkCancelled();

    /**
     * Maps [0, 1] of a part of the work onto [{@code from}, {@code to}] of the whole.
     *
     * @param from fraction of the whole at which the part starts, in [0, 1]
     * @param to fraction of the whole at which it ends, in [{@code from}, 1]
     * @return progress for the part, never null
     */
    default Progress part(double from, double to) {
        Progress whole = this;
        return new Progress() {
            @Override
            public void report(double fraction, String message) {
                whole.report(from + (to - from) * fraction, message);
            }

            @Override
            public void checkCancelled() {
                whole.checkCancelled();
            }
        };
    }
}
