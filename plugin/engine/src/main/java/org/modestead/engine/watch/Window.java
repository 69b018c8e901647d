package org.modestead.engine.watch;

import java.util.List;
import org.modestead.engine.recording.Run;

/**
 * A stretch of recorded time: part of a run, or several pieces with pauses between them.
 *
 * @param number counted from 1
 * @param pieces at least one, in the order recorded
 * @param recorded time recorded in it, without the pauses, in time units
 */
public record Window(int number, List<Run> pieces, double recorded) {

    /** Takes an immutable copy. */
    public Window {
        pieces = List.copyOf(pieces);
    }

    /** Returns the name of its run, or {@code first to last} where it holds several. */
    public String run() {
        String first = pieces.get(0).id();
        String last = pieces.get(pieces.size() - 1).id();
        return first.equals(last) ? first : first + " to " + last;
    }

    /** Returns the time of its first sample. */
    public double start() {
        return pieces.get(0).times()[0];
    }

    /** Returns the time of its last sample. */
    public double end() {
        Run last = pieces.get(pieces.size() - 1);
        return last.times()[last.samples() - 1];
    }

    /** Returns the number of samples. */
    public int samples() {
        return pieces.stream().mapToInt(Run::samples).sum();
    }
}
