package org.modestead.knime.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The six in a chain between the platform's own table nodes: its CSV Reader and Column Filter before them; its CSV Writer, and its Table Writer and Table
 * Reader, after every table that they make.
 */
class BetweenTheirNodesTest {

    private static final String COLUMN_FILTER = "org.knime.base.node.preproc.filter.column.DataColumnSpecFilterNodeFactory";
    private static final String FILES = "org.knime.base.node.io.filehandling.";
    private static final String CSV_WRITER = FILES + "csv.writer.CSVWriter2NodeFactory";
    private static final String TABLE_WRITER = FILES + "table.writer.TableWriterNodeFactory";
    private static final String TABLE_READER = FILES + "table.reader.KnimeTableReaderNodeFactory";
    private static final Set<String> NEEDED = Set.of("run", "time", "level [m]", "flow [m3/h]");

    @TempDir
    Path folder;
    private PlatformHome home;
    private HostRun host;

    @BeforeEach
    void runTheHost() throws IOException {
        home = PlatformHome.givenOrSkipped();
        Path file = HostRun.copied("six", folder);
        Files.write(file.resolveSibling("recordings.csv"), recordings());
        host = HostRun.of(file, folder.resolve("host"));
    }

    /** Two tanks that drain into each other, and a column that the Column Filter takes away. */
    private static List<String> recordings() {
        List<String> lines = new ArrayList<>(List.of("run,time,level [m],note,flow [m3/h]"));
        for (int run = 0; run < 8; run++) {
            double level = 1 + 0.25 * run;
            double flow = 3 - 0.5 * run;
            for (int k = 0; k < 50; k++) {
                lines.add(String.format(Locale.ROOT, "r%d,%.1f,%.6f,\"a, b\",%.6f", run, 0.5 * k, level, flow));
                double next = 0.95 * level - 0.08 * flow;
                flow = 0.08 * level + 0.93 * flow;
                level = next;
            }
        }
        return lines;
    }

    /** A table of ours at one of its outputs. */
    private record Output(String name, int node, int port) {}

    private List<Output> outputs(PlatformWorkflow built) {
        List<Output> outputs = new ArrayList<>();
        built.workflow().steps().stream().filter(step -> !step.node().equals(HostRun.SOURCE)).forEach(step -> {
            var declared = HostRun.NODES.find(step.node()).orElseThrow().declaration().outputs();
            for (int i = 0; i < declared.size(); i++) {
                String name = step.id() + "." + declared.get(i).id();
                if (host.tables().containsKey(name)) {
                    outputs.add(new Output(name, built.numbers().get(step.id()), i + 1));
                }
            }
        });
        assertEquals(host.tables().size(), outputs.size());
        return outputs;
    }

    /** Returns the workflow with a Column Filter between its reader and our first node. */
    private PlatformWorkflow built(Platform platform, Path target) throws IOException {
        PlatformWorkflow built = PlatformWorkflow.build(platform, host.workflow(), target);
        int filter = platform.node(COLUMN_FILTER);
        platform.ask("link", built.numbers().get("source"), 1, filter, 1);
        platform.ask("link", filter, 1, built.numbers().get("snapshots"), 1);
        platform.ask("set", filter, "column-filter/filter-type", "text", "STANDARD", "column-filter/included_names", "texts",
                String.join("|", NEEDED.stream().sorted().toList()), "column-filter/excluded_names", "texts", "note", "column-filter/enforce_option", "text",
                "EnforceInclusion");
        Map<String, Integer> numbers = new LinkedHashMap<>(built.numbers());
        numbers.put("filter", filter);
        return new PlatformWorkflow(built.workflow(), numbers);
    }

    private static Map<String, Path> csvWriters(Platform platform, List<Output> outputs, Path target) throws IOException {
        Files.createDirectories(target);
        Map<String, Path> files = new LinkedHashMap<>();
        for (Output output : outputs) {
            int writer = platform.node(CSV_WRITER);
            files.put(output.name(), target.resolve(output.name() + ".csv"));
            platform.ask("set", writer, "settings/file_chooser_settings/path/path", "text", files.get(output.name()), "advanced_settings/quote_mode", "text",
                    "IF_NEEDED");
            platform.ask("link", output.node(), output.port(), writer, 1);
        }
        return files;
    }

    @Test
    void whatThePlatformsOwnWritersKeepOfOurTablesAreTheHostsFigures() throws Exception {
        try (Platform platform = Platform.start(home, folder.resolve("platform"))) {
            PlatformWorkflow built = built(platform, folder.resolve("six"));
            List<Output> outputs = outputs(built);
            Map<String, Path> written = csvWriters(platform, outputs, folder.resolve("csv"));
            Map<String, Path> kept = new LinkedHashMap<>();
            for (Output output : outputs) {
                int writer = platform.node(TABLE_WRITER);
                kept.put(output.name(), folder.resolve(output.name() + ".table"));
                platform.ask("set", writer, "file_selection/path/path", "text", kept.get(output.name()));
                platform.ask("link", output.node(), output.port(), writer, 1);
            }
            platform.ask("execute");
            assertEquals(List.of(), built.unfinished(platform));
            for (Output output : outputs) {
                assertSame(host.tables().get(output.name()), Csv.rows(written.get(output.name())), output.name());
                int reader = platform.node(TABLE_READER);
                platform.ask("set", reader, "settings/file_selection/path/path", "text", kept.get(output.name()));
                platform.ask("start", reader);
                platform.ask("await", 300);
                Path read = folder.resolve(output.name() + ".read");
                platform.ask("table", reader, 1, read);
                assertEquals(withoutOrigin(host.tables().get(output.name())), withoutOrigin(Files.readAllLines(read)), output.name());
                assertEquals(platform.ask("spec", output.node(), output.port()), platform.ask("spec", reader, 1), output.name());
            }
            assertEquals(List.of(), platform.problemsLogged());
            System.out.println("The six between the platform's own nodes: its CSV Writer and Table Writer kept " + outputs.size() + " tables with "
                    + Tables.lines(host.tables()) + " lines as the embedded host has them.");
        }
    }

    /** Our nodes say what is true: each needs its whole input and runs once. The platform's streaming executor then hands them whole tables. */
    @Test
    void everyNodeSaysThatItNeedsItsWholeInputAndRunsOnce() throws Exception {
        try (Platform platform = Platform.start(home, folder.resolve("platform"))) {
            platform.ask("create", folder.resolve("roles"));
            for (String id : platform.ask("offered")) {
                var declaration = HostRun.NODES.find(id).orElseThrow().declaration();
                List<String> expected = Stream.concat(declaration.inputs().stream().map(port -> "in whole once"),
                        declaration.outputs().stream().map(port -> "out once")).toList();
                assertEquals(expected, platform.ask("roles", platform.node(id)), id);
            }
        }
    }

    @Test
    void insideAStreamingComponentOfThePlatformTheFiguresAreTheSame() throws Exception {
        try (Platform platform = Platform.start(home, folder.resolve("platform"))) {
            PlatformWorkflow built = built(platform, folder.resolve("streamed"));
            Map<String, Path> written = csvWriters(platform, outputs(built), folder.resolve("csv"));
            List<Integer> inside = built.numbers().entrySet().stream().filter(step -> !step.getKey().equals("source")).map(Map.Entry::getValue).toList();
            Platform.Answer answer = platform.tried("streamed", inside);
            Assumptions.assumeTrue(answer.ok() || !answer.fields().toString().contains("no streaming executor"), "the streaming executor is not installed");
            assertTrue(answer.ok(), answer.fields().toString());
            int component = Integer.parseInt(answer.field(0));
            platform.ask("execute");
            assertEquals("executed", platform.state(component).word(), platform.state(component).toString());
            for (Map.Entry<String, Path> file : written.entrySet()) {
                assertSame(host.tables().get(file.getKey()), Csv.rows(file.getValue()), file.getKey());
            }
            assertEquals(List.of(), platform.problemsLogged());
            System.out.println("The six in a streaming component of the platform: " + written.size() + " tables with " + Tables.lines(host.tables())
                    + " lines as the embedded host has them.");
        }
    }

    /** A file of numbers written as text holds the same doubles when each cell reads back to the same one. */
    private static void assertSame(List<String> host, List<List<String>> written, String table) {
        List<String> expected = withoutOrigin(host);
        List<List<String>> found = written.stream().filter(row -> !row.get(0).equals("table")).toList();
        assertEquals(expected.size(), found.size(), table + ", lines");
        for (int i = 0; i < expected.size(); i++) {
            List<String> cells = Stream.of(expected.get(i).split("\t", -1)).map(Desk::unescaped).toList();
            assertEquals(cells.size(), found.get(i).size(), table + ", line " + (i + 1));
            for (int j = 0; j < cells.size(); j++) {
                assertEquals(number(cells.get(j)), number(found.get(i).get(j)), table + ", line " + (i + 1) + ", column " + (j + 1));
            }
        }
    }

    /** True and false are one and nought to the platform's CSV Writer. */
    private static Object number(String cell) {
        if (cell.equals("true") || cell.equals("false")) {
            return cell.equals("true") ? 1.0 : 0.0;
        }
        try {
            return Double.valueOf(cell);
        } catch (NumberFormatException text) {
            return cell;
        }
    }

    /** The one cell that may differ names where a table came from: a table of the platform does not tell. */
    private static List<String> withoutOrigin(List<String> lines) {
        return lines.stream().filter(line -> !line.startsWith("table\t")).toList();
    }
}
