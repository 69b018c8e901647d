package org.modestead.host.table;

import java.nio.charset.Charset;
import java.nio.file.Path;

/**
 * How a CSV file is written.
 *
 * @param path absolute
 * @param shown the name as the person wrote it, for messages
 * @param delimiter between cells
 * @param header whether the first record names the columns
 * @param encoding of the text
 * @param skipLines lines before the header that are not read
 */
record CsvFormat(Path path, String shown, char delimiter, boolean header, Charset encoding, int skipLines) {

    CsvFormat withDelimiter(char other) {
        return new CsvFormat(path, shown, other, header, encoding, skipLines);
    }
}
