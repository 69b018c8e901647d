package org.modestead.engine.recording;

import java.util.List;

/** Which samples are kept away from a fit. */
public sealed interface Split {

    /** None. */
    record None() implements Split {}

    /**
     * Whole runs, named.
     *
     * @param ids names as in the recording
     */
    record Runs(List<String> ids) implements Split {
        /** Takes an immutable copy. */
        public Runs {
            ids = List.copyOf(ids);
        }
    }

    /**
     * The last runs, in the order of the recording.
     *
     * @param share of the number of runs, in (0, 1), rounded, at least one run
     */
    record RunShare(double share) implements Split {
        /** Checks the range. */
        public RunShare {
            requireShare(share);
        }
    }

    /**
     * The end of every run.
     *
     * @param share of the run's samples, in (0, 1), rounded, at least one sample
     */
    record Tail(double share) implements Split {
        /** Checks the range. */
        public Tail {
            requireShare(share);
        }
    }

    /**
     * The end of every run.
     *
     * @param time length of the end in time units, positive; a tail of L holds the samples later than {@code last - L}
     */
    record TailDuration(double time) implements Split {
        /** Checks the range. */
        public TailDuration {
            if (!(time > 0) || Double.isInfinite(time)) {
                throw new IllegalArgumentException("a tail of " + time + " time units must be positive and finite");
            }
        }
    }

    private static void requireShare(double share) {
        if (!(share > 0 && share < 1)) {
            throw new IllegalArgumentException("a share of " + share + " must lie between 0 and 1");
        }
    }
}
