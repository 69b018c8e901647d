package org.modestead.knime.trial;

import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.ZoneId;
import java.util.List;
import java.util.Optional;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.ListCell;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/**
 * One table with every kind of column that the platform has and the nodes read: a decaying oscillation, recorded against dates, date-times and
 * date-times with zone (across the end of summer time), beside whole numbers, texts, true or false, and lists. Every seventh cell is missing,
 * but for the times and the first two channels.
 */
public final class EveryKind {

    private static final int ROWS = 60;
    private static final int MISSING_EVERY = 7;
    private static final double DECAY = 0.02;
    private static final double TURN = 0.4;
    private static final LocalDate FIRST_DAY = LocalDate.of(2026, 1, 1);
    private static final LocalDateTime FIRST_MOMENT = LocalDateTime.of(2026, 12, 31, 23, 59, 50, 125_000_000);
    private static final LocalDateTime FIRST_HOUR = LocalDateTime.of(2026, 10, 24, 12, 0);
    private static final ZoneId ZONE = ZoneId.of("Europe/Berlin");

    private EveryKind() {}

    /** Returns the columns; the platform has {@code int} narrower than the nodes, which read both kinds of whole numbers alike. */
    static TableSchema schema() {
        return TableSchema.of(Column.number("x"), Column.number("y"), new Column("day", CellType.DATE), new Column("moment", CellType.DATE_TIME),
                new Column("zoned", CellType.ZONED_DATE_TIME), Column.number("double"), Column.whole("int"), Column.whole("long"), Column.text("string"),
                Column.flag("flag"), new Column("some day", CellType.DATE), new Column("some moment", CellType.DATE_TIME),
                new Column("some zoned", CellType.ZONED_DATE_TIME), new Column("pair", CellType.DOUBLE_LIST, List.of("u [mm]", "v [mm]")),
                new Column("numbers", CellType.DOUBLE_LIST), new Column("wholes", CellType.LONG_LIST), new Column("texts", CellType.TEXT_LIST),
                new Column("days", CellType.DATE_LIST), new Column("zones", CellType.ZONED_DATE_TIME_LIST));
    }

    /** Returns the table as the nodes have it. */
    public static MemoryTable table() {
        MemoryTable.Builder table = MemoryTable.builder(schema(), "every kind of column");
        for (int k = 0; k < ROWS; k++) {
            table.row(row(k));
        }
        return table.build();
    }

    private static Object[] row(int k) {
        double x = StrictMath.exp(-DECAY * k) * StrictMath.cos(TURN * k);
        double y = StrictMath.exp(-DECAY * k) * StrictMath.sin(TURN * k);
        LocalDate day = FIRST_DAY.plusDays(k);
        LocalDateTime moment = FIRST_MOMENT.plusNanos(k * 250_000_000L);
        var zoned = FIRST_HOUR.atZone(ZONE).plusMinutes(30L * k);
        Optional<Object> entry = k % 5 == 0 ? Optional.empty() : Optional.of(3 * y);
        Object[] cells = {x, y, day, moment, zoned, k / 3.0, (long) (k - 5), Long.MAX_VALUE - k, k % 2 == 0 ? "tab\there, \"quoted\"" : "é " + k, k % 3 == 0,
            day, moment, zoned, ListCell.of(2 * x, 2 * y), new ListCell(List.of(Optional.of(x), entry, Optional.of(-0.0))),
            new ListCell(List.of(Optional.of((long) k), Optional.empty())), new ListCell(List.of(Optional.of("a, b"), Optional.empty(), Optional.of(""))),
            ListCell.of(day), new ListCell(List.of(Optional.empty(), Optional.of(zoned)))};
        for (int j = schema().indexOf("double").orElseThrow(); j < cells.length; j++) {
            cells[j] = (k + j) % MISSING_EVERY == 0 ? null : cells[j];
        }
        return cells;
    }
}
