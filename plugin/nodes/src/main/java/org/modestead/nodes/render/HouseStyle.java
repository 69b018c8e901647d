package org.modestead.nodes.render;

import java.awt.BasicStroke;
import java.awt.Font;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Locale;
import java.util.TimeZone;
import org.knowm.xchart.style.AxesChartStyler;
import org.modestead.nodes.figure.Figure;

/** How every picture looks: white paper, thin frame, light grid. */
final class HouseStyle {
    private static final Font PLAIN = new Font(Font.SANS_SERIF, Font.PLAIN, 12);
    static final int ACROSS = 80;
    static final int UPWARDS = 46;
    private static final int TICK_DIGITS = 7;
    private static final int SHORTEST_PLAIN = 5;
    private static final int LONGEST_PLAIN = 5;
    private static final String RAISED = "\u2070\u00b9\u00b2\u00b3\u2074\u2075\u2076\u2077\u2078\u2079";
    private static final Font BOLD = new Font(Font.SANS_SERIF, Font.BOLD, 14);

    private HouseStyle() {}

    static void apply(AxesChartStyler style, Figure figure) {
        style.setBaseFont(PLAIN).setChartBackgroundColor(Palette.PAPER).setChartFontColor(Palette.INK).setChartPadding(12)
                .setPlotBackgroundColor(Palette.PAPER).setPlotBorderColor(Palette.FRAME).setPlotBorderVisible(true)
                .setChartTitleFont(BOLD).setChartTitleBoxVisible(false).setChartTitlePadding(8)
                .setLocale(Locale.ROOT).setMarkerSize(Marks.SIZE).setLegendVisible(false);
        style.setPlotMargin(0).setAxisTitleFont(PLAIN).setAxisTickLabelsFont(PLAIN.deriveFont(11f)).setAxisTitlePadding(8)
                .setAxisTickLabelsColor(Palette.QUIET_INK).setAxisTickMarksColor(Palette.FRAME).setAxisTickPadding(4)
                .setAxisTickMarkLength(4).setPlotGridLinesColor(Palette.GRID).setPlotGridLinesStroke(new BasicStroke(1f))
                .setTimezone(TimeZone.getTimeZone("UTC")).setXAxisTickMarkSpacingHint(ACROSS).setYAxisTickMarkSpacingHint(UPWARDS)
                .setXAxisLogarithmic(figure.x().logarithmic()).setYAxisLogarithmic(figure.y().logarithmic());
        style.setPlotContentSize(1);
    }

    /**
     * Returns how far apart ticks stand at least, so that an axis of whole numbers carries no others.
     *
     * @param usual distance in pixels
     * @param length of the axis in pixels, roughly
     */
    static int spacing(Figure.Axis axis, Range range, int usual, int length) {
        return axis.time().equals("whole") ? Math.max(usual, (int) (length / (range.high() - range.low()))) : usual;
    }

    /** Returns a tick's number without the rounding errors of stepping, as few characters as say it. */
    static String tick(double value) {
        if (value == 0 || !Double.isFinite(value)) {
            return "0";
        }
        BigDecimal rounded = new BigDecimal(value).round(new MathContext(TICK_DIGITS, RoundingMode.HALF_EVEN))
                .stripTrailingZeros();
        int exponent = rounded.precision() - rounded.scale() - 1;
        boolean plain = exponent >= -SHORTEST_PLAIN && exponent <= LONGEST_PLAIN;
        String text = plain ? rounded.toPlainString() : rounded.movePointLeft(exponent).toPlainString() + " \u00d7 10" + raised(exponent);
        return text.replace('-', '\u2212');
    }

    private static String raised(int exponent) {
        StringBuilder out = new StringBuilder(exponent < 0 ? "\u207b" : "");
        Integer.toString(Math.abs(exponent)).chars().forEach(digit -> out.append(RAISED.charAt(digit - '0')));
        return out.toString();
    }
}
