package org.modestead.engine.moments;

import java.util.Set;
import java.util.TreeSet;
import org.modestead.engine.recording.Snapshots.Part;

/**
 * What a fit in one pass must not see. Nothing may depend on what comes later or on which machine reads it, so shares are drawn by a seeded
 * hash of the run's name, or of that and the number of a stretch.
 */
public sealed interface Apart {

    /**
     * Returns the part that a stretch of a run belongs to.
     *
     * @param seed of the draw
     * @param run name
     * @param stretch number of the stretch in the run, from 0
     */
    Part of(long seed, String run, long stretch);

    /** Everything trains. */
    record None() implements Apart {
        @Override
        public Part of(long seed, String run, long stretch) {
            return Part.TRAINING;
        }
    }

    /**
     * Whole runs, named.
     *
     * @param holdout that judge
     * @param calibration that set the width of forecast bands
     */
    record Runs(Set<String> holdout, Set<String> calibration) implements Apart {
        /** Takes immutable copies in a fixed order. */
        public Runs {
            holdout = java.util.Collections.unmodifiableSet(new TreeSet<>(holdout));
            calibration = java.util.Collections.unmodifiableSet(new TreeSet<>(calibration));
        }

        @Override
        public Part of(long seed, String run, long stretch) {
            return holdout.contains(run) ? Part.HOLDOUT : calibration.contains(run) ? Part.CALIBRATION : Part.TRAINING;
        }
    }

    /**
     * Shares.
     *
     * @param holdout share that judges, in [0, 1)
     * @param calibration share that sets the width of forecast bands, in [0, 1)
     * @param wholeRuns whether whole runs are drawn, or stretches of runs
     */
    record Shares(double holdout, double calibration, boolean wholeRuns) implements Apart {
        /** Checks the range. */
        public Shares {
            if (!(holdout >= 0 && calibration >= 0 && holdout + calibration < 1)) {
                throw new IllegalArgumentException("shares of " + holdout + " and " + calibration + " leave nothing to train");
            }
        }

        @Override
        public Part of(long seed, String run, long stretch) {
            double drawn = SeededDraw.share(SeededDraw.of(seed, run, wholeRuns ? -1 : stretch));
            return drawn < holdout ? Part.HOLDOUT : drawn < holdout + calibration ? Part.CALIBRATION : Part.TRAINING;
        }
    }
}
