package org.modestead.host.bench.run;

/** Says spans of time as people do. */
public final class Spans {

    private static final double MINUTE = 60;
    private static final double HOUR = 3600;

    private Spans() {}

    /** Returns for example {@code 5 s}, {@code 3 min}, {@code 2 h}. */
    public static String words(double seconds) {
        if (seconds < 1.5 * MINUTE) {
            return Math.max(1, Math.round(seconds)) + " s";
        }
        return seconds < 1.5 * HOUR ? Math.round(seconds / MINUTE) + " min" : Math.round(seconds / HOUR) + " h";
    }
}
