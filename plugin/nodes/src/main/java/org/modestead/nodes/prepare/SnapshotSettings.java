package org.modestead.nodes.prepare;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.Set;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Detrend;
import org.modestead.engine.recording.GapPolicy;
import org.modestead.engine.recording.MissingPolicy;
import org.modestead.engine.recording.Resampling;
import org.modestead.engine.recording.RunWeighting;
import org.modestead.engine.recording.Scaling;
import org.modestead.engine.recording.SmoothingRule;
import org.modestead.engine.recording.SnapshotPlan;
import org.modestead.engine.recording.Split;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.table.CellType;

/** Settings of the Snapshot Builder, and what they mean for the engine. */
final class SnapshotSettings {

    static final String TABLE = "table";
    static final String TIME_COLUMN = "time-column";
    static final String TIME_UNIT = "time-unit";
    static final String RUN_COLUMN = "run-column";
    static final String CHANNELS = "channels";
    static final String INPUTS = "inputs";
    static final String UNITS = "units";
    static final String RESAMPLING = "resampling";
    static final String DELAY_DEPTH = "delay-depth";
    static final String HOLDOUT = "holdout";
    static final String CALIBRATION = "calibration";
    static final String RUN_WEIGHTS = "run-weights";
    static final String WEIGHT_COLUMN = "weight-column";
    static final String EQUAL_SAMPLES = "equal-samples";

    private static final Set<CellType> TIMES = Set.of(CellType.DOUBLE, CellType.LONG, CellType.DATE, CellType.DATE_TIME,
            CellType.ZONED_DATE_TIME, CellType.TEXT);
    private static final Set<CellType> NUMBERS = Set.of(CellType.DOUBLE, CellType.LONG, CellType.TEXT);
    private static final Set<CellType> MEASURED = Set.of(CellType.DOUBLE, CellType.LONG, CellType.TEXT, CellType.DOUBLE_LIST,
            CellType.LONG_LIST);
    private static final double LARGEST = Double.MAX_VALUE;

    private SnapshotSettings() {}

    /** Returns the settings in dialog order. */
    static List<Setting> declared() {
        List<Setting> all = new ArrayList<>();
        all.addAll(tableSettings());
        all.addAll(timeSettings());
        all.addAll(preparationSettings());
        all.addAll(weightSettings());
        all.addAll(splitSettings(HOLDOUT, "Holdout", "to judge modes and forecasts on data that the fit never saw"));
        all.addAll(splitSettings(CALIBRATION, "Calibration",
                "to set the width of forecast bands; taken from what the holdout leaves"));
        return all;
    }

    private static List<Setting> tableSettings() {
        String group = "Table";
        return List.of(
                new Setting.OneColumn(new Common(TIME_COLUMN, "Time column", group, "Column with the time of each row:"
                        + " a number, a date or a date-time (also written as text, 2015-06-30 or 2015-06-30T12:00:00)."
                        + " Leave it empty when rows follow each other at a fixed step."), TABLE, TIMES, false),
                new Setting.Number(new Common("row-step", "Time from row to row", group, "Time between neighbouring"
                        + " rows of a run where there is no time column; without effect otherwise."), "time", 0, true,
                        LARGEST, OptionalDouble.of(1)),
                new Setting.Text(new Common(TIME_UNIT, "Time unit", group, "Unit in which time is counted; rates are"
                        + " then per unit and frequencies in cycles per unit. For numbers it is the unit they are"
                        + " written in, for example s. Dates count in d, week or year, date-times in s, min, h, d, week"
                        + " or year (365.25 days); empty means d and s there."), "", false, false),
                new Setting.OneColumn(new Common(RUN_COLUMN, "Run column", group, "Column that names the run each row"
                        + " belongs to. Leave it empty when the table holds one recording without restart. Rows of"
                        + " different runs may be mixed. Whole numbers, texts, dates and true/false name runs; 1.0 is run 1."),
                        TABLE, RunName.TYPES, false),
                new Setting.Columns(new Common(CHANNELS, "Channels", group, "Measured columns whose modes are wanted."
                        + " Empty takes every column of numbers, and of lists of numbers, that has no other part here. A"
                        + " column of lists is several channels, one an entry. A column of text is accepted when each cell"
                        + " holds a number."), TABLE, MEASURED, 0, OptionalInt.empty()),
                new Setting.Columns(new Common(INPUTS, "Inputs", group, "Columns of known inputs such as valve"
                        + " positions or set points. They are neither detrended, scaled nor forecast; the Operator Fitter can"
                        + " separate what they drive. At new sample times they are interpolated like channels, which rounds"
                        + " off steps: keep the recorded times where inputs are switched."), TABLE,
                        MEASURED, 0, OptionalInt.empty()),
                new Setting.Texts(new Common(UNITS, "Units", group, "Units of channels as channel=unit, one a line, for"
                        + " example flow=m3/h. A column named flow [m3/h] needs no entry. The name of a column of lists"
                        + " stands for all of its channels."), List.of()));
    }

    private static List<Setting> timeSettings() {
        String group = "Times and gaps";
        return List.of(
                new Setting.Choice(new Common("gap-policy", "Gaps", group, "What happens where a run pauses, that is"
                        + " where a time step is much longer than usual."), List.of(
                        new Option("split", "Split the run", "The run becomes several runs; nothing is made up across"
                                + " the pause."),
                        new Option("interpolate", "Interpolate", "The pause is filled with interpolated samples."),
                        new Option("refuse", "Refuse", "The work stops and names the first pause.")), "split"),
                new Setting.Number(new Common("gap-factor", "Gap factor", group, "A step counts as a gap when it is"
                        + " longer than this many times the run's median step."), "", 1, true, LARGEST,
                        OptionalDouble.of(SnapshotPlan.DEFAULT_GAP_FACTOR)),
                new Setting.Choice(new Common(RESAMPLING, "Sample times", group, "Whether the recorded times are kept"
                        + " or replaced by even ones. Step maps and delay coordinates need even times; generators do"
                        + " not."), List.of(
                        new Option("keep", "Keep the recorded times", "Values stay as recorded."),
                        new Option("uniform", "Resample evenly", "Values are interpolated at even times.")), "keep"),
                new Setting.Number(new Common("step", "Time step", group, "Step of the even times. Empty takes the"
                        + " median step of all runs.").when(RESAMPLING, "uniform"), "time", 0, true, LARGEST,
                        OptionalDouble.empty()),
                new Setting.Choice(new Common("missing", "Missing cells", group, "What happens to a sample of which a"
                        + " channel or an input has no number."), List.of(
                        new Option("interpolate", "Interpolate", "The cell is interpolated in its own column."),
                        new Option("split", "Split the run", "The sample is dropped and the run split there."),
                        new Option("refuse", "Refuse", "The work stops and names the first missing cell.")),
                                "interpolate"));
    }

    private static List<Setting> preparationSettings() {
        String group = "Preparation";
        return List.of(
                new Setting.Choice(new Common("detrend", "Subtract", group, "What is subtracted from every channel"
                        + " before the fit, fitted on the training samples only; results are given in recorded units"
                        + " again."), List.of(
                        new Option("none", "Nothing", "The values stay; a constant part appears as a mode of rate zero."),
                        new Option("mean", "Mean", "The channel's mean."),
                        new Option("linear", "Straight line", "The least-squares line against time.")), "none"),
                new Setting.Choice(new Common("scaling", "Divide by", group, "What every channel is divided by, so that"
                        + " channels of different units weigh alike in distances and least squares."), List.of(
                        new Option("none", "Nothing", "Recorded units are kept."),
                        new Option("std", "Standard deviation", "Each channel by its own standard deviation."),
                        new Option("unit-group", "Standard deviation of the unit", "Channels that share a unit by their"
                                + " common standard deviation, so that their relative sizes stay.")), "none"),
                new Setting.Choice(new Common("smoothing", "Smooth", group, "Whether noise is smoothed away before the fit. Modes keep their"
                        + " rates, noise loses most of its weight, and verdicts come out right more often. What is forecast and scored"
                        + " afterwards is the smoothed signal, so leave it off where single readings are to be forecast."), List.of(
                        new Option("none", "No", "Samples stay as recorded."),
                        new Option("automatic", "Where it helps", "Every sample becomes the value of a parabola through its neighbours. For"
                                + " each channel the window is taken that best tells samples left out, over the training runs. Channels"
                                + " that move too fast, or that are mostly noise, stay as recorded.")), "none"),
                new Setting.Whole(new Common(DELAY_DEPTH, "Delay depth", group, "Number of samples stacked into one"
                        + " state, the newest and earlier ones. 1 takes the sample alone; take more when fewer channels"
                        + " were measured than the system has degrees of freedom."), "samples", 1, 100_000,
                        OptionalLong.of(1)),
                new Setting.Whole(new Common("delay-spacing", "Delay spacing", group, "Samples between neighbours in"
                        + " the stack; without effect at depth 1."), "samples", 1, 100_000, OptionalLong.of(1)));
    }

    private static List<Setting> weightSettings() {
        String group = "Weights of runs";
        return List.of(
                new Setting.Choice(new Common(RUN_WEIGHTS, "Weights", group, "How much the samples of each training run count"
                        + " in the fit. Only ratios matter. Trend and scales are taken from all samples alike, and so are the"
                        + " shares of the signal that modes carry."), List.of(
                        new Option(EQUAL_SAMPLES, "Every sample alike", "Long runs count more."),
                        new Option("equal-runs", "Every run alike", "The samples of a run together count as much as those of"
                                + " any other."),
                        new Option("noise", "By noise", "The noisier a run, the less it counts: by the inverse of the noise"
                                + " variance, told from how far samples lie from the line through their neighbours. Sample"
                                + " fast enough that the signal is nearly straight over three samples."),
                        new Option("given", "From a column", "As a column of the table says.")), EQUAL_SAMPLES),
                new Setting.OneColumn(new Common(WEIGHT_COLUMN, "Column of weights", group, "Column with the weight of each"
                        + " run, the same number in all its rows; 0 leaves the run out of training.")
                        .when(RUN_WEIGHTS, "given"), TABLE, NUMBERS, false));
    }

    private static List<Setting> splitSettings(String key, String group, String purpose) {
        return List.of(
                new Setting.Choice(new Common(key, group + " part", group, "Which samples are kept away from the fit "
                        + purpose + "."),
                        List.of(new Option("none", "None", "Everything trains the fit."),
                                new Option("runs", "Named runs", "Whole runs, by name."),
                                new Option("run-share", "Share of the runs", "The last runs of the table."),
                                new Option("tail-share", "Share of each run's end", "The last samples of every run."),
                                new Option("tail-time", "Time at each run's end", "The end of every run, by its length"
                                        + " in time.")),
                        "none"),
                new Setting.Texts(new Common(key + "-runs", "Runs", group, "Names of the runs, one a line, as in the"
                        + " run column.")
                        .when(key, "runs"), List.of()),
                new Setting.Number(new Common(key + "-run-share", "Share of runs", group, "Share of the number of runs,"
                        + " rounded, at least one run.").when(key, "run-share"), "", 0, true, 0.95,
                        OptionalDouble.of(0.2)),
                new Setting.Number(new Common(key + "-tail-share", "Share of samples", group, "Share of each run's"
                        + " samples, rounded, at least one sample.").when(key, "tail-share"), "", 0, true, 0.95,
                        OptionalDouble.of(0.2)),
                new Setting.Number(new Common(key + "-tail-time", "Length of the end", group, "Length of each run's end"
                        + " that is kept away.").when(key, "tail-time"), "time", 0, true, LARGEST, OptionalDouble.of(1)));
    }

    /** Returns which columns mean what. */
    static RecordingColumns columns(Settings settings) {
        return new RecordingColumns(settings.text(TIME_COLUMN), settings.number("row-step"),
                settings.text(TIME_UNIT).strip(),
                settings.text(RUN_COLUMN), settings.texts(CHANNELS), settings.texts(INPUTS), weightColumn(settings),
                units(settings));
    }

    /** Returns the column of weights, empty where none is asked for. */
    static String weightColumn(Settings settings) {
        return settings.text(RUN_WEIGHTS).equals("given") ? settings.text(WEIGHT_COLUMN) : "";
    }

    /** Returns units by channel; entries without {@code =} are left out (the node's check has told of them). */
    static Map<String, String> units(Settings settings) {
        Map<String, String> units = new LinkedHashMap<>();
        for (String entry : settings.texts(UNITS)) {
            int sign = entry.lastIndexOf('=');
            if (sign > 0) {
                units.put(entry.substring(0, sign).strip(), entry.substring(sign + 1).strip());
            }
        }
        return units;
    }

    /** Returns what the engine is to do with the recording. */
    static SnapshotPlan plan(Settings settings) {
        return new SnapshotPlan(option(GapPolicy.class, settings, "gap-policy"),
                OptionalDouble.of(settings.number("gap-factor")),
                option(Resampling.class, settings, RESAMPLING), settings.findNumber("step"),
                option(MissingPolicy.class, settings, "missing"), option(Detrend.class, settings, "detrend"),
                option(Scaling.class, settings, "scaling"),
                new DelayEmbedding(settings.whole(DELAY_DEPTH), settings.whole("delay-spacing")),
                split(settings, HOLDOUT), split(settings, CALIBRATION),
                option(RunWeighting.class, settings, RUN_WEIGHTS), option(SmoothingRule.class, settings, "smoothing"));
    }

    private static Split split(Settings settings, String key) {
        return switch (settings.text(key)) {
            case "runs" -> new Split.Runs(settings.texts(key + "-runs"));
            case "run-share" -> new Split.RunShare(settings.number(key + "-run-share"));
            case "tail-share" -> new Split.Tail(settings.number(key + "-tail-share"));
            case "tail-time" -> new Split.TailDuration(settings.number(key + "-tail-time"));
            default -> new Split.None();
        };
    }

    private static <E extends Enum<E>> E option(Class<E> type, Settings settings, String key) {
        return Enum.valueOf(type, settings.text(key).replace('-', '_').toUpperCase(Locale.ROOT));
    }
}
