package org.modestead.nodes.figure;

import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.modestead.engine.operator.FittedOperator;

/** How fast the singular values of the whitening fall, and where the rank was cut. */
public final class SingularValues {
    private SingularValues() {}

    /**
     * Draws the singular values relative to the largest one, over their number.
     *
     * @param operator fitted
     * @return kind {@link Figure.Kind#CURVES}, logarithmic upwards
     */
    public static Figure figure(FittedOperator operator) {
        double[] singular = operator.functions().singular();
        double[] number = IntStream.rangeClosed(1, singular.length).asDoubleStream().toArray();
        double[] relative = Arrays.stream(singular).map(value -> value / singular[0]).toArray();
        List<Figure.Layer> layers = List.of(
                new Figure.Line("singular values", "", number, relative, Figure.Emphasis.STRONG),
                new Figure.Rule("rank " + operator.rank(), "", true, operator.rank()));
        return new Figure("singular-values", Figure.Kind.CURVES, "Singular values",
                "Singular values relative to the largest. Those up to"
                + " the marked rank were kept: " + operator.rankChoice() + ". A sharp drop just behind it says that the"
                + " data hold no more;"
                + " a slow slope says that the rank is a choice.", Figure.Axis.linear("number"),
                Figure.Axis.log("relative singular value"), layers);
    }
}
