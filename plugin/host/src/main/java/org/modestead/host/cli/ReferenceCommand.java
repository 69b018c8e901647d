package org.modestead.host.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.function.Supplier;
import org.modestead.host.output.OutputFault;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

/** Writes the reference: a page a node and an index, made from the declarations that also check workflows. */
@Command(name = "reference", mixinStandardHelpOptions = true, versionProvider = ReleaseVersion.class,
        description = {"Writes the reference pages of all nodes, and an index, in Markdown.", ""})
final class ReferenceCommand implements Callable<Integer> {

    private static final String INDEX = "README.md";

    private final Terminal terminal;
    private final Supplier<NodeCatalog> catalog;

    @Parameters(paramLabel = "FOLDER", description = "Where to write; pages of the same names are replaced, nothing else is touched.")
    private Path folder;

    ReferenceCommand(Terminal terminal, Supplier<NodeCatalog> catalog) {
        this.terminal = terminal;
        this.catalog = catalog;
    }

    @Override
    public Integer call() {
        List<NodeDeclaration> nodes = catalog.get().nodes().stream().map(Node::declaration).toList();
        try {
            Files.createDirectories(folder);
            for (NodeDeclaration node : nodes) {
                Files.writeString(folder.resolve(node.id() + ".md"), ReferencePage.of(node));
            }
            Files.writeString(folder.resolve(INDEX), index(nodes));
        } catch (IOException refused) {
            throw OutputFault.of(folder.toString(), refused);
        }
        terminal.out().println(nodes.size() + " pages: " + folder.resolve(INDEX));
        return ExitCode.DONE;
    }

    private static String index(List<NodeDeclaration> nodes) {
        List<String> lines = new ArrayList<>(List.of("# Nodes"));
        for (NodeDeclaration.Stage stage : NodeDeclaration.Stage.values()) {
            List<NodeDeclaration> here = nodes.stream().filter(node -> node.stage() == stage).toList();
            if (!here.isEmpty()) {
                lines.addAll(List.of("", "## " + stage.title(), ""));
                here.forEach(node -> lines.add("- [" + ReferencePage.plain(node.title()) + "](" + node.id() + ".md): "
                        + ReferencePage.plain(node.purpose())));
            }
        }
        return String.join("\n", lines) + "\n";
    }
}
