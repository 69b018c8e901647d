package org.modestead.engine.watch;

import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * One mode in one window.
 *
 * @param look the window and what it shows
 * @param mode the watched mode
 * @param sighting empty where it was not found
 * @param averages moving average by quantity over its limit, signed: beyond 1 it alarms; only quantities with limits
 * @param alarms what lasts in this window
 */
public record WatchRow(Look look, WatchedMode mode, Optional<Sighting> sighting, Map<Quantity, Double> averages, List<Alarm.Kind> alarms) {

    /** Takes immutable copies. */
    public WatchRow {
        averages = Map.copyOf(averages);
        alarms = List.copyOf(alarms);
    }
}
