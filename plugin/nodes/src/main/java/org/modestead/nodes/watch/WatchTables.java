package org.modestead.nodes.watch;

import java.util.List;
import java.util.stream.Collectors;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.watch.Alarm;
import org.modestead.engine.watch.Look;
import org.modestead.engine.watch.Quantity;
import org.modestead.engine.watch.Reference;
import org.modestead.engine.watch.Sighting;
import org.modestead.engine.watch.WatchResult;
import org.modestead.engine.watch.WatchRow;
import org.modestead.engine.watch.WatchedMode;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.table.TimeCells;

/**
 * Windows, alarms and limits as tables. Times are as recorded; frequencies in cycles per time unit. Limits are those of the moving average, in the
 * unit of the figure; a score is that average over its limit, signed, beyond 1 it alarms.
 */
final class WatchTables {

    private static final double FOUND_WITHIN = 5;
    private static final double A_LITTLE_LOWER = 0.98;

    static final TableSchema LIMITS = TableSchema.of(Column.whole("mode"), Column.text("quantity"), Column.number("stored"),
            Column.number("centre"), Column.number("deviation_low"), Column.number("deviation_high"), Column.number("low"), Column.number("high"),
            Column.whole("windows"), Column.number("found_share"), Column.number("cycles"), Column.whole("missing_in_a_row"),
            Column.number("found_within_5"), Column.number("windows_for_2_percent"));

    private WatchTables() {}

    static TableSchema watchColumns(TimeAxis axis) {
        return TableSchema.of(Column.whole("window"), Column.text("run"), TimeCells.column("start", axis), TimeCells.column("end", axis), Column.whole("mode"),
                Column.flag("found"), Column.number("frequency"), Column.number("damping_ratio"), Column.number("mac"),
                Column.number("frequency_low"), Column.number("frequency_high"), Column.number("damping_ratio_low"),
                Column.number("damping_ratio_high"), Column.number("mac_low"), Column.number("frequency_score"), Column.number("damping_score"),
                Column.number("shape_score"), Column.text("alarm"));
    }

    static TableSchema alarmColumns(TimeAxis axis) {
        return TableSchema.of(Column.whole("alarm"), Column.whole("mode"), Column.text("kind"), Column.whole("first_window"),
                Column.whole("last_window"), Column.text("run"), TimeCells.column("start", axis), TimeCells.column("end", axis), TimeCells.column("began", axis),
                Column.flag("ongoing"), Column.number("before"), Column.number("after"), Column.number("change"), Column.number("height"),
                Column.text("message"));
    }

    static MemoryTable watch(WatchResult result, TimeAxis axis) {
        MemoryTable.Builder rows = MemoryTable.builder(watchColumns(axis), "watch");
        for (WatchRow row : result.rows()) {
            Look look = row.look();
            WatchedMode mode = row.mode();
            rows.row((long) look.window().number(), look.window().run(), TimeCells.cell(axis, look.window().start()), TimeCells.cell(axis, look.window().end()),
                    (long) mode.mode().number(), row.sighting().isPresent(), figure(row, Quantity.FREQUENCY), figure(row, Quantity.DAMPING),
                    figure(row, Quantity.SHAPE), limit(mode, Quantity.FREQUENCY, -1), limit(mode, Quantity.FREQUENCY, 1),
                    limit(mode, Quantity.DAMPING, -1), limit(mode, Quantity.DAMPING, 1), limit(mode, Quantity.SHAPE, 1),
                    score(row, Quantity.FREQUENCY), score(row, Quantity.DAMPING), score(row, Quantity.SHAPE), state(row));
        }
        return rows.build();
    }

    private static double figure(WatchRow row, Quantity quantity) {
        return row.sighting().map((Sighting sighting) -> sighting.figure(quantity)).orElse(Double.NaN);
    }

    private static double limit(WatchedMode mode, Quantity quantity, int side) {
        return mode.reference(quantity).map(reference -> reference.limitFigure(side)).orElse(Double.NaN);
    }

    private static double score(WatchRow row, Quantity quantity) {
        return row.averages().getOrDefault(quantity, Double.NaN);
    }

    private static String state(WatchRow row) {
        return row.look().fitted() ? row.alarms().stream().map(Alarm.Kind::word).collect(Collectors.joining(", ")) : "not fitted";
    }

    static MemoryTable alarms(WatchResult result, TimeAxis axis, WatchWords words) {
        MemoryTable.Builder rows = MemoryTable.builder(alarmColumns(axis), "alarms");
        List<Look> looks = result.looks();
        for (Alarm alarm : result.alarms()) {
            rows.row((long) alarm.number(), (long) alarm.mode(), alarm.kind().word(), (long) alarm.first() + 1, (long) alarm.last() + 1,
                    looks.get(alarm.first()).window().run(), TimeCells.cell(axis, looks.get(alarm.first()).window().start()),
                    TimeCells.cell(axis, looks.get(alarm.last()).window().end()), TimeCells.cell(axis, looks.get(alarm.began()).window().start()), alarm.ongoing(),
                    alarm.from(), alarm.to(), alarm.change(), alarm.height(), words.alarm(alarm));
        }
        return rows.build();
    }

    static MemoryTable limits(WatchResult result) {
        MemoryTable.Builder rows = MemoryTable.builder(LIMITS, "limits");
        for (WatchedMode watched : result.modes()) {
            for (Quantity quantity : watched.quantities()) {
                Reference reference = watched.reference(quantity).orElseThrow();
                boolean shape = quantity == Quantity.SHAPE;
                rows.row((long) watched.mode().number(), quantity.word(), stored(watched, quantity), reference.figure(0),
                        reference.figure(shape ? 1 : -1), reference.figure(shape ? -1 : 1), reference.limitFigure(shape ? 1 : -1), shape ? Double.NaN : reference.limitFigure(1),
                        (long) reference.windows(), watched.windows() == 0 ? Double.NaN : (double) watched.found() / watched.windows(),
                        watched.cycles(), (long) watched.missingInARow(), reference.smallestFound(FOUND_WITHIN),
                        quantity == Quantity.FREQUENCY ? reference.windowsToFind(A_LITTLE_LOWER * reference.figure(0)) : Double.NaN);
            }
        }
        return rows.build();
    }

    private static double stored(WatchedMode watched, Quantity quantity) {
        return switch (quantity) {
            case FREQUENCY -> watched.mode().frequency();
            case DAMPING -> watched.mode().dampingRatio();
            case SHAPE -> 1;
        };
    }
}
