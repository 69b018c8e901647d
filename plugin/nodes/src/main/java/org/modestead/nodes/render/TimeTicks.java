package org.modestead.nodes.render;

import org.knowm.xchart.style.AxesChartStyler;
import org.modestead.nodes.figure.Figure;

/**
 * How figure times become the chart's axis and its labels.
 *
 * @param millisPerUnit milliseconds in one unit of the figure's time; 0 for an axis of plain numbers
 * @param pattern of the labels, fine enough for the range shown; empty for plain numbers
 */
record TimeTicks(double millisPerUnit, String pattern) {
    private static final double DAY = 86_400_000;
    private static final double HOUR = 3_600_000;
    private static final double MINUTE = 60_000;
    private static final double YEAR = 365.25 * DAY;

    static TimeTicks of(Figure.Axis axis, Range range) {
        double unit = switch (axis.time()) {
            case "date" -> DAY;
            case "date-time" -> 1000;
            default -> 0;
        };
        return new TimeTicks(unit, unit == 0 ? "" : pattern((range.high() - range.low()) * unit, unit == DAY));
    }

    private static String pattern(double span, boolean daysOnly) {
        if (span > 6 * YEAR) {
            return "yyyy";
        }
        if (span > YEAR / 2) {
            return "yyyy-MM";
        }
        if (daysOnly || span > 8 * DAY) {
            return "yyyy-MM-dd";
        }
        if (span > 10 * HOUR) {
            return "MM-dd HH:mm";
        }
        return span > 10 * MINUTE ? "HH:mm" : "HH:mm:ss";
    }

    boolean dated() {
        return millisPerUnit > 0;
    }

    /** Returns the chart's number for a time of the figure. */
    double axis(double time) {
        return dated() ? time * millisPerUnit : time;
    }

    void apply(AxesChartStyler style) {
        if (dated()) {
            style.setDatePattern(pattern);
        }
    }
}
