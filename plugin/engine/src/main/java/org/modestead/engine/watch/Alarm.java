package org.modestead.engine.watch;

/**
 * One event: a change of a mode from its first sign to its end, however many windows it lasts.
 *
 * @param number counted from 1 by first window
 * @param mode number of the stored mode
 * @param kind what changed
 * @param first index into the looks of the window that raised it
 * @param last index of the last window it lasts
 * @param began index of the window in which the change probably began
 * @param ongoing whether it lasts at the end of the recordings
 * @param from figure of the centre: frequency, damping ratio or modal assurance; NaN for a missing mode
 * @param to mean figure since it began; NaN for a missing mode
 * @param height largest moving average over its limit, above 1; for a missing mode the windows missed in a row over those that alarm
 */
public record Alarm(int number, int mode, Kind kind, int first, int last, int began, boolean ongoing, double from, double to, double height) {

    /** What changed. */
    public enum Kind {
        /** The frequency. */
        FREQUENCY("frequency"),
        /** The damping ratio. */
        DAMPING("damping"),
        /** The shape. */
        SHAPE("shape"),
        /** The mode is no longer found. */
        MISSING("missing");

        private final String word;

        Kind(String word) {
            this.word = word;
        }

        /** Returns the word used in tables. */
        public String word() {
            return word;
        }

        static Kind of(Quantity quantity) {
            return valueOf(quantity.name());
        }
    }

    /** Returns {@code to/from - 1} of a frequency or damping ratio, the difference of a modal assurance; NaN for a missing mode. */
    public double change() {
        return kind == Kind.SHAPE ? to - from : to / from - 1;
    }

    Alarm numbered(int other) {
        return new Alarm(other, mode, kind, first, last, began, ongoing, from, to, height);
    }
}
