package org.modestead.engine.moments;

import java.util.Objects;
import org.modestead.engine.FitFault;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.basis.RandomFourierDictionary;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.operator.DictionaryEstimator;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.InputUse;
import org.modestead.engine.operator.KernelStepEstimator;
import org.modestead.engine.operator.LinearEstimator;
import org.modestead.engine.operator.NoiseCorrection;

/** Through which functions of the state a recording is summed up. Each has a fit in memory that gives the same figures. */
public sealed interface Features {

    /** Returns the inner product in which the fit is orthonormal. */
    InnerProduct innerProduct();

    /** Returns the fit in memory. */
    Estimator estimator(int stride);

    /** Returns whether scales, trends or landmarks must be known before the pass that sums. */
    boolean needsSurvey(boolean prepared);

    /**
     * The components of the state themselves. They need no survey: sums over them follow every shift and scale afterwards.
     *
     * @param correction for noise; {@link NoiseCorrection#EXTRAPOLATION} needs all samples at once and is refused
     */
    record Coordinates(NoiseCorrection correction) implements Features {
        /** Checks the correction. */
        public Coordinates {
            if (correction == NoiseCorrection.EXTRAPOLATION) {
                throw new FitFault("noise correction", "the extrapolation, which needs all samples at once",
                        "choose total least squares or forward and backward, or fit in memory");
            }
        }

        @Override
        public InnerProduct innerProduct() {
            return InnerProduct.DATA;
        }

        @Override
        public Estimator estimator(int stride) {
            return new LinearEstimator(stride, correction, InputUse.LEFT_IN);
        }

        @Override
        public boolean needsSurvey(boolean prepared) {
            return false;
        }
    }

    /**
     * Monomials of the state, see {@link Dictionary#monomials}.
     *
     * @param degree at least 1
     */
    record Monomials(int degree) implements Features {
        @Override
        public InnerProduct innerProduct() {
            return InnerProduct.DATA;
        }

        @Override
        public Estimator estimator(int stride) {
            return new DictionaryEstimator(Dictionary.monomials(degree), stride, InputUse.LEFT_IN);
        }

        @Override
        public boolean needsSurvey(boolean prepared) {
            return prepared;
        }
    }

    /**
     * Random waves whose products average to a kernel, see {@link RandomFourierDictionary}.
     *
     * @param kernel radial
     * @param waves D, at least 1
     * @param seed of the draw
     */
    record RandomFourier(KernelSpec kernel, int waves, long seed) implements Features {
        @Override
        public InnerProduct innerProduct() {
            return InnerProduct.DATA;
        }

        @Override
        public Estimator estimator(int stride) {
            return new DictionaryEstimator(new RandomFourierDictionary(kernel, waves, seed), stride, InputUse.LEFT_IN);
        }

        @Override
        public boolean needsSurvey(boolean prepared) {
            return prepared;
        }
    }

    /**
     * Kernel sections at landmarks that are chosen among the states a survey kept (Williams and Seeger, Advances in Neural Information
     * Processing Systems 13:682, 2001).
     *
     * @param kernel any
     * @param landmarks most of them, at least 1
     */
    record Landmarks(KernelSpec kernel, int landmarks) implements Features {
        @Override
        public InnerProduct innerProduct() {
            return InnerProduct.SPACE;
        }

        @Override
        public Estimator estimator(int stride) {
            return new KernelStepEstimator(kernelMade(), landmarks, stride);
        }

        @Override
        public boolean needsSurvey(boolean prepared) {
            return true;
        }

        Kernel kernelMade() {
            return KernelFamilies.create(Objects.requireNonNull(kernel));
        }
    }
}
