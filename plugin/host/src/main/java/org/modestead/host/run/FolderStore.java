package org.modestead.host.run;

import java.io.IOException;
import java.nio.file.Path;
import org.modestead.engine.Progress;
import org.modestead.host.output.CsvWriter;
import org.modestead.host.output.OutputFolder;
import org.modestead.host.table.DuckDbTable;
import org.modestead.host.table.NpyTable;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.table.Table;

/** Writes every table of a step as {@code STEP/PORT.csv}. */
final class FolderStore implements StepStore {

    private final OutputFolder folder;
    private final Wanted wanted;

    FolderStore(OutputFolder folder, Wanted wanted) {
        this.folder = folder;
        this.wanted = wanted;
    }

    @Override
    public Path folder(PlannedStep step) throws IOException {
        return folder.step(step.id());
    }

    @Override
    public void keep(PlannedStep step, NodeResult result, Progress progress) throws IOException {
        for (Port port : step.declaration().outputs()) {
            if (result.outputs().get(port.id()) instanceof Table table && belongs(table) && wanted.table(step.id(), port.id())) {
                progress.report(0, "writing " + port.id() + ".csv");
                folder.write(step.id() + "/" + port.id() + ".csv", out -> CsvWriter.write(table, out, progress));
            }
        }
        progress.report(1, "done");
    }

    private static boolean belongs(Table table) {
        return table instanceof DuckDbTable stored ? stored.isCopied() : !(table instanceof NpyTable array) || array.isCopied();
    }
}
