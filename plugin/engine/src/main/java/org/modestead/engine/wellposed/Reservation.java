package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Optional;

/** What is to be told together with a mode that settles: it depends on which checks failed, and none may be blamed that did not. */
final class Reservation {

    private Reservation() {}

    /**
     * Returns what may be done with one mode.
     *
     * @param decidedBy ids of the checks that decided the verdict
     */
    static String advice(Grade grade, List<String> decidedBy) {
        List<String> told = grade == Grade.SETTLES ? decidedBy.stream().flatMap(check -> words(check).stream()).distinct().toList() : List.of();
        return told.isEmpty() ? grade.advice() : "report the mode together with " + String.join(", and with ", told);
    }

    private static Optional<String> words(String check) {
        return switch (check) {
            case "eigenfunction-overlap", "joint-solo-gap" -> Optional.of("its overlap with other modes");
            case "noise-sensitivity" -> Optional.of("how far noise blurs it");
            case "close-residual" -> Optional.of("how well it keeps its rule");
            case "signal-in-space" -> Optional.of("how much of the signal the space does not hold");
            default -> Optional.empty();
        };
    }
}
