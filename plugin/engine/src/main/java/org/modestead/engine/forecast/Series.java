package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/**
 * A run of one part with everything recorded of it before: what a forecast may look back on.
 *
 * @param id the run's name
 * @param times sample times, length p, strictly rising, one step apart
 * @param values prepared samples, p x n
 * @param first samples before this one are history and never scored, in [0, p]
 */
record Series(String id, double[] times, DMatrixRMaj values, int first) {

    /** Neighbouring samples further apart than this many steps do not belong to one uninterrupted recording. */
    private static final double CONTIGUOUS = 1.5;

    /**
     * Returns the runs of a part, each continued backwards into the earlier parts it was cut from. Uneven runs are
     * interpolated linearly to the step, on a grid through the last sample before the part.
     *
     * @param step in time units, positive
     * @return possibly empty
     */
    static List<Series> of(Snapshots snapshots, Snapshots.Part part, double step) {
        List<Series> out = new ArrayList<>();
        for (Run run : snapshots.runs(part)) {
            Series series = joined(snapshots, part, run, step);
            out.add(snapshots.step().isPresent() ? series : series.even(step, Math.max(series.first - 1, 0)));
        }
        return out;
    }

    /**
     * Returns every run once, up to the last sample recorded of it in any part; uneven runs are interpolated to the
     * step on a grid through that sample.
     */
    static List<Series> ends(Snapshots snapshots, double step) {
        Map<String, Series> latest = new LinkedHashMap<>();
        for (Snapshots.Part part : Snapshots.Part.values()) {
            for (Run run : snapshots.runs(part)) {
                latest.merge(run.id(), joined(snapshots, part, run, step), (a, b) -> a.end() > b.end() ? a : b);
            }
        }
        if (snapshots.step().isPresent()) {
            return List.copyOf(latest.values());
        }
        return latest.values().stream().map(series -> series.even(step, series.length() - 1)).toList();
    }

    private static Series joined(Snapshots snapshots, Snapshots.Part part, Run run, double step) {
        Series out = new Series(run.id(), run.times(), run.values(), run.leadIn());
        for (int earlier = part.ordinal() - 1; earlier >= 0; earlier--) {
            for (Run before : snapshots.runs(Snapshots.Part.values()[earlier])) {
                if (before.id().equals(run.id())) {
                    out = out.after(before, step);
                }
            }
        }
        return out;
    }

    private Series after(Run before, double step) {
        int more = 0;
        while (more < before.samples() && before.times()[more] < times[0] - 0.5 * step) {
            more++;
        }
        if (more == 0 || before.times()[more - 1] < times[0] - CONTIGUOUS * step) {
            return this;
        }
        int n = values.numCols;
        double[] joinedTimes = Arrays.copyOf(before.times(), more + length());
        System.arraycopy(times, 0, joinedTimes, more, length());
        DMatrixRMaj joined = new DMatrixRMaj(more + length(), n);
        System.arraycopy(before.values().data, 0, joined.data, 0, more * n);
        System.arraycopy(values.data, 0, joined.data, more * n, length() * n);
        return new Series(id, joinedTimes, joined, first + more);
    }

    private Series even(double step, int anchor) {
        double at = times[anchor];
        int before = (int) Math.floor((at - times[0]) / step + 1e-9);
        int after = (int) Math.floor((end() - at) / step + 1e-9);
        double[] grid = new double[before + after + 1];
        DMatrixRMaj out = new DMatrixRMaj(grid.length, values.numCols);
        int left = 0;
        for (int k = 0; k < grid.length; k++) {
            grid[k] = at + (k - before) * step;
            while (left < length() - 2 && times[left + 1] <= grid[k]) {
                left++;
            }
            interpolate(left, grid[k], out, k);
        }
        return new Series(id, grid, out, Math.min(first, before + 1));
    }

    private void interpolate(int left, double time, DMatrixRMaj out, int row) {
        int right = Math.min(left + 1, length() - 1);
        double share = right == left ? 0 : (time - times[left]) / (times[right] - times[left]);
        double inside = Math.max(0, Math.min(1, share));
        for (int c = 0; c < out.numCols; c++) {
            out.set(row, c, (1 - inside) * values.get(left, c) + inside * values.get(right, c));
        }
    }

    /** Returns the number of samples p. */
    int length() {
        return times.length;
    }

    /** Returns the last time. */
    double end() {
        return times[times.length - 1];
    }

    /**
     * Returns the first origin from which this series' own samples can be forecast.
     *
     * @param memory samples of history needed
     * @return index of a sample; there is a sample to score after it only if it is below p - 1
     */
    int firstOrigin(int memory) {
        return Math.max(first - 1, memory - 1);
    }

    /** Returns how many samples can be forecast from the first origin; none when 0 or less. */
    int ahead(int memory) {
        return length() - 1 - firstOrigin(memory);
    }

    /** Returns the last {@code memory} samples up to the origin, newest last. */
    DMatrixRMaj history(int origin, int memory) {
        return Matrices.block(values, origin + 1 - memory, origin + 1, 0, values.numCols);
    }

    /** Returns the series without what comes at and after a sample. */
    Series before(int end) {
        DMatrixRMaj kept = Matrices.block(values, 0, end, 0, values.numCols);
        return new Series(id, Arrays.copyOf(times, end), kept, Math.min(first, end));
    }
}
