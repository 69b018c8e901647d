package org.modestead.nodes.table;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.ZonedDateTime;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class MemoryTableTest {

    private static final TableSchema ALL = TableSchema.of(Column.number("d"), Column.whole("l"), Column.text("t"),
            Column.flag("f"),
            new Column("date", CellType.DATE), new Column("at", CellType.DATE_TIME), new Column("zoned",
                    CellType.ZONED_DATE_TIME));
    private static final LocalDate DAY = LocalDate.of(2015, 6, 30);
    private static final LocalDateTime NOON = DAY.atTime(12, 0);
    private static final ZonedDateTime ABROAD = ZonedDateTime.parse("2015-06-30T12:00:00+02:00");

    private static MemoryTable sample() {
        return MemoryTable.builder(ALL, "memory").row(1.5, 2L, "x", true, DAY, NOON, ABROAD)
                .row(null, null, null, null, null, null, null).build();
    }

    @Test
    void everyTypeComesBackAsItWentIn() {
        try (RowCursor cursor = sample().open()) {
            assertTrue(cursor.next());
            assertEquals(1, cursor.row());
            assertEquals(1.5, cursor.number(0));
            assertEquals(2, cursor.number(1));
            assertEquals("x", cursor.text(2));
            assertEquals(Optional.of(true), cursor.cell(3));
            assertEquals(DAY, cursor.date(4));
            assertEquals(NOON, cursor.dateTime(5));
            assertEquals(LocalDateTime.of(2015, 6, 30, 10, 0), cursor.dateTime(6), "zoned times are read at UTC");
            assertEquals(Optional.of(ABROAD), cursor.cell(6));
        }
    }

    @Test
    void missingCellsAreMissingInEveryType() {
        try (RowCursor cursor = sample().open()) {
            cursor.next();
            assertTrue(cursor.next());
            for (int j = 0; j < ALL.columns().size(); j++) {
                assertTrue(cursor.isMissing(j), ALL.names().get(j));
                assertEquals("", cursor.text(j));
                assertEquals(Optional.empty(), cursor.cell(j));
            }
            assertTrue(Double.isNaN(cursor.number(0)));
            assertTrue(Double.isNaN(cursor.number(1)));
            assertFalse(cursor.next());
            assertFalse(cursor.next(), "stays at the end");
        }
    }

    @Test
    void notANumberIsAMissingCell() {
        MemoryTable table = MemoryTable.builder(TableSchema.of(Column.number("d")), "m").row(Double.NaN).build();
        try (RowCursor cursor = table.open()) {
            cursor.next();
            assertTrue(cursor.isMissing(0));
        }
    }

    @Test
    void aTableCanBeReadAgainAndCopied() {
        MemoryTable copy = MemoryTable.copyOf(sample());
        assertEquals(2, copy.rows());
        assertEquals(ALL, copy.schema());
        for (int pass = 0; pass < 2; pass++) {
            try (RowCursor cursor = copy.open()) {
                cursor.next();
                assertEquals(Optional.of(ABROAD), cursor.cell(6));
            }
        }
    }

    @Test
    void manyRowsKeepTheirOrder() {
        MemoryTable.Builder builder = MemoryTable.builder(TableSchema.of(Column.whole("i"), Column.number("d")), "m");
        for (long i = 0; i < 1000; i++) {
            builder.row(i, i / 2.0);
        }
        try (RowCursor cursor = builder.build().open()) {
            for (long i = 0; i < 1000; i++) {
                assertTrue(cursor.next());
                assertEquals(i + 1, cursor.row());
                assertEquals(i, cursor.number(0));
                assertEquals(i / 2.0, cursor.number(1));
            }
        }
    }

    @Test
    void aRowOfTheWrongLengthOrTypeIsRefusedAndLeavesTheTableAsItWas() {
        MemoryTable.Builder builder = MemoryTable.builder(TableSchema.of(Column.number("d"), Column.text("t")),
                "m").row(1, "a");
        assertThrows(IllegalArgumentException.class, () -> builder.row(1.0));
        assertThrows(IllegalArgumentException.class, () -> builder.row(1.0, 2.0));
        assertEquals(1, builder.build().rows());
    }
}
