package org.modestead.nodes.data;

import java.util.List;

/**
 * Signals that are a sum of modes about a working point, known in closed form:
 * <pre>    y_c(t) = offset_c + Σ_m a_m s_mc e^(σ_m t) cos(ω_m t + p_m + θ_mc)</pre>
 *
 * <p>{@link StrictMath} throughout, so that every machine makes the same bytes.
 *
 * @param offset working point, one a channel, in its unit
 * @param modes in the order of the arrays
 * @param size s, modes x channels, in the channel's unit
 * @param phase θ, modes x channels, in radians
 */
record ModalSum(double[] offset, List<TrueMode> modes, double[][] size, double[][] phase) {

    /**
     * How strongly one run excites each mode.
     *
     * @param amplitude a, one a mode
     * @param phase p, one a mode, in radians
     */
    record Excitation(double[] amplitude, double[] phase) {}

    /** Returns the exact values of all channels at a time after the start of the run. */
    double[] at(double time, Excitation excitation) {
        double[] values = offset.clone();
        for (int m = 0; m < modes.size(); m++) {
            TrueMode mode = modes.get(m);
            double envelope = excitation.amplitude()[m] * StrictMath.exp(mode.growth() * time);
            double angle = mode.angularFrequency() * time + excitation.phase()[m];
            for (int c = 0; c < values.length; c++) {
                values[c] += envelope * size[m][c] * StrictMath.cos(angle + phase[m][c]);
            }
        }
        return values;
    }
}
