package org.modestead.nodes.modelfile;

import java.io.EOFException;
import java.io.FilterInputStream;
import java.io.IOException;
import java.io.InputStream;

/**
 * Passes a stream through and remembers its last bytes: a zip read as a stream tells nothing of a cut after its last entry, so its end
 * record is looked for.
 */
final class ZipEnd extends FilterInputStream {

    private static final int RECORD = 22;
    private static final byte[] SIGNATURE = {'P', 'K', 5, 6};

    private final byte[] last = new byte[RECORD];
    private long count;

    ZipEnd(InputStream in) {
        super(in);
    }

    @Override
    public int read() throws IOException {
        byte[] one = new byte[1];
        return read(one, 0, 1) < 0 ? -1 : one[0] & 0xff;
    }

    @Override
    public int read(byte[] bytes, int from, int length) throws IOException {
        int read = super.read(bytes, from, length);
        for (int i = Math.max(0, read - RECORD); i < read; i++) {
            last[(int) ((count + i) % RECORD)] = bytes[from + i];
        }
        count += Math.max(0, read);
        return read;
    }

    @Override
    public long skip(long wanted) throws IOException {
        return read(new byte[(int) Math.min(wanted, 1 << 13)]);
    }

    @Override
    public boolean markSupported() {
        return false;
    }

    /** Reads on to the end of the stream. */
    void require() throws IOException {
        byte[] rest = new byte[1 << 13];
        while (read(rest, 0, rest.length) >= 0) {
            // only the last bytes count
        }
        for (int i = 0; i < SIGNATURE.length; i++) {
            if (count < RECORD || last[(int) ((count + i) % RECORD)] != SIGNATURE[i]) {
                throw new EOFException("its end is missing");
            }
        }
    }
}
