package org.modestead.engine.battery;

import static java.lang.StrictMath.PI;
import static java.lang.StrictMath.asin;
import static java.lang.StrictMath.atan;
import static java.lang.StrictMath.cos;
import static java.lang.StrictMath.exp;
import static java.lang.StrictMath.floor;
import static java.lang.StrictMath.log;
import static java.lang.StrictMath.sin;
import static java.lang.StrictMath.sqrt;
import static java.lang.StrictMath.tan;

import java.util.ArrayList;
import java.util.List;

/**
 * The reporting part: systems that no other part holds, their truth written down from the mathematics before any of them was judged and
 * without a look at the code that judges. Overlaps, harmonics, periods and autocorrelations that are not in closed form were computed by
 * another program. Nothing may be set by these cases. A mode that settles and does not stand overlaps by more than a third, and so does
 * its joint weight differ from the solo one.
 */
final class Fresh {

    private Fresh() {}

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        growingTurn(out);
        greenhouse(out);
        sixWheels(out);
        basins(out);
        rotors(out);
        cooling(out);
        shearedTurn(out);
        filters(out);
        wagons(out);
        drivenSwings(out);
        river(out);
        herds(out);
        lifted(out);
        buoy(out);
        twoAccounts(out);
        sinking(out);
        balloon(out);
        powers(out);
        logistic(out);
        slowManifold(out);
        pump(out);
        hopf(out);
        vanDerPol(out);
        pendulum(out);
        predators(out);
        circle(out);
        wheels(out);
        heat(out);
        advection(out);
        freeParticle(out);
        beam(out);
        coherent(out);
        waveforms(out);
        cycloid(out);
        trappedCloud(out);
        stiffeningSpring(out);
        equalRates(out);
        jordan(out);
        cubicResonance(out);
        expandingMaps(out);
        chaos(out);
        returning(out);
        walks(out);
        white(out);
        levels(out);
        return out;
    }

    /**
     * A turn of 1.5 rad/s that grows by 0.2: a skew matrix and a multiple of one, so normal: {@code x ± iy} are orthogonal in the spaces
     * of exp(x·y) and (1 + x·y)² (C3.3): stands. The Gaussian space holds no polynomial (C3.12): nothing to report.
     */
    private static void growingTurn(List<Case> out) {
        KnownSystem turn = Paths.near("growing turn 2d", 60, 0.05, 0.5, new double[][] {{0.2, -1.5}, {1.5, 0.2}});
        out.add(new Case(turn, Look.exponential(6), Truth.STANDS));
        out.add(new Case(turn, Look.polynomial(2, 6), Truth.STANDS));
        out.add(new Case(turn, Look.gaussian(1, 8), Truth.NONE));
    }

    /**
     * Three rooms of a greenhouse that even out and lose heat: a symmetric matrix, rates -0.30, -0.81, -1.59; w·x of its eigenvectors are
     * orthogonal in the spaces of exp(x·y) and x·y (C3.3): stands. Affine functions hold all of it: reportable.
     */
    private static void greenhouse(List<Case> out) {
        KnownSystem rooms = Paths.near("three rooms of a greenhouse 3d", 60, 0.06, 0.8, new double[][] {{-0.9, 0.4, 0.1}, {0.4, -1.3, 0.3},
            {0.1, 0.3, -0.5}});
        out.add(new Case(rooms, Look.exponential(10), Truth.STANDS));
        out.add(new Case(rooms, Look.linearKernel(3), Truth.STANDS));
        out.add(new Case(rooms, Look.monomials(1, 4), Truth.REPORTABLE));
    }

    /**
     * Six flywheels that hand their swing on without loss, all of them with the same drag: a skew matrix and a multiple of one, normal, no
     * blocks; rates -0.1 ± 0.94i, -0.1 ± 1.86i, -0.1 ± 3.11i: stands in the dual space of the state; delays hold all of it.
     */
    private static void sixWheels(List<Case> out) {
        KnownSystem wheels = Paths.linear("six flywheels with the same drag 6d", 80, 0.09, new double[][] {
            {-0.1, 0.9, 0.3, -1.3, -0.5, 1.5}, {-0.9, -0.1, 1.4, 0.5, -1.6, 0.4}, {-0.3, -1.4, -0.1, 0.8, 0.9, -0.3},
            {1.3, -0.5, -0.8, -0.1, -1, 0}, {0.5, 1.6, -0.9, 1, -0.1, 1.2}, {-1.5, -0.4, 0.3, 0, -1.2, -0.1}});
        out.add(new Case(wheels, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(wheels, Look.delays(2, 6), Truth.REPORTABLE));
    }

    /**
     * Five basins round a ring with a current, 0.9 to the next, 0.2 back, 1.2 lost: a circulant matrix, which commutes with its transpose
     * as both are polynomials of the same shift; rates -0.1, -0.86 ± 0.67i, -2.09 ± 0.41i: stands in the dual space of the state; delays
     * hold all of it.
     */
    private static void basins(List<Case> out) {
        double[][] a = new double[5][5];
        for (int i = 0; i < 5; i++) {
            a[i][i] = -1.2;
            a[i][(i + 4) % 5] = 0.9;
            a[i][(i + 1) % 5] = 0.2;
        }
        KnownSystem ring = Paths.linear("five basins round a ring 5d", 60, 0.07, a);
        out.add(new Case(ring, Look.linearKernel(5), Truth.STANDS));
        out.add(new Case(ring, Look.delays(3, 5), Truth.REPORTABLE));
    }

    /**
     * Two equal rotors that pull at each other, {@code z' = αz + βw, w' = αw + βz}, α = -0.225 + 1.95i, β = 0.125 - 0.75i: {@code z ± w}
     * are orthogonal, rates α ± β: -0.1 ± 1.2i, -0.35 ± 2.7i: normal, stands in the dual space of the state; affine functions hold it.
     */
    private static void rotors(List<Case> out) {
        KnownSystem rotors = Paths.linear("two equal rotors that pull at each other 4d", 70, 0.08, new double[][] {
            {-0.225, -1.95, 0.125, 0.75}, {1.95, -0.225, -0.75, 0.125}, {0.125, 0.75, -0.225, -1.95}, {-0.75, 0.125, 1.95, -0.225}});
        out.add(new Case(rotors, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(rotors, Look.monomials(1, 5), Truth.REPORTABLE));
    }

    /** {@code x' = -1.7x}: eigenfunctions x^n, orthogonal in the spaces of exp(xy) (C3.1, C3.4) and (1 + xy)³; only x carries x: stands. */
    private static void cooling(List<Case> out) {
        KnownSystem cooling = Paths.closed("x'=-1.7x", 41, 0.02, Paths.box(1, -1.1, 1.1), (x, t) -> new double[] {x[0] * exp(-1.7 * t)});
        out.add(new Case(cooling, Look.exponential(6), Truth.STANDS));
        out.add(new Case(cooling, Look.polynomial(3, 4), Truth.STANDS));
        out.add(new Case(cooling, Look.delays(6, 1), Truth.REPORTABLE));
    }

    /**
     * A turn along an ellipse that shrinks: rates -0.3 ± 1.22i; the left eigenvectors of the pair are not orthogonal to each other: overlap
     * and distance of the weights 0.54, the same in the spaces of exp(x·y) and (1 + x·y)² (degree 1 has the angles of the state): settles.
     * The Gaussian space holds none (C3.12).
     */
    private static void shearedTurn(List<Case> out) {
        KnownSystem turn = Paths.near("shrinking turn along an ellipse 2d", 60, 0.07, 0.8, new double[][] {{-0.1, 2.2}, {-0.7, -0.5}});
        out.add(new Case(turn, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(turn, Look.polynomial(2, 6), Truth.SETTLES));
        out.add(new Case(turn, Look.delays(6, 2), Truth.REPORTABLE));
        out.add(new Case(turn, Look.gaussian(1, 8), Truth.NONE));
    }

    /**
     * Three filters one after the other, a little of the first fed into the last: rates -0.26, -1.28, -2.57, overlaps of 0.59 and more,
     * weights 0.63 and more apart, in the dual space of the state and, degree 1 having the same angles, in that of exp(x·y): settles.
     */
    private static void filters(List<Case> out) {
        KnownSystem filters = Paths.near("three filters and a feedback 3d", 60, 0.06, 0.8, new double[][] {{-0.3, 1.1, 0}, {0, -1.2, 0.9},
            {0.1, 0, -2.6}});
        out.add(new Case(filters, Look.exponential(10), Truth.SETTLES));
        out.add(new Case(filters, Look.linearKernel(3), Truth.SETTLES));
    }

    /**
     * Two wagons between springs, positions and speeds: -0.11 ± 1.44i, -0.14 ± 2.81i; positions and speeds are of unlike size, so the
     * quick mode overlaps its conjugate by 0.78, weights 0.79 apart, the slow one 0.36 and 0.43: settles in the dual space of the state;
     * delays hold it.
     */
    private static void wagons(List<Case> out) {
        KnownSystem wagons = Paths.linear("two wagons between springs 4d", 80, 0.1, new double[][] {{0, 0, 1, 0}, {0, 0, 0, 1},
            {-7, 3, -0.3, 0}, {1.5, -3, 0, -0.2}});
        out.add(new Case(wagons, Look.linearKernel(4), Truth.SETTLES));
        out.add(new Case(wagons, Look.delays(3, 4), Truth.REPORTABLE));
    }

    /**
     * Three swings, the first drives the second and the second the third: block triangular, rates those of the blocks, -0.12 ± i, -0.2 ±
     * 1.9i, -0.3 ± 3i; the second overlaps by 0.50, weights 0.61 apart: settles in the dual space of the state; delays hold it.
     */
    private static void drivenSwings(List<Case> out) {
        KnownSystem swings = Paths.linear("three swings, each drives the next 6d", 80, 0.09, new double[][] {{-0.12, 1, 0, 0, 0, 0},
            {-1, -0.12, 0, 0, 0, 0}, {0, 0.6, -0.2, 1.9, 0, 0}, {1.1, 0, -1.9, -0.2, 0, 0}, {0, 0, 0, 0, -0.3, 3},
            {0, 0, 1.3, 0, -3, -0.3}});
        out.add(new Case(swings, Look.linearKernel(6), Truth.SETTLES));
        out.add(new Case(swings, Look.delays(3, 6), Truth.REPORTABLE));
    }

    /**
     * Dye in five reaches of a river, 1 goes down, 0.4 is stirred back up, 1.5 lost: rates {@code -1.5 + 2√0.4 cos(kπ/6)}: -0.40, -0.87,
     * -1.5, -2.13, -2.60; the left eigenvectors lean upstream, overlaps 0.73, weights 0.78 and more apart: settles in the dual space of
     * the state; affine functions hold it.
     */
    private static void river(List<Case> out) {
        double[][] a = new double[5][5];
        for (int i = 0; i < 5; i++) {
            a[i][i] = -1.5;
            if (i > 0) {
                a[i][i - 1] = 1;
                a[i - 1][i] = 0.4;
            }
        }
        KnownSystem river = Paths.linear("dye in five reaches of a river 5d", 60, 0.06, a);
        out.add(new Case(river, Look.linearKernel(5), Truth.SETTLES));
        out.add(new Case(river, Look.monomials(1, 6), Truth.REPORTABLE));
    }

    /**
     * Two herds that come and go, the second drives the first, year by year: multipliers 0.85 ± 0.35i, 0.68 ± 0.37i, overlaps 0.83,
     * weights 0.86 apart: settles in the dual space of the state; affine functions hold it.
     */
    private static void herds(List<Case> out) {
        double[][] year = {{0.9, 0.35, 0, 0}, {-0.35, 0.8, 0.5, 0}, {0, 0, 0.7, 0.45}, {0, 0, -0.3, 0.65}};
        KnownSystem herds = Paths.map("two herds year by year 4d", 24, 1, Paths.box(4, -1, 1), x -> Paths.times(year, x));
        out.add(new Case(herds, Look.linearKernel(4), Truth.SETTLES));
        out.add(new Case(herds, Look.monomials(1, 5), Truth.REPORTABLE));
    }

    /**
     * {@code x' = 0.8x + 0.9} about {@code c = -1.125}: eigenfunctions (x - c)^n (C3.4), 1 and x - c carry x. The overlap with the constant
     * is {@code |c|/√(1 + c²) = 0.75}, the solo weight of x - c 1/(1 + c²) = 0.44 against 1 in the space of exp(xy); 0.89 and 0.21 in that
     * of (1 + xy)³, where ‖x‖² = 1/3: settles. Cubic polynomials hold both: reportable.
     */
    private static void lifted(List<Case> out) {
        KnownSystem lifted = Paths.closed("x'=0.8x+0.9", 45, 0.02, Paths.box(1, -1.6, -0.65), (x, t) -> new double[] {
            -1.125 + (x[0] + 1.125) * exp(0.8 * t)});
        out.add(new Case(lifted, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(lifted, Look.polynomial(3, 4), Truth.SETTLES));
        out.add(new Case(lifted, Look.monomials(3, 4), Truth.REPORTABLE));
    }

    /**
     * A boat that spirals in to a buoy at (1, 0.8), rates -0.25 ± 1.6i: eigenfunctions {@code z - z*}, {@code z = x + iy}, its conjugate
     * and 1. In the space of exp(x·y) {@code ‖z - z*‖² = 2 + |z*|²}, {@code |z*|² = 1.64}: the pair overlaps by 1.64/3.64 = 0.45, with the
     * constant 0.67, solo weight 1/3.64 against 1/2. In that of (1 + x·y)² {@code ‖z‖² = 1}: 1.64/2.64 = 0.62, 0.79, and 0.5/2.64 against
     * 1/2: settles. Delays hold the rates 0 and -0.25 ± 1.6i: reportable.
     */
    private static void buoy(List<Case> out) {
        KnownSystem boat = Paths.closed("boat that spirals in to a buoy 2d", 60, 0.08, Paths.box(2, -0.8, 0.8), (x, t) -> {
            double size = exp(-0.25 * t);
            return new double[] {1 + size * (x[0] * cos(1.6 * t) - x[1] * sin(1.6 * t)),
                0.8 + size * (x[0] * sin(1.6 * t) + x[1] * cos(1.6 * t))};
        });
        out.add(new Case(boat, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(boat, Look.polynomial(2, 6), Truth.SETTLES));
        out.add(new Case(boat, Look.delays(8, 3), Truth.REPORTABLE));
    }

    /**
     * Two accounts that lend each other and are paid into, {@code x -> Mx + b}, M symmetric, multipliers 0.88 and 0.52, rest c = (0.85,
     * 0.47) with {@code |w·c|} = 0.97 and 0.01: in the space of (1 + x·y)² a unit w has ‖w·x‖² = 1/2, the slow {@code w·(x - c)} overlaps
     * the constant by {@code 0.97/√(1/2 + 0.95) = 0.81}, its solo weight is 0.35 against 1: settles. Affine functions hold it.
     */
    private static void twoAccounts(List<Case> out) {
        KnownSystem accounts = Paths.map("two accounts that are paid into 2d", 22, 1, Paths.box(2, -0.5, 1.8), x -> new double[] {
            0.8 * x[0] + 0.15 * x[1] + 0.1, 0.15 * x[0] + 0.6 * x[1] + 0.06});
        out.add(new Case(accounts, Look.step("polynomial", 6, "degree", 2, "offset", 1), Truth.SETTLES));
        out.add(new Case(accounts, Look.monomials(1, 3), Truth.REPORTABLE));
    }

    /**
     * {@code x' = -0.9}, as in {@link LineFlows}: in the space of exp(xy) every e^(λx) is an eigenfunction, over-complete (C3.4); on cubic
     * polynomials the generator is nilpotent, x a generalised eigenfunction; delays see a double multiplier 1 (C2.18): drifts. The Gaussian
     * space holds no e^(λx) (C3.12): nothing to report.
     */
    private static void sinking(List<Case> out) {
        KnownSystem sinking = Paths.closed("x'=-0.9", 41, 0.02, Paths.box(1, -0.6, 1.1), (x, t) -> new double[] {x[0] - 0.9 * t});
        out.add(new Case(sinking, Look.exponential(6), Truth.DRIFTS));
        out.add(new Case(sinking, Look.polynomial(3, 4), Truth.DRIFTS));
        out.add(new Case(sinking, Look.delays(6, 2), Truth.DRIFTS));
        out.add(new Case(sinking, Look.gaussian(1, 6), Truth.NONE));
    }

    /**
     * A balloon in a steady wind, {@code x' = (0.5, -0.3, 0.6)}: e^(k·x) without end in the space of exp(x·y) (C3.2, C3.4); on affine
     * functions the generator is nilpotent, what lies across the wind is kept, what lies along it is a generalised eigenfunction of the
     * rate 0 only: drifts.
     */
    private static void balloon(List<Case> out) {
        KnownSystem balloon = Paths.closed("balloon in a steady wind 3d", 45, 0.03, Paths.box(3, -0.8, 0.8), (x, t) -> new double[] {
            x[0] + 0.5 * t, x[1] - 0.3 * t, x[2] + 0.6 * t});
        out.add(new Case(balloon, Look.exponential(10), Truth.DRIFTS));
        out.add(new Case(balloon, Look.monomials(1, 4), Truth.DRIFTS));
    }

    /**
     * Degree 2 and 3 on the line: only the constant is an eigenfunction in the space of exp(xy) (C3.4). {@code -0.9x²} and {@code -0.8x³}:
     * formal ones, exp(λ/0.9x) and exp(λ/1.6x²), are essentially singular at 0, amid the data: absent, and none is a polynomial: nothing
     * to report. {@code 0.3(x² + x + 1)} has no real rest: formal ones, powers of exp(atan), are singular at {@code (-1 ± i√3)/2} and not
     * entire; between the ends of a record they look as if over-complete: nothing to report.
     */
    private static void powers(List<Case> out) {
        KnownSystem square = Paths.closed("x'=-0.9x^2", 41, 0.02, Paths.box(1, -0.6, 1.2), (x, t) -> new double[] {
            x[0] / (1 + 0.9 * x[0] * t)});
        out.add(new Case(square, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(square, Look.monomials(5, 6), Truth.NONE));
        KnownSystem cube = Paths.closed("x'=-0.8x^3", 50, 0.04, Paths.box(1, -1.2, 1.2), (x, t) -> new double[] {
            x[0] / sqrt(1 + 1.6 * x[0] * x[0] * t)});
        out.add(new Case(cube, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(cube, Look.monomials(5, 6), Truth.NONE));
        double half = sqrt(3) / 2;
        KnownSystem restless = Paths.closed("x'=0.3(x^2+x+1)", 50, 0.02, Paths.box(1, -1.4, 0.4), (x, t) -> new double[] {
            half * tan(atan((x[0] + 0.5) / half) + 0.3 * half * t) - 0.5});
        out.add(new Case(restless, Look.exponential(8), Truth.NONE));
    }

    /**
     * {@code x' = 2x(1 - x/0.8)}, both rests among the data: formal eigenfunctions are powers of {@code x/(0.8 - x)} (C2.9), none is entire
     * but the constant (C3.4): absent, and none is a polynomial: nothing to report.
     */
    private static void logistic(List<Case> out) {
        KnownSystem logistic = Paths.closed("x'=2x(1-x/0.8)", 50, 0.02, Paths.box(1, -0.06, 1.3), (x, t) -> new double[] {
            x[0] * exp(2 * t) / (1 + x[0] / 0.8 * (exp(2 * t) - 1))});
        out.add(new Case(logistic, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(logistic, Look.monomials(5, 6), Truth.NONE));
    }

    /**
     * C2.3 with mu = -0.2, lambda = -1.1, so b = 1.1/0.7 = 1.57: x, x² and y - bx² carry the signal. In the space of exp(x·y) the last two
     * overlap by {@code 2b/(√2 √(1 + 2b²)) = 0.91}, solo weight {@code 1/(1 + 2b²) = 0.17} against 1: settles. Quadratic polynomials and
     * delays hold them: reportable.
     */
    private static void slowManifold(List<Case> out) {
        double b = 1.1 / 0.7;
        KnownSystem manifold = Paths.closed("slow manifold, mu = -0.2", 70, 0.05, Paths.box(2, -1, 1), (x, t) -> {
            double u = x[0] * exp(-0.2 * t);
            return new double[] {u, (x[1] - b * x[0] * x[0]) * exp(-1.1 * t) + b * u * u};
        });
        out.add(new Case(manifold, Look.exponential(10), Truth.SETTLES));
        out.add(new Case(manifold, Look.monomials(2, 6), Truth.REPORTABLE));
        out.add(new Case(manifold, Look.delays(16, 3), Truth.REPORTABLE));
    }

    /**
     * A shrinking turn ζ, rate s = -0.2 + 1.3i, drives a pump, {@code z' = -0.9z + 0.7 Re(ζ)²}: eigenfunctions ζ, ζ², their conjugates,
     * |ζ|² and {@code z - h}, {@code h = 2 Re(kζ²) + 0.7|ζ|²}, {@code k = 0.175/(0.9 + 2s)}. In the space of (1 + x·y)² ‖z‖² = 1/2,
     * ‖|ζ|²‖² = 2, ‖ζ²‖² = 4, ‖h‖² = 1.015: overlap of z - h and |ζ|² {@code 1.4/(√2 √1.515) = 0.80}, solo weight of z - h 0.33 against
     * 1; 1, u, v, z, u², uv, v² are carried into themselves: settles. Quadratic polynomials hold them: reportable.
     */
    private static void pump(List<Case> out) {
        KnownSystem pump = Paths.closed("pump driven by a shrinking turn 3d", 60, 0.06, Paths.box(3, -1, 1), (x, t) -> {
            double size = exp(-0.2 * t);
            double u = size * (x[0] * cos(1.3 * t) - x[1] * sin(1.3 * t));
            double v = size * (x[0] * sin(1.3 * t) + x[1] * cos(1.3 * t));
            return new double[] {u, v, (x[2] - pumped(x[0], x[1])) * exp(-0.9 * t) + pumped(u, v)};
        });
        out.add(new Case(pump, Look.polynomial(2, 10), Truth.SETTLES));
        out.add(new Case(pump, Look.monomials(2, 10), Truth.REPORTABLE));
    }

    /** {@code 2 Re(kζ²) + 0.7|ζ|²}, {@code k = 0.175/(0.5 + 2.6i)}. */
    private static double pumped(double u, double v) {
        return 0.35 * (0.5 * (u * u - v * v) + 2.6 * 2 * u * v) / (0.5 * 0.5 + 2.6 * 2.6) + 0.7 * (u * u + v * v);
    }

    /**
     * C2.4, mu = 0.49, gamma = 1.7, beta = 0.4: on the cycle a rotation of 1.504 rad/s, e^(inθ) are orthogonal in the space of exp(x·y):
     * stands. mu = 0.36, gamma = 1.5, beta = 0.6, off the cycle: eigenfunctions contain ln r and 1/r²; an entire one has a sum of rates of
     * the source, 0.36 ± 1.5i, for its rate, and grows without bound unless it is constant, while paths stay bounded: nothing to report.
     */
    private static void hopf(List<Case> out) {
        KnownSystem on = Paths.closed("Hopf on the cycle of radius 0.7", 60, 0.1, Paths.box(1, 0, 2 * PI), (u, t) -> new double[] {
            0.7 * cos(u[0] + 1.504 * t), 0.7 * sin(u[0] + 1.504 * t)});
        out.add(new Case(on, Look.exponential(5), Truth.STANDS));
        out.add(new Case(on, Look.delays(12, 2), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("Hopf off the cycle of radius 0.6", 60, 0.09, Paths.box(2, 0, 1), (u, t) -> {
            double start = 0.1 + 0.9 * u[0];
            double r = sqrt(0.36 / (1 + (0.36 / (start * start) - 1) * exp(-0.72 * t)));
            double angle = 2 * PI * u[1] + (1.5 - 0.6 * 0.36) * t + 0.6 * log(r / start);
            return new double[] {r * cos(angle), r * sin(angle)};
        }), Look.exponential(10), Truth.NONE));
    }

    /**
     * C2.5. mu = 1.6 on the cycle: period 7.20, odd harmonics 17, 5, 1.8, 0.7 %: delays over a period hold four pairs: reportable. mu = 1.4
     * from starts all over the plane: within the cycle paths come from the source at 0 and stay bounded, so an entire eigenfunction is
     * constant, as off the cycle in {@link #hopf}: nothing to report.
     */
    private static void vanDerPol(List<Case> out) {
        out.add(new Case(Paths.flow("van der Pol 1.6 on the cycle", 120, 0.2, 50, 1, Paths.box(2, -1, 1), x -> new double[] {x[1],
            1.6 * (1 - x[0] * x[0]) * x[1] - x[0]}), Look.delays(38, 8), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("van der Pol 1.4 off the cycle", 60, 0.1, 0, 2, Paths.box(2, -2, 2), x -> new double[] {x[1],
            1.4 * (1 - x[0] * x[0]) * x[1] - x[0]}), Look.step("exponential", 12, "rate", 0.25), Truth.NONE));
    }

    /**
     * C2.7, {@code x'' = -cx' - 1.5 sin x}. Undamped, let go at 0.8 to 2.7: periods 5.3 to 9.6, no isolated frequency: nothing to report.
     * One orbit, from 2.2: period 7.33, third harmonic 4 %, fifth 0.2 %: reportable. c = 0.3, at most 0.05: linear to 2e-4, rates -0.15 ±
     * 1.22i: reportable. c = 0.25, let go at 0.6 to 2.6: an entire eigenfunction is finite at the focus, so the real part of its rate is
     * negative, and at the saddle too, so it is 0 along the path from there, which winds about the focus without end, so it is 0 all over:
     * nothing to report.
     */
    private static void pendulum(List<Case> out) {
        KnownSystem many = pendulum("pendulum of 1.5, amplitudes 0.8 to 2.7", 0, 0.8, 2.7);
        out.add(new Case(many, Look.delays(12, 6), Truth.NONE));
        out.add(new Case(many, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(Paths.orbit("pendulum of 1.5, one orbit", 120, 0.2, 7.3, 1, new double[] {2.2, 0}, x -> new double[] {x[1],
            -1.5 * sin(x[0])}), Look.delays(38, 4), Truth.REPORTABLE));
        out.add(new Case(pendulum("damped pendulum of 1.5, small", 0.3, 0.02, 0.05), Look.delays(12, 2), Truth.REPORTABLE));
        out.add(new Case(pendulum("damped pendulum of 1.5, amplitudes 0.6 to 2.6", 0.25, 0.6, 2.6),
                Look.step("exponential", 12, "rate", 0.25), Truth.NONE));
    }

    private static KnownSystem pendulum(String name, double damping, double low, double high) {
        return Paths.flow(name, 110, 0.15, 0, 2, random -> new double[] {low + (high - low) * random.nextDouble(), 0},
                x -> new double[] {x[1], -damping * x[1] - 1.5 * sin(x[0])});
    }

    /**
     * Lotka-Volterra (C2.8), {@code x' = x(1 - y), y' = 1.7y(x - 1)}, from (1, 1.3) to (1, 4.5): periods 4.84 to 6.16, no isolated
     * frequency: nothing to report. One orbit, from (1, 1.9): period 5.0, mean and harmonics 22, 5, 1 %: reportable.
     */
    private static void predators(List<Case> out) {
        Paths.Field field = x -> new double[] {x[0] * (1 - x[1]), 1.7 * x[1] * (x[0] - 1)};
        KnownSystem many = Paths.flow("foxes and rabbits, ensemble", 150, 0.16, 0, 2, random -> new double[] {1,
            1.3 + 3.2 * random.nextDouble()}, field);
        out.add(new Case(many, Look.delays(12, 7), Truth.NONE));
        out.add(new Case(many, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(Paths.orbit("foxes and rabbits, orbit", 110, 0.16, 5, 2, new double[] {1, 1.9}, field), Look.delays(33, 9),
                Truth.REPORTABLE));
    }

    /**
     * C2.14. By √7 - 2 turns seen as the angle: e^(2πinx) are eigenfunctions, harmonics to order 3 hold 0.83 of the saw-tooth's variance.
     * By e/10 turns in the plane: e^(inθ) are orthogonal in the space of exp(x·y), a function of the difference of the angles: stands.
     */
    private static void circle(List<Case> out) {
        out.add(new Case(Paths.map("circle rotation by √7-2", 70, 1, Paths.box(1, 0, 1), x -> new double[] {(x[0] + sqrt(7) - 2) % 1}),
                Look.fourier(3), Truth.REPORTABLE));
        KnownSystem plane = Paths.closed("circle rotation by e/10", 60, 1, Paths.box(1, 0, 1), (x, t) -> new double[] {
            cos(2 * PI * (x[0] + exp(1) / 10 * t)), sin(2 * PI * (x[0] + exp(1) / 10 * t))});
        out.add(new Case(plane, Look.step("exponential", 5, "rate", 1), Truth.STANDS));
        out.add(new Case(plane, Look.delays(4, 2), Truth.REPORTABLE));
    }

    /**
     * Two wheels of radii 1 and 0.8 that turn by 0.7 and 0.7√6 a step: x·y and |x - y|² are functions of the differences of both angles, so
     * {@code e^(i(ma + nb))} are orthogonal in the dual space of the state and in the Gaussian space on the torus, which does hold them:
     * stands. Two wheels that turn by 0.6 and 1.5, seen by four gauges through a matrix M that is not orthogonal: e^(ia) is w·x, w a
     * combination of the first two rows of M⁻¹, e^(ib) of the last two; overlaps 0.48, weights 0.60 apart: settles; delays hold both.
     */
    private static void wheels(List<Case> out) {
        KnownSystem straight = Paths.closed("two wheels of unlike speed 4d", 60, 1, Paths.box(2, 0, 2 * PI), (u, t) -> new double[] {
            cos(u[0] + 0.7 * t), sin(u[0] + 0.7 * t), 0.8 * cos(u[1] + 0.7 * sqrt(6) * t), 0.8 * sin(u[1] + 0.7 * sqrt(6) * t)});
        out.add(new Case(straight, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(straight, Look.step("gaussian", 9, "scale", 1), Truth.STANDS));
        double[][] gauges = {{1, 0.3, 0.5, 0}, {0, 1, 0.4, 0.2}, {-0.4, 0.2, 1, 0.6}, {0.1, 0.5, -0.3, 0.8}};
        KnownSystem askew = Paths.closed("two wheels seen askew 4d", 60, 1, Paths.box(4, 0, 1), (u, t) -> Paths.times(gauges, new double[] {
            (0.5 + u[2]) * cos(2 * PI * u[0] + 0.6 * t), (0.5 + u[2]) * sin(2 * PI * u[0] + 0.6 * t),
            (0.5 + u[3]) * cos(2 * PI * u[1] + 1.5 * t), (0.5 + u[3]) * sin(2 * PI * u[1] + 1.5 * t)}));
        out.add(new Case(askew, Look.linearKernel(4), Truth.SETTLES));
        out.add(new Case(askew, Look.delays(3, 4), Truth.REPORTABLE));
    }

    /**
     * C2.12. A rod that is insulated at one end and cold at the other, five points: second differences, symmetric, rates -0.08, -0.69,
     * -1.72, -2.83, -3.68: stands in the dual space of the state; delays hold all of it.
     */
    private static void heat(List<Case> out) {
        double[][] a = new double[5][5];
        for (int i = 0; i < 5; i++) {
            a[i][i] = i == 0 ? -1 : -2;
            if (i > 0) {
                a[i][i - 1] = 1;
                a[i - 1][i] = 1;
            }
        }
        KnownSystem rod = Paths.linear("heat in a rod with one cold end 5d", 60, 0.05, a);
        out.add(new Case(rod, Look.linearKernel(5), Truth.STANDS));
        out.add(new Case(rod, Look.delays(3, 5), Truth.REPORTABLE));
    }

    /**
     * C2.12, waves of wave numbers 1, 2 and 4 at nine points of a period, speed 0.12: 1, 8, 2, 7, 4, 5 are different modulo 9, so each wave
     * turns in a plane of its own and the planes are orthogonal: stands in the dual space of the state; delays hold all of it.
     */
    private static void advection(List<Case> out) {
        KnownSystem waves = Paths.closed("waves 1, 2 and 4", 75, 0.12, Paths.box(6, 0.3, 1), (u, t) -> {
            double[] row = new double[9];
            for (int i = 0; i < 9; i++) {
                double at = 2 * PI * (i / 9.0 - 0.12 * t);
                row[i] = u[0] * cos(at + 19 * u[3]) + u[1] * cos(2 * at + 19 * u[4]) + u[2] * cos(4 * at + 19 * u[5]);
            }
            return row;
        });
        out.add(new Case(waves, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(waves, Look.delays(2, 6), Truth.REPORTABLE));
    }

    /**
     * A free particle on a ring, {@code iψ' = -0.4ψ''}, real and imaginary part at seven points, wave numbers 1, -2, 3: {@code Σψ e^(-ikx)}
     * turns by 0.4, 1.6, 3.6 rad/s. As functions of the state they are (w, iw)·x, their conjugates (v̄, -iv̄)·x: orthogonal to each other
     * as 1, 5, 3 differ modulo 7, to every conjugate as {@code w·v + i² w·v = 0}: stands in the dual space of the state.
     */
    private static void freeParticle(List<Case> out) {
        int[] numbers = {1, -2, 3};
        out.add(new Case(Paths.closed("free particle on a ring", 80, 0.2, Paths.box(6, 0.4, 1), (u, t) -> {
            double[] row = new double[14];
            for (int i = 0; i < 7; i++) {
                for (int k = 0; k < 3; k++) {
                    double angle = numbers[k] * 2 * PI * i / 7 - 0.4 * numbers[k] * numbers[k] * t + 21 * u[3 + k];
                    row[i] += u[k] * cos(angle);
                    row[7 + i] += u[k] * sin(angle);
                }
            }
            return row;
        }), Look.linearKernel(6), Truth.STANDS));
    }

    /**
     * A beam that bends between two hinges, {@code ω = ck²}, shapes sin(kπx) at five points, which are orthogonal (i = 1, ..., 5 of 6).
     * Moments and speeds, scaled so that each stores half of the energy: a shape and its speed turn in a plane of their own, the planes
     * are orthogonal, decays of 0.02k² keep it so: rates -0.02 ± 0.45i, -0.08 ± 1.8i, -0.18 ± 4.05i: stands in the dual space of the
     * state; delays hold it. Deflections alone, shapes 1 and 2 by 0.55 and 2.2 rad a step: w·x are two-dimensional, each a shape times a
     * cosine of a phase that is not seen; the best multiplier is cos 0.55, cos 2.2 and misses by the sine, 0.52, 0.81: absent; delays
     * hold both pairs.
     */
    private static void beam(List<Case> out) {
        KnownSystem whole = Paths.closed("beam, moments and speeds 10d", 80, 0.18, Paths.box(6, 0.4, 1), (u, t) -> {
            double[] row = new double[10];
            for (int i = 0; i < 5; i++) {
                for (int k = 1; k <= 3; k++) {
                    double shape = u[k - 1] * exp(-0.02 * k * k * t) * sin(k * PI * (i + 1) / 6);
                    row[i] += shape * cos(0.45 * k * k * t + 21 * u[2 + k]);
                    row[5 + i] += shape * sin(0.45 * k * k * t + 21 * u[2 + k]);
                }
            }
            return row;
        });
        out.add(new Case(whole, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(whole, Look.delays(2, 6), Truth.REPORTABLE));
        KnownSystem half = Paths.closed("beam, deflections alone 5d", 70, 1, Paths.box(4, 0.4, 1), (u, t) -> {
            double[] row = new double[5];
            for (int i = 0; i < 5; i++) {
                row[i] = u[0] * cos(0.55 * t + 19 * u[2]) * sin(PI * (i + 1) / 6) + u[1] * cos(2.2 * t + 19 * u[3]) * sin(PI * (i + 1) / 3);
            }
            return row;
        });
        out.add(new Case(half, Look.linearKernel(2), Truth.ABSENT));
        out.add(new Case(half, Look.delays(5, 4), Truth.REPORTABLE));
    }

    /**
     * Coherent state (C2.17) of mean 1.4: frequencies n + 1/2, amplitudes {@code e^-1.4 1.4^n/n!}: 0.25, 0.35, 0.24, 0.11, 0.04, 0.01, then
     * below 0.003: six pairs, held by delays: reportable.
     */
    private static void coherent(List<Case> out) {
        out.add(new Case(Paths.closed("coherent state, mean 1.4", 120, 0.25, Paths.box(1, 0, 12), (u, t) -> {
            double s = t + u[0];
            double size = exp(1.4 * (cos(s) - 1));
            return new double[] {size * cos(-1.4 * sin(s) - s / 2), size * sin(-1.4 * sin(s) - s / 2)};
        }), Look.delays(24, 12), Truth.REPORTABLE));
    }

    /**
     * Periodic, sizes of their own where two numbers are drawn, held by delays over a period: reportable. The beam of a lighthouse, {@code
     * 1/(1 - 0.6 cos θ)}, 0.9 rad/s: a geometric series, mean and harmonics in the ratio 1 : 1/3 : 1/9 : 1/27. A rota of five shifts: mean
     * and two pairs and nothing else. The logistic map at 3.738914912970685, in its window of period 5 and on the cycle, which holds 1/2
     * and so attracts as strongly as can be (r solves f⁵(1/2) = 1/2): five exponentials.
     */
    private static void waveforms(List<Case> out) {
        out.add(new Case(Paths.closed("beam of a lighthouse", 120, 0.2, Paths.box(2, 0, 1), (u, t) -> new double[] {
            (0.6 + 0.8 * u[0]) / (1 - 0.6 * cos(0.9 * t + 2 * PI * u[1]))}), Look.delays(38, 9), Truth.REPORTABLE));
        double[] shifts = {1.3, -0.4, 0.8, 2.1, -1.1};
        out.add(new Case(Paths.closed("rota of five shifts", 60, 1, Paths.box(2, 0, 1), (u, t) -> new double[] {
            (0.6 + 0.8 * u[0]) * shifts[(int) (floor(5 * u[1]) + t + 0.5) % 5]}), Look.delays(8, 5), Truth.REPORTABLE));
        out.add(new Case(new KnownSystem("logistic map, period 5", 1, random -> {
            double x = 0.5;
            for (int k = 500 + random.nextInt(5); k > 0; k--) {
                x = 3.738914912970685 * x * (1 - x);
            }
            double[][] rows = new double[60][];
            for (int k = 0; k < rows.length; k++) {
                rows[k] = new double[] {x};
                x = 3.738914912970685 * x * (1 - x);
            }
            return rows;
        }), Look.delays(8, 5), Truth.REPORTABLE));
    }

    /**
     * A bead on a cycloid swings in one time whatever its size: the length along the wire is harmonic, {@code q = u cos(1.3t + φ)} of the
     * sine of half the angle, {@code x = 2(asin q + q√(1 - q²))}, {@code y = 2q²}: rates ±1.3i and, for u up to 0.85, 4 % of ±3.9i in x, 0
     * and ±2.6i in y, for all sizes: held by delays over a swing: reportable.
     */
    private static void cycloid(List<Case> out) {
        out.add(new Case(Paths.closed("bead on a cycloid 2d", 110, 0.15, Paths.box(2, 0, 1), (u, t) -> {
            double q = (0.3 + 0.55 * u[0]) * cos(1.3 * t + 2 * PI * u[1]);
            return new double[] {2 * (asin(q) + q * sqrt(1 - q * q)), 2 * q * q};
        }), Look.delays(34, 7), Truth.REPORTABLE));
    }

    /**
     * The radius of a cloud in a harmonic trap, {@code x'' = -0.49x + 0.49/x³}: {@code x² = √(1 + b²) + b cos(1.4t + φ)}, one period for
     * all sizes; b from 0.2 to 1.2: mean, ±1.4i and, of that, up to 11 and 3 % of the next harmonics: held by delays: reportable.
     */
    private static void trappedCloud(List<Case> out) {
        out.add(new Case(Paths.closed("radius of a cloud in a trap", 110, 0.14, Paths.box(2, 0, 1), (u, t) -> {
            double b = 0.2 + u[0];
            return new double[] {sqrt(sqrt(1 + b * b) + b * cos(1.4 * t + 2 * PI * u[1]))};
        }), Look.delays(34, 7), Truth.REPORTABLE));
    }

    /** {@code x'' = -x - 0.6x⁵}, let go at 0.3 to 1.8: periods 6.27 to 2.93, a continuous range of frequencies: nothing to report. */
    private static void stiffeningSpring(List<Case> out) {
        out.add(new Case(Paths.flow("spring that stiffens, many sizes", 120, 0.15, 0, 2, random -> new double[] {
            0.3 + 1.5 * random.nextDouble(), 0}, x -> new double[] {x[1], -x[0] - 0.6 * x[0] * x[0] * x[0] * x[0] * x[0]}),
                Look.delays(12, 6), Truth.NONE));
    }

    /**
     * Two equal rates one after the other (C2.18), one eigenvector each: drifts. What two equal leaks leave, {@code (a + bt)e^(-0.35t)}. A
     * damped swing that an equal one drives, {@code e^(-0.15t)} times a tone of 1.7 with parts that are linear in time: a double pair.
     */
    private static void equalRates(List<Case> out) {
        out.add(new Case(Paths.closed("two equal leaks", 70, 0.12, Paths.box(2, -1, 1), (u, t) -> new double[] {
            (1.5 * u[0] + 1.2 * u[1] * t) * exp(-0.35 * t)}), Look.delays(24, 2), Truth.DRIFTS));
        out.add(new Case(Paths.closed("damped swing driven by an equal one", 110, 0.13, Paths.box(4, -1, 1), (u, t) -> new double[] {
            exp(-0.15 * t) * ((u[0] + 0.6 * u[1] * t) * cos(1.7 * t) + (u[2] + 0.6 * u[3] * t) * sin(1.7 * t))}), Look.delays(36, 4),
                Truth.DRIFTS));
    }

    /**
     * Jordan blocks in the state (C2.18): drifts. Two tanks of the rate -0.5, the second feeds the first, the first a third of -1.4: A +
     * 0.5 has the rank 2, so one eigenvector for the double rate. Position, speed, acceleration and jerk that is kept: a nilpotent chain
     * of four.
     */
    private static void jordan(List<Case> out) {
        KnownSystem tanks = Paths.linear("two equal tanks and a quick one 3d", 60, 0.08, new double[][] {{-0.5, 1.2, 0}, {0, -0.5, 0},
            {0.4, 0, -1.4}});
        out.add(new Case(tanks, Look.linearKernel(3), Truth.DRIFTS));
        out.add(new Case(tanks, Look.monomials(1, 4), Truth.DRIFTS));
        out.add(new Case(Paths.linear("position to jerk 4d", 60, 0.05, new double[][] {{0, 1, 0, 0}, {0, 0, 1, 0}, {0, 0, 0, 1},
            {0, 0, 0, 0}}), Look.linearKernel(4), Truth.DRIFTS));
    }

    /**
     * A third that is fed at the rate of its feed, {@code x' = -0.15x, y' = -0.35y, z' = -0.65z + 1.2x²y}: x²y has the rate -0.65 too,
     * {@code z = (z0 + 1.2x0²y0 t)e^(-0.65t)}: a Jordan block on x²y and z, and {@code z^k p(x, y)} meets the same, so no polynomial
     * eigenfunction holds z: drifts on cubic polynomials.
     */
    private static void cubicResonance(List<Case> out) {
        out.add(new Case(Paths.closed("product of third degree at resonance 3d", 50, 0.08, Paths.box(3, -1.2, 1.2), (u, t) -> new double[] {
            u[0] * exp(-0.15 * t), u[1] * exp(-0.35 * t), (0.4 * u[2] + 1.2 * u[0] * u[0] * u[1] * t) * exp(-0.65 * t)}),
                Look.monomials(3, 20), Truth.DRIFTS));
    }

    /**
     * Two chaotic logistic maps side by side (C2.15): products of Chebyshev polynomials are orthogonal in the average over the density and
     * {@code T_m T_n -> T_2m T_2n}: on quadratic polynomials the only eigenvalue but 1 is 0, its residual 1: absent; the Gaussian space has
     * none either: nothing to report. Seven times the angle: {@code e^(2πinx) -> e^(14πinx)}, harmonics to order 3 are carried to such that
     * are orthogonal to all of them: absent.
     */
    private static void expandingMaps(List<Case> out) {
        KnownSystem pair = Paths.map("two chaotic logistic maps 2d", 90, 1, Paths.box(2, 0.01, 0.99), x -> new double[] {
            4 * x[0] * (1 - x[0]), 4 * x[1] * (1 - x[1])});
        out.add(new Case(pair, Look.monomials(2, 6), Truth.ABSENT));
        out.add(new Case(pair, Look.step("gaussian", 12, "scale", 0.4), Truth.NONE));
        out.add(new Case(Paths.map("seven times the angle", 90, 1, Paths.box(1, 0, 1), x -> new double[] {7 * x[0] % 1}), Look.fourier(3),
                Truth.ABSENT));
    }

    /**
     * Chaos: nothing to report. Lorenz (C2.16) at rho = 45, x and y: autocorrelations below 0.15 from 0.4 on. Lü and Chen's flow
     * (International Journal of Bifurcation and Chaos 12:659, 2002) at 36, 20, 3, x and y: below 0.3 from 0.2 on. Hénon's map with two
     * directions that stretch, {@code (1.76 - y² - 0.1z, x, y)} (Baier and Klein, Physics Letters A 151:281, 1990): -0.49 after two
     * steps, 0.21 after four, then below 0.13.
     */
    private static void chaos(List<Case> out) {
        KnownSystem lorenz = Paths.flow("Lorenz, rho = 45", 180, 0.04, 20, 2, Paths.box(3, 1, 10), x -> new double[] {10 * (x[1] - x[0]),
            x[0] * (45 - x[2]) - x[1], x[0] * x[1] - 8.0 / 3 * x[2]});
        out.add(new Case(lorenz, Look.delays(10, 8), Truth.NONE));
        out.add(new Case(lorenz, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(Paths.flow("Lü flow", 160, 0.03, 15, 2, Paths.box(3, 1, 8), x -> new double[] {36 * (x[1] - x[0]),
            -x[0] * x[2] + 20 * x[1], x[0] * x[1] - 3 * x[2]}), Look.delays(6, 8), Truth.NONE));
        KnownSystem stretched = new KnownSystem("Hénon map that stretches twice 3d", 1, random -> {
            double[] x = {0.3 + 0.2 * random.nextDouble(), 0.3 + 0.2 * random.nextDouble(), 0.1};
            double[][] rows = new double[110][];
            for (int k = -80; k < rows.length; k++) {
                x = new double[] {1.76 - x[1] * x[1] - 0.1 * x[2], x[0], x[1]};
                if (k >= 0) {
                    rows[k] = x;
                }
            }
            return rows;
        });
        out.add(new Case(stretched, Look.monomials(2, 10), Truth.NONE));
        out.add(new Case(stretched, Look.delays(4, 4), Truth.NONE));
    }

    /**
     * Paths that miss their mean motion by most of their size, {@code √(1 - e^-2) = 0.93}, over its own time: nothing to report.
     * Ornstein-Uhlenbeck (C2.13), theta = 3, 0.74 a step. A buoy in random waves, {@code z -> 0.85e^(0.6i)z} and a kick.
     */
    private static void returning(List<Case> out) {
        KnownSystem drawn = Paths.chance("Ornstein-Uhlenbeck, theta = 3", 140, 0.1, random -> {
            double[] x = {random.nextGaussian()};
            return () -> x[0] = exp(-0.3) * x[0] + sqrt(1 - exp(-0.6)) * random.nextGaussian();
        });
        out.add(new Case(drawn, Look.monomials(2, 3), Truth.NONE));
        out.add(new Case(drawn, Look.delays(5, 3), Truth.NONE));
        out.add(new Case(new KnownSystem("buoy in random waves 2d", 1, random -> {
            double[] x = {random.nextGaussian(), random.nextGaussian()};
            double[][] rows = new double[140][];
            for (int k = 0; k < rows.length; k++) {
                rows[k] = x;
                x = new double[] {0.85 * (cos(0.6) * x[0] - sin(0.6) * x[1]) + 0.527 * random.nextGaussian(),
                    0.85 * (sin(0.6) * x[0] + cos(0.6) * x[1]) + 0.527 * random.nextGaussian()};
            }
            return rows;
        }), Look.linearKernel(2), Truth.NONE));
    }

    /**
     * Sums of independent steps, which nothing draws back: nothing to report. Three walks by single paces. The distance
     * from the start of a walk in the plane, which is carried off or back by whatever step comes next.
     */
    private static void walks(List<Case> out) {
        out.add(new Case(new KnownSystem("three walks of single paces 3d", 1, random -> {
            double[][] rows = new double[140][3];
            for (int k = 1; k < rows.length; k++) {
                for (int i = 0; i < 3; i++) {
                    rows[k][i] = rows[k - 1][i] + (random.nextBoolean() ? 1 : -1);
                }
            }
            return rows;
        }), Look.monomials(1, 4), Truth.NONE));
        out.add(new Case(Paths.chance("distance of a walk in the plane", 140, 1, random -> {
            double[] x = {3 * random.nextGaussian(), 3 * random.nextGaussian()};
            return () -> {
                x[0] += random.nextGaussian();
                x[1] += random.nextGaussian();
                return sqrt(x[0] * x[0] + x[1] * x[1]);
            };
        }), Look.delays(6, 4), Truth.NONE));
    }

    /**
     * Independent from sample to sample, no memory that a function could carry: absent. Noise in four channels, the last shares the noise
     * of the first. The numbers of a roulette wheel, 0 to 36.
     */
    private static void white(List<Case> out) {
        KnownSystem noise = new KnownSystem("white noise, four channels", 0.1, random -> {
            double[][] rows = new double[130][];
            for (int k = 0; k < rows.length; k++) {
                double first = random.nextGaussian();
                rows[k] = new double[] {first, random.nextGaussian(), 0.5 * random.nextGaussian(), 0.7 * first + random.nextGaussian()};
            }
            return rows;
        });
        out.add(new Case(noise, Look.linearKernel(4), Truth.ABSENT));
        out.add(new Case(noise, Look.monomials(1, 5), Truth.ABSENT));
        out.add(new Case(Paths.chance("numbers of a roulette wheel", 130, 1, random -> () -> random.nextInt(37)), Look.delays(5, 4),
                Truth.ABSENT));
    }

    /**
     * Breaks at times that nothing in the record foretells, neither a cycle nor a rate across them: nothing to report. Two gauges, each
     * with a change of level at a time of its own and some noise. A bird that picks a new pitch, 0.4 to 2.6 rad a step, at random, on
     * average every eighteenth step: a continuous range of frequencies, none kept.
     */
    private static void levels(List<Case> out) {
        out.add(new Case(new KnownSystem("two gauges that change level, each in its time", 0.1, random -> {
            double[] levels = random.doubles(4, -1.5, 1.5).toArray();
            int first = 25 + random.nextInt(80);
            int second = 25 + random.nextInt(80);
            double[][] rows = new double[130][];
            for (int k = 0; k < rows.length; k++) {
                rows[k] = new double[] {levels[k < first ? 0 : 1] + 0.1 * random.nextGaussian(),
                    levels[k < second ? 2 : 3] + 0.1 * random.nextGaussian()};
            }
            return rows;
        }), Look.delays(8, 4), Truth.NONE));
        out.add(new Case(Paths.chance("bird that picks a new pitch", 150, 1, random -> {
            double[] state = {2 * PI * random.nextDouble(), 0.4 + 2.2 * random.nextDouble()};
            return () -> {
                state[1] = random.nextInt(18) == 0 ? 0.4 + 2.2 * random.nextDouble() : state[1];
                state[0] += state[1];
                return cos(state[0]);
            };
        }), Look.delays(8, 6), Truth.NONE));
    }
}
