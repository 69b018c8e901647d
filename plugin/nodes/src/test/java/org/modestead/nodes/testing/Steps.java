package org.modestead.nodes.testing;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.modestead.engine.Progress;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** Runs nodes one after the other as a host does: found by id, settings read and checked. */
public final class Steps {

    private static final NodeCatalog CATALOG = NodeCatalog.load(List.of(Node.class.getClassLoader()));

    private Steps() {}

    /** Runs a node. */
    public static NodeResult run(String id, Map<String, Object> inputs, Map<String, Object> raw) {
        Node node = node(id);
        Settings settings = settings(id, raw);
        if (!node.check(Map.of(), settings).isEmpty()) {
            throw new AssertionError(node.check(Map.of(), settings).toString());
        }
        return node.run(new NodeInputs(inputs), settings, new RunContext(Progress.NONE, Path.of("."), Path.of(".")));
    }

    /** Returns what a node says against settings that fit its declaration. */
    public static List<SettingProblem> check(String id, Map<String, Object> raw) {
        return node(id).check(Map.of(), settings(id, raw));
    }

    /** Returns a node's table as texts, one list a row. */
    public static List<List<String>> texts(NodeResult result, String port) {
        return texts((Table) result.outputs().get(port));
    }

    /** Returns a table as texts, one list a row. */
    public static List<List<String>> texts(Table table) {
        List<List<String>> rows = new ArrayList<>();
        try (RowCursor cursor = table.open()) {
            while (cursor.next()) {
                List<String> row = new ArrayList<>();
                for (int j = 0; j < table.schema().columns().size(); j++) {
                    row.add(cursor.text(j));
                }
                rows.add(row);
            }
        }
        return rows;
    }

    /** Returns a column of a node's table as texts. */
    public static List<String> column(NodeResult result, String port, String name) {
        int at = ((Table) result.outputs().get(port)).schema().indexOf(name).orElseThrow();
        return texts(result, port).stream().map(row -> row.get(at)).toList();
    }

    /** Returns a number of a node's table. */
    public static double number(NodeResult result, String port, String column, int row) {
        return Double.parseDouble(column(result, port, column).get(row));
    }

    private static Node node(String id) {
        return CATALOG.find(id).orElseThrow(() -> new AssertionError("no node " + id));
    }

    private static Settings settings(String id, Map<String, Object> raw) {
        SettingsReader.Reading reading = SettingsReader.read(node(id), raw);
        return reading.settings().orElseThrow(() -> new AssertionError(reading.problems().toString()));
    }
}
