package org.modestead.engine.battery;

import static java.lang.StrictMath.PI;
import static java.lang.StrictMath.abs;
import static java.lang.StrictMath.atan;
import static java.lang.StrictMath.cos;
import static java.lang.StrictMath.exp;
import static java.lang.StrictMath.log;
import static java.lang.StrictMath.pow;
import static java.lang.StrictMath.sin;
import static java.lang.StrictMath.sqrt;
import static java.lang.StrictMath.tan;
import static java.lang.StrictMath.tanh;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;

/**
 * The fourth calibration part: it was the reporting part until rules were changed after it had been seen. Systems of the kinds of the first parts
 * with other parameters, ranges and sampling, and some of other kinds. Overlaps and harmonics that are not in closed form were
 * computed by another program.
 */
final class Fourth {

    private Fourth() {}

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        plane(out);
        leaning(out);
        space(out);
        cascades(out);
        line(out);
        nonlinearLine(out);
        manifolds(out);
        cycles(out);
        oscillators(out);
        waves(out);
        diffusion(out);
        sums(out);
        defective(out);
        chaos(out);
        chance(out);
        jumps(out);
        return out;
    }

    /**
     * As in {@link LinearFlows}, all normal: a light spiral -0.12 ± 1.8i; a symmetric matrix that is not diagonal, rates -0.35 and -0.95 along
     * axes turned by 30° (sums of degree 2 are -0.7, -1.3, -1.9: none is a rate): stands. Gaussian: at a fixed point that draws all starts an
     * eigenfunction that is analytic starts with an eigenfunction of the linear part, here it is that polynomial, and the space holds no
     * polynomial (C3.12): nothing to report.
     */
    private static void plane(List<Case> out) {
        KnownSystem spiral = Paths.linear("light spiral 2d", 70, 0.09, new double[][] {{-0.12, 1.8}, {-1.8, -0.12}});
        out.add(new Case(spiral, Look.exponential(6), Truth.STANDS));
        out.add(new Case(spiral, Look.polynomial(3, 10), Truth.STANDS));
        double off = 0.6 * sqrt(3) / 4;
        KnownSystem turned = Paths.linear("turned decays 2d", 55, 0.06, new double[][] {{-0.5, off}, {off, -0.8}});
        out.add(new Case(turned, Look.linearKernel(2), Truth.STANDS));
        out.add(new Case(turned, Look.monomials(2, 6), Truth.REPORTABLE));
        out.add(new Case(turned, Look.gaussian(1, 8), Truth.NONE));
    }

    /**
     * Left eigenvectors (1, 0.5) of -0.3 and (0.2, 1) of -1.3: overlap 0.61 in the spaces of exp(x·y) and x·y, joint and solo weights 0.61
     * apart, sums of degree 2 are -0.6, -1.6, -2.6: settles. A spiral around (0.9, -0.8), A normal: eigenfunctions {@code z - z*} and its
     * conjugate, {@code z = x + iy}. In the space of exp(x·y) {@code ‖z - z*‖² = 2 + |z*|²} with {@code |z*|² = 1.45}, so they overlap by
     * {@code 1.45/3.45 = 0.42}, with the constant by 0.65, and the solo weight is {@code 1/3.45 = 0.29} against 1/2: not normal, as x' = ax +
     * b is not (C3.4): settles. Delays hold the rates 0 and -0.2 ± 1.2i.
     */
    private static void leaning(List<Case> out) {
        KnownSystem crossed = Paths.linear("crossed decays 2d", 50, 0.06, new double[][] {{-17 / 90.0, 5 / 9.0}, {-2 / 9.0, -127 / 90.0}});
        out.add(new Case(crossed, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(crossed, Look.linearKernel(2), Truth.SETTLES));
        out.add(new Case(crossed, Look.delays(5, 2), Truth.REPORTABLE));
        KnownSystem around = Paths.closed("spiral around a point 2d", 60, 0.09, Paths.box(2, -1, 1), (x, t) -> {
            double u = (x[0] - 0.9) * exp(-0.2 * t);
            double v = (x[1] + 0.8) * exp(-0.2 * t);
            return new double[] {0.9 + u * cos(1.2 * t) + v * sin(1.2 * t), -0.8 - u * sin(1.2 * t) + v * cos(1.2 * t)};
        });
        out.add(new Case(around, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(around, Look.delays(6, 3), Truth.REPORTABLE));
    }

    /**
     * Normal, so stands in the dual space of the state: precession about the axis (0.6, 0.9, 1.2) is skew, rates 0 (the part along the
     * axis, which differs from run to run) and ±1.62i; six tanks in a ring, each fed by the one before it, are a circulant matrix, whose
     * eigenvectors are the Fourier vectors, rates {@code -0.7 + 0.6 e^(-πik/3)}: -0.1, -0.4 ± 0.52i, -1 ± 0.52i, -1.3, all different. Three
     * equal masses between walls (C4.4), positions only: six exponentials -0.03 ± 0.76i, ± 1.41i, ± 1.85i in three channels.
     */
    private static void space(List<Case> out) {
        KnownSystem precession = Paths.linear("precession 3d", 65, 0.1, new double[][] {{0, -1.2, 0.9}, {1.2, 0, -0.6}, {-0.9, 0.6, 0}});
        out.add(new Case(precession, Look.linearKernel(3), Truth.STANDS));
        double[][] ring = new double[6][6];
        for (int i = 0; i < 6; i++) {
            ring[i][i] = -0.7;
            ring[i][(i + 5) % 6] = 0.6;
        }
        KnownSystem tanks = Paths.linear("ring of tanks 6d", 60, 0.07, ring);
        out.add(new Case(tanks, Look.linearKernel(6), Truth.STANDS));
        KnownSystem masses = Paths.flow("three masses, positions", 100, 0.2, 0, 3, Paths.box(6, -1, 1), x -> new double[] {x[3], x[4], x[5],
            x[1] - 2 * x[0] - 0.06 * x[3], x[0] - 2 * x[1] + x[2] - 0.06 * x[4], x[1] - 2 * x[2] - 0.06 * x[5]});
        out.add(new Case(masses, Look.delays(5, 6), Truth.REPORTABLE));
    }

    /**
     * Not normal. Three tanks, each emptied into the next: rates -0.9, -0.5, -0.2, each left eigenvector overlaps another by 0.91, joint and
     * solo weights are 0.94 and more apart; sums of degree 2 are -0.4, -0.7, -1, -1.1, -1.4, -1.8. Three rotations, the third drives both
     * others with 2.2 and 1.6: overlaps with those of other speeds 0.47 to 0.55, joint and solo weights 0.53 to 0.68 apart: settles in the
     * dual space of the state.
     */
    private static void cascades(List<Case> out) {
        KnownSystem tanks = Paths.linear("tanks in a row 3d", 60, 0.1, new double[][] {{-0.9, 0, 0}, {0.9, -0.5, 0}, {0, 0.5, -0.2}});
        out.add(new Case(tanks, Look.linearKernel(3), Truth.SETTLES));
        out.add(new Case(tanks, Look.monomials(2, 10), Truth.REPORTABLE));
        double[][] a = new double[6][6];
        double[] speeds = {0.9, 1.7, 2.9};
        double[] damping = {0.07, 0.1, 0.12};
        for (int k = 0; k < 3; k++) {
            a[2 * k][2 * k] = -damping[k];
            a[2 * k + 1][2 * k + 1] = -damping[k];
            a[2 * k][2 * k + 1] = speeds[k];
            a[2 * k + 1][2 * k] = -speeds[k];
        }
        a[0][4] = 2.2;
        a[3][5] = 1.6;
        KnownSystem driven = Paths.linear("one rotation drives two 6d", 75, 0.12, a);
        out.add(new Case(driven, Look.linearKernel(6), Truth.SETTLES));
        out.add(new Case(driven, Look.delays(5, 6), Truth.REPORTABLE));
    }

    private interface Solution {
        double at(double start, double time);
    }

    private static KnownSystem line(String name, double low, double high, Solution solution) {
        return Paths.closed(name, 51, 0.03, Paths.box(1, low, high), (x, t) -> new double[] {solution.at(x[0], t)});
    }

    /**
     * As in {@link LineFlows}. For x' = -0.9x - 0.5 the function is x + 5/9, its solo weight against 1 is {@code 1/(1 + 25/81) = 0.76} for
     * exp(xy) and {@code (1/3)/(1/3 + 25/81) = 0.52} for (1 + xy)^3: settles. x' = 0.5: e^(λx) without end in exp(xy),
     * nilpotent on polynomials: drifts.
     */
    private static void line(List<Case> out) {
        KnownSystem decay = line("x'=-0.45x", -1.3, 1.3, (x, t) -> x * exp(-0.45 * t));
        out.add(new Case(decay, Look.exponential(6), Truth.STANDS));
        out.add(new Case(decay, Look.polynomial(4, 5), Truth.STANDS));
        KnownSystem affine = line("x'=-0.9x-0.5", -1, 1, (x, t) -> (x + 5 / 9.0) * exp(-0.9 * t) - 5 / 9.0);
        out.add(new Case(affine, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(affine, Look.polynomial(3, 4), Truth.SETTLES));
        KnownSystem translation = line("x'=0.5", -1, 0.5, (x, t) -> x + 0.5 * t);
        out.add(new Case(translation, Look.exponential(6), Truth.DRIFTS));
        out.add(new Case(translation, Look.polynomial(4, 5), Truth.DRIFTS));
    }

    /**
     * None has an entire eigenfunction but the constant: absent from the space of exp(xy). {@code (1 + x²)/2}: {@code e^(2λ atan x)},
     * singular at ±i (C3.4; until the end of a run x stays below 2.7); on an interval that is one for every λ, no one of them the mode, and
     * none is a polynomial: nothing to report. {@code -1.1x^5}: {@code exp(λ/(4.4x⁴))}, an essential singularity at 0, amid the data.
     * {@code 1.5(x - x³)}: at 0 an analytic one has a rate 1.5n, at ±1 a rate -3m, n, m = 0, 1, ...: both only for 0. {@code 1.6x(1 - x/1.3)}:
     * the same, 1.6n and -1.6m. {@code -x ln x}: {@code (ln x)^n} at x = 1, singular at 0, close to the starts.
     */
    private static void nonlinearLine(List<Case> out) {
        KnownSystem tangent = line("x'=(1+x^2)/2", -1.2, 0.5, (x, t) -> tan(atan(x) + 0.5 * t));
        out.add(new Case(tangent, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(tangent, Look.monomials(5, 6), Truth.NONE));
        KnownSystem fifth = line("x'=-1.1x^5", -1.2, 1.2, (x, t) -> x / pow(1 + 4.4 * x * x * x * x * t, 0.25));
        out.add(new Case(fifth, Look.exponential(8), Truth.ABSENT));
        KnownSystem bistable = line("x'=1.5(x-x^3)", -1.5, 1.5, (x, t) -> x * exp(1.5 * t) / sqrt(1 + x * x * (exp(3 * t) - 1)));
        out.add(new Case(bistable, Look.exponential(8), Truth.ABSENT));
        KnownSystem logistic = line("x'=1.6x(1-x/1.3)", 0.05, 1.8, (x, t) -> x * exp(1.6 * t) / (1 + x / 1.3 * (exp(1.6 * t) - 1)));
        out.add(new Case(logistic, Look.exponential(8), Truth.ABSENT));
        KnownSystem gompertz = line("x'=-x ln x", 0.05, 2.4, (x, t) -> exp(log(x) * exp(-t)));
        out.add(new Case(gompertz, Look.exponential(8), Truth.ABSENT));
    }

    /**
     * Slow manifolds of other shapes. {@code x1' = -0.3x1, x2' = -1.9(x2 - x1³)}: x1, x1³ (-0.9) and x2 - bx1³ (-1.9), {@code b = 1.9}; in
     * the space of exp(x·y) ‖x1³‖² = 6, overlap {@code √6 b/√(1 + 6b²) = 0.98}, solo weight {@code 1/(1 + 6b²) = 0.04} against 1: settles.
     * A bowl, {@code z' = x² + y² - z} over the spiral -0.15 ± 1.3i: x ± iy, r² (-0.3) and z - br² (-1), {@code b = 1/0.7}; ‖r²‖² = 4, overlap
     * {@code 2b/√(1 + 4b²) = 0.94}, solo weight {@code 1/(1 + 4b²) = 0.11}: settles. No rate that carries the signal is that of another
     * monomial up to degree 3 but its own.
     */
    private static void manifolds(List<Case> out) {
        KnownSystem cubic = Paths.closed("cubic slow manifold", 60, 0.06, Paths.box(2, -1, 1), (x, t) -> {
            double cube = 1.9 * x[0] * x[0] * x[0];
            return new double[] {x[0] * exp(-0.3 * t), (x[1] - cube) * exp(-1.9 * t) + cube * exp(-0.9 * t)};
        });
        out.add(new Case(cubic, Look.exponential(12), Truth.SETTLES));
        out.add(new Case(cubic, Look.monomials(3, 10), Truth.REPORTABLE));
        KnownSystem bowl = Paths.closed("bowl over a spiral", 60, 0.08, Paths.box(3, -1, 1), (x, t) -> {
            double square = (x[0] * x[0] + x[1] * x[1]) / 0.7;
            double size = exp(-0.15 * t);
            return new double[] {size * (x[0] * cos(1.3 * t) - x[1] * sin(1.3 * t)), size * (x[0] * sin(1.3 * t) + x[1] * cos(1.3 * t)),
                (x[2] - square) * exp(-t) + square * exp(-0.3 * t)};
        });
        out.add(new Case(bowl, Look.exponential(12), Truth.SETTLES));
    }

    /**
     * Hopf (C2.4), mu = 0.49, gamma = -1.9, beta = -0.4: radius 0.7, clockwise at 1.704. On the cycle a rotation: orthogonal e^(inθ), of
     * which n = ±1 are the signal, in the space of exp(x·y) and, because K depends there on the difference of the angles only with a
     * positive Fourier series, in that of the Gaussian kernel too (in the plane {@code z e^(-r²/2s²)} is one of its functions): stands. Off
     * the cycle: at the unstable rest an analytic eigenfunction has a rate of real part {@code 0.49(m + n) > 0}, but solutions stay bounded,
     * so it is 0: absent. The same for van der Pol, mu = 0.6, in steps, and as a step map leaves the space: nothing to report. Periodic
     * signals on their cycles: van der Pol, mu = 1.3, odd harmonics fall by 3 to 7 (four pairs hold x but 1e-3); Brusselator, a = 1, b =
     * 2.4, by 2 (five pairs hold all but 1e-2); reportable.
     */
    private static void cycles(List<Case> out) {
        KnownSystem on = hopf("Hopf on the cycle, clockwise", 0.7, 0);
        out.add(new Case(on, Look.exponential(5), Truth.STANDS));
        out.add(new Case(on, Look.step("gaussian", 5, "scale", 1), Truth.STANDS));
        out.add(new Case(hopf("Hopf off the cycle, clockwise", 0.15, 1), Look.exponential(10), Truth.ABSENT));
        out.add(new Case(Paths.flow("van der Pol 0.6 off the cycle", 70, 0.1, 0, 2, Paths.box(2, -2, 2),
                x -> new double[] {x[1], 0.6 * (1 - x[0] * x[0]) * x[1] - x[0]}), Look.step("exponential", 12, "rate", 0.25), Truth.NONE));
        out.add(new Case(Paths.flow("van der Pol 1.3 on the cycle", 150, 0.12, 40, 1,
                random -> new double[] {2 * random.nextDouble() + 0.1, random.nextDouble()},
                x -> new double[] {x[1], 1.3 * (1 - x[0] * x[0]) * x[1] - x[0]}), Look.delays(20, 8), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("Brusselator on its cycle", 150, 0.12, 120, 2, Paths.box(2, 0.5, 2.5),
                x -> new double[] {1 + x[0] * x[0] * x[1] - 3.4 * x[0], 2.4 * x[0] - x[0] * x[0] * x[1]}), Look.delays(20, 11), Truth.REPORTABLE));
    }

    private static KnownSystem hopf(String name, double least, double width) {
        double mu = 0.49;
        double beta = -0.4;
        return Paths.closed(name, 60, 0.1, Paths.box(2, 0, 1), (u, t) -> {
            double r0 = least + width * u[0];
            double r = sqrt(mu / (1 + (mu / (r0 * r0) - 1) * exp(-2 * mu * t)));
            double angle = 2 * PI * u[1] + (-1.9 - beta * mu) * t + beta * log(r / r0);
            return new double[] {r * cos(angle), r * sin(angle)};
        });
    }

    /**
     * No isolated frequency: {@code x'' = -2.25 sin x}, amplitudes 0.8 to 2.6, periods 1.04 to 1.74 times {@code 2π/1.5}; {@code x'' = -x³},
     * period 7.42 over the amplitude, 0.6 to 1.8; a free top with moments 1, 2, 3, periods from 4 on without end (its quadratic invariants are
     * eigenfunctions of rate 0 and carry none of the swing). No rate: drag {@code -0.25|x'|x'}, amplitudes fall as {@code 1/(1 + 0.11at)},
     * from 2 to 0.40, but from 0.4 to 0.22. Pendulum damped by 0.3, large: an analytic eigenfunction has a rate -0.15(m + n) ± ..., and must be 0 on
     * what leaves the saddle at π, since it would be infinite there in the past; that spirals into the rest at 0, where the function is
     * {@code z^m z̄^n} to lowest order, not 0: none. Small (at most 0.05, frequency varies by 1.6e-4): -0.075 ± 1.5i.
     */
    private static void oscillators(List<Case> out) {
        out.add(new Case(pendulum("fast pendulum, amplitudes 0.8 to 2.6", 0, 0.8, 2.6), Look.delays(14, 6), Truth.NONE));
        out.add(new Case(pendulum("damped fast pendulum, amplitudes 0.8 to 2.6", 0.3, 0.8, 2.6), Look.step("exponential", 12, "rate", 0.25),
                Truth.NONE));
        out.add(new Case(pendulum("damped fast pendulum, small", 0.15, 0.02, 0.05), Look.delays(6, 2), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("quartic well, amplitudes 0.6 to 1.8", 120, 0.2, 0, 2,
                random -> new double[] {0.6 + 1.2 * random.nextDouble(), 0}, x -> new double[] {x[1], -x[0] * x[0] * x[0]}),
                Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(Paths.flow("rolling with quadratic drag", 120, 0.18, 0, 2, random -> new double[] {0.4 + 1.6 * random.nextDouble(), 0},
                x -> new double[] {x[1], -x[0] - 0.25 * abs(x[1]) * x[1]}), Look.delays(10, 4), Truth.NONE));
        out.add(new Case(Paths.flow("free top", 120, 0.15, 0, 3, Paths.box(3, -1.5, 1.5), x -> new double[] {-x[1] * x[2], x[2] * x[0],
            -x[0] * x[1] / 3}), Look.monomials(3, 20), Truth.NONE));
        predators(out);
    }

    private static KnownSystem pendulum(String name, double damping, double low, double high) {
        return Paths.flow(name, 110, 0.15, 0, 2, random -> new double[] {low + (high - low) * random.nextDouble(), 0},
                x -> new double[] {x[1], -damping * x[1] - 2.25 * sin(x[0])});
    }

    /**
     * Lotka-Volterra around (1.5, 1.375). On the orbit through (1.5, 2.2), period 6.47, harmonics fall by 5: a constant and three of them
     * hold all but 1e-4. From y = 1.9 to 4 the period runs from 6.38 to 7.33: no isolated frequency.
     */
    private static void predators(List<Case> out) {
        Paths.Field field = x -> new double[] {x[0] * (1.1 - 0.8 * x[1]), x[1] * (0.6 * x[0] - 0.9)};
        out.add(new Case(new KnownSystem("hares and lynxes, orbit", 0.2, random -> Paths.flow("", 110, 0.2, 0.01 + 6.4 * random.nextDouble(), 2,
                r -> new double[] {1.5, 2.2}, field).path().draw(random)), Look.delays(14, 7), Truth.REPORTABLE));
        out.add(new Case(Paths.flow("hares and lynxes, ensemble", 150, 0.2, 0, 2, random -> new double[] {1.5, 1.9 + 2.1 * random.nextDouble()},
                field), Look.delays(12, 7), Truth.NONE));
    }

    /**
     * Rotation by e - 2 turns, Gaussian kernel: stands, as on the cycle of {@link #cycles}. Two rotations at once, by √5 - 2 and √7 - 2, the
     * second of size 0.7: {@code K = e^(cos Δa) e^(0.49 cos Δb)}, products of harmonics are orthogonal: stands; delays: four exponentials.
     * Rotation by π - 3 seen as the angle: harmonics to order 4 hold 0.87 of the saw-tooth. Waves 1 to the right and 2 to the left at 9 points
     * of a period: 1, 2, 8 and 7 are different modulo 9, so the planes are orthogonal and each is a rotation: stands.
     */
    private static void waves(List<Case> out) {
        KnownSystem circle = Paths.closed("circle rotation by e-2", 65, 1, Paths.box(1, 0, 1), (x, t) -> new double[] {
            cos(2 * PI * (x[0] + (exp(1) - 2) * t)), sin(2 * PI * (x[0] + (exp(1) - 2) * t))});
        out.add(new Case(circle, Look.step("gaussian", 5, "scale", 0.8), Truth.STANDS));
        KnownSystem torus = Paths.closed("two rotations at once", 70, 1, Paths.box(2, 0, 1), (x, t) -> {
            double a = 2 * PI * (x[0] + (sqrt(5) - 2) * t);
            double b = 2 * PI * (x[1] + (sqrt(7) - 2) * t);
            return new double[] {cos(a), sin(a), 0.7 * cos(b), 0.7 * sin(b)};
        });
        out.add(new Case(torus, Look.step("exponential", 9, "rate", 1), Truth.STANDS));
        out.add(new Case(torus, Look.delays(3, 4), Truth.REPORTABLE));
        KnownSystem angle = Paths.map("circle rotation by π-3, angle", 70, 1, Paths.box(1, 0, 1), x -> new double[] {(x[0] + PI - 3) % 1});
        out.add(new Case(angle, Look.fourier(4), Truth.REPORTABLE));
        KnownSystem both = Paths.closed("waves both ways", 60, 0.1, Paths.box(4, 0.3, 1), (u, t) -> {
            double[] row = new double[9];
            for (int i = 0; i < 9; i++) {
                row[i] = u[0] * cos(2 * PI * (i / 9.0 - 0.15 * t + 3 * u[2])) + u[1] * cos(4 * PI * (i / 9.0 + 0.11 * t + 3 * u[3]));
            }
            return row;
        });
        out.add(new Case(both, Look.linearKernel(4), Truth.STANDS));
    }

    /**
     * Heat in an insulated rod at 5 points (factor 30, symmetric; rates 0, -11.5, -41.5, -78.5, -108.5): orthogonal: stands in the dual
     * space of the state. Diffusion in a stream at 5 points, neighbours weighted 1.5 upstream and 0.5 downstream: similar to a symmetric
     * matrix by powers of √3, which tilt the left eigenvectors: overlaps of 0.79, joint and solo weights 0.86 and more apart, rates -0.5,
     * -1.13, -2, -2.87, -3.5: settles.
     */
    private static void diffusion(List<Case> out) {
        double[][] rod = new double[5][5];
        double[][] stream = new double[5][5];
        for (int i = 0; i < 5; i++) {
            rod[i][i] = i == 0 || i == 4 ? -30 : -60;
            stream[i][i] = -2;
            if (i > 0) {
                rod[i][i - 1] = 30;
                rod[i - 1][i] = 30;
                stream[i][i - 1] = 1.5;
                stream[i - 1][i] = 0.5;
            }
        }
        KnownSystem heat = Paths.linear("heat in an insulated rod", 45, 0.0015, rod);
        out.add(new Case(heat, Look.linearKernel(5), Truth.STANDS));
        KnownSystem carried = Paths.linear("diffusion in a stream", 50, 0.04, stream);
        out.add(new Case(carried, Look.linearKernel(5), Truth.SETTLES));
    }

    /**
     * Coherent state (C2.17) of mean 0.6: frequencies n + 1/2, amplitudes 0.55, 0.33, 0.10, 0.02, 0.003. A beat: cos 3t with sides of
     * amplitude 0.3 at 2.5 and 3.5, six exponentials, more than a beat a run. Three tones that ring down, in two channels: six. All held by
     * delays: reportable.
     */
    private static void sums(List<Case> out) {
        out.add(new Case(Paths.closed("coherent state, mean 0.6", 120, 0.3, Paths.box(1, 0, 12), (u, t) -> {
            double s = t + u[0];
            double size = exp(0.6 * (cos(s) - 1));
            return new double[] {size * cos(-0.6 * sin(s) - s / 2), size * sin(-0.6 * sin(s) - s / 2)};
        }), Look.delays(16, 10), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("beat", 160, 0.12, Paths.box(2, 0, 2 * PI), (u, t) -> new double[] {
            (1 + 0.6 * cos(0.5 * t + u[0])) * cos(3 * t + u[1])}), Look.delays(24, 6), Truth.REPORTABLE));
        out.add(new Case(Paths.closed("ring-down of three tones", 120, 0.12, Paths.box(6, 0.3, 1), (u, t) -> {
            double a = u[0] * exp(-0.07 * t) * cos(1.1 * t + 9 * u[3]);
            double b = u[1] * exp(-0.1 * t) * cos(2.4 * t + 9 * u[4]);
            double c = u[2] * exp(-0.13 * t) * cos(4.3 * t + 9 * u[5]);
            return new double[] {a + b + c, a - 0.8 * b + 0.6 * c};
        }), Look.delays(12, 6), Truth.REPORTABLE));
    }

    /**
     * A rate that is repeated without a second eigenvector: what carries the signal is a generalised eigenfunction (C2.18): drifts. One
     * matrix [[-0.6, 1.1], [0, -0.6]]; transport upwind through 4 cells, one Jordan block of -1.2; a parabola, a triple rate 0; a ramp beside
     * a tone, a double 0 and ±1.1i, and the ramp is no small share; {@code (a + bt) e^(-0.12t) cos 2.2t}, a double pair.
     */
    private static void defective(List<Case> out) {
        KnownSystem repeated = Paths.linear("repeated rate 2d", 50, 0.07, new double[][] {{-0.6, 1.1}, {0, -0.6}});
        out.add(new Case(repeated, Look.linearKernel(2), Truth.DRIFTS));
        out.add(new Case(repeated, Look.delays(4, 2), Truth.DRIFTS));
        KnownSystem upwind = Paths.linear("upwind transport", 60, 0.07, new double[][] {{-1.2, 0, 0, 0}, {1.2, -1.2, 0, 0}, {0, 1.2, -1.2, 0},
            {0, 0, 1.2, -1.2}});
        out.add(new Case(upwind, Look.linearKernel(4), Truth.DRIFTS));
        out.add(new Case(Paths.closed("parabolas", 60, 1, Paths.box(3, -1, 1), (u, t) -> new double[] {
            u[0] + 0.05 * u[1] * t + 0.002 * u[2] * t * t}), Look.delays(6, 3), Truth.DRIFTS));
        out.add(new Case(Paths.closed("ramp beside a tone", 90, 0.22, Paths.box(3, -1, 1), (u, t) -> new double[] {
            u[0] + 0.1 * u[1] * t + 0.7 * cos(1.1 * t + 3 * u[2])}), Look.delays(12, 4), Truth.DRIFTS));
        out.add(new Case(Paths.closed("damped resonance", 110, 0.14, Paths.box(2, 0.2, 1), (u, t) -> new double[] {
            (u[0] + 0.4 * u[1] * t) * exp(-0.12 * t) * cos(2.2 * t)}), Look.delays(10, 4), Truth.DRIFTS));
    }

    /**
     * The map 4x³ - 3x (kept within ±1 against rounding) is multiplication of the angle by three, {@code U T_k = T_3k}: residual 1 but for the
     * constant, as in {@link NoModes}: absent. Cat map, {@code U e^(2πik·x) = e^(2πi(Ak)·x)}: mixing (Arnold and Avez, Ergodic Problems of Classical Mechanics, 1968). Roessler
     * at (0.28, 0.1, 8.5), the funnel: its autocorrelation is 0.5 after one turn, 0.2 after two, 0.07 after seven (at the usual
     * parameters it stays above 0.8: no case). Lorenz at (16, 45.92, 4): autocorrelation 0.03 after 3. Nothing to report.
     */
    private static void chaos(List<Case> out) {
        out.add(new Case(Paths.map("cubic map", 70, 1, Paths.box(1, -0.98, 0.98), x -> new double[] {
            Math.max(-1, Math.min(1, 4 * x[0] * x[0] * x[0] - 3 * x[0]))}),
                Look.monomials(5, 6), Truth.ABSENT));
        out.add(new Case(new KnownSystem("cat map", 1, random -> {
            double[][] rows = new double[80][];
            double a = random.nextDouble();
            double b = random.nextDouble();
            for (int k = 0; k < rows.length; k++) {
                rows[k] = new double[] {cos(2 * PI * a)};
                b = (a + b) % 1;
                a = (a + b) % 1;
            }
            return rows;
        }), Look.delays(6, 4), Truth.NONE));
        KnownSystem roessler = Paths.flow("Roessler funnel", 200, 0.15, 60, 3, Paths.box(3, 0.5, 3), x -> new double[] {-x[1] - x[2],
            x[0] + 0.28 * x[1], 0.1 + x[2] * (x[0] - 8.5)});
        out.add(new Case(roessler, Look.delays(12, 8), Truth.NONE));
        KnownSystem lorenz = Paths.flow("Lorenz, sigma = 16", 200, 0.04, 15, 3, Paths.box(3, 1, 10), x -> new double[] {16 * (x[1] - x[0]),
            x[0] * (45.92 - x[2]) - x[1], x[0] * x[1] - 4 * x[2]});
        out.add(new Case(lorenz, Look.monomials(3, 20), Truth.NONE));
    }

    /**
     * As in {@link NoModes}: noise of heavy tails (Laplace) in three channels obeys no rule: absent. Ornstein-Uhlenbeck, theta = 0.8, and a
     * rotation {@code 0.96 e^(0.3i)} kicked at every step in both channels: over its own time the path misses the mean motion by
     * {@code √(1 - e^-2)} of its size. A walk with a drift: the mean motion is a ramp, a double rate 0, and the kicks, 0.6 a step, are larger
     * than the drift, 0.1.
     */
    private static void chance(List<Case> out) {
        out.add(new Case(new KnownSystem("Laplace noise, three channels", 0.1, random -> Stream.generate(() -> new double[] {
            laplace(random), laplace(random), laplace(random)}).limit(130).toArray(double[][]::new)), Look.delays(4, 6), Truth.ABSENT));
        out.add(new Case(autoregression("Ornstein-Uhlenbeck, theta = 0.8", exp(-0.08), 0, sqrt(1 - exp(-0.16))), Look.delays(6, 3), Truth.NONE));
        KnownSystem walk = autoregression("walk with a drift", 1, 0.1, 0.6);
        out.add(new Case(walk, Look.delays(8, 4), Truth.NONE));
        out.add(new Case(new KnownSystem("kicked rotation", 0.2, random -> {
            double[][] rows = new double[140][];
            rows[0] = new double[] {random.nextGaussian(), random.nextGaussian()};
            for (int k = 1; k < rows.length; k++) {
                double[] x = rows[k - 1];
                rows[k] = new double[] {0.96 * (x[0] * cos(0.3) - x[1] * sin(0.3)) + 0.3 * random.nextGaussian(),
                    0.96 * (x[0] * sin(0.3) + x[1] * cos(0.3)) + 0.3 * random.nextGaussian()};
            }
            return rows;
        }), Look.monomials(2, 6), Truth.NONE));
    }

    private static double laplace(Random random) {
        return (random.nextBoolean() ? 1 : -1) * log(1 - random.nextDouble());
    }

    /** {@code x -> keep x + drift + kick N(0, 1)}, started in N(0, 1). */
    private static KnownSystem autoregression(String name, double keep, double drift, double kick) {
        return Paths.chance(name, 130, 0.1, random -> {
            double[] x = {random.nextGaussian()};
            return () -> {
                double now = x[0];
                x[0] = keep * now + drift + kick * random.nextGaussian();
                return now;
            };
        });
    }

    /**
     * A level that jumps once, in two channels at once and at a random time; a contact that opens or closes at random, with 0.05 a step; a
     * front from one level to another at a random time, {@code tanh((t - t0)/0.8)}, sums of e^(-2.5nt) behind it and of e^(2.5nt) before it:
     * no cycle, and no rate that holds across.
     */
    private static void jumps(List<Case> out) {
        out.add(new Case(new KnownSystem("level shift in two channels", 0.1, random -> {
            double[] before = {random.nextGaussian(), random.nextGaussian()};
            double[] after = {random.nextGaussian(), random.nextGaussian()};
            int at = 30 + random.nextInt(70);
            double[][] rows = new double[130][];
            for (int k = 0; k < rows.length; k++) {
                rows[k] = k < at ? before : after;
            }
            return rows;
        }), Look.delays(5, 4), Truth.NONE));
        out.add(new Case(Paths.chance("random contact", 140, 0.1, random -> {
            double[] x = {random.nextBoolean() ? 1 : -1};
            return () -> {
                x[0] = random.nextDouble() < 0.05 ? -x[0] : x[0];
                return x[0];
            };
        }), Look.delays(6, 4), Truth.NONE));
        out.add(new Case(Paths.closed("front", 120, 0.1, Paths.box(1, 3, 9), (u, t) -> new double[] {tanh((t - u[0]) / 0.8)}),
                Look.delays(8, 4), Truth.NONE));
    }
}
