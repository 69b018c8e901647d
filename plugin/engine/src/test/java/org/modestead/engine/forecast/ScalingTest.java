package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.OptionalDouble;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/** What must not depend on the units of the channels. */
class ScalingTest {

    private static final double[][] MAP = {{0.9, 0.3}, {-0.2, 0.7}};

    private static ForecastResult forecast(double c0, double c1, Route route) {
        Fixture.Signal first = t -> c0 * (Math.sin(t) + 0.3 * t);
        Fixture.Signal second = t -> c1 * Math.cos(0.7 * t);
        List<Run> training = List.of(Fixture.run("a", 0, 40, 0, 1, first, second));
        List<Run> holdout = List.of(Fixture.run("a", 39, 80, 1, 1, first, second));
        Snapshots snapshots = Fixture.snapshots(List.of("m", "bar"), training, List.of(), holdout, OptionalDouble.of(1));
        double[][] map = {{MAP[0][0], MAP[0][1] * c0 / c1}, {MAP[1][0] * c1 / c0, MAP[1][1]}};
        ForecastPlan plan = new ForecastPlan(route, Origin.RECORDING_END, OptionalDouble.of(10), 0.9, 0, List.of());
        return Fixture.linear(snapshots, new Evolution.StepMap(1), map).run(plan);
    }

    /** The same flow in other units gives the same forecast and band in these units, and the same scaled error. */
    @Property(tries = 50, seed = "20261201")
    void scalingAChannelScalesItsForecast(@ForAll @DoubleRange(min = 0.01, max = 100) double c0,
            @ForAll @DoubleRange(min = 0.01, max = 100) double c1, @ForAll boolean modal) {
        Route route = modal ? Route.MODAL : Route.PROJECTION;
        ForecastResult plain = forecast(1, 1, route);
        ForecastResult scaled = forecast(c0, c1, route);
        // Values are of order 10; eigenvectors of the badly scaled map lose up to its scale ratio of 1e4 in rounding.
        double tolerance = 1e-9;
        for (int k = 0; k < plain.forecast().size(); k++) {
            double unit = k % 2 == 0 ? c0 : c1;
            assertEquals(plain.forecast().get(k).value(), scaled.forecast().get(k).value() / unit, tolerance);
            assertEquals(plain.forecast().get(k).high(), scaled.forecast().get(k).high() / unit, tolerance);
        }
        for (int k = 0; k < plain.scores().size(); k++) {
            assertEquals(plain.scores().get(k).mase(), scaled.scores().get(k).mase(), tolerance);
        }
    }
}
