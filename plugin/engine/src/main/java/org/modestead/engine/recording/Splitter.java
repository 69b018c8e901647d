package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.RecordingFault;

/** Decides which rows of every run train, calibrate and judge; looks at names and times only, never at values. */
final class Splitter {
    private static final double TIME_ROUNDING = 1e-6;

    private final List<Run> runs;

    private Splitter(List<Run> runs) {
        this.runs = runs;
    }

    /**
     * Returns one cut a run.
     *
     * @param runs checked, at least one
     * @param holdout taken first
     * @param calibration taken from what the holdout leaves
     * @throws RecordingFault if a named run does not exist or is taken already, or if no run is left to train
     */
    static List<Cut> cuts(List<Run> runs, Split holdout, Split calibration) {
        Splitter splitter = new Splitter(runs);
        int[] all = new int[runs.size()];
        for (int r = 0; r < all.length; r++) {
            all[r] = runs.get(r).samples();
        }
        int[] calibrationEnd = splitter.take(all, holdout, "holdout");
        int[] trainingEnd = splitter.take(calibrationEnd, calibration, "calibration");
        List<Cut> cuts = new ArrayList<>();
        for (int r = 0; r < all.length; r++) {
            cuts.add(new Cut(trainingEnd[r], calibrationEnd[r]));
        }
        return cuts;
    }

    private int[] take(int[] ends, Split split, String purpose) {
        int[] left = ends.clone();
        if (split instanceof Split.Runs named) {
            takeNamed(left, named.ids(), purpose);
        } else if (split instanceof Split.RunShare last) {
            takeLast(left, last.share());
        } else if (split instanceof Split.Tail tail) {
            for (int r = 0; r < left.length; r++) {
                left[r] -= (int) Math.min(left[r], Math.max(1, Math.round(tail.share() * left[r])));
            }
        } else if (split instanceof Split.TailDuration tail) {
            for (int r = 0; r < left.length; r++) {
                left[r] = endBefore(runs.get(r).times(), left[r], tail.time());
            }
        }
        for (int end : left) {
            if (end > 0) {
                return left;
            }
        }
        throw new RecordingFault(purpose, "no run of " + names() + " is left for training",
                "keep fewer or shorter runs away, or use the end of every run instead of whole runs");
    }

    private void takeNamed(int[] left, List<String> ids, String purpose) {
        if (ids.isEmpty()) {
            throw new RecordingFault(purpose, "no run is named", "name at least one of " + names());
        }
        for (String id : ids) {
            int r = indexOf(id, purpose);
            if (left[r] == 0) {
                throw new RecordingFault(purpose + " run " + id, "it is kept away already", "name it once only");
            }
            left[r] = 0;
        }
    }

    private int indexOf(String id, String purpose) {
        for (int r = 0; r < runs.size(); r++) {
            if (runs.get(r).id().equals(id)) {
                return r;
            }
        }
        throw new RecordingFault(purpose + " run " + id, "there is no such run", "name one of " + names());
    }

    private void takeLast(int[] left, double share) {
        int present = 0;
        for (int end : left) {
            present += end > 0 ? 1 : 0;
        }
        long wanted = Math.max(1, Math.round(share * present));
        for (int r = left.length - 1; r >= 0 && wanted > 0; r--) {
            if (left[r] > 0) {
                left[r] = 0;
                wanted--;
            }
        }
    }

    private static int endBefore(double[] times, int end, double duration) {
        if (end == 0) {
            return 0;
        }
        double start = times[end - 1] - duration;
        int last = end;
        while (last > 0 && times[last - 1] > start + TIME_ROUNDING * (times[end - 1] - times[Math.max(0, end - 2)])) {
            last--;
        }
        return last;
    }

    private String names() {
        List<String> ids = new ArrayList<>();
        for (Run run : runs) {
            ids.add(run.id());
        }
        int shown = Math.min(ids.size(), 20);
        String more = ids.size() > shown ? " and " + (ids.size() - shown) + " more" : "";
        return String.join(", ", ids.subList(0, shown)) + more;
    }
}
