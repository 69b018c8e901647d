package org.modestead.knime.table;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.ZoneId;
import java.time.ZonedDateTime;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataColumnSpec;
import org.knime.core.data.DataColumnSpecCreator;
import org.knime.core.data.DataRow;
import org.knime.core.data.DataTableSpec;
import org.knime.core.data.DataType;
import org.knime.core.data.RowKey;
import org.knime.core.data.TimeCell;
import org.knime.core.data.collection.ListCell;
import org.knime.core.data.container.CloseableRowIterator;
import org.knime.core.data.def.BooleanCell;
import org.knime.core.data.def.DefaultRow;
import org.knime.core.data.def.DoubleCell;
import org.knime.core.data.def.IntCell;
import org.knime.core.data.def.LongCell;
import org.knime.core.data.def.StringCell;
import org.knime.core.node.BufferedDataContainer;
import org.knime.core.node.BufferedDataTable;
import org.knime.core.node.ExecutionContext;
import org.modestead.engine.Cancelled;
import org.modestead.engine.Progress;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.TableSchema;

/** Cells of every type come in and go out; missing ones stay missing; rows are streamed. */
class TablesTest {

    private static final LocalDate DAY = LocalDate.of(2026, 12, 2);
    private static final LocalDateTime MOMENT = LocalDateTime.of(2026, 12, 2, 1, 2, 3, 400_000_000);
    private static final ZonedDateTime ZONED = MOMENT.atZone(ZoneId.of("Europe/Berlin"));

    private static BufferedDataTable table(List<String> names, DataCell... cells) {
        DataColumnSpec[] columns = new DataColumnSpec[cells.length];
        DataCell[] missing = new DataCell[cells.length];
        Arrays.fill(missing, DataType.getMissingCell());
        for (int i = 0; i < cells.length; i++) {
            columns[i] = new DataColumnSpecCreator(names.get(i), cells[i].getType()).createSpec();
        }
        BufferedDataContainer container = new ExecutionContext().createDataContainer(new DataTableSpec(columns));
        container.addRowToTable(new DefaultRow(new RowKey("a"), cells));
        container.addRowToTable(new DefaultRow(new RowKey("b"), missing));
        container.close();
        return container.getTable();
    }

    private static BufferedDataTable everyType() {
        return table(List.of("double", "int", "long", "text", "flag", "day", "moment", "zoned", "list"), new DoubleCell(1.5), new IntCell(2),
                new LongCell(3), new StringCell("x"), BooleanCell.TRUE, new TimeCell.Day(DAY), new TimeCell.Moment(MOMENT),
                new TimeCell.Zoned(ZONED), new ListCell(new DoubleCell(1), DataType.getMissingCell(), new DoubleCell(2)));
    }

    @Test
    void everyColumnTypeOfThePlatformIsRead() {
        PlatformTable table = new PlatformTable(everyType(), "the input table");
        assertEquals(List.of(CellType.DOUBLE, CellType.LONG, CellType.LONG, CellType.TEXT, CellType.FLAG, CellType.DATE, CellType.DATE_TIME,
                CellType.ZONED_DATE_TIME, CellType.DOUBLE_LIST), table.schema().columns().stream().map(Column::type).toList());
        try (RowCursor cursor = table.open()) {
            assertTrue(cursor.next());
            List<Object> cells = new ArrayList<>();
            for (int j = 0; j < 9; j++) {
                cells.add(cursor.cell(j).orElseThrow());
            }
            assertEquals(List.of(1.5, 2L, 3L, "x", true, DAY, MOMENT, ZONED,
                    new org.modestead.nodes.table.ListCell(List.of(Optional.of(1.0), Optional.empty(), Optional.of(2.0)))), cells);
            assertEquals(2, cursor.number(1));
            assertTrue(cursor.next());
            for (int j = 0; j < 9; j++) {
                assertTrue(cursor.isMissing(j), table.schema().names().get(j));
            }
            assertTrue(Double.isNaN(cursor.number(0)));
            assertEquals(2, cursor.row());
            assertEquals(false, cursor.next());
        }
    }

    @Test
    void aTableCanBeReadAgainAndAgain() {
        PlatformTable table = new PlatformTable(everyType(), "the input table");
        for (int i = 0; i < 2; i++) {
            try (RowCursor cursor = table.open()) {
                assertTrue(cursor.next());
            }
        }
    }

    @Test
    void everyColumnTypeOfTheNodesIsWrittenWithTheSpecThatWasTold() {
        TableSchema schema = TableSchema.of(Column.number("double"), Column.whole("long"), Column.text("text"), Column.flag("flag"),
                new Column("day", CellType.DATE), new Column("moment", CellType.DATE_TIME), new Column("zoned", CellType.ZONED_DATE_TIME));
        MemoryTable table = MemoryTable.builder(schema, "made").row(1.5, 2L, "x", true, DAY, MOMENT, ZONED)
                .row(null, null, null, null, null, null, null).build();
        BufferedDataTable written = new TableWriter(new ExecutionContext(), Progress.NONE).write(table);
        assertEquals(TableSpecs.spec(schema), written.getDataTableSpec());
        try (CloseableRowIterator rows = written.iterator()) {
            DataRow row = rows.next();
            assertEquals("Row0", row.getKey().getString());
            assertEquals(List.of("1.5", "2", "x", "true", DAY.toString(), MOMENT.toString(), ZONED.toString()),
                    row.getNumCells() == 7 ? texts(row) : List.of());
            rows.next().forEach(cell -> assertTrue(cell.isMissing()));
        }
        assertEquals(schema, new PlatformTable(written, "again").schema());
    }

    @Test
    void listsOfEveryTypeComeOutAsTheyWentInWithMissingEntriesAndTheNamesOfTheirEntries() {
        DataCell no = DataType.getMissingCell();
        DataCell[] lists = {new ListCell(new DoubleCell(0.1), no, new DoubleCell(-0.0)), new ListCell(new LongCell(Long.MAX_VALUE), no),
            new ListCell(new StringCell("a, b"), no, new StringCell("")), new ListCell(BooleanCell.FALSE, no), new ListCell(new TimeCell.Day(DAY), no),
            new ListCell(new TimeCell.Moment(MOMENT), no), new ListCell(no, new TimeCell.Zoned(ZONED))};
        BufferedDataTable given = table(List.of("double", "long", "text", "flag", "day", "moment", "zoned"), lists);
        PlatformTable read = new PlatformTable(given, "the input table");
        assertEquals(List.of(CellType.DOUBLE_LIST, CellType.LONG_LIST, CellType.TEXT_LIST, CellType.FLAG_LIST, CellType.DATE_LIST,
                CellType.DATE_TIME_LIST, CellType.ZONED_DATE_TIME_LIST), read.schema().columns().stream().map(Column::type).toList());
        BufferedDataTable written = new TableWriter(new ExecutionContext(), Progress.NONE).write(read);
        assertEquals(given.getDataTableSpec(), written.getDataTableSpec());
        try (CloseableRowIterator rows = written.iterator()) {
            DataRow row = rows.next();
            for (int j = 0; j < lists.length; j++) {
                assertEquals(lists[j].toString(), row.getCell(j).toString());
            }
            rows.next().forEach(cell -> assertTrue(cell.isMissing()));
        }
        TableSchema named = TableSchema.of(new Column("accel", CellType.DOUBLE_LIST, List.of("x", "y")));
        assertEquals(named, TableSpecs.schema(TableSpecs.spec(named)));
    }

    /** A set has no order, and a list of lists no type of ours. */
    @Test
    void whatIsNoPlainListIsReadAsText() {
        ListCell inner = new ListCell(new DoubleCell(1), new DoubleCell(2));
        PlatformTable table = new PlatformTable(table(List.of("nested"), new ListCell(inner)), "the input table");
        assertEquals(TableSchema.of(Column.text("nested")), table.schema());
        try (RowCursor cursor = table.open()) {
            cursor.next();
            assertEquals("[[1.0, 2.0]]", cursor.text(0));
        }
    }

    private static List<String> texts(DataRow row) {
        List<String> texts = new ArrayList<>();
        row.forEach(cell -> texts.add(cell.toString()));
        return texts;
    }

    @Test
    void writingStopsWithinARowWhenAskedTo() {
        Progress stopped = new Progress() {
            @Override
            public void report(double fraction, String message) {
                // not watched
            }

            @Override
            public void checkCancelled() {
                throw new Cancelled("test");
            }
        };
        MemoryTable table = MemoryTable.builder(TableSchema.of(Column.number("x")), "made").row(1.0).build();
        assertThrows(Cancelled.class, () -> new TableWriter(new ExecutionContext(), stopped).write(table));
    }

    /** Pictures, molecules, mixed columns: as if they were not there. */
    @Test
    void columnsThatTheNodesCannotReadAreLeftOut() {
        DataCell strange = new DataCell() {
            private static final long serialVersionUID = 1L;

            @Override
            public String toString() {
                return "strange";
            }
        };
        BufferedDataTable table = table(List.of("picture", "x"), strange, new DoubleCell(1));
        PlatformTable seen = new PlatformTable(table, "the input table");
        assertEquals(TableSchema.of(Column.number("x")), seen.schema());
        try (RowCursor cursor = seen.open()) {
            cursor.next();
            assertEquals(1, cursor.number(0));
        }
    }
}
