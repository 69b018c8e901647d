package org.modestead.host.output;

import com.fasterxml.jackson.core.io.NumberOutput;
import java.io.IOException;
import java.io.OutputStream;
import java.io.OutputStreamWriter;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.time.LocalDateTime;
import java.time.ZonedDateTime;
import java.time.format.DateTimeFormatter;
import java.util.List;
import java.util.Optional;
import org.modestead.engine.Progress;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/**
 * Writes tables as CSV (RFC 4180, but with line feeds): UTF-8, a header, commas, a decimal point, ISO dates; a missing
 * cell is empty. Numbers have the fewest digits that read back to the same double, on every Java version.
 */
public final class CsvWriter {

    private static final int ROWS_BETWEEN_POLLS = 1024;

    private CsvWriter() {}

    /**
     * Writes all rows; the stream is flushed, not closed.
     *
     * @param table read once
     * @param out where the bytes go
     * @param progress asked about stopping
     */
    public static void write(Table table, OutputStream out, Progress progress) throws IOException {
        Writer writer = new OutputStreamWriter(out, StandardCharsets.UTF_8);
        List<Column> columns = table.schema().columns();
        for (int j = 0; j < columns.size(); j++) {
            writer.write(j == 0 ? "" : ",");
            text(writer, columns.get(j).name());
        }
        writer.write('\n');
        try (RowCursor cursor = table.open()) {
            while (cursor.next()) {
                if (cursor.row() % ROWS_BETWEEN_POLLS == 0) {
                    progress.checkCancelled();
                }
                row(writer, cursor, columns);
            }
        }
        writer.flush();
    }

    private static void row(Writer writer, RowCursor cursor, List<Column> columns) throws IOException {
        for (int j = 0; j < columns.size(); j++) {
            if (j > 0) {
                writer.write(',');
            }
            if (columns.get(j).type() == CellType.DOUBLE) {
                number(writer, cursor.number(j));
            } else {
                Optional<Object> cell = cursor.cell(j);
                if (cell.isPresent()) {
                    text(writer, written(cell.get()));
                }
            }
        }
        writer.write('\n');
    }

    private static void number(Writer writer, double value) throws IOException {
        if (!Double.isNaN(value)) {
            writer.write(NumberOutput.toString(value, true));
        }
    }

    /** Returns a cell as a text: date-times as ISO 8601 has them, seconds always. */
    public static String written(Object cell) {
        if (cell instanceof LocalDateTime time) {
            return time.format(DateTimeFormatter.ISO_LOCAL_DATE_TIME);
        }
        return cell instanceof ZonedDateTime moment ? moment.format(DateTimeFormatter.ISO_OFFSET_DATE_TIME)
                : cell.toString();
    }

    private static void text(Writer writer, String text) throws IOException {
        boolean quoted = text.chars().anyMatch(c -> c == ',' || c == '"' || c == '\n' || c == '\r')
                || !text.equals(text.strip());
        writer.write(quoted ? '"' + text.replace("\"", "\"\"") + '"' : text);
    }
}
