package org.modestead.host.cli;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.table.Column;

/** The reference page of one node as text. */
final class NodePage {

    private final NodeDeclaration node;
    private final List<String> lines = new ArrayList<>();

    private NodePage(NodeDeclaration node) {
        this.node = node;
    }

    static List<String> lines(NodeDeclaration node) {
        NodePage page = new NodePage(node);
        page.head();
        page.ports("Inputs", node.inputs());
        page.ports("Outputs", node.outputs());
        page.settings();
        page.references();
        return page.lines;
    }

    private void head() {
        lines.add(node.title() + " (" + node.id() + ")");
        text("", node.purpose());
        for (String paragraph : node.description().strip().split("\\n\\s*\\n")) {
            lines.add("");
            text("", paragraph);
        }
    }

    private void ports(String title, List<Port> ports) {
        if (ports.isEmpty()) {
            return;
        }
        heading(title);
        for (Port port : ports) {
            text("  ", port.id() + ": " + port.type().title() + (port.optional() ? ", optional" : "")
                    + ". " + port.description());
            port.schema().ifPresent(schema -> text("      ", "Columns: "
                    + schema.columns().stream().map(Column::name).collect(Collectors.joining(", ")) + "."));
        }
    }

    private void settings() {
        if (node.settings().isEmpty()) {
            return;
        }
        heading("Settings");
        String group = "";
        for (Setting setting : node.settings()) {
            if (!setting.common().group().equals(group)) {
                group = setting.common().group();
                lines.add("  " + group);
            }
            text("    ", setting.key() + ": " + SettingSummary.of(setting));
            text("        ", setting.common().help());
            if (setting instanceof Setting.Choice choice) {
                choice.options().forEach(option -> text("          ", option.id() + ": " + option.help()));
            }
            condition(setting).ifPresent(shown -> text("        ", shown));
        }
    }

    private static Optional<String> condition(Setting setting) {
        return setting.common().visibleWhen().map(when -> "Counts only when " + when.key() + " is "
                + String.join(" or ", new TreeSet<>(when.values())) + ".");
    }

    private void references() {
        if (!node.references().isEmpty()) {
            heading("References");
            node.references().forEach(reference -> text("  ", reference));
        }
    }

    private void heading(String title) {
        lines.add("");
        lines.add(title);
    }

    private void text(String indent, String text) {
        lines.addAll(Paragraphs.hanging(indent, text));
    }
}
