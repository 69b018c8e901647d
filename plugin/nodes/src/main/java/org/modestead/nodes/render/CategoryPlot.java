package org.modestead.nodes.render;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.Collectors;
import org.knowm.xchart.CategoryChart;
import org.knowm.xchart.CategorySeries;
import org.knowm.xchart.CategorySeries.CategorySeriesRenderStyle;
import org.modestead.nodes.figure.Figure;

/** Draws a figure with categories along the horizontal axis: bars, points and lines at 0, 1, 2, ... */
final class CategoryPlot {
    private static final int LEVEL_LABELS = 8;
    private static final int LEVEL_CHARACTERS = 52;

    private final Figure figure;
    private final LayerStyles styles;
    private final CategoryChart chart;

    private CategoryPlot(Figure figure) {
        this.figure = figure;
        this.styles = new LayerStyles(figure);
        Size size = Size.of(figure);
        this.chart = new CategoryChart(size.width(), size.height());
    }

    static Picture picture(Figure figure) {
        CategoryPlot plot = new CategoryPlot(figure);
        plot.draw();
        Range positions = new Range(-0.5, figure.x().categories().size() - 0.5);
        DoubleUnaryOperator screenX = position -> plot.chart.getScreenXFromChart(position + 0.5);
        Overlay overlay = new Overlay(figure, positions, Range.y(figure), screenX, plot.chart::getScreenYFromChart,
                new TimeTicks(0, ""));
        return new Picture(plot.chart, overlay, level(figure) ? SlantedLabels.NONE
                : new SlantedLabels(figure.x().categories(), figure.x().label(), screenX),
                Legend.of(figure, Size.of(figure).width(), false));
    }

    /** Returns whether the names fit side by side. */
    private static boolean level(Figure figure) {
        List<String> names = figure.x().categories();
        return names.size() <= LEVEL_LABELS && names.stream().mapToInt(String::length).sum() <= LEVEL_CHARACTERS;
    }

    private void draw() {
        Range y = Range.y(figure);
        HouseStyle.apply(chart.getStyler(), figure);
        chart.getStyler().setYAxisMin(y.low()).setYAxisMax(y.high());
        chart.getStyler().setAvailableSpaceFill(0.7).setPlotGridVerticalLinesVisible(false);
        // the series of a shape are groups of channels, which stand side by side and never in one place
        chart.getStyler().setOverlapped(figure.kind() == Figure.Kind.SHAPES);
        if (!level(figure)) {
            chart.getStyler().setXAxisTicksVisible(false).setXAxisTitleVisible(false);
        }
        chart.setCustomYAxisTickLabelsFormatter(HouseStyle::tick);
        chart.setTitle(figure.title());
        chart.setXAxisTitle(figure.x().label());
        chart.setYAxisTitle(figure.y().label());
        figure.layers().forEach(this::add);
    }

    private void add(Figure.Layer layer) {
        if (layer instanceof Figure.Bars bars) {
            CategorySeries series = series(bars.heights());
            series.setChartCategorySeriesRenderStyle(CategorySeriesRenderStyle.Bar).setFillColor(styles.colour(bars));
        } else if (layer instanceof Figure.Points points) {
            CategorySeries series = series(placed(points.x(), points.y()));
            series.setChartCategorySeriesRenderStyle(CategorySeriesRenderStyle.Scatter).setMarker(Marks.of(points.mark()))
                    .setMarkerColor(styles.colour(points));
        } else if (layer instanceof Figure.Line line) {
            CategorySeries series = series(placed(line.x(), line.y()));
            series.setChartCategorySeriesRenderStyle(CategorySeriesRenderStyle.Line).setLineColor(styles.colour(line))
                    .setLineStyle(styles.stroke(line));
        } else if (layer instanceof Figure.Band) {
            throw new IllegalArgumentException("figure " + figure.id() + ": a band needs a numeric axis");
        }
    }

    private double[] placed(double[] x, double[] y) {
        double[] heights = new double[figure.x().categories().size()];
        Arrays.fill(heights, Double.NaN);
        for (int i = 0; i < x.length; i++) {
            heights[Math.toIntExact(Math.round(x[i]))] = y[i];
        }
        return heights;
    }

    private CategorySeries series(double[] heights) {
        List<Double> drawn = Arrays.stream(heights).mapToObj(v -> Range.drawable(v, figure.y()) ? (Double) v : null)
                .collect(Collectors.toCollection(ArrayList::new));
        return chart.addSeries("series " + chart.getSeriesCollection().size(), figure.x().categories(), drawn);
    }
}
