package org.modestead.host.table;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Cancelled;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.TableSchema;

/** Rows read ahead in chunks are all rows in order, and never fewer without a word. */
class ChunkedCursorTest {

    private static final long MANY = 300_000;

    private static DuckDbTable table(String select, Column... columns) {
        return new DuckDbTable(new Recipe(select, List.of(), Map.of()), new TableSchema(List.of(columns)), "numbers", Database.USUAL_MEGABYTES, false,
                new Explainer() {
                    @Override
                    public Optional<TableFault> claim(DuckDbMessage message) {
                        return Optional.empty();
                    }

                    @Override
                    public TableFault explain(DuckDbMessage message) {
                        return new TableFault("numbers", message.brief(), "give others");
                    }
                });
    }

    private static DuckDbTable numbers(String select) {
        return table(select, new Column("x", CellType.DOUBLE));
    }

    @Test
    void rowsOfAnOrderedQueryComeInOrderAcrossChunks() {
        DuckDbTable table = numbers("SELECT CAST(i AS DOUBLE) AS x FROM range(" + MANY + ") t(i) ORDER BY x DESC");
        assertTrue(ChunkedCursor.reads(table));
        try (RowCursor cursor = table.open()) {
            for (long k = 1; k <= MANY; k++) {
                assertTrue(cursor.next());
                assertEquals(k, cursor.row());
                assertEquals(MANY - k, cursor.number(0));
            }
            assertFalse(cursor.next());
            assertFalse(cursor.next(), "the end stays the end");
        }
    }

    @Test
    void aFailureInTheMiddleIsToldAndIsNoEnd() {
        DuckDbTable table = numbers("SELECT CASE WHEN i = 200000 THEN error('a cell broke') ELSE CAST(i AS DOUBLE) END AS x FROM range(" + MANY + ") t(i)");
        try (RowCursor cursor = table.open()) {
            TableFault fault = assertThrows(TableFault.class, () -> {
                while (cursor.next()) {
                    // on to the fault
                }
            });
            assertEquals("numbers: a cell broke; give others.", fault.getMessage());
        }
    }

    @Test
    void aFailureBeforeTheFirstRowIsTold() {
        assertThrows(TableFault.class, () -> {
            try (RowCursor cursor = numbers("SELECT CAST(error('at once') AS DOUBLE) AS x").open()) {
                cursor.next();
            }
        });
    }

    @Test
    void rowsThatAreNotReadAheadTellOfAFailureToo() {
        DuckDbTable table = table("SELECT [CASE WHEN i = 200000 THEN error('a cell broke') ELSE CAST(i AS DOUBLE) END] AS x FROM range(" + MANY
                + ") t(i)", new Column("x", CellType.DOUBLE_LIST));
        assertFalse(ChunkedCursor.reads(table));
        try (RowCursor cursor = table.open()) {
            TableFault fault = assertThrows(TableFault.class, () -> {
                while (cursor.next()) {
                    // on to the fault
                }
            });
            assertEquals("numbers: a cell broke; give others.", fault.getMessage());
        }
    }

    @Test
    void missingCellsOfEveryTypeAreMissing() {
        DuckDbTable table = table("SELECT CAST(NULL AS DOUBLE), CAST(NULL AS BIGINT), CAST(NULL AS VARCHAR), CAST(NULL AS BOOLEAN), CAST(NULL AS DATE),"
                + " CAST(NULL AS TIMESTAMP)", new Column("a", CellType.DOUBLE), new Column("b", CellType.LONG), new Column("c", CellType.TEXT),
                new Column("d", CellType.FLAG), new Column("e", CellType.DATE), new Column("f", CellType.DATE_TIME));
        try (RowCursor cursor = table.open()) {
            assertTrue(cursor.next());
            for (int j = 0; j < 6; j++) {
                assertTrue(cursor.isMissing(j));
                assertEquals(Optional.empty(), cursor.cell(j));
            }
            assertTrue(Double.isNaN(cursor.number(0)));
            assertTrue(Double.isNaN(cursor.number(1)));
        }
    }

    @Test
    void aCursorThatIsClosedEarlyLeavesNoThreadBehind() {
        try (RowCursor cursor = numbers("SELECT CAST(i AS DOUBLE) AS x FROM range(100000000000) t(i)").open()) {
            assertTrue(cursor.next());
        }
        assertTrue(Thread.getAllStackTraces().keySet().stream().noneMatch(thread -> thread.getName().equals("table-reader")));
    }

    @Test
    void aQueryThatNeverGivesARowIsStoppedWithTheThreadThatWaits() {
        try (RowCursor cursor = numbers("SELECT sum(sin(i * j)) AS x FROM range(10000000) t(i), range(10000000) s(j)").open()) {
            Thread.currentThread().interrupt();
            assertThrows(Cancelled.class, cursor::next);
            assertTrue(Thread.interrupted());
        }
    }
}
