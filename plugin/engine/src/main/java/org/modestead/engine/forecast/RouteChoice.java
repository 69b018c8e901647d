package org.modestead.engine.forecast;

import java.util.List;
import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.Verdict;

/**
 * Which route carries the forecast table, and why.
 *
 * @param route {@link Route#MODAL} or {@link Route#PROJECTION}
 * @param sentence for the summary
 * @param doubts what a reader must know about the choice
 */
record RouteChoice(Route route, String sentence, List<Doubt> doubts) {

    /**
     * @param asked by the plan
     * @param verdict on the modes, where they were checked
     */
    static RouteChoice of(Route asked, Optional<Verdict> verdict) {
        Optional<Grade> grade = verdict.map(v -> v.overall().grade());
        boolean trusted = grade.map(RouteChoice::carries).orElse(true);
        Route route = asked == Route.AUTO ? (trusted ? Route.MODAL : Route.PROJECTION) : asked;
        String because = grade.map(g -> "the verdict on the modes is '" + g.word() + "'")
                .orElse("the modes were not checked");
        String why = asked == Route.AUTO ? because : "the settings ask for it; " + because;
        return new RouteChoice(route, "Forecast by the " + route.word() + " route: " + why + ".", doubts(route, grade));
    }

    private static boolean carries(Grade grade) {
        return grade == Grade.STANDS || grade == Grade.SETTLES;
    }

    private static List<Doubt> doubts(Route route, Optional<Grade> grade) {
        if (route == Route.PROJECTION) {
            return List.of();
        }
        if (grade.isEmpty()) {
            return List.of(new Doubt("modes-not-checked",
                    "The forecast adds up modes that no well-posedness check has seen."));
        }
        return carries(grade.get()) ? List.of() : List.of(new Doubt("modes-not-trusted",
                "The forecast adds up modes whose verdict is '" + grade.get().word() + "': " + grade.get().advice()
                        + "; the projection route does not need them."));
    }
}
