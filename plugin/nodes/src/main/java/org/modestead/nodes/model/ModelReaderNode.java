package org.modestead.nodes.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.modestead.engine.modelfile.Model;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.modelfile.PortFiles;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/** Takes up a model that was written by another session. */
public final class ModelReaderNode implements Node {

    private static final TableSchema FACTS = TableSchema.of(Column.text("item"), Column.text("value"));

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("model-reader", "Model Reader", NodeDeclaration.Stage.DATA,
                "Reads a model that the Model Writer wrote.",
                """
                Everything comes back as it was, to the last digit: connect a Model Applier to forecast, judge or reconstruct new recordings \
                without fitting again.

                A file that is broken, changed or of a later version is refused with a sentence; nothing in a file is ever run. A kernel \
                is made again from its name and parameters, so one that an extension brought needs that extension here, too.

                Memory is needed for the recordings in the file, 8 bytes a number.""",
                List.of("Harris et al., Array programming with NumPy, Nature 585:357, 2020"),
                List.of("load", "open", "import", "restore", "numpy", "npy", "file"),
                List.of(),
                List.of(Port.of("model", PortType.MODEL, "Model", "Operator, spectrum and verdict."),
                        Port.table("facts", "Facts", "What the model is, line by line.", FACTS)),
                List.of(new Setting.File(new Common(ModelPath.SETTING, "File", "File", "The file to read; a name is looked up in the folder of"
                        + " the workflow."), true, List.of(ModelPath.EXTENSION), true)), 1);
    }

    @Override
    public Map<String, TableSchema> schemas(Map<String, TableSchema> inputs, Settings settings, RunContext context) {
        ModelPath.of(settings, context).requireReadable();
        return Map.of();
    }

    @Override
    public Expected expect(Expected inputs, Settings settings, RunContext context) {
        return new Expected(Map.of(), Map.of("model", ModelPath.of(settings, context).outlook()));
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        ModelPath file = ModelPath.of(settings, context);
        Model model = file.read(context.progress());
        context.progress().report(1, "read");
        MemoryTable.Builder facts = MemoryTable.builder(FACTS, file.shown());
        PortFiles.describe(PortType.MODEL, model).forEach(fact -> facts.row(fact.item(), fact.value()));
        List<String> summary = new ArrayList<>(List.of(ModelWords.what(model), ModelWords.verdict(model)));
        if (!model.notes().isBlank()) {
            summary.add(model.notes());
        }
        return new NodeResult(Map.of("model", model, "facts", facts.build()), List.of(), summary, model.doubts());
    }
}
