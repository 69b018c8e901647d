package org.modestead.knime;

import java.io.BufferedInputStream;
import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import org.modestead.engine.Fault;
import org.modestead.nodes.modelfile.ResultFile;

/** What a node keeps beside its outputs: the result that its view shows, as one file in the open format. */
final class Internals {

    private static final String FILE = "result.zip";

    private Internals() {}

    static void save(Optional<ResultFile> shown, Path folder) throws IOException {
        if (shown.isPresent()) {
            try (OutputStream out = new BufferedOutputStream(Files.newOutputStream(folder.resolve(FILE)))) {
                ResultFile.write(shown.get(), out);
            }
        }
    }

    static Optional<ResultFile> load(Path folder) throws IOException {
        Path file = folder.resolve(FILE);
        if (!Files.exists(file)) {
            return Optional.empty();
        }
        try (InputStream in = new BufferedInputStream(Files.newInputStream(file))) {
            return Optional.of(ResultFile.read(in));
        } catch (Fault unreadable) {
            throw new IOException(unreadable.getMessage(), unreadable);
        }
    }
}
