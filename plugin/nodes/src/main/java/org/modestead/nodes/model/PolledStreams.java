package org.modestead.nodes.model;

import java.io.FilterInputStream;
import java.io.FilterOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import org.modestead.engine.Progress;

/** Streams that ask at every block whether to stop, so that a large file can be cancelled, and tell how far they are. */
final class PolledStreams {

    private PolledStreams() {}

    /** @param size of the whole, at least 1 */
    static InputStream reading(InputStream in, long size, String message, Progress progress) {
        return new FilterInputStream(in) {
            private long done;

            @Override
            public int read() throws IOException {
                byte[] one = new byte[1];
                return read(one, 0, 1) < 0 ? -1 : one[0] & 0xff;
            }

            @Override
            public int read(byte[] bytes, int from, int length) throws IOException {
                progress.checkCancelled();
                int read = super.read(bytes, from, length);
                done += Math.max(0, read);
                progress.report(Math.min(1, (double) done / size), message);
                return read;
            }
        };
    }

    static OutputStream writing(OutputStream out, Progress progress) {
        return new FilterOutputStream(out) {
            @Override
            public void write(byte[] bytes, int from, int length) throws IOException {
                progress.checkCancelled();
                out.write(bytes, from, length);
            }
        };
    }
}
