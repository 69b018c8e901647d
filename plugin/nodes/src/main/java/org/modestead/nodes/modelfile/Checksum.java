package org.modestead.nodes.modelfile;

import java.io.OutputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.zip.CRC32;

/** Counts and sums what is written to it, and keeps none of it. */
final class Checksum extends OutputStream {

    private final CRC32 crc = new CRC32();
    private final MessageDigest digest = digest();
    private long count;

    @Override
    public void write(int b) {
        write(new byte[] {(byte) b}, 0, 1);
    }

    @Override
    public void write(byte[] bytes, int from, int length) {
        crc.update(bytes, from, length);
        digest.update(bytes, from, length);
        count += length;
    }

    long count() {
        return count;
    }

    long crc() {
        return crc.getValue();
    }

    /** Returns the SHA-256 in hexadecimal digits; the sum starts anew. */
    String sha256() {
        return HexFormat.of().formatHex(digest.digest());
    }

    private static MessageDigest digest() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException impossible) {
            throw new IllegalStateException("every Java has SHA-256", impossible);
        }
    }
}
