package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collection;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
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
 * @param inputs known inputs at the same times, p x q
 * @param first samples before this one are history and never scored, in [0, p]
 */
record Series(String id, double[] times, DMatrixRMaj values, DMatrixRMaj inputs, int first) {

    /** Neighbouring samples further apart than this many steps do not belong to one uninterrupted recording. */
    private static final double CONTIGUOUS = 1.5;

    /** All grids of a forecast together, in numbers of 8 bytes: 270 MB. */
    private static final double MOST_NUMBERS = 1 << 25;

    /** Without inputs. */
    Series(String id, double[] times, DMatrixRMaj values, int first) {
        this(id, times, values, new DMatrixRMaj(times.length, 0), first);
    }

    /**
     * Returns the runs of a part, each continued backwards into the earlier parts it was cut from. Uneven runs are
     * interpolated linearly to the step, on a grid through the last sample before the part.
     *
     * @param step in time units, positive
     * @return possibly empty
     * @throws ForecastFault if such grids would fill the memory
     */
    static List<Series> of(Snapshots snapshots, Snapshots.Part part, double step) {
        Map<String, List<Run>> earlier = earlier(snapshots, part);
        List<Series> joined = snapshots.runs(part).stream().map(run -> joined(earlier, run, step)).toList();
        if (snapshots.step().isPresent()) {
            return joined;
        }
        requireRoom(joined, step);
        return joined.stream().map(series -> series.even(step, Math.max(series.first - 1, 0))).toList();
    }

    /**
     * Returns every run once, up to the last sample recorded of it in any part; uneven runs are interpolated to the
     * step on a grid through that sample.
     *
     * @throws ForecastFault if such grids would fill the memory
     */
    static List<Series> ends(Snapshots snapshots, double step) {
        Map<String, Series> latest = new LinkedHashMap<>();
        for (Snapshots.Part part : Snapshots.Part.values()) {
            Map<String, List<Run>> earlier = earlier(snapshots, part);
            for (Run run : snapshots.runs(part)) {
                latest.merge(run.id(), joined(earlier, run, step), (a, b) -> a.end() > b.end() ? a : b);
            }
        }
        if (snapshots.step().isPresent()) {
            return List.copyOf(latest.values());
        }
        requireRoom(latest.values(), step);
        return latest.values().stream().map(series -> series.even(step, series.length() - 1)).toList();
    }

    /** One time that is far off makes a grid of any size. */
    private static void requireRoom(Collection<Series> uneven, double step) {
        double numbers = 0;
        for (Series series : uneven) {
            double samples = Math.floor((series.end() - series.times[0]) / step) + 1;
            numbers += samples * Math.max(1, series.values.numCols + series.inputs.numCols);
            if (!(numbers <= MOST_NUMBERS)) {
                throw new ForecastFault("run " + series.id, String.format(Locale.ROOT, "its times from %s to %s are %.3g steps of %s", series.times[0], series.end(), samples,
                        step), "split the run where its times leap, or resample it to a longer step");
            }
        }
    }

    /** Returns the runs of earlier parts by name, those of the part just before first. */
    private static Map<String, List<Run>> earlier(Snapshots snapshots, Snapshots.Part part) {
        Map<String, List<Run>> byName = new HashMap<>();
        for (int earlier = part.ordinal() - 1; earlier >= 0; earlier--) {
            for (Run run : snapshots.runs(Snapshots.Part.values()[earlier])) {
                byName.computeIfAbsent(run.id(), name -> new ArrayList<>()).add(run);
            }
        }
        return byName;
    }

    private static Series joined(Map<String, List<Run>> earlier, Run run, double step) {
        Series out = new Series(run.id(), run.times(), run.values(), run.inputs(), run.leadIn());
        for (Run before : earlier.getOrDefault(run.id(), List.of())) {
            out = out.after(before, step);
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
        double[] joinedTimes = Arrays.copyOf(before.times(), more + length());
        System.arraycopy(times, 0, joinedTimes, more, length());
        return new Series(id, joinedTimes, stacked(before.values(), more, values), stacked(before.inputs(), more, inputs), first + more);
    }

    private static DMatrixRMaj stacked(DMatrixRMaj before, int rows, DMatrixRMaj after) {
        DMatrixRMaj out = new DMatrixRMaj(rows + after.numRows, after.numCols);
        System.arraycopy(before.data, 0, out.data, 0, rows * after.numCols);
        System.arraycopy(after.data, 0, out.data, rows * after.numCols, after.getNumElements());
        return out;
    }

    private Series even(double step, int anchor) {
        double at = times[anchor];
        int before = (int) Math.floor((at - times[0]) / step + 1e-9);
        int after = (int) Math.floor((end() - at) / step + 1e-9);
        double[] grid = new double[before + after + 1];
        DMatrixRMaj out = new DMatrixRMaj(grid.length, values.numCols);
        DMatrixRMaj known = new DMatrixRMaj(grid.length, inputs.numCols);
        int left = 0;
        for (int k = 0; k < grid.length; k++) {
            grid[k] = at + (k - before) * step;
            while (left < length() - 2 && times[left + 1] <= grid[k]) {
                left++;
            }
            interpolate(values, left, grid[k], out, k);
            interpolate(inputs, left, grid[k], known, k);
        }
        return new Series(id, grid, out, known, Math.min(first, before + 1));
    }

    private void interpolate(DMatrixRMaj from, int left, double time, DMatrixRMaj out, int row) {
        int right = Math.min(left + 1, length() - 1);
        double share = right == left ? 0 : (time - times[left]) / (times[right] - times[left]);
        double inside = Math.max(0, Math.min(1, share));
        for (int c = 0; c < out.numCols; c++) {
            out.set(row, c, (1 - inside) * from.get(left, c) + inside * from.get(right, c));
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

    /**
     * Returns the inputs at the history of a forecast and at the steps to come; after the last recorded one they are held.
     *
     * @return (memory + steps) x q
     */
    DMatrixRMaj inputs(int origin, int memory, int steps) {
        DMatrixRMaj out = new DMatrixRMaj(memory + steps, inputs.numCols);
        for (int k = 0; k < out.numRows; k++) {
            int sample = Math.min(origin + 1 - memory + k, length() - 1);
            System.arraycopy(inputs.data, sample * inputs.numCols, out.data, k * inputs.numCols, inputs.numCols);
        }
        return out;
    }

    /** Returns the series without what comes at and after a sample. */
    Series before(int end) {
        DMatrixRMaj kept = Matrices.block(values, 0, end, 0, values.numCols);
        return new Series(id, Arrays.copyOf(times, end), kept, Matrices.block(inputs, 0, end, 0, inputs.numCols), Math.min(first, end));
    }
}
