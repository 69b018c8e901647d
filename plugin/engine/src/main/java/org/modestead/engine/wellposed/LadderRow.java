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
 * @param residual holdout residual (training residual where there is no holdout)
 * @param distance how far it moved from the rung before: |Δλ| scaled; NaN on the lowest rung
 */
public record LadderRow(int rank, int mode, Complex rate, double weight, double weightNorm, double normRatio, double residual, double distance) {}
