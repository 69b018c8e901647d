package org.modestead.engine.wellposed;

/** What may be said about a mode. Ordered from best to worst; the worst decides overall. */
public enum Grade {
    /** Settles, is in the space, passes holdout, captures its part, joint = solo: report the mode. */
    STANDS("stands", "report the mode"),
    /** As {@link #STANDS}, but overlap, noise, a rule kept only roughly or a signal partly outside the space limit it: report with that. */
    SETTLES("settles", "report the mode together with what limits it"),
    /** Too few data, rungs or runs to tell. */
    UNDECIDED("undecided", "collect more data as the finding says"),
    /** Holdout passes, but the rate or the weight keeps changing as the basis grows. */
    DRIFTS("drifts", "report only the projection and its forecast"),
    /** The residual stays, or the norm grows without bound. */
    ABSENT("absent", "there is no such mode among these functions: try another kernel, dictionary or delay depth");

    private final String word;
    private final String advice;

    Grade(String word, String advice) {
        this.word = word;
        this.advice = advice;
    }

    /** Returns the word used in tables. */
    public String word() {
        return word;
    }

    /** Returns what the analyst may do, whichever check decided; {@link ModeVerdict#advice} tells it of one mode. */
    public String advice() {
        return advice;
    }
}
