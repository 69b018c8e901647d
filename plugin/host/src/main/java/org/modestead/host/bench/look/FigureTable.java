package org.modestead.host.bench.look;

import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.util.List;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/**
 * The numbers behind a picture, one row a mark, in the order in which they are drawn: the name in the legend, what is selected with it,
 * the place along the horizontal axis, the value, the ends of a band and the label.
 */
public final class FigureTable {

    private static final double DAY = 86400;

    private final Figure figure;
    private final MemoryTable.Builder rows;

    private FigureTable(Figure figure) {
        this.figure = figure;
        String x = figure.x().label().isBlank() ? "category" : figure.x().label();
        String value = figure.y().label().equals(x) || figure.y().label().isBlank() ? "value" : figure.y().label();
        Column place = isNumber() ? Column.number(x) : Column.text(x);
        this.rows = MemoryTable.builder(TableSchema.of(Column.text("drawn as"), Column.text("selects"), place, Column.number(value), Column.number("low"),
                Column.number("high"), Column.text("label")), figure.id());
    }

    /** Returns the table of a picture. */
    public static Table of(Figure figure) {
        FigureTable table = new FigureTable(figure);
        figure.layers().forEach(table::add);
        return table.rows.build();
    }

    private boolean isNumber() {
        return figure.x().categories().isEmpty() && !figure.x().time().startsWith("date");
    }

    private void add(Figure.Layer layer) {
        if (layer instanceof Figure.Line line) {
            points(layer, line.x(), line.y(), List.of());
        } else if (layer instanceof Figure.Backdrop backdrop) {
            points(layer, backdrop.x(), backdrop.y(), List.of());
        } else if (layer instanceof Figure.Points points) {
            points(layer, points.x(), points.y(), points.labels());
        } else if (layer instanceof Figure.Band band) {
            for (int i = 0; i < band.x().length; i++) {
                row(layer, place(band.x()[i]), Double.NaN, band.low()[i], band.high()[i], "");
            }
        } else if (layer instanceof Figure.Bars bars) {
            for (int i = 0; i < bars.heights().length; i++) {
                row(layer, place(i), bars.heights()[i], Double.NaN, Double.NaN, "");
            }
        } else if (layer instanceof Figure.Rule rule) {
            row(layer, rule.vertical() ? place(rule.at()) : isNumber() ? (Object) Double.NaN : "", rule.vertical() ? Double.NaN : rule.at(), Double.NaN,
                    Double.NaN, "");
        }
    }

    private void points(Figure.Layer layer, double[] x, double[] y, List<String> labels) {
        for (int i = 0; i < x.length; i++) {
            row(layer, place(x[i]), y[i], Double.NaN, Double.NaN, i < labels.size() ? labels.get(i) : "");
        }
    }

    private Object place(double x) {
        Figure.Axis axis = figure.x();
        if (isNumber()) {
            return x;
        }
        if (!axis.categories().isEmpty()) {
            int at = (int) Math.round(x);
            return at >= 0 && at < axis.categories().size() ? axis.categories().get(at) : "";
        }
        double seconds = axis.time().equals("date") ? x * DAY : x;
        if (!Double.isFinite(seconds)) {
            return "";
        }
        LocalDateTime moment = LocalDateTime.ofEpochSecond((long) Math.floor(seconds), (int) ((seconds - Math.floor(seconds)) * 1e9), ZoneOffset.UTC);
        return axis.time().equals("date") ? LocalDate.from(moment).toString() : moment.toString();
    }

    private void row(Figure.Layer layer, Object place, double value, double low, double high, String label) {
        rows.row(layer.name(), layer.selection(), place, value, low, high, label);
    }
}
