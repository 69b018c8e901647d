package org.modestead.host.table;

import java.io.BufferedInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.file.Files;
import java.util.Locale;
import java.util.Optional;
import java.util.zip.GZIPInputStream;

/** Finds the line of a CSV file that is not text of the encoding it is said to have. */
final class EncodingScan {

    private EncodingScan() {}

    /** Returns the fault to throw for a file whose bytes are not of its encoding. */
    static TableFault fault(CsvFormat format) {
        String name = format.encoding().name();
        String place = firstBadLine(format).map(line -> ", line " + line).orElse("");
        String other = name.equals("UTF-8") ? "latin-1" : "utf-8";
        return new TableFault(format.shown() + place, "the text is not " + name,
                "save the file as UTF-8, or set encoding to " + other + " if that is what it is");
    }

    /** Returns the first line, from 1, that cannot be decoded; empty when all can. */
    static Optional<Long> firstBadLine(CsvFormat format) {
        if (!format.encoding().name().toUpperCase(Locale.ROOT).equals("UTF-8")) {
            return Optional.empty();
        }
        try (InputStream file = new BufferedInputStream(Files.newInputStream(format.path()));
                InputStream bytes = format.path().toString().endsWith(".gz") ? new GZIPInputStream(file) : file) {
            long line = 1;
            ByteArrayOutputStream text = new ByteArrayOutputStream();
            for (int c = bytes.read(); c >= 0; c = bytes.read()) {
                text.write(c);
                if (c == '\n') {
                    if (!decodes(format, text)) {
                        return Optional.of(line);
                    }
                    text.reset();
                    line++;
                }
            }
            return decodes(format, text) ? Optional.empty() : Optional.of(line);
        } catch (IOException unreadable) {
            return Optional.empty();
        }
    }

    private static boolean decodes(CsvFormat format, ByteArrayOutputStream text) {
        try {
            format.encoding().newDecoder().decode(ByteBuffer.wrap(text.toByteArray()));
            return true;
        } catch (CharacterCodingException foreign) {
            return false;
        }
    }
}
