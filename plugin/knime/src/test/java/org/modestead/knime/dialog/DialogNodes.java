package org.modestead.knime.dialog;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

/** Every node that is offered, and a table that each of them can be connected to. */
final class DialogNodes {
    static final TableSchema TABLE = TableSchema.of(Column.text("run"), Column.number("time"), Column.number("p_1 [bar]"),
            Column.number("p_2 [bar]"), Column.number("flow [m3/h]"), Column.whole("valve"), Column.flag("alarm"),
            new Column("started", CellType.DATE_TIME), Column.text("<html>note"));

    private DialogNodes() {}

    static List<Node> all() {
        return NodeCatalog.load(List.of(Node.class.getClassLoader())).nodes();
    }

    static Node node(String id) {
        return NodeCatalog.load(List.of(Node.class.getClassLoader())).find(id).orElseThrow();
    }

    static Map<String, TableSchema> inputs(Node node) {
        Map<String, TableSchema> inputs = new HashMap<>();
        node.declaration().inputs().stream().filter(port -> port.type() == PortType.TABLE).forEach(port -> inputs.put(port.id(), TABLE));
        return inputs;
    }

    /** Returns a new form with stored settings. */
    static SettingsForm opened(Node node, Map<String, Object> stored) {
        SettingsForm form = new SettingsForm(node);
        form.component();
        return reopened(form, node, stored);
    }

    /** Opens a form again, as the platform does: nothing of before may be left. */
    static SettingsForm reopened(SettingsForm form, Node node, Map<String, Object> stored) {
        form.load(stored, inputs(node));
        return form;
    }

    /** A node and one of its settings. */
    record Place(Node node, Setting setting) {
        @Override
        public String toString() {
            return node.declaration().id() + "." + setting.key();
        }
    }

    static Stream<Place> places() {
        return all().stream().flatMap(node -> node.declaration().settings().stream().map(setting -> new Place(node, setting)));
    }
}
