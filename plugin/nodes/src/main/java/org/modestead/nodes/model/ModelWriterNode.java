package org.modestead.nodes.model;

import java.util.List;
import java.util.Map;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;
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
import org.modestead.nodes.table.TableSchema;

/** Puts operator, spectrum and verdict together and writes them to a file in an open format. */
public final class ModelWriterNode implements Node {

    private static final String NAME = "name";
    private static final String NOTES = "notes";

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("model-writer", "Model Writer", NodeDeclaration.Stage.REPORT,
                "Writes a fitted model to a file, for another session or another program.",
                """
                The file is a zip of one JSON text and NumPy arrays, stored plainly: operator, functions, eigenvalues, shapes, verdict with \
                all findings, and the prepared recordings of the fit, each with a checksum. What is computed from the file is the same to \
                the last digit. The developer's guide describes every entry; Python reads it with zipfile, json and numpy.

                A model is not handed on without a verdict: who takes it up must know whether its modes exist.

                The recordings are part of the file, because the checks, the intervals and the forecast bands rest on them: do not \
                give it to people who may not see the recordings.

                The file appears under its name only when it is complete; one that was there before stays until then.""",
                List.of("Harris et al., Array programming with NumPy, Nature 585:357, 2020"),
                List.of("save", "store", "export", "persist", "serialise", "numpy", "npy", "python", "file"),
                List.of(Port.of("operator", PortType.OPERATOR, "Operator", "The fitted operator."),
                        Port.of("spectrum", PortType.SPECTRUM, "Spectrum", "Its modes."),
                        Port.of("verdict", PortType.VERDICT, "Verdict", "Whether they exist.")),
                List.of(Port.of("model", PortType.MODEL, "Model", "The three together.")),
                List.of(new Setting.File(new Common(ModelPath.SETTING, "File", "File", "The file to write; a name is taken in the folder of"
                        + " the workflow. Missing folders are made."), false, List.of(ModelPath.EXTENSION), true),
                        new Setting.Text(new Common(NAME, "Name", "For people", "What the model is of, for whoever takes it up."), "", false, false),
                        new Setting.Text(new Common(NOTES, "Notes", "For people", "What else they must know: how it was recorded, what it is for."),
                                "", true, false)), 1);
    }

    @Override
    public Map<String, TableSchema> schemas(Map<String, TableSchema> inputs, Settings settings, RunContext context) {
        ModelPath.of(settings, context).requireWritable();
        return Map.of();
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Model model = new Model(settings.text(NAME), settings.text(NOTES), inputs.get("operator", FittedOperator.class),
                inputs.get("spectrum", Spectrum.class), inputs.get("verdict", Verdict.class));
        ModelPath file = ModelPath.of(settings, context);
        context.progress().report(0, "writing " + file.shown());
        file.write(model, context.progress());
        context.progress().report(1, "written");
        return new NodeResult(Map.of("model", model), List.of(), List.of("Written to " + file.shown() + ".", ModelWords.verdict(model)), List.of());
    }
}
