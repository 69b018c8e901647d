package org.modestead.engine.forecast;

/** How the fitted operator carries a state forward. */
public enum Route {
    /** Modal where the verdict lets the modes stand (grades stands, settles), projection otherwise. */
    AUTO("auto"),
    /** By modes: each eigenfunction grows, decays and turns at its own rate. See {@link ModalRoute}. */
    MODAL("modal"),
    /** By the compressed operator, step after step, without eigenvectors. See {@link ProjectionRoute}. */
    PROJECTION("projection");

    private final String word;

    Route(String word) {
        this.word = word;
    }

    /** Returns the word used in tables. */
    public String word() {
        return word;
    }
}
