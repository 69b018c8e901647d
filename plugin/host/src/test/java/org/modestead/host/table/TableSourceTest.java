package org.modestead.host.table;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import java.util.zip.GZIPOutputStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.Table;

/** What the source makes of files, and the sentence it says about each kind of broken one. */
class TableSourceTest {

    @TempDir
    Path folder;

    @Test
    void readsTypesAndRowsOfAPlainCsv() throws IOException {
        Table table = read("""
                time,flow,gate,day,at,note
                0,1.5,true,2020-01-01,2020-01-01T10:00:00,"a, b"
                1,2,false,2020-01-02,2020-01-01 10:00:01.5,
                2,NaN,true,2020-01-03,2020-01-01T10:00:02,x
                """);
        assertEquals(List.of(CellType.LONG, CellType.DOUBLE, CellType.FLAG, CellType.DATE, CellType.DATE_TIME,
                CellType.TEXT),
                types(table));
        assertEquals(List.of("0|1.5|true|2020-01-01|2020-01-01T10:00|a, "
                + "b", "1|2.0|false|2020-01-02|2020-01-01T10:00:01.500|",
                "2||true|2020-01-03|2020-01-01T10:00:02|x"), Steps.rows(table));
    }

    @Test
    void givesTheSameRowsWhenOpenedAgain() throws IOException {
        Table table = read("time,flow\n0,1\n1,2\n");
        assertEquals(Steps.rows(table), Steps.rows(table));
    }

    @Test
    void findsSemicolonsAndDecimalCommas() throws IOException {
        Table table = read("time;flow\n0;1,5\n1;-2,25\n", "decimal", "comma");
        assertEquals(List.of("0|1.5", "1|-2.25"), Steps.rows(table));
    }

    @Test
    void readsTabsGzipByteOrderMarkWindowsLineEndsAndSkippedLines() throws IOException {
        try (GZIPOutputStream out = new GZIPOutputStream(Files.newOutputStream(folder.resolve("log.tsv.gz")))) {
            out.write("made by logger 7\r\ntime\tflow [m3/h]\r\n0\t1\r\n1\t2\r\n".getBytes(StandardCharsets.UTF_8));
        }
        Table table = Steps.source(folder, "log.tsv.gz", "skip-lines", 1);
        assertEquals(List.of("time", "flow [m3/h]"), table.schema().names());
        assertEquals(List.of("0|1", "1|2"), Steps.rows(table));
        assertEquals(List.of("0|1"), Steps.rows(read("\uFEFFtime,flow\n0,1\n")));
    }

    @Test
    void readsLatin1WhenToldSo() throws IOException {
        Files.write(folder.resolve("t.csv"), "time,débit\n0,1\n".getBytes(StandardCharsets.ISO_8859_1));
        assertEquals(List.of("time", "débit"), Steps.source(folder, "t.csv", "encoding", "latin-1").schema().names());
    }

    @Test
    void readsTimesInAnotherFormatWhenToldSo() throws IOException {
        Table table = read("at,flow\n30.06.2015 12:00:00,1\n01.07.2015 00:30:00,2\n", "time-format", "%d.%m.%Y %H:%M:%S");
        assertEquals(List.of("2015-06-30T12:00|1", "2015-07-01T00:30|2"), Steps.rows(table));
    }

    @Test
    void readsZonedTimesAtUtc() throws IOException {
        Table table = read("at,flow\n2020-01-01T10:00:00+02:00,1\n2020-01-01T09:00:00Z,2\n");
        assertEquals(List.of(CellType.ZONED_DATE_TIME, CellType.LONG), types(table));
        assertEquals(List.of("2020-01-01T08:00Z|1", "2020-01-01T09:00Z|2"), Steps.rows(table));
    }

    @Test
    void leavesOutTheEmptyColumnOfATrailingDelimiterButKeepsANamedEmptyChannel() throws IOException {
        assertEquals(List.of("time", "flow"), read("time,flow,\n0,1,\n1,2,\n").schema().names());
        Table table = read("time,flow\n0,\n1,NaN\n");
        assertEquals(List.of(CellType.LONG, CellType.DOUBLE),
                types(table), "an empty channel is a channel, to be refused later");
    }

    @Test
    void aDecimalAfterTheSampleMakesTheColumnANumber() throws IOException {
        StringBuilder text = new StringBuilder("time,flow\n");
        for (int i = 0; i < TextTyper.SAMPLE + 10; i++) {
            text.append(i).append(',').append(i == TextTyper.SAMPLE + 5 ? "2.5" : "1").append('\n');
        }
        assertEquals(List.of(CellType.LONG, CellType.DOUBLE), types(read(text.toString())));
    }

    @Test
    void textInANumberColumnNamesFileRowLineColumnAndText() throws IOException {
        TableFault fault = refused("time,note,flow\n0,\"a\nb\",1\n1,c,abc\n2,c,3\n");
        assertEquals("t.csv, row 2 (line 4), column flow: the text \"abc\" in a column of type whole number; correct the "
                + "cell, add this "
                + "text to the setting missing, or name the column in the setting text-columns.", fault.getMessage());
    }

    @Test
    void textAfterTheSampleNamesItsRowTooAndNotADatabaseError() throws IOException {
        StringBuilder text = new StringBuilder("time,flow\n");
        int bad = TextTyper.SAMPLE + 5000;
        for (int i = 1; i <= TextTyper.SAMPLE + 6000; i++) {
            text.append(i).append(',').append(i == bad ? "n.a." : "0.5").append('\n');
        }
        Table table = read(text.toString());
        TableFault fault = assertThrows(TableFault.class, () -> Steps.rows(table));
        assertEquals("t.csv, row " + bad + " (line " + (bad + 1) + "), column flow", fault.where());
        assertTrue(fault.seen().contains("\"n.a.\""), fault::seen);
    }

    @Test
    void textFarBelowTheRowsThatDuckDbKeepsReadyIsNamedAndEndsNoTable() throws IOException {
        StringBuilder text = new StringBuilder("time,flow\n");
        for (int i = 1; i <= 300_000; i++) {
            text.append(i).append(',').append(i == 250_000 ? "n.a." : "0.5").append('\n');
        }
        Table table = read(text.toString());
        TableFault fault = assertThrows(TableFault.class, () -> Steps.rows(table));
        assertEquals("t.csv, row 250000 (line 250001), column flow", fault.where());
    }

    @Test
    void textThatIsDeclaredMissingOrTextPasses() throws IOException {
        assertEquals(List.of("0|1", "1|", "2|3"),
                Steps.rows(read("time,flow\n0,1\n1,n.a.\n2,3\n", "missing", List.of("n.a."))));
        assertEquals(List.of(CellType.LONG, CellType.TEXT),
                types(read("time,run\n0,1\n1,2\n2,2b\n", "text-columns", List.of("run"))));
    }

    @Test
    void emptyFileIsNamed() throws IOException {
        assertEquals("t.csv: the file is empty (0 bytes); give a table with a header and at least one row.",
                refused("").getMessage());
        assertTrue(refused("\n\n").getMessage().contains("no line of text"));
    }

    @Test
    void headerWithoutRowsIsNamed() throws IOException {
        assertEquals("t.csv: there is a header (time, flow) but no row below it; give a table with at least one row.",
                refused("time,flow\n").getMessage());
    }

    @Test
    void headerOfNumbersIsNamed() throws IOException {
        TableFault fault = refused("0,1.5\n1,2.5\n");
        assertTrue(fault.getMessage().contains("header holds numbers only (0, 1.5)"), fault::getMessage);
        assertEquals(List.of("column1", "column2"), read("0,1.5\n1,2.5\n", "header", false).schema().names());
    }

    @Test
    void twiceNamedColumnIsNamed() throws IOException {
        assertEquals("t.csv, line 1, column Flow", refused("time,flow,Flow\n0,1,2\n").where());
    }

    @Test
    void raggedRowsAreNamedWithTheirWidth() throws IOException {
        assertEquals("t.csv, row 2 (line 3): 3 cells where the header has 2; give every row as many cells, and quote cells "
                + "that hold "
                + "the delimiter.", refused("time,flow\n0,1\n1,2,3\n").getMessage());
        assertTrue(refused("time,flow\n0,1\n1\n").getMessage()
                .startsWith("t.csv, row 2 (line 3): 1 cell where the header has 2"));
    }

    @Test
    void raggedRowAfterTheSampleIsNamed() throws IOException {
        String text = "time,flow\n" + "1,2\n".repeat(TextTyper.SAMPLE + 100) + "1,2,3\n";
        TableFault fault = assertThrows(TableFault.class, () -> Steps.rows(read(text)));
        assertEquals("t.csv, row " + (TextTyper.SAMPLE + 101) + " (line " + (TextTyper.SAMPLE + 102) + ")", fault.where());
    }

    @Test
    void openQuoteIsNamed() throws IOException {
        TableFault fault = refused("time,note\n0,x\n1,\"abc\n2,y\n");
        assertEquals("t.csv, row 2 (line 3)", fault.where());
        assertTrue(fault.seen().contains("never closes"), fault::seen);
    }

    @Test
    void textOfAnotherEncodingIsNamedByLine() throws IOException {
        Files.write(folder.resolve("t.csv"), "time,débit\n0,1\n".getBytes(StandardCharsets.ISO_8859_1));
        TableFault fault = assertThrows(TableFault.class, () -> Steps.source(folder, "t.csv"));
        assertEquals("t.csv, line 1: the text is not UTF-8; save the file as UTF-8, or set encoding to latin-1 if that is "
                + "what it is.",
                fault.getMessage());
        Files.write(folder.resolve("t.csv"), "time,note\n0,a\n1,é\n".getBytes(StandardCharsets.ISO_8859_1));
        TableFault late = assertThrows(TableFault.class, () -> Steps.rows(Steps.source(folder, "t.csv")));
        assertEquals("t.csv, line 3", late.where());
    }

    @Test
    void missingFileAndFolderAreNamed() throws IOException {
        Files.writeString(folder.resolve("pumps.csv"), "time,flow\n0,1\n");
        assertEquals("pump.csv: there is no such file, perhaps you meant pumps.csv; name a file relative to the workflow's "
                + "folder "
                + "or with its full path.", assertThrows(TableFault.class, () -> Steps.source(folder, "pump.csv"))
                .getMessage());
        Files.createDirectory(folder.resolve("data"));
        assertEquals("data: this is a folder, not a file; name a file in it.",
                assertThrows(TableFault.class, () -> Steps.source(folder, "data")).getMessage());
    }

    @Test
    void readsJsonAndNamesTextInANumberColumn() throws IOException {
        Files.writeString(folder.resolve("t.json"), "[{\"t\":0,\"f\":1.5},{\"t\":1,\"f\":null},{\"t\":2,\"f\":2}]");
        assertEquals(List.of("0|1.5", "1|", "2|2.0"), Steps.rows(Steps.source(folder, "t.json")));
        Files.writeString(folder.resolve("t.json"), "{\"t\":0,\"f\":1.5}\n{\"t\":1,\"f\":\"abc\"}\n{\"t\":2,\"f\":2}\n");
        TableFault fault = assertThrows(TableFault.class, () -> Steps.source(folder, "t.json"));
        assertEquals("t.json, row 2, column f", fault.where());
        Files.writeString(folder.resolve("t.json"), "[{\"t\":0},{\"t\":");
        assertTrue(assertThrows(TableFault.class, () -> Steps.source(folder, "t.json")).getMessage()
                .startsWith("t.json: Malformed"));
    }

    @Test
    void readsParquetAndNamesABrokenFile() throws IOException {
        Table csv = read("time,flow,at\n0,1.5,2020-01-01T10:00:00\n1,,2020-01-01T10:00:01\n");
        Steps.run(new TableSink(), folder, Map.of("table", csv), "path", "t.parquet");
        Table parquet = Steps.source(folder, "t.parquet");
        assertEquals(csv.schema(), parquet.schema());
        assertEquals(Steps.rows(csv), Steps.rows(parquet));
        Files.writeString(folder.resolve("broken.parquet"), "hello");
        TableFault fault = assertThrows(TableFault.class, () -> Steps.source(folder, "broken.parquet"));
        assertTrue(fault.getMessage().startsWith("broken.parquet: ") && !fault.getMessage().contains("\n"),
                fault::getMessage);
    }

    @Test
    void aFileNameCannotBecomeSql() throws IOException {
        Files.writeString(folder.resolve("a'b [1].csv"), "time,\"fl\"\"ow\"\n0,1\n");
        assertEquals(List.of("0|1"), Steps.rows(Steps.source(folder, "a'b [1].csv")));
    }

    private Table read(String text, Object... settings) throws IOException {
        Files.writeString(folder.resolve("t.csv"), text);
        return Steps.source(folder, "t.csv", settings);
    }

    private TableFault refused(String text) throws IOException {
        Files.writeString(folder.resolve("t.csv"), text);
        TableFault fault = assertThrows(TableFault.class, () -> Steps.source(folder, "t.csv"));
        assertTrue(!fault.getMessage().contains("\n"), "one sentence");
        return fault;
    }

    private static List<CellType> types(Table table) {
        return table.schema().columns().stream().map(Column::type).collect(Collectors.toList());
    }

    /** As other programs write tables: parts by number, and notes beside them that begin with a low line or a point. A query reads them, too. */
    @Test
    void aFolderOfParquetFilesIsOneTableInTheOrderOfNames() throws IOException {
        Path parts = Files.createDirectory(folder.resolve("parts"));
        for (int part = 1; part >= 0; part--) {
            Files.writeString(folder.resolve("t.csv"), "time,flow\n" + 2 * part + ",1.5\n" + (2 * part + 1) + ",\n");
            Steps.run(new TableSink(), folder, Map.of("table", Steps.source(folder, "t.csv")), "path", "parts/part-" + part + ".parquet");
        }
        Files.writeString(parts.resolve("_SUCCESS"), "");
        Files.writeString(parts.resolve(".part-0.parquet"), "no table");
        Table table = Steps.source(folder, "parts");
        assertEquals(List.of("0|1.5", "1|", "2|1.5", "3|"), Steps.rows(table));
        assertEquals(List.of("2"), Steps.rows(Steps.query(folder, "SELECT count(flow) AS n FROM input", Map.of("input", table))));
    }
}
