package org.modestead.engine.battery;

import static java.lang.StrictMath.PI;
import static java.lang.StrictMath.abs;
import static java.lang.StrictMath.asin;
import static java.lang.StrictMath.cos;
import static java.lang.StrictMath.exp;
import static java.lang.StrictMath.floor;
import static java.lang.StrictMath.log;
import static java.lang.StrictMath.max;
import static java.lang.StrictMath.min;
import static java.lang.StrictMath.signum;
import static java.lang.StrictMath.sin;
import static java.lang.StrictMath.sqrt;
import static java.lang.StrictMath.tanh;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;

/**
 * The sixth calibration part: it was the reporting part until rules were changed after it had been seen. Systems that no part before holds, under looks
 * that an analyst would choose. Overlaps, harmonics and autocorrelations that are not in closed form were computed by another program. Each overlap that
 * makes a mode settle and not stand is above a third, and so is the distance of its joint weight from the solo one.
 */
final class Sixth {

    private Sixth() {}

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        lossless(out);
        normal(out);
        ring(out);
        machines(out);
        sensors(out);
        cable(out);
        swingAndHeat(out);
        rotor(out);
        steps(out);
        waveforms(out);
        lines(out);
        settled(out);
        epicycle(out);
        hesitating(out);
        line(out);
        limits(out);
        stops(out);
        falling(out);
        critical(out);
        resonant(out);
        screw(out);
        ensembles(out);
        mixingMaps(out);
        arms(out);
        jolted(out);
        walks(out);
        counts(out);
        return out;
    }

    /**
     * In units in which the energy is the sum of squares. A pendulum on a turning floor, {@code x' = 1.3v, v' = -1.3x - 0.5Jv}: skew, rates
     * ±i(√(1.69 + 0.0625) ± 0.25), ±1.07i and ±1.57i. A particle that hops between three sites, {@code ψ' = -iHψ} with H real and symmetric,
     * real and imaginary parts: skew, rates ±iE, E = 0.35, 1.64, 2.90. Skew is normal, w·x are orthogonal in the dual space of the state,
     * see {@link LinearFlows}: stands. The hopping is sampled over half a turn of the slowest of them.
     */
    private static void lossless(List<Case> out) {
        KnownSystem floor = Paths.linear("pendulum on a turning floor 4d", 80, 0.12, new double[][] {{0, 0, 1.3, 0}, {0, 0, 0, 1.3},
            {-1.3, 0, 0, 0.5}, {0, -1.3, -0.5, 0}});
        out.add(new Case(floor, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(floor, Look.delays(3, 4), Truth.REPORTABLE));
        double[][] h = {{0.7, 0.6, 0}, {0.6, 1.5, 0.5}, {0, 0.5, 2.7}};
        double[][] a = new double[6][6];
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                a[i][3 + j] = h[i][j];
                a[3 + i][j] = -h[i][j];
            }
        }
        KnownSystem sites = Paths.linear("particle that hops between three sites 6d", 80, 0.12, a);
        out.add(new Case(sites, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(sites, Look.delays(3, 6), Truth.REPORTABLE));
    }

    /**
     * Normal, damped. Currents in two layers that turn alike and rub on each other: in complex numbers {@code [[-0.38, 0.28], [0.28, -0.38]]
     * + 1.2i}, rates -0.1 ± 1.2i and -0.66 ± 1.2i; degree 2 has ± 2.4i or none. In the space of (1 + x·y)² the adjoint is that of Aᵀ, so the
     * generator is normal with A: stands. One whirl that grows, 0.08 ± 1.1i, one that fades, -0.3 ± 1.9i, each spread over all four channels
     * by an orthogonal matrix: stands. Three cells that leak and exchange, symmetric, rates -0.23, -0.76, -1.22, in the spaces of exp(x·y)
     * and (1 + x·y)²; sums of degree 2 are -0.45, -0.98, -1.44, -1.51, ...: stands.
     */
    private static void normal(List<Case> out) {
        KnownSystem layers = Paths.linear("currents in two layers 4d", 60, 0.09, new double[][] {{-0.38, 1.2, 0.28, 0},
            {-1.2, -0.38, 0, 0.28}, {0.28, 0, -0.38, 1.2}, {0, 0.28, -1.2, -0.38}});
        out.add(new Case(layers, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(layers, Look.polynomial(2, 15), Truth.STANDS));
        double[][] whirls = {{0.08, 1.1, 0, 0}, {-1.1, 0.08, 0, 0}, {0, 0, -0.3, 1.9}, {0, 0, -1.9, -0.3}};
        out.add(new Case(Paths.linear("one whirl grows and one fades 4d", 60, 0.1, turned(turned(whirls, 0, 2, 0.7), 1, 3, 1.1)),
                Look.linearKernel(4), Truth.STANDS));
        KnownSystem cells = Paths.linear("three leaking cells 3d", 50, 0.07, new double[][] {{-0.7, 0.3, 0.1}, {0.3, -0.9, 0.35},
            {0.1, 0.35, -0.6}});
        out.add(new Case(cells, Look.exponential(10), Truth.STANDS));
        out.add(new Case(cells, Look.polynomial(2, 10), Truth.STANDS));
    }

    /** {@code Q A Qᵀ} with a turn Q of the plane of two axes. */
    private static double[][] turned(double[][] a, int first, int second, double angle) {
        int n = a.length;
        double[][] q = new double[n][n];
        for (int i = 0; i < n; i++) {
            q[i][i] = i == first || i == second ? cos(angle) : 1;
        }
        q[first][second] = -sin(angle);
        q[second][first] = sin(angle);
        double[][] out = new double[n][n];
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
                for (int k = 0; k < n; k++) {
                    for (int l = 0; l < n; l++) {
                        out[i][j] += q[i][k] * a[k][l] * q[j][l];
                    }
                }
            }
        }
        return out;
    }

    /**
     * Amounts handed round five stations, 0.97 of each to the next: 0.97 times a permutation, which is orthogonal: normal, multipliers 0.97
     * e^(2πik/5): stands in the dual space; affine functions hold w·x: reportable. A bead on a ring that lies across three axes, 0.37 rad a
     * step, centred at zero: on it {@code K = exp(cos Δ)}, Gaussian {@code exp(cos Δ - 1)}, both of the difference of the angles only and
     * with a positive Fourier series: e^(inθ) orthogonal, n = ±1 are the signal: stands.
     */
    private static void ring(List<Case> out) {
        KnownSystem stations = Paths.map("amounts handed round five stations", 36, 1, Paths.box(5, -1, 1), x -> new double[] {
            0.97 * x[4], 0.97 * x[0], 0.97 * x[1], 0.97 * x[2], 0.97 * x[3]});
        out.add(new Case(stations, Look.linearKernel(5), Truth.STANDS));
        out.add(new Case(stations, Look.monomials(1, 6), Truth.REPORTABLE));
        KnownSystem bead = Paths.closed("bead on a tilted ring", 60, 1, Paths.box(1, 0, 2 * PI), (u, t) -> {
            double c = cos(u[0] + 0.37 * t) / 3;
            double s = sin(u[0] + 0.37 * t) / 3;
            return new double[] {2 * c - 2 * s, c + 2 * s, 2 * c + s};
        });
        out.add(new Case(bead, Look.step("gaussian", 5, "scale", 1), Truth.STANDS));
        out.add(new Case(bead, Look.step("exponential", 5, "rate", 1), Truth.STANDS));
    }

    /**
     * Not normal. A drive train, speeds of motor and load (a fifth of its inertia) and the torque between them: rates -0.45, -0.12 ± 2.19i,
     * overlap of the pair 0.59, joint and solo weights 0.55 to 0.72 apart: settles in the dual space of the state. A reactor and its
     * precursors: rates -2.01, -0.19, overlap 0.66, joint and solo weights 0.66 apart: settles in the spaces of exp(x·y) and x·y. Current
     * and speed of a motor: rates -0.65 ± 1.82i; overlap and distance of the weights 0.67: settles in the space of (1 + x·y)²; Gaussian:
     * drawn to a point of rest, its analytic eigenfunctions are polynomials, which that space does not hold (C3.12): nothing to report.
     */
    private static void machines(List<Case> out) {
        KnownSystem train = Paths.linear("drive train 3d", 70, 0.07, new double[][] {{-0.5, 0, -1}, {0, -0.2, 5}, {0.8, -0.8, 0}});
        out.add(new Case(train, Look.linearKernel(3), Truth.SETTLES));
        out.add(new Case(train, Look.delays(4, 3), Truth.REPORTABLE));
        KnownSystem reactor = Paths.linear("reactor and precursors 2d", 50, 0.05, new double[][] {{-1.6, 0.3}, {1.9, -0.6}});
        out.add(new Case(reactor, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(reactor, Look.linearKernel(2), Truth.SETTLES));
        KnownSystem motor = Paths.linear("current and speed of a motor 2d", 50, 0.06, new double[][] {{-1.2, -4}, {0.9, -0.1}});
        out.add(new Case(motor, Look.polynomial(2, 6), Truth.SETTLES));
        out.add(new Case(motor, Look.delays(5, 2), Truth.REPORTABLE));
        out.add(new Case(motor, Look.gaussian(1, 8), Truth.NONE));
    }

    /**
     * Two separate decays, -0.3 and -1.2, each seen by all of four gauges: {@code y = Cx}. In the dual space of what is seen x1 and x2 are
     * the rows of the pseudo-inverse of C, whose overlap is that of the columns, 0.75; joint and solo weights are 0.75 apart: settles.
     */
    private static void sensors(List<Case> out) {
        KnownSystem hidden = Paths.linear("", 50, 0.06, new double[][] {{-0.3, 0}, {0, -1.2}});
        KnownSystem gauges = Paths.seen("two decays seen by four gauges", hidden,
                x -> Paths.times(new double[][] {{1, 0.8}, {0.9, 0.2}, {0.5, 0.9}, {0.3, 1}}, x));
        out.add(new Case(gauges, Look.linearKernel(2), Truth.SETTLES));
        out.add(new Case(gauges, Look.delays(3, 2), Truth.REPORTABLE));
    }

    /**
     * A cable whose current is damped by 1.5 and whose voltage by 0.05, on staggered points: skew but for a damping that is not shared, so
     * not normal: rates -0.24, -1.31, -0.78 ± 1.85i, -0.78 ± 1.16i, overlaps 0.68, 0.37, 0.53, joint and solo weights as far apart: settles
     * in the dual space of the state.
     */
    private static void cable(List<Case> out) {
        double[][] a = new double[6][6];
        for (int i = 0; i < 6; i++) {
            a[i][i] = i % 2 == 0 ? -0.05 : -1.5;
            if (i > 0) {
                a[i][i - 1] = 1.1;
                a[i - 1][i] = -1.1;
            }
        }
        out.add(new Case(Paths.linear("cable with losses 6d", 60, 0.08, a), Look.linearKernel(6), Truth.SETTLES));
    }

    /**
     * A damped swing {@code z = x + iv}, -0.2 ± 1.4i, whose motion heats, {@code q' = -1.1q + 0.9v²}: with {@code v² = (|z|² - Re z²)/2} the
     * function of -1.1 is {@code q - A|z|² - Re(Bz²)}, {@code A = 0.45/0.7 = 0.64, B = -0.45/(0.7 + 2.8i), |B| = 0.156}. In the space of
     * exp(x·y) ‖|z|²‖² = 4, ‖z²‖² = 8, so its square norm is {@code 1 + 4A² + 4|B|² = 2.75}, it overlaps |z|² (-0.4) by {@code 2A/√2.75 =
     * 0.78}, solo weight {@code 1/2.75 = 0.36} against 1; -1.1 is no other rate (-0.4, -0.8, -1.2 are the real ones): settles. Monomials up
     * to degree 2 hold all of them: reportable.
     */
    private static void swingAndHeat(List<Case> out) {
        KnownSystem heat = Paths.closed("heat of a damped swing", 60, 0.07, Paths.box(3, -1, 1), (u, t) -> {
            double[] start = forced(u[0], u[1]);
            double size = exp(-0.2 * t);
            double x = size * (u[0] * cos(1.4 * t) - u[1] * sin(1.4 * t));
            double v = size * (u[0] * sin(1.4 * t) + u[1] * cos(1.4 * t));
            return new double[] {x, v, forced(x, v)[0] + (u[2] - start[0]) * exp(-1.1 * t)};
        });
        out.add(new Case(heat, Look.exponential(16), Truth.SETTLES));
        out.add(new Case(heat, Look.monomials(2, 10), Truth.REPORTABLE));
    }

    /** {@code A|z|² + Re(Bz²)}, as an array of one. */
    private static double[] forced(double x, double v) {
        double modulus = 0.7 * 0.7 + 2.8 * 2.8;
        double re = -0.45 * 0.7 / modulus;
        double im = 0.45 * 2.8 / modulus;
        return new double[] {0.45 / 0.7 * (x * x + v * v) + re * (x * x - v * v) - im * 2 * x * v};
    }

    /**
     * A rotor whose surplus of speed dies out, {@code θ' = 1.5 + 0.35x, x' = -0.5x}, seen as x, cos θ, sin θ. Eigenfunctions on this
     * cylinder: {@code x^n ψ^m} with {@code ψ = e^(i(θ + κx))}, {@code κ = 0.7}, rates 1.5im - 0.5n, all different. There {@code K =
     * exp(xx') exp(cos Δ)} factors, so within one harmonic the norm is that of exp(xx'): e^(iκx) is in it, {@code <x e^(iκx), e^(iκx)>}
     * makes an overlap of {@code κ/√(1 + κ²) = 0.57} (C3.2). {@code e^(iθ) = ψ Σ(-iκx)^n/n!}, whose weights are Taylor coefficients, bounded
     * functionals that do not depend on the rank; the share of n = 2 is below 1 %. Solo weight of ψ: {@code <e^(iθ), ψ>/‖ψ‖² = e^(-κ²) =
     * 0.61} against 1: settles.
     */
    private static void rotor(List<Case> out) {
        out.add(new Case(Paths.closed("rotor whose speed settles", 70, 0.08, Paths.box(2, -1, 1), (u, t) -> {
            double x = u[0] * exp(-0.5 * t);
            double angle = PI * u[1] + 1.5 * t + 0.7 * (u[0] - x);
            return new double[] {x, cos(angle), sin(angle)};
        }), Look.exponential(20), Truth.SETTLES));
    }

    /**
     * In steps. A loan, x -> 1.03x - 0.05, held off 5/3: functions (x - 5/3)^k, in the space of (1 + xy)³ ‖x‖² = 1/3, {@code <1, x - 5/3> =
     * -5/3}: overlap {@code 1.67/√(1/3 + 2.78) = 0.94}, solo weight {@code (1/3)/(1/3 + 2.78) = 0.11} against 1: settles. A filter of two
     * taps, {@code x(k+1) = 1.5x(k) - 0.85x(k-1)} with both as state, multipliers 0.75 ± 0.54i: overlap and distance of the weights 0.81:
     * settles in the dual space of the state and in that of (1 + x·y)², whose degree 1 has the same angles. Two stages, multipliers 0.8 and
     * 0.45, left eigenvectors (1, 0.86) and (0, 1): overlap and distance of joint and solo weights 0.65; its largest singular value is 0.87,
     * so the composition is bounded for exp(x·y); products are 0.64, 0.51, 0.41, 0.36: settles. Affine functions hold all of it: reportable.
     */
    private static void steps(List<Case> out) {
        KnownSystem loan = Paths.map("loan that is paid off", 22, 1, Paths.box(1, -1, 1), x -> new double[] {1.03 * x[0] - 0.05});
        out.add(new Case(loan, Look.step("polynomial", 4, "degree", 3, "offset", 1), Truth.SETTLES));
        out.add(new Case(loan, Look.monomials(2, 3), Truth.REPORTABLE));
        KnownSystem taps = Paths.map("filter of two taps", 30, 1, Paths.box(2, -1, 1), x -> new double[] {1.5 * x[0] - 0.85 * x[1], x[0]});
        out.add(new Case(taps, Look.linearKernel(2), Truth.SETTLES));
        out.add(new Case(taps, Look.step("polynomial", 6, "degree", 2, "offset", 1), Truth.SETTLES));
        KnownSystem stages = Paths.map("two stages in steps", 16, 1, Paths.box(2, -1, 1), x -> new double[] {0.8 * x[0] + 0.3 * x[1], 0.45 * x[1]});
        out.add(new Case(stages, Look.step("exponential", 6, "rate", 1), Truth.SETTLES));
        out.add(new Case(stages, Look.monomials(1, 3), Truth.REPORTABLE));
    }

    /**
     * Periodic waveforms, held by delays that reach over a period: reportable. A triangle of 18 samples: odd harmonics, 1, 0.11, 0.04, three
     * pairs leave 1e-3 of the power. A rectified cosine: mean 0.64, 0.42, 0.085, 0.036 of the even ones. Pulses {@code e^(4(cos φ - 1))}:
     * I_n(4), relative to the mean 1.73, 1.14, 0.59, 0.25, 0.09, 0.03 (the amplitude of n twice I_n/I_0): five pairs leave 1e-3 of the
     * power.
     */
    private static void waveforms(List<Case> out) {
        out.add(new Case(Paths.closed("triangle of 18 samples", 90, 1, Paths.box(1, 0, 1), (u, t) -> new double[] {
            asin(sin(2 * PI * (t / 18 + u[0])))}), Look.delays(20, 6), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("rectified cosine", 110, 0.15, Paths.box(1, 0, PI), (u, t) -> new double[] {abs(cos(1.1 * t + u[0]))}),
                Look.delays(22, 7), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("train of pulses", 110, 1, Paths.box(1, 0, 2 * PI), (u, t) -> new double[] {
            exp(4 * (cos(0.31 * t + u[0]) - 1))}), Look.delays(24, 11), Truth.REPORTABLE));
    }

    /**
     * Lines, held by delays: reportable. A product of two tones: 2.3 and 3.5, equal. Two pendulums, weakly coupled, positions: 1.5 and 1.85,
     * together and against each other. A bar, struck, three sensors: -0.05 ± 1.1i, -0.1 ± 3.03i, -0.15 ± 5.94i. A star in two modes whose
     * light also holds their product: 2, 3.1, 5.1, 1.1. A howl that builds up: 0.05 ± 2i. The brightness of a damped swing, its square:
     * -0.12 and -0.12 ± 2.4i.
     */
    private static void lines(List<Case> out) {
        out.add(new Case(Paths.closed("ring modulator", 120, 0.12, Paths.box(2, 0, 2 * PI), (u, t) -> new double[] {
            cos(2.9 * t + u[0]) * cos(0.6 * t + u[1])}), Look.delays(24, 4), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("two coupled pendulums, positions", 110, 0.15, Paths.box(4, 0.3, 1), (u, t) -> {
            double together = u[0] * cos(1.5 * t + 11 * u[2]);
            double against = u[1] * cos(1.85 * t + 11 * u[3]);
            return new double[] {together + against, together - against};
        }), Look.delays(10, 4), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("struck bar", 100, 0.12, Paths.box(6, 0.4, 1), (u, t) -> {
            double a = u[0] * exp(-0.05 * t) * cos(1.1 * t + 11 * u[3]);
            double b = u[1] * exp(-0.1 * t) * cos(3.03 * t + 11 * u[4]);
            double c = u[2] * exp(-0.15 * t) * cos(5.94 * t + 11 * u[5]);
            return new double[] {a + b + c, 0.7 * a - 0.2 * b - 0.8 * c, 0.3 * a - 0.9 * b + 0.5 * c};
        }), Look.delays(6, 6), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("star in two modes", 130, 0.15, Paths.box(2, 0, 2 * PI), (u, t) -> {
            double a = cos(2 * t + u[0]);
            double b = cos(3.1 * t + u[1]);
            return new double[] {a + 0.7 * b + 0.8 * a * b};
        }), Look.delays(36, 8), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("howl that builds up", 100, 0.12, Paths.box(2, 0.4, 1), (u, t) -> new double[] {
            u[0] * exp(0.05 * t) * cos(2 * t + 11 * u[1])}), Look.delays(8, 2), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("brightness of a swing", 100, 0.15, Paths.box(2, 0.5, 1), (u, t) -> {
            double x = u[0] * exp(-0.06 * t) * cos(1.2 * t + 13 * u[1]);
            return new double[] {x * x};
        }), Look.delays(18, 3), Truth.REPORTABLE));
    }

    /**
     * Periodic once settled, held by delays: reportable. Three genes that repress each other in turn (Elowitz and Leibler, Nature 403:335,
     * 2000; proteins only): period 4.96, mean and three pairs leave 1e-3. A driven pendulum, {@code x'' = -0.5x' - sin x + 0.7 cos 1.2t}:
     * the third harmonic is 0.2 % of the first. A rotation in steps of an uneven size, 0.29 + 0.08 sin 2πθ of a turn: invertible (the slope
     * is at least 0.5), rotation number 0.282, mean and two pairs leave 3 %.
     */
    private static void settled(List<Case> out) {
        out.add(new Case(Paths.flow("genes that repress each other", 110, 0.25, 80, 3, Paths.box(3, 0.5, 3), x -> new double[] {
            10 / (1 + x[2] * x[2] * x[2]) - x[0], 10 / (1 + x[0] * x[0] * x[0]) - x[1], 10 / (1 + x[1] * x[1] * x[1]) - x[2]}),
                Look.delays(22, 7), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("driven pendulum, settled", 110, 0.25, 90, 1, random -> {
            double phase = 2 * PI * random.nextDouble();
            return new double[] {0.4 * random.nextDouble(), 0, cos(phase), sin(phase)};
        }, x -> new double[] {x[1], -0.5 * x[1] - sin(x[0]) + 0.7 * x[2], -1.2 * x[3], 1.2 * x[2]}), Look.delays(22, 2), Truth.REPORTABLE));
        KnownSystem turn = Paths.map("", 70, 1, Paths.box(1, 0, 1), x -> new double[] {x[0] + 0.29 + 0.08 * sin(2 * PI * x[0])});
        out.add(new Case(Paths.seen("uneven rotation in steps", turn, x -> new double[] {cos(2 * PI * x[0]), sin(2 * PI * x[0])}),
                Look.delays(10, 5), Truth.REPORTABLE));
    }

    /**
     * {@code z = e^(0.5it) + 0.7e^(-1.3it)} with random phases: w·x are two-dimensional, z and its conjugate; the best multiplier {@code
     * (e^(0.5i) + 0.49e^(-1.3i))/1.49} is 0.68 in size, so z misses by {@code √(1 - 0.68²) = 0.74} a step: absent. Delays hold both pairs.
     */
    private static void epicycle(List<Case> out) {
        KnownSystem planet = Paths.closed("planet on an epicycle", 70, 1, Paths.box(2, 0, 2 * PI), (u, t) -> new double[] {
            cos(0.5 * t + u[0]) + 0.7 * cos(1.3 * t + u[1]), sin(0.5 * t + u[0]) - 0.7 * sin(1.3 * t + u[1])});
        out.add(new Case(planet, Look.linearKernel(2), Truth.ABSENT));
        out.add(new Case(planet, Look.delays(4, 4), Truth.REPORTABLE));
    }

    /**
     * A rotor that hesitates, {@code θ' = 1.08 + sin θ}, seen as (cos θ, sin θ). It is conjugate to a rotation by a map of the disc, so its
     * only continuous eigenfunctions on the circle are powers of {@code (z - c)/(1 - c̄z)}, {@code |c| = 1.08 - √(1.08² - 1) = 0.67}. That
     * has Fourier coefficients that fall as |c|^n; the space of exp(x·y) on the circle asks for {@code Σ|c_n|²/I_n(1)} finite, I_n(1) falls
     * faster than any power: the sum grows as 0.5, 1.0, 2.8, 10, 46 from n = 1 to 5: absent. The same sum for the Gaussian kernel, in steps.
     */
    private static void hesitating(List<Case> out) {
        KnownSystem rotor = Paths.flow("rotor that hesitates", 80, 0.3, 0, 2, random -> {
            double angle = 2 * PI * random.nextDouble();
            return new double[] {cos(angle), sin(angle)};
        }, x -> new double[] {-x[1] * (1.08 + x[1]), x[0] * (1.08 + x[1])});
        out.add(new Case(rotor, Look.exponential(9), Truth.ABSENT));
        out.add(new Case(rotor, Look.step("gaussian", 9, "scale", 1), Truth.NONE));
    }

    /**
     * None has an entire eigenfunction but the constant: absent from the space of exp(xy) (C3.4). {@code -x - x³}: {@code x/√(1 + x²)},
     * branches at ±i, the starts reach to 2. {@code -0.8(x - x³)}: {@code x/√(1 - x²)}, branches at ±1, the starts reach to 0.97. A falling
     * body, {@code 1 - v²}: {@code (1 - v)/(1 + v)}, a pole at -1, starts from -0.9. A boat that coasts, {@code -x|x|}: {@code exp(λ/|x|)},
     * no power series at 0; on monomials nothing to report, as for x' = -x³.
     */
    private static void line(List<Case> out) {
        out.add(new Case(Paths.closed("x'=-x-x^3", 50, 0.04, Paths.box(1, -2, 2),
                (x, t) -> new double[] {x[0] * exp(-t) / sqrt(1 + x[0] * x[0] * (1 - exp(-2 * t)))}), Look.exponential(8), Truth.ABSENT));
        out.add(new Case(Paths.closed("x'=-0.8(x-x^3)", 50, 0.05, Paths.box(1, -0.97, 0.97),
                (x, t) -> new double[] {x[0] * exp(-0.8 * t) / sqrt(1 - x[0] * x[0] * (1 - exp(-1.6 * t)))}),
                Look.exponential(8), Truth.ABSENT));
        out.add(new Case(Paths.closed("falling body", 50, 0.04, Paths.box(1, -0.9, 0.9),
                (x, t) -> new double[] {tanh(0.5 * log((1 + x[0]) / (1 - x[0])) + t)}), Look.exponential(8), Truth.ABSENT));
        KnownSystem boat = Paths.closed("boat that coasts", 60, 0.05, Paths.box(1, -2, 2), (x, t) -> new double[] {x[0] / (1 + abs(x[0]) * t)});
        out.add(new Case(boat, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(boat, Look.monomials(5, 6), Truth.NONE));
    }

    /**
     * A servo with a limit of speed, {@code -1.5 max(-0.5, min(0.5, x))}: within the limit an analytic eigenfunction is a power of x, beyond
     * it {@code e^(λx/0.75)}, so none is both. Growth up to a stop, 0.8x until x = 1: an eigenfunction of rate 0.8n is x^n, but at the stop,
     * which rests, it must be 0. Over a run the speed limit is left and the stop is reached by most. Nothing to report.
     */
    private static void limits(List<Case> out) {
        out.add(new Case(Paths.closed("servo with a limit of speed", 60, 0.06, Paths.box(1, -2.4, 2.4), (x, t) -> {
            double size = abs(x[0]);
            double late = max(0, t - max(0, size - 0.5) / 0.75);
            return new double[] {signum(x[0]) * (late > 0 ? min(size, 0.5) * exp(-1.5 * late) : size - (size > 0.5 ? 0.75 * t : 0))};
        }), Look.exponential(8), Truth.NONE));
        KnownSystem growth = Paths.closed("growth up to a stop", 60, 0.06, Paths.box(1, 0.08, 0.9),
                (x, t) -> new double[] {min(1, x[0] * exp(0.8 * t))});
        out.add(new Case(growth, Look.monomials(3, 4), Truth.NONE));
        out.add(new Case(growth, Look.delays(8, 3), Truth.NONE));
    }

    /**
     * A tank that is filled evenly until it overflows; a block that slides, {@code v' = -0.4 sign v}, and stops: an eigenfunction is {@code
     * e^(-λ|v|/0.4)} while it slides and 0 at rest unless λ = 0. A ramp that ends at a time that differs from run to run is no sum of
     * exponentials. Nothing to report.
     */
    private static void stops(List<Case> out) {
        out.add(new Case(Paths.closed("tank that overflows", 70, 0.1, Paths.box(1, -1, 0.7), (x, t) -> new double[] {min(1, x[0] + 0.4 * t)}),
                Look.delays(8, 4), Truth.NONE));
        KnownSystem block = Paths.closed("block that slides", 70, 0.07, Paths.box(1, -1.8, 1.8),
                (v, t) -> new double[] {signum(v[0]) * max(0, abs(v[0]) - 0.4 * t)});
        out.add(new Case(block, Look.exponential(8), Truth.NONE));
        out.add(new Case(block, Look.delays(8, 4), Truth.NONE));
    }

    /**
     * A thrown stone, {@code h' = v, v' = -0.6}: in the space of exp(x·y) e^(λv) for every λ, as for x' = c, and no mode holds v or h;
     * delays: a triple rate 0. A train that speeds up evenly, position, speed and acceleration: one Jordan block of three. Drifts.
     */
    private static void falling(List<Case> out) {
        KnownSystem stone = Paths.closed("thrown stone", 50, 0.05, Paths.box(2, -0.5, 1), (u, t) -> new double[] {u[0] + u[1] * t - 0.3 * t * t,
            u[1] - 0.6 * t});
        out.add(new Case(stone, Look.exponential(8), Truth.DRIFTS));
        out.add(new Case(stone, Look.delays(12, 3), Truth.DRIFTS));
        out.add(new Case(Paths.linear("train that speeds up 3d", 50, 0.07, new double[][] {{0, 1, 0}, {0, 0, 1}, {0, 0, 0}}),
                Look.linearKernel(3), Truth.DRIFTS));
    }

    /**
     * Double rates without a second eigenvector: drifts. A needle that comes to rest at 0.7 without a swing, {@code x'' = -1.44(x - 0.7) -
     * 2.4x'}: {@code v + 1.2(x - 0.7)} and its powers are the only eigenfunctions. A register that carries over in steps, [[0.8, 0], [0.35,
     * 0.8]].
     */
    private static void critical(List<Case> out) {
        KnownSystem needle = Paths.closed("needle that does not swing", 50, 0.07, Paths.box(2, -1, 1), (u, t) -> {
            double far = u[0] - 0.7;
            double slope = u[1] + 1.2 * far;
            double size = exp(-1.2 * t);
            return new double[] {0.7 + (far + slope * t) * size, (u[1] - 1.2 * slope * t) * size};
        });
        out.add(new Case(needle, Look.exponential(6), Truth.DRIFTS));
        out.add(new Case(needle, Look.monomials(2, 6), Truth.DRIFTS));
        KnownSystem register = Paths.map("register that carries over", 18, 1, Paths.box(2, -1, 1),
                x -> new double[] {0.8 * x[0], 0.35 * x[0] + 0.8 * x[1]});
        out.add(new Case(register, Look.linearKernel(2), Truth.DRIFTS));
        out.add(new Case(register, Look.step("polynomial", 6, "degree", 2, "offset", 1), Truth.DRIFTS));
    }

    /**
     * Nonlinear resonance. {@code x' = -0.4x, y' = -0.8y + 1.1x²}, {@code y = (y0 + 1.1x0² t)e^(-0.8t)}: -0.8 is the rate of x² too, on x²
     * and y the generator is a Jordan block and no eigenfunction reaches y, in the space of exp(x·y) as on monomials. A second swing of
     * twice the pitch and twice the damping, {@code z' = (-0.2 + 1.3i)z, w' = 2(-0.2 + 1.3i)w + 0.9z²}: the same with z² and w. Drifts.
     */
    private static void resonant(List<Case> out) {
        KnownSystem resonance = Paths.closed("parabola at resonance", 60, 0.06, Paths.box(2, -1, 1), (u, t) -> new double[] {
            u[0] * exp(-0.4 * t), (u[1] + 1.1 * u[0] * u[0] * t) * exp(-0.8 * t)});
        out.add(new Case(resonance, Look.exponential(10), Truth.DRIFTS));
        out.add(new Case(resonance, Look.monomials(2, 6), Truth.DRIFTS));
        out.add(new Case(Paths.closed("swing of twice the pitch", 70, 0.07, Paths.box(4, -1, 1), (u, t) -> {
            double size = exp(-0.2 * t);
            double c = cos(1.3 * t);
            double s = sin(1.3 * t);
            double a = u[2] + 0.9 * t * (u[0] * u[0] - u[1] * u[1]);
            double b = u[3] + 0.9 * t * 2 * u[0] * u[1];
            double c2 = c * c - s * s;
            double s2 = 2 * s * c;
            return new double[] {size * (u[0] * c - u[1] * s), size * (u[0] * s + u[1] * c), size * size * (a * c2 - b * s2),
                size * size * (a * s2 + b * c2)};
        }), Look.monomials(2, 15), Truth.DRIFTS));
    }

    /**
     * A point on a screw, cos and sin of 1.6t and a height that rises by 0.45: {@code e^(inθ) e^(λy)} for every λ in the space of exp(x·y),
     * over-complete: no mode holds the height; delays: ±1.6i and a double 0. The worst of the two drifts.
     */
    private static void screw(List<Case> out) {
        KnownSystem screw = Paths.closed("point on a screw", 60, 0.08, Paths.box(2, -1, 0.2), (u, t) -> new double[] {
            cos(6 * u[0] + 1.6 * t), sin(6 * u[0] + 1.6 * t), u[1] + 0.45 * t});
        out.add(new Case(screw, Look.exponential(10), Truth.DRIFTS));
        out.add(new Case(screw, Look.delays(8, 4), Truth.DRIFTS));
    }

    /**
     * A continuous range of frequencies, no isolated one: nothing to report. A ball that bounces without loss, its speed: periods 1.2 to
     * 3.6. A particle between two walls, speeds 0.5 to 1.5: periods 8 to 2.7. Runners on a ring, 0.6 to 1.8 rad a second. A pendulum that
     * goes over the top, energies 1.2 to 4 above the middle: periods 5.0 to 2.2.
     */
    private static void ensembles(List<Case> out) {
        out.add(new Case(Paths.closed("speed of a bouncing ball", 120, 0.1, Paths.box(2, 0, 1), (u, t) -> {
            double speed = 0.6 + 1.2 * u[0];
            return new double[] {speed - (t + 2 * speed * u[1]) % (2 * speed)};
        }), Look.delays(14, 6), Truth.NONE));
        out.add(new Case(Paths.closed("particle between two walls", 120, 0.15, Paths.box(2, 0, 1), (u, t) -> new double[] {
            2 / PI * asin(sin(PI / 2 * ((0.5 + u[0]) * t + 4 * u[1])))}), Look.delays(12, 6), Truth.NONE));
        KnownSystem runners = Paths.closed("runners on a ring", 100, 0.2, Paths.box(2, 0, 1), (u, t) -> new double[] {
            cos(2 * PI * u[1] + (0.6 + 1.2 * u[0]) * t), sin(2 * PI * u[1] + (0.6 + 1.2 * u[0]) * t)});
        out.add(new Case(runners, Look.delays(8, 6), Truth.NONE));
        out.add(new Case(runners, Look.linearKernel(2), Truth.NONE));
        out.add(new Case(Paths.flow("pendulum over the top", 120, 0.12, 0, 2, random -> {
            double angle = 2 * PI * random.nextDouble();
            return new double[] {cos(angle), sin(angle), sqrt(2 * (1.2 + 2.8 * random.nextDouble() + cos(angle)))};
        }, x -> new double[] {-x[1] * x[2], x[0] * x[2], -x[1]}), Look.delays(10, 6), Truth.NONE));
    }

    /**
     * Mixing maps. A skew tent with its top at 0.3, in Lebesgue measure: its transfer operator keeps polynomials of each degree and has the
     * eigenvalues {@code 0.3^(n+1) + (-1)^n 0.7^(n+1)}: -0.4, 0.37, -0.23, 0.17; a multiplier μ has the residual √(1 - μ²) (C7.3), 0.92 and
     * more: absent. The baker's map: {@code y -> y/2 + bit}, autocorrelation 0.5, residual 0.87 a step, x is white but for its own halves. A
     * kicked rotor at 7 (Chirikov, Physics Reports 52:263, 1979): autocorrelations 0.03, 0.33, 0.02, 0.14 in size, then below 0.06. An
     * intermittent map, {@code x(1 + √(2x))} below 1/2 and 2x - 1 above (Liverani, Saussol and Vaienti, Ergodic Theory and Dynamical Systems
     * 19:671, 1999): mixing with a density, no eigenvalue but 1. Nothing to report.
     */
    private static void mixingMaps(List<Case> out) {
        out.add(new Case(Paths.map("skew tent", 70, 1, Paths.box(1, 0.02, 0.98),
                x -> new double[] {x[0] < 0.3 ? x[0] / 0.3 : (1 - x[0]) / 0.7}), Look.monomials(4, 5), Truth.ABSENT));
        out.add(new Case(new KnownSystem("baker's map", 1, random -> {
            double[][] rows = new double[70][];
            double x = random.nextDouble();
            double y = random.nextDouble();
            for (int k = 0; k < rows.length; k++) {
                rows[k] = new double[] {x, y};
                double bit = x < 0.5 ? 0 : 1;
                y = (y + bit) / 2;
                x = min(1 - 0x1p-52, 2 * x - bit + (random.nextBoolean() ? 0x1p-52 : 0));
            }
            return rows;
        }), Look.monomials(2, 6), Truth.NONE));
        KnownSystem kicked = Paths.map("", 90, 1, Paths.box(2, 0, 1), x -> {
            double p = x[1] + 7 / (2 * PI) * sin(2 * PI * x[0]);
            return new double[] {(x[0] + p) % 1, p % 1};
        });
        out.add(new Case(Paths.seen("kicked rotor", kicked, x -> new double[] {cos(2 * PI * x[0]), sin(2 * PI * x[0])}),
                Look.delays(4, 6), Truth.NONE));
        out.add(new Case(Paths.map("intermittent map", 120, 1, Paths.box(1, 0.02, 0.98),
                x -> new double[] {x[0] < 0.5 ? x[0] * (1 + sqrt(2 * x[0])) : 2 * x[0] - 1}), Look.monomials(4, 5), Truth.NONE));
    }

    /**
     * Two equal arms hung from each other, let go at 1.8 to 2.8 rad: autocorrelations, by numerics, below 0.5 from 0.9 or 2 on and below
     * 0.17 from 6 on in runs of 21: nothing to report.
     */
    private static void arms(List<Case> out) {
        KnownSystem arms = Paths.flow("", 140, 0.15, 20, 2, random -> new double[] {1.8 + random.nextDouble(), 1.8 + random.nextDouble(), 0, 0}, x -> {
            double d = x[0] - x[1];
            double below = 3 - cos(2 * d);
            return new double[] {x[2], x[3], (-3 * sin(x[0]) - sin(x[0] - 2 * x[1]) - 2 * sin(d) * (x[3] * x[3] + x[2] * x[2] * cos(d))) / below,
                2 * sin(d) * (2 * x[2] * x[2] + 2 * cos(x[0]) + x[3] * x[3] * cos(d)) / below};
        });
        out.add(new Case(Paths.seen("double pendulum, wide", arms, x -> new double[] {sin(x[0]), sin(x[1])}), Look.delays(10, 8), Truth.NONE));
    }

    /**
     * Paths that miss their mean motion by most of their size over its own time, as Ornstein-Uhlenbeck in {@link NoModes}. A clock that is
     * jolted by 0.12 of a turn a step: mean multiplier {@code e^(-2π² 0.0144) = 0.75} in size. A drunkard on a ring, 0.35 rad a step: 0.94.
     * A tone that is broken off and begun anew with 0.06 a step: 0.94. Noise that keeps 0.8 of what it was a season of 12 steps ago.
     * Flicker, three relaxations at 0.98, 0.85 and 0.4 a step, each kicked. Nothing to report.
     */
    private static void jolted(List<Case> out) {
        out.add(new Case(Paths.chance("jolted clock", 140, 1, random -> {
            double[] turn = {random.nextDouble()};
            return () -> {
                turn[0] += 0.23 + 0.12 * random.nextGaussian();
                turn[0] -= floor(turn[0]);
                return turn[0];
            };
        }), Look.fourier(3), Truth.NONE));
        out.add(new Case(Paths.seen("drunkard on a ring", Paths.chance("", 140, 0.1, random -> {
            double[] angle = {2 * PI * random.nextDouble()};
            return () -> angle[0] += 0.35 * random.nextGaussian();
        }), x -> new double[] {cos(x[0]), sin(x[0])}), Look.monomials(2, 5), Truth.NONE));
        out.add(new Case(Paths.chance("tone that is begun anew", 140, 0.1, random -> {
            double[] phase = {2 * PI * random.nextDouble()};
            return () -> {
                phase[0] = random.nextDouble() < 0.06 ? 2 * PI * random.nextDouble() : phase[0] + 0.4;
                return cos(phase[0]);
            };
        }), Look.delays(6, 2), Truth.NONE));
        out.add(new Case(Paths.chance("seasons of noise", 140, 1, random -> {
            double[] past = random.doubles(12, -1, 1).toArray();
            int[] at = {0};
            return () -> {
                at[0] = (at[0] + 1) % 12;
                past[at[0]] = 0.8 * past[at[0]] + 0.6 * random.nextGaussian();
                return past[at[0]];
            };
        }), Look.delays(14, 8), Truth.NONE));
        out.add(new Case(Paths.chance("flicker", 140, 0.1, random -> {
            double[] keep = {0.98, 0.85, 0.4};
            double[] x = {random.nextGaussian(), random.nextGaussian(), random.nextGaussian()};
            return () -> {
                for (int i = 0; i < 3; i++) {
                    x[i] = keep[i] * x[i] + sqrt(1 - keep[i] * keep[i]) * random.nextGaussian();
                }
                return x[0] + x[1] + x[2];
            };
        }), Look.delays(8, 4), Truth.NONE));
    }

    /**
     * Random walks in other clothes: one that is set back to zero with 0.05 a step, a price that is multiplied by {@code e^(0.12 N(0, 1))},
     * a queue that grows or shrinks by one and is never below zero. Their mean motions have rates, their paths keep none: nothing to report.
     */
    private static void walks(List<Case> out) {
        out.add(new Case(Paths.chance("walk that is set back", 140, 0.1, random -> {
            double[] x = {2 * random.nextGaussian()};
            return () -> x[0] = random.nextDouble() < 0.05 ? 0 : x[0] + random.nextGaussian();
        }), Look.delays(6, 4), Truth.NONE));
        out.add(new Case(Paths.chance("price", 140, 1, random -> {
            double[] x = {0.5 + random.nextDouble()};
            return () -> x[0] *= exp(0.12 * random.nextGaussian());
        }), Look.monomials(2, 3), Truth.NONE));
        out.add(new Case(Paths.chance("queue", 140, 1, random -> {
            double[] x = {random.nextInt(8)};
            return () -> x[0] = max(0, x[0] + (random.nextDouble() < 0.48 ? 1 : -1));
        }), Look.delays(6, 4), Truth.NONE));
    }

    /** Counts of mean 2 that know nothing of each other, two channels: independent, so absent, as white noise. */
    private static void counts(List<Case> out) {
        out.add(new Case(new KnownSystem("counts of two counters", 1, random -> Stream.generate(() -> new double[] {count(random),
            count(random)}).limit(130).toArray(double[][]::new)), Look.monomials(3, 10), Truth.ABSENT));
    }

    private static int count(Random random) {
        double product = random.nextDouble();
        int n = 0;
        while (product > exp(-2)) {
            product *= random.nextDouble();
            n++;
        }
        return n;
    }
}
