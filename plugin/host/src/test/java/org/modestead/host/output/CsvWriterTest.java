package org.modestead.host.output;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.time.ZonedDateTime;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/** The exact bytes of written tables (RFC 4180 with line feeds). */
class CsvWriterTest {

    @Test
    void everyTypeIsWrittenAndMissingCellsAreEmpty() throws IOException {
        TableSchema schema = TableSchema.of(new Column("d", CellType.DOUBLE), new Column("l", CellType.LONG),
                new Column("t", CellType.TEXT), new Column("f", CellType.FLAG), new Column("day", CellType.DATE),
                new Column("at", CellType.DATE_TIME), new Column("zoned", CellType.ZONED_DATE_TIME));
        LocalDateTime noon = LocalDateTime.of(2015, 6, 30, 12, 0);
        assertEquals("d,l,t,f,day,at,zoned\n0.1,-3,a,true,2015-06-30,2015-06-30T12:00:00,2015-06-30T12:00:00Z\n,,,,,,\n",
                written(MemoryTable.builder(schema, "test")
                        .row(0.1, -3L, "a", true, LocalDate.of(2015, 6, 30), noon, ZonedDateTime.of(noon, ZoneOffset.UTC))
                        .row(null, null, null, null, null, null, null).build()));
    }

    @Test
    void numbersHaveTheFewestDigitsThatReadBack() throws IOException {
        TableSchema schema = TableSchema.of(new Column("x", CellType.DOUBLE));
        // 2.0E-3 and 2.2E-322 come out longer from Double.toString before Java 19 (JDK-4511638)
        assertEquals("x\n0.3\n0.30000000000000004\n0.002\n2.0E-322\n1.0E10\n-0.0\n\n",
                written(MemoryTable.builder(schema, "test").row(0.3).row(0.1 + 0.2).row(2e-3).row(2e-322).row(1e10).row(-0.0)
                        .row(Double.NaN).build()));
    }

    @Test
    void textIsQuotedWhereItMustBe() throws IOException {
        TableSchema schema = TableSchema.of(new Column("a,b", CellType.TEXT), new Column("c", CellType.TEXT));
        assertEquals("\"a,b\",c\n\"say \"\"x\"\"\",\"two\nlines\"\n\" blank\",plain text\n",
                written(MemoryTable.builder(schema, "test").row("say \"x\"", "two\nlines").row(" blank", "plain text")
                .build()));
    }

    private static String written(MemoryTable table) throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        CsvWriter.write(table, out, Progress.NONE);
        return out.toString(StandardCharsets.UTF_8);
    }
}
