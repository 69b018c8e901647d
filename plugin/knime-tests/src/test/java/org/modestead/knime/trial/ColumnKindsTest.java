package org.modestead.knime.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.engine.Progress;
import org.modestead.host.table.TableSink;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingsReader;

/** Every kind of column of the platform, into our nodes and out again, in the real engine. */
class ColumnKindsTest {

    private static final String COLLECT = "org.knime.base.collection.list.create2.CollectionCreate2NodeFactory";
    private static final String SPLIT = "org.knime.base.collection.list.split.CollectionSplitNodeFactory";

    @TempDir
    Path folder;

    /** The echo reads every cell as our nodes read it and the bridge writes each anew; the trial's source and reading go around the bridge. */
    @Test
    void everyKindOfColumnComesOutAsItWentInWithItsMissingCells() throws Exception {
        PlatformHome home = PlatformHome.givenOrSkipped();
        List<String> expected = HostRun.lines(EveryKind.table());
        Path saved = folder.resolve("kinds");
        int source;
        int echo;
        try (Platform platform = Platform.start(home, folder.resolve("first"))) {
            platform.ask("create", saved);
            source = platform.node(EveryKindFactory.class.getName());
            echo = platform.node(EchoNode.ID);
            platform.ask("link", source, 1, echo, 1);
            List<String> told = platform.ask("spec", echo, 1);
            platform.ask("execute");
            assertEquals("executed", platform.state(echo).word(), platform.state(echo).toString());
            assertEquals(told, platform.ask("spec", echo, 1));
            assertEquals(columns(platform, source).stream().map(column -> column.replaceAll("^int: .*", "int: Number (Long Integer)")).toList(),
                    columns(platform, echo), "whole numbers of both widths come out as the wider one");
            assertEquals(expected, table(platform, source, folder.resolve("given")));
            assertEquals(expected, table(platform, echo, folder.resolve("echoed")));
            platform.ask("save", saved);
            assertEquals(List.of(), platform.problemsLogged());
            System.out.println("Every kind of column, in and out of our nodes in the platform's engine: " + told.get(1));
        }
        try (Platform platform = Platform.start(home, folder.resolve("second"))) {
            assertEquals(List.of(""), platform.ask("load", saved), "complaints about the saved workflow");
            assertEquals(expected, table(platform, echo, folder.resolve("loaded")));
            platform.ask("reset-all");
            platform.ask("execute");
            assertEquals(expected, table(platform, echo, folder.resolve("again")));
            assertEquals(List.of(), platform.problemsLogged());
        }
    }

    @Test
    void timesOfEveryKindAndChannelsInListsGiveTheHostsFigures() throws Exception {
        PlatformHome home = PlatformHome.givenOrSkipped();
        HostRun host = HostRun.of(workflow(), folder.resolve("host"));
        try (Platform platform = Platform.start(home, folder.resolve("platform"))) {
            PlatformWorkflow built = PlatformWorkflow.build(platform, host.workflow(), folder.resolve("times"));
            List<String> given = columns(platform, built.numbers().get("source"));
            Map.of("day", "day", "moment", "moment", "zoned", "moment", "lists", "day").forEach((step, kind) -> {
                String type = given.stream().filter(column -> column.startsWith(kind + ": ")).findFirst().orElseThrow().substring(kind.length());
                assertEquals("time" + type, columns(platform, built.numbers().get(step)).get(1), step);
            });
            platform.ask("execute");
            assertEquals(List.of(), built.unfinished(platform));
            Map<String, List<String>> tables = built.tables(platform, folder.resolve("tables"));
            Tables.assertSame(host.tables(), tables);
            assertTrue(tables.get("day.forecast").get(1).contains("2026-02-"), tables.get("day.forecast").get(1));
            assertTrue(tables.get("zoned.forecast").get(1).contains("2026-10-25T"), tables.get("zoned.forecast").get(1));
            assertTrue(tables.get("lists.forecast").stream().anyMatch(line -> line.contains("numbers 2")), "channels of lists are named");
            assertEquals(List.of(), platform.problemsLogged());
            System.out.println("Times of every kind and channels in lists: " + tables.size() + " tables with " + Tables.lines(tables)
                    + " lines are the embedded host's, digit by digit, in the platform's engine.");
        }
    }

    /** The platform's own nodes gather columns into lists and take them apart again. */
    @Test
    void listsOfThePlatformsOwnNodesAreChannelsUnderTheNamesOfTheirColumns() throws Exception {
        try (Platform platform = Platform.start(PlatformHome.givenOrSkipped(), folder.resolve("platform"))) {
            platform.ask("create", folder.resolve("lists"));
            int station = platform.node("signal-generator");
            int collect = platform.node(COLLECT);
            int single = platform.node("snapshot-builder");
            int listed = platform.node("snapshot-builder");
            int echo = platform.node(EchoNode.ID);
            int apart = platform.node(SPLIT);
            List<Object> times = List.of("time-column", "text", "time", "time-unit", "text", "s", "run-column", "text", "run");
            platform.ask("link", station, 1, collect, 1);
            platform.ask("set", collect, "includes/included_names", "texts", "flow [m3/h]|sump_level [m]", "includes/excluded_names", "texts", "",
                    "includes/enforce_option", "text", "EnforceInclusion", "removeCols", "flag", "true", "newColName", "text", "both", "createSet", "flag", "false");
            platform.ask("link", station, 1, single, 1);
            platform.ask("set", single, times, "channels", "texts", "flow [m3/h]|sump_level [m]");
            platform.ask("link", collect, 1, listed, 1);
            platform.ask("set", listed, times, "channels", "texts", "both");
            platform.ask("link", collect, 1, echo, 1);
            platform.ask("link", echo, 1, apart, 1);
            platform.ask("set", apart, "collectionCol", "text", "both");
            assertEquals(platform.ask("spec", single, 1), platform.ask("spec", listed, 1), "channels are told before anything runs");
            platform.ask("execute");
            for (int node : List.of(single, listed, echo, apart)) {
                assertEquals("executed", platform.state(node).word(), platform.state(node).toString());
            }
            assertEquals(platform.ask("object", single, 1), platform.ask("object", listed, 1));
            assertEquals(table(platform, collect, folder.resolve("gathered")), table(platform, echo, folder.resolve("echoed")));
            assertTrue(platform.ask("spec", apart, 1).get(1).contains("flow [m3/h]"), platform.ask("spec", apart, 1).get(1));
            assertEquals(List.of(), platform.problemsLogged());
        }
    }

    private Path workflow() throws Exception {
        Path copy = HostRun.copied("every-kind", folder);
        TableSink sink = new TableSink();
        sink.run(new NodeInputs(Map.of("table", EveryKind.table())), SettingsReader.read(sink, Map.of("path", "every-kind.parquet")).settings().orElseThrow(),
                new RunContext(Progress.NONE, copy.getParent(), copy.getParent()));
        return copy;
    }

    private static List<String> columns(Platform platform, int node) {
        return List.of(platform.ask("spec", node, 1).get(1).split(", "));
    }

    private static List<String> table(Platform platform, int node, Path file) throws Exception {
        platform.ask("table", node, 1, file);
        return Files.readAllLines(file);
    }
}
