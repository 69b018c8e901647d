package org.modestead.engine.spectrum;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.modestead.engine.linalg.Complex;

/**
 * One dynamic mode: a real eigenvalue, or a conjugate pair told as one.
 *
 * <p>With rate {@code λ = σ + iω}: frequency {@code |ω|/2π} (damped, as it is seen), natural frequency
 * {@code |λ|/2π}, damping ratio {@code -σ/|λ|}, doubling time {@code ln 2/σ} (negative: the halving time of a decay).
 *
 * @param number 1-based, by falling energy share
 * @param indices columns of the spectrum's eigenvectors: one, or two conjugate ones (positive imaginary part first), or all
 *     members of a cluster with their conjugates
 * @param rate λ per time unit, imaginary part at least 0
 * @param amplitude root mean square over the training runs of the Euclidean norm over channels of the mode's part of
 *     the signal at the run's first sample; peak value for an oscillation; in prepared units
 * @param energyShare mean square of the mode's part over the training states divided by the sum of these over all
 *     modes, in [0, 1]
 * @param jointSoloGap relative difference of joint and solo weights, 0 for an orthonormal eigenbasis
 * @param weights joint weights of the N state components on the first index, prepared units
 * @param constant whether this is the constant function of rate 0, which every flow has: no evidence
 * @param cluster number of the cluster of nearly equal eigenvalues it belongs to, 0 for none
 * @param intervals of its figures, where they were computed
 */
public record Mode(
        int number,
        List<Integer> indices,
        Complex rate,
        double amplitude,
        double energyShare,
        double jointSoloGap,
        List<Complex> weights,
        boolean constant,
        int cluster,
        Optional<ModeIntervals> intervals) {

    private static final double TWO_PI = 2 * Math.PI;

    /** Takes immutable copies. */
    public Mode {
        indices = List.copyOf(indices);
        weights = List.copyOf(weights);
        Objects.requireNonNull(intervals);
    }

    /** Without intervals. */
    public Mode(int number, List<Integer> indices, Complex rate, double amplitude, double energyShare, double jointSoloGap,
            List<Complex> weights, boolean constant, int cluster) {
        this(number, indices, rate, amplitude, energyShare, jointSoloGap, weights, constant, cluster, Optional.empty());
    }

    /** Returns the same mode with intervals. */
    public Mode with(ModeIntervals found) {
        return new Mode(number, indices, rate, amplitude, energyShare, jointSoloGap, weights, constant, cluster,
                Optional.of(found));
    }

    /** Returns whether the mode oscillates (a conjugate pair). */
    public boolean oscillates() {
        return rate.im() != 0;
    }

    /** Returns the damped frequency |ω|/2π in cycles per time unit. */
    public double frequency() {
        return Math.abs(rate.im()) / TWO_PI;
    }

    /** Returns the undamped (natural) frequency |λ|/2π in cycles per time unit. */
    public double naturalFrequency() {
        return rate.abs() / TWO_PI;
    }

    /** Returns 2π/|ω|, infinite without oscillation. */
    public double period() {
        return TWO_PI / Math.abs(rate.im());
    }

    /** Returns -σ/|λ| in [-1, 1]; 0 for λ = 0, 1 for σ = -∞. */
    public double dampingRatio() {
        return rate.re() == Double.NEGATIVE_INFINITY ? 1 : rate.abs() == 0 ? 0 : -rate.re() / rate.abs();
    }

    /** Returns ln 2/σ: time to double, or when negative minus the time to halve; infinite for σ = 0. */
    public double doublingTime() {
        return rate.re() == 0 ? Double.POSITIVE_INFINITY : Math.log(2) / rate.re();
    }
}
