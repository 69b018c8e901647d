package org.modestead.host.table;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** What a query may do, and what it must not. */
class TableQueryTest {

    @TempDir
    Path folder;

    @Test
    void aQueryReadsItsInputsAndNamesItsColumns() throws IOException {
        Table table = query("SELECT time, 2 * flow AS twice, flow > 1 AS high FROM input WHERE time > 0; ");
        assertEquals(List.of("time", "twice", "high"), table.schema().names());
        assertEquals(List.of("1|5.0|true", "2|2.0|false"), Steps.rows(table));
        assertEquals(Steps.rows(table), Steps.rows(table), "opened again it gives the same rows");
    }

    @Test
    void queriesOfQueriesAndTablesInMemoryJoin() throws IOException {
        Table doubled = Steps.query(folder, "SELECT time, 2 * flow AS flow FROM input", Map.of("input", source()));
        TableSchema names = TableSchema.of(new Column("time", CellType.LONG), new Column("name", CellType.TEXT));
        Table memory = MemoryTable.builder(names, "memory").row(0L, "start").row(2L, null).build();
        Table joined = Steps.query(folder, """
                WITH named AS (SELECT * FROM input2)
                SELECT a.time, a.flow, n.name, c.flow AS single
                FROM input a JOIN named n USING (time) JOIN input3 c USING (time) ORDER BY a.time -- the last word
                """, Map.of("input", doubled, "input2", memory, "input3", source()));
        assertEquals(List.of("0|3.0|start|1.5", "2|2.0||1.0"), Steps.rows(joined));
    }

    @Test
    void typesWithoutCounterpartComeAsNumbersOrText() throws IOException {
        Table table = query("SELECT 1.50::DECIMAL(5, 2) AS d, [1, 2] AS list, [[1], [2]] AS nested, [1.5, NULL]::DOUBLE[2] AS fixed, "
                + "[TIME '10:00:00'] AS hours, DATE '2020-01-01' AS day, TIMESTAMPTZ '2020-01-01 10:00:00+02' AS zoned, 3::HUGEINT AS huge FROM input LIMIT 1");
        assertEquals(List.of(CellType.DOUBLE, CellType.LONG_LIST, CellType.TEXT, CellType.DOUBLE_LIST, CellType.TEXT, CellType.DATE,
                CellType.ZONED_DATE_TIME, CellType.DOUBLE), table.schema().columns().stream().map(Column::type).toList());
        assertEquals(List.of("1.5|[1, 2]|[[1], [2]]|[1.5, ]|['10:00:00']|2020-01-01|2020-01-01T08:00Z|3.0"), Steps.rows(table));
    }

    @Test
    void nothingButOneSelectIsAccepted() throws IOException {
        for (String sql : List.of("DROP TABLE input", "COPY input TO 'x.csv'", "ATTACH 'x.db'", "SET memory_limit = '9GB'",
                "INSTALL httpfs", "SELECT 1; SELECT 2", "CREATE TABLE t AS SELECT 1", "PRAGMA database_list", "  ",
                "SELECT 1) TO 'x.csv'; SELECT (1")) {
            TableFault fault = assertThrows(TableFault.class, () -> query(sql), sql);
            assertTrue(fault.getMessage().startsWith("setting sql: "), fault::getMessage);
        }
    }

    @Test
    void noOtherFileCanBeReached() throws IOException {
        Path secret = Files.writeString(folder.resolve("secret.csv"), "word\nhidden\n");
        for (String sql : List.of("SELECT * FROM read_csv('" + secret + "')", "SELECT * FROM '" + secret + "'",
                "SELECT content FROM read_text('" + secret + "')", "SELECT * FROM glob('/*')",
                "SELECT * FROM query('SELECT * FROM read_text(''" + secret + "'')')",
                "SELECT (SELECT content FROM read_text('" + secret + "')) AS word FROM input")) {
            TableFault fault = assertThrows(TableFault.class, () -> Steps.rows(query(sql)), sql);
            assertTrue(!fault.getMessage().contains("hidden") && !fault.getMessage().contains("\n"), fault::getMessage);
        }
    }

    @Test
    void aFaultOfTheFileIsToldThroughTheQuery() throws IOException {
        StringBuilder text = new StringBuilder("time,flow\n");
        for (int i = 1; i <= TextTyper.SAMPLE + 100; i++) {
            text.append(i).append(',').append(i == TextTyper.SAMPLE + 50 ? "abc" : "1.5").append('\n');
        }
        Files.writeString(folder.resolve("t.csv"), text.toString());
        Table sum = Steps.query(folder, "SELECT sum(flow) AS total FROM input",
                Map.of("input", Steps.source(folder, "t.csv")));
        TableFault fault = assertThrows(TableFault.class, () -> Steps.rows(sum));
        assertEquals("t.csv, row " + (TextTyper.SAMPLE + 50) + " (line " + (TextTyper.SAMPLE + 51) + "), column flow",
                fault.where());
    }

    @Test
    void wrongNamesAndFailingExpressionsAreOneSentence() throws IOException {
        TableFault name = assertThrows(TableFault.class, () -> query("SELECT flwo FROM input"));
        assertTrue(name.getMessage().matches("setting sql: Referenced column \"flwo\" not found.*flow.*; correct the "
                + "query\\."),
                name::getMessage);
        TableFault twice = assertThrows(TableFault.class, () -> query("SELECT flow, time AS flow FROM input"));
        assertEquals("setting sql, column flow", twice.where());
        TableFault late = assertThrows(TableFault.class, () -> Steps.rows(query("SELECT CAST(note AS DOUBLE) AS n FROM "
                + "input")));
        assertTrue(late.getMessage().startsWith("setting sql: Could not convert string 'a'"), late::getMessage);
    }

    @Test
    void whatIsLargerThanMemoryGoesToATemporaryFolderThatIsRemoved() throws IOException {
        long before = spills();
        Table sorted = Steps.query(folder, "SELECT i, hash(i) AS h FROM input, range(4000000) r(i) ORDER BY h LIMIT 3000000",
                Map.of("input", Steps.query(folder, "SELECT 1 AS one FROM input LIMIT 1", Map.of("input", source()))));
        Table small = (Table) Steps.run(new TableQuery(), folder, Map.of("input", sorted), "sql",
                "SELECT count(*) AS n FROM input", "memory", 128).outputs().get("table");
        assertEquals(List.of("3000000"), Steps.rows(small));
        assertEquals(before, spills());
    }

    /** Those of this process alone: others work in the same folder. */
    private static long spills() throws IOException {
        try (var inside = Files.list(Path.of(System.getProperty("java.io.tmpdir")))) {
            return inside.filter(path -> path.getFileName().toString().startsWith("modestead-spill-" + ProcessHandle.current().pid() + "-")).count();
        }
    }

    private Table query(String sql) throws IOException {
        return Steps.query(folder, sql, Map.of("input", source()));
    }

    private Table source() throws IOException {
        Files.writeString(folder.resolve("pumps.csv"), "time,flow,note\n0,1.5,a\n1,2.5,b\n2,1.0,c\n");
        return Steps.source(folder, "pumps.csv");
    }
}
