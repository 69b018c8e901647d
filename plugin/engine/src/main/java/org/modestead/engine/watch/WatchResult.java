package org.modestead.engine.watch;

import java.util.List;
import org.modestead.engine.Doubt;

/**
 * What became of the watched modes.
 *
 * @param length recorded time of a full window, in time units
 * @param modes watched, by number
 * @param looks windows of the new recordings in order
 * @param rows window by window, mode by mode
 * @param alarms events in the order in which they were raised
 * @param charts number of charts among which the false alarms allowed were shared out
 * @param doubts what a reader of the results must know
 */
public record WatchResult(double length, List<WatchedMode> modes, List<Look> looks, List<WatchRow> rows, List<Alarm> alarms, int charts,
        List<Doubt> doubts) {

    /** Takes immutable copies. */
    public WatchResult {
        modes = List.copyOf(modes);
        looks = List.copyOf(looks);
        rows = List.copyOf(rows);
        alarms = List.copyOf(alarms);
        doubts = List.copyOf(doubts);
    }
}
