package org.modestead.nodes.figure;

import java.util.Arrays;
import java.util.List;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.words.TimeUnit;

/** Axes that several figures share. */
final class Axes {
    private Axes() {}

    static Figure.Axis time(TimeAxis time) {
        return switch (time.kind()) {
            case NUMBER -> Figure.Axis.linear(labelled("time", time.unit()));
            case DATE -> new Figure.Axis("date", false, List.of(), "date");
            case DATE_TIME -> new Figure.Axis("date and time (UTC)", false, List.of(), "date-time");
        };
    }

    /** Returns engine times as the axis counts them: numbers as they are, else days or seconds since 1970. */
    static double[] times(TimeAxis axis, double[] times) {
        double factor = axis.calendarUnitsPerUnit();
        return factor == 1 ? times : Arrays.stream(times).map(time -> time * factor).toArray();
    }

    static Figure.Axis growth(TimeUnit unit) {
        return Figure.Axis.linear(labelled("growth rate", unit.rate()));
    }

    static Figure.Axis frequency(TimeUnit unit) {
        return Figure.Axis.linear(labelled("frequency", unit.frequency()));
    }

    static String labelled(String quantity, String unit) {
        return unit.isEmpty() ? quantity : quantity + " [" + unit + "]";
    }
}
