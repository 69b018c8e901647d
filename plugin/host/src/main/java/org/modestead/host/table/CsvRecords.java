package org.modestead.host.table;

import java.io.BufferedReader;
import java.io.Closeable;
import java.io.FileInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CodingErrorAction;
import java.util.ArrayList;
import java.util.List;
import java.util.zip.GZIPInputStream;

/**
 * Steps through the records of a CSV file (RFC 4180) only to name places in it: the header, and where a file that
 * DuckDB refused is broken. DuckDB reads the data.
 */
final class CsvRecords implements Closeable {

    private static final int QUOTE = '"';
    private static final int BYTE_ORDER_MARK = 0xFEFF;
    /** DuckDB refuses longer ones too; a line without end would fill the memory. */
    static final int LONGEST = 2_000_000;

    private final BufferedReader reader;
    private final String shown;
    private final char delimiter;
    private long lines = 1;
    private long line = 1;
    private boolean unterminated;
    private List<String> cells = List.of();

    private CsvRecords(BufferedReader reader, String shown, char delimiter) {
        this.reader = reader;
        this.shown = shown;
        this.delimiter = delimiter;
    }

    static CsvRecords open(CsvFormat format) throws IOException {
        return open(format, format.delimiter());
    }

    static CsvRecords open(CsvFormat format, char delimiter) throws IOException {
        BufferedReader reader = reader(format);
        reader.mark(1);
        if (reader.read() != BYTE_ORDER_MARK) {
            reader.reset();
        }
        CsvRecords records = new CsvRecords(reader, format.shown(), delimiter);
        for (int i = 0; i < format.skipLines(); i++) {
            records.skipLine();
        }
        return records;
    }

    /** Moves behind the next line feed, carriage return or both. */
    private void skipLine() throws IOException {
        int c = reader.read();
        while (c >= 0 && c != '\n' && c != '\r') {
            c = reader.read();
        }
        reader.mark(1);
        if (c == '\r' && reader.read() != '\n') {
            reader.reset();
        }
        lines++;
    }

    /** Opens the text of the file; bytes that are not text of its encoding are an {@link IOException}. */
    static BufferedReader reader(CsvFormat format) throws IOException {
        InputStream bytes = new FileInputStream(format.path().toFile());
        boolean opened = false;
        try {
            InputStream plain = format.path().toString().endsWith(".gz") ? new GZIPInputStream(bytes) : bytes;
            CharsetDecoder decoder = format.encoding().newDecoder()
                    .onMalformedInput(CodingErrorAction.REPORT).onUnmappableCharacter(CodingErrorAction.REPORT);
            BufferedReader reader = new BufferedReader(new InputStreamReader(plain, decoder));
            opened = true;
            return reader;
        } finally {
            if (!opened) {
                bytes.close();
            }
        }
    }

    /**
     * Moves on to the next record that is not an empty line; returns false at the end.
     *
     * @throws TableFault if the record is longer than any table's
     */
    boolean next() throws IOException {
        do {
            line = lines;
            cells = record();
        } while (cells.size() == 1 && cells.get(0).isEmpty());
        return !cells.isEmpty();
    }

    /** Returns the cells of the current record, without quotes. */
    List<String> cells() {
        return cells;
    }

    /** Returns the line on which the current record begins, from 1. */
    long line() {
        return line;
    }

    /** Returns whether the file ended inside quotes. */
    boolean isUnterminated() {
        return unterminated;
    }

    private List<String> record() throws IOException {
        List<String> record = new ArrayList<>();
        StringBuilder cell = new StringBuilder();
        boolean quoted = false;
        int length = 0;
        for (int c = reader.read(); c >= 0; c = reader.read()) {
            length++;
            if (length > LONGEST) {
                throw tooLong(quoted);
            }
            lines += c == '\n' ? 1 : 0;
            if (c == QUOTE) {
                quoted = !quoted;
            } else if (c == '\n' && !quoted) {
                break;
            } else if (c == delimiter && !quoted) {
                record.add(cell.toString());
                cell.setLength(0);
            } else if (c != '\r' || quoted) {
                cell.append((char) c);
            }
        }
        unterminated |= quoted;
        if (length > 0) {
            record.add(cell.toString());
        }
        return record;
    }

    private TableFault tooLong(boolean quoted) {
        return quoted ? new TableFault(shown + ", line " + line, "a quote \" opens here and does not close within " + LONGEST + " characters",
                "close it, or write \"\" for a quote inside quotes")
                : new TableFault(shown + ", line " + line, "this line is longer than " + LONGEST + " characters",
                        "check that lines end by line feeds, and that the file is a table");
    }

    @Override
    public void close() throws IOException {
        reader.close();
    }
}
