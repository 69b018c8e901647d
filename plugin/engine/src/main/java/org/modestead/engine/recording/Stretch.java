package org.modestead.engine.recording;

/**
 * Neighbouring samples of a run that stay together.
 *
 * @param from first row
 * @param to one past the last row
 */
record Stretch(int from, int to) {

    /** Returns the number of rows. */
    int length() {
        return to - from;
    }

    /** Returns the nearest row end inside this stretch. */
    int clamp(int end) {
        return Math.max(from, Math.min(to, end));
    }
}
