package org.modestead.host.fault;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.host.TestWorkflows;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/**
 * The nodes from a file to its forecast, one after the other: what each of them said, or hands on.
 *
 * @param folder of the file
 * @param file name of the file
 * @param settings of each node that has some, by its id
 */
record RecordingLine(Path folder, String file, Map<String, Map<String, Object>> settings) {

    private static final NodeCatalog NODES = TestWorkflows.allNodes();

    /**
     * What came of a recording.
     *
     * @param node the last one that ran
     * @param sentence with which it refused the recording, empty where all were run
     * @param tables by node and port
     */
    record Outcome(String node, String sentence, Map<String, Table> tables) {

        boolean taken() {
            return sentence.isEmpty();
        }

        String words() {
            return taken() ? "taken" : node + ": " + sentence;
        }
    }

    /** Runs the nodes until one refuses. */
    Outcome run(List<String> nodes) {
        Map<String, Object> values = new LinkedHashMap<>();
        Map<String, Table> tables = new LinkedHashMap<>();
        for (String id : nodes) {
            try {
                step(id, values, tables);
            } catch (Fault fault) {
                return new Outcome(id, fault.getMessage(), tables);
            }
        }
        return new Outcome(nodes.get(nodes.size() - 1), "", tables);
    }

    private void step(String id, Map<String, Object> values, Map<String, Table> tables) {
        Node node = NODES.find(id).orElseThrow();
        Map<String, Object> own = new LinkedHashMap<>(settings.getOrDefault(id, Map.of()));
        if (id.equals("table-source")) {
            own.put("path", file);
        }
        Settings read = SettingsReader.read(node, own).settings().orElseThrow();
        Map<String, Object> inputs = new LinkedHashMap<>();
        node.declaration().inputs().stream().filter(port -> values.containsKey(port.id())).forEach(port -> inputs.put(port.id(), values.get(port.id())));
        node.run(new NodeInputs(inputs), read, new RunContext(Progress.NONE, folder, folder)).outputs().forEach((port, value) -> {
            values.put(port, value);
            if (value instanceof Table table) {
                tables.put(id + "." + port, table);
            }
        });
    }

    /** Returns cells of numbers that are not finite, and missing ones of columns that must be whole. */
    static List<String> unusable(Map<String, Table> tables, List<String> whole) {
        List<String> found = new ArrayList<>();
        tables.forEach((name, table) -> {
            if (name.startsWith("table-source")) {
                return; // as it was given
            }
            try (RowCursor rows = table.open()) {
                while (rows.next()) {
                    unusable(name, table, rows, whole, found);
                }
            }
        });
        return found;
    }

    private static void unusable(String name, Table table, RowCursor row, List<String> whole, List<String> found) {
        for (int j = 0; j < table.schema().columns().size(); j++) {
            Column column = table.schema().columns().get(j);
            String place = name + "." + column.name();
            boolean infinite = column.type() == CellType.DOUBLE && Double.isInfinite(row.number(j));
            if (infinite || row.isMissing(j) && whole.contains(place)) {
                found.add(place + ", row " + row.row() + ": \"" + row.text(j) + "\"");
            }
        }
    }
}
