package org.modestead.engine.wellposed;

import org.modestead.engine.linalg.Complex;

/**
 * One mode on one rung.
 *
 * @param rank of the rung
 * @param mode number of the mode at the fitted rank that it was matched to; 0 for the strongest mode of the rung, whichever it is
 * @param rate λ on this rung
 * @param weight size of its contribution: root mean square over the training states, prepared units
 * @param weightNorm norm of its joint weight vector over the newest samples, prepared units
 * @param normRatio ‖φ‖_H / ‖φ‖_L2(data)
 * @param residual holdout residual (training residual where there is no holdout), the share of the noise taken off
 * @param rawResidual the same with it
 * @param gap relative difference of joint and solo weights, see {@link Eigenspace}
 * @param overlap largest with its own conjugate and with the functions of other rates that carry the signal
 * @param noise what noise of the data's own size does to the mode
 */
public record LadderRow(int rank, int mode, Complex rate, double weight, double weightNorm, double normRatio, double residual,
        double rawResidual, double gap, double overlap, NoiseEffect noise) {

    /** Returns the square of the residual that noise was found to make. */
    double takenOff() {
        return rawResidual * rawResidual - residual * residual;
    }

    /** Returns whether the square of what is left of the residual is at most so many times that which noise makes. */
    boolean withinNoise(double times) {
        return residual * residual <= times * takenOff();
    }
}
