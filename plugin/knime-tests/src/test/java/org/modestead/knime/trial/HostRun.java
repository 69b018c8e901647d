package org.modestead.knime.trial;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.StringJoiner;
import org.modestead.host.run.CancelSwitch;
import org.modestead.host.run.RunListener;
import org.modestead.host.run.RunResult;
import org.modestead.host.run.StepOutcome;
import org.modestead.host.run.WorkflowRunner;
import org.modestead.host.workflow.SettingOverride;
import org.modestead.host.workflow.Workflow;
import org.modestead.host.workflow.WorkflowChecker;
import org.modestead.host.workflow.WorkflowFile;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;

/**
 * A workflow of test-workflows as the embedded host runs it.
 *
 * @param workflow as read
 * @param tables lines of every table, but of the sources' own, by {@code step.port}, written as {@link TableText} writes those of the platform
 */
record HostRun(Workflow workflow, Map<String, List<String>> tables) {

    /** The host's node that reads a file; in the platform its own reader does that. */
    static final String SOURCE = "table-source";

    /** Nodes that the host finds; those of the bridge are among them. */
    static final NodeCatalog NODES = NodeCatalog.load(List.of(HostRun.class.getClassLoader()));

    /** Returns a copy, below a folder, of the trial's own workflow of a name: its nodes write beside it, and its data are put there. */
    static Path copied(String name, Path folder) throws IOException {
        Path copy = Files.createDirectories(folder.resolve("written")).resolve("workflow.json");
        try (InputStream file = HostRun.class.getResourceAsStream("/" + name + "/workflow.json")) {
            Files.copy(file, copy);
        }
        return copy;
    }

    /** Runs a workflow, with some settings replaced, each written {@code step.key=value}. */
    static HostRun of(Path file, Path target, String... replaced) {
        List<SettingOverride> overrides = new ArrayList<>();
        for (String text : replaced) {
            overrides.add(SettingOverride.parse(text).orElseThrow());
        }
        WorkflowChecker.Outcome checked = new WorkflowChecker(NODES).check(WorkflowFile.read(file), overrides);
        RunResult result = checked.plan()
                .map(plan -> WorkflowRunner.once().run(plan, target, RunListener.NONE, new CancelSwitch()))
                .orElseThrow(() -> new AssertionError(checked.problems().toString()));
        Map<String, List<String>> tables = new LinkedHashMap<>();
        result.outcomes().forEach((step, outcome) -> {
            boolean source = result.plan().workflow().step(step).orElseThrow().node().equals(SOURCE);
            if (!(outcome instanceof StepOutcome.Done done)) {
                throw new AssertionError(step + " " + outcome);
            }
            done.result().outputs().forEach((port, value) -> {
                if (value instanceof Table table && !source) {
                    tables.put(step + "." + port, lines(table));
                }
            });
        });
        return new HostRun(result.plan().workflow(), tables);
    }

    /** Returns the lines of a table as {@link TableText} writes those of the platform. */
    static List<String> lines(Table table) {
        List<Column> columns = table.schema().columns();
        List<String> lines = new ArrayList<>();
        StringJoiner names = new StringJoiner("\t");
        columns.forEach(column -> names.add(Desk.escaped(column.name())));
        lines.add(names.toString());
        try (RowCursor cursor = table.open()) {
            while (cursor.next()) {
                StringJoiner cells = new StringJoiner("\t");
                for (int j = 0; j < columns.size(); j++) {
                    cells.add(cursor.cell(j).map(cell -> Desk.escaped(cell.toString())).orElse(""));
                }
                lines.add(cells.toString());
            }
        }
        return lines;
    }
}
