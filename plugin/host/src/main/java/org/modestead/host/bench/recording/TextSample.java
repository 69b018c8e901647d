package org.modestead.host.bench.recording;

import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.zip.GZIPInputStream;

/**
 * The first lines of a text file.
 *
 * @param encoding how letters are stored, as the step that reads the file names it
 * @param lines whole lines
 */
record TextSample(String encoding, List<String> lines) {

    private static final int BYTES = 1 << 16;
    private static final int MOST_LINES = 300;
    private static final int BYTE = 0xFF;
    private static final int HIGH = 0xFE;

    /** Reads the beginning of a file, gzipped or not. */
    static TextSample of(Path file) throws IOException {
        byte[] bytes;
        try (InputStream in = open(file)) {
            bytes = in.readNBytes(BYTES);
        }
        boolean wide = bytes.length > 1 && ((bytes[0] & BYTE) == HIGH && (bytes[1] & BYTE) == BYTE || (bytes[0] & BYTE) == BYTE && (bytes[1] & BYTE) == HIGH);
        Charset charset = wide ? StandardCharsets.UTF_16 : isUtf8(bytes) ? StandardCharsets.UTF_8 : StandardCharsets.ISO_8859_1;
        String text = new String(bytes, charset);
        List<String> lines = new ArrayList<>(text.lines().limit(MOST_LINES).toList());
        boolean cut = bytes.length == BYTES && lines.size() < MOST_LINES;
        if (cut && lines.size() > 1) {
            lines.remove(lines.size() - 1);
        }
        if (!lines.isEmpty() && lines.get(0).startsWith("\uFEFF")) {
            lines.set(0, lines.get(0).substring(1));
        }
        return new TextSample(wide ? "utf-16" : charset == StandardCharsets.UTF_8 ? "utf-8" : "latin-1", lines);
    }

    private static InputStream open(Path file) throws IOException {
        InputStream in = new BufferedInputStream(Files.newInputStream(file));
        return file.toString().toLowerCase(Locale.ROOT).endsWith(".gz") ? new GZIPInputStream(in) : in;
    }

    private static boolean isUtf8(byte[] bytes) {
        // the last letter may be cut in two: up to three bytes of it are left out
        for (int cut = 0; cut < 4 && cut <= bytes.length; cut++) {
            try {
                StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes, 0, bytes.length - cut));
                return true;
            } catch (CharacterCodingException broken) {
                if (bytes.length < BYTES) {
                    return false;
                }
            }
        }
        return false;
    }
}
