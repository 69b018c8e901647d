package org.modestead.engine.watch;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.Snapshots.Part;

/**
 * Recordings cut into windows of equal recorded time that share no sample, so that chance in one says nothing about the next.
 *
 * <p>A window goes on after a gap, as long as the pause is no longer than a window. Runs shorter than a window are not cut but gathered
 * whole, since a run that dies away tells most at its beginning; other runs start a window of their own. A window that ends early
 * is kept from half the length on.
 *
 * @param windows in the order recorded
 * @param leftOut recorded time that was too short for a window, in time units
 */
record Windows(List<Window> windows, double leftOut) {

    private static final double LEAST = 0.5;

    /**
     * Cuts recordings.
     *
     * @param runs see {@link #runs}
     * @param length of a window in time units
     * @param least samples that a piece must have
     */
    static Windows of(List<Run> runs, double length, int least) {
        Cutter cutter = new Cutter(length, least);
        runs.forEach(cutter::add);
        cutter.close();
        return new Windows(List.copyOf(cutter.windows), cutter.leftOut);
    }

    /** Returns the runs of some parts, each once and without history, pieces of one run in the order of time. */
    static List<Run> runs(Snapshots snapshots, List<Part> parts) {
        Map<String, List<Run>> byName = new LinkedHashMap<>();
        for (Part part : parts) {
            for (Run run : snapshots.runs(part)) {
                if (run.leadIn() < run.samples() && run.weight() > 0) {
                    byName.computeIfAbsent(recording(run), name -> new ArrayList<>()).add(run.cut(run.leadIn(), run.samples()).weighted(1));
                }
            }
        }
        List<Run> out = new ArrayList<>();
        byName.values().forEach(pieces -> {
            pieces.sort(Comparator.comparingDouble(run -> run.times()[0]));
            out.addAll(pieces);
        });
        return out;
    }

    /** Returns the name of the recording that a piece is of: pieces between gaps are called {@code run#1}, {@code run#2}. */
    private static String recording(Run run) {
        int at = run.id().indexOf('#');
        return at > 0 ? run.id().substring(0, at) : run.id();
    }

    /** Returns the time that a run has recorded: its duration and one step more. */
    static double recorded(Run run) {
        return run.samples() < 2 ? 0 : run.duration() * run.samples() / (run.samples() - 1);
    }

    /** The window being filled. */
    private static final class Cutter {

        private final double length;
        private final int least;
        private final List<Window> windows = new ArrayList<>();
        private List<Run> open = new ArrayList<>();
        private double filled;
        private double leftOut;

        Cutter(double length, int least) {
            this.length = length;
            this.least = least;
        }

        void add(Run run) {
            boolean whole = recorded(run) < length;
            if (!open.isEmpty() && !goesOn(run) && !whole) {
                close();
            }
            if (goesOn(run) && pause(run) > length) {
                close();
            }
            int at = 0;
            while (at < run.samples()) {
                int to = whole && !goesOn(run) ? run.samples() : end(run, at);
                take(run.cut(at, to));
                at = to;
            }
        }

        private void take(Run piece) {
            if (piece.samples() < least) {
                leftOut += recorded(piece);
            } else {
                open.add(piece);
                filled += recorded(piece);
            }
            if (filled >= length - 0.5 * least * recorded(piece) / piece.samples()) {
                close();
            }
        }

        /** First row behind what the window still needs. */
        private int end(Run run, int from) {
            double step = run.duration() / Math.max(1, run.samples() - 1);
            double until = run.times()[from] + length - filled - 0.5 * step;
            int to = from + 1;
            while (to < run.samples() && run.times()[to] < until) {
                to++;
            }
            return to;
        }

        private boolean goesOn(Run run) {
            return !open.isEmpty() && recording(open.get(open.size() - 1)).equals(recording(run)) && follows(run);
        }

        private boolean follows(Run run) {
            return !open.isEmpty() && pause(run) >= 0;
        }

        private double pause(Run run) {
            Run last = open.get(open.size() - 1);
            return run.times()[0] - last.times()[last.samples() - 1];
        }

        void close() {
            if (filled >= LEAST * length) {
                windows.add(new Window(windows.size() + 1, open, filled));
            } else {
                leftOut += filled;
            }
            open = new ArrayList<>();
            filled = 0;
        }
    }
}
