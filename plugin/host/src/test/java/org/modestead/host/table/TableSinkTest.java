package org.modestead.host.table;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.output.OutputFault;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.ListCell;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** Files that a person asks for: each format reads back as it was, and nothing half-written stays. */
class TableSinkTest {

    private static final TableSchema SCHEMA = TableSchema.of(new Column("time", CellType.LONG),
            new Column("flow", CellType.DOUBLE), new Column("note", CellType.TEXT));

    @TempDir
    Path folder;

    private Table table;

    @BeforeEach
    void table() {
        table = MemoryTable.builder(SCHEMA, "memory").row(0L, 1.5, "a, \"b\"").row(1L, null, null).row(2L, 0.1 + 0.2, "é")
                .build();
    }

    @Test
    void everyFormatReadsBackTheSame() {
        for (String name : List.of("t.csv", "deep/er/t.json", "t.parquet")) {
            Steps.run(new TableSink(), folder, Map.of("table", table), "path", name);
            Table back = Steps.source(folder, name);
            assertEquals(SCHEMA, back.schema(), name);
            assertEquals(Steps.rows(table), Steps.rows(back), name);
        }
    }

    @Test
    void listsOfEveryTypeReadBackFromParquetWithTheirMissingEntries() {
        LocalDateTime moment = LocalDateTime.of(2026, 12, 2, 1, 2, 3, 456_789_000);
        Map<CellType, Object> entries = new EnumMap<>(Map.of(CellType.DOUBLE_LIST, 0.1, CellType.LONG_LIST, Long.MAX_VALUE,
                CellType.TEXT_LIST, "a, \"b\"", CellType.FLAG_LIST, true, CellType.DATE_LIST, moment.toLocalDate(), CellType.DATE_TIME_LIST, moment,
                CellType.ZONED_DATE_TIME_LIST, moment.atZone(ZoneOffset.UTC)));
        MemoryTable.Builder rows = MemoryTable.builder(new TableSchema(entries.keySet().stream().map(type -> new Column(type.name(), type))
                .toList()), "memory");
        rows.row(entries.values().stream().map(entry -> new ListCell(List.of(Optional.of(entry), Optional.empty()))).toArray());
        rows.row(new Object[entries.size()]);
        Table lists = rows.build();
        Steps.run(new TableSink(), folder, Map.of("table", lists), "path", "lists.parquet");
        Table back = Steps.source(folder, "lists.parquet");
        assertEquals(lists.schema(), back.schema());
        assertEquals(Steps.rows(lists), Steps.rows(back));
    }

    @Test
    void theSameTableGivesTheSameBytes() throws IOException {
        for (String end : List.of("csv", "json", "parquet")) {
            Steps.run(new TableSink(), folder, Map.of("table", table), "path", "a." + end);
            Steps.run(new TableSink(), folder, Map.of("table", table), "path", "b." + end);
            assertEquals(-1, Files.mismatch(folder.resolve("a." + end), folder.resolve("b." + end)), end);
        }
    }

    @Test
    void aFaultOfTheSourceLeavesTheOldFile() throws IOException {
        StringBuilder text = new StringBuilder("time,flow\n");
        for (int i = 1; i <= TextTyper.SAMPLE + 100; i++) {
            text.append(i).append(',').append(i == TextTyper.SAMPLE + 50 ? "abc" : "1.5").append('\n');
        }
        Files.writeString(folder.resolve("in.csv"), text.toString());
        Table late = Steps.source(folder, "in.csv");
        for (String end : List.of("csv", "json", "parquet")) {
            Files.writeString(folder.resolve("t." + end), "old");
            TableFault fault = assertThrows(TableFault.class,
                    () -> Steps.run(new TableSink(), folder, Map.of("table", late), "path", "t." + end));
            assertTrue(fault.where().startsWith("in.csv, row " + (TextTyper.SAMPLE + 50)), fault::getMessage);
            assertEquals("old", Files.readString(folder.resolve("t." + end)));
        }
        try (Stream<Path> inside = Files.list(folder)) {
            assertEquals(4, inside.count(), "no part is left");
        }
    }

    @Test
    void aFolderInPlaceOfTheFileIsNamed() throws IOException {
        Files.createDirectory(folder.resolve("t.csv"));
        assertEquals("t.csv: this is a folder, not a file; name a file in it.", assertThrows(OutputFault.class,
                () -> Steps.run(new TableSink(), folder, Map.of("table", table), "path", "t.csv")).getMessage());
    }
}
