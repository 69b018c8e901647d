package org.modestead.engine.operator;

/** What a fit makes of known inputs (control), that is of what it takes them to do between two samples. */
public enum InputUse {

    /** Nothing: what they cause counts as free motion. */
    LEFT_IN("not separated"),

    /** Each stays as it was sampled until the next sample: set points, valves that are switched. Exact for linear motion then. */
    HELD("separated, held from sample to sample"),

    /**
     * Each runs straight from sample to sample: quantities measured from outside, such as weather. Not with feedback, where an
     * input follows from the state at its own time: it would then tell that state.
     */
    STRAIGHT("separated, straight from sample to sample");

    private final String words;

    InputUse(String words) {
        this.words = words;
    }

    /** Returns the use in words, for the report. */
    public String words() {
        return words;
    }
}
