package org.modestead.engine.operator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.RandomMatrices_DDRM;
import org.junit.jupiter.api.Test;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.fixtures.Motions;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.wellposed.JudgeSettings;

class NoiseCorrectionTest {

    private static final List<NoiseCorrection> CORRECTIONS =
            List.of(NoiseCorrection.TOTAL_LEAST_SQUARES, NoiseCorrection.FORWARD_BACKWARD);

    /** Two slowly fading oscillations in one channel, with white noise. */
    private static Snapshots tones(double noise) {
        return tones(noise, new Random(7));
    }

    private static Snapshots tones(double noise, Random random) {
        Run run = Motions.run("tones", 600, 0.1, t -> new double[] {Math.exp(-0.02 * t) * Math.cos(2 * t)
                + 0.6 * Math.exp(-0.01 * t) * Math.cos(5 * t + 1) + noise * random.nextGaussian()});
        return Motions.snapshots(0.1, 30, List.of(run), List.of());
    }

    private static FactoredCompression factored(long seed, int samples, int size, NoiseCorrection correction,
            boolean exact) {
        Random random = new Random(seed);
        DMatrixRMaj now = RandomMatrices_DDRM.rectangle(samples, size, -1, 1, random);
        DMatrixRMaj step = RandomMatrices_DDRM.rectangle(size, size, -0.4 / size, 0.4 / size, random);
        CommonOps_DDRM.addEquals(step, CommonOps_DDRM.identity(size));
        DMatrixRMaj next = Matrices.product(now, step);
        if (!exact) {
            CommonOps_DDRM.addEquals(next, RandomMatrices_DDRM.rectangle(samples, size, -0.1, 0.1, random));
        }
        return new FactoredCompression(new Coordinates(size), now, next, now, InnerProduct.DATA,
                new Evolution.StepMap(1), correction);
    }

    @Property(tries = 60, seed = "20261201")
    void withoutNoiseEveryCorrectionIsLeastSquares(@ForAll long seed, @ForAll @IntRange(min = 1, max = 8) int size) {
        DMatrixRMaj plain = factored(seed, 40, size, NoiseCorrection.NONE, true).whiten(size).action();
        for (NoiseCorrection correction : CORRECTIONS) {
            // rounding times the condition of a random matrix
            assertArrayEquals(plain.data, factored(seed, 40, size, correction, true).whiten(size).action().data, 1e-7,
                    correction.words());
        }
    }

    @Property(tries = 60, seed = "20261201")
    void totalLeastSquaresLeavesTheSmallestJointSingularValues(@ForAll long seed,
            @ForAll @IntRange(min = 1, max = 8) int size) {
        // definition: the columns (K; -I) span what the leading right singular vectors of [X Y] leave out
        FactoredCompression data = factored(seed, 40, size, NoiseCorrection.TOTAL_LEAST_SQUARES, false);
        OrthonormalCompression white = data.whiten(size);
        DMatrixRMaj map = inCoordinates(white);
        DMatrixRMaj joint = CommonOps_DDRM.concatColumnsMulti(data.now(), data.next());
        DMatrixRMaj leading = Matrices.block(LinearAlgebra.installed().svd(joint).v(), 0, 2 * size, 0, size);
        DMatrixRMaj left = CommonOps_DDRM.concatRowsMulti(map, Matrices.scaled(CommonOps_DDRM.identity(size), -1));
        assertEquals(0, CommonOps_DDRM.elementMaxAbs(Matrices.transposeProduct(leading, left)), 1e-10);
    }

    @Property(tries = 60, seed = "20261201")
    void forwardAndBackwardRunTheSameStepInBothDirections(@ForAll long seed, @ForAll @IntRange(min = 1, max = 8) int size) {
        // the geometric mean of the exchanged data is the inverse
        FactoredCompression data = factored(seed, 40, size, NoiseCorrection.FORWARD_BACKWARD, false);
        FactoredCompression exchanged = new FactoredCompression(data.features(), data.next(), data.now(), data.next(),
                InnerProduct.DATA, data.evolution(), NoiseCorrection.FORWARD_BACKWARD);
        DMatrixRMaj forth = inCoordinates(data.whiten(size));
        DMatrixRMaj back = inCoordinates(exchanged.whiten(size));
        assertArrayEquals(CommonOps_DDRM.identity(size).data, Matrices.product(forth, back).data, 1e-7);
    }

    private static DMatrixRMaj inCoordinates(OrthonormalCompression white) {
        DMatrixRMaj inverse = white.map().copy();
        CommonOps_DDRM.invert(inverse);
        return Matrices.product(white.map(), Matrices.product(white.action(), inverse));
    }

    @Test
    void everyRankIsCorrectedForItself() {
        for (NoiseCorrection correction : CORRECTIONS) {
            OrthonormalCompression full = new LinearEstimator(correction).compress(tones(0.05), Progress.NONE).whiten(12);
            OrthonormalCompression alone = new LinearEstimator(correction).compress(tones(0.05), Progress.NONE).whiten(4);
            // the same four directions, found twice
            assertArrayEquals(alone.action().data, full.leading(4).action().data, 1e-10, correction.words());
            assertArrayEquals(alone.action().data, full.leading(8).leading(4).action().data, 1e-10, correction.words());
            assertNotEquals(Matrices.block(full.action(), 0, 4, 0, 4).get(0, 0), alone.action().get(0, 0));
        }
    }

    @Test
    void theMeasuredActionIsKeptForTheResidual() {
        DMatrixRMaj plain = new LinearEstimator().compress(tones(0.05), Progress.NONE).whiten(4).action();
        for (NoiseCorrection correction : CORRECTIONS) {
            Compression noisy = new LinearEstimator(correction).compress(tones(0.05), Progress.NONE);
            assertArrayEquals(plain.data, Ridge.removed(noisy.whiten(12).leading(4), 0).data, 1e-12, correction.words());
        }
    }

    @Test
    void feignedDampingInDelayCoordinatesShrinks() {
        double plain = meanDampingError(NoiseCorrection.NONE);
        for (NoiseCorrection correction : CORRECTIONS) {
            double corrected = meanDampingError(correction);
            assertTrue(Math.abs(corrected) < plain / 3, correction.words() + " " + corrected + " against " + plain);
        }
    }

    /** Mean over recordings of how much more damping than the truth the first oscillation is given. */
    private static double meanDampingError(NoiseCorrection correction) {
        int recordings = 30;
        double sum = 0;
        Random random = new Random(7);
        for (int k = 0; k < recordings; k++) {
            Mode mode = Motions.nearest(Motions.spectrum(tones(0.3, random), new LinearEstimator(correction), 4), -0.02, 2);
            sum += -0.02 - mode.rate().re();
        }
        return sum / recordings;
    }

    @Test
    void ladderAndVerdictReadACorrectedFit() {
        for (NoiseCorrection correction : CORRECTIONS) {
            FittedOperator operator = Motions.fit(tones(0.02), new LinearEstimator(correction), 4);
            var rows = Motions.judge(operator, JudgeSettings.DEFAULT).ladder();
            assertTrue(rows.stream().mapToInt(row -> row.rank()).distinct().count() >= 3, "rungs below and above the rank");
        }
    }

    @Test
    void aRidgeIsRefusedBesideACorrection() {
        FitFault fault = assertThrows(FitFault.class, () -> OperatorFitter.fit(tones(0.02),
                new LinearEstimator(NoiseCorrection.TOTAL_LEAST_SQUARES), new RankRule.Fixed(4), 0.1, Progress.NONE));
        assertEquals("a ridge of 0.1 shrinks what the noise correction restores", fault.seen());
    }

    @Test
    void aCorrectionBelongsToTheDataInnerProduct() {
        DMatrixRMaj one = Motions.column(1, 2);
        assertThrows(IllegalArgumentException.class, () -> new FactoredCompression(new Coordinates(1), one, one,
                one, InnerProduct.SPACE, new Evolution.StepMap(1), NoiseCorrection.TOTAL_LEAST_SQUARES));
    }

    @Test
    void theMeanOfForwardAndBackwardIsTheRootOfTheirProductWhereTheyCommute() {
        // closed form, a shrunken quarter turn, whose square has no other real root near it: M = ρR, N = I, A = R
        DMatrixRMaj step = new DMatrixRMaj(new double[][] {{0, 0.8}, {-0.8, 0}});
        DMatrixRMaj mean = ForwardBackward.action(step, CommonOps_DDRM.identity(2));
        assertArrayEquals(new double[] {0, 1, -1, 0}, mean.data, 1e-15);
        // diagonal and therefore commuting: √(m · n/m) = √n
        DMatrixRMaj diagonal = new DMatrixRMaj(new double[][] {{0.5, 0}, {0, -0.3}});
        DMatrixRMaj second = new DMatrixRMaj(new double[][] {{0.49, 0}, {0, 0.16}});
        assertArrayEquals(new double[] {0.7, 0, 0, -0.4}, ForwardBackward.action(diagonal, second).data, 1e-15);
    }

    @Test
    void whatTheStepExtinguishesStaysExtinguished() {
        DMatrixRMaj step = new DMatrixRMaj(new double[][] {{0.5, 0}, {0, 0}});
        DMatrixRMaj second = new DMatrixRMaj(new double[][] {{1, 0}, {0, 1}});
        assertArrayEquals(new double[] {1, 0, 0, 0}, ForwardBackward.action(step, second).data, 1e-15);
    }
}
