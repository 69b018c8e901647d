package org.modestead.host.cli;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

/** The reference page of one node in Markdown, made from its declaration alone. */
final class ReferencePage {

    private final NodeDeclaration node;
    private final List<String> lines = new ArrayList<>();

    private ReferencePage(NodeDeclaration node) {
        this.node = node;
    }

    /** Returns the page's text; lines end with a line feed on every system. */
    static String of(NodeDeclaration node) {
        ReferencePage page = new ReferencePage(node);
        page.head();
        page.ports("Inputs", node.inputs());
        page.ports("Outputs", node.outputs());
        page.settings();
        page.references();
        return String.join("\n", page.lines) + "\n";
    }

    private void head() {
        lines.add("# " + plain(node.title()));
        paragraph("`" + node.id() + "`, " + node.stage().title() + ". " + plain(node.purpose()));
        for (String text : node.description().strip().split("\\n\\s*\\n")) {
            paragraph(plain(text));
        }
    }

    private void ports(String title, List<Port> ports) {
        if (ports.isEmpty()) {
            return;
        }
        paragraph("## " + title);
        table("Port", "Kind", "What it is");
        for (Port port : ports) {
            row("`" + port.id() + "`", port.type().title() + (port.optional() ? ", optional" : ""),
                    plain(port.title()) + ": " + plain(port.description()));
        }
        for (Port port : ports) {
            port.schema().ifPresent(schema -> columns(port, schema));
        }
    }

    private void columns(Port port, TableSchema schema) {
        paragraph("Columns of `" + port.id() + "`:");
        table("Column", "Type");
        for (Column column : schema.columns()) {
            String entries = column.entries().isEmpty() ? "" : " of " + plain(String.join(", ", column.entries()));
            row("`" + column.name() + "`", column.type().title() + entries);
        }
    }

    private void settings() {
        if (node.settings().isEmpty()) {
            return;
        }
        paragraph("## Settings");
        String group = "";
        for (Setting setting : node.settings()) {
            if (!setting.common().group().equals(group)) {
                group = setting.common().group();
                paragraph("### " + plain(group));
            }
            paragraph("**" + plain(setting.common().label()) + "** `" + setting.key() + "`: "
                    + plain(SettingSummary.of(setting)));
            paragraph(plain(setting.common().help()));
            setting.common().visibleWhen().ifPresent(when -> paragraph("Counts only when `" + when.key() + "` is "
                    + String.join(" or ", new TreeSet<>(when.values())) + "."));
            if (setting instanceof Setting.Choice choice) {
                options(choice);
            }
        }
    }

    private void options(Setting.Choice choice) {
        table("Option", "Name", "What it does");
        choice.options().forEach(option -> row("`" + option.id() + "`", plain(option.label()), plain(option.help())));
    }

    private void references() {
        if (node.references().isEmpty()) {
            return;
        }
        paragraph("## References");
        lines.add("");
        node.references().forEach(reference -> lines.add("- " + plain(reference)));
    }

    private void table(String... titles) {
        lines.add("");
        row(titles);
        lines.add("|" + "---|".repeat(titles.length));
    }

    private void row(String... cells) {
        lines.add("| " + String.join(" | ", cells) + " |");
    }

    private void paragraph(String text) {
        lines.add("");
        lines.add(text);
    }

    /** Returns a text on one line in which nothing is taken for markup. */
    static String plain(String text) {
        return text.strip().replaceAll("\\s+", " ").replaceAll("([\\\\`*_\\[\\]<>|#])", "\\\\$1");
    }
}
