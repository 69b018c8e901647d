package org.modestead.engine.battery;

import static java.lang.StrictMath.PI;
import static java.lang.StrictMath.abs;
import static java.lang.StrictMath.cos;
import static java.lang.StrictMath.exp;
import static java.lang.StrictMath.floor;
import static java.lang.StrictMath.log;
import static java.lang.StrictMath.pow;
import static java.lang.StrictMath.sin;
import static java.lang.StrictMath.sqrt;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/**
 * The ninth calibration part: it was the reporting part until a rule was changed after it had been seen. Systems that no part before holds, their truth written
 * down from the mathematics before any of them was judged and without a look at the code that judges. Overlaps, harmonics and autocorrelations that are not in
 * closed form were computed by another program. A mode that settles and does not stand overlaps by more than a third, and so does its joint weight differ from the
 * solo one.
 */
final class Ninth {

    private Ninth() {}

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        pipes(out);
        screws(out);
        frame(out);
        slab(out);
        tiltedTurn(out);
        firms(out);
        growth(out);
        torus(out);
        cloud(out);
        rim(out);
        bacteria(out);
        soil(out);
        aeroplane(out);
        organs(out);
        ocean(out);
        income(out);
        pulledUp(out);
        lake(out);
        debt(out);
        manifolds(out);
        bean(out);
        cycles(out);
        wells(out);
        predators(out);
        circle(out);
        lines(out);
        poles(out);
        growingBlocks(out);
        keptProduct(out);
        swelling(out);
        origins(out);
        frost(out);
        rests(out);
        skewTurn(out);
        chaos(out);
        prices(out);
        heads(out);
        reset(out);
        white(out);
        return out;
    }

    /**
     * Six points of a water network, pressures even out along eight pipes and leak: a symmetric matrix, rates -0.22, -0.72, -0.91, -1.26,
     * -2.31, -2.72: stands in the dual space of the state; affine functions hold all of it.
     */
    private static void pipes(List<Case> out) {
        double[][] pipes = {{0, 1, 0.5}, {1, 2, 0.9}, {0, 3, 0.3}, {2, 3, 0.2}, {3, 4, 0.7}, {4, 5, 0.4}, {1, 5, 0.25}, {0, 4, 0.15}};
        double[] leaks = {0.15, 0.3, 0.15, 0.2, 0.4, 0.15};
        double[][] a = new double[6][6];
        for (int i = 0; i < 6; i++) {
            a[i][i] = -leaks[i];
        }
        for (double[] pipe : pipes) {
            int from = (int) pipe[0];
            int to = (int) pipe[1];
            a[from][to] += pipe[2];
            a[to][from] += pipe[2];
            a[from][from] -= pipe[2];
            a[to][to] -= pipe[2];
        }
        KnownSystem network = Paths.linear("pressure in a network of pipes 6d", 60, 0.06, a);
        out.add(new Case(network, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(network, Look.monomials(1, 7), Truth.REPORTABLE));
    }

    /**
     * A quaternion that is multiplied from both sides, {@code q' = uq + qv - 0.1q} with imaginary u = (0.9, 0.6, -1.2), v = (0.4, -0.3,
     * 0.2): both products are skew, so the matrix is normal without a block; rates {@code -0.1 ± i(|u| ± |v|)}, |u| = 1.62, |v| = 0.54:
     * stands in the dual space of the state and, as a turn and a shrinking, in the space of (1 + x·y)².
     */
    private static void screws(List<Case> out) {
        KnownSystem screw = Paths.linear("quaternion turned from both sides 4d", 70, 0.09, new double[][] {{-0.1, -1.3, -0.3, 1},
            {1.3, -0.1, 1.4, 0.9}, {0.3, -1.4, -0.1, -0.5}, {-1, -0.9, 0.5, -0.1}});
        out.add(new Case(screw, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(screw, Look.step("polynomial", 15, "degree", 2, "offset", 1), Truth.STANDS));
    }

    /**
     * Strains s and velocities v of a frame of three bars, {@code s' = Bv - 0.08s, v' = -Bᵀs - 0.08v}: skew and a multiple of one, normal;
     * rates -0.08 ± iσ with the singular values σ of B, 1.11, 1.67, 2.42: stands in the dual space of the state.
     */
    private static void frame(List<Case> out) {
        double[][] b = {{1.1, -0.6, 0}, {0.2, 1.5, -0.7}, {0.3, 0.4, 2.3}};
        double[][] a = new double[6][6];
        for (int i = 0; i < 3; i++) {
            a[i][i] = -0.08;
            a[3 + i][3 + i] = -0.08;
            for (int j = 0; j < 3; j++) {
                a[i][3 + j] = b[i][j];
                a[3 + j][i] = -b[i][j];
            }
        }
        KnownSystem bars = Paths.linear("frame of three bars, strains and velocities 6d", 70, 0.08, a);
        out.add(new Case(bars, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(bars, Look.delays(2, 6), Truth.REPORTABLE));
    }

    /**
     * Neutrons that diffuse through a slab of five cells, are lost at both faces and multiply by 0.5: second differences and a multiple of
     * one, symmetric; rates 0.29, -0.30, -1.10, -1.90, -2.49: stands in the dual space of the state.
     */
    private static void slab(List<Case> out) {
        double[][] a = new double[5][5];
        for (int i = 0; i < 5; i++) {
            for (int j = 0; j < 5; j++) {
                a[i][j] = i == j ? 0.5 - 1.6 : abs(i - j) == 1 ? 0.8 : 0;
            }
        }
        KnownSystem slab = Paths.linear("neutrons in a slab 5d", 50, 0.06, a);
        out.add(new Case(slab, Look.linearKernel(5), Truth.STANDS));
        out.add(new Case(slab, Look.delays(3, 5), Truth.REPORTABLE));
    }

    /**
     * A turn by 0.6 about the axis (1, 2, 2)/3, across it all shrinks by 0.97, along it by 0.9: axis and plane are orthogonal, so the map
     * is normal in the spaces of x·y and of (1 + x·y)²: multipliers 0.97e^(±0.6i) and 0.9: stands.
     */
    private static void tiltedTurn(List<Case> out) {
        double[] u = {1.0 / 3, 2.0 / 3, 2.0 / 3};
        KnownSystem turn = Paths.map("turn about a tilted axis, by steps 3d", 26, 1, Paths.box(3, -1, 1), x -> {
            double along = u[0] * x[0] + u[1] * x[1] + u[2] * x[2];
            double[] y = new double[3];
            for (int i = 0; i < 3; i++) {
                int j = (i + 1) % 3;
                int k = (i + 2) % 3;
                y[i] = 0.97 * (cos(0.6) * (x[i] - along * u[i]) + sin(0.6) * (u[j] * x[k] - u[k] * x[j])) + 0.9 * along * u[i];
            }
            return y;
        });
        out.add(new Case(turn, Look.linearKernel(3), Truth.STANDS));
        out.add(new Case(turn, Look.step("polynomial", 10, "degree", 2, "offset", 1), Truth.STANDS));
        out.add(new Case(turn, Look.monomials(1, 4), Truth.REPORTABLE));
    }

    /**
     * Two firms that grow and help each other alike: symmetric, so self-adjoint in the spaces of exp(x·y) and (1 + x·y)² (C3.3): rates
     * 0.82, 0.18; of degree 2 1.64, 1.00, 0.36: stands. The Gaussian space holds no w·x (C3.12).
     */
    private static void firms(List<Case> out) {
        KnownSystem firms = Paths.near("two firms that help each other 2d", 50, 0.03, 0.5, new double[][] {{0.7, 0.25}, {0.25, 0.3}});
        out.add(new Case(firms, Look.exponential(6), Truth.STANDS));
        out.add(new Case(firms, Look.polynomial(2, 6), Truth.STANDS));
        out.add(new Case(firms, Look.gaussian(1, 8), Truth.NONE));
    }

    /** {@code x' = 1.4x}: eigenfunctions x^n, orthogonal in the spaces of exp(xy) (C3.1, C3.4) and (1 + xy)³; only x carries x: stands. */
    private static void growth(List<Case> out) {
        KnownSystem growth = Paths.closed("x'=1.4x", 41, 0.02, Paths.box(1, -0.7, 0.7), (x, t) -> new double[] {x[0] * exp(1.4 * t)});
        out.add(new Case(growth, Look.exponential(6), Truth.STANDS));
        out.add(new Case(growth, Look.polynomial(3, 4), Truth.STANDS));
    }

    /**
     * Two angles that turn by 0.8 and 0.5√5 a step, seen by cosine and sine of both and, 0.7 as large, of their sum: {@code x·y = cos Δa +
     * cos Δb + 0.49 cos(Δa + Δb)} is a function of the differences of the angles, so e^(ia), e^(ib), e^(i(a+b)) and their conjugates are
     * orthogonal and all of the dual space of the state: stands. Delays hold the three pairs.
     */
    private static void torus(List<Case> out) {
        KnownSystem torus = Paths.closed("two angles and their sum 6d", 60, 1, Paths.box(2, 0, 2 * PI), (u, t) -> {
            double a = u[0] + 0.8 * t;
            double b = u[1] + 0.5 * sqrt(5) * t;
            return new double[] {cos(a), sin(a), cos(b), sin(b), 0.7 * cos(a + b), 0.7 * sin(a + b)};
        });
        out.add(new Case(torus, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(torus, Look.delays(2, 6), Truth.REPORTABLE));
    }

    /**
     * A cloud that is carried round a ring at the speed 0.9 and spreads, seen at seven points, wave numbers 1, 2, 3: each decays by 0.05k²
     * and turns by 0.9k in its own plane of the state, the planes are orthogonal: stands in the dual space of the state.
     */
    private static void cloud(List<Case> out) {
        out.add(new Case(Paths.closed("cloud that drifts and spreads round a ring", 60, 0.1, Paths.box(6, 0.4, 1), (u, t) -> {
            double[] row = new double[7];
            for (int i = 0; i < 7; i++) {
                for (int k = 1; k <= 3; k++) {
                    row[i] += u[k - 1] * exp(-0.05 * k * k * t) * cos(k * (2 * PI * i / 7 - 0.9 * t) + 21 * u[2 + k]);
                }
            }
            return row;
        }), Look.linearKernel(6), Truth.STANDS));
    }

    /**
     * A point on the rim of a tilted wheel of radius 1, 1.1 rad/s, seen in three coordinates: the plane of (2, -2, 1)/3 and (1, 2, 2)/3.
     * On the rim {@code x·y = cos Δ}, so the kernels x·y, exp(x·y) and, as |x - y|² = 2 - 2 cos Δ, the Gaussian one are functions of the
     * difference of the angles: e^(inθ) are orthogonal, n = ±1 are the signal: stands. (On the rim the Gaussian space does hold x: it is
     * the trace of {@code e^((1 - |x|²)/2) x}, which turns like x.)
     */
    private static void rim(List<Case> out) {
        KnownSystem rim = Paths.closed("rim of a tilted wheel 3d", 60, 0.1, Paths.box(1, 0, 2 * PI), (u, t) -> {
            double x = cos(u[0] + 1.1 * t) / 3;
            double y = sin(u[0] + 1.1 * t) / 3;
            return new double[] {2 * x + y, -2 * x + 2 * y, x + 2 * y};
        });
        out.add(new Case(rim, Look.linearKernel(2), Truth.STANDS));
        out.add(new Case(rim, Look.exponential(5), Truth.STANDS));
        out.add(new Case(rim, Look.step("gaussian", 5, "scale", 1), Truth.STANDS));
    }

    /**
     * Bacteria, awake and dormant, each turns into the other: rates 0.38 and -0.88, overlap and distance of the weights 0.54, the same in
     * the spaces of exp(x·y) and (1 + x·y)² (degree 1 has the angles of the state): settles. Those of degree 2 are 0.75, -0.50, -1.75. The
     * Gaussian space holds none (C3.12).
     */
    private static void bacteria(List<Case> out) {
        KnownSystem bacteria = Paths.near("bacteria awake and dormant 2d", 50, 0.05, 0.6, new double[][] {{0.3, 0.9}, {0.1, -0.8}});
        out.add(new Case(bacteria, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(bacteria, Look.polynomial(2, 6), Truth.SETTLES));
        out.add(new Case(bacteria, Look.delays(3, 2), Truth.REPORTABLE));
        out.add(new Case(bacteria, Look.gaussian(1, 8), Truth.NONE));
    }

    /**
     * Nitrogen that goes from plant to litter to soil and back: rates -0.15 and -1.08 ± 0.38i; the pair's functions overlap by 0.71, its
     * weights are 0.76 apart, those of the slow one 0.41: settles in the dual space of the state; affine functions hold all of it.
     */
    private static void soil(List<Case> out) {
        KnownSystem soil = Paths.linear("nitrogen in plant, litter and soil 3d", 60, 0.07, new double[][] {{-0.6, 0, 0.3}, {0.5, -1.2, 0},
            {0, 1.1, -0.5}});
        out.add(new Case(soil, Look.linearKernel(3), Truth.SETTLES));
        out.add(new Case(soil, Look.monomials(1, 4), Truth.REPORTABLE));
    }

    /**
     * An aeroplane that rolls and yaws: sideslip, rates of roll and yaw, bank; -0.13 ± 1.37i, -0.15, -1.94, every overlap above 0.46,
     * weights 0.77 and more apart: settles in the dual space of the state; delays hold all of it.
     */
    private static void aeroplane(List<Case> out) {
        KnownSystem aeroplane = Paths.linear("aeroplane that rolls and yaws 4d", 80, 0.1, new double[][] {{-0.25, 0, -1, 0.35},
            {-4, -1.6, 0.3, 0}, {1.4, -0.05, -0.5, 0}, {0, 1, 0, 0}});
        out.add(new Case(aeroplane, Look.linearKernel(4), Truth.SETTLES));
        out.add(new Case(aeroplane, Look.delays(3, 4), Truth.REPORTABLE));
    }

    /**
     * A drug that goes round through blood and four organs, most of it one way: rates -0.18, -0.43, -1.14, -1.65, -1.99, overlaps of 0.41
     * and more, weights 0.55 and more apart: settles in the dual space of the state.
     */
    private static void organs(List<Case> out) {
        KnownSystem organs = Paths.linear("drug in blood and four organs 5d", 60, 0.07, new double[][] {{-1.5, 0, 0.2, 0, 0.1},
            {0.9, -0.35, 0, 0, 0}, {0.7, 0, -0.8, 0, 0.3}, {0.4, 0.5, 0, -2, 0}, {0, 0, 0.6, 0.5, -0.75}});
        out.add(new Case(organs, Look.linearKernel(5), Truth.SETTLES));
    }

    /**
     * Six boxes of an ocean, each feeds the next, two send some back: rates -0.24, -0.93 ± 0.35i, -1.12, -2.19 ± 0.28i, overlaps of 0.53
     * and more, weights 0.70 and more apart: settles in the dual space of the state; affine functions hold all of it.
     */
    private static void ocean(List<Case> out) {
        KnownSystem ocean = Paths.linear("six boxes of an ocean 6d", 60, 0.06, new double[][] {{-0.9, 0, 0.2, 0, 0, 0},
            {0.8, -0.5, 0, 0, 0, 0}, {0, 0.5, -0.7, 0, 0, 0}, {0, 0, 0.5, -1.3, 0, 0.1}, {0, 0, 0, 1.1, -1.8, 0},
            {0, 0, 0, 0, 1.4, -2.4}});
        out.add(new Case(ocean, Look.linearKernel(6), Truth.SETTLES));
        out.add(new Case(ocean, Look.monomials(1, 7), Truth.REPORTABLE));
    }

    /**
     * National income and the income of the year before, {@code (x, y) -> (1.3x - 0.75y, x)} (Samuelson, Review of Economics and Statistics
     * 21:75, 1939): multipliers 0.65 ± 0.57i, overlap and distance of the weights 0.76, in the dual space of the state and in that of
     * (1 + x·y)²: settles.
     */
    private static void income(List<Case> out) {
        KnownSystem income = Paths.map("national income and its lag", 24, 1, Paths.box(2, -1, 1), x -> new double[] {
            1.3 * x[0] - 0.75 * x[1], x[0]});
        out.add(new Case(income, Look.linearKernel(2), Truth.SETTLES));
        out.add(new Case(income, Look.step("polynomial", 6, "degree", 2, "offset", 1), Truth.SETTLES));
        out.add(new Case(income, Look.delays(3, 2), Truth.REPORTABLE));
    }

    /**
     * {@code x' = -1.5x + 1.8} about {@code c = 1.2}: eigenfunctions (x - c)^n (C3.4), 1 and x - c carry x. The overlap with the constant
     * is {@code c/√(1 + c²) = 0.77}, the solo weight of x - c 1/(1 + c²) = 0.41 against 1 in the space of exp(xy); 0.90 and 0.19 in that
     * of (1 + xy)³, where ‖x‖² = 1/3: settles. Cubic polynomials hold both: reportable.
     */
    private static void pulledUp(List<Case> out) {
        KnownSystem pulled = Paths.closed("x'=-1.5x+1.8", 41, 0.02, Paths.box(1, 0.1, 2.3), (x, t) -> new double[] {
            1.2 + (x[0] - 1.2) * exp(-1.5 * t)});
        out.add(new Case(pulled, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(pulled, Look.polynomial(3, 4), Truth.SETTLES));
        out.add(new Case(pulled, Look.monomials(3, 4), Truth.REPORTABLE));
    }

    /**
     * Two basins of a lake that mix and are fed, {@code x' = A(x - c)}, A symmetric, rates -0.41 and -1.09, c = (0.7, 0.5): a unit w has
     * {@code |w·c|} = 0.79 and 0.33; w·(x - c) overlaps the constant by {@code |w·c|/√(1 + (w·c)²) = 0.62} for the slow one in the space
     * of exp(x·y), its solo weight is 0.61 against 1; in that of (1 + x·y)², where ‖w·x‖² = 1/2, 0.75 and 0.44: settles.
     */
    private static void lake(List<Case> out) {
        KnownSystem lake = Paths.seen("two basins of a lake, fed 2d", Paths.near("", 50, 0.05, 0.5, new double[][] {{-0.9, 0.3}, {0.3, -0.6}}),
                x -> new double[] {0.7 + x[0], 0.5 + x[1]});
        out.add(new Case(lake, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(lake, Look.polynomial(2, 6), Truth.SETTLES));
    }

    /**
     * A debt at a tenth of interest that is paid off by 0.1 a year, {@code x -> 1.1x - 0.1}: eigenfunctions (x - 1)^n; in the space of
     * (1 + xy)³ x - 1 overlaps the constant by {@code 1/√(1/3 + 1) = 0.87}, solo weight 0.25 against 1: settles. Cubic polynomials hold
     * it: reportable.
     */
    private static void debt(List<Case> out) {
        KnownSystem debt = Paths.map("x->1.1x-0.1", 14, 1, Paths.box(1, 0.2, 1.8), x -> new double[] {1.1 * x[0] - 0.1});
        out.add(new Case(debt, Look.step("polynomial", 4, "degree", 3, "offset", 1), Truth.SETTLES));
        out.add(new Case(debt, Look.monomials(3, 4), Truth.REPORTABLE));
    }

    /**
     * Polynomial manifolds. Over a growing coordinate, {@code x' = 0.4x, y' = -1.5(y - x²)}: eigenfunctions x, x², {@code y - bx²}, {@code b
     * = 1.5/2.3 = 0.65}; overlap of the last two {@code 2b/(√2 √(1 + 2b²)) = 0.68} in the space of exp(x·y), solo weight {@code 1/(1 + 2b²)
     * = 0.54} against 1: settles. Two squares that feed a third, {@code x' = -0.3x, y' = -0.55y, z' = -2.2z + 1.3x² - 1.5y²}: {@code z -
     * b₁x² - b₂y²}, b₁ = 1.3/1.6, b₂ = -1.5/1.1; in the space of (1 + x·y)² ‖z‖² = 1/2, ‖x²‖ = ‖y²‖ = 1: overlaps 0.47 and 0.78, solo
     * weight 0.17 against 1; 1, x, y, z, x², xy, y² are carried into themselves: settles. By steps onto a cubic, {@code (x, y) -> (0.95x,
     * 0.5y + 0.7x³)}: x, x³ and {@code y - 0.7x³/(0.95³ - 0.5)} are of degree 3 and carry the signal. Monomials hold them: reportable.
     */
    private static void manifolds(List<Case> out) {
        double b = 1.5 / 2.3;
        KnownSystem growing = Paths.closed("slow manifold over a growing coordinate", 50, 0.04, Paths.box(2, -0.5, 0.5), (x, t) -> {
            double u = x[0] * exp(0.4 * t);
            return new double[] {u, (x[1] - b * x[0] * x[0]) * exp(-1.5 * t) + b * u * u};
        });
        out.add(new Case(growing, Look.exponential(10), Truth.SETTLES));
        out.add(new Case(growing, Look.monomials(2, 6), Truth.REPORTABLE));
        KnownSystem squares = Paths.closed("two squares that feed a third 3d", 50, 0.04, Paths.box(3, -0.8, 0.8), (u, t) -> {
            double x = u[0] * exp(-0.3 * t);
            double y = u[1] * exp(-0.55 * t);
            double lag = u[2] - 1.3 / 1.6 * u[0] * u[0] + 1.5 / 1.1 * u[1] * u[1];
            return new double[] {x, y, lag * exp(-2.2 * t) + 1.3 / 1.6 * x * x - 1.5 / 1.1 * y * y};
        });
        out.add(new Case(squares, Look.polynomial(2, 10), Truth.SETTLES));
        out.add(new Case(squares, Look.monomials(2, 10), Truth.REPORTABLE));
        out.add(new Case(Paths.map("onto a cubic, by steps 2d", 22, 1, Paths.box(2, -1, 1), x -> new double[] {0.95 * x[0],
            0.5 * x[1] + 0.7 * x[0] * x[0] * x[0]}), Look.monomials(3, 10), Truth.REPORTABLE));
    }

    /**
     * Bean-shaped orbits, a rotation of 1.5 bent by {@code y = v + 0.8x²}: {@code z = x + i(y - 0.8x²)} turns at one speed whatever its
     * size; {@code x = Re z, y = Im z + 0.2(z² + 2|z|² + z̄²)}: rates ±1.5i, ±3i, 0, held by delays: reportable.
     */
    private static void bean(List<Case> out) {
        out.add(new Case(Paths.closed("bean-shaped orbits 2d", 80, 0.1, Paths.box(2, -0.9, 0.9), (u, t) -> {
            double x = u[0] * cos(1.5 * t) - u[1] * sin(1.5 * t);
            double v = u[0] * sin(1.5 * t) + u[1] * cos(1.5 * t);
            return new double[] {x, v + 0.8 * x * x};
        }), Look.delays(20, 5), Truth.REPORTABLE));
    }

    /**
     * Limit cycles, reached before the record begins, held by delays that reach over a period: reportable. A string that is bowed, {@code
     * x'' = 0.9x' - 0.5x'³ - 2x}: ±1.38i, third harmonic 3 %. A nerve that fires, {@code v' = v - v³/3 - w + 0.7, w' = 0.7(v + 0.6 -
     * 0.6w)} (FitzHugh, Biophysical Journal 1:445, 1961): mean, ±0.67i, harmonics 14, 8, 3 %. Roessler's flow before its doublings
     * (Physics Letters A 57:397, 1976), c = 2.5: mean, ±1.09i, harmonics 10, 3 %. Mites and their hunters (May, Stability and Complexity,
     * 1973), {@code x' = 5x(1 - x) - 5xy/(x + 0.1), y' = y(1 - y/x)}: mean, ±1.51i, harmonics 7, 3 %.
     */
    private static void cycles(List<Case> out) {
        out.add(new Case(Paths.flow("string that is bowed, on its cycle", 110, 0.16, 80, 1, Paths.box(2, -1, 1), x -> new double[] {
            x[1], 0.9 * x[1] - 0.5 * x[1] * x[1] * x[1] - 2 * x[0]}), Look.delays(32, 4), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("nerve that fires, on its cycle", 110, 0.3, 80, 1, Paths.box(2, -1, 1), x -> new double[] {
            x[0] - x[0] * x[0] * x[0] / 3 - x[1] + 0.7, 0.7 * (x[0] + 0.6 - 0.6 * x[1])}), Look.delays(36, 9), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("Roessler flow before its doublings", 110, 0.22, 300, 1, Paths.box(3, 0.2, 1), x -> new double[] {
            -x[1] - x[2], x[0] + 0.2 * x[1], 0.2 + x[2] * (x[0] - 2.5)}), Look.delays(30, 7), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("mites and their hunters, on their cycle", 110, 0.16, 120, 1, Paths.box(2, 0.2, 0.5), x -> new double[] {
            5 * x[0] * (1 - x[0]) - 5 * x[0] * x[1] / (x[0] + 0.1), x[1] * (1 - x[1] / x[0])}), Look.delays(30, 5), Truth.REPORTABLE));
    }

    /**
     * To and fro in wells. Many sizes have a continuous range of frequencies, no isolated one: nothing to report; one closed orbit, begun
     * anywhere on it, is periodic and held by delays over a period: reportable. Open on one side, {@code x'' = -x + x²}, let go at 0.3 to
     * 0.96: periods 6.5 to 11.4; from 0.9 mean, ±0.65i, harmonics 25, 5 %. A sextic one, {@code x'' = -x⁵}, from 0.8 to 1.5: periods 13.1
     * to 3.7; from 1 ±0.75i, third harmonic 7 %. A spring of square law, {@code x'' = -x|x|}, from 0.4 to 4: periods 10.9 to 3.4.
     */
    private static void wells(List<Case> out) {
        Paths.Field open = x -> new double[] {x[1], -x[0] + x[0] * x[0]};
        KnownSystem sizes = Paths.flow("well open on one side, many sizes", 120, 0.2, 0, 2, random -> new double[] {
            0.3 + 0.66 * random.nextDouble(), 0}, open);
        out.add(new Case(sizes, Look.delays(12, 6), Truth.NONE));
        out.add(new Case(sizes, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(Paths.orbit("well open on one side, one orbit", 110, 0.25, 9.6, 1, new double[] {0.9, 0}, open), Look.delays(40, 7), Truth.REPORTABLE));
        Paths.Field sextic = x -> new double[] {x[1], -pow(x[0], 5)};
        out.add(new Case(Paths.flow("sextic well, many sizes", 120, 0.15, 0, 2, random -> new double[] {0.8 + 0.7 * random.nextDouble(), 0},
                sextic), Look.delays(12, 6), Truth.NONE));
        out.add(new Case(Paths.orbit("sextic well, one orbit", 110, 0.25, 8.4, 1, new double[] {1, 0}, sextic), Look.delays(36, 4), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("spring of square law, many sizes", 120, 0.15, 0, 2, random -> new double[] {
            0.4 + 3.6 * random.nextDouble(), 0}, x -> new double[] {x[1], -x[0] * abs(x[0])}), Look.delays(12, 6), Truth.NONE));
    }

    /**
     * Predators that live thrice as quick as their prey, {@code x' = x(1 - y), y' = 3y(x - 1)}, from (1, 1.3) to (1, 5.5): periods 3.6 to
     * 4.8, no isolated frequency (C2.8): nothing to report. One orbit, from (1, 2): mean, ±1.67i, harmonics 20, 4 %: reportable.
     */
    private static void predators(List<Case> out) {
        Paths.Field field = x -> new double[] {x[0] * (1 - x[1]), 3 * x[1] * (x[0] - 1)};
        KnownSystem many = Paths.flow("quick predators, ensemble", 150, 0.12, 0, 2, random -> new double[] {1,
            1.3 + 4.2 * random.nextDouble()}, field);
        out.add(new Case(many, Look.delays(12, 7), Truth.NONE));
        out.add(new Case(many, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(Paths.orbit("quick predators, orbit", 100, 0.12, 3.7, 2, new double[] {1, 2}, field), Look.delays(32, 7),
                Truth.REPORTABLE));
    }

    /** C2.14 with another irrational number: e^(2πinx) are eigenfunctions; harmonics to order 3 hold 0.83 of the saw-tooth's variance. */
    private static void circle(List<Case> out) {
        out.add(new Case(Paths.map("circle rotation by 1/π", 70, 1, Paths.box(1, 0, 1), x -> new double[] {(x[0] + 1 / PI) % 1}),
                Look.fourier(3), Truth.REPORTABLE));
    }

    /**
     * Lines, held by delays: reportable. Two beacons that turn by 0.8 and 2.1 rad/s, the gauge sees the product of {@code 1 + cos} of
     * each: mean, 0.8, 2.1, 1.3, 2.9. A code of nine signs again and again, sizes of their own: every harmonic of 1/9 above a fifth of
     * the size, nothing else. The fifth power of a cosine: 0.5, 1.5, 2.5 rad/s in the ratio 10 : 5 : 1. Flutter that builds up, 0.06 ±
     * 1.7i, while a tank drains, -0.5.
     */
    private static void lines(List<Case> out) {
        out.add(new Case(Paths.closed("two beacons in one gauge", 150, 0.3, Paths.box(3, 0, 1), (u, t) -> new double[] {
            (0.6 + 0.8 * u[2]) * (1 + cos(0.8 * t + 2 * PI * u[0])) * (1 + cos(2.1 * t + 2 * PI * u[1]))}), Look.delays(44, 9),
                Truth.REPORTABLE));
        double[] signs = {1, -1, 1, 1, -1, -1, -1, 1, 1};
        out.add(new Case(Paths.closed("code of nine signs", 72, 1, Paths.box(2, 0, 1), (u, t) -> new double[] {
            (0.6 + 0.8 * u[0]) * signs[(int) (floor(9 * u[1]) + t + 0.5) % 9]}), Look.delays(13, 9), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("fifth power of a cosine", 110, 0.3, Paths.box(2, 0, 1), (u, t) -> new double[] {
            (0.6 + 0.8 * u[0]) * pow(cos(0.5 * t + 2 * PI * u[1]), 5)}), Look.delays(40, 6), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("flutter that builds up while a tank drains", 90, 0.1, Paths.box(3, 0.5, 1.5), (u, t) -> new double[] {
            u[0] * exp(0.06 * t) * cos(1.7 * t + 7 * u[2]) + 2.5 * u[1] * exp(-0.5 * t)}), Look.delays(34, 3), Truth.REPORTABLE));
    }

    /**
     * A servo whose three poles were all put at -0.7, position, speed and acceleration: a companion matrix has one eigenvector for each
     * rate, so one Jordan block of three (C2.18): drifts.
     */
    private static void poles(List<Case> out) {
        KnownSystem servo = Paths.linear("servo with three equal poles 3d", 60, 0.08, new double[][] {{0, 1, 0}, {0, 0, 1},
            {-0.343, -1.47, -2.1}});
        out.add(new Case(servo, Look.linearKernel(3), Truth.DRIFTS));
        out.add(new Case(servo, Look.monomials(1, 4), Truth.DRIFTS));
        out.add(new Case(servo, Look.delays(4, 3), Truth.DRIFTS));
    }

    /**
     * Jordan blocks that grow, which no eigenfunction reaches: drifts. An infection that feeds another of its own rate, the second seen,
     * {@code (a + bt)e^(0.2t)}. The square of a growing coordinate, {@code x' = 0.3x, y' = 0.6y + 0.9x²}: {@code y = (y0 + 0.9x0²t)
     * e^(0.6t)}, x² and y are a block of the rate 0.6.
     */
    private static void growingBlocks(List<Case> out) {
        out.add(new Case(Paths.closed("infection fed at its own rate", 60, 0.12, Paths.box(2, -1, 1), (u, t) -> new double[] {
            (2 * u[0] + 0.8 * u[1] * t) * exp(0.2 * t)}), Look.delays(24, 2), Truth.DRIFTS));
        KnownSystem square = Paths.closed("square of a growing coordinate at resonance 2d", 50, 0.03, Paths.box(2, -0.7, 0.7), (u, t) ->
                new double[] {u[0] * exp(0.3 * t), (0.4 * u[1] + 0.9 * u[0] * u[0] * t) * exp(0.6 * t)});
        out.add(new Case(square, Look.exponential(10), Truth.DRIFTS));
        out.add(new Case(square, Look.monomials(2, 6), Truth.DRIFTS));
    }

    /**
     * A product that is kept drives a drift, {@code x' = 0.4x, y' = -0.4y, z' = 1.5xy}: xy stays, {@code z = z0 + 1.5x0y0t}. On xy and z
     * the generator is a Jordan block of the rate 0; entire eigenfunctions are entire in x and y alone, as those with z have {@code
     * e^(z/xy)}: z is not reached: drifts, in the space of exp(x·y) as on monomials.
     */
    private static void keptProduct(List<Case> out) {
        KnownSystem kept = Paths.closed("product that is kept drives a drift 3d", 50, 0.05, Paths.box(3, -0.6, 0.6), (u, t) -> new double[] {
            u[0] * exp(0.4 * t), u[1] * exp(-0.4 * t), u[2] + 1.5 * u[0] * u[1] * t});
        out.add(new Case(kept, Look.exponential(14), Truth.DRIFTS));
        out.add(new Case(kept, Look.monomials(2, 10), Truth.DRIFTS));
    }

    /** A tone whose both parts are polynomials of degree 2 in time: a triple pair ±1.2i with one eigenvector each (C2.18): drifts. */
    private static void swelling(List<Case> out) {
        out.add(new Case(Paths.closed("tone that swells with the square of time", 100, 0.2, Paths.box(6, -1, 1), (u, t) -> new double[] {
            (u[0] + 0.25 * u[1] * t + 0.02 * u[2] * t * t) * cos(1.2 * t) + (u[3] + 0.25 * u[4] * t + 0.02 * u[5] * t * t) * sin(1.2 * t)}),
                Look.delays(36, 6), Truth.DRIFTS));
    }

    /**
     * Within a limit cycle all paths come from a source and stay bounded: an entire eigenfunction of a positive real part would grow
     * without bound, of a negative one be infinite at the source, of none be a constant, as the source has no imaginary rate of its own:
     * none, nothing to report. A swing of degree five, {@code r' = 0.5r(1 - r⁴)}, 1.6 rad/s: rates 0.5 ± 1.6i. The Brusselator (Prigogine
     * and Lefever, Journal of Chemical Physics 48:1695, 1968), A = 1.2, B = 2.9, as seen from its rest (A, B/A): rates 0.23 ± 1.18i.
     */
    private static void origins(List<Case> out) {
        out.add(new Case(Paths.closed("swing of degree five, off its cycle", 60, 0.08, Paths.box(2, 0, 1), (u, t) -> {
            double r = 0.15 + 0.75 * u[0];
            double grown = pow(1 + (pow(r, -4) - 1) * exp(-2 * t), -0.25);
            return new double[] {grown * cos(1.6 * t + 2 * PI * u[1]), grown * sin(1.6 * t + 2 * PI * u[1])};
        }), Look.exponential(10), Truth.NONE));
        out.add(new Case(Paths.flow("Brusselator off its cycle", 70, 0.12, 0, 2, Paths.box(2, -0.3, 0.3), x -> {
            double a = 1.2 + x[0];
            double b = 2.9 / 1.2 + x[1];
            return new double[] {1.2 + a * a * b - 3.9 * a, 2.9 * a - a * a * b};
        }), Look.exponential(10), Truth.NONE));
    }

    /**
     * Frost that thickens ever slower, {@code x' = e^(-x), e^x = e^x0 + t}: formal eigenfunctions exp(λe^x), of infinite order, while the
     * space of exp(xy) holds orders up to 2 (C3.2): none; between the ends of a record they look as if over-complete: nothing to report.
     */
    private static void frost(List<Case> out) {
        out.add(new Case(Paths.closed("frost that thickens ever slower", 50, 0.03, Paths.box(1, -0.6, 1.2), (x, t) -> new double[] {
            log(exp(x[0]) + t)}), Look.exponential(8), Truth.NONE));
    }

    /**
     * Polynomials of degree 2 and 3 on the line: only the constant is an eigenfunction in the space of exp(xy) (C3.4), absent; formal ones
     * have poles or essential singularities at zeros inside the sampled interval, so none is a polynomial. {@code 1.2x²(1 - x)}; {@code
     * 0.6(1 - x³)}; a fishery with a fixed catch, {@code 1.4x(1 - x) - 0.15}, rests at 0.12 and 0.88; hawks and doves, {@code 2x(1 - x)
     * (0.45 - x)}.
     */
    private static void rests(List<Case> out) {
        KnownSystem twofold = line("x'=1.2x^2(1-x)", 0.07, -0.4, 1.3, x -> 1.2 * x * x * (1 - x));
        out.add(new Case(twofold, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(twofold, Look.monomials(5, 6), Truth.NONE));
        out.add(new Case(line("x'=0.6(1-x^3)", 0.04, -0.9, 1.5, x -> 0.6 * (1 - x * x * x)), Look.exponential(8), Truth.ABSENT));
        KnownSystem fishery = line("fishery with a fixed catch", 0.05, 0.1, 1.3, x -> 1.4 * x * (1 - x) - 0.15);
        out.add(new Case(fishery, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(fishery, Look.monomials(5, 6), Truth.NONE));
        out.add(new Case(line("hawks and doves", 0.08, 0.03, 0.99, x -> 2 * x * (1 - x) * (0.45 - x)), Look.exponential(8), Truth.ABSENT));
    }

    /** {@code x'} at {@code x}. */
    private interface Speed {
        double at(double x);
    }

    private static KnownSystem line(String name, double step, double low, double high, Speed speed) {
        return Paths.flow(name, 50, step, 0, 1, Paths.box(1, low, high), x -> new double[] {speed.at(x[0])});
    }

    /**
     * A skew turn of the torus, {@code (a, b) -> (a + α, b + a)}, α = 2π(√2 - 1), seen by (cos b, sin b): e^(ib) is carried to e^(i(b + na
     * + ...)), functions orthogonal to each other (Anzai, Osaka Mathematical Journal 3:83, 1951), so the best multiplier is 0 and its
     * residual 1, as for Chebyshev's maps; on delays they are shifted on until they leave the space: absent.
     */
    private static void skewTurn(List<Case> out) {
        KnownSystem skew = Paths.closed("skew turn of the torus", 90, 1, Paths.box(2, 0, 2 * PI), (u, k) -> {
            double b = u[1] + k * u[0] + (sqrt(2) - 1) * PI * k * (k - 1);
            return new double[] {cos(b), sin(b)};
        });
        out.add(new Case(skew, Look.linearKernel(2), Truth.ABSENT));
        out.add(new Case(skew, Look.delays(3, 6), Truth.ABSENT));
    }

    /**
     * Chaos: nothing to report. Kaplan and Yorke's map, {@code (x, y) -> (3x mod 1, 0.4y + cos 2πx)} (Functional Differential Equations
     * and Approximation of Fixed Points, Springer, 1979, p. 204): an eigenfunction {@code y + h(x)} would need Fourier coefficients of h that grow 2.5-fold from each power of 3 to
     * the next. Salmon that crowd each other, {@code x -> x e^(3(1 - x))} (Ricker, Journal of the Fisheries Research Board of Canada
     * 11:559, 1954): exponent 0.39, autocorrelations -0.75, 0.35, -0.17, then below 0.3. Rucklidge's flow, {@code (-2x + 6.7y - yz, x, y²
     * - z)} (Journal of Fluid Mechanics 237:209, 1992), x and y: autocorrelations below 0.2 from 1.8 on.
     */
    private static void chaos(List<Case> out) {
        KnownSystem kaplan = Paths.seen("Kaplan-Yorke map", Paths.map("", 90, 1,
                random -> new double[] {random.nextDouble(), 2 * random.nextDouble() - 1},
                x -> new double[] {3 * x[0] % 1, 0.4 * x[1] + cos(2 * PI * x[0])}), x -> new double[] {x[0] - 0.5, x[1]});
        out.add(new Case(kaplan, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(kaplan, Look.delays(4, 4), Truth.NONE));
        KnownSystem salmon = Paths.map("salmon that crowd each other", 90, 1, Paths.box(1, 0.2, 2.2), x -> new double[] {
            x[0] * exp(3 * (1 - x[0]))});
        out.add(new Case(salmon, Look.monomials(4, 5), Truth.NONE));
        out.add(new Case(salmon, Look.step("gaussian", 10, "scale", 0.5), Truth.NONE));
        out.add(new Case(Paths.flow("Rucklidge flow", 150, 0.15, 60, 2, Paths.box(3, 0.3, 1), x -> new double[] {
            -2 * x[0] + 6.7 * x[1] - x[1] * x[2], x[0], x[1] * x[1] - x[2]}), Look.delays(6, 8), Truth.NONE));
    }

    /**
     * Paths that miss their mean motion by most of their size over its own time, as Ornstein-Uhlenbeck in {@link NoModes}: nothing to
     * report. Two prices that share a random walk, their difference keeps 0.6 a day. Two markets that follow each other, 0.84 ± 0.15i.
     */
    private static void prices(List<Case> out) {
        KnownSystem shared = new KnownSystem("two prices that share a walk 2d", 1, random -> {
            double[][] rows = new double[140][];
            double walk = random.nextGaussian();
            double apart = random.nextGaussian();
            for (int k = 0; k < rows.length; k++) {
                rows[k] = new double[] {walk + apart, walk - 0.5 * apart};
                walk += 0.5 * random.nextGaussian();
                apart = 0.6 * apart + 0.8 * random.nextGaussian();
            }
            return rows;
        });
        out.add(new Case(shared, Look.linearKernel(2), Truth.NONE));
        out.add(new Case(shared, Look.monomials(1, 3), Truth.NONE));
        out.add(new Case(new KnownSystem("two markets that follow each other 2d", 1, random -> {
            double[][] rows = new double[140][];
            double[] x = {random.nextGaussian(), random.nextGaussian()};
            for (int k = 0; k < rows.length; k++) {
                rows[k] = x;
                x = new double[] {0.88 * x[0] + 0.12 * x[1] + 0.5 * random.nextGaussian(),
                    -0.2 * x[0] + 0.8 * x[1] + 0.5 * random.nextGaussian()};
            }
            return rows;
        }), Look.linearKernel(2), Truth.NONE));
    }

    /**
     * Counts that go back to their mean by chance, with a scatter that hides it over its own time, as in {@link NoModes}: nothing to
     * report. Twenty fleas on two dogs, one of them at random leaps every time (Ehrenfest, Physikalische Zeitschrift 8:311, 1907): 0.9 a
     * step. A gene among forty, each generation drawn anew, 0.04 change to and 0.04 fro (Wright, Genetics 16:97, 1931): 0.92 a step.
     */
    private static void heads(List<Case> out) {
        out.add(new Case(Paths.chance("fleas on two dogs", 140, 1, random -> {
            int[] first = {drawn(random, 20, 0.5)};
            return () -> {
                first[0] += random.nextInt(20) < first[0] ? -1 : 1;
                return first[0];
            };
        }), Look.monomials(2, 3), Truth.NONE));
        out.add(new Case(Paths.chance("share of a gene among forty", 140, 1, random -> {
            int[] count = {drawn(random, 40, random.nextDouble())};
            return () -> {
                count[0] = drawn(random, 40, 0.04 + 0.92 * count[0] / 40);
                return count[0] / 40.0;
            };
        }), Look.monomials(2, 3), Truth.NONE));
    }

    /** How many of a number come up, each with a chance. */
    private static int drawn(Random random, int number, double chance) {
        return (int) random.doubles(number).filter(u -> u < chance).count();
    }

    /** A counter that rises by one a step and is set back to 0 at times that nothing foretells, on average every sixteenth step: no mode. */
    private static void reset(List<Case> out) {
        out.add(new Case(Paths.chance("counter that is set back", 140, 1, random -> {
            int[] count = {random.nextInt(16)};
            return () -> {
                count[0] = random.nextInt(16) == 0 ? 0 : count[0] + 1;
                return count[0];
            };
        }), Look.delays(6, 4), Truth.NONE));
    }

    /**
     * Independent from sample to sample, no memory that a function could carry: absent. Waiting times, {@code -ln u}, from their mean. Noise that grows four
     * times as loud at a time that nothing foretells.
     */
    private static void white(List<Case> out) {
        KnownSystem waiting = Paths.chance("waiting times", 130, 1, random -> () -> -log(1 - random.nextDouble()) - 1);
        out.add(new Case(waiting, Look.monomials(2, 3), Truth.ABSENT));
        out.add(new Case(waiting, Look.delays(5, 4), Truth.ABSENT));
        out.add(new Case(new KnownSystem("noise that grows loud", 0.1, random -> {
            int turn = 40 + random.nextInt(60);
            double[][] rows = new double[140][1];
            for (int k = 0; k < rows.length; k++) {
                rows[k][0] = (k < turn ? 0.4 : 1.6) * random.nextGaussian();
            }
            return rows;
        }), Look.delays(6, 4), Truth.ABSENT));
    }
}
