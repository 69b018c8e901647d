package org.modestead.nodes.forecast;

import java.util.List;
import org.modestead.engine.Progress;
import org.modestead.engine.forecast.BacktestResult;
import org.modestead.engine.forecast.ErrorRow;
import org.modestead.engine.forecast.ForecastResult;
import org.modestead.engine.forecast.ForecastRow;
import org.modestead.engine.forecast.ReconstructionRow;
import org.modestead.engine.forecast.Region;
import org.modestead.engine.forecast.ScoreRow;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.table.TimeCells;

/** Forecast, reconstruction, scores and errors as tables. Times are as recorded: number, date or date-time. */
final class ForecastTables {

    static final TableSchema SCORES = TableSchema.of(Column.text("method"), Column.number("horizon"),
            Column.number("rmse"),
            Column.number("mae"), Column.number("mase"), Column.number("coverage"), Column.number("interval_score"));

    private ForecastTables() {}

    /** Columns of the forecast of a recording with such times; {@code beyond}: outside the range that the fit has seen, so extrapolated. */
    static TableSchema forecastColumns(TimeAxis axis) {
        return TableSchema.of(Column.text("run"), TimeCells.column("time", axis), Column.text("channel"), Column.number("value"),
                Column.number("low"), Column.number("high"), Column.text("route"), Column.flag("beyond"));
    }

    /** Columns of the reconstruction of a recording with such times. */
    static TableSchema reconstructionColumns(TimeAxis axis) {
        return TableSchema.of(Column.text("run"), TimeCells.column("time", axis), Column.text("channel"), Column.number("observed"),
                Column.number("reconstructed"));
    }

    /** Columns of the errors of a backtest on a recording with such times. */
    static TableSchema errorColumns(TimeAxis axis) {
        return TableSchema.of(Column.text("method"), Column.text("run"), TimeCells.column("origin", axis), Column.number("horizon"),
                Column.text("channel"), Column.number("error"));
    }

    static MemoryTable forecast(ForecastResult result, Snapshots snapshots, Progress progress) {
        MemoryTable.Builder rows = MemoryTable.builder(forecastColumns(snapshots.time()), "forecast");
        List<String> channels = names(snapshots);
        Region region = Region.of(snapshots);
        for (ForecastRow row : result.forecast()) {
            progress.checkCancelled();
            rows.row(row.run(), TimeCells.cell(snapshots.time(), row.time()), channels.get(row.channel()), row.value(), row.low(),
                    row.high(),
                    result.routeUsed().word(), region.leaves(row.channel(), snapshots.preparation().prepare(row.channel(), row.time(),
                            row.value())));
        }
        return rows.build();
    }

    static MemoryTable reconstruction(ForecastResult result, Snapshots snapshots, Progress progress) {
        MemoryTable.Builder rows = MemoryTable.builder(reconstructionColumns(snapshots.time()), "reconstruction");
        List<String> channels = names(snapshots);
        for (ReconstructionRow row : result.reconstruction()) {
            progress.checkCancelled();
            rows.row(row.run(), TimeCells.cell(snapshots.time(), row.time()), channels.get(row.channel()), row.observed(),
                    row.reconstructed());
        }
        return rows.build();
    }

    static MemoryTable scores(List<ScoreRow> scores) {
        MemoryTable.Builder rows = MemoryTable.builder(SCORES, "scores");
        for (ScoreRow row : scores) {
            rows.row(row.method(), row.horizon(), row.rmse(), row.mae(), row.mase(), row.coverage(), row.intervalScore());
        }
        return rows.build();
    }

    static MemoryTable errors(BacktestResult result, Snapshots snapshots, Progress progress) {
        MemoryTable.Builder rows = MemoryTable.builder(errorColumns(snapshots.time()), "errors");
        List<String> channels = names(snapshots);
        for (ErrorRow row : result.errors()) {
            progress.checkCancelled();
            rows.row(row.method(), row.run(), TimeCells.cell(snapshots.time(), row.origin()), row.horizon(),
                    channels.get(row.channel()), row.error());
        }
        return rows.build();
    }

    private static List<String> names(Snapshots snapshots) {
        return snapshots.channels().stream().map(Channel::name).toList();
    }
}
