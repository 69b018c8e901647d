package org.modestead.engine.wellposed;

import java.util.List;

/**
 * Verdict on one mode.
 *
 * @param mode mode number, 0 for the operator as a whole
 * @param grade what may be said
 * @param decidedBy ids of the checks that decided it
 * @param counts whether the mode carries a stated share of the signal and so enters the overall verdict
 * @param sentence in plain words, with the deciding figures
 */
public record ModeVerdict(int mode, Grade grade, List<String> decidedBy, boolean counts, String sentence) {

    /** Takes an immutable copy. */
    public ModeVerdict {
        decidedBy = List.copyOf(decidedBy);
    }

    /** Returns what the analyst may do; of a mode that settles, together with what is to be told of it. */
    public String advice() {
        return mode == 0 ? grade.advice() : Reservation.advice(grade, decidedBy);
    }
}
