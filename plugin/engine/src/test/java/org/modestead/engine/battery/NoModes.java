package org.modestead.engine.battery;

import static java.lang.StrictMath.exp;
import static java.lang.StrictMath.sqrt;

import java.util.ArrayList;
import java.util.List;

/** Chaos and chance: systems that have no mode at all. */
final class NoModes {

    private NoModes() {}

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        chaos(out);
        chance(out);
        return out;
    }

    /**
     * Logistic map 4x(1 - x) (C2.15): the only eigenvalue in L² of its measure is 1; the residual of every other is
     * 1: absent. Lorenz (C2.16): mixing, no point spectrum but 1.
     */
    private static void chaos(List<Case> out) {
        KnownSystem logistic = Paths.map("chaotic logistic map", 60, 1, Paths.box(1, 0.01, 0.99),
                x -> new double[] {4 * x[0] * (1 - x[0])});
        out.add(new Case(logistic, Look.monomials(6, 7), Truth.ABSENT));
        out.add(new Case(logistic, Look.delays(8, 4), Truth.NONE));
        out.add(new Case(logistic, Look.step("gaussian", 10, "scale", 0.3), Truth.NONE));
        KnownSystem lorenz = Paths.flow("Lorenz", 200, 0.05, 20, 3, Paths.box(3, 1, 10),
                x -> new double[] {10 * (x[1] - x[0]),
            x[0] * (28 - x[2]) - x[1], x[0] * x[1] - 8.0 / 3 * x[2]});
        out.add(new Case(lorenz, Look.delays(10, 8), Truth.NONE));
        out.add(new Case(lorenz, Look.monomials(3, 20), Truth.NONE));
        out.add(new Case(lorenz, Look.step("gaussian", 12, "scale", 15), Truth.NONE));
    }

    /**
     * White noise and the random walk obey no rule of motion. Ornstein-Uhlenbeck (C2.13) has eigenfunctions of the
     * mean motion only: over the mode's own time 1/theta its path misses e^(-theta t) by √(1 - e^-2) = 0.93 of its
     * size: absent as a rule of motion. A level that jumps once, at a random time, keeps its level before and after
     * (the rate 0) but not across: no cycle and no rate.
     */
    private static void chance(List<Case> out) {
        KnownSystem white = new KnownSystem("white noise", 0.1, random -> {
            double[][] rows = new double[120][2];
            for (double[] row : rows) {
                row[0] = random.nextGaussian();
                row[1] = random.nextGaussian();
            }
            return rows;
        });
        out.add(new Case(white, Look.delays(6, 6), Truth.ABSENT));
        out.add(new Case(white, Look.monomials(3, 10), Truth.ABSENT));
        KnownSystem walk = chain("random walk", 1, 1);
        out.add(new Case(walk, Look.delays(8, 4), Truth.NONE));
        out.add(new Case(walk, Look.monomials(3, 4), Truth.NONE));
        KnownSystem ou = chain("Ornstein-Uhlenbeck", exp(-0.1), sqrt((1 - exp(-0.2)) / 2));
        out.add(new Case(ou, Look.delays(6, 3), Truth.NONE));
        out.add(new Case(ou, Look.monomials(3, 4), Truth.NONE));
        KnownSystem shift = new KnownSystem("level shift", 0.1, random -> {
            double before = random.nextGaussian();
            double after = random.nextGaussian();
            int at = 30 + random.nextInt(60);
            double[][] rows = new double[120][1];
            for (int k = 0; k < rows.length; k++) {
                rows[k][0] = k < at ? before : after;
            }
            return rows;
        });
        out.add(new Case(shift, Look.delays(8, 4), Truth.NONE));
    }

    /** {@code x -> keep x + kick N(0, 1)}, started in its spread. */
    private static KnownSystem chain(String name, double keep, double kick) {
        return new KnownSystem(name, 0.1, random -> {
            double[][] rows = new double[120][1];
            double x = 0.7 * random.nextGaussian();
            for (double[] row : rows) {
                row[0] = x;
                x = keep * x + kick * random.nextGaussian();
            }
            return rows;
        });
    }
}
