package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.List;

/** Cuts a run where its samples must not be joined. */
final class Stretches {
    private Stretches() {}

    /**
     * Returns the stretches of one run, in order, none of them empty.
     *
     * @param gaps gaps of the run
     * @param splitGaps whether a gap ends a stretch
     * @param missing missing cells of the run
     * @param splitMissing whether a sample with a missing cell is dropped and ends a stretch
     */
    static List<Stretch> of(Gaps gaps, boolean splitGaps, MissingCells missing, boolean splitMissing) {
        List<Stretch> stretches = new ArrayList<>();
        int samples = gaps.run().samples();
        int from = 0;
        for (int row = 0; row < samples; row++) {
            if (splitMissing && missing.inRow(row)) {
                close(stretches, from, row);
                from = row + 1;
            } else if (splitGaps && gaps.follows(row)) {
                close(stretches, from, row + 1);
                from = row + 1;
            }
        }
        close(stretches, from, samples);
        return stretches;
    }

    private static void close(List<Stretch> stretches, int from, int to) {
        if (to > from) {
            stretches.add(new Stretch(from, to));
        }
    }
}
