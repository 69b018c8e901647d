package org.modestead.engine.recording;

import java.util.Arrays;
import java.util.Optional;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;

/**
 * Samples of one stretch at the wanted times: training first, then calibration, then holdout.
 *
 * @param id name of the runs made from it
 * @param recorded name of the run it was cut from
 * @param weight of that run as recorded
 * @param times rising
 * @param values channels; those of the recorded run where every sample of it is one
 * @param inputs inputs
 * @param ends one past the last sample of training, calibration and holdout
 * @param interpolated samples at times that were not recorded
 * @param filled interpolated cells of each recorded column
 */
record Piece(
        String id,
        String recorded,
        double weight,
        double[] times,
        DMatrixRMaj values,
        DMatrixRMaj inputs,
        int[] ends,
        int interpolated,
        long[] filled) {


    /**
     * Samples one stretch; a sample of a part is interpolated from recorded samples of that part and earlier ones only.
     *
     * @param id name
     * @param run it is cut from
     * @param rows without missing cells, at least one row
     * @param gaps gaps of the run
     * @param wanted which times
     */
    static Piece sample(String id, Run run, StagedRows rows, Gaps gaps, TargetTimes wanted) {
        double[] times = wanted.of(rows, gaps);
        if (rows.values() == run.values() && Arrays.equals(times, run.times())) {
            int[] same = IntStream.of(rows.ends()).map(end -> wanted.count(times, rows, end)).toArray();
            return new Piece(id, run.id(), run.weight(), times, run.values(), run.inputs(), same, 0, rows.filled());
        }
        DMatrixRMaj values = new DMatrixRMaj(times.length, rows.values().numCols);
        DMatrixRMaj inputs = new DMatrixRMaj(times.length, rows.inputs().numCols);
        int[] ends = new int[rows.ends().length];
        int interpolated = 0;
        int done = 0;
        for (int stage = 0; stage < ends.length; stage++) {
            int rowEnd = rows.ends()[stage];
            ends[stage] = wanted.count(times, rows, rowEnd);
            if (ends[stage] > done) {
                interpolated += new MonotoneCubic(rows.times(), rows.values(), rows.from(), rowEnd)
                        .evaluate(times, done, ends[stage], values);
                new MonotoneCubic(rows.times(), rows.inputs(), rows.from(), rowEnd)
                        .evaluate(times, done, ends[stage], inputs);
                done = ends[stage];
            }
        }
        return new Piece(id, run.id(), run.weight(), times, values, inputs, ends, interpolated, rows.filled());
    }

    /** Returns the number of samples. */
    int samples() {
        return times.length;
    }

    /** Returns the number of samples that belong to a part. */
    int samples(Snapshots.Part part) {
        int stage = part.ordinal();
        return ends[stage] - (stage == 0 ? 0 : ends[stage - 1]);
    }

    /** Returns the same piece with prepared values instead of recorded ones. */
    Piece prepared(Preparation preparation) {
        int n = values.numCols;
        DMatrixRMaj out = values.createLike();
        for (int k = 0, at = 0; k < times.length; k++) {
            for (int c = 0; c < n; c++, at++) {
                out.data[at] = preparation.prepare(c, times[k], values.data[at]);
            }
        }
        return new Piece(id, recorded, weight, times, out, inputs, ends, interpolated, filled);
    }

    /** Returns the same piece smoothed; no part reads a sample of a later one. */
    Piece smoothed(Smoothing smoothing) {
        return new Piece(id, recorded, weight, times, smoothing.apply(times, values, ends), inputs, ends, interpolated, filled);
    }

    /**
     * Returns the samples of one part, after as much history as its first predicted sample needs.
     *
     * @param part which
     * @param reach samples before the newest one that a state needs
     * @return empty when the part has no sample, or with its history too few for two states
     */
    Optional<Run> part(Snapshots.Part part, int reach) {
        int end = ends[part.ordinal()];
        int begin = end - samples(part);
        int leadIn = Math.min(begin, reach + 1);
        if (end == begin || end - begin + leadIn < reach + 2) {
            return Optional.empty();
        }
        int first = begin - leadIn;
        if (first == 0 && end == times.length) {
            return Optional.of(new Run(id, times, values, inputs, leadIn));
        }
        return Optional.of(new Run(id, Arrays.copyOfRange(times, first, end), rows(values, first, end),
                rows(inputs, first, end), leadIn));
    }

    private static DMatrixRMaj rows(DMatrixRMaj all, int from, int to) {
        int n = all.numCols;
        DMatrixRMaj part = new DMatrixRMaj(to - from, n);
        System.arraycopy(all.data, from * n, part.data, 0, part.data.length);
        return part;
    }
}
