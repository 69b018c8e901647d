package org.modestead.knime.trial;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.OutputStreamWriter;
import java.io.UncheckedIOException;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** The platform, running in a process of its own with our finished bundles, asked request by request. */
final class Platform implements AutoCloseable {

    private final Process process;
    private final Writer requests;
    private final BufferedReader answers;
    private final Path area;
    private final List<String> said = new ArrayList<>();

    private Platform(Process process, Path area) {
        this.process = process;
        this.requests = new OutputStreamWriter(process.getOutputStream(), StandardCharsets.UTF_8);
        this.answers = process.inputReader(StandardCharsets.UTF_8);
        this.area = area;
    }

    /**
     * An answer.
     *
     * @param ok whether the request was fulfilled
     * @param fields of the answer; class and text of the error when it was not
     */
    record Answer(boolean ok, List<String> fields) {
        String field(int index) {
            return fields.get(index);
        }
    }

    /**
     * How a node is.
     *
     * @param word executed, configured, idle, executing
     * @param kind of message: reset (none), warning, error
     * @param message shown at the node
     */
    record State(String word, String kind, String message) {}

    /** Starts a fresh process whose files all go below {@code area}. */
    static Platform start(PlatformHome home, Path area) throws IOException {
        List<Path> bundles = new ArrayList<>(home.installed());
        bundles.addAll(site());
        bundles.add(Path.of("target", "classes").toAbsolutePath());
        Files.createDirectories(area);
        Path list = Files.write(area.resolve("bundles.txt"), bundles.stream().map(Path::toString).toList());
        Process process = new ProcessBuilder(Path.of(System.getProperty("java.home"), "bin", "java").toString(), "-Xmx2g",
                "-Djava.awt.headless=true", "-Duser.language=en", "-Duser.name=modestead", "-cp", home.framework() + System.getProperty("path.separator")
                        + Path.of("target", "test-classes").toAbsolutePath(),
                PlatformStart.class.getName(), area.toString(), list.toString())
                        .redirectError(area.resolve("errors.txt").toFile()).start();
        return new Platform(process, area);
    }

    /** Returns our bundles as they ship. */
    private static List<Path> site() throws IOException {
        Path plugins = Path.of(System.getProperty("site.plugins"));
        if (!Files.isDirectory(plugins)) {
            throw new IllegalStateException("there is no " + plugins.normalize() + ": the update site is built before these tests run");
        }
        try (Stream<Path> jars = Files.list(plugins)) {
            return jars.filter(jar -> jar.toString().endsWith(".jar")).sorted().toList();
        }
    }

    /** Asks, and fails when the request was not fulfilled. */
    List<String> ask(String word, Object... arguments) {
        Answer answer = tried(word, arguments);
        if (!answer.ok()) {
            throw new AssertionError(word + " " + List.of(arguments) + ": " + answer.fields() + "\n" + String.join("\n", said));
        }
        return answer.fields();
    }

    /** Asks. */
    Answer tried(String word, Object... arguments) {
        try {
            StringBuilder line = new StringBuilder(word);
            Stream.of(arguments).flatMap(argument -> argument instanceof List<?> list ? list.stream() : Stream.of(argument))
                    .forEach(argument -> line.append('\t').append(Desk.escaped(argument.toString())));
            requests.write(line.append('\n').toString());
            requests.flush();
            return answer();
        } catch (IOException broken) {
            throw new UncheckedIOException(broken);
        }
    }

    private Answer answer() throws IOException {
        String line;
        while ((line = answers.readLine()) != null) {
            if (line.startsWith(Desk.MARK)) {
                List<String> fields = Stream.of(line.substring(Desk.MARK.length()).split("\t", -1)).map(Desk::unescaped).toList();
                return new Answer(fields.get(0).equals("ok"), fields.subList(1, fields.size()));
            }
            said.add(line);
        }
        throw new AssertionError("the platform has ended\n" + String.join("\n", said) + "\n" + errors());
    }

    /** Adds a node of ours by its id, or one of the platform's by the name of its factory; returns its number. */
    int node(String node) {
        return node(node, node);
    }

    /** Adds a node under a label; returns its number. */
    int node(String node, String label) {
        return Integer.parseInt(ask("node", node, label).get(0));
    }

    State state(int node) {
        List<String> fields = ask("state", node);
        return new State(fields.get(0), fields.get(1), fields.get(2));
    }

    /** Returns the lines of the platform's log that name a coding problem or an error. */
    List<String> problemsLogged() throws IOException {
        Optional<Path> log = Optional.of(area.resolve("workspace").resolve(".metadata").resolve("knime").resolve("knime.log"));
        List<String> lines = new ArrayList<>();
        for (Path file : log.filter(Files::exists).stream().toList()) {
            Files.readAllLines(file).stream().filter(line -> line.contains("CODING PROBLEM") || line.contains(" : ERROR : ")).forEach(lines::add);
        }
        return lines;
    }

    private String errors() throws IOException {
        return Files.readString(area.resolve("errors.txt"));
    }

    @Override
    public void close() throws IOException {
        try {
            requests.write("quit\n");
            requests.close();
        } catch (IOException alreadyEnded) {
            // nothing left to end
        }
        try {
            process.waitFor();
        } catch (InterruptedException interrupted) {
            process.destroy();
            Thread.currentThread().interrupt();
        }
    }
}
