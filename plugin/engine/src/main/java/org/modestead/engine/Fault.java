package org.modestead.engine;

import java.util.Objects;

/**
 * What is told to a person when work cannot go on: one sentence with where, what was seen and what would be right.
 *
 * <p>Each kind of fault is a subclass of its own, so that a host can tell a bad recording from an impossible fit
 * without reading text. A host shows {@link #getMessage()} and never the stack trace.
 */
public abstract class Fault extends RuntimeException {
    private static final long serialVersionUID = 1L;

    private final String where;
    private final String seen;
    private final String wanted;

    /**
     * @param where place of the fault, for example {@code "pumps.csv, row 17, column flow"}; not null
     * @param seen what was found there, with its value; not null
     * @param wanted what would be right, as an instruction; not null
     */
    protected Fault(String where, String seen, String wanted) {
        super(where + ": " + seen + "; " + wanted + ".");
        this.where = Objects.requireNonNull(where);
        this.seen = Objects.requireNonNull(seen);
        this.wanted = Objects.requireNonNull(wanted);
    }

    /** Returns the place of the fault, never null. */
    public String where() {
        return where;
    }

    /** Returns what was found, with its value, never null. */
    public String seen() {
        return seen;
    }

    /** Returns what would be right, never null. */
    public String wanted() {
        return wanted;
    }
}
