package org.modestead.engine.battery;

import static java.lang.StrictMath.PI;
import static java.lang.StrictMath.abs;
import static java.lang.StrictMath.acos;
import static java.lang.StrictMath.cbrt;
import static java.lang.StrictMath.cos;
import static java.lang.StrictMath.exp;
import static java.lang.StrictMath.floor;
import static java.lang.StrictMath.log;
import static java.lang.StrictMath.max;
import static java.lang.StrictMath.min;
import static java.lang.StrictMath.pow;
import static java.lang.StrictMath.signum;
import static java.lang.StrictMath.sin;
import static java.lang.StrictMath.sinh;
import static java.lang.StrictMath.sqrt;
import static java.lang.StrictMath.tanh;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/**
 * The eighth calibration part: it was the reporting part until a rule was changed after it had been seen. Systems that no part before holds, their truth written
 * down from the mathematics before any of them was judged and without a look at the code that judges. Overlaps, harmonics and autocorrelations that are not in
 * closed form were computed by another program. A mode that settles and does not stand overlaps by more than a third, and so does its joint weight differ from the
 * solo one.
 */
final class Eighth {

    private Eighth() {}

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        excitations(out);
        gyrators(out);
        bowls(out);
        updraught(out);
        picture(out);
        ripples(out);
        rosette(out);
        kettle(out);
        structures(out);
        lagoons(out);
        pumped(out);
        reservoirs(out);
        shops(out);
        arm(out);
        bentLine(out);
        torus(out);
        circle(out);
        week(out);
        lines(out);
        cycles(out);
        game(out);
        stages(out);
        trend(out);
        floe(out);
        resonances(out);
        powers(out);
        rests(out);
        valve(out);
        prey(out);
        ensembles(out);
        bat(out);
        chaos(out);
        chebyshev(out);
        white(out);
        chains(out);
        breaks(out);
        return out;
    }

    /**
     * Excitations of three sites that spread and turn, {@code z' = (0.3 + 0.9i) L z} with the second differences L, real and imaginary
     * parts: a normal matrix, rates (0.3 ± 0.9i) times -0.59, -2, -3.41: stands in the dual space of the state; delays hold all of it.
     */
    private static void excitations(List<Case> out) {
        double[][] a = new double[6][6];
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                double difference = i == j ? -2 : abs(i - j) == 1 ? 1 : 0;
                a[i][j] = 0.3 * difference;
                a[3 + i][3 + j] = 0.3 * difference;
                a[i][3 + j] = -0.9 * difference;
                a[3 + i][j] = 0.9 * difference;
            }
        }
        KnownSystem sites = Paths.linear("excitations that spread and turn 6d", 60, 0.09, a);
        out.add(new Case(sites, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(sites, Look.delays(2, 6), Truth.REPORTABLE));
    }

    /**
     * Five currents that gyrators couple without loss, each with the same leak: a skew matrix and a multiple of one, normal, no blocks;
     * rates -0.12, -0.12 ± 1.25i, -0.12 ± 2.20i: stands in the dual space of the state; affine functions hold all of it.
     */
    private static void gyrators(List<Case> out) {
        KnownSystem currents = Paths.linear("gyrators with a leak 5d", 70, 0.1, new double[][] {{-0.12, 0.8, -0.4, 0, 0.5},
            {-0.8, -0.12, 1.1, 0.3, 0}, {0.4, -1.1, -0.12, -0.6, 0.9}, {0, -0.3, 0.6, -0.12, 1.7}, {-0.5, 0, -0.9, -1.7, -0.12}});
        out.add(new Case(currents, Look.linearKernel(5), Truth.STANDS));
        out.add(new Case(currents, Look.monomials(1, 6), Truth.REPORTABLE));
    }

    /**
     * Downhill in a quadratic bowl without inertia: symmetric, so self-adjoint in the spaces of x·y, exp(x·y) and (1 + x·y)² (C3.3):
     * stands. Four dimensions: rates -0.31, -0.63, -1.13, -1.83. Two: -0.44, -1.36; of degree 2 -0.88, -1.80, -2.72. The Gaussian space
     * holds none of them (C3.12): nothing to report.
     */
    private static void bowls(List<Case> out) {
        KnownSystem four = Paths.linear("bead in a tilted bowl 4d", 50, 0.08, new double[][] {{-0.9, 0.35, 0.1, 0},
            {0.35, -0.6, 0.25, -0.15}, {0.1, 0.25, -1.6, 0.4}, {0, -0.15, 0.4, -0.8}});
        out.add(new Case(four, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(four, Look.delays(3, 4), Truth.REPORTABLE));
        KnownSystem two = Paths.near("bead in a tilted trough 2d", 50, 0.05, 0.8, new double[][] {{-0.6, 0.35}, {0.35, -1.2}});
        out.add(new Case(two, Look.exponential(6), Truth.STANDS));
        out.add(new Case(two, Look.polynomial(2, 6), Truth.STANDS));
        out.add(new Case(two, Look.gaussian(1, 8), Truth.NONE));
    }

    /**
     * Air that turns about a tilted axis (2, 1, 2)/3 by 1.8 rad/s, rises along it, 0.45, and closes in, -0.36: the axis and the plane
     * across it are orthogonal, so the matrix is normal: stands in the spaces of exp(x·y) and (1 + x·y)². Affine functions hold it.
     */
    private static void updraught(List<Case> out) {
        KnownSystem air = Paths.near("updraught that turns 3d", 50, 0.05, 0.5, new double[][] {{0, -1.02, 0.96}, {1.38, -0.27, -1.02},
            {-0.24, 1.38, 0}});
        out.add(new Case(air, Look.exponential(12), Truth.STANDS));
        out.add(new Case(air, Look.polynomial(2, 10), Truth.STANDS));
        out.add(new Case(air, Look.monomials(1, 4), Truth.REPORTABLE));
    }

    /**
     * A picture of two rows of three that blurs, step by step: a symmetric matrix for the rows times one for the columns, multipliers
     * 0.95 and 0.6 times 0.98, 0.78 and 0.38, all apart: stands in the dual space of the state.
     */
    private static void picture(List<Case> out) {
        double[][] rows = {{0.775, 0.175}, {0.175, 0.775}};
        double[][] columns = {{0.78, 0.2, 0}, {0.2, 0.58, 0.2}, {0, 0.2, 0.78}};
        double[][] both = new double[6][6];
        for (int i = 0; i < 6; i++) {
            for (int j = 0; j < 6; j++) {
                both[i][j] = rows[i / 3][j / 3] * columns[i % 3][j % 3];
            }
        }
        KnownSystem picture = Paths.map("picture that blurs 6d", 20, 1, Paths.box(6, -1, 1), x -> Paths.times(both, x));
        out.add(new Case(picture, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(picture, Look.monomials(1, 7), Truth.REPORTABLE));
    }

    /**
     * Waves of wave numbers 1, 2, 3 on eight points of a ring, each with its own speed, {@code ω = 0.6k + k³/4}: 0.85, 3.2, 8.55. Each
     * turns in its own plane of the state, the planes are orthogonal: stands in the dual space of the state.
     */
    private static void ripples(List<Case> out) {
        KnownSystem ring = Paths.closed("ripples that outrun each other", 70, 0.1, Paths.box(6, 0.4, 1), (u, t) -> {
            double[] row = new double[8];
            for (int i = 0; i < 8; i++) {
                for (int k = 1; k <= 3; k++) {
                    row[i] += u[k - 1] * cos(k * PI * i / 4 - (0.6 * k + 0.25 * k * k * k) * t + 21 * u[2 + k]);
                }
            }
            return row;
        });
        out.add(new Case(ring, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(ring, Look.delays(2, 6), Truth.REPORTABLE));
    }

    /**
     * A pen on a rosette, {@code (cos 2θ, sin 2θ, 0.8 cos 5θ, 0.8 sin 5θ)}, 0.3 rad a step: {@code x·y = cos 2Δ + 0.64 cos 5Δ}, a
     * function of the difference of the angles, so e^(inθ) are orthogonal, and n = ±2, ±5 are all of the dual space of the state: stands.
     */
    private static void rosette(List<Case> out) {
        KnownSystem pen = Paths.closed("pen on a rosette 4d", 60, 1, Paths.box(1, 0, 2 * PI), (u, t) -> {
            double angle = u[0] + 0.3 * t;
            return new double[] {cos(2 * angle), sin(2 * angle), 0.8 * cos(5 * angle), 0.8 * sin(5 * angle)};
        });
        out.add(new Case(pen, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(pen, Look.delays(2, 4), Truth.REPORTABLE));
    }

    /**
     * A kettle that cools and the thermometer in it, rates -0.5 and -1.4: left eigenvectors (1, 0) and (1.6, -0.9), overlap and distance
     * of the weights 0.87, the same in the spaces of exp(x·y) and (1 + x·y)² (degree 1 has the angles of the state): settles. Those of
     * degree 2 are -1, -1.9, -2.8. The Gaussian space holds none (C3.12).
     */
    private static void kettle(List<Case> out) {
        KnownSystem kettle = Paths.near("kettle and its thermometer 2d", 50, 0.06, 0.9, new double[][] {{-0.5, 0}, {1.6, -1.4}});
        out.add(new Case(kettle, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(kettle, Look.polynomial(2, 6), Truth.SETTLES));
        out.add(new Case(kettle, Look.delays(3, 2), Truth.REPORTABLE));
        out.add(new Case(kettle, Look.gaussian(1, 8), Truth.NONE));
    }

    /**
     * Not normal, settles in the dual space of the state. A boom that bends and twists, both with their speeds: -0.07 ± 0.86i, -0.16 ±
     * 1.56i, every overlap 0.55, weights 0.59 and more apart. Three carts between springs, metres and metres a second: -0.06 ± 1.71i,
     * -0.09 ± 3.16i, -0.12 ± 4.13i; positions and speeds are of unlike size, so each mode overlaps its conjugate: 0.49, 0.82, 0.89, the
     * weights as far apart.
     */
    private static void structures(List<Case> out) {
        KnownSystem boom = Paths.linear("boom that bends and twists 4d", 90, 0.11, new double[][] {{0, 1, 0, 0}, {-0.6, -0.15, 0.9, 0},
            {0, 0, 0, 1}, {-0.3, 0, -2.6, -0.3}});
        out.add(new Case(boom, Look.linearKernel(4), Truth.SETTLES));
        out.add(new Case(boom, Look.delays(3, 4), Truth.REPORTABLE));
        double[][] a = new double[6][6];
        for (int i = 0; i < 3; i++) {
            a[i][3 + i] = 1;
            for (int j = 0; j < 3; j++) {
                double spring = i == j ? 2 : abs(i - j) == 1 ? -1 : 0;
                a[3 + i][j] = -5 * spring;
                a[3 + i][3 + j] = -0.04 * spring - (i == j ? 0.1 : 0);
            }
        }
        KnownSystem carts = Paths.linear("three carts in metres and metres a second 6d", 80, 0.07, a);
        out.add(new Case(carts, Look.linearKernel(6), Truth.SETTLES));
        out.add(new Case(carts, Look.delays(2, 6), Truth.REPORTABLE));
    }

    /**
     * Salt in four lagoons, each empties into the next: rates -0.3, -0.7, -1.3, -2.1. Left eigenvectors lean on all lagoons upstream:
     * overlaps of 0.71 and more, weights 0.79 and more apart: settles in the dual space of the state; affine functions hold it.
     */
    private static void lagoons(List<Case> out) {
        KnownSystem lagoons = Paths.linear("salt in four lagoons 4d", 60, 0.06, new double[][] {{-0.3, 0, 0, 0}, {0.4, -0.7, 0, 0},
            {0, 0.7, -1.3, 0}, {0, 0, 1, -2.1}});
        out.add(new Case(lagoons, Look.linearKernel(4), Truth.SETTLES));
        out.add(new Case(lagoons, Look.monomials(1, 5), Truth.REPORTABLE));
    }

    /**
     * {@code x' = 1.1x - 1} about {@code c = 1/1.1}: eigenfunctions (x - c)^n (C3.4), 1 and x - c carry x. The overlap with the constant
     * is {@code c/√(1 + c²) = 0.67}, the solo weight of x - c 1/(1 + c²) = 0.55 against 1 in the space of exp(xy); 0.84 and 0.29 in that
     * of (1 + xy)³, where ‖x‖² = 1/3: settles. Cubic polynomials hold both: reportable.
     */
    private static void pumped(List<Case> out) {
        KnownSystem pumped = Paths.closed("x'=1.1x-1", 45, 0.02, Paths.box(1, 0.4, 1.4), (x, t) -> new double[] {
            1 / 1.1 + (x[0] - 1 / 1.1) * exp(1.1 * t)});
        out.add(new Case(pumped, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(pumped, Look.polynomial(3, 4), Truth.SETTLES));
        out.add(new Case(pumped, Look.monomials(3, 4), Truth.REPORTABLE));
    }

    /**
     * Three reservoirs that are filled evenly and share, {@code x' = A(x - c)}, A symmetric, rates -0.36, -0.98, -1.37: in the space of
     * (1 + x·y)² a unit w has ‖w·x‖² = 1/2, and w·(x - c) overlaps the constant by {@code |w·c|/√(1/2 + (w·c)²)}: 0.83 for the slowest,
     * whose solo weight is {@code 1/(1 + 2(w·c)²) = 0.30} against 1: settles. Affine functions hold it: reportable.
     */
    private static void reservoirs(List<Case> out) {
        double[] c = {0.6, 0.8, 0.5};
        KnownSystem about = Paths.near("", 50, 0.07, 0.8, new double[][] {{-0.8, 0.3, 0}, {0.3, -0.6, 0.2}, {0, 0.2, -1.3}});
        KnownSystem filled = Paths.seen("three reservoirs filled evenly 3d", about,
                x -> new double[] {c[0] + x[0], c[1] + x[1], c[2] + x[2]});
        out.add(new Case(filled, Look.polynomial(2, 10), Truth.SETTLES));
        out.add(new Case(filled, Look.monomials(1, 4), Truth.REPORTABLE));
    }

    /**
     * Three shops that lend each other stock, week by week: multipliers 0.83 ± 0.27i and 0.44, overlaps 0.67, weights 0.83 and more
     * apart, in the dual space of the state and, degree 1 having the same angles, in that of (1 + x·y)²: settles. Affine functions hold
     * it.
     */
    private static void shops(List<Case> out) {
        double[][] lend = {{0.9, 0.6, 0}, {-0.15, 0.7, 0.5}, {0, 0.05, 0.5}};
        KnownSystem shops = Paths.map("three shops that lend 3d", 24, 1, Paths.box(3, -0.8, 0.8), x -> Paths.times(lend, x));
        out.add(new Case(shops, Look.linearKernel(3), Truth.SETTLES));
        out.add(new Case(shops, Look.step("polynomial", 10, "degree", 2, "offset", 1), Truth.SETTLES));
        out.add(new Case(shops, Look.monomials(1, 4), Truth.REPORTABLE));
    }

    /**
     * A turning arm that lifts a weight, {@code ζ = u + iv} with the rate -0.15 + 1.2i, {@code z = w + 0.9uv}, w with the rate -1: entire
     * eigenfunctions ζ, ζ², their conjugates and {@code z - 0.9uv}, {@code uv = (ζ² - ζ̄²)/4i}. In the space of (1 + x·y)² ‖z‖² = ‖uv‖²,
     * ‖ζ²‖² = 4 in units in which ‖uv‖² = 1/2, {@code <uv, ζ²> = 1}: overlap of w and ζ² {@code 0.9/(√(1.81/2) · 2) = 0.47}, solo weight
     * of w 1/1.81 = 0.55 against 1; 1, u, v, z, u², uv, v² are carried into themselves: settles. Monomials of degree 2 hold them:
     * reportable.
     */
    private static void arm(List<Case> out) {
        KnownSystem arm = Paths.closed("turning arm that lifts 3d", 60, 0.06, Paths.box(3, -1, 1), (x, t) -> {
            double size = exp(-0.15 * t);
            double u = size * (x[0] * cos(1.2 * t) - x[1] * sin(1.2 * t));
            double v = size * (x[0] * sin(1.2 * t) + x[1] * cos(1.2 * t));
            return new double[] {u, v, (x[2] - 0.9 * x[0] * x[1]) * exp(-t) + 0.9 * u * v};
        });
        out.add(new Case(arm, Look.polynomial(2, 10), Truth.SETTLES));
        out.add(new Case(arm, Look.monomials(2, 10), Truth.REPORTABLE));
    }

    /**
     * Paths that settle onto a line with two bends, {@code y = v + 0.9u² - 1.1u³}, u and v with the rates -0.45 and -2: u, u², u³ and
     * {@code y - 0.9u² + 1.1u³} are polynomials of degree 3, carried into themselves: reportable in the average over the data. Rates
     * -0.45, -0.9, -1.35, -2.
     */
    private static void bentLine(List<Case> out) {
        out.add(new Case(Paths.closed("settling onto a line with two bends 2d", 60, 0.05, Paths.box(2, -1, 1), (x, t) -> {
            double u = x[0] * exp(-0.45 * t);
            return new double[] {u, x[1] * exp(-2 * t) + 0.9 * u * u - 1.1 * u * u * u};
        }), Look.monomials(3, 10), Truth.REPORTABLE));
    }

    /**
     * A torus, angles that turn by 0.9 and 0.9√3 a step, seen by the cosines of both and of their sum. w·x are three-dimensional; a
     * turned cosine is {@code cos ω cos θ - sin ω sin θ} and the sine is orthogonal to all three: the best multiplier cos ω misses by sin
     * ω, 0.78, 1.00, 0.63, a mixture by no less: absent. Delays hold the three pairs: reportable.
     */
    private static void torus(List<Case> out) {
        KnownSystem torus = Paths.closed("torus seen by three cosines", 70, 1, Paths.box(2, 0, 2 * PI), (u, t) -> {
            double first = u[0] + 0.9 * t;
            double second = u[1] + 0.9 * sqrt(3) * t;
            return new double[] {cos(first), cos(second), cos(first + second)};
        });
        out.add(new Case(torus, Look.linearKernel(3), Truth.ABSENT));
        out.add(new Case(torus, Look.delays(4, 6), Truth.REPORTABLE));
    }

    /** C2.14 with another irrational number: e^(2πinx) are eigenfunctions; harmonics to order 3 hold 0.83 of the saw-tooth's variance. */
    private static void circle(List<Case> out) {
        out.add(new Case(Paths.map("circle rotation by ∛2-1", 70, 1, Paths.box(1, 0, 1), x -> new double[] {(x[0] + cbrt(2) - 1) % 1}),
                Look.fourier(3), Truth.REPORTABLE));
    }

    /**
     * Takings of a shop that follow the day of the week, each shop of its own size: period 7, so a mean and three pairs and nothing else,
     * held by delays over more than a week: reportable.
     */
    private static void week(List<Case> out) {
        double[] days = {0.4, 1.1, 0.7, 0.9, 2.2, 2.6, -0.5};
        out.add(new Case(Paths.closed("takings by the day of the week", 63, 1, Paths.box(2, 0, 1), (u, t) -> new double[] {
            (0.6 + 0.8 * u[0]) * days[(int) (floor(7 * u[1]) + t + 0.5) % 7]}), Look.delays(10, 7), Truth.REPORTABLE));
    }

    /**
     * Lines, held by delays: reportable. Four tones, 0.7, 1.2, 2 and 2.9 rad/s, of sizes and phases of their own. A scale pan that comes
     * to rest at a weight, with a swing -0.2 ± 1.8i and a slow spring, -0.6.
     */
    private static void lines(List<Case> out) {
        out.add(new Case(Paths.closed("chord of four tones", 150, 0.3, Paths.box(8, 0.5, 1), (u, t) -> new double[] {
            u[0] * cos(0.7 * t + 13 * u[4]) + u[1] * cos(1.2 * t + 13 * u[5]) + u[2] * cos(2 * t + 13 * u[6])
                + u[3] * cos(2.9 * t + 13 * u[7])}), Look.delays(40, 8), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("scale pan that comes to rest", 90, 0.1, Paths.box(4, 0, 1), (u, t) -> new double[] {
            2.4 * u[0] - 1.2 + (0.5 + u[1]) * exp(-0.2 * t) * cos(1.8 * t + 7 * u[3]) + (4 * u[2] - 2) * exp(-0.6 * t)}),
                Look.delays(36, 4), Truth.REPORTABLE));
    }

    /**
     * Limit cycles, reached before the record begins, held by delays that reach over a period: reportable. A valve with a flat middle,
     * {@code x'' = 0.5(1 - x⁴)x' - x}: ±0.97i, third harmonic 9 %. A valve with a hard spring, {@code x'' = 0.4(1 - x²)x' - x - 0.5x³}:
     * ±1.54i, third harmonic 4 %.
     */
    private static void cycles(List<Case> out) {
        out.add(new Case(Paths.flow("valve with a flat middle, on its cycle", 110, 0.25, 80, 1, Paths.box(2, -1, 1), x -> new double[] {
            x[1], 0.5 * (1 - x[0] * x[0] * x[0] * x[0]) * x[1] - x[0]}), Look.delays(26, 4), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("valve with a hard spring, on its cycle", 110, 0.16, 80, 1, Paths.box(2, -1, 1), x -> new double[] {
            x[1], 0.4 * (1 - x[0] * x[0]) * x[1] - x[0] - 0.5 * x[0] * x[0] * x[0]}), Look.delays(26, 4), Truth.REPORTABLE));
    }

    /**
     * Rock, paper, scissors: {@code x' = 2x(y - z)} and so on round (Hofbauer and Sigmund, Evolutionary Games and Population Dynamics,
     * 1998): sum and product are kept, every orbit is closed. One orbit: periodic, a mean and harmonics that delays hold: reportable.
     * Orbits of products 0.034 to 0.002: periods 5.5 to 9.5, a continuous range: nothing to report.
     */
    private static void game(List<Case> out) {
        Paths.Field field = x -> new double[] {2 * x[0] * (x[1] - x[2]), 2 * x[1] * (x[2] - x[0]), 2 * x[2] * (x[0] - x[1])};
        out.add(new Case(new KnownSystem("rock, paper, scissors, one orbit", 0.2, random -> Paths.flow("", 110, 0.2,
                0.01 + 7 * random.nextDouble(), 3, ignored -> new double[] {0.8, 0.1, 0.1}, field).path().draw(random)),
                Look.delays(18, 5), Truth.REPORTABLE));
        KnownSystem many = Paths.flow("rock, paper, scissors, many orbits", 140, 0.2, 0, 3, random -> {
            double first = 0.45 + 0.46 * random.nextDouble();
            return new double[] {first, (1 - first) / 2, (1 - first) / 2};
        }, field);
        out.add(new Case(many, Look.delays(12, 7), Truth.NONE));
        out.add(new Case(many, Look.monomials(3, 10), Truth.NONE));
    }

    /**
     * Equal stages one after the other, a single Jordan block (C2.18): drifts. Four low-pass stages, 0.9 each, all of them seen. What
     * leaves the last of three tanks of 0.8, {@code (a + bt + ct²)e^(-0.8t)}.
     */
    private static void stages(List<Case> out) {
        KnownSystem filter = Paths.linear("four equal low-pass stages 4d", 60, 0.08, new double[][] {{-0.9, 0, 0, 0}, {0.9, -0.9, 0, 0},
            {0, 0.9, -0.9, 0}, {0, 0, 0.9, -0.9}});
        out.add(new Case(filter, Look.linearKernel(4), Truth.DRIFTS));
        out.add(new Case(filter, Look.monomials(1, 5), Truth.DRIFTS));
        out.add(new Case(Paths.closed("wash-out of three equal tanks", 70, 0.1, Paths.box(3, -1, 1), (u, t) -> new double[] {
            (u[0] + 1.5 * u[1] * t + 1.2 * u[2] * t * t) * exp(-0.8 * t)}), Look.delays(24, 3), Truth.DRIFTS));
    }

    /**
     * A season on a bent trend, {@code a + bt + ct²} and a tone of 0.9: a pair of modes and a threefold 1 with one eigenvector, which
     * carries most of the signal: the worst of the two drifts.
     */
    private static void trend(List<Case> out) {
        out.add(new Case(Paths.closed("season on a bent trend", 80, 0.4, Paths.box(4, -1, 1), (u, t) -> new double[] {
            2 * u[0] + 0.2 * u[1] * t + 0.016 * u[2] * t * t + cos(0.9 * t + PI * u[3])}), Look.delays(32, 5), Truth.DRIFTS));
    }

    /**
     * An ice floe on an even current, {@code x' = (0.7, -0.4)}: in the space of exp(x·y) every e^(k·x) is an eigenfunction, over-complete
     * (C3.2, C3.4); on polynomials the generator is nilpotent, x and y are generalised eigenfunctions of the rate 0: drifts. The Gaussian
     * space holds no e^(k·x) (C3.12).
     */
    private static void floe(List<Case> out) {
        KnownSystem floe = Paths.closed("ice floe on an even current 2d", 45, 0.03, Paths.box(2, -0.8, 0.8), (u, t) -> new double[] {
            u[0] + 0.7 * t, u[1] - 0.4 * t});
        out.add(new Case(floe, Look.exponential(8), Truth.DRIFTS));
        out.add(new Case(floe, Look.monomials(2, 6), Truth.DRIFTS));
        out.add(new Case(floe, Look.gaussian(1, 8), Truth.NONE));
    }

    /**
     * Nonlinear resonance, a Jordan block on the driving power and the driven channel, which no eigenfunction reaches: drifts in the
     * space of exp(x·y) and on monomials. A cube, {@code x' = -0.4x, y' = -1.2y + 1.5x³}: {@code y = (y0 + 1.5x0³t)e^(-1.2t)}. The power
     * of a swing, {@code z' = (-0.2 + 1.4i)z, y' = -0.4y + 1.5|z|²}: {@code y = (y0 + 1.5|z0|²t)e^(-0.4t)}.
     */
    private static void resonances(List<Case> out) {
        KnownSystem cube = Paths.closed("cube at resonance 2d", 50, 0.06, Paths.box(2, -1.2, 1.2), (u, t) -> new double[] {
            u[0] * exp(-0.4 * t), (0.5 * u[1] + 1.5 * u[0] * u[0] * u[0] * t) * exp(-1.2 * t)});
        out.add(new Case(cube, Look.exponential(10), Truth.DRIFTS));
        out.add(new Case(cube, Look.monomials(3, 10), Truth.DRIFTS));
        KnownSystem power = Paths.closed("power of a swing at resonance 3d", 60, 0.08, Paths.box(3, -0.7, 0.7), (u, t) -> {
            double size = exp(-0.2 * t);
            return new double[] {size * (u[0] * cos(1.4 * t) - u[1] * sin(1.4 * t)), size * (u[0] * sin(1.4 * t) + u[1] * cos(1.4 * t)),
                (u[2] + 1.5 * (u[0] * u[0] + u[1] * u[1]) * t) * size * size};
        });
        out.add(new Case(power, Look.exponential(14), Truth.DRIFTS));
        out.add(new Case(power, Look.monomials(2, 10), Truth.DRIFTS));
    }

    /**
     * {@code x' = -0.9x⁴, x⁻³ = x0⁻³ + 2.7t}: degree 4, only the constant is an eigenfunction in the space of exp(xy) (C3.4): absent;
     * formal ones, exp(λ/(2.7x³)), are essentially singular at 0, inside the sampled interval, so none is a polynomial. A crust that
     * thickens, {@code r' = 0.8/r²}: formal ones are exp(λr³/2.4), of order 3, too quick for the space of exp(xy), which holds orders up
     * to 2 (C3.2); between the ends of a record they look as if over-complete: nothing to report.
     */
    private static void powers(List<Case> out) {
        KnownSystem fourth = Paths.closed("x'=-0.9x^4", 41, 0.02, Paths.box(1, -0.7, 1.2), (x, t) -> new double[] {
            x[0] / cbrt(1 + 2.7 * x[0] * x[0] * x[0] * t)});
        out.add(new Case(fourth, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(fourth, Look.monomials(5, 6), Truth.NONE));
        out.add(new Case(Paths.closed("crust that thickens", 50, 0.03, Paths.box(1, 0.6, 1.6), (r, t) -> new double[] {
            cbrt(r[0] * r[0] * r[0] + 2.4 * t)}), Look.exponential(8), Truth.NONE));
    }

    /**
     * A ball that rolls to the groove of a hat, {@code x' = x(1 - |x|²)} in the plane: on every line through 0 it is {@code x - x³},
     * whose only eigenfunction in the space of exp(xy) is the constant (C3.4), and what is constant on all of these lines is constant:
     * none. Nothing to report.
     */
    private static void rests(List<Case> out) {
        out.add(new Case(Paths.closed("ball that rolls to the groove of a hat", 60, 0.04, Paths.box(2, -1.3, 1.3), (x, t) -> {
            double square = x[0] * x[0] + x[1] * x[1];
            double grown = exp(t) / sqrt(1 + square * (exp(2 * t) - 1));
            return new double[] {x[0] * grown, x[1] * grown};
        }), Look.exponential(10), Truth.NONE));
    }

    /**
     * The valve with a flat middle off its cycle, 0.8 for 0.5: within the cycle all paths come from the source at 0, rates 0.40 ± 0.92i,
     * and stay bounded: an entire eigenfunction of a positive real part would grow without bound, of a negative one be infinite at the
     * source, of none be a constant, as 0 has no imaginary rate of its own: none. Nothing to report.
     */
    private static void valve(List<Case> out) {
        out.add(new Case(Paths.flow("valve with a flat middle, off its cycle", 80, 0.1, 0, 2, Paths.box(2, -0.7, 0.7), x -> new double[] {
            x[1], 0.8 * (1 - x[0] * x[0] * x[0] * x[0]) * x[1] - x[0]}), Look.exponential(10), Truth.NONE));
    }

    /**
     * Prey whose grass runs out, {@code x' = 1.6x(1 - x/1.5) - 1.2xy, y' = y(0.9x - 0.5)}: all spirals into a focus of the rates -0.30 ±
     * 0.65i (Goh, American Naturalist 111:135, 1977, for the whole quadrant). An entire eigenfunction that is not a constant has a rate
     * with a negative real part, as it is finite at the focus; along the path that comes from the saddle (1.5, 0) it would be infinite
     * there unless 0 on all of that path, which winds about the focus without end, so it is 0: none. Nothing to report.
     */
    private static void prey(List<Case> out) {
        out.add(new Case(Paths.flow("prey whose grass runs out", 80, 0.1, 0, 2, Paths.box(2, 0.05, 1.5), x -> new double[] {
            1.6 * x[0] * (1 - x[0] / 1.5) - 1.2 * x[0] * x[1], x[1] * (0.9 * x[0] - 0.5)}), Look.exponential(10), Truth.NONE));
    }

    /**
     * A continuous range of frequencies, no isolated one: nothing to report. To and fro in a valley of two straight slopes, let go at 0.4
     * to 4: periods {@code 4√(2a)}, 3.6 to 11.3. A soft cord, {@code x'' = -tanh 2x}, 0.3 to 4: periods 4.6 to 11.3. A stiff one, {@code
     * x'' = -sinh x}, 0.5 to 4: periods 6.2 to 2.9.
     */
    private static void ensembles(List<Case> out) {
        out.add(new Case(Paths.closed("valley of two straight slopes", 120, 0.15, Paths.box(2, 0, 1), (u, t) -> {
            double size = 0.4 + 3.6 * u[0];
            double quarter = sqrt(2 * size);
            double late = (t + 4 * quarter * u[1]) % (4 * quarter) - 2 * quarter;
            return new double[] {signum(late) * (size - (abs(late) - quarter) * (abs(late) - quarter) / 2)};
        }), Look.delays(12, 6), Truth.NONE));
        KnownSystem soft = Paths.flow("soft cord, many sizes", 120, 0.18, 0, 2, random -> new double[] {0.3 + 3.7 * random.nextDouble(), 0},
                x -> new double[] {x[1], -tanh(2 * x[0])});
        out.add(new Case(soft, Look.delays(12, 6), Truth.NONE));
        out.add(new Case(soft, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(Paths.flow("stiff cord, many sizes", 130, 0.1, 0, 2, random -> new double[] {0.5 + 3.5 * random.nextDouble(), 0},
                x -> new double[] {x[1], -sinh(x[0])}), Look.delays(12, 6), Truth.NONE));
    }

    /**
     * The cry of a bat, {@code cos(12 ln τ)}, {@code τ = 1 + (t + t0)/3}: from 4 to 1 rad/s and less, no frequency: nothing to report.
     */
    private static void bat(List<Case> out) {
        out.add(new Case(Paths.closed("cry of a bat", 110, 0.1, Paths.box(2, 0, 1), (u, t) -> new double[] {
            cos(12 * log(1 + (t + 4 * u[0]) / 3) + 2 * PI * u[1])}), Look.delays(14, 6), Truth.NONE));
    }

    /**
     * Chaos: nothing to report. A westerly wind and its waves, {@code (-y² - z² - x/4 + 2, xy - 4xz - y + 1, 4xy + xz - z)} (Lorenz,
     * Tellus A 36:98, 1984): autocorrelations of the waves below 0.2 from 0.6 on, of the wind below 0.3 from 3.6 on. Holmes' map, {@code
     * (y, -0.15x + 2.75y - y³)} (Philosophical Transactions of the Royal Society A 292:419, 1979).
     */
    private static void chaos(List<Case> out) {
        out.add(new Case(Paths.flow("westerly wind and its waves", 150, 0.15, 60, 3, Paths.box(3, 0.5, 1.5), x -> new double[] {
            -x[1] * x[1] - x[2] * x[2] - x[0] / 4 + 2, x[0] * x[1] - 4 * x[0] * x[2] - x[1] + 1, 4 * x[0] * x[1] + x[0] * x[2] - x[2]}),
                Look.delays(6, 8), Truth.NONE));
        KnownSystem holmes = new KnownSystem("Holmes map", 1, random -> {
            double[] x = {0.2 * random.nextDouble() + 0.1, 0.2 * random.nextDouble() + 0.1};
            double[][] rows = new double[100][];
            for (int k = -60; k < rows.length; k++) {
                x = new double[] {x[1], -0.15 * x[0] + 2.75 * x[1] - x[1] * x[1] * x[1]};
                if (k >= 0) {
                    rows[k] = x;
                }
            }
            return rows;
        });
        out.add(new Case(holmes, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(holmes, Look.delays(4, 4), Truth.NONE));
        out.add(new Case(holmes, Look.step("gaussian", 12, "scale", 0.8), Truth.NONE));
    }

    /**
     * Chebyshev's polynomial of degree 5 as a map: cosines of angles that are taken five times, {@code T_n -> T_5n}, and T_n are
     * orthogonal in the average over its density. On polynomials of degree 4 all but the constant are carried to what is orthogonal to
     * the space: the residual is 1. On delays the five functions T_1 to T_625 are shifted on until they leave the space, the only
     * eigenvalue is 0: absent.
     */
    private static void chebyshev(List<Case> out) {
        KnownSystem five = Paths.map("five times the angle, seen from the side", 90, 1,
                random -> new double[] {cos(PI * random.nextDouble())}, x -> new double[] {cos(5 * acos(max(-1, min(1, x[0]))))});
        out.add(new Case(five, Look.monomials(4, 5), Truth.ABSENT));
        out.add(new Case(five, Look.delays(5, 4), Truth.ABSENT));
    }

    /**
     * Independent from sample to sample, no memory that a function could carry: absent. Noise with outliers, Student's t of 5 degrees.
     * Tosses of a coin. Squares of noise in two channels. Three channels that mix the noise of one time.
     */
    private static void white(List<Case> out) {
        out.add(new Case(Paths.chance("noise with outliers", 140, 0.1, random -> () -> student(random)), Look.delays(6, 4), Truth.ABSENT));
        out.add(new Case(Paths.chance("tosses of a coin", 130, 1, random -> () -> random.nextBoolean() ? 1 : -1), Look.delays(5, 4),
                Truth.ABSENT));
        out.add(new Case(new KnownSystem("squares of noise", 0.1, random -> {
            double[][] rows = new double[130][2];
            for (double[] row : rows) {
                row[0] = pow(random.nextGaussian(), 2);
                row[1] = pow(random.nextGaussian(), 2);
            }
            return rows;
        }), Look.monomials(2, 6), Truth.ABSENT));
        out.add(new Case(new KnownSystem("three mixtures of noise", 0.1, random -> {
            double[][] rows = new double[130][];
            for (int k = 0; k < rows.length; k++) {
                double first = random.nextGaussian();
                double second = random.nextGaussian();
                rows[k] = new double[] {first, first + second, second - 0.5 * first + 0.4 * random.nextGaussian()};
            }
            return rows;
        }), Look.linearKernel(3), Truth.ABSENT));
    }

    private static double student(Random random) {
        double squares = 0;
        for (int i = 0; i < 5; i++) {
            squares += pow(random.nextGaussian(), 2);
        }
        return random.nextGaussian() / sqrt(squares / 5);
    }

    /**
     * Paths that miss their mean motion by most of their size over its own time, as Ornstein-Uhlenbeck in {@link NoModes}: nothing to
     * report. A rate of interest that is drawn back with a noise that grows with its root (Cox, Ingersoll and Ross, Econometrica 53:385,
     * 1985), 0.92 a step. Two memories, 0.95 and 0.5. A grain of pollen with inertia, its speed keeps 0.85 a step. A walk with leaps in
     * the plane.
     */
    private static void chains(List<Case> out) {
        out.add(new Case(Paths.chance("interest that is drawn back", 140, 0.1, random -> {
            double[] x = {0.5 + random.nextDouble()};
            return () -> x[0] = abs(x[0] + 0.08 * (1 - x[0]) + 0.19 * sqrt(x[0]) * random.nextGaussian());
        }), Look.monomials(2, 3), Truth.NONE));
        out.add(new Case(Paths.chance("two memories", 140, 0.1, random -> {
            double[] x = {random.nextGaussian(), random.nextGaussian()};
            return () -> {
                x[0] = 0.95 * x[0] + 0.31 * random.nextGaussian();
                x[1] = 0.5 * x[1] + 0.87 * random.nextGaussian();
                return x[0] + x[1];
            };
        }), Look.delays(6, 4), Truth.NONE));
        out.add(new Case(Paths.chance("pollen with inertia", 140, 0.1, random -> {
            double[] x = {0, 2 * random.nextGaussian()};
            return () -> {
                x[1] = 0.85 * x[1] + random.nextGaussian();
                return x[0] += x[1];
            };
        }), Look.delays(6, 4), Truth.NONE));
        out.add(new Case(Paths.seen("walk with leaps 2d", new KnownSystem("", 1, random -> {
            double[][] rows = new double[130][2];
            for (int k = 1; k < rows.length; k++) {
                rows[k] = new double[] {rows[k - 1][0] + student(random), rows[k - 1][1] + student(random)};
            }
            return rows;
        }), x -> x), Look.monomials(2, 6), Truth.NONE));
    }

    /**
     * Breaks at times that nothing in the record foretells, neither a cycle nor a rate across them: nothing to report. Levels of a lock,
     * two changes. A kite that rises and at a random time comes down.
     */
    private static void breaks(List<Case> out) {
        out.add(new Case(new KnownSystem("levels of a lock", 0.1, random -> {
            double[] levels = {random.nextGaussian(), random.nextGaussian(), random.nextGaussian()};
            int first = 20 + random.nextInt(40);
            int second = first + 20 + random.nextInt(40);
            double[][] rows = new double[140][1];
            for (int k = 0; k < rows.length; k++) {
                rows[k][0] = levels[k < first ? 0 : k < second ? 1 : 2];
            }
            return rows;
        }), Look.delays(8, 4), Truth.NONE));
        out.add(new Case(Paths.closed("kite that rises and comes down", 120, 0.1, Paths.box(3, 0, 1), (u, t) -> {
            double turn = 3 + 6 * u[0];
            return new double[] {(0.5 + u[1]) * min(t, turn) - (0.5 + u[2]) * max(0, t - turn)};
        }), Look.delays(6, 4), Truth.NONE));
    }
}
