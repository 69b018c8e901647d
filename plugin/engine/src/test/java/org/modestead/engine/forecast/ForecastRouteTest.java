package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.OptionalDouble;
import org.ejml.data.DMatrixRMaj;
import org.hipparchus.ode.ExpandableODE;
import org.hipparchus.ode.ODEState;
import org.hipparchus.ode.OrdinaryDifferentialEquation;
import org.hipparchus.ode.nonstiff.DormandPrince853Integrator;
import org.junit.jupiter.api.Test;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/** Both routes against closed forms and against an integrator from another library. */
class ForecastRouteTest {

    /** A few hundred roundings of numbers of order 1. */
    private static final double ROUNDING = 1e-12;
    /** The integrator's own tolerance is 1e-13 a step; over the runs here its error stays below this. */
    private static final double INTEGRATOR = 1e-10;

    private static Snapshots plain(int channels, double step) {
        Fixture.Signal[] signals = new Fixture.Signal[channels];
        Arrays.fill(signals, (Fixture.Signal) t -> Math.sin(t));
        List<Run> training = List.of(Fixture.run("a", 0, 20, 0, step, signals));
        List<String> units = Collections.nCopies(channels, "m");
        return Fixture.snapshots(units, training, List.of(), List.of(), OptionalDouble.of(step));
    }

    private static List<ForecastRoute> routes(Fixture fixture, double step) {
        return List.of(new ModalRoute(fixture.operator(), fixture.spectrum(), step),
                new ProjectionRoute(fixture.operator(), step));
    }

    @Test
    void decayOfTwoChannelsIsAPowerOfTheMultipliers() {
        Fixture fixture = Fixture.linear(plain(2, 1), new Evolution.StepMap(1), new double[][] {{0.9, 0}, {0, 0.5}});
        for (ForecastRoute route : routes(fixture, 1)) {
            DMatrixRMaj out = route.forecast(new DMatrixRMaj(new double[][] {{3, -2}}), 25);
            for (int k = 1; k <= 25; k++) {
                assertEquals(3 * Math.pow(0.9, k), out.get(k - 1, 0), ROUNDING, route.id());
                assertEquals(-2 * Math.pow(0.5, k), out.get(k - 1, 1), ROUNDING, route.id());
            }
        }
    }

    @Test
    void negativeMultiplierAlternates() {
        // CHECKS C2.18: (-0.5)^k has no real generator at this step; powers of the eigenvalue still follow it.
        Fixture fixture = Fixture.linear(plain(1, 1), new Evolution.StepMap(1), new double[][] {{-0.5}});
        for (ForecastRoute route : routes(fixture, 1)) {
            DMatrixRMaj out = route.forecast(new DMatrixRMaj(new double[][] {{8}}), 3);
            assertEquals(-4, out.get(0, 0), ROUNDING, route.id());
            assertEquals(2, out.get(1, 0), ROUNDING, route.id());
            assertEquals(-1, out.get(2, 0), ROUNDING, route.id());
        }
    }

    @Test
    void decayingRotationOfAGeneratorFollowsClosedFormAndIntegrator() {
        // CHECKS C2.1: A = [[-0.1, 2], [-2, -0.1]]
        double[][] a = {{-0.1, 2}, {-2, -0.1}};
        double step = 0.1;
        Fixture fixture = Fixture.linear(plain(2, step), new Evolution.Generator(1), a);
        for (ForecastRoute route : routes(fixture, step)) {
            DMatrixRMaj out = route.forecast(new DMatrixRMaj(new double[][] {{1, 0.5}}), 60);
            for (int k = 1; k <= 60; k++) {
                double t = k * step;
                double exact = Math.exp(-0.1 * t) * (Math.cos(2 * t) + 0.5 * Math.sin(2 * t));
                assertEquals(exact, out.get(k - 1, 0), ROUNDING, route.id());
            }
            double[] integrated = integrate(a, new double[] {1, 0.5}, 60 * step);
            assertEquals(integrated[0], out.get(59, 0), INTEGRATOR, route.id());
            assertEquals(integrated[1], out.get(59, 1), INTEGRATOR, route.id());
        }
    }

    private static double[] integrate(double[][] a, double[] start, double time) {
        OrdinaryDifferentialEquation linear = new OrdinaryDifferentialEquation() {
            @Override
            public int getDimension() {
                return start.length;
            }

            @Override
            public double[] computeDerivatives(double t, double[] x) {
                double[] out = new double[x.length];
                for (int i = 0; i < x.length; i++) {
                    for (int j = 0; j < x.length; j++) {
                        out[i] += a[i][j] * x[j];
                    }
                }
                return out;
            }
        };
        DormandPrince853Integrator integrator = new DormandPrince853Integrator(1e-6, 1, 1e-13, 1e-13);
        return integrator.integrate(new ExpandableODE(linear), new ODEState(0, start), time).getPrimaryState();
    }

    @Test
    void rotationStepMapHasTheEigenvaluesOfTheSampledFlow() {
        // CHECKS C2.1: dt 0.1 gives z = 0.970314752454837 ± 0.196692537924709 i, which is [[re, im], [-im, re]] as a map.
        double re = 0.970314752454837;
        double im = 0.196692537924709;
        Fixture fixture = Fixture.linear(plain(2, 0.1), new Evolution.StepMap(0.1), new double[][] {{re, im}, {-im, re}});
        for (ForecastRoute route : routes(fixture, 0.1)) {
            DMatrixRMaj out = route.forecast(new DMatrixRMaj(new double[][] {{1, 0}}), 30);
            assertEquals(Math.exp(-0.3) * Math.cos(6), out.get(29, 0), 1e-12, route.id() + ", 15 digits, 30 steps");
            assertEquals(-Math.exp(-0.3) * Math.sin(6), out.get(29, 1), 1e-12, route.id());
        }
    }

    @Test
    void slowManifoldIsForecastExactlyThroughThreeFunctions() {
        // CHECKS C2.3: mu = -0.05, lambda = -1 from (2, -1): x(3) = (1.721415952850116, 3.021462497471487).
        FunctionBasis basis = new FunctionBasis() {
            @Override
            public int size() {
                return 3;
            }

            @Override
            public DMatrixRMaj evaluate(DMatrixRMaj states) {
                DMatrixRMaj out = new DMatrixRMaj(states.numRows, 3);
                for (int k = 0; k < states.numRows; k++) {
                    double x1 = states.get(k, 0);
                    out.set(k, 0, x1);
                    out.set(k, 1, states.get(k, 1));
                    out.set(k, 2, x1 * x1);
                }
                return out;
            }

            @Override
            public String describe() {
                return "x1, x2, x1²";
            }
        };
        DMatrixRMaj action = new DMatrixRMaj(new double[][] {{-0.05, 0, 0}, {0, -1, 0}, {0, 1, -0.1}});
        DMatrixRMaj observable = new DMatrixRMaj(new double[][] {{1, 0}, {0, 1}, {0, 0}});
        Fixture fixture = Fixture.of(plain(2, 0.1), new Evolution.Generator(1), basis, action, observable);
        for (ForecastRoute route : routes(fixture, 0.1)) {
            DMatrixRMaj out = route.forecast(new DMatrixRMaj(new double[][] {{2, -1}}), 30);
            assertEquals(1.721415952850116, out.get(29, 0), 1e-10, route.id() + ", tolerance of the check");
            assertEquals(3.021462497471487, out.get(29, 1), 1e-10, route.id());
        }
    }

    @Test
    void delaysShiftByTheirSpacing() {
        // With states [y_k, y_(k-2)] a cosine obeys y_(k+1) = a y_k + b y_(k-2), y_(k-1) = c y_k + d y_(k-2) (closed form).
        double w = 0.3;
        double d = 1 / (2 * Math.cos(w));
        double[][] map = {{Math.cos(w) + d * Math.cos(2 * w), -d}, {Math.cos(w) - d * Math.cos(2 * w), d}};
        Fixture.Signal cosine = t -> Math.cos(w * t + 0.4);
        List<Run> training = List.of(Fixture.run("a", 0, 20, 0, 1, cosine));
        Snapshots snapshots = Fixture.snapshots(List.of("m"), training, List.of(), List.of(), OptionalDouble.of(1),
                new DelayEmbedding(2, 2), Preparation.identity(1));
        Fixture fixture = Fixture.linear(snapshots, new Evolution.StepMap(1), map);
        for (ForecastRoute route : routes(fixture, 1)) {
            assertEquals(3, route.memory());
            DMatrixRMaj out = route.forecast(snapshots.training().get(0).values(), 40);
            for (int k = 1; k <= 40; k++) {
                // 40 steps each amplify the rounding of the one before by a few.
                assertEquals(cosine.at(19 + k), out.get(k - 1, 0), 1e-11, route.id());
            }
        }
    }

    @Test
    void persistenceRepeatsTheRecordedValueAlsoWhereATrendWasTakenOut() {
        Preparation trend = new Preparation(5, new double[] {3}, new double[] {0.5}, new double[] {2});
        double last = trend.prepare(0, 10, 7.25);
        DMatrixRMaj out = new Persistence(trend, 0.5).forecast(new DMatrixRMaj(new double[][] {{last}}), 6);
        for (int k = 1; k <= 6; k++) {
            assertEquals(7.25, trend.restore(0, 10 + 0.5 * k, out.get(k - 1, 0)), ROUNDING);
        }
    }

    @Test
    void seasonalNaiveRepeatsTheLastSeason() {
        DMatrixRMaj history = new DMatrixRMaj(new double[][] {{9}, {1}, {2}, {3}});
        DMatrixRMaj out = new SeasonalNaive(Preparation.identity(1), 1, 3).forecast(history, 7);
        assertArrayEquals(new double[] {1, 2, 3, 1, 2, 3, 1}, out.data);
    }
}
