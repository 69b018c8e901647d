package org.modestead.engine.basis;

import java.util.Map;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.FitFault;
import org.modestead.engine.kernel.KernelSpec;

/**
 * Random waves for a radial kernel: ω is drawn from the kernel's spectral measure, for the Gaussian of scale s a normal distribution of
 * standard deviation 1/s, for a Matérn kernel of smoothness ν (1/2 the Laplacian, 3/2, 5/2) that divided by the root of χ²/2ν with
 * 2ν degrees of freedom, a multivariate t distribution.
 *
 * <p>Rahimi and Recht, Advances in Neural Information Processing Systems 20:1177, 2007; cosines and sines in pairs as in Sutherland and
 * Schneider, Uncertainty in Artificial Intelligence 2015; spectral density of Matérn kernels: Rasmussen and Williams, Gaussian Processes for
 * Machine Learning, MIT Press 2006, equation 4.15.
 *
 * @param kernel family and scale
 * @param waves D, at least 1; 2 D functions
 * @param seed of the draw
 */
public record RandomFourierDictionary(KernelSpec kernel, int waves, long seed) implements Dictionary {

    private static final int MOST = 2500;
    /** Twice the smoothness ν; 0 stands for infinitely smooth. */
    private static final Map<String, Integer> FREEDOM = Map.of("gaussian", 0, "laplacian", 1, "matern32", 3, "matern52", 5);

    /** Checks family and number. */
    public RandomFourierDictionary {
        if (!FREEDOM.containsKey(kernel.family()) || kernel.scale().isEmpty()) {
            throw new FitFault("random waves", "the kernel " + kernel.label() + ", which is not known by its spectral measure",
                    "choose a kernel of the distance: gaussian, laplacian, matern32 or matern52");
        }
        if (waves < 1 || waves > MOST) {
            throw new FitFault("random waves", waves + " waves", "choose from 1 to " + MOST);
        }
    }

    @Override
    public String describe() {
        return "cosines and sines of random waves for " + kernel.label();
    }

    @Override
    public FunctionBasis on(int stateSize) {
        Random random = new Random(seed);
        double scale = kernel.scale().orElseThrow();
        int freedom = FREEDOM.get(kernel.family());
        DMatrixRMaj frequencies = new DMatrixRMaj(waves, stateSize);
        for (int i = 0; i < waves; i++) {
            double stretch = stretch(random, freedom) / scale;
            for (int k = 0; k < stateSize; k++) {
                frequencies.set(i, k, stretch * random.nextGaussian());
            }
        }
        return new RandomFourierFunctions(frequencies, describe());
    }

    private static double stretch(Random random, int freedom) {
        if (freedom == 0) {
            return 1;
        }
        double squares = 0;
        for (int j = 0; j < freedom; j++) {
            squares += Math.pow(random.nextGaussian(), 2);
        }
        return Math.sqrt(freedom / squares);
    }
}
