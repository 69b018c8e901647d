package org.modestead.engine.battery;

import static java.lang.StrictMath.PI;
import static java.lang.StrictMath.cos;
import static java.lang.StrictMath.exp;
import static java.lang.StrictMath.log;
import static java.lang.StrictMath.sin;
import static java.lang.StrictMath.sqrt;

import java.util.ArrayList;
import java.util.List;

/** Nonlinear flows in the plane. */
final class Oscillators {

    private Oscillators() {}

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        slowManifold(out);
        hopf(out);
        vanDerPol(out);
        pendulum(out);
        lotkaVolterra(out);
        return out;
    }

    /**
     * C2.3 with mu = -0.3, lambda = -1: eigenfunctions x1, x2 - b x1², x1² are polynomials of degree 2, b = 2.5, and
     * carry the signal. In the space of exp(x·y), {@code <x2 - b x1², x1²> = -2b}, norms √(1 + 2b²) and √2: overlap
     * 0.96, settles. Delays: both channels are sums of the three exponentials. Reportable where the norm is that of
     * the data.
     */
    private static void slowManifold(List<Case> out) {
        double mu = -0.3;
        double lambda = -1;
        double b = lambda / (lambda - 2 * mu);
        KnownSystem system = Paths.closed("slow manifold", 60, 0.05, Paths.box(2, -1, 1), (x,
                t) -> new double[] {x[0] * exp(mu * t),
            (x[1] - b * x[0] * x[0]) * exp(lambda * t) + b * x[0] * x[0] * exp(2 * mu * t)});
        out.add(new Case(system, Look.exponential(10), Truth.SETTLES));
        out.add(new Case(system, Look.monomials(2, 6), Truth.REPORTABLE));
        out.add(new Case(system, Look.delays(6, 3), Truth.REPORTABLE));
    }

    /**
     * C2.4. On the cycle the motion is a rotation: x + iy is an eigenfunction, and rotations keep the norm of the
     * space of exp(x·y): stands. Off it, eigenfunctions contain ln r and 1/r², singular at the origin: none is
     * entire: absent from the space of exp(x·y). In the average over data from the ring 0.08 to 0.98 exp(i(θ - β ln
     * r)) is bounded and smooth, its limit on the cycle is the signal, and only the lattice's are smooth across the
     * cycle: reportable.
     */
    private static void hopf(List<Case> out) {
        KnownSystem on = hopf("Hopf on the cycle", (a, b) -> 0.5);
        KnownSystem off = hopf("Hopf off the cycle", (a, b) -> 0.08 + 0.9 * a);
        out.add(new Case(on, Look.delays(6, 2), Truth.REPORTABLE));
        out.add(new Case(on, Look.exponential(5), Truth.STANDS));
        out.add(new Case(off, Look.exponential(10), Truth.ABSENT));
        out.add(new Case(off, Look.monomials(3, 10), Truth.REPORTABLE));
    }

    private interface Radius {
        double of(double u, double v);
    }

    private static KnownSystem hopf(String name, Radius radius) {
        double mu = 0.25;
        double beta = 0.5;
        return Paths.closed(name, 60, 0.08, Paths.box(2, 0, 1), (u, t) -> {
            double r0 = radius.of(u[0], u[1]);
            double r = sqrt(mu / (1 + (mu / (r0 * r0) - 1) * exp(-2 * mu * t)));
            double angle = 2 * PI * u[1] + (2 - beta * mu) * t + beta * log(r / r0);
            return new double[] {r * cos(angle), r * sin(angle)};
        });
    }

    /**
     * C2.5, mu = 1. On the cycle x(t) is periodic and odd harmonics fall by 8 to 10: six delay modes hold all but
     * 1e-2 of it. From starts all over the plane: eigenfunctions are analytic near the origin only, the cycle is
     * their boundary, so no entire one. (In the average over the data the phase of the cycle is an eigenfunction, but
     * nothing here says how well a given degree reaches it: no case.)
     */
    private static void vanDerPol(List<Case> out) {
        Paths.Field field = x -> new double[] {x[1], (1 - x[0] * x[0]) * x[1] - x[0]};
        out.add(new Case(Paths.flow("van der Pol on the cycle", 150, 0.1, 40, 1,
                random -> new double[] {2 * random.nextDouble() + 0.1,
            random.nextDouble()}, field), Look.delays(20, 6), Truth.REPORTABLE));
        KnownSystem off = Paths.flow("van der Pol off the cycle", 60, 0.1, 0, 2, Paths.box(2, -2, 2), field);
        out.add(new Case(off, Look.step("exponential", 12, "rate", 0.25), Truth.NONE));
    }

    /**
     * C2.7. Undamped over amplitudes 0.5 to 2.5 the period runs from 1.6 % to 80 % above 2π: a continuous range of
     * frequencies, no isolated one, in any space. Damped and large: the phase of the eigenfunction turns without end
     * towards the separatrix, so it is not entire. Amplitude at most 0.05: the frequency varies by 1.6e-4, linear to
     * that share, rates -0.1 ± 0.995i or ±i.
     */
    private static void pendulum(List<Case> out) {
        KnownSystem undamped = pendulum("pendulum, amplitudes 0.5 to 2.5", 0, 0.5, 2.5);
        KnownSystem damped = pendulum("damped pendulum, amplitudes 0.5 to 2.5", 0.2, 0.5, 2.5);
        out.add(new Case(undamped, Look.delays(12, 6), Truth.NONE));
        out.add(new Case(undamped, Look.monomials(3, 10), Truth.NONE));
        out.add(new Case(undamped, Look.step("gaussian", 12, "scale", 2), Truth.NONE));
        out.add(new Case(damped, Look.step("exponential", 12, "rate", 0.25), Truth.NONE));
        out.add(new Case(pendulum("pendulum, small", 0, 0.02, 0.05), Look.delays(6, 2), Truth.REPORTABLE));
        out.add(new Case(pendulum("damped pendulum, small", 0.2, 0.02, 0.05), Look.delays(6, 2), Truth.REPORTABLE));
    }

    private static KnownSystem pendulum(String name, double damping, double low, double high) {
        return Paths.flow(name, 120, 0.2, 0, 2, random -> new double[] {low + (high - low) * random.nextDouble(), 0},
                x -> new double[] {x[1], -damping * x[1] - sin(x[0])});
    }

    /**
     * C2.8. Over an ensemble of orbits the period runs from 2π to above 7: no isolated frequency. On one orbit (y0 =
     * 1.5) the motion is periodic; a constant and two harmonics of delays hold it.
     */
    private static void lotkaVolterra(List<Case> out) {
        Paths.Field field = x -> new double[] {x[0] * (1 - x[1]), x[1] * (x[0] - 1)};
        KnownSystem ensemble = Paths.flow("Lotka-Volterra ensemble", 150, 0.2, 0, 2, random -> new double[] {1,
                1.2 + 2.3 * random.nextDouble()},
                field);
        out.add(new Case(ensemble, Look.delays(12, 7), Truth.NONE));
        out.add(new Case(ensemble, Look.monomials(3, 10), Truth.NONE));
        KnownSystem orbit = new KnownSystem("Lotka-Volterra orbit", 0.2, random -> {
            KnownSystem later = Paths.flow("", 100, 0.2, 0.01 + 6 * random.nextDouble(), 2, r -> new double[] {1,
                    1.5}, field);
            return later.path().draw(random);
        });
        out.add(new Case(orbit, Look.delays(12, 5), Truth.REPORTABLE));
    }
}
