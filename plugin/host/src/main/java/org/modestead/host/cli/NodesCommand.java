package org.modestead.host.cli;

import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import java.util.function.Supplier;
import org.modestead.nodes.contract.NearestName;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

/** Lists the nodes, or explains one: the reference, made from the declarations that also check workflows. */
@Command(name = "nodes", mixinStandardHelpOptions = true, versionProvider = ReleaseVersion.class,
        description = {"Lists the nodes, or explains one with its ports and settings.", ""})
final class NodesCommand implements Callable<Integer> {

    private final Terminal terminal;
    private final Supplier<NodeCatalog> catalog;

    @Parameters(paramLabel = "NODE", arity = "0..1", description = "Id of the node to explain.")
    private String node;

    NodesCommand(Terminal terminal, Supplier<NodeCatalog> catalog) {
        this.terminal = terminal;
        this.catalog = catalog;
    }

    @Override
    public Integer call() {
        NodeCatalog nodes = catalog.get();
        if (node == null) {
            list(nodes);
            return ExitCode.DONE;
        }
        Optional<Node> found = nodes.find(node);
        if (found.isEmpty()) {
            terminal.err().println("There is no node \"" + node + "\"" + NearestName.hint(node, nodes.ids())
                    + "; use one of "
                    + String.join(", ", nodes.ids()) + ".");
            return ExitCode.WRONG;
        }
        NodePage.lines(found.get().declaration()).forEach(terminal.out()::println);
        return ExitCode.DONE;
    }

    private void list(NodeCatalog nodes) {
        int width = nodes.ids().stream().mapToInt(String::length).max().orElse(0);
        for (NodeDeclaration.Stage stage : NodeDeclaration.Stage.values()) {
            List<NodeDeclaration> here = nodes.nodes().stream().map(Node::declaration)
                    .filter(declaration -> declaration.stage() == stage).toList();
            if (!here.isEmpty()) {
                terminal.out().println(stage.title());
                here.forEach(declaration -> Paragraphs.hanging("  " + pad(declaration.id(), width) + "  ",
                        declaration.purpose())
                        .forEach(terminal.out()::println));
            }
        }
    }

    private static String pad(String text, int width) {
        return text + " ".repeat(width - text.length());
    }
}
