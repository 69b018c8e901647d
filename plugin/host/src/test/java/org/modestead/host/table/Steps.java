package org.modestead.host.table;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.modestead.engine.Progress;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/** Runs single table nodes in tests. */
final class Steps {

    private Steps() {}

    static Table source(Path folder, String path, Object... settings) {
        List<Object> all = new ArrayList<>(List.of("path", path));
        all.addAll(List.of(settings));
        return (Table) run(new TableSource(), folder, Map.of(), all.toArray()).outputs().get("table");
    }

    static Table query(Path folder, String sql, Map<String, Object> inputs) {
        return (Table) run(new TableQuery(), folder, inputs, "sql", sql).outputs().get("table");
    }

    static NodeResult run(Node node, Path folder, Map<String, Object> inputs, Object... settings) {
        return node.run(new NodeInputs(inputs), settings(node, settings), new RunContext(Progress.NONE, folder, folder));
    }

    static Settings settings(Node node, Object... pairs) {
        Map<String, Object> stored = new java.util.LinkedHashMap<>();
        for (int i = 0; i < pairs.length; i += 2) {
            stored.put((String) pairs[i], pairs[i + 1]);
        }
        SettingsReader.Reading reading = SettingsReader.read(node, stored);
        return reading.settings().orElseThrow(() -> new IllegalArgumentException(reading.problems().toString()));
    }

    /** Returns all rows, cells as text joined by bars, missing cells empty. */
    static List<String> rows(Table table) {
        List<String> rows = new ArrayList<>();
        try (RowCursor cursor = table.open()) {
            while (cursor.next()) {
                List<String> cells = new ArrayList<>();
                for (int j = 0; j < table.schema().columns().size(); j++) {
                    cells.add(cursor.text(j));
                }
                rows.add(String.join("|", cells));
            }
        }
        return rows;
    }
}
