package org.modestead.engine.watch;

import java.util.HashMap;
import java.util.Map;

/** Limits of many charts of one weight and one rate of false alarms; each is computed once. Used by one thread. */
final class ControlLimits {

    private final double weight;
    private final double rate;
    private final Map<Key, ControlLimit> known = new HashMap<>();

    private record Key(double pieces, double degrees) {}

    /**
     * @param weight w
     * @param rate of false alarms of one chart per window
     */
    ControlLimits(double weight, double rate) {
        this.weight = weight;
        this.rate = rate;
    }

    double rate() {
        return rate;
    }

    /** See {@link ControlLimit#of}. */
    ControlLimit of(double pieces, double degrees) {
        return known.computeIfAbsent(new Key(pieces, degrees), key -> ControlLimit.of(weight, rate, key.pieces(), key.degrees()));
    }
}
