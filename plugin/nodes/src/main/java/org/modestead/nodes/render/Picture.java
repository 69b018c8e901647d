package org.modestead.nodes.render;

import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.Rectangle2D;
import org.knowm.xchart.internal.chartpart.Chart;
import org.knowm.xchart.internal.chartpart.IChart;

/**
 * A chart with what the chart library does not draw: named lines across the plot, labels beside points, and a legend
 * of several rows below.
 *
 * @param chart drawn first
 * @param overlay drawn over it
 * @param labels names of categories below it, where they do not fit on its axis
 * @param legend drawn below all
 */
record Picture(Chart<?, ?> chart, Overlay overlay, SlantedLabels labels, Legend legend) implements IChart {

    @Override
    public void paint(Graphics2D graphics, int width, int height) {
        graphics.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        graphics.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        graphics.setColor(Palette.PAPER);
        graphics.fill(new Rectangle2D.Double(0, 0, width, height));
        int chartHeight = height - legend.height() - labels.height();
        chart.paint(graphics, width, chartHeight);
        overlay.paint(graphics);
        labels.paint(graphics, width, chartHeight);
        legend.paint(graphics, width, height - legend.height());
    }

    @Override
    public int getWidth() {
        return chart.getWidth();
    }

    @Override
    public int getHeight() {
        return chart.getHeight() + labels.height() + legend.height();
    }

    @Override
    public String getTitle() {
        return chart.getTitle();
    }
}
