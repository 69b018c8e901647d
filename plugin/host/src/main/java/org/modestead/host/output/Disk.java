package org.modestead.host.output;

import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;

/** Where bytes of results go; the one place at which a full or broken disk shows. */
@FunctionalInterface
public interface Disk {

    /** The machine's own disk. */
    Disk REAL = file -> new BufferedOutputStream(Files.newOutputStream(file, StandardOpenOption.CREATE,
            StandardOpenOption.TRUNCATE_EXISTING, StandardOpenOption.WRITE), 1 << 16);

    /**
     * Makes or empties a file.
     *
     * @return to be closed by the caller
     */
    OutputStream create(Path file) throws IOException;
}
