package org.modestead.host;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;

/**
 * The command line in a Java of its own, as a person starts it.
 *
 * @param process running
 * @param err file that collects its error stream
 */
public record ChildProcess(Process process, Path err) {

    private static final long PATIENCE_SECONDS = 240;

    /**
     * Starts it.
     *
     * @param folder where it runs and where its streams are kept
     * @param javaOptions for example {@code -Xmx96m}
     * @param arguments of the command line
     */
    public static ChildProcess start(Path folder, List<String> javaOptions, String... arguments) throws IOException {
        List<String> command = new ArrayList<>();
        command.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
        command.addAll(javaOptions);
        command.addAll(List.of("-Djava.awt.headless=true", "-cp",
                System.getProperty("surefire.test.class.path", System.getProperty("java.class.path")),
                Main.class.getName()));
        command.addAll(List.of(arguments));
        Path err = folder.resolve("child-err.txt");
        Process process = new ProcessBuilder(command).directory(folder.toFile()).redirectError(err.toFile())
                .redirectOutput(folder.resolve("child-out.txt").toFile()).start();
        return new ChildProcess(process, err);
    }

    /** Waits until the error stream holds a text. */
    public void await(String text) throws IOException, InterruptedException {
        long end = System.nanoTime() + TimeUnit.SECONDS.toNanos(PATIENCE_SECONDS);
        while (!said().contains(text)) {
            if (System.nanoTime() > end || !process.isAlive()) {
                process.destroyForcibly();
                throw new IllegalStateException("\"" + text + "\" never came: " + said());
            }
            Thread.sleep(10);
        }
    }

    /** Waits for the end and returns the exit code. */
    public int exit() throws InterruptedException {
        if (!process.waitFor(PATIENCE_SECONDS, TimeUnit.SECONDS)) {
            process.destroyForcibly();
            throw new IllegalStateException("the process did not end");
        }
        return process.exitValue();
    }

    /** Returns what it said on its error stream. */
    public String said() throws IOException {
        return Files.exists(err) ? Files.readString(err) : "";
    }
}
