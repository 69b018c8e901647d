package org.modestead.nodes.figure;

import java.util.Comparator;
import java.util.List;
import org.modestead.engine.forecast.ScoreRow;
import org.modestead.nodes.words.TimeUnit;

/** Forecast error against the naive methods, over the horizon. */
public final class ScoreFigures {
    private static final double WIDE = 100;

    private ScoreFigures() {}

    /**
     * Draws the root mean square error of every method over the horizon; one curve a method, the first one strongest.
     * The scale is logarithmic when the errors span more than a factor of 100.
     *
     * @param scores by method and horizon
     * @param unit of the horizons
     * @return kind {@link Figure.Kind#CURVES}; without layers when nothing was scored
     */
    public static Figure figure(List<ScoreRow> scores, TimeUnit unit) {
        List<String> methods = scores.stream().map(ScoreRow::method).distinct().toList();
        List<Figure.Layer> layers = methods.stream().map(method -> curve(scores, method,
                method.equals(methods.get(0)))).toList();
        String caption = layers.isEmpty() ? "Nothing was held out, so no forecast could be scored."
                : "Root mean square error of forecasts of data that the fit never saw, by how far ahead they reach. A"
                + " fitted operator"
                        + " is worth using only where its curve lies below those of the naive methods.";
        return new Figure("scores", Figure.Kind.CURVES, "Forecast error by horizon", caption,
                Figure.Axis.linear(Axes.labelled("horizon", unit.name())), errorAxis(scores), layers);
    }

    private static Figure.Axis errorAxis(List<ScoreRow> scores) {
        double[] errors = scores.stream().mapToDouble(ScoreRow::rmse).filter(Double::isFinite).sorted().toArray();
        boolean wide = errors.length > 0 && errors[0] > 0 && errors[errors.length - 1] > WIDE * errors[0];
        return wide ? Figure.Axis.log("root mean square error") : Figure.Axis.linear("root mean square error");
    }

    private static Figure.Layer curve(List<ScoreRow> scores, String method, boolean first) {
        List<ScoreRow> own = scores.stream().filter(row -> row.method().equals(method))
                .sorted(Comparator.comparingDouble(ScoreRow::horizon)).toList();
        double[] errors = own.stream().mapToDouble(ScoreRow::rmse).map(e -> Double.isFinite(e) ? e : Double.NaN).toArray();
        double[] horizons = own.stream().mapToDouble(ScoreRow::horizon).toArray();
        return new Figure.Line(method.replace('-', ' '), "method:" + method, horizons, errors,
                first ? Figure.Emphasis.STRONG : Figure.Emphasis.NORMAL);
    }
}
