package org.modestead.nodes.figure;

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
