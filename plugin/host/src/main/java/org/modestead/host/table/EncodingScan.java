package org.modestead.host.table;

import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.file.Files;
import java.util.Locale;
import java.util.Optional;
import java.util.zip.GZIPInputStream;

/** Finds the line of a CSV file that is not text of the encoding it is said to have. */
final class EncodingScan {

    private static final int BLOCK = 1 << 13;

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
            return firstBadLine(bytes, format.encoding().newDecoder());
        } catch (IOException unreadable) {
            return Optional.empty();
        }
    }

    /** Decodes block by block: a line may be as long as the file. */
    private static Optional<Long> firstBadLine(InputStream bytes, CharsetDecoder decoder) throws IOException {
        ByteBuffer in = ByteBuffer.allocate(BLOCK);
        // a byte never gives more than one character
        CharBuffer out = CharBuffer.allocate(BLOCK);
        long line = 1;
        boolean end = false;
        while (!end) {
            int count = bytes.read(in.array(), in.position(), in.remaining());
            end = count < 0;
            in.position(in.position() + Math.max(0, count)).flip();
            CoderResult result = decoder.decode(in, out, end);
            line += out.flip().chars().filter(c -> c == '\n').count();
            if (result.isError()) {
                return Optional.of(line);
            }
            out.clear();
            in.compact();
        }
        return Optional.empty();
    }
}
