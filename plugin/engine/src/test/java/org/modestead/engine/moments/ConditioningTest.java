package org.modestead.engine.moments;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Map;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.RandomFourierDictionary;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.operator.OperatorFitter;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Recording;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Scaling;

/** What keeps digits in long sums, and what random waves tend to. */
class ConditioningTest {

    /** Sums that cancel: terms of size 1e16 beside small ones, in two orders, against exact decimals. */
    @Test
    void compensatedSumsKeepWhatPlainSumsLose() {
        Random random = new Random(3);
        CompensatedSums.Running forward = new CompensatedSums.Running(CompensatedSums.zero(1, 1));
        CompensatedSums first = CompensatedSums.zero(1, 1);
        BigDecimal exact = BigDecimal.ZERO;
        double size = 0;
        for (int i = 0; i < 2000; i++) {
            double term = random.nextGaussian() * (i % 7 == 0 ? 1e16 : 1);
            exact = exact.add(new BigDecimal(term));
            size += Math.abs(term);
            forward.add(0, term);
            CompensatedSums one = new CompensatedSums(1, 1, new double[] {term}, new double[1]);
            first = i % 2 == 0 ? first.plus(one) : one.plus(first);
        }
        double unit = Math.ulp(1.0) / 2;
        double bound = Math.pow(2000 * unit, 2) * size + unit * Math.abs(exact.doubleValue());
        assertEquals(exact.doubleValue(), forward.total().value().get(0, 0), bound);
        assertEquals(exact.doubleValue(), first.value().get(0, 0), bound);
    }

    /**
     * Twelve delays of a smooth signal: singular values fall to 1e-9 of the largest. From sums of plain products, those below 1.5e-8 would be noise;
     * here the smallest ones agree with the fit in memory to what rounding of the samples themselves leaves, 1e-16 over 1e-9.
     */
    @Test
    void smallSingularValuesSurviveSummation() {
        int samples = 3000;
        DMatrixRMaj values = new DMatrixRMaj(samples, 1);
        double[] times = new double[samples];
        Random random = new Random(8);
        for (int k = 0; k < samples; k++) {
            times[k] = k * Streams.STEP;
            values.set(k, 0, Math.sin(0.1 * k) + 0.3 * Math.sin(0.037 * k) + 1e-9 * random.nextGaussian());
        }
        StreamPlan all = Streams.plan(new Features.Coordinates(NoiseCorrection.NONE), new DelayEmbedding(12, 1), false, Scaling.NONE);
        Recording recording = new Recording(Streams.CHANNELS.subList(0, 1), java.util.List.of(), java.util.List.of(new Run("1", times, values),
                new Run("run 4", times, values)), Streams.TIME);
        StreamPlan plan = new StreamPlan(recording.channels(), all.time(), all.step(), all.gapFactor(), all.gaps(), all.missing(), false,
                Scaling.NONE, all.delay(), 1, all.features(), all.keeping());
        FittedOperator there = OperatorFitter.fit(Streams.inMemory(plan, recording), plan.features().estimator(1), new RankRule.Fixed(12), 0,
                Progress.NONE);
        FittedOperator here = MomentFit.fit(Streams.moments(plan, recording), new RankRule.Fixed(12), 0, Progress.NONE);
        double[] expected = there.compression().singular();
        assertTrue(expected[11] < 1.5e-8 * expected[0], "not a hard case: " + expected[11] / expected[0]);
        for (int j = 0; j < 12; j++) {
            assertEquals(expected[j], here.compression().singular()[j], 1e-14 * expected[0], "singular value " + j);
            assertEquals(1, here.compression().singular()[j] / expected[j], 1e-5, "singular value " + j);
        }
    }

    /** The mean over D waves has a standard error of at most 1/√(2D) an entry; four of them are allowed. */
    @Test
    void randomWavesTendToTheirKernel() {
        Random random = new Random(1);
        DMatrixRMaj states = new DMatrixRMaj(12, 3);
        for (int i = 0; i < states.getNumElements(); i++) {
            states.data[i] = random.nextGaussian();
        }
        for (String family : new String[] {"gaussian", "laplacian", "matern32", "matern52"}) {
            KernelSpec spec = new KernelSpec(family, Map.of("scale", 1.7));
            DMatrixRMaj waves = new RandomFourierDictionary(spec, 2000, 9).on(3).evaluate(states);
            DMatrixRMaj found = Matrices.productTranspose(waves, waves);
            DMatrixRMaj expected = KernelFamilies.create(spec).matrix(states, states);
            for (int i = 0; i < expected.getNumElements(); i++) {
                assertEquals(expected.data[i], found.data[i], 4 / Math.sqrt(2 * 2000.0), family + " entry " + i);
            }
        }
    }
}
