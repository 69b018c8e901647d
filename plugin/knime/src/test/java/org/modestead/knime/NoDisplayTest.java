package org.modestead.knime;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** On a server nodes are made, configured, run and saved without one class of the window system being loaded. */
class NoDisplayTest {

    private static final long PATIENCE_MINUTES = 5;

    /** The whole chain in a fresh process, because the tests beside this one paint. */
    public static final class Headless {

        private Headless() {}

        /** @param arguments folder for internals */
        public static void main(String[] arguments) throws Exception {
            Chain.run().rig("forecast").engine().save(Path.of(arguments[0]).toFile());
        }
    }

    @Test
    void nodesRunWithoutTheWindowSystem(@TempDir Path folder) throws IOException, InterruptedException {
        Path log = folder.resolve("loaded.txt");
        Process child = new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-Xlog:class+load:file=" + log, "-cp", System.getProperty("java.class.path"), Headless.class.getName(), folder.toString())
                .redirectErrorStream(true).redirectOutput(folder.resolve("out.txt").toFile()).start();
        assertTrue(child.waitFor(PATIENCE_MINUTES, TimeUnit.MINUTES));
        assertEquals(0, child.exitValue(), Files.readString(folder.resolve("out.txt")));
        assertTrue(Files.exists(folder.resolve("result.zip")));
        try (Stream<String> lines = Files.lines(log)) {
            assertEquals(List.of(), lines.filter(line -> line.matches(".* (java[.]awt|javax[.]swing|sun[.]awt|sun[.]java2d)[.].*")).toList());
        }
        assertTrue(Files.readString(log).contains("org.modestead.knime.DeclaredNodeModel"), "the list is of this run");
    }
}
