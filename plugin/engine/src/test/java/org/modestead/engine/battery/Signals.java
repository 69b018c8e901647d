package org.modestead.engine.battery;

import static java.lang.StrictMath.PI;
import static java.lang.StrictMath.cos;
import static java.lang.StrictMath.exp;
import static java.lang.StrictMath.sin;
import static java.lang.StrictMath.sqrt;

import java.util.ArrayList;
import java.util.List;

/** Rotations, waves, sums of exponentials, and signals whose exponentials coincide. */
final class Signals {

    private static final double GOLDEN = 0.618033988749895;

    private Signals() {}

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        circle(out);
        heat(out);
        advection(out);
        sums(out);
        return out;
    }

    /**
     * C2.14, golden mean. Seen as (cos, sin) it is a rotation of the plane: stands in the space of exp(x·y). Seen as the
     * angle itself, e^(2πinx) are eigenfunctions; harmonics to order 3 hold 0.83 of the saw-tooth's variance.
     */
    private static void circle(List<Case> out) {
        KnownSystem plane = Paths.closed("circle rotation", 60, 1, Paths.box(1, 0, 1), (x, t) -> new double[] {
            cos(2 * PI * (x[0] + GOLDEN * t)), sin(2 * PI * (x[0] + GOLDEN * t))});
        out.add(new Case(plane, Look.delays(4, 2), Truth.REPORTABLE));
        out.add(new Case(plane, Look.step("exponential", 5, "rate", 1), Truth.STANDS));
        KnownSystem angle = Paths.map("circle rotation, angle", 60, 1, Paths.box(1, 0, 1),
                x -> new double[] {(x[0] + GOLDEN) % 1});
        out.add(new Case(angle, Look.fourier(3), Truth.REPORTABLE));
    }

    /**
     * C2.12: second differences at 6 points are a symmetric matrix: orthogonal w·x in the dual space of the state:
     * stands.
     */
    private static void heat(List<Case> out) {
        double[][] a = new double[6][6];
        for (int i = 0; i < 6; i++) {
            a[i][i] = -98;
            if (i > 0) {
                a[i][i - 1] = 49;
                a[i - 1][i] = 49;
            }
        }
        KnownSystem system = Paths.linear("heat equation", 40, 0.001, a);
        out.add(new Case(system, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(system, Look.delays(3, 6), Truth.REPORTABLE));
    }

    /**
     * C2.12: travelling waves of wave numbers 1 and 2 at 8 points of a period, speed 0.1: each is a rotation in its
     * own plane of the state, the planes orthogonal: stands in the dual space of the state.
     */
    private static void advection(List<Case> out) {
        KnownSystem system = Paths.closed("advection equation", 60, 0.1, Paths.box(4, 0.3, 1), (u, t) -> {
            double[] row = new double[8];
            for (int i = 0; i < 8; i++) {
                double at = i / 8.0 - 0.1 * t;
                row[i] = u[0] * cos(2 * PI * (at + 3 * u[2])) + u[1] * cos(4 * PI * (at + 3 * u[3]));
            }
            return row;
        });
        out.add(new Case(system, Look.linearKernel(4), Truth.STANDS));
        out.add(new Case(system, Look.delays(2, 4), Truth.REPORTABLE));
    }

    /**
     * Coherent state (C2.17): frequencies n + 1/2; those with amplitudes above 1 % are six, each a pair in (Re, Im):
     * rank 10 and more hold the signal: reportable. Defective (C2.18): a + bt has a double multiplier 1, (a + bt)e^-t
     * a double e^-dt: a generalised eigenfunction carries the signal, no eigenbasis: drifts.
     */
    private static void sums(List<Case> out) {
        KnownSystem coherent = Paths.closed("coherent state", 120, 0.25, Paths.box(1, 0, 12), (u, t) -> {
            double s = t + u[0];
            double size = exp(cos(s) - 1);
            return new double[] {size * cos(-sin(s) - s / 2), size * sin(-sin(s) - s / 2)};
        });
        out.add(new Case(coherent, Look.delays(20, 12), Truth.REPORTABLE));
        KnownSystem drift = Paths.closed("ramps", 60, 1, Paths.box(2, -1, 1), (u,
                t) -> new double[] {2 * u[0] + 0.1 * u[1] * t});
        out.add(new Case(drift, Look.delays(4, 2), Truth.DRIFTS));
        KnownSystem critical = Paths.closed("critically damped", 60, 0.1, Paths.box(2, -1, 1), (u,
                t) -> new double[] {(u[0] + 3 * u[1] * t) * exp(-t)});
        out.add(new Case(critical, Look.delays(4, 2), Truth.DRIFTS));
        KnownSystem apart = Paths.closed("two decays, one channel", 80, 0.1, Paths.box(2, 0.5, 1), (u, t) ->
                new double[] {u[0] * exp(-0.3 * t) + (2 * u[1] - 1.5) * exp(-2 * t) * sqrt(2)});
        out.add(new Case(apart, Look.delays(8, 2), Truth.REPORTABLE));
    }
}
