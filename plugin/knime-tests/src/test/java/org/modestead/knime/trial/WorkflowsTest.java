package org.modestead.knime.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Whole workflows in the real engine, and the same ones in the embedded host: the same figures, to the last digit. */
class WorkflowsTest {

    private static final Path FOLDERS = Path.of(System.getProperty("basedir", ""), "../../test-workflows").toAbsolutePath().normalize();

    @TempDir
    Path folder;

    /** Those of every folder that holds one, or those that are named by {@code -Dplatform.workflows=a,b}. */
    static List<String> names() throws IOException {
        String some = System.getProperty("platform.workflows", "");
        if (!some.isBlank()) {
            return List.of(some.split(","));
        }
        try (Stream<Path> folders = Files.list(FOLDERS)) {
            return folders.filter(folder -> Files.isRegularFile(folder.resolve("workflow.json"))).map(folder -> folder.getFileName().toString())
                    .sorted().toList();
        }
    }

    @ParameterizedTest
    @MethodSource("names")
    void aWorkflowGivesTheHostsFiguresAndStillDoesWhenSavedLoadedAndRunAgain(String name) throws Exception {
        PlatformHome home = PlatformHome.givenOrSkipped();
        HostRun host = HostRun.of(FOLDERS.resolve(name), folder.resolve("host"));
        Path saved = folder.resolve(name);
        PlatformWorkflow built;
        try (Platform platform = Platform.start(home, folder.resolve("first"))) {
            built = PlatformWorkflow.build(platform, host.workflow(), saved);
            platform.ask("execute");
            assertEquals(List.of(), built.unfinished(platform));
            Tables.assertSame(host.tables(), built.tables(platform, folder.resolve("executed")));
            platform.ask("save", saved);
            assertEquals(List.of(), platform.problemsLogged());
        }
        try (Platform platform = Platform.start(home, folder.resolve("second"))) {
            assertEquals(List.of(""), platform.ask("load", saved), "complaints about the saved workflow");
            assertEquals(List.of(), built.unfinished(platform));
            Tables.assertSame(host.tables(), built.tables(platform, folder.resolve("loaded")));
            platform.ask("reset-all");
            platform.ask("execute");
            assertEquals(List.of(), built.unfinished(platform));
            Tables.assertSame(host.tables(), built.tables(platform, folder.resolve("again")));
            assertEquals(List.of(), platform.problemsLogged());
            keep(platform, saved, name);
        }
        System.out.println(name + ": " + host.tables().size() + " tables with "
                + Tables.lines(host.tables()) + " lines are the embedded host's, digit by digit, in the"
                + " platform's engine; so they are after saving, loading in a fresh process, and running again.");
    }

    /** Saves the workflow without its results into {@code -Dplatform.keep=<folder>}, for test-workflows/knime, when that is given. */
    private static void keep(Platform platform, Path saved, String name) throws IOException {
        String folder = System.getProperty("platform.keep", "");
        if (!folder.isBlank()) {
            platform.ask("reset-all");
            platform.ask("save", saved);
            Path target = Path.of(folder).resolve(name);
            try (Stream<Path> files = Files.walk(saved)) {
                for (Path file : files.filter(Files::isRegularFile).filter(WorkflowsTest::belongsToTheWorkflow).toList()) {
                    Path copy = target.resolve(saved.relativize(file));
                    Files.createDirectories(copy.getParent());
                    Files.copy(file, copy, StandardCopyOption.REPLACE_EXISTING);
                }
            }
        }
    }

    private static boolean belongsToTheWorkflow(Path file) {
        String name = file.getFileName().toString();
        return name.equals("settings.xml") || name.equals("workflow.knime") || name.endsWith(".csv") || name.equals("model.zip");
    }
}
