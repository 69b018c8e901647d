package org.modestead.host.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.TestWorkflows;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.Setting;

/** The written reference holds all that the declarations tell. */
class ReferenceTest {

    @TempDir
    Path folder;

    private final ByteArrayOutputStream out = new ByteArrayOutputStream();
    private final ByteArrayOutputStream err = new ByteArrayOutputStream();
    private final List<NodeDeclaration> nodes = TestWorkflows.allNodes().nodes().stream().map(Node::declaration).toList();

    @Test
    void aPageForEveryNodeAndAnIndexThatLeadsToEach() throws IOException {
        assertEquals(0, run(folder.resolve("pages")), err());
        Set<String> expected = nodes.stream().map(node -> node.id() + ".md").collect(Collectors.toCollection(TreeSet::new));
        expected.add("README.md");
        try (Stream<Path> files = Files.list(folder.resolve("pages"))) {
            assertEquals(expected, files.map(file -> file.getFileName().toString()).collect(Collectors.toCollection(TreeSet::new)));
        }
        String index = Files.readString(folder.resolve("pages/README.md"));
        for (NodeDeclaration node : nodes) {
            assertTrue(index.contains("- [" + ReferencePage.plain(node.title()) + "](" + node.id() + ".md): "), node.id());
            assertEquals(ReferencePage.of(node), Files.readString(folder.resolve("pages/" + node.id() + ".md")));
        }
    }

    @Test
    void everyPortAndEveryColumnThatIsToldAppears() {
        for (NodeDeclaration node : nodes) {
            List<String> page = ReferencePage.of(node).lines().toList();
            for (Port port : Stream.concat(node.inputs().stream(), node.outputs().stream()).toList()) {
                assertHas(page, "| `" + port.id() + "` | " + port.type().title(), node);
                port.schema().ifPresent(schema -> {
                    int from = page.indexOf("Columns of `" + port.id() + "`:");
                    assertTrue(from > 0, node.id() + " " + port.id());
                    schema.columns().forEach(column -> assertHas(page.subList(from, page.size()),
                            "| `" + column.name() + "` | " + column.type().title(), node));
                });
            }
        }
    }

    @Test
    void everySettingAppearsWithItsLabelDefaultHelpAndOptions() {
        for (NodeDeclaration node : nodes) {
            List<String> page = ReferencePage.of(node).lines().toList();
            for (Setting setting : node.settings()) {
                assertHas(page, "**" + ReferencePage.plain(setting.common().label()) + "** `" + setting.key() + "`: "
                        + ReferencePage.plain(SettingSummary.of(setting)), node);
                assertHas(page, ReferencePage.plain(setting.common().help()), node);
                if (setting instanceof Setting.Choice choice) {
                    choice.options().forEach(option -> assertHas(page, "| `" + option.id() + "` | ", node));
                }
            }
        }
    }

    @Test
    void nothingInATextIsTakenForMarkup() {
        assertEquals("a \\| b \\_c\\_ \\<d\\> \\[e\\]", ReferencePage.plain(" a | b\n _c_ <d> [e] "));
    }

    @Test
    void aFileInThePlaceOfTheFolderIsRefusedInASentence() throws IOException {
        Path file = Files.writeString(folder.resolve("taken"), "a file");
        assertEquals(1, run(file));
        assertTrue(err().contains("the file cannot be written") && err().contains("choose a folder that can be written"), this::err);
        assertEquals("a file", Files.readString(file));
    }

    private static void assertHas(List<String> page, String start, NodeDeclaration node) {
        assertTrue(page.stream().anyMatch(line -> line.startsWith(start)), () -> node.id() + ": " + start);
    }

    private int run(Path where) {
        Terminal terminal = new Terminal(print(out), print(err), false);
        return new CommandLineHost(terminal, TestWorkflows::allNodes).run("reference", where.toString());
    }

    private String err() {
        return err.toString(StandardCharsets.UTF_8);
    }

    private static PrintStream print(ByteArrayOutputStream stream) {
        return new PrintStream(stream, true, StandardCharsets.UTF_8);
    }
}
