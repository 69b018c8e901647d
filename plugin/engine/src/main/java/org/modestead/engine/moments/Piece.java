package org.modestead.engine.moments;

import java.util.Arrays;

/**
 * Neighbouring samples of a piece that are at hand: some that were seen before, as far as pairs reach back, and new ones. For one thread.
 *
 * <p>Samples may be borrowed from a neighbour who owns them, where a run is read in slices: they help to form states but are not counted.
 */
final class Piece {

    private final int channels;
    private final int reach;
    private final double[] times;
    private final double[] values;
    private final boolean[] own;
    private int size;
    /** Samples at the front that were counted already. */
    private int counted;
    private boolean longEnough;

    /**
     * @param channels n
     * @param reach samples that a pair reaches back from its newest one
     * @param block new samples that are taken up at once
     */
    Piece(int channels, int reach, int block) {
        this.channels = channels;
        this.reach = reach;
        int room = reach + block;
        this.times = new double[room];
        this.values = new double[room * channels];
        this.own = new boolean[room];
    }

    boolean isFull() {
        return size == times.length;
    }

    void add(double time, double[] row, boolean owned) {
        times[size] = time;
        System.arraycopy(row, 0, values, size * channels, channels);
        own[size] = owned;
        size++;
    }

    int size() {
        return size;
    }

    double[] times() {
        return times;
    }

    double[] values() {
        return values;
    }

    /** Notes that the piece is long enough to count if it has that many samples, and returns whether it is. */
    boolean isLongEnough(int needed) {
        longEnough |= size >= needed;
        return longEnough;
    }

    /** Returns the first own sample that was not counted, or the number of samples. */
    int firstNew() {
        int at = counted;
        while (at < size && !own[at]) {
            at++;
        }
        return at;
    }

    /** Returns one past the last own sample; own samples stand together. */
    int endNew() {
        int at = size;
        while (at > counted && !own[at - 1]) {
            at--;
        }
        return at;
    }

    /** Forgets all samples but those that later pairs need. */
    void carry() {
        int kept = Math.min(reach, size);
        int from = size - kept;
        System.arraycopy(times, from, times, 0, kept);
        System.arraycopy(values, from * channels, values, 0, kept * channels);
        System.arraycopy(own, from, own, 0, kept);
        size = kept;
        counted = kept;
    }

    /** Begins another piece. */
    void clear() {
        size = 0;
        counted = 0;
        longEnough = false;
        Arrays.fill(own, false);
    }
}
