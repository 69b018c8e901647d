package org.modestead.engine.battery;

import java.util.Set;
import org.modestead.engine.wellposed.Grade;

/** What the mathematics allows as the overall verdict. */
enum Truth {
    /** Eigenfunctions in the space, orthogonal in its norm, which does not depend on the data. */
    STANDS("stands", Set.of(Grade.STANDS)),
    /** Eigenfunctions in the space that overlap in its norm. */
    SETTLES("settles", Set.of(Grade.SETTLES)),
    /** Eigenfunctions in the space; their overlap is an average over the data and so differs from recording to recording. */
    REPORTABLE("stands or settles", Set.of(Grade.STANDS, Grade.SETTLES)),
    /** Eigenfunctions without end, or a generalised one only: none of them is a mode of its own. */
    DRIFTS("drifts", Set.of(Grade.DRIFTS)),
    /** No eigenfunction in the space reaches the signal. */
    ABSENT("absent", Set.of(Grade.ABSENT)),
    /** No mode; whether a projection imitates one over the length of a run depends on that length. */
    NONE("drifts or absent", Set.of(Grade.DRIFTS, Grade.ABSENT));

    private final String word;
    private final Set<Grade> allowed;

    Truth(String word, Set<Grade> allowed) {
        this.word = word;
        this.allowed = allowed;
    }

    String word() {
        return word;
    }

    boolean allows(Grade grade) {
        return allowed.contains(grade);
    }

    /** Whether there is no mode to report. */
    boolean forbidsReport() {
        return this == DRIFTS || this == ABSENT || this == NONE;
    }
}
