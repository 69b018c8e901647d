package org.modestead.nodes.report;

import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.modestead.engine.forecast.ScoreRow;
import org.modestead.nodes.words.Digits;

/** How much better than doing nothing clever a forecast is. */
final class ForecastSkill {
    private static final String PERSISTENCE = "persistence";
    private static final List<String> FITTED = List.of("modal", "projection");

    private ForecastSkill() {}

    /** Returns one or two sentences against persistence at the shortest and the longest horizon; empty without scores. */
    static Optional<String> sentence(ReportSource source) {
        List<ScoreRow> fitted = source.forecast().scores().stream().filter(row -> row.method().equals(method(source)))
                .filter(row -> persistence(source, row.horizon()).isPresent())
                .sorted(Comparator.comparingDouble(ScoreRow::horizon)).toList();
        if (fitted.isEmpty()) {
            return Optional.empty();
        }
        ScoreRow longest = fitted.get(fitted.size() - 1);
        String first = fitted.size() > 1 ? against(source, fitted.get(0)) + " " : "";
        return Optional.of("On data the fit never saw: " + first + against(source, longest));
    }

    private static String method(ReportSource source) {
        return FITTED.contains(source.forecast().route()) ? source.forecast().route() : source.forecast().scores().stream()
                .map(ScoreRow::method).filter(FITTED::contains).findFirst().orElse("");
    }

    private static Optional<ScoreRow> persistence(ReportSource source, double horizon) {
        return source.forecast().scores().stream().filter(row -> row.method().equals(PERSISTENCE)
                && row.horizon() == horizon)
                .filter(row -> row.rmse() > 0).findFirst();
    }

    private static String against(ReportSource source, ScoreRow row) {
        double naive = persistence(source, row.horizon()).orElseThrow().rmse();
        double skill = 1 - row.rmse() / naive;
        String figures = " (root mean square error " + Digits.figure(row.rmse()) + " against " + Digits.figure(naive) + ")";
        String ahead = source.unit().exactly(row.horizon()) + " ahead the " + row.method() + " forecast errs ";
        if (skill > 0) {
            return ahead + Digits.percent(skill) + " less than persistence" + figures + ".";
        }
        return ahead + Digits.percent(-skill) + " more than persistence" + figures
                + ": there it is no better than repeating"
                + " the last value.";
    }
}
