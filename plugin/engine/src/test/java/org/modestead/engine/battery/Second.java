package org.modestead.engine.battery;

import static java.lang.StrictMath.PI;
import static java.lang.StrictMath.cos;
import static java.lang.StrictMath.exp;
import static java.lang.StrictMath.log;
import static java.lang.StrictMath.sin;
import static java.lang.StrictMath.sqrt;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;

/**
 * The second calibration part: it was the reporting part until rules were changed after it had been seen. Systems of the same kinds as the
 * first part with other parameters, and some others. Derivations that are those of the first part are not repeated.
 */
final class Second {

    private Second() {}

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        plane(out);
        space(out);
        line(out);
        manifolds(out);
        oscillators(out);
        waves(out);
        sums(out);
        chaos(out);
        chance(out);
        return out;
    }

    /**
     * Normal with rates -0.25 ± 1.4i; diagonal with rates -0.5, -1.3 (no rate is a sum of others up to degree 2); upper triangular with
     * left
     * eigenvectors (1, 1) of -0.6 and (0, 1) of -1.7, overlap 0.71. As in {@link LinearFlows}. The Gaussian space
     * holds no mode that decays: near the fixed point an analytic eigenfunction of these rates is a polynomial.
     */
    private static void plane(List<Case> out) {
        KnownSystem spiral = Paths.linear("spiral 2d", 50, 0.1, new double[][] {{-0.25, 1.4}, {-1.4, -0.25}});
        out.add(new Case(spiral, Look.exponential(6), Truth.STANDS));
        out.add(new Case(spiral, Look.polynomial(2, 6), Truth.STANDS));
        out.add(new Case(spiral, Look.delays(5, 2), Truth.REPORTABLE));
        out.add(new Case(spiral, Look.monomials(2, 6), Truth.REPORTABLE));
        out.add(new Case(spiral, Look.gaussian(1, 8), Truth.NONE));
        KnownSystem apart = Paths.linear("decays apart 2d", 50, 0.06, new double[][] {{-0.5, 0}, {0, -1.3}});
        out.add(new Case(apart, Look.exponential(6), Truth.STANDS));
        out.add(new Case(apart, Look.linearKernel(2), Truth.STANDS));
        out.add(new Case(apart, Look.monomials(2, 6), Truth.REPORTABLE));
        out.add(new Case(apart, Look.delays(5, 2), Truth.REPORTABLE));
        KnownSystem tilted = Paths.linear("tilted decays 2d", 50, 0.05, new double[][] {{-0.6, 1.1}, {0, -1.7}});
        out.add(new Case(tilted, Look.polynomial(2, 6), Truth.SETTLES));
        out.add(new Case(tilted, Look.linearKernel(2), Truth.SETTLES));
        out.add(new Case(tilted, Look.monomials(2, 6), Truth.REPORTABLE));
        out.add(new Case(tilted, Look.delays(5, 2), Truth.REPORTABLE));
    }

    /** Normal: a growing rotation and a decay; three rotations. Not normal: the second pushes the first, the third the second. */
    private static void space(List<Case> out) {
        KnownSystem growing = Paths.linear("growing rotation and decay 3d", 60, 0.1, new double[][] {{0.05, 1.1, 0}, {-1.1, 0.05, 0}, {0, 0, -0.7}});
        out.add(new Case(growing, Look.linearKernel(3), Truth.STANDS));
        out.add(new Case(growing, Look.delays(3, 3), Truth.REPORTABLE));
        double[][] a = new double[6][6];
        double[] speeds = {0.7, 1.9, 3.1};
        for (int k = 0; k < 3; k++) {
            a[2 * k][2 * k] = -0.08;
            a[2 * k + 1][2 * k + 1] = -0.08;
            a[2 * k][2 * k + 1] = speeds[k];
            a[2 * k + 1][2 * k] = -speeds[k];
        }
        KnownSystem free = Paths.linear("slow rotations 6d", 80, 0.1, a);
        out.add(new Case(free, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(free, Look.delays(5, 6), Truth.REPORTABLE));
        double[][] pushed = IntStream.range(0, 6).mapToObj(i -> a[i].clone()).toArray(double[][]::new);
        pushed[0][2] = 1.2;
        pushed[2][4] = 1.5;
        KnownSystem chain = Paths.linear("chain of rotations 6d", 80, 0.1, pushed);
        out.add(new Case(chain, Look.linearKernel(6), Truth.SETTLES));
        out.add(new Case(chain, Look.delays(5, 6), Truth.REPORTABLE));
    }

    /**
     * As in {@link LineFlows}. For x' = 0.6x + 0.4 the function is x + 2/3, its solo weight {@code 1/(1 + 4/9) = 0.69} against 1: settles.
     */
    private static void line(List<Case> out) {
        KnownSystem decay = line("x'=-0.7x", -1, (x, t) -> x * exp(-0.7 * t));
        out.add(new Case(decay, Look.exponential(6), Truth.STANDS));
        out.add(new Case(decay, Look.polynomial(3, 4), Truth.STANDS));
        out.add(new Case(decay, Look.delays(5, 1), Truth.REPORTABLE));
        KnownSystem affine = line("x'=0.6x+0.4", -1, (x, t) -> (x + 2 / 3.0) * exp(0.6 * t) - 2 / 3.0);
        out.add(new Case(affine, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(affine, Look.monomials(3, 4), Truth.REPORTABLE));
        KnownSystem translation = line("x'=0.8", -1, (x, t) -> x + 0.8 * t);
        out.add(new Case(translation, Look.exponential(6), Truth.DRIFTS));
        out.add(new Case(translation, Look.monomials(3, 4), Truth.DRIFTS));
        out.add(new Case(translation, Look.delays(5, 2), Truth.DRIFTS));
        out.add(new Case(translation, Look.gaussian(1, 6), Truth.NONE));
        KnownSystem riccati = line("x'=0.6x^2", -1, (x, t) -> x / (1 - 0.6 * x * t));
        out.add(new Case(riccati, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(riccati, Look.monomials(5, 6), Truth.NONE));
        KnownSystem cubic = line("x'=-2x^3", -1, (x, t) -> x / sqrt(1 + 4 * x * x * t));
        out.add(new Case(cubic, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(cubic, Look.monomials(5, 6), Truth.NONE));
        KnownSystem logistic = line("x'=1.2(x-x^2)", -0.4, (x, t) -> x * exp(1.2 * t) / (1 + x * (exp(1.2 * t) - 1)));
        out.add(new Case(logistic, Look.exponential(8), Truth.ABSENT));
    }

    private interface Solution {
        double at(double start, double time);
    }

    private static KnownSystem line(String name, double low, Solution solution) {
        return Paths.closed(name, 41, 0.025, Paths.box(1, low, 0.6), (x, t) -> new double[] {solution.at(x[0], t)});
    }

    /** mu = -0.2, lambda = -0.9, b = 1.8: overlap {@code 2b/(√(1 + 2b²) √2) = 0.93}. Hopf: mu = 0.36, gamma = 1.5, beta = 0.3. */
    private static void manifolds(List<Case> out) {
        KnownSystem slow = Paths.closed("slow manifold, b = 1.8", 60, 0.06, Paths.box(2, -1, 1), (x, t) -> new double[] {x[0] * exp(-0.2 * t),
            (x[1] - 1.8 * x[0] * x[0]) * exp(-0.9 * t) + 1.8 * x[0] * x[0] * exp(-0.4 * t)});
        out.add(new Case(slow, Look.exponential(10), Truth.SETTLES));
        out.add(new Case(slow, Look.monomials(2, 6), Truth.REPORTABLE));
        out.add(new Case(slow, Look.delays(6, 3), Truth.REPORTABLE));
        KnownSystem on = hopf("Hopf on the larger cycle", 0.6, 0);
        out.add(new Case(on, Look.delays(6, 2), Truth.REPORTABLE));
        out.add(new Case(on, Look.exponential(5), Truth.STANDS));
        out.add(new Case(hopf("Hopf off the larger cycle", 0.1, 0.9), Look.exponential(10), Truth.ABSENT));
    }

    private static KnownSystem hopf(String name, double least, double width) {
        double mu = 0.36;
        double beta = 0.3;
        return Paths.closed(name, 60, 0.1, Paths.box(2, 0, 1), (u, t) -> {
            double r0 = least + width * u[0];
            double r = sqrt(mu / (1 + (mu / (r0 * r0) - 1) * exp(-2 * mu * t)));
            double angle = 2 * PI * u[1] + (1.5 - beta * mu) * t + beta * log(r / r0);
            return new double[] {r * cos(angle), r * sin(angle)};
        });
    }

    /**
     * Van der Pol at mu = 0.5 (odd harmonics fall faster than at 1). Duffing x'' + x + x³ = 0 (C2.6): the period runs from 5.77 at
     * amplitude 0.5 to 3.2 at 2;
     * at amplitudes up to 0.05 the frequency varies by {@code 3/8 · 0.05² = 1e-3}. Lotka-Volterra, y0 = 2.
     */
    private static void oscillators(List<Case> out) {
        out.add(new Case(Paths.flow("van der Pol 0.5 on the cycle", 150, 0.12, 60, 1,
                random -> new double[] {2 * random.nextDouble() + 0.1, random.nextDouble()},
                x -> new double[] {x[1], 0.5 * (1 - x[0] * x[0]) * x[1] - x[0]}), Look.delays(20, 6), Truth.REPORTABLE));
        Paths.Field duffing = x -> new double[] {x[1], -x[0] - x[0] * x[0] * x[0]};
        KnownSystem ensemble = Paths.flow("Duffing, amplitudes 0.5 to 2", 120, 0.15, 0, 2,
                random -> new double[] {0.5 + 1.5 * random.nextDouble(), 0}, duffing);
        out.add(new Case(ensemble, Look.delays(12, 6), Truth.NONE));
        out.add(new Case(ensemble, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(Paths.flow("Duffing, small", 120, 0.15, 0, 2, random -> new double[] {0.02 + 0.03 * random.nextDouble(), 0}, duffing),
                Look.delays(6, 2), Truth.REPORTABLE));
        Paths.Field predators = x -> new double[] {x[0] * (1 - x[1]), x[1] * (x[0] - 1)};
        out.add(new Case(new KnownSystem("Lotka-Volterra orbit, y0 = 2", 0.2, random -> Paths.flow("", 100, 0.2, 0.01 + 6 * random.nextDouble(), 2,
                r -> new double[] {1, 2}, predators).path().draw(random)), Look.delays(14, 7), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("Lotka-Volterra wide ensemble", 150, 0.15, 0, 2, random -> new double[] {1, 1.5 + 2 * random.nextDouble()}, predators),
                Look.monomials(3, 10), Truth.NONE));
    }

    /** Rotation by √2 - 1; heat at 5 points (h = 1/6, factor 36); waves 1 and 3 at 8 points. */
    private static void waves(List<Case> out) {
        double turn = 2 * PI * (sqrt(2) - 1);
        KnownSystem circle = Paths.closed("circle rotation by √2-1", 60, 1, Paths.box(1, 0, 2 * PI), (x, t) -> new double[] {
            cos(x[0] + turn * t), sin(x[0] + turn * t)});
        out.add(new Case(circle, Look.delays(4, 2), Truth.REPORTABLE));
        out.add(new Case(circle, Look.step("exponential", 5, "rate", 1), Truth.STANDS));
        double[][] a = new double[5][5];
        for (int i = 0; i < 5; i++) {
            a[i][i] = -72;
            if (i > 0) {
                a[i][i - 1] = 36;
                a[i - 1][i] = 36;
            }
        }
        KnownSystem heat = Paths.linear("heat at 5 points", 40, 0.0015, a);
        out.add(new Case(heat, Look.linearKernel(5), Truth.STANDS));
        out.add(new Case(heat, Look.delays(3, 5), Truth.REPORTABLE));
        KnownSystem waves = Paths.closed("waves 1 and 3", 60, 0.1, Paths.box(4, 0.3, 1), (u, t) -> {
            double[] row = new double[8];
            for (int i = 0; i < 8; i++) {
                double at = i / 8.0 - 0.12 * t;
                row[i] = u[0] * cos(2 * PI * (at + 3 * u[2])) + u[1] * cos(6 * PI * (at + 3 * u[3]));
            }
            return row;
        });
        out.add(new Case(waves, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(waves, Look.delays(2, 4), Truth.REPORTABLE));
    }

    /**
     * A ring-down of two tones in one channel. Defective: a slow ramp; {@code (a + bt) cos t}, a double pair ±i (resonance); a critically
     * damped rate of 0.5.
     */
    private static void sums(List<Case> out) {
        out.add(new Case(Paths.closed("ring-down of two tones", 120, 0.1, Paths.box(4, 0.3, 1), (u, t) -> new double[] {
            u[0] * exp(-0.1 * t) * cos(2 * t + 6 * u[2]) + u[1] * exp(-0.15 * t) * cos(4.5 * t + 6 * u[3])}), Look.delays(14, 4), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("slow ramps", 60, 1, Paths.box(2, -1, 1), (u, t) -> new double[] {u[0] + 0.05 * u[1] * t}),
                Look.delays(5, 2), Truth.DRIFTS));
        out.add(new Case(Paths.closed("resonance", 100, 0.2, Paths.box(2, 0.2, 1), (u, t) -> new double[] {(u[0] + 0.2 * u[1] * t) * cos(t)}),
                Look.delays(8, 4), Truth.DRIFTS));
        out.add(new Case(Paths.closed("critically damped, rate 0.5", 60, 0.15, Paths.box(2, -1, 1), (u, t) -> new double[] {
            (u[0] + 1.5 * u[1] * t) * exp(-0.5 * t)}), Look.delays(4, 2), Truth.DRIFTS));
    }

    /** Hénon's map at its classical parameters and Lorenz at rho = 35: chaotic, no point spectrum but the constant. */
    private static void chaos(List<Case> out) {
        KnownSystem henon = Paths.map("Henon map", 80, 1, Paths.box(2, -0.1, 0.1), x -> new double[] {1 - 1.4 * x[0] * x[0] + x[1], 0.3 * x[0]});
        out.add(new Case(henon, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(henon, Look.delays(6, 4), Truth.NONE));
        KnownSystem lorenz = Paths.flow("Lorenz, rho = 35", 200, 0.04, 20, 3, Paths.box(3, 1, 10), x -> new double[] {10 * (x[1] - x[0]),
            x[0] * (35 - x[2]) - x[1], x[0] * x[1] - 8.0 / 3 * x[2]});
        out.add(new Case(lorenz, Look.delays(10, 8), Truth.NONE));
        out.add(new Case(lorenz, Look.monomials(3, 20), Truth.NONE));
    }

    /**
     * An oscillator kicked at every step, z = 0.97 e^(0.4i): over its own time its path misses the mean motion by most of its size, as for
     * Ornstein-Uhlenbeck. White noise, walks and levels as in {@link NoModes}.
     */
    private static void chance(List<Case> out) {
        out.add(new Case(new KnownSystem("kicked oscillator", 0.2, random -> {
            double[][] rows = new double[150][1];
            double now = random.nextGaussian();
            double before = random.nextGaussian();
            for (double[] row : rows) {
                double next = 2 * 0.97 * cos(0.4) * now - 0.97 * 0.97 * before + 0.5 * random.nextGaussian();
                before = now;
                now = next;
                row[0] = now;
            }
            return rows;
        }), Look.delays(8, 4), Truth.NONE));
        out.add(new Case(new KnownSystem("white noise, one channel", 0.1, random -> {
            double[][] rows = new double[150][1];
            for (double[] row : rows) {
                row[0] = random.nextGaussian();
            }
            return rows;
        }), Look.delays(8, 4), Truth.ABSENT));
        KnownSystem walks = new KnownSystem("two random walks", 0.1, random -> {
            double[][] rows = new double[120][2];
            double a = random.nextGaussian();
            double b = random.nextGaussian();
            for (double[] row : rows) {
                row[0] = a;
                row[1] = b;
                a += 0.7 * random.nextGaussian();
                b += 0.7 * random.nextGaussian();
            }
            return rows;
        });
        out.add(new Case(walks, Look.delays(5, 4), Truth.NONE));
        out.add(new Case(walks, Look.monomials(2, 6), Truth.NONE));
        out.add(new Case(new KnownSystem("Ornstein-Uhlenbeck, theta = 2", 0.1, random -> {
            double[][] rows = new double[120][1];
            double x = 0.5 * random.nextGaussian();
            for (double[] row : rows) {
                row[0] = x;
                x = exp(-0.2) * x + 0.5 * sqrt(1 - exp(-0.4)) * random.nextGaussian();
            }
            return rows;
        }), Look.monomials(3, 4), Truth.NONE));
        out.add(new Case(new KnownSystem("late level shift", 0.1, random -> {
            double before = random.nextGaussian();
            double after = random.nextGaussian();
            int at = 60 + random.nextInt(50);
            double[][] rows = new double[140][1];
            for (int k = 0; k < rows.length; k++) {
                rows[k][0] = k < at ? before : after;
            }
            return rows;
        }), Look.delays(6, 4), Truth.NONE));
    }
}
