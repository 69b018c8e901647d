package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.IntStream;
import org.modestead.engine.forecast.ForecastResult;
import org.modestead.engine.forecast.ForecastRow;
import org.modestead.engine.forecast.ReconstructionRow;
import org.modestead.engine.forecast.Route;
import org.modestead.engine.forecast.ScoreRow;
import org.modestead.engine.recording.Snapshots;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/**
 * Forecast, reconstruction and scores as they come out of their tables, with only the rows that a report draws.
 *
 * @param forecast of the channels drawn
 * @param reconstruction of the channels drawn, first run only
 * @param scores all
 * @param route word of the route that was used; empty when unknown
 */
record ForecastRows(List<ForecastRow> forecast, List<ReconstructionRow> reconstruction, List<ScoreRow> scores,
        String route) {
    static final ForecastRows NONE = new ForecastRows(List.of(), List.of(), List.of(), "");

    /**
     * Reads the tables. Without snapshots nothing can be drawn, so only the scores are read.
     *
     * @param channels how many channels are drawn, at least 1
     * @throws SettingFault if a connected table lacks a column
     */
    static ForecastRows read(Optional<Table> forecast, Optional<Table> reconstruction, Optional<Table> scores,
            Optional<Snapshots> snapshots, int channels) {
        Optional<Drawn> drawn = snapshots.map(s -> new Drawn(s, Math.min(channels, s.channels().size())));
        return new ForecastRows(
                drawn.flatMap(d -> forecast.map(d::forecast)).orElse(List.of()),
                drawn.flatMap(d -> reconstruction.map(d::reconstruction)).orElse(List.of()),
                scores.map(ForecastRows::scores).orElse(List.of()),
                forecast.map(ForecastRows::route).orElse(""));
    }

    /** Returns the rows as the engine hands them out, for the figures. */
    ForecastResult result() {
        return new ForecastResult(forecast, reconstruction, scores, Route.AUTO, List.of(), List.of());
    }

    boolean isEmpty() {
        return forecast.isEmpty() && reconstruction.isEmpty() && scores.isEmpty();
    }

    private static List<ScoreRow> scores(Table table) {
        TableColumns at = new TableColumns(table);
        List<ScoreRow> rows = new ArrayList<>();
        try (RowCursor cursor = table.open()) {
            while (cursor.next()) {
                rows.add(new ScoreRow(cursor.text(at.of("method")), cursor.number(at.of("horizon")),
                        cursor.number(at.of("rmse")),
                        cursor.number(at.of("mae")), cursor.number(at.of("mase")), cursor.number(at.of("coverage")),
                        cursor.number(at.of("interval_score"))));
            }
        }
        return rows;
    }

    private static String route(Table table) {
        int column = new TableColumns(table).of("route");
        try (RowCursor cursor = table.open()) {
            return cursor.next() ? cursor.text(column) : "";
        }
    }

    private record Drawn(Snapshots snapshots, int channels) {

        List<ForecastRow> forecast(Table table) {
            TableColumns at = new TableColumns(table);
            List<ForecastRow> rows = new ArrayList<>();
            try (RowCursor cursor = table.open()) {
                while (cursor.next()) {
                    OptionalInt channel = channel(cursor.text(at.of("channel")));
                    if (channel.isPresent()) {
                        rows.add(new ForecastRow(cursor.text(at.of("run")), at.time(cursor, snapshots), channel.getAsInt(),
                                cursor.number(at.of("value")), cursor.number(at.of("low")), cursor.number(at.of("high"))));
                    }
                }
            }
            return rows;
        }

        List<ReconstructionRow> reconstruction(Table table) {
            TableColumns at = new TableColumns(table);
            List<ReconstructionRow> rows = new ArrayList<>();
            try (RowCursor cursor = table.open()) {
                while (cursor.next()) {
                    String run = cursor.text(at.of("run"));
                    OptionalInt channel = channel(cursor.text(at.of("channel")));
                    if (channel.isPresent() && (rows.isEmpty() || rows.get(0).run().equals(run))) {
                        rows.add(new ReconstructionRow(run, at.time(cursor, snapshots), channel.getAsInt(),
                                cursor.number(at.of("observed")), cursor.number(at.of("reconstructed"))));
                    }
                }
            }
            return rows;
        }

        private OptionalInt channel(String name) {
            return IntStream.range(0, channels).filter(c -> snapshots.channels().get(c).name().equals(name)
                    || snapshots.channels().get(c).label().equals(name)).findFirst();
        }
    }
}
