package org.modestead.engine.operator;

/**
 * What is done about noise in the states, which makes least squares report too much damping: a single oscillation with a
 * ratio R of signal to noise power is given the multiplier {@code |z| = 1 / (1 + 1/R)} (CHECKS C7.4).
 */
public enum NoiseCorrection {

    /** Nothing: least squares, which takes all noise to be in the later state. */
    NONE("least squares"),

    /** Noise of the same size in both states is projected out, see {@link TotalLeastSquares}. */
    TOTAL_LEAST_SQUARES("total least squares"),

    /** The geometric mean of the step forward and the inverted step backward, see {@link ForwardBackward}. */
    FORWARD_BACKWARD("least squares forward and backward"),

    /** What noise adds to the arrays is measured and taken off, for any functions, see {@link NoiseMoments}. */
    EXTRAPOLATION("least squares extrapolated to no noise");

    private final String words;

    NoiseCorrection(String words) {
        this.words = words;
    }

    /** Returns the method in words, for the report. */
    public String words() {
        return words;
    }
}
