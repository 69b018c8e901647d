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
 * The third calibration part: it was the reporting part until rules were changed after it had been seen. Systems of the same kinds as in
 * the parts before it with other parameters, sizes and sampling; derivations that are those of the first part are not repeated.
 */
final class Third {

    private Third() {}

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        plane(out);
        space(out);
        line(out);
        manifolds(out);
        oscillators(out);
        predators(out);
        waves(out);
        sums(out);
        chaos(out);
        chance(out);
        return out;
    }

    /**
     * As in {@link LinearFlows}. Normal with rates -0.18 ± 2.6i; diagonal with rates -0.4 and -1.1, no sum of others up to degree 2 (-0.8,
     * -1.5, -2.2); lower triangular with left eigenvectors (1.5, 1) of -0.45 and (1, 0) of -1.6: overlap {@code 1.5/√3.25 = 0.83}, and the
     * weights (0, 1), (1, -1.5) against solo ones (1.5, 1)/3.25, (1, 0) are 0.83 apart; sums of degree 2 are -0.9, -2.05, -3.2. Over a run
     * of 3.1 or 2.8 every decay is seen and none is over within the first samples. Gaussian: none that is analytic at the fixed point but
     * polynomials.
     */
    private static void plane(List<Case> out) {
        KnownSystem spiral = Paths.linear("fast spiral 2d", 55, 0.08, new double[][] {{-0.18, 2.6}, {-2.6, -0.18}});
        out.add(new Case(spiral, Look.exponential(6), Truth.STANDS));
        out.add(new Case(spiral, Look.linearKernel(2), Truth.STANDS));
        out.add(new Case(spiral, Look.delays(4, 2), Truth.REPORTABLE));
        out.add(new Case(spiral, Look.monomials(2, 6), Truth.REPORTABLE));
        out.add(new Case(spiral, Look.gaussian(1, 8), Truth.NONE));
        KnownSystem slow = Paths.linear("slow decays 2d", 45, 0.07, new double[][] {{-0.4, 0}, {0, -1.1}});
        out.add(new Case(slow, Look.exponential(6), Truth.STANDS));
        out.add(new Case(slow, Look.polynomial(2, 6), Truth.STANDS));
        out.add(new Case(slow, Look.monomials(2, 6), Truth.REPORTABLE));
        out.add(new Case(slow, Look.delays(6, 2), Truth.REPORTABLE));
        KnownSystem leaning = Paths.linear("leaning decays 2d", 50, 0.058, new double[][] {{-1.6, 0}, {1.725, -0.45}});
        out.add(new Case(leaning, Look.polynomial(2, 6), Truth.SETTLES));
        out.add(new Case(leaning, Look.linearKernel(2), Truth.SETTLES));
        out.add(new Case(leaning, Look.monomials(2, 6), Truth.REPORTABLE));
        out.add(new Case(leaning, Look.delays(6, 2), Truth.REPORTABLE));
    }

    /**
     * As in {@link LinearFlows}. Normal: a decay and a slowly growing rotation; three rotations. Not normal: a decay (-0.45) pushes a
     * rotation with 2.8, so the left eigenvector of -0.12 + 1.5i is (1, i, z), {@code |z| = 2.8/|0.33 + 1.5i| = 1.82}, and overlaps
     * (0, 0, 1) by {@code |z|/√(2 + |z|²) = 0.79}, its own conjugate by 0.62; joint and solo weights are 0.79 and more apart. Three
     * rotations, the second pushes the first, the third the second, with 1.8: the largest overlap of each pair with another is 0.56 to 0.74,
     * joint and solo weights 0.60 to 0.82 apart (eigenvectors computed by another program).
     */
    private static void space(List<Case> out) {
        KnownSystem growing = Paths.linear("decay and growing rotation 3d", 70, 0.09, new double[][] {{-0.4, 0, 0}, {0, 0.03, 1.6}, {0, -1.6, 0.03}});
        out.add(new Case(growing, Look.linearKernel(3), Truth.STANDS));
        out.add(new Case(growing, Look.delays(5, 3), Truth.REPORTABLE));
        KnownSystem driven = Paths.linear("rotation driven by a decay 3d", 60, 0.1,
                new double[][] {{-0.12, 1.5, 0}, {-1.5, -0.12, 2.8}, {0, 0, -0.45}});
        out.add(new Case(driven, Look.linearKernel(3), Truth.SETTLES));
        double[][] a = new double[6][6];
        double[] speeds = {1.2, 2.1, 3.4};
        double[] damping = {0.06, 0.11, 0.09};
        for (int k = 0; k < 3; k++) {
            a[2 * k][2 * k] = -damping[k];
            a[2 * k + 1][2 * k + 1] = -damping[k];
            a[2 * k][2 * k + 1] = speeds[k];
            a[2 * k + 1][2 * k] = -speeds[k];
        }
        KnownSystem free = Paths.linear("unlike rotations 6d", 70, 0.11, a);
        out.add(new Case(free, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(free, Look.delays(6, 6), Truth.REPORTABLE));
        double[][] pushed = IntStream.range(0, 6).mapToObj(i -> a[i].clone()).toArray(double[][]::new);
        pushed[1][3] = 1.8;
        pushed[2][5] = 1.8;
        KnownSystem row = Paths.linear("row of rotations 6d", 70, 0.11, pushed);
        out.add(new Case(row, Look.linearKernel(6), Truth.SETTLES));
        out.add(new Case(row, Look.delays(6, 6), Truth.REPORTABLE));
    }

    /**
     * As in {@link LineFlows}. For x' = -0.8x + 0.6 the function is x - 3/4, its solo weight {@code 1/(1 + 9/16) = 0.64} against 1: settles.
     * Up to the end of a run x' = 0.8x² from 0.6 has not escaped (at 2.08), nor x' = 0.9x - 1.1x² from -0.3 (it has reached -2.1). That
     * has two simple zeros; {@code x/(x - 9/11)} to a power has a pole at 9/11, its inverse one at 0: none is entire.
     */
    private static void line(List<Case> out) {
        KnownSystem decay = line("x'=-1.3x", -1, (x, t) -> x * exp(-1.3 * t));
        out.add(new Case(decay, Look.exponential(6), Truth.STANDS));
        out.add(new Case(decay, Look.polynomial(3, 4), Truth.STANDS));
        out.add(new Case(decay, Look.delays(4, 1), Truth.REPORTABLE));
        KnownSystem affine = line("x'=-0.8x+0.6", -1, (x, t) -> (x - 0.75) * exp(-0.8 * t) + 0.75);
        out.add(new Case(affine, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(affine, Look.monomials(3, 4), Truth.REPORTABLE));
        KnownSystem translation = line("x'=-0.6", -1, (x, t) -> x - 0.6 * t);
        out.add(new Case(translation, Look.exponential(6), Truth.DRIFTS));
        out.add(new Case(translation, Look.monomials(3, 4), Truth.DRIFTS));
        out.add(new Case(translation, Look.delays(4, 2), Truth.DRIFTS));
        out.add(new Case(translation, Look.gaussian(1, 6), Truth.NONE));
        KnownSystem riccati = line("x'=0.8x^2", -1, (x, t) -> x / (1 - 0.8 * x * t));
        out.add(new Case(riccati, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(riccati, Look.monomials(5, 6), Truth.NONE));
        KnownSystem cubic = line("x'=-1.5x^3", -1, (x, t) -> x / sqrt(1 + 3 * x * x * t));
        out.add(new Case(cubic, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(cubic, Look.monomials(5, 6), Truth.NONE));
        KnownSystem logistic = line("x'=0.9x-1.1x^2", -0.3, (x, t) -> x * exp(0.9 * t) / (1 + 11.0 / 9 * x * (exp(0.9 * t) - 1)));
        out.add(new Case(logistic, Look.exponential(8), Truth.ABSENT));
    }

    private interface Solution {
        double at(double start, double time);
    }

    private static KnownSystem line(String name, double low, Solution solution) {
        return Paths.closed(name, 51, 0.022, Paths.box(1, low, 0.6), (x, t) -> new double[] {solution.at(x[0], t)});
    }

    /**
     * Slow manifold: mu = -0.22, lambda = -0.8, {@code b = 0.8/0.36 = 20/9}: overlap {@code 2b/(√(1 + 2b²) √2) = 0.95}, solo weight of the
     * function of lambda {@code 1/(1 + 2b²) = 0.09} against 1. lambda is none of -0.44, -0.66, -1.02 and -1.24, which are the other rates up
     * to degree 3 near it. Hopf: mu = 0.3, gamma = 1.7, beta = 0.6, radius 0.55, speed 1.52, starts off the cycle from 0.1 to 0.95; the
     * eigenfunctions that are analytic at the origin are products of {@code r e^(iθ) (1 - r²/mu)^(-(1 + i beta)/2)} and its conjugate, which
     * the cycle bounds: no entire one.
     */
    private static void manifolds(List<Case> out) {
        double b = 20.0 / 9;
        KnownSystem slow = Paths.closed("slow manifold, b = 2.2", 65, 0.065, Paths.box(2, -1, 1), (x, t) -> new double[] {x[0] * exp(-0.22 * t),
            (x[1] - b * x[0] * x[0]) * exp(-0.8 * t) + b * x[0] * x[0] * exp(-0.44 * t)});
        out.add(new Case(slow, Look.exponential(10), Truth.SETTLES));
        out.add(new Case(slow, Look.monomials(2, 6), Truth.REPORTABLE));
        out.add(new Case(slow, Look.delays(5, 3), Truth.REPORTABLE));
        KnownSystem on = hopf("Hopf on the cycle, beta = 0.6", sqrt(0.3), 0);
        out.add(new Case(on, Look.delays(5, 2), Truth.REPORTABLE));
        out.add(new Case(on, Look.exponential(5), Truth.STANDS));
        out.add(new Case(hopf("Hopf off the cycle, beta = 0.6", 0.1, 0.85), Look.exponential(10), Truth.ABSENT));
    }

    private static KnownSystem hopf(String name, double least, double width) {
        double mu = 0.3;
        double beta = 0.6;
        return Paths.closed(name, 65, 0.09, Paths.box(2, 0, 1), (u, t) -> {
            double r0 = least + width * u[0];
            double r = sqrt(mu / (1 + (mu / (r0 * r0) - 1) * exp(-2 * mu * t)));
            double angle = 2 * PI * u[1] + (1.7 - beta * mu) * t + beta * log(r / r0);
            return new double[] {r * cos(angle), r * sin(angle)};
        });
    }

    /**
     * Van der Pol at mu = 0.8: odd harmonics 1, 0.096, 0.016, 0.003, three pairs hold it. Pendulum {@code x'' = -1.44 sin x}: the period is
     * 1.02 to 1.49 times {@code 2π/1.2} at amplitudes 0.6 to 2.3: no isolated frequency. Damped by 0.25 every start is drawn to the rest at 0;
     * an eigenfunction of a rate that decays grows without bound towards the separatrix, which the solutions take ever longer to leave: none
     * is entire. Duffing {@code x'' + 0.12x' + 2x + 3x³ = 0} at amplitudes up to 0.05: the frequency varies by {@code 9 · 0.05²/16 = 1.4e-3}
     * at first, then less: linear to that share, rates -0.06 ± 1.41i.
     */
    private static void oscillators(List<Case> out) {
        out.add(new Case(Paths.flow("van der Pol 0.8 on the cycle", 150, 0.11, 50, 1,
                random -> new double[] {2 * random.nextDouble() + 0.1, random.nextDouble()},
                x -> new double[] {x[1], 0.8 * (1 - x[0] * x[0]) * x[1] - x[0]}), Look.delays(18, 6), Truth.REPORTABLE));
        out.add(new Case(pendulum("stiff pendulum, amplitudes 0.6 to 2.3", 0), Look.delays(12, 6), Truth.NONE));
        out.add(new Case(pendulum("damped stiff pendulum, amplitudes 0.6 to 2.3", 0.25), Look.step("exponential", 12, "rate", 0.25), Truth.NONE));
        out.add(new Case(Paths.flow("damped Duffing, small", 110, 0.14, 0, 2, random -> new double[] {0.02 + 0.03 * random.nextDouble(), 0},
                x -> new double[] {x[1], -0.12 * x[1] - 2 * x[0] - 3 * x[0] * x[0] * x[0]}), Look.delays(6, 2), Truth.REPORTABLE));
    }

    private static KnownSystem pendulum(String name, double damping) {
        return Paths.flow(name, 110, 0.18, 0, 2, random -> new double[] {0.6 + 1.7 * random.nextDouble(), 0},
                x -> new double[] {x[1], -damping * x[1] - 1.44 * sin(x[0])});
    }

    /**
     * Lotka-Volterra with {@code y' = 0.8 y (x - 1)}. On the orbit through (1, 1.8), period 7.31, harmonics fall by 4: 1, 0.26, 0.07, 0.02; a
     * constant and three of them hold it. From y0 = 1.4 to 3.2 the period runs from 7.1 to 8.4: no isolated frequency.
     */
    private static void predators(List<Case> out) {
        Paths.Field field = x -> new double[] {x[0] * (1 - x[1]), 0.8 * x[1] * (x[0] - 1)};
        out.add(new Case(new KnownSystem("slow predators, orbit", 0.2, random -> Paths.flow("", 110, 0.2, 0.01 + 7 * random.nextDouble(), 2,
                r -> new double[] {1, 1.8}, field).path().draw(random)), Look.delays(14, 7), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("slow predators, ensemble", 140, 0.18, 0, 2, random -> new double[] {1, 1.4 + 1.8 * random.nextDouble()}, field),
                Look.monomials(3, 10), Truth.NONE));
    }

    /**
     * As in {@link Signals}: rotation by √3 - 1; heat at 4 points (h = 1/5, factor 25, symmetric; rates -9.5 to -90); waves 2 and 3 at 10
     * points of a period, whose planes are orthogonal (2, 3, 8 and 7 are different modulo 10).
     */
    private static void waves(List<Case> out) {
        double turn = 2 * PI * (sqrt(3) - 1);
        KnownSystem circle = Paths.closed("circle rotation by √3-1", 70, 1, Paths.box(1, 0, 2 * PI), (x, t) -> new double[] {
            cos(x[0] + turn * t), sin(x[0] + turn * t)});
        out.add(new Case(circle, Look.delays(5, 2), Truth.REPORTABLE));
        out.add(new Case(circle, Look.step("exponential", 5, "rate", 1), Truth.STANDS));
        double[][] a = new double[4][4];
        for (int i = 0; i < 4; i++) {
            a[i][i] = -50;
            if (i > 0) {
                a[i][i - 1] = 25;
                a[i - 1][i] = 25;
            }
        }
        KnownSystem heat = Paths.linear("heat at 4 points", 45, 0.0018, a);
        out.add(new Case(heat, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(heat, Look.delays(4, 4), Truth.REPORTABLE));
        KnownSystem waves = Paths.closed("waves 2 and 3", 65, 0.1, Paths.box(4, 0.3, 1), (u, t) -> {
            double[] row = new double[10];
            for (int i = 0; i < 10; i++) {
                double at = i / 10.0 - 0.09 * t;
                row[i] = u[0] * cos(4 * PI * (at + 3 * u[2])) + u[1] * cos(6 * PI * (at + 3 * u[3]));
            }
            return row;
        });
        out.add(new Case(waves, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(waves, Look.delays(3, 4), Truth.REPORTABLE));
    }

    /**
     * A ring-down of two tones in one channel, -0.08 ± 1.6i and -0.14 ± 3.7i: four exponentials. Defective: ramps (a double rate 0);
     * {@code (a + bt) cos 1.3t}, a double pair ±1.3i; a critically damped rate of 0.8, double. As in {@link Signals}.
     */
    private static void sums(List<Case> out) {
        out.add(new Case(Paths.closed("slower ring-down of two tones", 110, 0.12, Paths.box(4, 0.3, 1), (u, t) -> new double[] {
            u[0] * exp(-0.08 * t) * cos(1.6 * t + 6 * u[2]) + u[1] * exp(-0.14 * t) * cos(3.7 * t + 6 * u[3])}),
                Look.delays(16, 4), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("middling ramps", 65, 1, Paths.box(2, -1, 1), (u, t) -> new double[] {1.5 * u[0] + 0.07 * u[1] * t}),
                Look.delays(6, 2), Truth.DRIFTS));
        out.add(new Case(Paths.closed("resonance at 1.3", 110, 0.16, Paths.box(2, 0.2, 1), (u, t) -> new double[] {
            (u[0] + 0.22 * u[1] * t) * cos(1.3 * t)}), Look.delays(10, 4), Truth.DRIFTS));
        out.add(new Case(Paths.closed("critically damped, rate 0.8", 55, 0.12, Paths.box(2, -1, 1), (u, t) -> new double[] {
            (u[0] + 2.4 * u[1] * t) * exp(-0.8 * t)}), Look.delays(5, 2), Truth.DRIFTS));
    }

    /**
     * Ulam's map 1 - 2x² is the logistic map of {@link NoModes} in other coordinates: U T_k = ± T_2k, residual 1: absent. Lozi's map at 1.7 and
     * 0.3, where {@code √2 · 1.7 > 2.3}, {@code 1.7 > 1.3}, {@code 3.7 < 4} and {@code 0.3 < (1.7² - 1)/4.4}: its attractor is chaotic and
     * mixing (Misiurewicz, Annals of the New York Academy of Sciences 357:348, 1980; Collet and Levy, Communications in Mathematical Physics
     * 93:461, 1984). Lorenz at rho = 30, within the range of the geometric model: no point spectrum but the constant.
     */
    private static void chaos(List<Case> out) {
        out.add(new Case(Paths.map("Ulam map", 70, 1, Paths.box(1, -0.98, 0.98), x -> new double[] {1 - 2 * x[0] * x[0]}),
                Look.monomials(6, 7), Truth.ABSENT));
        out.add(new Case(Paths.map("Lozi map", 80, 1, Paths.box(2, -0.1, 0.1), x -> new double[] {1 - 1.7 * Math.abs(x[0]) + x[1], 0.3 * x[0]}),
                Look.delays(6, 4), Truth.NONE));
        KnownSystem lorenz = Paths.flow("Lorenz, rho = 30", 190, 0.045, 20, 3, Paths.box(3, 1, 10), x -> new double[] {10 * (x[1] - x[0]),
            x[0] * (30 - x[2]) - x[1], x[0] * x[1] - 8.0 / 3 * x[2]});
        out.add(new Case(lorenz, Look.delays(12, 8), Truth.NONE));
        out.add(new Case(lorenz, Look.monomials(3, 20), Truth.NONE));
    }

    /**
     * An oscillator kicked at every step, z = 0.95 e^(0.5i): over its own time its path misses the mean motion by √(1 - e^-2) of its size, as
     * for Ornstein-Uhlenbeck, here with theta = 1.5. Noise that is uniform, walks that toss a coin and levels as in {@link NoModes}.
     */
    private static void chance(List<Case> out) {
        out.add(new Case(new KnownSystem("kicked oscillator, 0.95", 0.2, random -> {
            double[][] rows = new double[140][1];
            double now = random.nextGaussian();
            double before = random.nextGaussian();
            for (double[] row : rows) {
                double next = 2 * 0.95 * cos(0.5) * now - 0.95 * 0.95 * before + 0.6 * random.nextGaussian();
                before = now;
                now = next;
                row[0] = now;
            }
            return rows;
        }), Look.delays(8, 4), Truth.NONE));
        out.add(new Case(new KnownSystem("uniform noise", 0.1, random -> {
            double[][] rows = new double[140][1];
            for (double[] row : rows) {
                row[0] = 2 * random.nextDouble() - 1;
            }
            return rows;
        }), Look.delays(6, 4), Truth.ABSENT));
        KnownSystem walk = new KnownSystem("coin walk", 0.1, random -> {
            double[][] rows = new double[130][1];
            double x = random.nextGaussian();
            for (double[] row : rows) {
                row[0] = x;
                x += random.nextBoolean() ? 0.8 : -0.8;
            }
            return rows;
        });
        out.add(new Case(walk, Look.delays(6, 4), Truth.NONE));
        out.add(new Case(walk, Look.monomials(3, 4), Truth.NONE));
        out.add(new Case(new KnownSystem("Ornstein-Uhlenbeck, theta = 1.5", 0.1, random -> {
            double[][] rows = new double[130][1];
            double x = 0.6 * random.nextGaussian();
            for (double[] row : rows) {
                row[0] = x;
                x = exp(-0.15) * x + 0.6 * sqrt(1 - exp(-0.3)) * random.nextGaussian();
            }
            return rows;
        }), Look.monomials(3, 4), Truth.NONE));
        out.add(new Case(new KnownSystem("level shift at any time", 0.1, random -> {
            double before = random.nextGaussian();
            double after = random.nextGaussian();
            int at = 30 + random.nextInt(70);
            double[][] rows = new double[130][1];
            for (int k = 0; k < rows.length; k++) {
                rows[k][0] = k < at ? before : after;
            }
            return rows;
        }), Look.delays(7, 4), Truth.NONE));
    }
}
