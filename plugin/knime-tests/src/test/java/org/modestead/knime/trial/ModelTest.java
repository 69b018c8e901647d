package org.modestead.knime.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A model that was fitted in one session of the platform is taken up in another one, by our file and by the platform's own. */
class ModelTest {

    private static final String PLATFORM_WRITER = "org.knime.base.node.io.filehandling.model.writer.ModelWriterNodeFactory";
    private static final String PLATFORM_READER = "org.knime.base.node.io.filehandling.model.reader.ModelReaderNodeFactory";

    @TempDir
    Path folder;

    @Test
    void aSavedModelGivesTheSameForecastInANewSession() throws Exception {
        PlatformHome home = PlatformHome.givenOrSkipped();
        HostRun host = HostRun.of(NodesTest.everyNode(folder), folder.resolve("host"));
        Path first = folder.resolve("first");
        Path theirs = folder.resolve("platforms.model");
        try (Platform platform = Platform.start(home, folder.resolve("session-1"))) {
            PlatformWorkflow built = PlatformWorkflow.build(platform, host.workflow(), first);
            int writer = platform.node(PLATFORM_WRITER);
            platform.ask("link", built.numbers().get("kept"), 1, writer, 1);
            platform.ask("set", writer, path(theirs));
            platform.ask("start", writer);
            assertEquals(List.of("true"), platform.ask("await", 300));
            assertEquals("executed", platform.state(writer).word(), platform.state(writer).toString());
            assertEquals(List.of(), platform.problemsLogged());
        }
        assertTrue(Files.size(theirs) > 0);
        Path second = Files.createDirectories(folder.resolve("second"));
        Files.copy(first.resolve("model.zip"), second.resolve("model.zip"));
        try (Platform platform = Platform.start(home, folder.resolve("session-2"))) {
            platform.ask("create", second);
            int ours = platform.node("model-reader");
            platform.ask("set", ours, "file", "text", "model.zip");
            forecastIsTheHosts(platform, ours, host, folder.resolve("ours"));
            int reader = platform.node(PLATFORM_READER);
            platform.ask("set", reader, path(theirs));
            forecastIsTheHosts(platform, reader, host, folder.resolve("theirs"));
            assertEquals(List.of(), platform.problemsLogged());
        }
    }

    private static void forecastIsTheHosts(Platform platform, int source, HostRun host, Path file) throws Exception {
        int applied = platform.node("model-applier");
        int forecast = platform.node("forecast");
        platform.ask("set", forecast, "horizon", "number", 10, "origin", "text", "before-holdout");
        platform.ask("link", source, 1, applied, 1);
        for (int port = 1; port <= 4; port++) {
            platform.ask("link", applied, port, forecast, port);
        }
        platform.ask("start", forecast);
        assertEquals(List.of("true"), platform.ask("await", 300));
        assertEquals("executed", platform.state(forecast).word(), platform.state(source) + " " + platform.state(forecast));
        platform.ask("table", forecast, 1, file);
        assertEquals(host.tables().get("forecast.forecast"), Files.readAllLines(file));
    }

    private static List<Object> path(Path file) {
        return List.of("filechooser/path/path", "text", file);
    }
}
