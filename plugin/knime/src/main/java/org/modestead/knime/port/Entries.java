package org.modestead.knime.port;

import java.io.IOException;
import java.io.InputStream;
import java.time.LocalDateTime;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;

/** The one file inside each zip that the platform gives us. */
final class Entries {

    /** The oldest time that a zip can hold: the same value gives the same bytes whenever it is saved. */
    private static final LocalDateTime ALWAYS = LocalDateTime.of(1980, 1, 1, 0, 0);

    private Entries() {}

    static ZipEntry named(String name) {
        ZipEntry entry = new ZipEntry(name);
        entry.setTimeLocal(ALWAYS);
        return entry;
    }

    /** Moves to the file and returns it. */
    static InputStream open(ZipInputStream in, String name) throws IOException {
        ZipEntry entry = in.getNextEntry();
        if (entry == null || !entry.getName().equals(name)) {
            throw new IOException("A saved port lacks its file " + name + "; run the node again.");
        }
        return in;
    }
}
