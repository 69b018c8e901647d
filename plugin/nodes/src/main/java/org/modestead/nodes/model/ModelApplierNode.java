package org.modestead.nodes.model;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.engine.Doubt;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.recording.PreparedAlike;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.Snapshots.Part;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.figure.RecordingFigure;
import org.modestead.nodes.table.Table;

/** Hands out what a model holds, with new recordings prepared as its own were. */
public final class ModelApplierNode implements Node {

    private static final int MOST_CHANNELS_DRAWN = 6;
    private static final String COORDINATES = "coordinates";

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("model-applier", "Model Applier", NodeDeclaration.Stage.PREPARE,
                "Hands out what a model holds, with new recordings prepared as its own were.",
                """
                Nothing is fitted. The new recordings are brought to the channels, trend, scales and delays of the model and become the \
                holdout, since no fit saw them; training and calibration stay those of the model. So connect the outputs as after a fit: \
                the forecast starts from the new recordings with the bands that were calibrated then, its scores tell how good it is on \
                them, and the Well-posedness Checker tells whether the modes still hold there.

                The new recordings must bring every channel and input of the model by name, in the same unit and counted in the same unit \
                of time, sampled at the same step: the Snapshot Builder resamples. How it detrends, scales, delays and splits is undone \
                here; leave it without, so that no number is rounded twice. A run named as one of the model is called name (new).

                Without new recordings the model's own come out, holdout included.

                Switch the modal coordinates on to have the recordings projected on the modes: the value of each eigenfunction at each \
                state. Along a motion that obeys its mode it turns, grows or fades at the mode's rate; where it does not, the mode does not \
                hold there. Magnitude and phase of a mode over time follow from its two columns, and with the joint weights of the model \
                file the prepared values. Modes of a cluster have no coordinate of their own and are left out.

                Samples outside the range of the training, by more than a tenth of it, are told as a doubt: there the model extrapolates. \
                Where decisions on pressure, structures or grids hang on it, keep the usual safety margins.""",
                List.of(), List.of("apply", "predict", "predictor", "score", "new data", "transfer", "reuse"),
                List.of(Port.of("model", PortType.MODEL, "Model", "From the Model Reader or the Model Writer."),
                        Port.optional("snapshots", PortType.SNAPSHOTS, "New recordings", "What the model was not fitted to; without it the"
                                + " model's own come out.")),
                List.of(Port.of("snapshots", PortType.SNAPSHOTS, "Snapshots", "Training of the model, new recordings as holdout."),
                        Port.of("operator", PortType.OPERATOR, "Operator", "As it was fitted."),
                        Port.of("spectrum", PortType.SPECTRUM, "Spectrum", "Its modes."),
                        Port.of("verdict", PortType.VERDICT, "Verdict", "As it was given on the recordings of the model."),
                        Port.of("coordinates", PortType.TABLE, "Coordinates", "Real and imaginary part of every mode's eigenfunction by run, time"
                                + " and mode, of the new recordings or else of the model's own; empty unless switched on.")),
                List.of(new Setting.Flag(new Setting.Common(COORDINATES, "Modal coordinates", "Projection", "Whether the recordings are projected on"
                        + " the modes: one row a run, time and mode, some 40 bytes each."), false)), 1);
    }

    @Override
    public Expected expect(Expected inputs, Settings settings, RunContext context) {
        Outlook model = inputs.values().getOrDefault("model", Outlook.NONE);
        Outlook fresh = inputs.values().getOrDefault("snapshots", Outlook.NONE);
        if (model.complete() && !fresh.channels().isEmpty()) {
            PreparedAlike.check(model.channels(), fresh.channels(), model.inputs(), fresh.inputs());
        }
        if (model.complete() && fresh.time().isPresent()) {
            PreparedAlike.check(model.time().orElseThrow(), fresh.time().orElseThrow());
        }
        Expected values = Node.super.expect(inputs, settings, context);
        return new Expected(model.time().map(axis -> Map.of(COORDINATES, CoordinateTable.columns(axis))).orElse(Map.of()), values.values());
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Model model = inputs.get("model", Model.class);
        Optional<Snapshots> fresh = inputs.find("snapshots", Snapshots.class);
        Snapshots snapshots = fresh.map(model::on).orElse(model.operator().snapshots());
        List<String> summary = new ArrayList<>(List.of(ModelWords.what(model), ModelWords.verdict(model)));
        fresh.ifPresent(recordings -> summary.add(sentence(snapshots)));
        List<Doubt> doubts = new ArrayList<>(model.doubts());
        snapshots.doubts().stream().filter(doubt -> !doubts.contains(doubt)).forEach(doubts::add);
        Table coordinates = CoordinateTable.of(model, snapshots, projected(settings, snapshots, fresh.isPresent()), context.progress());
        return new NodeResult(Map.of("snapshots", snapshots, "operator", model.operator(), "spectrum", model.spectrum(), "verdict",
                model.verdict(), COORDINATES, coordinates), List.of(RecordingFigure.figure(snapshots, MOST_CHANNELS_DRAWN)), summary, doubts);
    }

    private static List<Run> projected(Settings settings, Snapshots snapshots, boolean fresh) {
        if (!settings.flag(COORDINATES)) {
            return List.of();
        }
        return Stream.of(Part.values()).filter(part -> !fresh || part == Part.HOLDOUT).flatMap(part -> snapshots.runs(part).stream()).toList();
    }

    private static String sentence(Snapshots snapshots) {
        int runs = snapshots.holdout().size();
        int samples = snapshots.holdout().stream().mapToInt(run -> run.samples()).sum();
        return runs + (runs == 1 ? " new run" : " new runs") + " with " + samples + " samples stand beside the recordings of the model.";
    }
}
