package org.modestead.engine.spectrum;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Cancelled;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/** Poles of a system stay from order to order, those of noise do not. */
class StabilisationTest {

    // CHECKS C4.4: three masses between two walls, m = k = 1
    private static final double[] NATURAL = {0.765366864730180, 1.41421356237310, 1.84775906502257};
    private static final double DAMPING = 0.01;
    private static final Stabilisation.Orders ORDERS = new Stabilisation.Orders(2, 40, 2);

    /** The chain set free from several displacements, each mode with 1 % damping, under white noise. */
    private static Snapshots chain(double noise, long seed) {
        Random random = new Random(seed);
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < 4; i++) {
            double[] weight = {0.5 + random.nextDouble(), 0.5 + random.nextDouble(), 0.5 + random.nextDouble()};
            runs.add(Motions.run("r" + i, Motions.grid(300, 0.4), time -> at(time, weight), noise, random));
        }
        return Motions.snapshots(0.4, 20, runs, List.of());
    }

    private static double[] at(double time, double[] weight) {
        double[] displacement = new double[3];
        for (int k = 1; k <= 3; k++) {
            double natural = NATURAL[k - 1];
            double motion = Math.exp(-DAMPING * natural * time) * Math.cos(natural * Math.sqrt(1 - DAMPING * DAMPING) * time);
            for (int j = 1; j <= 3; j++) {
                displacement[j - 1] += weight[k - 1] * Math.sin(j * k * Math.PI / 4) * motion;
            }
        }
        return displacement;
    }

    private static Stabilisation of(Snapshots snapshots) {
        FittedOperator operator = Motions.fit(snapshots, new LinearEstimator(), 6);
        return Stabilisation.of(operator, ORDERS, StabilityLimits.DEFAULT, Progress.NONE);
    }

    private static boolean ofTheChain(Pole pole) {
        return IntStream.range(0, 3).anyMatch(k -> Math.abs(2 * Math.PI * pole.frequency() / NATURAL[k] - 1) < 0.02
                && pole.dampingRatio().orElse(1) < 0.05 && ModalAssurance.of(pole.shape(), mode(k + 1)) > 0.95);
    }

    private static List<Complex> mode(int k) {
        return IntStream.rangeClosed(1, 3).mapToObj(j -> new Complex(Math.sin(j * k * Math.PI / 4), 0)).toList();
    }

    @Test
    void polesOfTheChainAreStableAndThoseOfNoiseAreNot() {
        for (long seed : new long[] {1, 2, 3}) {
            Stabilisation found = of(chain(0.02, seed));
            List<Pole> above = found.poles().stream().filter(pole -> pole.order() > 10).toList();
            List<Pole> physical = above.stream().filter(StabilisationTest::ofTheChain).toList();
            List<Pole> noise = above.stream().filter(pole -> !ofTheChain(pole)).toList();
            assertEquals(3 * 15, physical.size(), "three at each of the orders 12, 14, ..., 40");
            assertTrue(physical.stream().filter(Pole::stable).count() >= 0.95 * physical.size(), "seed " + seed + ": "
                    + physical.stream().filter(Pole::stable).count());
            // noise alone: two poles within 1 %, 5 % and 0.98 at once are an accident
            assertTrue(noise.size() > 100 && noise.stream().filter(Pole::stable).count() <= 0.1 * noise.size(), "seed " + seed + ": "
                    + noise.stream().filter(Pole::stable).count() + " of " + noise.size());
        }
    }

    @Test
    void theLinesOfManyOrdersAreTheModesOfTheChain() {
        for (long seed : new long[] {1, 2, 3}) {
            List<PoleLine> lines = of(chain(0.02, seed)).lines().stream().filter(line -> line.poles().size() >= 10).toList();
            assertEquals(3, lines.size(), lines.stream().map(line -> line.median(Pole::frequency) + " x " + line.poles().size()).toList()
                    .toString());
            for (int k = 0; k < 3; k++) {
                // 2 % noise on 1200 samples of three channels: frequency to a thousandth, damping ratio 0.01 to a twentieth
                assertEquals(NATURAL[k] / (2 * Math.PI), lines.get(k).median(Pole::frequency), 1e-3 * NATURAL[k]);
                assertEquals(DAMPING, lines.get(k).median(pole -> pole.dampingRatio().orElseThrow()), 5e-4);
                assertEquals(1, ModalAssurance.of(lines.get(k).last().shape(), mode(k + 1)), 0.01);
            }
        }
    }

    @Test
    void withoutNoiseEveryPoleIsThatOfTheChainFromTheFullOrderOn() {
        FittedOperator operator = Motions.fit(chain(0, 1), new LinearEstimator(), 6);
        assertTrue(operator.compression().rank() >= 6);
        Stabilisation found = Stabilisation.of(operator, new Stabilisation.Orders(2, 6, 2), StabilityLimits.DEFAULT, Progress.NONE);
        List<Pole> last = found.poles().stream().filter(pole -> pole.order() == 6).toList();
        assertEquals(3, last.size());
        for (int k = 0; k < 3; k++) {
            // exact samples: rounding
            assertEquals(NATURAL[k] * Math.sqrt(1 - DAMPING * DAMPING), last.get(k).rate().im(), 1e-8);
            assertEquals(DAMPING, last.get(k).dampingRatio().orElseThrow(), 1e-8);
        }
        assertEquals(List.of(2, 4, 6), found.orders());
        assertTrue(found.poles().stream().filter(pole -> pole.order() == 2).noneMatch(pole -> pole.stableFrequency()), "nothing before it");
    }

    @Test
    void aSlowDecayIsHeldAgainstItsRateAndARateOfNothingAgainstTheLengthOfTheRun() {
        PoleFollower follower = new PoleFollower(StabilityLimits.DEFAULT, 10);
        List<Complex> shape = List.of(new Complex(1, 0), new Complex(2, 0));
        follower.add(List.of(pole(2, new Complex(-0.3, 0), shape), pole(2, new Complex(1e-9, 5), shape)));
        follower.add(List.of(pole(4, new Complex(-0.31, 0), shape), pole(4, new Complex(-2e-9, 5), shape)));
        follower.add(List.of(pole(6, new Complex(-0.4, 0), shape), pole(6, new Complex(-2e-9, 5.2), shape)));
        List<Pole> poles = follower.poles();
        assertTrue(poles.get(2).stable() && poles.get(2).stableFrequency(), "3.2 % of its rate");
        assertTrue(poles.get(3).stable(), "3e-9 of 5 is no damping at all");
        assertTrue(poles.get(4).stableFrequency() && !poles.get(4).stableDamping(), "a quarter of its rate");
        assertTrue(!poles.get(5).stableFrequency() && poles.get(5).stableShape(), "4 % of its frequency");
        assertEquals(1, poles.get(3).stableOrders());
        assertEquals(0, poles.get(5).stableOrders());
        assertEquals(2, follower.lines().size());
    }

    private static Pole pole(int order, Complex rate, List<Complex> shape) {
        return new Pole(order, rate, shape, false, false, false, 0);
    }

    @Test
    void aLineThatBreaksOffIsTakenUpAgain() {
        PoleFollower follower = new PoleFollower(StabilityLimits.DEFAULT, 100);
        List<Complex> shape = List.of(new Complex(1, 0), new Complex(0, 1));
        double[] frequencies = {5, 5.001, 7, 5.002, 5.003};
        for (int k = 0; k < frequencies.length; k++) {
            follower.add(List.of(pole(2 * k, new Complex(-0.1, frequencies[k]), shape)));
        }
        assertEquals(1, follower.lines().size());
        assertEquals(List.of(0, 2, 6, 8), follower.lines().get(0).poles().stream().map(Pole::order).toList());
    }

    @Test
    void ordersThatTheDataDoNotHoldAreRefusedAndItCanBeCancelled() {
        FittedOperator operator = Motions.fit(chain(0, 1), new LinearEstimator(), 6);
        assertThrows(FitFault.class, () -> Stabilisation.of(operator, new Stabilisation.Orders(2, 10_000, 2), StabilityLimits.DEFAULT,
                Progress.NONE));
        assertThrows(FitFault.class, () -> Stabilisation.of(operator, new Stabilisation.Orders(6, 7, 2), StabilityLimits.DEFAULT, Progress.NONE));
        assertThrows(IllegalArgumentException.class, () -> new Stabilisation.Orders(0, 4, 2));
        assertThrows(IllegalArgumentException.class, () -> new StabilityLimits(0, 0.1, 0.9));
        Progress stopped = new Progress() {
            @Override
            public void report(double fraction, String message) {
                // nobody watches
            }

            @Override
            public void checkCancelled() {
                throw new Cancelled("stopped");
            }
        };
        assertThrows(Cancelled.class, () -> Stabilisation.of(operator, new Stabilisation.Orders(2, 6, 2),
                StabilityLimits.DEFAULT, stopped));
    }
}
