package org.modestead.benchmark;

import java.util.Map;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.LandmarkFeatures;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.linalg.Matrices;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;

/**
 * What a kernel fit does before any decomposition, on all cores: 20 000 states of 32 channels, on a torus and with a little noise, and 200
 * landmarks among them.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
public class KernelBenchmark {

    private static final int STATES = 20_000;
    private static final int CHANNELS = 32;
    private static final int LANDMARKS = 200;
    private static final double STEP = 0.02;
    private static final double NOISE = 0.02;

    private Kernel kernel;
    private DMatrixRMaj states;
    private DMatrixRMaj chosen;
    private LandmarkFeatures features;

    /** Makes the states and chooses the landmarks once. */
    @Setup
    public void fill() {
        kernel = KernelFamilies.create(new KernelSpec("gaussian", Map.of("scale", 4.0)));
        Random random = new Random(1);
        double[][] mix = new double[CHANNELS][4];
        for (double[] row : mix) {
            for (int k = 0; k < row.length; k++) {
                row[k] = random.nextGaussian();
            }
        }
        states = new DMatrixRMaj(STATES, CHANNELS);
        for (int i = 0; i < STATES; i++) {
            double slow = 2 * Math.PI * 0.097 * STEP * i;
            double fast = 2 * Math.PI * 0.31 * STEP * i;
            double[] torus = {Math.cos(fast), Math.sin(fast), Math.cos(slow), Math.sin(slow)};
            for (int c = 0; c < CHANNELS; c++) {
                double value = 0;
                for (int k = 0; k < torus.length; k++) {
                    value += mix[c][k] * torus[k];
                }
                states.set(i, c, Math.tanh(0.6 * value) + NOISE * random.nextGaussian());
            }
        }
        chosen = Matrices.block(states, 0, LANDMARKS, 0, CHANNELS);
        features = LandmarkFeatures.choose(kernel, states, LANDMARKS, Progress.NONE);
    }

    /** Kernel values between all states and as many as there are landmarks. */
    @Benchmark
    public DMatrixRMaj kernelMatrix() {
        return kernel.matrix(states, chosen);
    }

    /** The choice of the landmarks: partial Cholesky with pivoting. */
    @Benchmark
    public LandmarkFeatures landmarks() {
        return LandmarkFeatures.choose(kernel, states, LANDMARKS, Progress.NONE);
    }

    /** The orthonormal functions of the landmarks at all states. */
    @Benchmark
    public DMatrixRMaj featureValues() {
        return features.evaluate(states);
    }
}
