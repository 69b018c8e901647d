package org.modestead.nodes.data;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** Makes invented recordings whose modes are known in closed form, together with that truth. */
public final class SignalGenerator implements Node {

    private static final TableSchema TRUTH = TableSchema.of(new Column("mode", CellType.TEXT),
            new Column("frequency", CellType.DOUBLE), new Column("damping_ratio", CellType.DOUBLE),
            new Column("doubling_time", CellType.DOUBLE));

    private static final String PUMP_HOUSE = "pump-house";
    private static final String FLOWS = "flows";
    private static final String DURATION = "duration";
    private static final String NODE = "signal-generator";

    private static final int PUMP_RUNS = 16;
    private static final double PUMP_DURATION = 60;
    private static final double PUMP_NOISE = 0.01;
    private static final int FLOW_RUNS = 40;
    private static final double FLOW_DURATION = 0.4;

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration(NODE, "Signal Generator", NodeDeclaration.Stage.DATA,
                "Makes invented recordings whose modes are known exactly, to try a workflow on.",
                """
                Two scenarios. The pump house is an invented water pumping station with eight channels: a lightly \
                damped surge (0.62 Hz, damping ratio 2 %), a sump level that halves its offset every 25 s, a bearing \
                resonance (2.9 Hz, 1.2 %) and, in a chosen number of runs, a rotor whirl that grows (1.37 Hz, damping \
                ratio -0.6 %, doubling in 13.4 s). One linear system explains every run. Measurement noise, uneven \
                steps, sensor drop-outs and logging gaps can be set.

                The flows are one-dimensional equations with a closed solution, run from evenly spaced starts between \
                -1 and 1: some have eigenfunctions in the exponential kernel's space, others have none, which is what \
                the well-posedness checks are to tell apart.

                The second table holds the truth: the frequency, damping ratio and doubling time of every mode that the \
                data were made from. A flow without a mode has an empty table. The same settings always give the same \
                numbers. Cost: one exponential and eight cosines a mode and sample; the table is held in memory.""",
                List.of(), List.of("synthetic data", "demo", "test signal", "ground truth", "simulate"),
                List.of(),
                List.of(Port.of("table", PortType.TABLE, "Recordings", "One row a sample: run, time and the channels."),
                        Port.table("truth", "Truth", "One row a mode that the recordings were made from.", TRUTH)),
                settings(), 1);
    }

    private static List<Setting> settings() {
        List<Setting> settings = new ArrayList<>();
        settings.add(new Setting.Choice(new Common("scenario", "Scenario", "Scenario", "What the recordings are of."),
                List.of(new Option(PUMP_HOUSE, "Pump house", "An invented water pumping station, eight channels."),
                        new Option(FLOWS, "One-dimensional flow", "An equation with a closed solution, one channel.")),
                PUMP_HOUSE));
        settings.add(new Setting.Choice(new Common("flow", "Flow", "Scenario", "Equation that moves the state x.")
                .when("scenario", FLOWS),
                List.of(new Option("affine", "x' = a x + b", "Linear growth or decay about -b/a; a drift when a = 0."),
                        new Option("square", "x' = x²", "Escapes to infinity in finite time from every positive start."),
                        new Option("minus-cube", "x' = -x³", "Decays ever more slowly."),
                        new Option("logistic", "x' = x - x²", "Leaves 0 and settles at 1.")), "affine"));
        settings.add(number(new Common("a", "Rate a", "Scenario", "Rate of the affine flow; 1 with b = 0 gives x' = x.")
                .when("flow", "affine"), "1/time", -10, 10, 1));
        settings.add(number(new Common("b", "Drift b", "Scenario", "Drift of the affine flow; 1 with a = 0 gives x' = 1.")
                .when("flow", "affine"), "1/time", -10, 10, 0));
        settings.addAll(amounts());
        settings.addAll(disturbances());
        return settings;
    }

    private static List<Setting> amounts() {
        return List.of(
                new Setting.Whole(new Common("runs", "Runs", "Amount",
                        "Number of runs; when not set 16 for the pump house and 40 for a flow."), "", 1, 500,
                        OptionalLong.empty()),
                new Setting.Number(new Common(DURATION, "Length of a run", "Amount",
                        "When not set 60 s for the pump house, whose runs differ by up to 15 %, and 0.4 for a flow."),
                        "time", 0, true, 3600, OptionalDouble.empty()),
                new Setting.Number(new Common("rate", "Samples a second", "Amount", "How often the station logs.")
                        .when("scenario", PUMP_HOUSE), "1/s", 6, false, 100, OptionalDouble.of(20)),
                new Setting.Whole(new Common("samples", "Samples a run", "Amount",
                        "Samples of each run, both ends included.")
                        .when("scenario", FLOWS), "", 2, 100_000, OptionalLong.of(20)),
                new Setting.Whole(new Common("seed", "Seed", "Amount",
                        "Start of the random numbers: the same seed gives the same recordings."), "", 0, Long.MAX_VALUE,
                        OptionalLong.of(1)));
    }

    private static List<Setting> disturbances() {
        return List.of(
                new Setting.Number(new Common("noise", "Noise", "Disturbances",
                        "Standard deviation of the noise, for the pump house as a share of a channel's usual swing, for a flow in the"
                                + " unit of its state x; when not set 0.01 for the pump house and 0 for a flow."), "", 0, false, 1,
                        OptionalDouble.empty()),
                number(new Common("jitter", "Uneven steps", "Disturbances",
                        "Largest shift of a sample time as a share of the step.").when("scenario", PUMP_HOUSE), "", 0,
                        0.4, 0.1),
                whole("dropouts", "Sensor drop-outs a run", "How often in a run one sensor says nothing for two to"
                        + " four samples.", 2),
                whole("gaps", "Runs with a logging gap", "Number of runs in which nothing was logged for two seconds.", 3),
                whole("unstable-runs", "Runs with whirl", "Number of runs in which the rotor whirl grows.", 1));
    }

    private static Setting number(Common common, String unit, double min, double max, double initial) {
        return new Setting.Number(common, unit, min, false, max, OptionalDouble.of(initial));
    }

    private static Setting whole(String key, String label, String help, long initial) {
        return new Setting.Whole(new Common(key, label, "Disturbances", help).when("scenario", PUMP_HOUSE), "", 0, 500,
                OptionalLong.of(initial));
    }

    @Override
    public Map<String, TableSchema> schemas(Map<String, TableSchema> inputs, Settings settings, RunContext context) {
        return Map.of("table", isPumpHouse(settings) ? PumpHouse.schema() : FlowRuns.schema());
    }

    @Override
    public List<SettingProblem> check(Map<String, TableSchema> inputs, Settings settings) {
        if (isPumpHouse(settings)) {
            return List.of();
        }
        FlowRuns flow = flowRuns(settings);
        double escape = flow.escapeTime();
        return flow.duration() < escape ? List.of() : List.of(new SettingProblem(DURATION,
                "a run of length " + flow.duration() + " would pass infinity at time " + escape, "choose a length below "
                        + escape));
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        for (SettingProblem problem : check(Map.of(), settings)) {
            throw new SettingFault(NODE + ", setting " + problem.key(), problem.seen(), problem.wanted());
        }
        return isPumpHouse(settings) ? pumpHouse(settings, context) : flow(settings, context);
    }

    private static NodeResult pumpHouse(Settings settings, RunContext context) {
        PumpHouse station = new PumpHouse((int) settings.findWhole("runs").orElse(PUMP_RUNS),
                settings.findNumber(DURATION).orElse(PUMP_DURATION), settings.number("rate"), settings.number("jitter"),
                settings.findNumber("noise").orElse(PUMP_NOISE), settings.whole("unstable-runs"), settings.whole("gaps"),
                settings.whole("dropouts"), settings.findWhole("seed").orElseThrow());
        List<TrueMode> truth = station.truth();
        return result(station.table(context.progress()), truth,
                "Invented recordings of a pumping station: " + station.runs() + " runs made of " + truth.size()
                        + " known modes.");
    }

    private static NodeResult flow(Settings settings, RunContext context) {
        FlowRuns flow = flowRuns(settings);
        List<TrueMode> truth = flow.flow().truth();
        return result(flow.table(context.progress()), truth, "Invented recordings of a flow: " + flow.runs()
                + " runs; the state has " + (truth.isEmpty() ? "no mode" : "one mode")
                        + " in the exponential kernel's space.");
    }

    private static NodeResult result(Table table, List<TrueMode> truth, String summary) {
        MemoryTable.Builder rows = MemoryTable.builder(TRUTH, "signal generator, truth");
        truth.forEach(mode -> rows.row(mode.name(), mode.frequency(), mode.dampingRatio(), mode.doublingTime()));
        return new NodeResult(Map.of("table", table, "truth", rows.build()), List.of(), List.of(summary), List.of());
    }

    private static boolean isPumpHouse(Settings settings) {
        return settings.text("scenario").equals(PUMP_HOUSE);
    }

    private static FlowRuns flowRuns(Settings settings) {
        Flow flow = switch (settings.text("flow")) {
            case "square" -> new Flow.Square();
            case "minus-cube" -> new Flow.MinusCube();
            case "logistic" -> new Flow.Logistic();
            default -> new Flow.Affine(settings.number("a"), settings.number("b"));
        };
        return new FlowRuns(flow, (int) settings.findWhole("runs").orElse(FLOW_RUNS),
                settings.findNumber(DURATION).orElse(FLOW_DURATION), settings.whole("samples"),
                settings.findNumber("noise").orElse(0), settings.findWhole("seed").orElseThrow());
    }
}
