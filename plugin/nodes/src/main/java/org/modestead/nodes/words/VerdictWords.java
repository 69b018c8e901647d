package org.modestead.nodes.words;

import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;

/**
 * What each verdict means, for a reader who has never seen the checks. Says only what holds in every function space:
 * whether a mode belongs to the space can be told in a kernel's space alone, and the findings say it there.
 */
public final class VerdictWords {

    /** What a reader must know of a mode that is absent because data the fit never saw do not keep its rule. */
    public static final String DRIVEN = "Absent is said of these functions, not of what was recorded. A mode that something unrecorded keeps going,"
            + " such as wind, traffic or turbulence, cannot be foretold from its own past and is called absent too, although its frequency may be real."
            + " If that may be so: give what drives it as an input column, record runs in which the motion dies away by itself,"
            + " or take longer states (delay depth of the Snapshot Builder); and see in a Stabilisation Diagram whether the same frequency and damping"
            + " come back at every rank.";

    private VerdictWords() {}

    /** Returns one sentence: what was found, without a subject's name; starts with a capital letter. */
    public static String meaning(Grade grade) {
        return switch (grade) {
            case STANDS -> "It settles as functions are added, holds on data the fit never saw and does not depend on the"
                    + " other modes.";
            case SETTLES -> "It settles as functions are added and holds on data the fit never saw, but not without limits:"
                    + " it overlaps other modes, noise blurs it, it keeps its rule only roughly, or the space does not hold all of the"
                    + " signal. The checks that decided tell which.";
            case UNDECIDED -> "The data are too few to tell whether it exists.";
            case DRIFTS -> "It forecasts data the fit never saw, but its rate or its weight keeps changing as functions"
                    + " are added:"
                    + " the figures belong to this one projection, not to the system.";
            case ABSENT -> "Either the error on data the fit never saw stays, or it grows without bound in the function"
                    + " space:"
                    + " there is no such mode in this space.";
        };
    }

    /** Returns the verdict as what follows a mode's name: {@code stands}, {@code is absent}. */
    public static String verb(Grade grade) {
        return switch (grade) {
            case STANDS, SETTLES, DRIFTS -> grade.word();
            case UNDECIDED, ABSENT -> "is " + grade.word();
        };
    }

    /** Returns the overall verdict in a few words, without a capital letter. */
    public static String headline(Grade grade) {
        return switch (grade) {
            case STANDS -> "the modes stand";
            case SETTLES -> "the modes settle, within limits";
            case UNDECIDED -> "whether the modes exist is undecided";
            case DRIFTS -> "the modes drift";
            case ABSENT -> "a leading mode is absent";
        };
    }

    /** Returns one sentence on the modes that carry the signal, taken together; the worst of them decides. */
    public static String overall(Grade grade) {
        return switch (grade) {
            case STANDS -> "Every mode that carries a stated share of the signal settles as functions are added, holds on"
                    + " data the fit never saw and does not depend on the others.";
            case SETTLES -> "Every mode that carries a stated share of the signal settles and holds on data the fit"
                    + " never saw, but not all without limits: the checks that decided tell which.";
            case UNDECIDED -> "For at least one mode that carries a stated share of the signal the data are too few to"
                    + " tell whether it"
                    + " exists.";
            case DRIFTS -> "At least one mode that carries a stated share of the signal keeps changing as functions are"
                    + " added: its"
                    + " figures belong to this one projection, not to the system.";
            case ABSENT -> "At least one mode that carries a stated share of the signal does not exist in this function"
                    + " space.";
        };
    }

    /** Returns what may be done, as a sentence. */
    public static String advice(Grade grade) {
        return "What may be done: " + grade.advice() + ".";
    }

    /** Returns what may be done with one mode, true of the checks that decided, as a sentence. */
    public static String advice(ModeVerdict mode) {
        return "What may be done: " + mode.advice() + ".";
    }
}
