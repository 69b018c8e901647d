package org.modestead.host.bench.trial;

import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.modestead.host.Main;

/**
 * The command {@code bench} in a Java of its own, as a user starts it.
 *
 * @param process running
 * @param url that it printed
 */
record BenchProcess(Process process, String url) implements AutoCloseable {

    private static final long PATIENCE_SECONDS = 240;

    /** Starts it and waits for its address. */
    static BenchProcess start(Path folder, String... arguments) throws IOException, InterruptedException {
        List<String> command = new ArrayList<>(List.of(Path.of(System.getProperty("java.home"), "bin", "java").toString(), "-Xmx1g",
                "-Djava.awt.headless=true", "-cp", classPath(), Main.class.getName(), "bench", "--no-open"));
        command.addAll(List.of(arguments));
        Path out = Files.createTempFile(folder, "bench", ".txt");
        Process process = new ProcessBuilder(command).directory(folder.toFile()).redirectErrorStream(true).redirectOutput(out.toFile()).start();
        long end = System.nanoTime() + TimeUnit.SECONDS.toNanos(PATIENCE_SECONDS);
        Optional<String> url = Optional.empty();
        while (url.isEmpty()) {
            if (System.nanoTime() > end || !process.isAlive()) {
                process.destroyForcibly();
                throw new IllegalStateException("the bench told no address: " + Files.readString(out));
            }
            Thread.sleep(20);
            url = Files.readString(out).lines().filter(line -> line.startsWith("Bench: ")).map(line -> line.substring(7)).findFirst();
        }
        return new BenchProcess(process, url.get());
    }

    /** Without the nodes of tests, which no user has on the shelf. */
    private static String classPath() {
        String all = System.getProperty("surefire.test.class.path", System.getProperty("java.class.path"));
        return String.join(File.pathSeparator, Stream.of(all.split(File.pathSeparator))
                .filter(entry -> !Files.exists(Path.of(entry, "org", "modestead", "host", "WaitingNode.class"))).toList());
    }

    /** Ends it as a crash does. */
    void kill() throws InterruptedException {
        process.destroyForcibly().waitFor();
    }

    @Override
    public void close() {
        process.destroyForcibly();
    }
}
