package org.modestead.host.table;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** What the source makes of arrays as NumPy saves them; headers are written here as NumPy 1.24 writes them. */
class NpySourceTest {

    @TempDir
    Path folder;

    @Test
    void anArrayGivesNumberedColumnsAndMissingCells() throws IOException {
        write("{'descr': '<f8', 'fortran_order': False, 'shape': (2, 3), }", doubles(1, 2.5, Double.NaN, -4, 5, 6e300));
        Table table = Steps.source(folder, "a.npy");
        assertEquals(List.of("column1", "column2", "column3"), table.schema().names());
        assertEquals(List.of("1.0|2.5|", "-4.0|5.0|6.0E300"), Steps.rows(table));
        assertEquals(Steps.rows(table), Steps.rows(table), "opened again it gives the same rows");
    }

    @Test
    void fieldsAreColumnsOfTheirNames() throws IOException {
        write("{'descr': [('time', '<f8'), ('flow [m3/h]', '<f8')], 'fortran_order': False, 'shape': (2,), }", doubles(0, 1, 0.5, 2));
        Table table = Steps.source(folder, "a.npy");
        assertEquals(List.of("time", "flow [m3/h]"), table.schema().names());
        assertEquals(List.of("0.0|1.0", "0.5|2.0"), Steps.rows(table));
    }

    @Test
    void singlePrecisionIsReadToo() throws IOException {
        ByteBuffer bytes = ByteBuffer.allocate(8).order(ByteOrder.LITTLE_ENDIAN).putFloat(1.5f).putFloat(-2);
        write("{'descr': '<f4', 'fortran_order': False, 'shape': (2, 1), }", bytes.array());
        assertEquals(List.of("1.5", "-2.0"), Steps.rows(Steps.source(folder, "a.npy")));
    }

    @Test
    void aWideArrayIsOneColumnOfLists() throws IOException {
        double[] values = new double[2 * 1001];
        for (int k = 0; k < values.length; k++) {
            values[k] = k;
        }
        values[1001] = Double.NaN;
        write("{'descr': '<f8', 'fortran_order': False, 'shape': (2, 1001), }", doubles(values));
        Table table = Steps.source(folder, "a.npy");
        assertEquals(List.of(CellType.DOUBLE_LIST), table.schema().columns().stream().map(column -> column.type()).toList());
        try (RowCursor cursor = table.open()) {
            assertTrue(cursor.next());
            assertEquals(1000, cursor.numbers(0).orElseThrow()[1000]);
            assertTrue(cursor.next());
            assertArrayEquals(new double[] {Double.NaN, 1002}, java.util.Arrays.copyOf(cursor.numbers(0).orElseThrow(), 2));
            assertTrue(cursor.cell(0).orElseThrow().toString().startsWith("[, 1002.0"));
        }
    }

    @Test
    void everyKindOfWrongArrayIsRefusedWithASentence() throws IOException {
        refused("{'descr': '<f8', 'fortran_order': True, 'shape': (2, 2), }", doubles(1, 2, 3, 4), "column after column");
        refused("{'descr': '<i8', 'fortran_order': False, 'shape': (2, 2), }", doubles(1, 2, 3, 4), "not numbers of 8 or 4 bytes");
        refused("{'descr': '<f8', 'fortran_order': False, 'shape': (2, 2, 2), }", doubles(1, 2, 3, 4, 5, 6, 7, 8), "another shape");
        refused("{'descr': '<f8', 'fortran_order': False, 'shape': (0, 2), }", new byte[0], "0 rows");
        refused("{'descr': '<f8', 'fortran_order': False, 'shape': (3, 2), }", doubles(1, 2, 3, 4), "shorter than its 3 rows");
        refused("{'descr': [('a', '<f8'), ('b', '<i4')], 'fortran_order': False, 'shape': (1,), }", doubles(1, 2), "fields");
        Files.writeString(folder.resolve("a.npy"), "time,flow\n0,1\n");
        assertTrue(assertThrows(TableFault.class, () -> Steps.source(folder, "a.npy")).getMessage().contains("NPY"));
    }

    private void refused(String header, byte[] data, String seen) throws IOException {
        write(header, data);
        TableFault fault = assertThrows(TableFault.class, () -> Steps.source(folder, "a.npy"));
        assertTrue(fault.getMessage().contains(seen), fault.getMessage());
    }

    private void write(String header, byte[] data) throws IOException {
        String padded = header + " ".repeat(Math.floorMod(-(10 + header.length() + 1), 64)) + "\n";
        ByteBuffer bytes = ByteBuffer.allocate(10 + padded.length() + data.length).order(ByteOrder.LITTLE_ENDIAN);
        bytes.put((byte) 0x93).put("NUMPY".getBytes(StandardCharsets.US_ASCII)).put((byte) 1).put((byte) 0).putShort((short) padded.length());
        Files.write(folder.resolve("a.npy"), bytes.put(padded.getBytes(StandardCharsets.US_ASCII)).put(data).array());
    }

    private static byte[] doubles(double... values) {
        ByteBuffer bytes = ByteBuffer.allocate(8 * values.length).order(ByteOrder.LITTLE_ENDIAN);
        bytes.asDoubleBuffer().put(values);
        return bytes.array();
    }
}
