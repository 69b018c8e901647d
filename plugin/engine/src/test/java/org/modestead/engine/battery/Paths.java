package org.modestead.engine.battery;

import java.util.Arrays;
import java.util.Random;
import java.util.function.DoubleSupplier;
import java.util.function.UnaryOperator;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.hipparchus.ode.ODEState;
import org.hipparchus.ode.OrdinaryDifferentialEquation;
import org.hipparchus.ode.nonstiff.DormandPrince853Integrator;
import org.modestead.engine.linalg.MatrixExponential;

/** Ways to make a path: closed form, iterated map, linear flow, integrated flow, chance. */
final class Paths {

    private Paths() {}

    /** A random start. */
    interface Start {
        double[] draw(Random random);
    }

    /** State at a time after a start. */
    interface Solution {
        double[] at(double[] start, double time);
    }

    /** {@code x'} at {@code x}. */
    interface Field {
        double[] at(double[] x);
    }

    /** Every component uniform in an interval. */
    static Start box(int size, double low, double high) {
        return random -> random.doubles(size, low, high).toArray();
    }

    static KnownSystem closed(String name, int samples, double step, Start start, Solution solution) {
        return new KnownSystem(name, step, random -> {
            double[] from = start.draw(random);
            double[][] rows = new double[samples][];
            for (int k = 0; k < samples; k++) {
                rows[k] = solution.at(from, k * step);
            }
            return rows;
        });
    }

    static KnownSystem map(String name, int samples, double step, Start start, UnaryOperator<double[]> next) {
        return new KnownSystem(name, step, random -> {
            double[][] rows = new double[samples][];
            rows[0] = start.draw(random);
            for (int k = 1; k < samples; k++) {
                rows[k] = next.apply(rows[k - 1]);
            }
            return rows;
        });
    }

    /** {@code x' = A x}, exactly. */
    static KnownSystem linear(String name, int samples, double step, double[][] a) {
        DMatrixRMaj generator = new DMatrixRMaj(a);
        for (int k = 0; k < generator.getNumElements(); k++) {
            generator.data[k] *= step;
        }
        DMatrixRMaj flow = MatrixExponential.of(generator);
        return map(name, samples, step, box(a.length, -1, 1), x -> {
            double[] y = new double[x.length];
            for (int i = 0; i < y.length; i++) {
                for (int j = 0; j < y.length; j++) {
                    y[i] += flow.get(i, j) * x[j];
                }
            }
            return y;
        });
    }

    /** {@code A x}, A of any shape. */
    static double[] times(double[][] a, double[] x) {
        double[] y = new double[a.length];
        for (int i = 0; i < y.length; i++) {
            for (int j = 0; j < x.length; j++) {
                y[i] += a[i][j] * x[j];
            }
        }
        return y;
    }

    /** {@code x' = A x} from starts that are smaller by a factor: a kernel of small rank then tells the degrees apart. */
    static KnownSystem near(String name, int samples, double step, double factor, double[][] a) {
        return seen(name, linear("", samples, step, a), x -> {
            double[] y = x.clone();
            for (int i = 0; i < y.length; i++) {
                y[i] *= factor;
            }
            return y;
        });
    }

    /** Integrated to 1e-10, first on to a given time that is not recorded; channels are the first ones of the state. */
    static KnownSystem flow(String name, int samples, double step, double unrecorded, int channels, Start start,
            Field field) {
        return new KnownSystem(name, step, random -> {
            double[] x = start.draw(random);
            x = unrecorded > 0 ? advanced(field, x, unrecorded) : x;
            double[][] rows = new double[samples][];
            for (int k = 0; k < samples; k++) {
                rows[k] = Arrays.copyOf(x, channels);
                x = advanced(field, x, step);
            }
            return rows;
        });
    }

    /** A number of samples of the first channels, begun at a random time of a span after a state. */
    static KnownSystem orbit(String name, int samples, double step, double span, int channels, double[] from, Field field) {
        return new KnownSystem(name, step, random -> flow("", samples, step, 0.01 + span * random.nextDouble(), channels,
                ignored -> from.clone(), field).path().draw(random));
    }

    /** What is seen of a hidden path. */
    static KnownSystem seen(String name, KnownSystem hidden, UnaryOperator<double[]> gauge) {
        return new KnownSystem(name, hidden.step(), random -> {
            double[][] rows = hidden.path().draw(random);
            for (int k = 0; k < rows.length; k++) {
                rows[k] = gauge.apply(rows[k]);
            }
            return rows;
        });
    }

    /** A path of numbers: every call gives the next. */
    interface Chain {
        DoubleSupplier start(Random random);
    }

    /** One channel, each number the next of a chain. */
    static KnownSystem chance(String name, int samples, double step, Chain chain) {
        return new KnownSystem(name, step, random -> {
            DoubleSupplier next = chain.start(random);
            return Stream.generate(() -> new double[] {next.getAsDouble()}).limit(samples).toArray(double[][]::new);
        });
    }

    private static double[] advanced(Field field, double[] x, double time) {
        OrdinaryDifferentialEquation equation = new OrdinaryDifferentialEquation() {
            @Override
            public int getDimension() {
                return x.length;
            }

            @Override
            public double[] computeDerivatives(double t, double[] y) {
                return field.at(y);
            }
        };
        return new DormandPrince853Integrator(1e-9, time, 1e-10, 1e-10).integrate(equation, new ODEState(0, x),
                time).getPrimaryState();
    }
}
