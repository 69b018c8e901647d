package org.modestead.engine.battery;

import static java.lang.StrictMath.exp;
import static java.lang.StrictMath.sqrt;

import java.util.ArrayList;
import java.util.List;

/** Flows on the line, length 0.8, starts where they stay finite; see CHECKS C3.4 for the space of exp(xy). */
final class LineFlows {

    private LineFlows() {}

    private interface Solution {
        double at(double start, double time);
    }

    private static KnownSystem flow(String name, double low, Solution solution) {
        return Paths.closed(name, 41, 0.02, Paths.box(1, low, 0.7), (x, t) -> new double[] {solution.at(x[0], t)});
    }

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        scaling(out, flow("x'=x", -1, (a, t) -> a * exp(t)));
        scaling(out, flow("x'=-x", -1, (a, t) -> a * exp(-t)));
        affine(out, flow("x'=x+1/2", -1, (a, t) -> (a + 0.5) * exp(t) - 0.5));
        translation(out, flow("x'=1", -1, Double::sum));
        nonlinear(out, flow("x'=x^2", -1, (a, t) -> a / (1 - a * t)));
        nonlinear(out, flow("x'=-x^3", -1, (a, t) -> a / sqrt(1 + 2 * a * a * t)));
        nonlinear(out, flow("x'=x-x^2", -0.5, (a, t) -> a * exp(t) / (1 + a * (exp(t) - 1))));
        return out;
    }

    /**
     * {@code x' = a x}: eigenfunctions x^n, orthogonal in the spaces of exp(xy) (C3.1) and (1 + xy)^p (whose norm
     * also weighs monomials one by one); only x carries the signal: stands. In the average over the data x is an
     * eigenfunction, whatever its overlap: reportable. The Gaussian space holds none of them (C3.12).
     */
    private static void scaling(List<Case> out, KnownSystem system) {
        out.add(new Case(system, Look.exponential(6), Truth.STANDS));
        out.add(new Case(system, Look.polynomial(3, 4), Truth.STANDS));
        out.add(new Case(system, Look.monomials(4, 5), Truth.REPORTABLE));
        out.add(new Case(system, Look.gaussian(1, 6), Truth.NONE));
        out.add(new Case(system, Look.delays(6, 1), Truth.REPORTABLE));
    }

    /**
     * {@code x' = x + 1/2}: eigenfunctions (x + 1/2)^n; only n = 0, 1 carry x = (x + 1/2) - 1/2. {@code <1, x + 1/2>
     * = 1/2} in the spaces of exp(xy) and (1 + xy)^p: overlap with the constant, which is no evidence; the solo
     * weight of x + 1/2 is {@code <x, x + 1/2>/‖x + 1/2‖² = 1/(1 + 1/4) = 0.8} against a joint one of 1 (C3.1; for (1
     * + xy)^3 ‖x‖² is 1/3, solo 4/7): not orthogonal, settles.
     */
    private static void affine(List<Case> out, KnownSystem system) {
        out.add(new Case(system, Look.exponential(6), Truth.SETTLES));
        out.add(new Case(system, Look.polynomial(3, 4), Truth.SETTLES));
        out.add(new Case(system, Look.monomials(4, 5), Truth.REPORTABLE));
    }

    /**
     * {@code x' = 1}: in the space of exp(xy) every e^(λx) is an eigenfunction, over-complete, so weights never
     * settle (C3.4): drifts. On polynomials d/dx is nilpotent, one Jordan block with the rate 0, and x is a
     * generalised eigenfunction only (C2.18): drifts. Delays see x0 + t, a double multiplier 1 (C2.18): drifts. The
     * Gaussian space holds no e^(λx) (C3.12).
     */
    private static void translation(List<Case> out, KnownSystem system) {
        out.add(new Case(system, Look.exponential(6), Truth.DRIFTS));
        out.add(new Case(system, Look.polynomial(3, 4), Truth.DRIFTS));
        out.add(new Case(system, Look.monomials(4, 5), Truth.DRIFTS));
        out.add(new Case(system, Look.delays(6, 2), Truth.DRIFTS));
        out.add(new Case(system, Look.gaussian(1, 6), Truth.NONE));
    }

    /**
     * Degree 2 and more: only the constant is an eigenfunction in the space of exp(xy) (C3.4): absent. Formal
     * eigenfunctions exp(λ∫dx/f) have a pole or an essential singularity where f vanishes, inside the sampled
     * interval (C2.9-C2.11), so none is a polynomial, and the delays' exponentials are no solutions: nothing to
     * report.
     */
    private static void nonlinear(List<Case> out, KnownSystem system) {
        out.add(new Case(system, Look.exponential(8), Truth.ABSENT));
        out.add(new Case(system, Look.monomials(5, 6), Truth.NONE));
    }
}
