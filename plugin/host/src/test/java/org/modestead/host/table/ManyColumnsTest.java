package org.modestead.host.table;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.Table;

/** Tables of more columns than are looked at by one query, and than the usual memory holds. */
class ManyColumnsTest {

    private static final int COLUMNS = 4000;

    @TempDir
    Path folder;

    /** Column j holds whole numbers where j is divisible by 3, words where the rest is 1, halves where it is 2. */
    private static String cell(int row, int column) {
        return List.of(Integer.toString(row + column), "w" + column, row + ".5").get(column % 3);
    }

    private static CellType type(int column) {
        return List.of(CellType.LONG, CellType.TEXT, CellType.DOUBLE).get(column % 3);
    }

    private static String line(int row) {
        return IntStream.range(0, COLUMNS).mapToObj(j -> cell(row, j)).collect(Collectors.joining(","));
    }

    private void write(List<String> lines) throws IOException {
        String names = IntStream.range(0, COLUMNS).mapToObj(j -> "c" + j).collect(Collectors.joining(","));
        Files.writeString(folder.resolve("t.csv"), names + "\n" + String.join("\n", lines) + "\n");
    }

    @Test
    void everyColumnHasItsOwnTypeAndEveryRowItsCells() throws IOException {
        write(List.of(line(0), line(1), line(2)));
        Table table = Steps.source(folder, "t.csv");
        assertEquals(IntStream.range(0, COLUMNS).mapToObj(ManyColumnsTest::type).toList(),
                table.schema().columns().stream().map(Column::type).toList());
        assertEquals(line(1).replace(',', '|'), Steps.rows(table).get(1));
    }

    @Test
    void theCellThatDoesNotFitIsNamedHoweverFarToTheRight() throws IOException {
        write(List.of(line(0), line(1), line(2).replace("," + cell(2, 3900) + ",", ",broken,"), line(3)));
        TableFault fault = assertThrows(TableFault.class, () -> Steps.rows(Steps.source(folder, "t.csv")));
        assertTrue(fault.getMessage().contains("column c3900") && fault.getMessage().contains("broken"), fault.getMessage());
    }
}
