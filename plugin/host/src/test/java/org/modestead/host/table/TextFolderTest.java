package org.modestead.host.table;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.OutputStreamWriter;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.zip.GZIPOutputStream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** A folder of text files is one table. */
class TextFolderTest {

    @TempDir
    Path folder;

    @BeforeEach
    void makeFolder() throws IOException {
        Files.createDirectory(folder.resolve("days"));
    }

    private void write(String name, String text) throws IOException {
        Files.writeString(folder.resolve("days").resolve(name), text);
    }

    private Table days(Object... settings) {
        return Steps.source(folder, "days", settings);
    }

    private String refused() {
        return assertThrows(TableFault.class, this::days).getMessage();
    }

    @Test
    void filesFollowEachOtherInTheOrderOfTheirNames() throws IOException {
        write("2.csv", "time,flow\n2,1.5\n3,\n");
        write("1.csv", "time,flow\n0,4\n1,5\n");
        write(".1.csv", "not a table\n");
        write("_done", "");
        try (Writer out = new OutputStreamWriter(new GZIPOutputStream(Files.newOutputStream(folder.resolve("days/3.csv.gz"))), StandardCharsets.UTF_8)) {
            out.write("time;flow\n4;7\n");
        }
        assertEquals(List.of("0|4.0", "1|5.0", "2|1.5", "3|", "4|7.0"), Steps.rows(days()));
        assertEquals(List.of(CellType.LONG, CellType.DOUBLE), days().schema().columns().stream().map(Column::type).toList());
        assertEquals("days", days().origin());
    }

    @Test
    void rowsOfLargeFilesStayInOrder() throws IOException {
        int rows = 150_000;
        for (int part = 0; part < 3; part++) {
            StringBuilder text = new StringBuilder("time,value\n");
            for (int i = part * rows; i < (part + 1) * rows; i++) {
                text.append(i).append(',').append(i % 7).append(".5\n");
            }
            write("part" + part + ".csv", text.toString());
        }
        long expected = 0;
        try (RowCursor cursor = days().open()) {
            while (cursor.next()) {
                assertEquals(expected++, cursor.number(0));
            }
        }
        assertEquals(3L * rows, expected);
        assertEquals(List.of("450000|449999"), Steps.rows(Steps.query(folder, "SELECT count(*) AS n, max(time) AS last FROM input", Map.of("input", days()))));
    }

    @Test
    void aColumnThatIsEmptyInOneFileIsWhatTheOthersSay() throws IOException {
        write("1.csv", "time,note,\n0,,\n");
        write("2.csv", "time,note,\n1,open,\n");
        assertEquals(List.of("0|", "1|open"), Steps.rows(days()));
        assertEquals(List.of("time", "note"), days().schema().names());
    }

    @Test
    void aFileWithOtherColumnsIsNamed() throws IOException {
        write("1.csv", "time,flow\n0,1\n");
        write("2.csv", "time,level\n1,2\n");
        assertEquals("days/2.csv: its columns are time, level, those of days/1.csv are time, flow; give all files of the folder the same columns"
                + " in the same order, or name one file.", refused());
    }

    @Test
    void aColumnOfAnotherTypeIsNamed() throws IOException {
        write("1.csv", "time,flow\n0,1\n");
        write("2.csv", "time,flow\n1,open\n");
        assertEquals("days/2.csv, column flow: it is of type text here and of type whole number in days/1.csv; correct the files, or name the column"
                + " in the setting text-columns.", refused());
        assertEquals(List.of("0|1", "1|open"), Steps.rows(days("text-columns", List.of("flow"))));
    }

    @Test
    void aCellThatDoesNotFitIsNamedWithItsFileAndRow() throws IOException {
        write("1.csv", "time,flow\n0,1.5\n");
        StringBuilder late = new StringBuilder("time,flow\n");
        for (int i = 1; i < 30_000; i++) {
            late.append(i).append(i == 29_000 ? ",broken\n" : ",2.5\n");
        }
        write("2.csv", late.toString());
        Table days = days();
        assertEquals("days/2.csv, row 29000 (line 29001), column flow: the text \"broken\" in a column of type number; correct the cell, add this text"
                + " to the setting missing, or name the column in the setting text-columns.",
                assertThrows(TableFault.class, () -> Steps.rows(days)).getMessage());
    }

    @Test
    void aFileWithoutARowIsNamed() throws IOException {
        write("1.csv", "time,flow\n0,1\n");
        write("2.csv", "time,flow\n");
        assertTrue(refused().startsWith("days/2.csv: there is a header (time, flow) but no row below it;"), this::refused);
        write("2.csv", "");
        assertTrue(refused().startsWith("days/2.csv: the file is empty (0 bytes);"), this::refused);
    }

    @Test
    void aFolderWithoutTextFilesIsNoTable() throws IOException {
        write("data.xml", "<a/>");
        assertEquals("days: this is a folder, not a file; name a file in it.", refused());
    }
}
