package org.modestead.nodes.render;

import java.awt.Color;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Date;
import java.util.List;
import org.knowm.xchart.XYChart;
import org.knowm.xchart.XYSeries;
import org.knowm.xchart.XYSeries.XYSeriesRenderStyle;
import org.knowm.xchart.style.Styler;
import org.knowm.xchart.style.markers.SeriesMarkers;
import org.modestead.nodes.figure.Figure;

/** Draws a figure with numbers or times on both axes. */
final class XyPlot {
    private static final int MARKED_UP_TO = 60;
    private static final int RIGHT = 1;
    /** Pixels that title, labels and ticks take, roughly. */
    private static final int FRAME = 90;
    private static final Color CLEAR = new Color(0, 0, 0, 0);

    private final Figure figure;
    private final LayerStyles styles;
    private final TimeTicks times;
    private final XYChart chart;

    private XyPlot(Figure figure) {
        this.figure = figure;
        this.styles = new LayerStyles(figure);
        this.times = TimeTicks.of(figure.x(), Range.x(figure));
        Size size = Size.of(figure);
        this.chart = new XYChart(size.width(), size.height());
    }

    static Picture picture(Figure figure) {
        XyPlot plot = new XyPlot(figure);
        plot.draw();
        Overlay overlay = new Overlay(figure, Range.x(figure), Range.y(figure), plot.chart::getScreenXFromChart,
                plot.chart::getScreenYFromChart, plot.times);
        return new Picture(plot.chart, overlay, SlantedLabels.NONE, Legend.of(figure, Size.of(figure).width(),
                figure.kind() == Figure.Kind.CURVES));
    }

    private void draw() {
        Range x = Range.x(figure);
        Range y = Range.y(figure);
        HouseStyle.apply(chart.getStyler(), figure);
        chart.setCustomYAxisTickLabelsFormatter(HouseStyle::tick);
        if (!times.dated()) {
            chart.setCustomXAxisTickLabelsFormatter(HouseStyle::tick);
        }
        times.apply(chart.getStyler());
        Size size = Size.of(figure);
        chart.getStyler().setXAxisTickMarkSpacingHint(HouseStyle.spacing(figure.x(), x, HouseStyle.ACROSS, size.width() - FRAME))
                .setYAxisTickMarkSpacingHint(HouseStyle.spacing(figure.y(), y, HouseStyle.UPWARDS, size.height() - FRAME));
        chart.getStyler().setXAxisMin(times.axis(x.low())).setXAxisMax(times.axis(x.high())).setYAxisMin(y.low())
                .setYAxisMax(y.high());
        chart.setTitle(figure.title());
        chart.setXAxisTitle(figure.x().label());
        chart.setYAxisTitle(figure.y().label());
        figure.right().ifPresent(this::rightAxis);
        figure.layers().stream().filter(Figure.Backdrop.class::isInstance).forEach(this::add);
        figure.layers().stream().filter(layer -> !(layer instanceof Figure.Backdrop)).forEach(this::add);
        if (chart.getSeriesCollection().isEmpty()) {
            blank(x, y);
        }
    }

    private void rightAxis(Figure.Axis axis) {
        Range range = Range.right(figure, axis);
        chart.getStyler().setYAxisMin(RIGHT, range.low()).setYAxisMax(RIGHT, range.high());
        chart.getStyler().setYAxisGroupPosition(RIGHT, Styler.YAxisPosition.Right);
        chart.setYAxisGroupTitle(RIGHT, axis.label());
    }

    private void backdrop(Figure.Backdrop backdrop) {
        Figure.Axis axis = figure.right().orElseThrow(() -> new IllegalArgumentException("figure " + figure.id()
                + ": a backdrop needs a right axis"));
        double[] y = Arrays.stream(backdrop.y()).map(v -> Range.drawable(v, axis) ? v : Double.NaN).toArray();
        if (Arrays.stream(y).allMatch(Double::isNaN)) {
            return;
        }
        XYSeries series = series(backdrop.x(), y);
        series.setYAxisGroup(RIGHT);
        series.setXYSeriesRenderStyle(XYSeriesRenderStyle.Line).setLineColor(styles.colour(backdrop))
                .setLineStyle(LayerStyles.backdrop());
        series.setMarker(SeriesMarkers.NONE);
    }

    private void blank(Range x, Range y) {
        XYSeries corners = series(new double[] {x.low(), x.high()}, new double[] {y.low(), y.high()});
        corners.setMarker(SeriesMarkers.NONE).setLineColor(CLEAR);
    }

    private void add(Figure.Layer layer) {
        if (layer instanceof Figure.Line line) {
            line(line);
        } else if (layer instanceof Figure.Points points) {
            points(points);
        } else if (layer instanceof Figure.Band band) {
            band(band);
        } else if (layer instanceof Figure.Backdrop backdrop) {
            backdrop(backdrop);
        } else if (layer instanceof Figure.Bars) {
            throw new IllegalArgumentException("figure " + figure.id() + ": bars need a category axis");
        }
    }

    private void line(Figure.Line line) {
        double[] y = drawable(line.y());
        if (Arrays.stream(y).allMatch(Double::isNaN)) {
            return;
        }
        XYSeries series = series(line.x(), y);
        series.setXYSeriesRenderStyle(XYSeriesRenderStyle.Line).setLineColor(styles.colour(line))
                .setLineStyle(styles.stroke(line));
        boolean marked = figure.kind() == Figure.Kind.CURVES && line.x().length <= MARKED_UP_TO;
        series.setMarker(marked ? Marks.of(styles.curveMark(line)) : SeriesMarkers.NONE)
                .setMarkerColor(styles.colour(line));
    }

    private void points(Figure.Points points) {
        double[] y = drawable(points.y());
        if (Arrays.stream(y).allMatch(Double::isNaN)) {
            return;
        }
        XYSeries series = series(points.x(), y);
        series.setXYSeriesRenderStyle(XYSeriesRenderStyle.Scatter).setMarker(Marks.of(points.mark()))
                .setMarkerColor(styles.colour(points));
    }

    private void band(Figure.Band band) {
        double[] low = drawable(band.low());
        double[] high = drawable(band.high());
        int from = 0;
        for (int i = 0; i <= low.length; i++) {
            if (i == low.length || Double.isNaN(low[i]) || Double.isNaN(high[i])) {
                if (i - from > 1) {
                    area(band, from, i, low, high);
                }
                from = i + 1;
            }
        }
    }

    private void area(Figure.Band band, int from, int to, double[] low, double[] high) {
        int count = to - from;
        double[] x = new double[2 * count];
        double[] y = new double[2 * count];
        for (int i = 0; i < count; i++) {
            x[i] = band.x()[from + i];
            y[i] = low[from + i];
            x[2 * count - 1 - i] = band.x()[from + i];
            y[2 * count - 1 - i] = high[from + i];
        }
        XYSeries series = series(x, y);
        series.setXYSeriesRenderStyle(XYSeriesRenderStyle.PolygonArea).setLineColor(CLEAR)
                .setFillColor(styles.colour(band));
        series.setMarker(SeriesMarkers.NONE);
    }

    private XYSeries series(double[] x, double[] y) {
        String name = "series " + chart.getSeriesCollection().size();
        if (!times.dated()) {
            return chart.addSeries(name, x.clone(), y);
        }
        List<Date> dates = Arrays.stream(x).mapToObj(time -> new Date(Math.round(times.axis(time)))).toList();
        return chart.addSeries(name, dates, new ArrayList<>(Arrays.stream(y).boxed().toList()));
    }

    private double[] drawable(double[] values) {
        return Arrays.stream(values).map(v -> Range.drawable(v, figure.y()) ? v : Double.NaN).toArray();
    }
}
