package org.modestead.engine.watch;

import java.util.ArrayList;
import java.util.List;

/**
 * The moving average of the scores of one quantity of one mode, window by window, and the events in it.
 *
 * <p>An event begins where the average leaves the limits and ends where it is back within half of them, so that an average that dwells
 * at a limit is one event and not many. The change probably began in the window τ from which on the scores up to the alarm at T are the
 * likeliest under a shift, {@code τ = argmax (Σ_(τ..T) z)²/(T - τ + 1)} (Samuel, Pignatiello and Calvin, Qual. Eng. 10:521, 1998).
 *
 * @param average over its limit, one entry a window, signed; NaN before the mode was first found
 * @param events from, to (inclusive) and begin of each
 * @param raised whether an event lasts, one entry a window
 */
record Chart(double[] average, List<Event> events, boolean[] raised) {

    private static final double CALM = 0.5;

    /** Indices of windows. */
    record Event(int first, int last, int began) {}

    /**
     * @param scores one a window, NaN where there is none
     * @param limit of the average
     * @param oneSided whether only rising scores alarm
     */
    static Chart of(double[] scores, ControlLimit limit, boolean oneSided) {
        double[] average = new double[scores.length];
        boolean[] raised = new boolean[scores.length];
        List<Event> events = new ArrayList<>();
        double y = 0;
        int first = -1;
        int free = 0;
        for (int t = 0; t < scores.length; t++) {
            double before = y;
            y = Double.isNaN(scores[t]) ? y : (1 - limit.weight()) * y + limit.weight() * scores[t];
            average[t] = y / limit.height();
            double out = oneSided ? average[t] : Math.abs(average[t]);
            if (first >= 0 && (out < CALM || before * y < 0)) {
                events.add(new Event(first, t - 1, began(scores, free, first, average[first])));
                free = t;
                first = -1;
            }
            first = first < 0 && out > 1 ? t : first;
            raised[t] = first >= 0;
        }
        if (first >= 0) {
            events.add(new Event(first, scores.length - 1, began(scores, free, first, average[first])));
        }
        return new Chart(average, List.copyOf(events), raised);
    }

    /** Where a change to one side began, not before a window. */
    private static int began(double[] scores, int free, int alarm, double side) {
        double sum = 0;
        int windows = 0;
        double likeliest = 0;
        int began = alarm;
        for (int t = alarm; t >= free; t--) {
            if (!Double.isNaN(scores[t])) {
                sum += Math.signum(side) * scores[t];
                windows++;
                if (sum > 0 && sum * sum / windows > likeliest) {
                    likeliest = sum * sum / windows;
                    began = t;
                }
            }
        }
        return began;
    }

    /** Returns whether an event lasts to the end. */
    boolean lasts(Event event) {
        return event.last() == average.length - 1 && raised[average.length - 1];
    }
}
