package org.modestead.knime.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.workflow.Step;
import org.modestead.nodes.contract.NodeDeclaration;

/** Each node by itself in the real engine. */
class NodesTest {

    /** Executed last, since it reads what another node has written. */
    private static final String READER = "model-reader";

    private static final String NO_CHANNELS = "channels=[]";

    @TempDir
    Path folder;

    @Test
    void everyNodeIsOfferedUnderItsTitleWithADescriptionThatThePlatformReads() throws Exception {
        try (Platform platform = Platform.start(PlatformHome.givenOrSkipped(), folder.resolve("platform"))) {
            List<String> offered = platform.ask("offered");
            assertTrue(offered.size() > 6, offered.toString());
            for (String id : offered) {
                String title = HostRun.NODES.find(id).orElseThrow().declaration().title();
                assertEquals(List.of(title, "knimeNode"), platform.ask("description", id));
            }
            assertEquals(List.of(), platform.problemsLogged());
        }
    }

    @Test
    void aFreshNodeWaitsForItsInputsOrSaysWhatItLacksInOneSentence() throws Exception {
        try (Platform platform = Platform.start(PlatformHome.givenOrSkipped(), folder.resolve("platform"))) {
            platform.ask("create", folder.resolve("fresh"));
            for (String id : platform.ask("offered")) {
                NodeDeclaration declaration = HostRun.NODES.find(id).orElseThrow().declaration();
                int number = platform.node(id);
                Platform.State state = platform.state(number);
                boolean ready = state.word().equals("configured");
                boolean waits = declaration.inputs().stream().anyMatch(port -> !port.optional());
                assertTrue(ready || waits && state.word().equals("idle") || state.message().endsWith("."), id + " " + state);
                assertTrue(state.message().lines().count() <= 1, id + " " + state);
                assertFalse(state.message().contains("Exception"), id + " " + state);
            }
            assertEquals(List.of(), platform.problemsLogged());
        }
    }

    /** Without a display, as everything here. */
    @Test
    void everyDialogOpensAndSavesWhatIsStored() throws Exception {
        try (Platform platform = Platform.start(PlatformHome.givenOrSkipped(), folder.resolve("platform"))) {
            platform.ask("create", folder.resolve("dialogs"));
            for (String id : platform.ask("offered")) {
                int number = platform.node(id);
                assertEquals(platform.ask("settings", number), platform.ask("dialog", number), id);
            }
            assertEquals(List.of(), platform.problemsLogged());
        }
    }

    @Test
    void everyNodeExecutesAndItsColumnsAreThoseItToldBefore() throws Exception {
        PlatformHome home = PlatformHome.givenOrSkipped();
        HostRun host = HostRun.of(everyNode(folder), folder.resolve("host"));
        try (Platform platform = Platform.start(home, folder.resolve("platform"))) {
            PlatformWorkflow built = PlatformWorkflow.build(platform, host.workflow(), folder.resolve("every-node"));
            Set<String> left = new HashSet<>(platform.ask("offered"));
            for (Step step : host.workflow().steps()) {
                executed(platform, built.numbers().get(step.id()), HostRun.NODES.find(step.node()).orElseThrow().declaration());
                left.remove(step.node());
            }
            assertEquals(Set.of(READER), left, "nodes that were not tried");
            Tables.assertSame(host.tables(), built.tables(platform, folder.resolve("tables")));
            int reader = platform.node(READER);
            platform.ask("set", reader, "file", "text", "model.zip");
            executed(platform, reader, HostRun.NODES.find(READER).orElseThrow().declaration());
            assertEquals(List.of(), platform.problemsLogged());
        }
    }

    /** Returns a copy of the workflow that has every node: it writes a file beside itself. */
    static Path everyNode(Path folder) throws IOException {
        return HostRun.copied("every-node", folder);
    }

    private static void executed(Platform platform, int number, NodeDeclaration declaration) {
        Map<Integer, List<String>> before = specs(platform, number, declaration);
        platform.ask("start", number);
        assertEquals(List.of("true"), platform.ask("await", 300));
        Platform.State state = platform.state(number);
        assertTrue(state.word().equals("executed") && !state.kind().equals("error"), declaration.id() + " " + state);
        Map<Integer, List<String>> after = specs(platform, number, declaration);
        before.forEach((port, told) -> {
            // the recording behind a model is known when the file has been read, not before
            boolean onlyKind = told.get(1).contains(NO_CHANNELS);
            assertEquals(onlyKind ? List.of(kind(told)) : told, onlyKind ? List.of(kind(after.get(port))) : after.get(port),
                    declaration.id() + ", output " + port);
        });
        List<String> untold = after.keySet().stream().filter(port -> !before.containsKey(port))
                .map(port -> declaration.outputs().get(port - 1).id()).toList();
        assertEquals(List.of(), untold, declaration.id() + ": outputs of which nothing was told before");
    }

    private static String kind(List<String> spec) {
        return spec.get(1).split(",")[0];
    }

    /** Returns classes and columns of all outputs of which something is known. */
    private static Map<Integer, List<String>> specs(Platform platform, int number, NodeDeclaration declaration) {
        return IntStream.rangeClosed(1, declaration.outputs().size()).boxed()
                .filter(port -> !platform.ask("spec", number, port).isEmpty())
                .collect(Collectors.toMap(port -> port, port -> platform.ask("spec", number, port), (a, b) -> a, LinkedHashMap::new));
    }
}
