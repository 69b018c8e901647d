package org.modestead.engine.kernel;

import java.util.List;

/** The families that come with the engine. */
public final class BuiltInKernels implements KernelLibrary {

    private static final String FINITE_SMOOTHNESS =
            "The space holds functions of finite smoothness that fade far from the data, and no constant.";

    @Override
    public List<KernelFamily> families() {
        return List.of(new ExponentialKernels(), gaussian(), new PolynomialKernels(), new LinearKernels(), laplacian(), matern32(), matern52());
    }

    /**
     * {@code K(x, y) = exp(-|x-y|²/(2 s²))}. Its space holds no non-zero polynomial and no constant (Steinwart, Hush and
     * Scovel, IEEE Trans. Inf. Theory 52:4635, 2006; Minh, Constr. Approx. 32:307, 2010), hence with one coordinate no
     * eigenfunction of a polynomial flow, and with several none that grows or decays; see {@link ModeRoom#STEADY}.
     */
    private static KernelFamily gaussian() {
        return new RadialFamily("gaussian", "Gaussian", "exp(-|x-y|²/(2 scale²))",
                "The space holds no constant, no polynomial and no exponential, and its functions fade far off: no mode that grows or decays"
                        + " is in it, although forecasts through it may be good.",
                scale -> squared -> Math.exp(-squared / (2 * scale * scale)), true);
    }

    /**
     * {@code K(x, y) = exp(-|x-y|/s)}, the Matérn kernel of smoothness 1/2. Rasmussen and Williams, <i>Gaussian Processes for
     * Machine Learning</i>, MIT Press 2006, section 4.2.1.
     */
    private static KernelFamily laplacian() {
        return new RadialFamily("laplacian", "Laplacian", "exp(-|x-y|/scale)",
                "The space holds functions with one weak derivative and no constant: a mode in it cannot be as smooth as smooth motion asks.",
                scale -> squared -> Math.exp(-Math.sqrt(squared) / scale), false);
    }

    /** {@code K(x, y) = (1 + a) e^-a} with {@code a = √3 |x-y|/s}. Rasmussen and Williams 2006, equation 4.17. */
    private static KernelFamily matern32() {
        return new RadialFamily("matern32", "Matérn 3/2", "(1 + a) exp(-a), a = √3 |x-y|/scale", FINITE_SMOOTHNESS, scale -> squared -> {
            double a = Math.sqrt(3 * squared) / scale;
            return (1 + a) * Math.exp(-a);
        }, false);
    }

    /** {@code K(x, y) = (1 + a + a²/3) e^-a} with {@code a = √5 |x-y|/s}. Rasmussen and Williams 2006, equation 4.17. */
    private static KernelFamily matern52() {
        return new RadialFamily("matern52", "Matérn 5/2", "(1 + a + a²/3) exp(-a), a = √5 |x-y|/scale", FINITE_SMOOTHNESS,
                scale -> squared -> {
                    double a = Math.sqrt(5 * squared) / scale;
                    return (1 + a + a * a / 3) * Math.exp(-a);
                }, false);
    }
}
