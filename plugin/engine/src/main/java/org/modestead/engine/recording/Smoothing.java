package org.modestead.engine.recording;

import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;

/**
 * What smoothing did to the prepared samples: every sample of a channel became the value of a {@link LocalParabola} through its neighbours.
 * Inside a run of even steps that is a fixed filter: {@code e^(λt)} stays {@code e^(λt)}, so rates are left alone; only the ends of runs
 * are bent, the less the shorter the window is beside the motion. White noise comes out smaller and no longer white.
 *
 * @param reach h of each channel in samples, 0 = left as recorded
 * @param noise standard deviation of the noise on single samples before smoothing, in prepared units; 0 where left as recorded
 */
public record Smoothing(List<Integer> reach, List<Double> noise) {

    /** Takes immutable copies and checks that the lengths agree. */
    public Smoothing {
        reach = List.copyOf(reach);
        noise = List.copyOf(noise);
        if (reach.size() != noise.size()) {
            throw new IllegalArgumentException("reach and noise must have one entry a channel");
        }
    }

    /** Leaves n channels as recorded. */
    public static Smoothing none(int n) {
        return new Smoothing(Collections.nCopies(n, 0), Collections.nCopies(n, 0.0));
    }

    /** Returns whether any channel was smoothed: whether noise was told from motion. */
    public boolean active() {
        return reach.stream().anyMatch(h -> h > 0);
    }

    /** Returns whether a channel was smoothed. */
    public boolean touches(int channel) {
        return reach.get(channel) > 0;
    }

    /**
     * Smooths samples of one run.
     *
     * @param times rising, length p
     * @param values p x n, not written
     * @return p x n
     */
    public DMatrixRMaj apply(double[] times, DMatrixRMaj values) {
        return active() ? apply(times, values, new int[] {times.length}) : values;
    }

    /** Smooths a stretch cut into parts, each from its own samples and those of parts before it. */
    DMatrixRMaj apply(double[] times, DMatrixRMaj values, int[] ends) {
        DMatrixRMaj out = values.copy();
        for (int h : reach.stream().filter(h -> h > 0).distinct().toList()) {
            int[] channels = IntStream.range(0, reach.size()).filter(c -> reach.get(c) == h).toArray();
            int begin = 0;
            for (int end : ends) {
                smooth(Arrays.copyOf(times, end), begin, Math.min(h, (end - 1) / 2), values, channels, out);
                begin = end;
            }
        }
        return out;
    }

    private static void smooth(double[] known, int begin, int h, DMatrixRMaj values, int[] channels, DMatrixRMaj out) {
        for (int k = begin; h > 0 && k < known.length; k++) {
            LocalParabola parabola = LocalParabola.at(known, k, h);
            for (int c : channels) {
                out.set(k, c, parabola.value(values.data, values.numCols, c));
            }
        }
    }

    /** Returns a copy of a whole run, smoothed. */
    Run apply(Run run) {
        return run.withValues(apply(run.times(), run.values()));
    }
}
