package org.modestead.engine.battery;

import static java.lang.StrictMath.PI;
import static java.lang.StrictMath.atan;
import static java.lang.StrictMath.cos;
import static java.lang.StrictMath.exp;
import static java.lang.StrictMath.floor;
import static java.lang.StrictMath.log;
import static java.lang.StrictMath.pow;
import static java.lang.StrictMath.signum;
import static java.lang.StrictMath.sin;
import static java.lang.StrictMath.sqrt;
import static java.lang.StrictMath.tan;

import java.util.ArrayList;
import java.util.List;

/**
 * The fifth calibration part: it was the reporting part until rules were changed after it had been seen. Systems that no part before holds, under looks
 * that an analyst would choose. Overlaps, harmonics, periods and autocorrelations that are not in closed form were computed by another program. Each overlap that makes a mode settle and not stand is above a third, and so is the distance of its joint weight from the solo one.
 */
final class Fifth {

    private Fifth() {}

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        lossless(out);
        exchange(out);
        turned(out);
        normalMaps(out);
        units(out);
        thermal(out);
        reactions(out);
        hydraulic(out);
        flutter(out);
        leaningMaps(out);
        circles(out);
        manifolds(out);
        waveforms(out);
        lines(out);
        cycles(out);
        defective(out);
        steady(out);
        draining(out);
        repelled(out);
        phases(out);
        partlySeen(out);
        maps(out);
        flows(out);
        epidemic(out);
        wells(out);
        ensembles(out);
        passing(out);
        memory(out);
        kicked(out);
        wandering(out);
        return out;
    }

    private static Paths.Field times(double[][] a) {
        return x -> {
            double[] y = new double[x.length];
            for (int i = 0; i < y.length; i++) {
                for (int j = 0; j < y.length; j++) {
                    y[i] += a[i][j] * x[j];
                }
            }
            return y;
        };
    }

    /** Amounts, which are not negative. */
    private static KnownSystem amounts(String name, int samples, double step, double[][] a) {
        return Paths.flow(name, samples, step, 0, a.length, Paths.box(a.length, 0, 1), times(a));
    }

    /** Each stage drives the next and is held back by it, with equal strength: skew but for a damping that all share. */
    private static double[][] chain(double damping, double... strengths) {
        double[][] a = new double[strengths.length + 1][strengths.length + 1];
        for (int i = 0; i < a.length; i++) {
            a[i][i] = -damping;
            if (i > 0) {
                a[i - 1][i] = -strengths[i - 1];
                a[i][i - 1] = strengths[i - 1];
            }
        }
        return a;
    }

    /** Exchange between neighbours (from, to, strength) and a loss that all share: symmetric. */
    private static double[][] exchange(int size, double loss, double[]... links) {
        double[][] a = new double[size][size];
        for (int i = 0; i < size; i++) {
            a[i][i] = -loss;
        }
        for (double[] link : links) {
            int i = (int) link[0];
            int j = (int) link[1];
            a[i][i] -= link[2];
            a[j][j] -= link[2];
            a[i][j] += link[2];
            a[j][i] += link[2];
        }
        return a;
    }

    /**
     * In units in which the energy is the sum of squares. A ladder of inductors and capacitors without a resistor is skew, rates ±0.91i,
     * ±1.81i; strains and velocities of a string with one end free, on staggered points, are skew but for -0.05, rates -0.05 ± 0.49i, ±
     * 1.37i, ± 1.98i. Skew and a multiple of one are normal: w·x are orthogonal in the dual space of the state: stands, see {@link
     * LinearFlows}. Over a run the slowest turns by 0.8 of a turn and more.
     */
    private static void lossless(List<Case> out) {
        KnownSystem ladder = Paths.linear("ladder of inductors and capacitors 4d", 70, 0.1, chain(0, 1.5, 0.8, 1.1));
        out.add(new Case(ladder, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(ladder, Look.delays(3, 4), Truth.REPORTABLE));
        KnownSystem string = Paths.linear("string, strains and velocities 6d", 70, 0.15, chain(0.05, 1.1, 1.1, 1.1, 1.1, 1.1));
        out.add(new Case(string, Look.linearKernel(6), Truth.STANDS));
    }

    /**
     * Five rooms of equal capacity: symmetric, rates -0.2, -0.62, -0.86, -1.68, -1.95: orthogonal: stands. Affine functions hold w·x,
     * their inner product is that of the data: reportable. Four cells of a ring main, carried on with 0.9 and back with 0.1: circulant,
     * so normal, rates -0.2, -1.2 ± 0.8i, -2.2. In the space of (1 + x·y)², as of every kernel k(x·y), the adjoint of x -> e^(At) x is
     * that of Aᵀ, since {@code k(e^(At)x·y) = k(x·e^(Aᵀt)y)}: normal as A is. Sums of degree 2 (-0.4, -1.4 ± 0.8i, -2.4, ...) are at
     * least 0.2 from every rate of degree 1: stands.
     */
    private static void exchange(List<Case> out) {
        KnownSystem rooms = Paths.linear("rooms alike 5d", 60, 0.06, exchange(5, 0.2, new double[][] {{0, 1, 0.5}, {1, 2, 0.3}, {2, 3, 0.7},
            {3, 4, 0.2}, {0, 4, 0.35}, {1, 3, 0.1}}));
        out.add(new Case(rooms, Look.linearKernel(5), Truth.STANDS));
        out.add(new Case(rooms, Look.monomials(1, 6), Truth.REPORTABLE));
        double[][] ring = new double[4][4];
        for (int i = 0; i < 4; i++) {
            ring[i][i] = -1.2;
            ring[i][(i + 3) % 4] = 0.9;
            ring[i][(i + 1) % 4] = 0.1;
        }
        out.add(new Case(Paths.linear("ring main of four cells", 60, 0.045, ring), Look.polynomial(2, 15), Truth.STANDS));
    }

    /**
     * Normal, in axes that are not those of the channels. A saddle, rates 0.35 and -0.8 along axes turned by 25°: symmetric, so
     * self-adjoint in the spaces of exp(x·y) and (1 + x·y)³; 0.35i - 0.8j is one of the two for no other small powers. Precession about n
     * = (1, 2, 2)/3 that is damped, {@code -0.25 + 1.4 n× - 0.5 n nᵀ}: the three commute with their transposes and with each other, rates
     * -0.25 ± 1.4i, -0.75, sums of degree 2 -0.5, -0.5 ± 2.8i, -1 ± 1.4i, -1.5: stands.
     */
    private static void turned(List<Case> out) {
        double c = cos(25 * PI / 180);
        double s = sin(25 * PI / 180);
        double across = 1.15 * s * c;
        KnownSystem saddle = Paths.linear("turned saddle 2d", 50, 0.05, new double[][] {{0.35 * c * c - 0.8 * s * s, across},
            {across, 0.35 * s * s - 0.8 * c * c}});
        out.add(new Case(saddle, Look.exponential(6), Truth.STANDS));
        out.add(new Case(saddle, Look.polynomial(3, 10), Truth.STANDS));
        double[] n = {1 / 3.0, 2 / 3.0, 2 / 3.0};
        double[][] a = {{0, -n[2], n[1]}, {n[2], 0, -n[0]}, {-n[1], n[0], 0}};
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                a[i][j] = 1.4 * a[i][j] - 0.5 * n[i] * n[j] - (i == j ? 0.25 : 0);
            }
        }
        KnownSystem precession = Paths.linear("damped precession about a tilted axis 3d", 60, 0.1, a);
        out.add(new Case(precession, Look.exponential(10), Truth.STANDS));
        out.add(new Case(precession, Look.monomials(2, 10), Truth.REPORTABLE));
    }

    /**
     * In steps. Composition with 0.93 times a rotation commutes with its adjoint, composition with 0.93 times the rotation back: z, z̄
     * are orthogonal to all other {@code z^m z̄^n}: stands. On the line x -> 0.82x is self-adjoint and compact (C3.7): stands. In the
     * Gaussian space it is bounded, but an eigenfunction, being entire, is a power of x, and none is in it (C3.12): nothing to report.
     */
    private static void normalMaps(List<Case> out) {
        double c = 0.93 * cos(0.6);
        double s = 0.93 * sin(0.6);
        KnownSystem turn = Paths.map("shrinking turn", 40, 1, Paths.box(2, -1, 1),
                x -> new double[] {c * x[0] - s * x[1], s * x[0] + c * x[1]});
        out.add(new Case(turn, Look.step("exponential", 6, "rate", 1), Truth.STANDS));
        out.add(new Case(turn, Look.step("polynomial", 6, "degree", 2, "offset", 1), Truth.STANDS));
        KnownSystem shrink = Paths.map("x->0.82x", 18, 1, Paths.box(1, -1.2, 1.2), x -> new double[] {0.82 * x[0]});
        out.add(new Case(shrink, Look.step("exponential", 5, "rate", 1), Truth.STANDS));
        out.add(new Case(shrink, Look.step("gaussian", 6, "scale", 0.8), Truth.NONE));
    }

    /**
     * Units that do not suit each other. A mass on a spring in metres and metres a second, {@code x'' + 0.3x' + 5x = 0}: left
     * eigenvectors (λ + 0.3, 1), λ = -0.15 ± 2.23i, of length √6, overlap 0.67, joint and solo weights 0.67 apart; every sum has a real
     * part of its own degree: settles in the spaces of exp(x·y) and x·y. Axes 1.2 and 0.4 of an ellipse, 0.47 rad a step: e^(±iθ) are
     * x/1.2 ± iy/0.4, overlap {@code (6.25 - 0.69)/(6.25 + 0.69) = 0.80} for x·y; of the functions of exp(x·y) restricted to the ellipse,
     * whose e^(inθ) all have rates of their own, the two overlap by 0.80 as well, x has the weights 0.6 joint and 0.12 solo: settles.
     */
    private static void units(List<Case> out) {
        KnownSystem spring = Paths.linear("spring in metres and metres a second", 60, 0.08, new double[][] {{0, 1}, {-5, -0.3}});
        out.add(new Case(spring, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(spring, Look.linearKernel(2), Truth.SETTLES));
        out.add(new Case(Paths.closed("swing on an ellipse", 60, 1, Paths.box(1, 0, 2 * PI),
                (u, t) -> new double[] {1.2 * cos(u[0] + 0.47 * t), 0.4 * sin(u[0] + 0.47 * t)}), Look.step("exponential", 5, "rate", 1), Truth.SETTLES));
    }

    /**
     * Thermal networks, not symmetric because capacities differ. Four layers of a wall, capacities 1, 5, 1, 5: rates -0.14, -0.41, -2.54,
     * -2.85, each left eigenvector overlaps another by 0.36 or 0.51: settles in the dual space of the state. A room (-2, 1.5) and its
     * wall (0.3, -0.5) fall to -1 outside: rates -2.26, -0.24, overlaps with the constant 0.76 and with each other 0.25 for exp(x·y),
     * 0.85 for (1 + x·y)², joint weights (-0.99, 0.17), (-0.65, -0.76) against solo ones (-0.65, 0.55), (-0.06, -0.36) and further apart
     * for (1 + x·y)²: settles. Delays hold the rates 0, -0.24, -2.26. Gaussian: as every start is drawn to the point of rest, an entire
     * eigenfunction is a polynomial there, and the space holds none (C3.12): nothing to report.
     */
    private static void thermal(List<Case> out) {
        double[][] wall = exchange(4, 0, new double[][] {{0, 1, 1.5}, {1, 2, 1}, {2, 3, 1.5}});
        wall[0][0] -= 0.9;
        wall[3][3] -= 1.2;
        for (int j = 0; j < 4; j++) {
            wall[1][j] /= 5;
            wall[3][j] /= 5;
        }
        KnownSystem layers = Paths.linear("layers of a wall 4d", 60, 0.06, wall);
        out.add(new Case(layers, Look.linearKernel(4), Truth.SETTLES));
        out.add(new Case(layers, Look.delays(3, 4), Truth.REPORTABLE));
        KnownSystem room = Paths.flow("room and wall in the cold", 60, 0.06, 0, 2, Paths.box(2, -1, 1), x -> new double[] {
            -2 * (x[0] + 1) + 1.5 * (x[1] + 1), 0.3 * (x[0] + 1) - 0.5 * (x[1] + 1)});
        out.add(new Case(room, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(room, Look.polynomial(2, 6), Truth.SETTLES));
        out.add(new Case(room, Look.delays(10, 3), Truth.REPORTABLE));
        out.add(new Case(room, Look.gaussian(1, 8), Truth.NONE));
    }

    /**
     * First-order kinetics, not symmetric. A = B = C with unequal constants: rates 0 (the whole amount, which differs from run to run),
     * -0.69, -1.76, overlaps 0.64, 0.61, 0.32. A dose in gut, blood and tissue: rates -0.6, -1.67, -0.13, overlaps 0.54 and 0.48, joint
     * and solo weights 0.55 to 0.71 apart: settles in the dual space of the state. Magnetisation that relaxes to (0, 0, 0.9) at 0.2 and
     * across at 0.35, turning at 1.6: u ± iv are orthogonal to the rest, but {@code <w - 0.9, 1> = -0.9}, solo weight {@code 1/1.81 =
     * 0.55} against 1; 0.2 and 0.35 ± 1.6i are no sums of others: the worst of the three settles. Delays hold 0, -0.2, -0.35 ± 1.6i.
     */
    private static void reactions(List<Case> out) {
        KnownSystem reversible = amounts("reversible reaction A=B=C", 60, 0.07,
                new double[][] {{-1.2, 0.3, 0}, {1.2, -1, 0.25}, {0, 0.7, -0.25}});
        out.add(new Case(reversible, Look.linearKernel(3), Truth.SETTLES));
        out.add(new Case(reversible, Look.delays(3, 3), Truth.REPORTABLE));
        out.add(new Case(amounts("dose in gut, blood and tissue", 60, 0.13,
                new double[][] {{-0.6, 0, 0}, {0.6, -1.5, 0.3}, {0, 0.8, -0.3}}),
                Look.linearKernel(3), Truth.SETTLES));
        KnownSystem spin = Paths.closed("magnetisation that relaxes", 70, 0.08, Paths.box(3, -1, 1), (x, t) -> {
            double size = exp(-0.35 * t);
            return new double[] {size * (x[0] * cos(1.6 * t) + x[1] * sin(1.6 * t)), size * (x[1] * cos(1.6 * t) - x[0] * sin(1.6 * t)),
                0.9 + (x[2] - 0.9) * exp(-0.2 * t)};
        });
        out.add(new Case(spin, Look.exponential(10), Truth.SETTLES));
        out.add(new Case(spin, Look.delays(10, 4), Truth.REPORTABLE));
    }

    /**
     * A cart with drag 0.8: position + speed/0.8 stays, speed decays: left eigenvectors (1, 1.25) and (0, 1), overlap 0.78. Two
     * reservoirs of areas 2 and 0.3, joined by a pipe of inertia 0.2 and friction 0.06: the volume stays, rates -0.15 ± 4.37i, overlaps
     * 0.51 with the volume and 0.45 with its own conjugate: settles in the dual space of the state (in spaces with powers every power of
     * what stays has the rate 0 too: no case).
     */
    private static void hydraulic(List<Case> out) {
        KnownSystem cart = Paths.linear("cart with drag", 50, 0.08, new double[][] {{0, 1}, {0, -0.8}});
        out.add(new Case(cart, Look.linearKernel(2), Truth.SETTLES));
        out.add(new Case(cart, Look.delays(3, 2), Truth.REPORTABLE));
        KnownSystem reservoirs = Paths.linear("reservoirs joined by a pipe 3d", 70, 0.08, new double[][] {{0, 0, -0.5}, {0, 0, 1 / 0.3},
            {5, -5, -0.3}});
        out.add(new Case(reservoirs, Look.linearKernel(3), Truth.SETTLES));
        out.add(new Case(reservoirs, Look.delays(3, 3), Truth.REPORTABLE));
    }

    /**
     * Two motions of a wing, positions and velocities, coupled with opposite signs: -0.40 ± 1.68i and 0.20 ± 1.68i, which grows by 3 over
     * a run; overlaps 0.77 across the pairs, joint and solo weights 0.84 apart: settles in the dual space of the state.
     */
    private static void flutter(List<Case> out) {
        KnownSystem wing = Paths.linear("flutter 4d", 60, 0.1,
                new double[][] {{0, 0, 1, 0}, {0, 0, 0, 1}, {-1.5, -1.6, -0.2, 0}, {1.6, -4, 0, -0.2}});
        out.add(new Case(wing, Look.linearKernel(4), Truth.SETTLES));
        out.add(new Case(wing, Look.delays(3, 4), Truth.REPORTABLE));
    }

    /**
     * In steps, not normal. Three ages of a population: multipliers 1.04 and 0.96 e^(±2.14i), overlaps 0.59 and 0.56, joint and solo
     * weights 0.83 apart: settles in the dual space of the state. x -> 0.75x + 0.4, drawn to 1.6: functions (x - 1.6)^k (C3.7), {@code
     * <1, x - 1.6> = -1.6}, solo weight of x - 1.6 {@code 1/(1 + 2.56) = 0.28} for exp(xy), {@code (1/3)/(1/3 + 2.56) = 0.12} for (1 +
     * xy)³, against 1. x -> 0.9x, y -> 0.6y + 0.5x²: x, x² and y - bx², {@code b = 0.5/(0.81 - 0.6) = 2.38}; in the space of (1 + x·y)²
     * ‖y‖² = 1/2, ‖x²‖ = 1, overlap {@code b/√(1/2 + b²) = 0.96}, solo weight {@code 0.5/(0.5 + b²) = 0.08} against 1; 0.6 is no product
     * of others up to degree 2 (0.81, 0.54, 0.36): settles.
     */
    private static void leaningMaps(List<Case> out) {
        KnownSystem ages = Paths.map("population of three ages", 24, 1, random -> new double[] {0.2 + 0.8 * random.nextDouble(),
            0.1 + 0.4 * random.nextDouble(), 0.05 + 0.25 * random.nextDouble()},
                x -> new double[] {0.4 * x[1] + 4 * x[2], 0.4 * x[0], 0.6 * x[1]});
        out.add(new Case(ages, Look.linearKernel(3), Truth.SETTLES));
        out.add(new Case(ages, Look.monomials(1, 4), Truth.REPORTABLE));
        KnownSystem affine = Paths.map("x->0.75x+0.4", 16, 1, Paths.box(1, -1, 1), x -> new double[] {0.75 * x[0] + 0.4});
        out.add(new Case(affine, Look.step("exponential", 5, "rate", 1), Truth.SETTLES));
        out.add(new Case(affine, Look.step("polynomial", 4, "degree", 3, "offset", 1), Truth.SETTLES));
        KnownSystem bent = Paths.map("quadratic map onto a parabola", 15, 1, Paths.box(2, -1, 1),
                x -> new double[] {0.9 * x[0], 0.6 * x[1] + 0.5 * x[0] * x[0]});
        out.add(new Case(bent, Look.step("polynomial", 6, "degree", 2, "offset", 1), Truth.SETTLES));
    }

    /**
     * Three balanced phases lie in a plane of the state and turn in it: normal, stands in the dual space. Two gears, the second four
     * times as fast and the other way: on the closed orbit {@code K = exp(cos Δ + 0.64 cos 4Δ)} depends on the difference of the angles
     * only, with a positive Fourier series, so e^(inθ) are orthogonal, each with its own rate, and n = ±1, ±4 are the signal: stands. A
     * dial around (0.7, -0.5): Gaussian, {@code K = exp(cos Δ - 1)}, the same, with the constant for the offset (in the plane {@code (z -
     * z*)^n e^(-|z - z*|²/2)} are functions of that space): stands. In the space of exp(x·y), as for a spiral around a point, z - z*
     * overlaps the constant; restricted to the circle by 0.61, and solo weights are (0.30, 0.36) in size against (0.5, 0.5): settles.
     */
    private static void circles(List<Case> out) {
        KnownSystem phases = Paths.closed("three balanced phases", 60, 0.1, Paths.box(2, 0.4, 1), (u, t) -> new double[] {
            u[0] * cos(3 * t + 11 * u[1]), u[0] * cos(3 * t + 11 * u[1] - 2 * PI / 3), u[0] * cos(3 * t + 11 * u[1] + 2 * PI / 3)});
        out.add(new Case(phases, Look.linearKernel(2), Truth.STANDS));
        KnownSystem gears = Paths.closed("gears, four to one", 70, 1, Paths.box(1, 0, 2 * PI), (u, t) -> {
            double a = u[0] + 0.21 * t;
            return new double[] {cos(a), sin(a), 0.8 * cos(4 * a), -0.8 * sin(4 * a)};
        });
        out.add(new Case(gears, Look.step("exponential", 9, "rate", 1), Truth.STANDS));
        KnownSystem dial = Paths.closed("dial beside zero", 60, 1, Paths.box(1, 0, 2 * PI),
                (u, t) -> new double[] {0.7 + cos(u[0] + 0.41 * t), -0.5 + sin(u[0] + 0.41 * t)});
        out.add(new Case(dial, Look.step("gaussian", 5, "scale", 1), Truth.STANDS));
        out.add(new Case(dial, Look.step("exponential", 5, "rate", 1), Truth.SETTLES));
    }

    /**
     * A saddle-shaped slow manifold, {@code x1' = -0.25x1, x2' = -0.6x2, x3' = -1.28(x3 - x1x2)}: x1, x2, x1x2 (-0.85) and x3 - bx1x2,
     * {@code b = 1.28/0.43 = 2.98}; ‖x1x2‖ = ‖x3‖ = 1 for exp(x·y): overlap {@code b/√(1 + b²) = 0.95}, solo weight {@code 1/(1 + b²) =
     * 0.10} against 1; -1.28 is no rate of another monomial up to degree 3 (-1.2, -1.1, -1.45 are the nearest): settles. Monomials up to
     * degree 2 are not closed but hold all four: reportable.
     */
    private static void manifolds(List<Case> out) {
        double b = 1.28 / 0.43;
        KnownSystem saddle = Paths.closed("saddle-shaped slow manifold", 60, 0.06, Paths.box(3, -1, 1), (x, t) -> {
            double product = b * x[0] * x[1];
            return new double[] {x[0] * exp(-0.25 * t), x[1] * exp(-0.6 * t), (x[2] - product) * exp(-1.28 * t) + product * exp(-0.85 * t)};
        });
        out.add(new Case(saddle, Look.exponential(12), Truth.SETTLES));
        out.add(new Case(saddle, Look.monomials(2, 10), Truth.REPORTABLE));
    }

    /**
     * Waveforms of a whole number of samples a period obey an exact recurrence, {@code x(k+8) = -x(k)} for a square wave of period 16:
     * eight exponentials, the odd harmonics, amplitudes 0.64, 0.23, 0.15, 0.13; {@code x(k+15) = x(k)} for a thermostat, half of the time
     * drawn to 1.5 and half to -0.5: mean, odd harmonics 0.21, 0.024, 0.009, 0.004, no other above 0.003. The logistic map at 3.8319, in
     * its window of period 3, on the cycle: three exponentials, the mean and e^(±2πi/3). All held by delays: reportable.
     */
    private static void waveforms(List<Case> out) {
        out.add(new Case(Paths.closed("square wave of 16 samples", 80, 1, Paths.box(1, 0, 1), (u, t) -> new double[] {
            signum(sin(2 * PI * (t / 16 + floor(16 * u[0]) / 16 + 0.01)))}), Look.delays(10, 8), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("thermostat", 110, 0.1, Paths.box(1, 0, 1), (u, t) -> {
            double phase = (u[0] + t / 1.5) % 1;
            return new double[] {phase < 0.5 ? 1.5 - 1.5 * pow(9, -phase) : -0.5 + 1.5 * pow(9, 0.5 - phase)};
        }), Look.delays(16, 9), Truth.REPORTABLE));
        out.add(new Case(new KnownSystem("logistic map, period 3", 1, random -> {
            double x = 0.5;
            for (int k = 300 + random.nextInt(3); k > 0; k--) {
                x = 3.8319 * x * (1 - x);
            }
            double[][] rows = new double[45][];
            for (int k = 0; k < rows.length; k++) {
                rows[k] = new double[] {x};
                x = 3.8319 * x * (1 - x);
            }
            return rows;
        }), Look.delays(4, 3), Truth.REPORTABLE));
    }

    /**
     * Line spectra, held by delays: reportable. Frequency modulation, index 1.2: lines 4 + 0.7n of Bessel amplitudes 0.67, 0.50, 0.16,
     * 0.03, 0.005 each way, seven pairs hold all but 1e-4; the delays reach over 1.1 of the slow periods, a run over 5.8. A tide of four
     * constituents, speeds an hour 0.506, 0.524, 0.243, 0.263, amplitudes 1, 0.4, 0.25, 0.35; over a run of 20 days the close pairs beat
     * 1.3 and 1.5 times. A bell that warbles, -0.05 ± 5i and -0.06 ± 5.4i, 1.1 beats a run. Collapse and revival, lines √(n + 1) with Poisson
     * weights of mean 0.6: 0.55, 0.33, 0.10, 0.02 (Cummings, Physical Review 140:A1051, 1965); the closest turn by 2.5 turns against each
     * other in a run.
     */
    private static void lines(List<Case> out) {
        out.add(new Case(Paths.closed("frequency modulation", 150, 0.35, Paths.box(2, 0, 2 * PI), (u, t) -> new double[] {
            cos(4 * t + u[0] + 1.2 * sin(0.7 * t + u[1]))}), Look.delays(28, 14), Truth.REPORTABLE));
        double[] speeds = {0.50587, 0.5236, 0.24335, 0.26252};
        double[] sizes = {1, 0.4, 0.25, 0.35};
        out.add(new Case(Paths.closed("tide gauge", 160, 3, Paths.box(4, 0, 2 * PI), (u, t) -> {
            double level = 0;
            for (int i = 0; i < 4; i++) {
                level += sizes[i] * cos(speeds[i] * t + u[i]);
            }
            return new double[] {level};
        }), Look.delays(30, 8), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("warbling bell", 150, 0.12, Paths.box(4, 0.4, 1), (u, t) -> new double[] {
            u[0] * exp(-0.05 * t) * cos(5 * t + 11 * u[2]) + u[1] * exp(-0.06 * t) * cos(5.4 * t + 11 * u[3])}),
                Look.delays(28, 4), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("collapse and revival", 150, 0.4, Paths.box(1, 0, 50), (u, t) -> {
            double sum = 0;
            double weight = exp(-0.6);
            for (int n = 0; n < 8; n++) {
                sum += weight * cos(sqrt(n + 1) * (t + u[0]));
                weight *= 0.6 / (n + 1);
            }
            return new double[] {sum};
        }), Look.delays(40, 8), Truth.REPORTABLE));
    }

    private static Paths.Field selkov(double a) {
        return x -> new double[] {-x[0] + a * x[1] + x[0] * x[0] * x[1], 0.6 - a * x[1] - x[0] * x[0] * x[1]};
    }

    /**
     * Periodic signals on their orbits, held by delays: reportable. Glycolysis (Selkov, a = 0.1), period 9.30, harmonics 1, 0.31, 0.11,
     * 0.04 of x: mean and four pairs hold all but 3e-4. Predators with saturation (Rosenzweig and MacArthur, American Naturalist 97:209,
     * 1963), period 18.6, harmonics 1, 0.15, 0.04, 0.007: mean and three pairs hold all but 6e-5. A planet of eccentricity 0.3, harmonics
     * 1, 0.15, 0.03, 0.008: four pairs and the mean hold all but 1e-5. The delays reach over one period.
     */
    private static void cycles(List<Case> out) {
        out.add(new Case(Paths.flow("glycolysis on its cycle", 110, 0.3, 250, 2, Paths.box(2, 0.5, 1.5), selkov(0.1)), Look.delays(32, 9),
                Truth.REPORTABLE));
        out.add(new Case(Paths.flow("saturated predators on their cycle", 100, 0.6, 400, 2, Paths.box(2, 0.5, 1.5), x -> {
            double eaten = x[0] * x[1] / (1 + x[0]);
            return new double[] {x[0] * (1 - x[0] / 3) - eaten, 0.8 * eaten - 0.35 * x[1]};
        }), Look.delays(32, 7), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("planet on one orbit", 100, 0.3, Paths.box(1, 0, 2 * PI), (u, t) -> planet(1, u[0], t)),
                Look.delays(22, 9), Truth.REPORTABLE));
    }

    /** Kepler's ellipse of eccentricity 0.3 by Newton's method. */
    private static double[] planet(double axis, double mean, double time) {
        double m = mean + time / pow(axis, 1.5);
        double e = m;
        for (int k = 0; k < 20; k++) {
            e -= (e - 0.3 * sin(e) - m) / (1 - 0.3 * cos(e));
        }
        return new double[] {axis * (cos(e) - 0.3), axis * sqrt(1 - 0.09) * sin(e)};
    }

    /**
     * A repeated rate without a second eigenvector, so that the signal needs a generalised eigenfunction (C2.18): drifts. A free cart:
     * its speed is an eigenfunction of rate 0 but its position is none, and on polynomials the generator is nilpotent. A door closer,
     * {@code x'' + 1.4x' + 0.49x = 0}, double -0.7, w·x with w = (0.7, 1) the only linear eigenfunction and its powers the only ones in
     * the spaces of exp(x·y) and (1 + x·y)². A rotor that drives its twin, a double pair -0.1 ± 1.5i. A -> B -> C with equal constants,
     * double -0.8 beside the whole amount. A ramp and what settles, double 0 beside -1.5, the ramp the larger part.
     */
    private static void defective(List<Case> out) {
        KnownSystem cart = Paths.linear("free cart", 50, 0.06, new double[][] {{0, 1}, {0, 0}});
        out.add(new Case(cart, Look.linearKernel(2), Truth.DRIFTS));
        out.add(new Case(cart, Look.monomials(2, 6), Truth.DRIFTS));
        KnownSystem door = Paths.linear("door closer", 50, 0.07, new double[][] {{0, 1}, {-0.49, -1.4}});
        out.add(new Case(door, Look.exponential(6), Truth.DRIFTS));
        out.add(new Case(door, Look.polynomial(2, 6), Truth.DRIFTS));
        KnownSystem twin = Paths.linear("rotor that drives its twin 4d", 60, 0.12,
                new double[][] {{-0.1, 1.5, 0.9, 0}, {-1.5, -0.1, 0, 0.9}, {0, 0, -0.1, 1.5}, {0, 0, -1.5, -0.1}});
        out.add(new Case(twin, Look.linearKernel(4), Truth.DRIFTS));
        out.add(new Case(twin, Look.delays(4, 4), Truth.DRIFTS));
        out.add(new Case(amounts("reaction A->B->C, equal constants", 60, 0.07, new double[][] {{-0.8, 0, 0}, {0.8, -0.8, 0}, {0, 0.8, 0}}),
                Look.linearKernel(3), Truth.DRIFTS));
        out.add(new Case(Paths.closed("ramp and settling", 70, 0.1, Paths.box(3, -1, 1), (u, t) -> new double[] {
            0.5 * u[0] + 0.6 * u[1] * t + u[2] * exp(-1.5 * t)}), Look.delays(16, 3), Truth.DRIFTS));
    }

    /**
     * At constant speed. A ship, (0.8, 0.5): in the space of exp(x·y) e^(k·x) for every k, over-complete; what lies across the course has
     * the rate 0, but the way along it has no mode (C3.4): drifts; delays: a double multiplier 1 beside what lies across: drifts;
     * Gaussian: translations are unitary with a continuous spectrum (C3.12): nothing to report. One channel that decays beside one that
     * is conveyed, -0.8x and 0.5: {@code x^n e^(λy)}, and on monomials {@code x^n y^m} are Jordan blocks of -0.8n; the worst of the two
     * drifts. A belt in steps, x -> x + 0.06: every e^(λx) again for exp(xy) (C3.7), one Jordan block of 1 for (1 + xy)³: drifts.
     */
    private static void steady(List<Case> out) {
        KnownSystem ship = Paths.closed("ship on a steady course", 50, 0.04, Paths.box(2, -1, 0.5), (x, t) -> new double[] {x[0] + 0.8 * t,
            x[1] + 0.5 * t});
        out.add(new Case(ship, Look.exponential(8), Truth.DRIFTS));
        out.add(new Case(ship, Look.delays(4, 3), Truth.DRIFTS));
        out.add(new Case(ship, Look.gaussian(1, 8), Truth.NONE));
        KnownSystem both = Paths.closed("decaying and conveyed", 50, 0.045, Paths.box(2, -1, 1),
                (x, t) -> new double[] {x[0] * exp(-0.8 * t), x[1] + 0.5 * t});
        out.add(new Case(both, Look.exponential(8), Truth.DRIFTS));
        out.add(new Case(both, Look.monomials(3, 10), Truth.DRIFTS));
        KnownSystem belt = Paths.map("belt in steps", 30, 1, Paths.box(1, -1, 0.2), x -> new double[] {x[0] + 0.06});
        out.add(new Case(belt, Look.step("exponential", 6, "rate", 1), Truth.DRIFTS));
        out.add(new Case(belt, Look.step("polynomial", 4, "degree", 3, "offset", 1), Truth.DRIFTS));
    }

    /**
     * A tank that drains through a hole, {@code h' = -0.4√h}, not empty before the run ends: {@code h = (√h0 - 0.2t)²}, a parabola in
     * time, third differences zero: one Jordan block of three for the rate 0: drifts. As a flow: {@code e^(-5λ√h)} for every λ, a branch
     * at h = 0, so none but the constant is entire, and over the data any λ is imitated: nothing to report. {@code x' = -sin(2x)/2} (a
     * rotor that falls to rest against heavy friction): {@code (tan x)^n}, poles at ±π/2 = ±1.57, starts up to 1.45, and no other is
     * analytic at 0: absent from the space of exp(xy).
     */
    private static void draining(List<Case> out) {
        KnownSystem tank = Paths.closed("draining tank", 40, 0.1, Paths.box(1, 0.85, 1.4), (u, t) -> new double[] {
            (u[0] - 0.2 * t) * (u[0] - 0.2 * t)});
        out.add(new Case(tank, Look.delays(12, 3), Truth.DRIFTS));
        out.add(new Case(tank, Look.exponential(8), Truth.NONE));
        out.add(new Case(Paths.closed("x'=-sin(2x)/2", 45, 0.05, Paths.box(1, -1.45, 1.45),
                (x, t) -> new double[] {atan(tan(x[0]) * exp(-t))}), Look.exponential(8), Truth.ABSENT));
    }

    /**
     * Starts all around a point of rest that repels on every side (a source or an unstable focus), and motions that stay bounded: near
     * the point an analytic eigenfunction begins with a product of powers of the linear ones, its rate has a real part 0 or above; above,
     * it would grow without bound along a bounded motion; 0 only for the zeroth power, then it is constant along motions and so on the
     * basin of what attracts them: no entire one but the constant: absent from the space of exp(x·y). Two competing species: source at 0
     * (1, 0.8), all drawn to (0.71, 0.57). Glycolysis, a = 0.08: focus (0.6, 1.36), 0.10 ± 0.66i. A nerve (FitzHugh, Biophysical Journal
     * 1:445, 1961): focus (-0.80, -0.13), 0.10 ± 0.37i. The Gaussian space lacks the constant as well.
     */
    private static void repelled(List<Case> out) {
        out.add(new Case(Paths.flow("competing species", 60, 0.08, 0, 2, Paths.box(2, 0.03, 1.2), x -> new double[] {
            x[0] * (1 - x[0] - 0.5 * x[1]), 0.8 * x[1] * (1 - x[1] - 0.6 * x[0])}), Look.exponential(10), Truth.ABSENT));
        KnownSystem glycolysis = Paths.flow("glycolysis off its cycle", 70, 0.12, 0, 2,
                random -> new double[] {0.2 + 1.3 * random.nextDouble(), 0.5 + 1.7 * random.nextDouble()}, selkov(0.08));
        out.add(new Case(glycolysis, Look.exponential(10), Truth.ABSENT));
        out.add(new Case(glycolysis, Look.gaussian(1, 12), Truth.NONE));
        KnownSystem nerve = Paths.flow("nerve off its cycle", 80, 0.2, 0, 2,
                random -> new double[] {-2 + 4 * random.nextDouble(), -0.4 + 1.9 * random.nextDouble()},
                x -> new double[] {x[0] - x[0] * x[0] * x[0] / 3 - x[1] + 0.5, 0.2 * (x[0] + 0.7 - 0.8 * x[1])});
        out.add(new Case(nerve, Look.exponential(10), Truth.ABSENT));
    }

    /**
     * Three times the angle: {@code U e^(inθ) = e^(3inθ)}: mixing, and no combination of harmonics -3 to 3 returns to itself (the
     * residual of the nilpotent part is 1); on the circle no continuous function but the constant is an eigenfunction of a mixing map, so
     * none of the Gaussian space: absent.
     */
    private static void phases(List<Case> out) {
        out.add(new Case(Paths.map("three times the angle", 70, 1, Paths.box(1, 0, 1), x -> new double[] {3 * x[0] % 1}), Look.fourier(3),
                Truth.ABSENT));
        out.add(new Case(new KnownSystem("three times the angle, plane", 1, random -> {
            double[][] rows = new double[70][];
            double x = random.nextDouble();
            for (int k = 0; k < rows.length; k++) {
                rows[k] = new double[] {cos(2 * PI * x), sin(2 * PI * x)};
                x = 3 * x % 1;
            }
            return rows;
        }), Look.step("gaussian", 9, "scale", 0.8), Truth.ABSENT));
    }

    /**
     * What is recorded is not the whole state. A string that swings in two shapes (1 and 2.6 rad/s) seen by six sensors, positions only:
     * the functions w·x are two-dimensional, each swing is one of them times a cosine of a phase that is not seen: the best multiplier
     * cos(ωΔ) is real and misses by sin(ωΔ), 0.39 and 0.86: absent; delays hold the two pairs: reportable. Three phases with a fifth
     * harmonic, 0.4, which turns backwards in the same plane: {@code z = e^(iθ) + 0.4e^(-5iθ)}, no w·x has one harmonic, the best
     * multiplier is 0.84 in size and misses by 0.54: absent; delays hold ±3i and ±15i: reportable. The position of a swinging hook,
     * amplitudes 0.5 to 1.5, in cubic polynomials: the same.
     */
    private static void partlySeen(List<Case> out) {
        KnownSystem string = Paths.closed("string seen by six sensors", 60, 0.4, Paths.box(4, 0.4, 1), (u, t) -> {
            double[] row = new double[6];
            for (int i = 0; i < 6; i++) {
                row[i] = u[0] * cos(t + 11 * u[2]) * sin(PI * (i + 1) / 7) + u[1] * cos(2.6 * t + 11 * u[3]) * sin(2 * PI * (i + 1) / 7);
            }
            return row;
        });
        out.add(new Case(string, Look.linearKernel(2), Truth.ABSENT));
        out.add(new Case(string, Look.delays(5, 4), Truth.REPORTABLE));
        KnownSystem fifth = Paths.closed("three phases with a fifth harmonic", 70, 0.1, Paths.box(1, 0, 2 * PI), (u, t) -> {
            double[] row = new double[3];
            for (int i = 0; i < 3; i++) {
                double phase = 3 * t + u[0] - 2 * PI * i / 3;
                row[i] = cos(phase) + 0.4 * cos(5 * phase);
            }
            return row;
        });
        out.add(new Case(fifth, Look.linearKernel(2), Truth.ABSENT));
        out.add(new Case(fifth, Look.delays(6, 4), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("position of a hook", 80, 0.3, Paths.box(2, 0.5, 1.5),
                (u, t) -> new double[] {u[0] * cos(1.3 * t + 7 * u[1])}),
                Look.monomials(3, 4), Truth.ABSENT));
    }

    /**
     * Gauss's map 1/x mod 1: mixing; the compressed spectrum is that of its transfer operator, 1, -0.30, 0.10, ... (Wirsing, Acta
     * Arithmetica 24:507, 1974), and in the measure that is kept a multiplier μ has the residual √(1 - |μ|²) (C7.3), 0.95 and more:
     * absent. Three chaotic logistic maps, each coupled to the next with 0.05: autocorrelations -0.39, -0.01, 0.15, -0.1, 0: absent.
     * Ikeda's map (Optics Communications 30:257, 1979) at 0.9: autocorrelations below 0.3 from one step on: nothing to report.
     */
    private static void maps(List<Case> out) {
        out.add(new Case(Paths.map("Gauss map", 70, 1, Paths.box(1, 0.05, 0.98), x -> new double[] {x[0] < 1e-9 ? 0.3 : 1 / x[0] % 1}),
                Look.monomials(5, 6), Truth.ABSENT));
        out.add(new Case(Paths.map("coupled logistic maps", 80, 1, Paths.box(3, 0.05, 0.95), x -> {
            double[] y = new double[3];
            for (int i = 0; i < 3; i++) {
                y[i] = Math.min(1, 0.95 * 4 * x[i] * (1 - x[i]) + 0.05 * 4 * x[(i + 2) % 3] * (1 - x[(i + 2) % 3]));
            }
            return y;
        }), Look.delays(4, 6), Truth.ABSENT));
        out.add(new Case(Paths.map("Ikeda map", 90, 1, Paths.box(2, -0.1, 0.1), x -> {
            double turn = 0.4 - 6 / (1 + x[0] * x[0] + x[1] * x[1]);
            return new double[] {1 + 0.9 * (x[0] * cos(turn) - x[1] * sin(turn)), 0.9 * (x[0] * sin(turn) + x[1] * cos(turn))};
        }), Look.monomials(3, 10), Truth.NONE));
    }

    /**
     * Chaotic flows. A ring of five sites of the atmosphere, forced by 10 (Lorenz, Predictability, ECMWF, 1996): exponent 0.9,
     * autocorrelation below 0.26 from 2 on; Chen's flow (International Journal of Bifurcation and Chaos 9:1465, 1999): exponent 2.0,
     * autocorrelation 0.3 after 1.2, 0.15 after 2.4, 0.02 after 3.2; runs of 6 and 5.4: nothing to report.
     */
    private static void flows(List<Case> out) {
        KnownSystem ring = Paths.flow("five sites of an atmosphere", 150, 0.04, 10, 5, Paths.box(5, 1, 8), x -> {
            double[] y = new double[5];
            for (int i = 0; i < 5; i++) {
                y[i] = (x[(i + 1) % 5] - x[(i + 3) % 5]) * x[(i + 4) % 5] - x[i] + 10;
            }
            return y;
        });
        out.add(new Case(ring, Look.delays(4, 10), Truth.NONE));
        out.add(new Case(ring, Look.monomials(2, 21), Truth.NONE));
        out.add(new Case(Paths.flow("Chen flow", 180, 0.03, 5, 3, Paths.box(3, 1, 10), x -> new double[] {35 * (x[1] - x[0]),
            -7 * x[0] - x[0] * x[2] + 28 * x[1], x[0] * x[1] - 3 * x[2]}), Look.delays(10, 8), Truth.NONE));
    }

    /**
     * An epidemic, {@code S' = -2.4SI, I' = 2.4SI - 0.8I}. All states with I = 0 rest, so an analytic eigenfunction of another rate than
     * 0 is {@code I^k ψ} with {@code (k(2.4S - 0.8) - λ)ψ = 0} there, that is ψ = 0 there, that is none; those of rate 0 are functions of
     * {@code S e^(-3(S + I))}, which do not move while S falls from 0.9 to 0.1: nothing to report; delays: a wave whose height, time and
     * last rate depend on the start. A fast feed of a sink of second order, {@code x' = -x, y' = x - 1.5y²}: on x = 0 an analytic
     * eigenfunction solves {@code -1.5y²φ' = λφ}, so it is constant there and λ = 0, or x^k times one: only x^k, which carry nothing of y
     * (C3.1): nothing to report.
     */
    private static void epidemic(List<Case> out) {
        KnownSystem epidemic = Paths.flow("epidemic", 80, 0.12, 0, 2, random -> new double[] {0.6 + 0.38 * random.nextDouble(),
            0.01 + 0.11 * random.nextDouble()}, x -> new double[] {-2.4 * x[0] * x[1], 2.4 * x[0] * x[1] - 0.8 * x[1]});
        out.add(new Case(epidemic, Look.exponential(10), Truth.NONE));
        out.add(new Case(epidemic, Look.delays(8, 5), Truth.NONE));
        out.add(new Case(Paths.flow("feed of a sink of second order", 60, 0.06, 0, 2, Paths.box(2, 0.05, 1), x -> new double[] {-x[0],
            x[0] - 1.5 * x[1] * x[1]}), Look.exponential(10), Truth.NONE));
    }

    /**
     * {@code x'' = -0.5x' + x - x³} (C2.6): an eigenfunction that is analytic has a rate -0.25(m + n) ± 1.39i(m - n) at the rests ±1, and
     * for any rate but 0, whose real part is then below 0, it must vanish on what leaves the saddle at 0, where it would be infinite in
     * the past; that spirals into the rests, where the function is {@code z^m z̄^n}, not 0: none, and rate 0 gives constants. Not damped, once over
     * the hump: amplitudes 1.5 to 2.3, periods 9.2 to 3.8. Morse's bond, stretched by 0.4 to 2: periods 4.7 to 8.8: a continuous range of
     * frequencies, no isolated one: nothing to report.
     */
    private static void wells(List<Case> out) {
        out.add(new Case(Paths.flow("two wells, damped", 100, 0.15, 0, 2, Paths.box(2, -1.8, 1.8), x -> new double[] {x[1],
            -0.5 * x[1] + x[0] - x[0] * x[0] * x[0]}), Look.step("exponential", 12, "rate", 0.25), Truth.NONE));
        out.add(new Case(Paths.flow("two wells, over the hump", 120, 0.15, 0, 2,
                random -> new double[] {1.5 + 0.8 * random.nextDouble(), 0},
                x -> new double[] {x[1], x[0] - x[0] * x[0] * x[0]}), Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(Paths.flow("Morse bond", 120, 0.15, 0, 2, random -> new double[] {0.4 + 1.6 * random.nextDouble(), 0},
                x -> new double[] {x[1], -2 * (1 - exp(-x[0])) * exp(-x[0])}), Look.monomials(3, 10), Truth.NONE));
    }

    /**
     * A vortex that turns at {@code 0.6 + 0.8r²}, r from 0.4 to 1.4: on every circle an eigenfunction of another rate than 0 has a rate
     * {@code i n ω(r)}, so it is 0 on all but a few; those of rate 0 are functions of r and carry nothing of x or y. Planets of axes 0.8
     * to 1.5: periods {@code 2π a^(3/2)}, 4.5 to 11.5. Dry friction, {@code x'' = -x - 0.25 sign x'}: half turns around ±0.25 by turns,
     * amplitudes of 1.5 to 4 fall by 0.5 a half turn: the least by five sixths, the largest by a third in one run: no rate. A machine
     * that runs up from about 1 to 4 rad/s: no frequency. Nothing to report.
     */
    private static void ensembles(List<Case> out) {
        KnownSystem vortex = Paths.closed("vortex", 100, 0.12, Paths.box(2, 0, 1), (u, t) -> {
            double r = 0.4 + u[0];
            double angle = 2 * PI * u[1] + (0.6 + 0.8 * r * r) * t;
            return new double[] {r * cos(angle), r * sin(angle)};
        });
        out.add(new Case(vortex, Look.exponential(10), Truth.NONE));
        out.add(new Case(vortex, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(Paths.closed("planets on many orbits", 120, 0.2, Paths.box(2, 0, 1),
                (u, t) -> planet(0.8 + 0.7 * u[0], 2 * PI * u[1], t)),
                Look.delays(12, 8), Truth.NONE));
        out.add(new Case(Paths.closed("dry friction", 75, 0.12, Paths.box(1, 1.5, 4), (u, t) -> {
            double half = floor(t / PI);
            double sign = half % 2 == 0 ? 1 : -1;
            double size = u[0] - (2 * half + 1) * 0.25;
            return new double[] {sign * (0.25 + size * cos(t - half * PI)), -sign * size * sin(t - half * PI)};
        }), Look.delays(8, 4), Truth.NONE));
        out.add(new Case(Paths.closed("run-up of a machine", 150, 0.1, Paths.box(2, 0, 1), (u, t) -> new double[] {
            cos(2 * PI * u[0] + (0.8 + 0.6 * u[1]) * t + 0.1 * t * t)}), Look.delays(14, 6), Truth.NONE));
    }

    /**
     * A pulse {@code e^(-2(t - t0)²)} that passes three gauges at a random time: no sum of exponentials, and nothing before it tells of
     * it.
     */
    private static void passing(List<Case> out) {
        out.add(new Case(Paths.closed("pulse past three gauges", 110, 0.1, Paths.box(1, 2, 6), (u, t) -> {
            double[] row = new double[3];
            for (int i = 0; i < 3; i++) {
                double late = t - u[0] - 0.9 * i;
                row[i] = exp(-2 * late * late);
            }
            return row;
        }), Look.delays(6, 6), Truth.NONE));
    }

    /**
     * Coloured by a window and not by a rule: {@code 0.6e(k) + e(k-1) + 0.6e(k-2)}, whose mean is 0 three steps ahead whatever is known:
     * its only eigenvalue is 0, as of white noise. Noise whose size, not its sign, remembers, {@code σ² = 0.4 + 0.5x²}: the mean is 0 one
     * step ahead: absent.
     */
    private static void memory(List<Case> out) {
        out.add(new Case(Paths.chance("moving average of noise", 140, 0.1, random -> {
            double[] e = {random.nextGaussian(), random.nextGaussian(), random.nextGaussian()};
            return () -> {
                double x = 0.6 * e[0] + e[1] + 0.6 * e[2];
                e[0] = e[1];
                e[1] = e[2];
                e[2] = random.nextGaussian();
                return x;
            };
        }), Look.delays(6, 4), Truth.ABSENT));
        out.add(new Case(Paths.chance("volatile noise", 140, 0.1, random -> {
            double[] x = {random.nextGaussian()};
            return () -> {
                x[0] = sqrt(0.4 + 0.5 * x[0] * x[0]) * random.nextGaussian();
                return x[0];
            };
        }), Look.delays(6, 6), Truth.ABSENT));
    }

    /**
     * Paths that miss their mean motion by most of their size over its own time, as Ornstein-Uhlenbeck in {@link NoModes}. Shots that
     * ring out at 0.9 a step, one in ten steps; set points that are changed to another random one with 0.06 a step, mean motion 0.94 a
     * step; a climate with two states, {@code x' = x - x³ + 0.6 noise}, that changes over at random; three rooms, symmetric, multipliers
     * 0.70 to 0.96 and weather of 0.3 a step.
     */
    private static void kicked(List<Case> out) {
        out.add(new Case(Paths.chance("shot noise", 140, 0.1, random -> {
            double[] x = {1};
            return () -> {
                x[0] = 0.9 * x[0] - (random.nextDouble() < 0.1 ? log(1 - random.nextDouble()) : 0);
                return x[0];
            };
        }), Look.monomials(3, 4), Truth.NONE));
        out.add(new Case(Paths.chance("changing set points", 140, 0.1, random -> {
            double[] x = {random.nextGaussian()};
            return () -> {
                x[0] = random.nextDouble() < 0.06 ? random.nextGaussian() : x[0];
                return x[0];
            };
        }), Look.delays(6, 4), Truth.NONE));
        out.add(new Case(Paths.chance("climate with two states", 140, 0.2, random -> {
            double[] x = {random.nextBoolean() ? 1 : -1};
            return () -> {
                for (int k = 0; k < 10; k++) {
                    x[0] += 0.02 * (x[0] - x[0] * x[0] * x[0]) + 0.6 * sqrt(0.02) * random.nextGaussian();
                }
                return x[0];
            };
        }), Look.monomials(3, 4), Truth.NONE));
        out.add(new Case(new KnownSystem("three rooms in random weather", 0.1, random -> {
            double[][] rows = new double[140][];
            double[] x = {random.nextGaussian(), random.nextGaussian(), random.nextGaussian()};
            for (int k = 0; k < rows.length; k++) {
                rows[k] = x;
                x = new double[] {0.85 * x[0] + 0.08 * x[1] + 0.3 * random.nextGaussian(),
                    0.08 * x[0] + 0.8 * x[1] + 0.1 * x[2] + 0.3 * random.nextGaussian(),
                    0.1 * x[1] + 0.86 * x[2] + 0.3 * random.nextGaussian()};
            }
            return rows;
        }), Look.monomials(1, 4), Truth.NONE));
    }

    /**
     * A tone whose phase wanders by 0.25 a step: the mean motion loses its phase in 32 steps, the path keeps its size. Noise that is
     * added up twice, as of a drifting gyroscope: the mean motion is a ramp, a double rate 0, and the speed itself wanders. Nothing to
     * report.
     */
    private static void wandering(List<Case> out) {
        out.add(new Case(new KnownSystem("tone whose phase wanders", 0.2, random -> {
            double[][] rows = new double[140][];
            double phase = 2 * PI * random.nextDouble();
            for (int k = 0; k < rows.length; k++) {
                rows[k] = new double[] {cos(phase), sin(phase)};
                phase += 0.35 + 0.25 * random.nextGaussian();
            }
            return rows;
        }), Look.delays(6, 4), Truth.NONE));
        out.add(new Case(Paths.chance("noise added up twice", 140, 0.1, random -> {
            double[] x = {random.nextGaussian(), 0.3 * random.nextGaussian()};
            return () -> {
                x[1] += 0.1 * random.nextGaussian();
                x[0] += x[1];
                return x[0];
            };
        }), Look.delays(8, 4), Truth.NONE));
    }
}
