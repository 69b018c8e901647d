package org.modestead.engine.battery;

import java.util.ArrayList;
import java.util.List;

/**
 * {@code x' = A x}. Left eigenvectors w of A give the eigenfunctions w·x (CHECKS C2.1), which carry the whole signal.
 *
 * <ul>
 * <li>Space of exp(x·y), of (1 + x·y)^p and of x·y: all hold w·x, and the adjoint of the generator is that of Aᵀ
 * (C3.3: shown for     exp; the three norms are invariant under rotations of the state, so the same proof serves).
 * Normal exactly if A is:     stands for normal A. For other A, &lt;w1·x, w2·x&gt; is a multiple of w1·w2, not zero:
 * settles.
 * <li>Space of the Gaussian kernel: holds no polynomial (C3.12), so no w·x: nothing to report.
 * <li>Delays and dictionaries of monomials hold w·x, but their inner product is an average over the data: reportable.
 * </ul>
 */
final class LinearFlows {

    private static final double[][] ROTATION = {{-0.1, 2}, {-2, -0.1}};
    private static final double[][] TWO_DECAYS = {{-1, 0}, {0, -2}};
    /** Left eigenvectors (1, 3) and (0, 1) of rates -1 and -2: overlap 0.95. */
    private static final double[][] SHEARED = {{-1, 3}, {0, -2}};
    private static final double[][] ROTATION_AND_DECAY = {{-0.1, 2, 0}, {-2, -0.1, 0}, {0, 0, -0.5}};
    /** As before, with the decay pushing the rotation: its left eigenvector has a part of length above 1 in the plane. */
    private static final double[][] PUSHED = {{-0.1, 2, 0}, {-2, -0.1, 3}, {0, 0, -0.5}};
    private static final double[][] THREE_ROTATIONS = rotations(1, 2.3, 4.1);

    private LinearFlows() {}

    private static double[][] rotations(double... speeds) {
        double[][] a = new double[2 * speeds.length][2 * speeds.length];
        for (int k = 0; k < speeds.length; k++) {
            a[2 * k][2 * k] = -0.1;
            a[2 * k + 1][2 * k + 1] = -0.1;
            a[2 * k][2 * k + 1] = speeds[k];
            a[2 * k + 1][2 * k] = -speeds[k];
        }
        return a;
    }

    /** The second rotation pushes the first, the third the second: not normal. */
    private static double[][] coupled() {
        double[][] a = rotations(1, 2.3, 4.1);
        a[0][2] = 2;
        a[3][4] = 2;
        return a;
    }

    static List<Case> cases() {
        List<Case> out = new ArrayList<>();
        for (Case plane : List.of(new Case(Paths.linear("rotation 2d", 60, 0.1, ROTATION), null, Truth.STANDS),
                new Case(Paths.linear("two decays 2d", 40, 0.05, TWO_DECAYS), null, Truth.STANDS),
                new Case(Paths.linear("sheared decays 2d", 40, 0.05, SHEARED), null, Truth.SETTLES))) {
            out.add(new Case(plane.system(), Look.exponential(6), plane.truth()));
            out.add(new Case(plane.system(), Look.polynomial(2, 6), plane.truth()));
            out.add(new Case(plane.system(), Look.delays(6, 2), Truth.REPORTABLE));
            out.add(new Case(plane.system(), Look.monomials(2, 6), Truth.REPORTABLE));
            out.add(new Case(plane.system(), Look.gaussian(1, 8), Truth.NONE));
        }
        KnownSystem normal = Paths.linear("rotation and decay 3d", 60, 0.1, ROTATION_AND_DECAY);
        out.add(new Case(normal, Look.exponential(10), Truth.STANDS));
        out.add(new Case(normal, Look.linearKernel(3), Truth.STANDS));
        out.add(new Case(normal, Look.delays(4, 3), Truth.REPORTABLE));
        KnownSystem pushed = Paths.linear("pushed rotation 3d", 60, 0.1, PUSHED);
        out.add(new Case(pushed, Look.linearKernel(3), Truth.SETTLES));
        out.add(new Case(pushed, Look.delays(4, 3), Truth.REPORTABLE));
        KnownSystem three = Paths.linear("three rotations 6d", 80, 0.1, THREE_ROTATIONS);
        out.add(new Case(three, Look.linearKernel(6), Truth.STANDS));
        out.add(new Case(three, Look.delays(4, 6), Truth.REPORTABLE));
        KnownSystem coupled = Paths.linear("coupled rotations 6d", 80, 0.1, coupled());
        out.add(new Case(coupled, Look.linearKernel(6), Truth.SETTLES));
        out.add(new Case(coupled, Look.delays(4, 6), Truth.REPORTABLE));
        return out;
    }
}
