package org.modestead.host.run;

/** Hears how a run goes. Called from several threads. */
public interface RunListener {

    /** Hears nothing. */
    RunListener NONE = new RunListener() {
        @Override
        public void started(String step) {
            // nobody watches
        }

        @Override
        public void progress(String step, double fraction, String message) {
            // nobody watches
        }

        @Override
        public void ended(String step, StepOutcome outcome) {
            // nobody watches
        }
    };

    /** The run found something that the person must know before it begins; not heard unless taken up. */
    default void told(String sentence) {
        // who shows no sentences needs none
    }

    /** A step began. */
    void started(String step);

    /**
     * A step went on.
     *
     * @param step id
     * @param fraction done so far, in [0, 1]
     * @param message what is being done
     */
    void progress(String step, double fraction, String message);

    /** A step ended, or will never begin. */
    void ended(String step, StepOutcome outcome);
}
