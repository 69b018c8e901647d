package org.modestead.engine.watch;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.modestead.engine.spectrum.Mode;

/**
 * Turns what happened to one mode into alarms.
 *
 * @param mode stored
 * @param place of it among the watched ones
 * @param looks windows in order
 */
record Events(Mode mode, int place, List<Look> looks) {

    /** Returns the alarms of one chart. */
    List<Alarm> of(Quantity quantity, Reference reference, Chart chart) {
        List<Alarm> out = new ArrayList<>();
        for (Chart.Event event : chart.events()) {
            double to = IntStream.rangeClosed(event.began(), event.last()).boxed().flatMap(t -> looks.get(t).modes().get(place).stream())
                    .mapToDouble(sighting -> sighting.figure(quantity)).average().orElse(Double.NaN);
            double height = IntStream.rangeClosed(event.first(), event.last()).mapToDouble(t -> Math.abs(chart.average()[t])).max().orElse(1);
            out.add(new Alarm(0, mode.number(), Alarm.Kind.of(quantity), event.first(), event.last(), event.began(), chart.lasts(event),
                    reference.figure(0), to, height));
        }
        return out;
    }

    /** Returns the alarms of a mode that is no longer found: at least so many fitted windows in a row without it. */
    List<Alarm> missing(int row) {
        List<Alarm> out = new ArrayList<>();
        int began = -1;
        int missed = 0;
        int raised = -1;
        for (int t = 0; t <= looks.size(); t++) {
            boolean end = t == looks.size();
            if (!end && !looks.get(t).fitted()) {
                continue;
            }
            if (!end && looks.get(t).modes().get(place).isEmpty()) {
                began = missed == 0 ? t : began;
                missed++;
                raised = row > 0 && missed == row ? t : raised;
                continue;
            }
            if (raised >= 0) {
                out.add(new Alarm(0, mode.number(), Alarm.Kind.MISSING, raised, t - 1, began, end, Double.NaN, Double.NaN,
                        (double) missed / row));
            }
            missed = 0;
            raised = -1;
        }
        return out;
    }
}
