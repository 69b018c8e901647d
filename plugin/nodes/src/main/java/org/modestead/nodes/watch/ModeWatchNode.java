package org.modestead.nodes.watch;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.recording.PreparedAlike;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.watch.ModeWatch;
import org.modestead.engine.watch.WatchResult;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.figure.WatchFigures;
import org.modestead.nodes.table.TableSchema;

/** Watches the modes of a model in new recordings and alarms when one changes. */
public final class ModeWatchNode implements Node {

    private static final String MODEL = "model";
    private static final String SNAPSHOTS = "snapshots";

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("mode-watch", "Mode Watch", NodeDeclaration.Stage.JUDGE,
                "Follows the modes of a model through new recordings, window by window, and alarms when one changes.",
                description(), List.of(
                        "Allemang and Brown, A correlation coefficient for modal vector analysis, Proceedings of the 1st"
                                + " International Modal Analysis Conference, 1982",
                        "Roberts, Control chart tests based on geometric moving averages, Technometrics 1:239, 1959",
                        "Crowder, A simple method for studying run-length distributions of exponentially weighted moving average charts,"
                                + " Technometrics 29:401, 1987",
                        "Jones, Champ and Rigdon, The performance of exponentially weighted moving average charts with estimated parameters,"
                                + " Technometrics 43:156, 2001",
                        "Politis and Romano, A circular block-resampling procedure for stationary data, in Exploring the Limits of Bootstrap,"
                                + " Wiley, 1992"),
                List.of("monitoring", "control chart", "EWMA", "alarm", "change detection", "condition monitoring", "damage detection", "MAC",
                        "drift"),
                List.of(Port.of(MODEL, PortType.MODEL, "Model", "The stored spectrum with its recordings, from the Model Reader or the Model"
                                + " Writer."),
                        Port.of(SNAPSHOTS, PortType.SNAPSHOTS, "New recordings", "What is watched: runs that the model was not fitted to.")),
                List.of(Port.of("watch", PortType.TABLE, "Watch", "Every watched mode in every window: figures, limits, scores and alarms."),
                        Port.of("alarms", PortType.TABLE, "Alarms", "One row an event: what changed, from when to when, by how much."),
                        Port.table("limits", "Limits", "What each figure was on the model's recordings, how it scatters, and which change is"
                                + " found how soon.", WatchTables.LIMITS)),
                WatchSettings.all(), 1);
    }

    private static String description() {
        return """
                The recordings of the model and the new ones are cut into windows of equal recorded time, and each window is fitted as the \
                model was: same estimator, rank and preparation. The modes of a window are assigned to the stored ones by shape (modal \
                assurance) and frequency, all at once, so that a mode is not taken for its neighbour. A window goes on after a gap; runs \
                shorter than a window are gathered.

                Frequency, damping ratio and shape of every watched mode have a control chart each. Centre and spread come from the windows of \
                the model's own recordings; the bootstrap of the stored fit tells the spread a second time, and the larger counts. \
                What is charted is a moving average in which older windows fade (EWMA). Its limits are set so that false alarms are as \
                rare as asked for over all charts together, and are wider the fewer windows the model's recordings hold. One odd window \
                after calm ones does not alarm, two in a row do. An alarm is one event from its begin to its end. A mode that is no longer found is an \
                event of its own kind, after more misses in a row than chance explains.

                Use it where recordings keep coming from a plant that was once understood: a model says what is normal, the watch says what \
                is no longer. Use recordings of normal operation in all its states for the model; what it has never seen, such as another \
                season or load, looks like a change. Only oscillating modes are watched. Short windows, few windows in the model and modes \
                that wander by themselves are told as doubts.

                An alarm is a reason to look, not a diagnosis, and silence is no proof of safety: keep the limits of the equipment and the \
                local codes, and leave decisions that can harm people or plant to licensed practice. Cost: one fit a window and its \
                resampled fits.""";
    }

    @Override
    public List<SettingProblem> check(Map<String, TableSchema> inputs, Settings settings) {
        return WatchSettings.problems(settings);
    }

    @Override
    public Expected expect(Expected inputs, Settings settings, RunContext context) {
        Outlook model = inputs.values().getOrDefault(MODEL, Outlook.NONE);
        Outlook fresh = inputs.values().getOrDefault(SNAPSHOTS, Outlook.NONE);
        if (model.complete() && !fresh.channels().isEmpty()) {
            PreparedAlike.check(model.channels(), fresh.channels(), model.inputs(), fresh.inputs());
        }
        if (model.complete() && fresh.time().isPresent()) {
            PreparedAlike.check(model.time().orElseThrow(), fresh.time().orElseThrow());
        }
        Optional<TimeAxis> time = model.time().or(fresh::time);
        return new Expected(time.map(axis -> Map.of("watch", WatchTables.watchColumns(axis), "alarms", WatchTables.alarmColumns(axis)))
                .orElse(Map.of()), Map.of());
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Model model = inputs.get(MODEL, Model.class);
        WatchResult result = ModeWatch.of(model, inputs.get(SNAPSHOTS, Snapshots.class), WatchSettings.plan(settings), context.progress());
        TimeAxis axis = model.operator().snapshots().time();
        WatchWords words = new WatchWords(result, axis);
        return new NodeResult(Map.of("watch", WatchTables.watch(result, axis), "alarms", WatchTables.alarms(result, axis, words), "limits",
                WatchTables.limits(result)), WatchFigures.figures(result, axis), words.summary(), result.doubts());
    }
}
