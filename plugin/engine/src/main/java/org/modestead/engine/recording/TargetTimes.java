package org.modestead.engine.recording;

import java.util.Arrays;
import java.util.OptionalDouble;
import org.modestead.engine.RecordingFault;

/**
 * The times at which samples are wanted, always inside the recorded stretch.
 *
 * @param uniform step of the grid that starts at the first sample; empty = the recorded times
 * @param fillGaps whether a gap between recorded times gets evenly spaced times, about the median step apart; a grid
 *     covers gaps anyway
 */
record TargetTimes(OptionalDouble uniform, boolean fillGaps) {
    private static final double END_SLACK = 1e-9;
    private static final double MOST_CELLS = 1 << 28;

    /**
     * Returns the times for one stretch.
     *
     * @param rows the stretch, at least one row
     * @param gaps gaps of its run
     * @throws RecordingFault if the step is so small that the samples would not fit into memory
     */
    double[] of(StagedRows rows, Gaps gaps) {
        double[] recorded = Arrays.copyOfRange(rows.times(), rows.from(), rows.ends()[2]);
        if (uniform.isEmpty()) {
            return fillGaps && gaps.count() > 0 ? filled(recorded, gaps) : recorded;
        }
        double step = uniform.getAsDouble();
        if (StepEstimate.of(recorded).agreesWith(step)) {
            return recorded;
        }
        double count = Math.floor((recorded[recorded.length - 1] - recorded[0]) / step + END_SLACK) + 1;
        requireMemory(count, gaps, "a step of " + Wording.number(step), "choose a step near the median step "
                + Wording.number(gaps.typicalStep()));
        double[] grid = new double[(int) count];
        for (int k = 0; k < grid.length; k++) {
            grid[k] = recorded[0] + k * step;
        }
        return grid;
    }

    /** Returns how many targets lie within the first stages, up to row {@code end}. */
    int count(double[] targets, StagedRows rows, int end) {
        if (end <= rows.from()) {
            return 0;
        }
        double last = rows.times()[end - 1] + (uniform.isPresent() ? END_SLACK * uniform.getAsDouble() : 0);
        int at = Arrays.binarySearch(targets, last);
        return at >= 0 ? at + 1 : -at - 1;
    }

    private static double[] filled(double[] recorded, Gaps gaps) {
        double[] times = new double[2 * recorded.length];
        int count = 0;
        for (int i = 0; i < recorded.length; i++) {
            double step = i == 0 ? 0 : recorded[i] - recorded[i - 1];
            double wanted = step > gaps.limit() ? Math.rint(step / gaps.typicalStep()) : 1;
            requireMemory(count + wanted, gaps, "bridging the gap of " + Wording.number(step), "have gaps split");
            int parts = (int) wanted;
            if (count + parts > times.length) {
                times = Arrays.copyOf(times, Math.max(2 * times.length, count + parts));
            }
            for (int part = 1; part < parts; part++) {
                times[count++] = recorded[i - 1] + step * part / parts;
            }
            times[count++] = recorded[i];
        }
        return Arrays.copyOf(times, count);
    }

    private static void requireMemory(double samples, Gaps gaps, String cause, String remedy) {
        if (samples * gaps.run().values().numCols > MOST_CELLS) {
            throw new RecordingFault("run " + gaps.run().id(), cause + " would give " + Wording.number(samples) + " samples",
                    remedy);
        }
    }
}
