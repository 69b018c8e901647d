package org.modestead.knime.display;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.BufferedReader;
import java.io.File;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The dialogs on a real display, a virtual one started for this test; skipped where there is none to start or the JDK has no windows. */
class DisplayTest {
    private static final long PATIENCE = 300;

    @Test
    void everyDialogIsWalkedThroughByTheKeyboardInAWindowOfEightHundredBySixHundred() throws IOException, InterruptedException {
        assumeTrue(Stream.of(System.getenv("PATH").split(File.pathSeparator)).anyMatch(folder -> Files.isExecutable(Path.of(folder,
                "Xvfb"))),
                "no Xvfb on this machine");
        assumeTrue(Files.exists(Path.of(System.getProperty("java.home"), "lib", "libawt_xawt.so")), "this JDK opens no windows");
        Process screen = new ProcessBuilder("Xvfb", "-displayfd", "1", "-screen", "0", "1280x1024x24", "-nolisten", "tcp")
                .redirectError(ProcessBuilder.Redirect.DISCARD).start();
        try (BufferedReader number = new BufferedReader(new InputStreamReader(screen.getInputStream(), StandardCharsets.UTF_8))) {
            List<String> lines = walk(":" + number.readLine());
            assertTrue(lines.size() > 20, lines.toString());
        } finally {
            screen.destroy();
            screen.waitFor(PATIENCE, TimeUnit.SECONDS);
        }
    }

    private static List<String> walk(String display) throws IOException, InterruptedException {
        ProcessBuilder command = new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-Djava.awt.headless=false",
                "-cp", System.getProperty("java.class.path"), OnDisplay.class.getName()).redirectErrorStream(true);
        command.environment().put("DISPLAY", display);
        Process walk = command.start();
        List<String> lines;
        try (BufferedReader out = new BufferedReader(new InputStreamReader(walk.getInputStream(), StandardCharsets.UTF_8))) {
            lines = out.lines().toList();
        }
        assertTrue(walk.waitFor(PATIENCE, TimeUnit.SECONDS));
        assertEquals(0, walk.exitValue(), String.join("\n", lines));
        return lines;
    }
}
