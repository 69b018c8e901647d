package org.modestead.engine.battery;

import static java.lang.StrictMath.PI;
import static java.lang.StrictMath.abs;
import static java.lang.StrictMath.atan;
import static java.lang.StrictMath.cos;
import static java.lang.StrictMath.exp;
import static java.lang.StrictMath.floor;
import static java.lang.StrictMath.max;
import static java.lang.StrictMath.min;
import static java.lang.StrictMath.sin;
import static java.lang.StrictMath.sqrt;
import static java.lang.StrictMath.tan;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;

/**
 * The seventh calibration part: it was the reporting part until rules were changed after it had been seen. Systems that no part before holds, written before any
 * of them was judged. Overlaps, harmonics and autocorrelations that are not in closed form were computed by another program.
 * Each overlap that makes a mode settle and not stand is above a third, and so is the distance of its joint weight from the solo one.
 * Modes in the space of exp(x·y) were kept only where another program's fit of that rank came near their rates.
 */
final class Seventh {

    private Seventh() {}

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        lossless(out);
        symmetric(out);
        turns(out);
        octave(out);
        vehicles(out);
        damper(out);
        pools(out);
        aside(out);
        fed(out);
        bent(out);
        stock(out);
        waveforms(out);
        lines(out);
        orbits(out);
        forks(out);
        atResonance(out);
        equal(out);
        travelling(out);
        drop(out);
        rests(out);
        reed(out);
        ensembles(out);
        turntables(out);
        passing(out);
        chaos(out);
        white(out);
        chains(out);
        return out;
    }

    /**
     * Two gyroscopes on a platform, in units in which the energy is the sum of squares: a skew matrix without a block, rates ±0.90i and
     * ±1.90i. Skew is normal, w·x are orthogonal in the dual space of the state, see {@link LinearFlows}: stands.
     */
    private static void lossless(List<Case> out) {
        KnownSystem platform = Paths.linear("gyroscopes on a platform 4d", 80, 0.12, new double[][] {{0, 1, -0.5, 0.3}, {-1, 0, 0.7, -0.2},
            {0.5, -0.7, 0, 1.6}, {-0.3, 0.2, -1.6, 0}});
        out.add(new Case(platform, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(platform, Look.delays(3, 4), Truth.REPORTABLE));
    }

    /**
     * Symmetric, so self-adjoint in the spaces of x·y, exp(x·y) and (1 + x·y)² alike (C3.3): stands. A flow towards a point of stagnation,
     * rates 0.56, -0.35, -0.61; those of degree 2 are 1.12, 0.21, -0.05, -0.71, -0.96, -1.21; the entire eigenfunctions are
     * products of the three linear ones, which the Gaussian space does not hold (C3.12): nothing to report. Opinions of five that listen
     * to each other, and forget: multipliers 0.97, 0.86, 0.81, 0.70, 0.63. A rod of two metals, one conducts 0.3 of the other: rates
     * -0.16, -0.44, -0.91, -1.71, -3.29.
     */
    private static void symmetric(List<Case> out) {
        KnownSystem stagnation = Paths.near("flow to a point of stagnation 3d", 50, 0.04, 0.5, new double[][] {{0.1, 0.45, 0.2},
            {0.45, -0.2, 0.3}, {0.2, 0.3, -0.3}});
        out.add(new Case(stagnation, Look.exponential(12), Truth.STANDS));
        out.add(new Case(stagnation, Look.polynomial(2, 10), Truth.STANDS));
        out.add(new Case(stagnation, Look.gaussian(1, 10), Truth.NONE));
        double[][] listen = {{0.8, 0.1, 0.025, 0, 0.05}, {0.1, 0.75, 0.075, 0.05, 0}, {0.025, 0.075, 0.825, 0.05, 0},
            {0, 0.05, 0.05, 0.775, 0.1}, {0.05, 0, 0, 0.1, 0.825}};
        KnownSystem opinions = Paths.map("opinions that come together 5d", 24, 1, Paths.box(5, -1, 1), x -> Paths.times(listen, x));
        out.add(new Case(opinions, Look.linearKernel(5), Truth.STANDS));
        out.add(new Case(opinions, Look.monomials(1, 6), Truth.REPORTABLE));
        double[] conductance = {1, 1, 1, 0.3, 0.3, 0.3};
        double[][] a = new double[5][5];
        for (int i = 0; i < 5; i++) {
            a[i][i] = -conductance[i] - conductance[i + 1];
            if (i > 0) {
                a[i][i - 1] = conductance[i];
                a[i - 1][i] = conductance[i];
            }
        }
        KnownSystem rod = Paths.linear("rod of two metals 5d", 50, 0.1, a);
        out.add(new Case(rod, Look.linearKernel(5), Truth.STANDS));
        out.add(new Case(rod, Look.delays(3, 5), Truth.REPORTABLE));
    }

    /**
     * Three turns of planes that share axes, one after the other, and a shrinking by 0.985: an orthogonal matrix times a number, normal,
     * so the composition is normal in the dual space of the state and in the space of (1 + x·y)², whose norm no turn changes:
     * multipliers 0.985e^(±0.42i) and 0.985e^(±1.47i): stands. Delays hold both pairs.
     */
    private static void turns(List<Case> out) {
        KnownSystem turns = Paths.map("turns of planes that share axes 4d", 60, 1, Paths.box(4, -1, 1), x -> {
            double[] y = x.clone();
            turn(y, 0, 1, 0.5);
            turn(y, 2, 3, 1.3);
            turn(y, 1, 2, 0.7);
            for (int i = 0; i < 4; i++) {
                y[i] *= 0.985;
            }
            return y;
        });
        out.add(new Case(turns, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(turns, Look.delays(2, 4), Truth.REPORTABLE));
        out.add(new Case(turns, Look.step("polynomial", 15, "degree", 2, "offset", 1), Truth.STANDS));
    }

    private static void turn(double[] x, int first, int second, double angle) {
        double y = x[first] * cos(angle) - x[second] * sin(angle);
        x[second] = x[first] * sin(angle) + x[second] * cos(angle);
        x[first] = y;
    }

    /**
     * A rotor seen with its octave, {@code (cos θ, sin θ, 0.7 cos 2θ, 0.7 sin 2θ)}, 0.4 rad a step. On this curve {@code x·y = cos Δ + 0.49
     * cos 2Δ}, a function of the difference of the angles with a Fourier series of positive terms, and so is its exponential: e^(inθ) are
     * orthogonal, and n = ±1, ±2 are the signal: stands. Delays hold them: reportable.
     */
    private static void octave(List<Case> out) {
        KnownSystem rotor = Paths.closed("rotor seen with its octave 4d", 60, 1, Paths.box(1, 0, 2 * PI), (u, t) -> {
            double angle = u[0] + 0.4 * t;
            return new double[] {cos(angle), sin(angle), 0.7 * cos(2 * angle), 0.7 * sin(2 * angle)};
        });
        out.add(new Case(rotor, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(rotor, Look.step("exponential", 7, "rate", 1), Truth.STANDS));
        out.add(new Case(rotor, Look.delays(2, 4), Truth.REPORTABLE));
    }

    /**
     * Not normal, settles in the dual space of the state. An aircraft, speed, angle of attack, pitch rate and pitch: rates 0.02 ± 0.54i and
     * -1.36 ± 1.62i, overlaps 0.59 and 0.45, joint and solo weights 0.66 and 0.56 apart. A servo, position, speed and acceleration: -0.44,
     * -0.83 ± 1.58i, overlaps 0.73 and 0.79, weights 0.77 and more apart.
     */
    private static void vehicles(List<Case> out) {
        KnownSystem aircraft = Paths.linear("aircraft, slow and quick swing 4d", 90, 0.12, new double[][] {{-0.08, 0.3, 0, -0.9},
            {-0.5, -1.2, 1, 0}, {0.1, -2.6, -1.4, 0}, {0, 0, 1, 0}});
        out.add(new Case(aircraft, Look.linearKernel(4), Truth.SETTLES));
        out.add(new Case(aircraft, Look.delays(3, 4), Truth.REPORTABLE));
        KnownSystem servo = Paths.linear("servo, position to acceleration 3d", 60, 0.08, new double[][] {{0, 1, 0}, {0, 0, 1},
            {-1.4, -3.9, -2.1}});
        out.add(new Case(servo, Look.linearKernel(3), Truth.SETTLES));
        out.add(new Case(servo, Look.delays(4, 3), Truth.REPORTABLE));
    }

    /**
     * Two floors in units of energy, one of them with a damper: the damping is not shared. Rates -0.19 ± 0.87i and -0.61 ± 1.80i,
     * overlap 0.55, weights 0.61 and more apart: settles in the dual space of the state; delays hold both pairs.
     */
    private static void damper(List<Case> out) {
        KnownSystem floors = Paths.linear("two floors and one damper 4d", 80, 0.1, new double[][] {{0, 0, 1.4, 0}, {0, 0, -1.2, 1.2},
            {-1.4, 1.2, -1.6, 0}, {0, -1.2, 0, 0}});
        out.add(new Case(floors, Look.linearKernel(4), Truth.SETTLES));
        out.add(new Case(floors, Look.delays(3, 4), Truth.REPORTABLE));
    }

    /**
     * A spill in three pools, each fed by those above: rates -0.3, -0.75, -1.3, overlaps 0.74, 0.74 and 0.67 of the linear functions, in
     * the spaces of exp(x·y) and (1 + x·y)² as in the dual one (degree 1 has the same angles, other degrees are orthogonal to it); weights
     * 0.80 and more apart. Sums of degree 2 are -0.6, -1.05, -1.5, -1.6, -2.05, -2.6: no rate comes twice: settles.
     */
    private static void pools(List<Case> out) {
        KnownSystem pools = Paths.near("spill in three pools 3d", 50, 0.06, 0.8, new double[][] {{-0.3, 0, 0}, {0.5, -0.75, 0},
            {0.3, 0.7, -1.3}});
        out.add(new Case(pools, Look.exponential(14), Truth.SETTLES));
        out.add(new Case(pools, Look.polynomial(2, 10), Truth.SETTLES));
        out.add(new Case(pools, Look.monomials(1, 4), Truth.REPORTABLE));
    }

    /**
     * A saddle beside zero, {@code x' = A(x - c)}, rates 0.64 and -1.04: eigenfunctions {@code w·(x - c)} and their products. In the space
     * of (1 + x·y)² ‖w·x‖² = 1/2 for a unit w: the constant overlaps the first by {@code |w·c|/√(1/2 + (w·c)²) = 0.67}, the second
     * hardly; the two overlap each other by 0.37, weights are 0.47 and more apart: settles. Affine functions hold all of it: reportable.
     */
    private static void aside(List<Case> out) {
        double[][] a = {{0.5, 0.2}, {1.1, -0.9}};
        double[] c = {0.6, 0.4};
        KnownSystem moved = Paths.near("", 40, 0.04, 0.5, a);
        KnownSystem saddle = new KnownSystem("saddle beside zero 2d", 0.04, random -> {
            double[][] rows = moved.path().draw(random);
            for (double[] row : rows) {
                row[0] += c[0];
                row[1] += c[1];
            }
            return rows;
        });
        out.add(new Case(saddle, Look.polynomial(2, 6), Truth.SETTLES));
        out.add(new Case(saddle, Look.monomials(1, 3), Truth.REPORTABLE));
    }

    /**
     * Two decays whose product feeds a third, {@code x' = -0.4x, y' = -0.7y, z' = -2.5z + 1.87xy}: entire eigenfunctions x, y, xy (-1.1)
     * and {@code z - bxy}, {@code b = 1.87/(2.5 - 1.1) = 1.33}; no other rate of degree 3 or less is -2.5. In the space of (1 + x·y)²
     * ‖xy‖² = ‖z‖² = 1/2, so z - bxy overlaps xy by {@code b/√(1 + b²) = 0.80}, and its solo weight is {@code 1/(1 + b²) = 0.36} against 1;
     * 1, x, y, z, xy, x², y² are carried into themselves, so the projection adds nothing to what holds the signal: settles. Monomials up
     * to degree 2 hold all of them.
     */
    private static void fed(List<Case> out) {
        KnownSystem third = Paths.closed("product of two decays feeds a third 3d", 50, 0.04, Paths.box(3, -0.7, 0.7), (u, t) -> {
            double x = u[0] * exp(-0.4 * t);
            double y = u[1] * exp(-0.7 * t);
            return new double[] {x, y, 4.0 / 3 * x * y + (u[2] - 4.0 / 3 * u[0] * u[1]) * exp(-2.5 * t)};
        });
        out.add(new Case(third, Look.polynomial(2, 10), Truth.SETTLES));
        out.add(new Case(third, Look.monomials(2, 10), Truth.REPORTABLE));
    }

    /**
     * A spiral, bent by {@code y = v + x²}: {@code z = x + i(y - x²)} is entire, rate -0.2 + 1.3i, and so are its powers and products with
     * its conjugate; {@code x = Re z, y = Im z + (z² + 2|z|² + z̄²)/4}. Monomials up to degree 4 hold all of these: reportable. They do not
     * hold what else they are carried into, which has no part in x or y.
     */
    private static void bent(List<Case> out) {
        KnownSystem spiral = Paths.closed("bent spiral 2d", 60, 0.07, Paths.box(2, -0.8, 0.8), (u, t) -> {
            double x = exp(-0.2 * t) * (u[0] * cos(1.3 * t) - u[1] * sin(1.3 * t));
            double v = exp(-0.2 * t) * (u[0] * sin(1.3 * t) + u[1] * cos(1.3 * t));
            return new double[] {x, v + x * x};
        });
        out.add(new Case(spiral, Look.monomials(4, 15), Truth.REPORTABLE));
    }

    /**
     * A stock and its orders, from week to week: multipliers 0.85 ± 0.33i, overlap and distance of the weights 0.72, in the dual space of
     * the state and in that of (1 + x·y)²: settles.
     */
    private static void stock(List<Case> out) {
        KnownSystem stock = Paths.map("stock and orders", 36, 1, Paths.box(2, -1, 1), x -> new double[] {0.95 * x[0] + 0.8 * x[1],
            -0.15 * x[0] + 0.75 * x[1]});
        out.add(new Case(stock, Look.linearKernel(2), Truth.SETTLES));
        out.add(new Case(stock, Look.delays(3, 2), Truth.REPORTABLE));
        out.add(new Case(stock, Look.step("polynomial", 6, "degree", 2, "offset", 1), Truth.SETTLES));
    }

    /**
     * Periodic waveforms of one period whatever their size, held by delays that reach over it: reportable. A saw-tooth of 11 samples: mean
     * 0 and five pairs, {@code 1/sin(πn/11)}, nothing else. A tone of 1.1 rad/s that is clipped at 1, sizes 1.4 to 2.4: the third
     * harmonic is 0.22 of the first, both leave 0.3 % of the power. A gear
     * with a play of ±0.4 that is turned to and fro, sizes 1 to 2: it stands still after each turn back: the first
     * harmonic leaves 1 % of the power.
     */
    private static void waveforms(List<Case> out) {
        out.add(new Case(Paths.closed("saw-tooth of 11 samples", 80, 1, Paths.box(1, 0, 11), (u, t) -> new double[] {
            (floor(u[0]) + t) % 11 / 5 - 1}), Look.delays(14, 10), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("clipped tone of many sizes", 110, 0.3, Paths.box(2, 0, 1), (u, t) -> new double[] {
            max(-1, min(1, (1.4 + u[0]) * cos(1.1 * t + 2 * PI * u[1])))}), Look.delays(24, 4), Truth.REPORTABLE));
        out.add(new Case(new KnownSystem("gear with play", 0.25, random -> {
            double size = 1 + random.nextDouble();
            double phase = 2 * PI * random.nextDouble();
            double y = 0;
            double[][] rows = new double[110][];
            for (int k = -60; k < rows.length; k++) {
                double x = size * cos(1.2 * 0.25 * k + phase);
                y = max(x - 0.4, min(x + 0.4, y));
                if (k >= 0) {
                    rows[k] = new double[] {y};
                }
            }
            return rows;
        }), Look.delays(26, 2), Truth.REPORTABLE));
    }

    /**
     * Lines, held by delays: reportable. A carrier of 3 rad/s whose size follows a tone of 0.6: 3, 2.4, 3.6. A bell whose two shapes are
     * close, -0.04 ± 3i and -0.07 ± 3.7i. A pointer that settles while its bench swings: -0.45 and ±1.5i.
     */
    private static void lines(List<Case> out) {
        out.add(new Case(Paths.closed("carrier with a programme", 150, 0.25, Paths.box(2, 0, 2 * PI), (u, t) -> new double[] {
            (1 + 0.9 * cos(0.6 * t + u[0])) * cos(3 * t + u[1])}), Look.delays(40, 6), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("bell whose two shapes are close", 140, 0.2, Paths.box(4, 0.5, 1), (u, t) -> new double[] {
            u[0] * exp(-0.04 * t) * cos(3 * t + 13 * u[2]) + u[1] * exp(-0.07 * t) * cos(3.7 * t + 13 * u[3])}),
                Look.delays(36, 4), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("pointer on a swinging bench", 90, 0.12, Paths.box(3, 0.5, 1.5), (u, t) -> new double[] {
            2 * u[0] * exp(-0.45 * t) + u[1] * cos(1.5 * t + 7 * u[2])}), Look.delays(34, 3), Truth.REPORTABLE));
    }

    /**
     * One closed orbit, begun anywhere on it, held by delays that reach over a period: reportable. A pendulum that swings to 2.2 rad:
     * ±0.70i, third harmonic 4 %. Toda's bond, {@code x'' = 1 - e^x} (Physics Reports 18:1, 1975), from 1.6: mean, ±0.83i, second
     * harmonic 16 %, third 4 %. A clockwork, {@code x'' = (1 - x²)x' - x + 1.5 cos 1.1t}, that keeps
     * the time of its drive: ±1.1i, third harmonic 13 %. Herbivores that graze last year's growth, {@code x(k+1) = 2.1x(k)(1 - x(k-1))}
     * (Maynard Smith,
     * Mathematical Ideas in Biology, 1968), on their closed curve: mean,
     * 0.98 rad a step, second harmonic 17 %.
     */
    private static void orbits(List<Case> out) {
        out.add(new Case(Paths.orbit("pendulum, one wide swing", 110, 0.25, 9.5, 1, new double[] {2.2, 0}, x -> new double[] {x[1], -sin(x[0])}),
                Look.delays(36, 4), Truth.REPORTABLE));
        out.add(new Case(Paths.orbit("Toda bond, one orbit", 110, 0.25, 7.3, 1, new double[] {1.6, 0}, x -> new double[] {x[1], 1 - exp(x[0])}),
                Look.delays(30, 5), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("clockwork that keeps the time of its drive", 110, 0.25, 120, 1, random -> {
            double phase = 2 * PI * random.nextDouble();
            return new double[] {random.nextDouble(), 0, cos(phase), sin(phase)};
        }, x -> new double[] {x[1], (1 - x[0] * x[0]) * x[1] - x[0] + 1.5 * x[2], -1.1 * x[3], 1.1 * x[2]}),
                Look.delays(24, 4), Truth.REPORTABLE));
        out.add(new Case(new KnownSystem("grazers of last year's growth", 1, random -> {
            double[] x = {0.4 + 0.2 * random.nextDouble(), 0.5};
            double[][] rows = new double[90][];
            for (int k = -600 - random.nextInt(60); k < rows.length; k++) {
                x = new double[] {2.1 * x[0] * (1 - x[1]), x[0]};
                if (k >= 0) {
                    rows[k] = new double[] {x[0]};
                }
            }
            return rows;
        }), Look.delays(14, 5), Truth.REPORTABLE));
    }

    /**
     * Three tuning forks, 0.7, 1.3 and 2.1 rad a step, positions only, mixed by no one: w·x are three-dimensional, the best multiplier of a
     * fork is cos ω, real, and misses by sin ω, 0.64, 0.96, 0.86; a mixture misses by no less: absent. Delays hold the pairs: reportable.
     */
    private static void forks(List<Case> out) {
        KnownSystem forks = Paths.closed("three tuning forks, positions", 70, 1, Paths.box(6, 0.5, 1), (u, t) -> new double[] {
            u[0] * cos(0.7 * t + 13 * u[3]), u[1] * cos(1.3 * t + 13 * u[4]), u[2] * cos(2.1 * t + 13 * u[5])});
        out.add(new Case(forks, Look.linearKernel(3), Truth.ABSENT));
        out.add(new Case(forks, Look.delays(4, 6), Truth.REPORTABLE));
    }

    /**
     * Two decays whose product feeds a third of just the sum of their rates, {@code x' = -0.3x, y' = -0.5y, z' = -0.8z + 1.4xy}: {@code z =
     * (z0 + 1.4x0y0 t)e^(-0.8t)}. On xy and z the generator is a Jordan block, no eigenfunction reaches z: drifts, in the space of exp(x·y)
     * as on monomials.
     */
    private static void atResonance(List<Case> out) {
        KnownSystem third = Paths.closed("product at resonance 3d", 50, 0.07, Paths.box(3, -1, 1), (u, t) -> new double[] {
            u[0] * exp(-0.3 * t), u[1] * exp(-0.5 * t), (u[2] + 1.4 * u[0] * u[1] * t) * exp(-0.8 * t)});
        out.add(new Case(third, Look.exponential(16), Truth.DRIFTS));
        out.add(new Case(third, Look.monomials(2, 10), Truth.DRIFTS));
    }

    /**
     * Equal rates without a second eigenvector: drifts. Cells and their mutants, both grow by 0.4 and some of the first turn into the
     * second, 0.6. A smoothing by 0.7 three times over, one Jordan block of three.
     */
    private static void equal(List<Case> out) {
        KnownSystem mutants = Paths.near("cells and their mutants 2d", 50, 0.04, 0.5, new double[][] {{0.4, 0}, {0.6, 0.4}});
        out.add(new Case(mutants, Look.exponential(6), Truth.DRIFTS));
        out.add(new Case(mutants, Look.linearKernel(2), Truth.DRIFTS));
        out.add(new Case(mutants, Look.polynomial(2, 6), Truth.DRIFTS));
        double[][] smooth = {{0.7, 0, 0}, {0.3, 0.7, 0}, {0, 0.3, 0.7}};
        KnownSystem smoothing = Paths.map("smoothing three times over", 20, 1, Paths.box(3, -1, 1), x -> Paths.times(smooth, x));
        out.add(new Case(smoothing, Look.linearKernel(3), Truth.DRIFTS));
        out.add(new Case(smoothing, Look.monomials(1, 4), Truth.DRIFTS));
    }

    /**
     * Carried along and swinging: rates ±iω, which are modes, and a double 0 with one eigenvector that holds most of the signal: the worst
     * of the two drifts. A crane that travels while its load swings (1.6). An electron in crossed fields: a circle that is
     * carried along at an even speed, ±2i.
     */
    private static void travelling(List<Case> out) {
        KnownSystem crane = Paths.linear("crane with a swinging load 4d", 60, 0.1, new double[][] {{0, 1, 0.4, 0}, {0, 0, 0, 0},
            {0, 0, 0, 1.6}, {0, 0.3, -1.6, 0}});
        out.add(new Case(crane, Look.linearKernel(4), Truth.DRIFTS));
        out.add(new Case(crane, Look.delays(4, 4), Truth.DRIFTS));
        out.add(new Case(crane, Look.monomials(1, 5), Truth.DRIFTS));
        out.add(new Case(Paths.closed("electron in crossed fields", 70, 0.12, Paths.box(4, -1, 1), (u, t) -> new double[] {
            u[0] + 0.6 * u[1] * t + 0.7 * cos(2 * t + PI * u[2]), 0.7 * sin(2 * t + PI * u[2])}), Look.delays(24, 4), Truth.DRIFTS));
    }

    /**
     * A drop that evaporates, {@code r' = -0.3/r, r² = r0² - 0.6t}: eigenfunctions {@code e^(b r²)} of the rate -0.6b for every b, in the
     * space of exp(xy) while |b| < 1/2 (C3.2): over-complete, even, and r is odd: no mode holds it. Nothing to report.
     */
    private static void drop(List<Case> out) {
        KnownSystem drop = Paths.closed("drop that evaporates", 50, 0.05, Paths.box(1, 1.6, 3.2),
                (u, t) -> new double[] {sqrt(u[0] - 0.6 * t)});
        out.add(new Case(drop, Look.exponential(8), Truth.NONE));
    }

    /**
     * Paths that lead from rest to rest. A population too thin to grow, {@code 1.5x(1 - x)(x - 0.3)}: absent from the space of exp(xy)
     * (C3.4), starts on both sides of 0.3. Three cells in a row that take sides, {@code x' = x - x³} and 0.2 of the difference to the next:
     * 0 is a source (1, 0.8, 0.4), what leaves it fills an open set and ends at rests, so it is bounded in past and future: an entire
     * eigenfunction of a rate with a real part is 0 there, one of an imaginary rate has a limit and is 0 too, one of rate 0 is constant:
     * none. Nothing to report on cubic polynomials either.
     */
    private static void rests(List<Case> out) {
        out.add(new Case(Paths.flow("population too thin to grow", 50, 0.07, 0, 1, Paths.box(1, 0.04, 1.1), x -> new double[] {
            1.5 * x[0] * (1 - x[0]) * (x[0] - 0.3)}), Look.exponential(8), Truth.ABSENT));
        KnownSystem sides = Paths.flow("three cells that take sides", 60, 0.06, 0, 3, Paths.box(3, -1.4, 1.4), x -> new double[] {
            x[0] - x[0] * x[0] * x[0] + 0.2 * (x[1] - x[0]), x[1] - x[1] * x[1] * x[1] + 0.2 * (x[0] - 2 * x[1] + x[2]),
            x[2] - x[2] * x[2] * x[2] + 0.2 * (x[1] - x[2])});
        out.add(new Case(sides, Look.exponential(12), Truth.NONE));
        out.add(new Case(sides, Look.monomials(3, 20), Truth.NONE));
    }

    /**
     * A reed that is blown, {@code x'' = 0.9(x' - x'³) - x} (Rayleigh, Theory of Sound, 1877), off its cycle: within it all paths come from
     * the source at 0, rates 0.45 ± 0.89i, and stay bounded: an entire eigenfunction of a positive real part would grow without bound, of a
     * negative one be infinite at the source, of none, be the constant, as 0 has no imaginary rate of its own: none; how well a
     * projection imitates the turn hangs on the share of the cycle in the runs: nothing to report.
     */
    private static void reed(List<Case> out) {
        out.add(new Case(Paths.flow("reed that is blown, off its cycle", 70, 0.1, 0, 2, Paths.box(2, -0.7, 0.7), x -> new double[] {x[1],
            0.9 * (x[1] - x[1] * x[1] * x[1]) - x[0]}), Look.exponential(10), Truth.NONE));
    }

    /**
     * A continuous range of frequencies, no isolated one: nothing to report. Toda bonds that are let go at 0.5 to 3.5: periods 6.4 to
     * 16.6. A spring
     * whose mass nears the speed of light, {@code x' = p/√(1 + p²), p' = -x}, from 1 to 6: periods 7.4 to 24.7. Swings in a funnel,
     * {@code x'' = -x/|x|²}
     * in the plane, from 0.5 to 2: periods in proportion.
     */
    private static void ensembles(List<Case> out) {
        KnownSystem bonds = Paths.flow("Toda bonds, many energies", 120, 0.2, 0, 2, random -> new double[] {0.5 + 3 * random.nextDouble(), 0},
                x -> new double[] {x[1], 1 - exp(x[0])});
        out.add(new Case(bonds, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(bonds, Look.delays(12, 6), Truth.NONE));
        out.add(new Case(Paths.flow("spring near the speed of light", 120, 0.3, 0, 2, random -> new double[] {1 + 5 * random.nextDouble(), 0},
                x -> new double[] {x[1] / sqrt(1 + x[1] * x[1]), -x[0]}), Look.delays(12, 6), Truth.NONE));
        out.add(new Case(Paths.flow("swings in a funnel", 120, 0.15, 0, 2, random -> {
            double r = 0.5 + 1.5 * random.nextDouble();
            double angle = 2 * PI * random.nextDouble();
            double speed = 0.6 + 0.8 * random.nextDouble();
            return new double[] {r * cos(angle), r * sin(angle), -speed * sin(angle), speed * cos(angle)};
        }, x -> {
            double square = x[0] * x[0] + x[1] * x[1];
            return new double[] {x[2], x[3], -x[0] / square, -x[1] / square};
        }), Look.delays(10, 8), Truth.NONE));
    }

    /**
     * Angles in turns, looked at by harmonics. Turntables of 0.05 to 0.35 of a turn a step, each its own: every harmonic has as many
     * multipliers as there are tables. A needle that is drawn north without a swing, {@code tan πθ} falls by e^(-t): powers of that are the
     * only eigenfunctions, they have poles or kinks at south or north and a rate of any size. Nothing to report. A counter that rolls over,
     * 0.04 to 0.14 a step: the same as the turntables, by delays.
     */
    private static void turntables(List<Case> out) {
        out.add(new Case(Paths.closed("turntables of many speeds", 60, 1, Paths.box(2, 0, 1), (u, t) -> new double[] {
            (u[0] + (0.05 + 0.3 * u[1]) * t) % 1}), Look.fourier(2), Truth.NONE));
        out.add(new Case(Paths.closed("needle that is drawn north", 60, 0.06, Paths.box(1, 0, 1), (u, t) -> new double[] {
            (1 + atan(tan(PI * u[0]) * exp(-t)) / PI) % 1}), Look.fourier(3), Truth.NONE));
        out.add(new Case(Paths.closed("counters that roll over", 120, 1, Paths.box(2, 0, 1), (u, t) -> new double[] {
            (u[0] + (0.04 + 0.1 * u[1]) * t) % 1}), Look.delays(14, 7), Truth.NONE));
    }

    /**
     * A siren that drives past at a random time: its pitch falls from 4.3 to 1.7 rad/s, phase {@code 3t - 1.4√(9 + (t - t0)²)}: no
     * frequency.
     */
    private static void passing(List<Case> out) {
        out.add(new Case(Paths.closed("siren that drives past", 140, 0.1, Paths.box(2, 0, 1), (u, t) -> {
            double late = t - 4 - 6 * u[0];
            return new double[] {cos(3 * t - 1.4 * sqrt(9 + late * late) + 2 * PI * u[1])};
        }), Look.delays(14, 6), Truth.NONE));
    }

    /**
     * Chaos. The map sin πx: one hump, full, exponent 0.69. A number times 1.7, the whole part dropped: mixing with a density (Renyi, Acta
     * Mathematica Hungarica 8:477, 1957), no eigenvalue but 1. A double well that is shaken, {@code x'' = -0.25x' + x - x³ + 0.4 cos t},
     * seen once a period: autocorrelations -0.32, 0.16, then below 0.06. A flow of five terms, {@code (yz, x - y, 1 - xy)} (Sprott,
     * Physical Review E 50:R647, 1994): autocorrelations
     * below 0.46 from 4 on and below 0.2 from 8 on.
     * Nothing to report.
     */
    private static void chaos(List<Case> out) {
        out.add(new Case(Paths.map("one hump of a sine", 80, 1, Paths.box(1, 0.02, 0.98), x -> new double[] {sin(PI * x[0])}),
                Look.monomials(4, 5), Truth.NONE));
        out.add(new Case(Paths.map("1.7 times, whole part dropped", 80, 1, Paths.box(1, 0.01, 0.99), x -> new double[] {1.7 * x[0] % 1}),
                Look.monomials(4, 5), Truth.NONE));
        out.add(new Case(Paths.flow("double well, shaken, seen once a period", 100, 2 * PI, 40 * PI, 2, random -> new double[] {
            2 * random.nextDouble() - 1, 2 * random.nextDouble() - 1, 1, 0}, x -> new double[] {x[1],
            -0.25 * x[1] + x[0] - x[0] * x[0] * x[0] + 0.4 * x[2], -x[3], x[2]}), Look.delays(3, 6), Truth.NONE));
        out.add(new Case(Paths.flow("Sprott flow of five terms", 150, 0.25, 60, 3, Paths.box(3, -0.5, 0.5), x -> new double[] {x[1] * x[2],
            x[0] - x[1], 1 - x[0] * x[1]}), Look.delays(6, 8), Truth.NONE));
    }

    /**
     * No memory that a function of the look could carry. A die: independent throws. The difference of a noise to the one before: its
     * mean is
     * 0 two steps ahead, its only eigenvalue is 0, as of a moving average. Two gauges of one noise, each with half as much of its own:
     * alike
     * at one time, independent from one to the next. Absent.
     */
    private static void white(List<Case> out) {
        out.add(new Case(Paths.chance("a die", 130, 1, random -> () -> 1 + random.nextInt(6)), Look.monomials(2, 3), Truth.ABSENT));
        out.add(new Case(Paths.chance("differences of noise", 140, 0.1, random -> {
            double[] last = {random.nextGaussian()};
            return () -> {
                double before = last[0];
                last[0] = random.nextGaussian();
                return last[0] - before;
            };
        }), Look.delays(6, 4), Truth.ABSENT));
        out.add(new Case(new KnownSystem("two gauges of one noise", 0.1, random -> Stream.generate(() -> {
            double common = random.nextGaussian();
            return new double[] {common + 0.5 * random.nextGaussian(), common + 0.5 * random.nextGaussian()};
        }).limit(130).toArray(double[][]::new)), Look.delays(4, 4), Truth.ABSENT));
    }

    /**
     * Paths that miss their mean motion by most of their size over its own time, as Ornstein-Uhlenbeck in {@link NoModes}: nothing to
     * report. A walk of 0.25 a step that two walls at ±1 throw back: 0.93 a step. Guests, 0.4 come and a twentieth of those present leave a
     * step: 0.95. A walk on a sphere, 0.3 a step to every side: 0.91. A machine of three levels that goes on to the next, 0 to 1 to 2.3 and
     * back, with 0.15 a step: 0.78 ± 0.13i.
     */
    private static void chains(List<Case> out) {
        out.add(new Case(Paths.chance("walk between two walls", 140, 0.1, random -> {
            double[] x = {2 * random.nextDouble() - 1};
            return () -> {
                double y = abs((x[0] + 0.25 * random.nextGaussian() + 7) % 4 - 2) - 1;
                x[0] = y;
                return y;
            };
        }), Look.delays(6, 4), Truth.NONE));
        out.add(new Case(Paths.chance("guests that come and go", 140, 1, random -> {
            double[] n = {5 + random.nextInt(7)};
            return () -> {
                double leave = 0;
                for (int i = 0; i < n[0]; i++) {
                    leave += random.nextDouble() < 0.05 ? 1 : 0;
                }
                n[0] += (random.nextDouble() < 0.4 ? 1 : 0) - leave;
                return n[0];
            };
        }), Look.delays(6, 4), Truth.NONE));
        out.add(new Case(new KnownSystem("walk on a sphere", 0.1, random -> {
            double[][] rows = new double[140][];
            double[] x = unit(new double[] {random.nextGaussian(), random.nextGaussian(), random.nextGaussian()});
            for (int k = 0; k < rows.length; k++) {
                rows[k] = x;
                x = unit(new double[] {x[0] + 0.3 * random.nextGaussian(), x[1] + 0.3 * random.nextGaussian(),
                    x[2] + 0.3 * random.nextGaussian()});
            }
            return rows;
        }), Look.monomials(1, 4), Truth.NONE));
        out.add(new Case(Paths.chance("machine of three levels", 140, 1, random -> {
            double[] levels = {0, 1, 2.3};
            int[] at = {random.nextInt(3)};
            return () -> {
                at[0] = random.nextDouble() < 0.15 ? (at[0] + 1) % 3 : at[0];
                return levels[at[0]];
            };
        }), Look.monomials(2, 3), Truth.NONE));
    }

    private static double[] unit(double[] x) {
        double size = sqrt(x[0] * x[0] + x[1] * x[1] + x[2] * x[2]);
        return new double[] {x[0] / size, x[1] / size, x[2] / size};
    }
}
