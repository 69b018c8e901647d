package org.modestead.nodes.fit;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.Set;
import java.util.TreeSet;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.moments.Apart;
import org.modestead.engine.moments.Features;
import org.modestead.engine.moments.Keeping;
import org.modestead.engine.moments.StreamPlan;
import org.modestead.engine.operator.NoiseCorrection;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.GapPolicy;
import org.modestead.engine.recording.MissingPolicy;
import org.modestead.engine.recording.Scaling;
import org.modestead.engine.recording.SnapshotPlan;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.prepare.RunName;
import org.modestead.nodes.table.CellType;

/** Settings of the Streaming Fit, and what they mean for the engine. */
final class StreamSettings {

    static final String TABLE = "table";
    static final String TIME = "time-column";
    static final String TIME_UNIT = "time-unit";
    static final String RUN = "run-column";
    static final String CHANNELS = "channels";
    static final String UNITS = "units";
    private static final String FUNCTIONS = "functions";
    private static final String CORRECTION = "noise-correction";
    private static final String HOLDOUT = "holdout";
    private static final String KERNEL = "kernel";
    private static final String SCALE = "scale";
    private static final String STRETCH = "stretch";
    private static final String KEPT = "kept-samples";
    private static final String[] WITH_KERNEL = {"random-waves", "landmarks"};
    private static final double LARGEST = Double.MAX_VALUE;

    private StreamSettings() {}

    /** Returns the settings in dialog order. */
    static List<Setting> declared() {
        List<Setting> all = new ArrayList<>();
        all.addAll(tableSettings());
        all.addAll(timeSettings());
        all.addAll(preparationSettings());
        all.addAll(functionSettings());
        all.addAll(FitSettings.rankSettings());
        all.addAll(holdoutSettings());
        all.addAll(keptSettings());
        return all;
    }

    private static List<Setting> tableSettings() {
        String group = "Table";
        return List.of(
                new Setting.OneColumn(new Common(TIME, "Time column", group, "Column with the time of each row: a number, a date or a"
                        + " date-time. Rows must be in order of run and time; a query step with ORDER BY puts them so."), TABLE,
                        Set.of(CellType.DOUBLE, CellType.LONG, CellType.DATE, CellType.DATE_TIME, CellType.ZONED_DATE_TIME, CellType.TEXT), true),
                new Setting.Text(new Common(TIME_UNIT, "Time unit", group, "Unit in which time is counted; rates are then per unit and"
                        + " frequencies in cycles per unit. For numbers the unit they are written in, for example s. Dates count in d, week or"
                        + " year, date-times in s, min, h, d, week or year; empty means d and s there."), "", false, false),
                new Setting.OneColumn(new Common(RUN, "Run column", group, "Column that names the run of each row. Leave it empty when the"
                        + " table holds one recording without restart."), TABLE,
                        RunName.TYPES, false),
                new Setting.Columns(new Common(CHANNELS, "Channels", group, "Measured columns whose modes are wanted. Empty takes every column"
                        + " of numbers that has no other part here."), TABLE, Set.of(CellType.DOUBLE, CellType.LONG), 0, OptionalInt.empty()),
                new Setting.Texts(new Common(UNITS, "Units", group, "Units of channels as channel=unit, one a line, for example flow=m3/h. A"
                        + " column named flow [m3/h] needs no entry."), List.of()));
    }

    private static List<Setting> timeSettings() {
        String group = "Times and gaps";
        return List.of(
                new Setting.Number(new Common("step", "Time step", group, "Usual time from row to row. Empty takes the median of the first rows."
                        + " Rows are not resampled: all steps but gaps must be even."), "time", 0, true, LARGEST, OptionalDouble.empty()),
                new Setting.Choice(new Common("gap-policy", "Gaps", group, "What happens where a run pauses."), List.of(
                        new Option("split", "Split the run", "Nothing is paired across the pause."),
                        new Option("refuse", "Refuse", "The work stops and names the pause.")), "split"),
                new Setting.Number(new Common("gap-factor", "Gap factor", group, "A step counts as a gap when it is longer than this many usual"
                        + " ones."), "", 1, true, LARGEST, OptionalDouble.of(SnapshotPlan.DEFAULT_GAP_FACTOR)),
                new Setting.Choice(new Common("missing", "Missing cells", group, "What happens to a row of which a channel has no number."), List.of(
                        new Option("split", "Split the run", "The row is dropped and nothing is paired across it."),
                        new Option("refuse", "Refuse", "The work stops and names the first missing cell.")), "split"));
    }

    private static List<Setting> preparationSettings() {
        String group = "Preparation";
        return List.of(
                new Setting.Choice(new Common("detrend", "Subtract", group, "What is subtracted from every channel, taken from the samples that"
                        + " train; results are given in recorded units again."), List.of(
                        new Option("none", "Nothing", "The values stay; a constant part appears as a mode of rate zero."),
                        new Option("mean", "Mean", "The channel's mean.")), "none"),
                new Setting.Choice(new Common("scaling", "Divide by", group, "What every channel is divided by, so that channels of different"
                        + " units weigh alike. With functions other than the coordinates this takes a pass over the rows before the fit."), List.of(
                        new Option("none", "Nothing", "Recorded units are kept."),
                        new Option("std", "Standard deviation", "Each channel by its own standard deviation."),
                        new Option("unit-group", "Standard deviation of the unit", "Channels that share a unit by their common standard"
                                + " deviation.")), "none"),
                new Setting.Whole(new Common("delay-depth", "Delay depth", group, "Number of samples stacked into one state, the newest and earlier"
                        + " ones."), "samples", 1, 10_000, OptionalLong.of(1)),
                new Setting.Whole(new Common("delay-spacing", "Delay spacing", group, "Samples between neighbours in the stack; without effect at"
                        + " depth 1."), "samples", 1, 10_000, OptionalLong.of(1)));
    }

    private static List<Setting> functionSettings() {
        String group = "Operator";
        return List.of(
                new Setting.Choice(new Common(FUNCTIONS, "Functions", group, "Through which functions of the state its step is looked at."), List.of(
                        new Option("linear", "Coordinates", "The (delay) coordinates themselves: signals that are sums of growing, decaying or"
                                + " steady oscillations. One pass."),
                        new Option("monomials", "Monomials", "All products of powers of the coordinates up to a total degree."),
                        new Option("random-waves", "Random waves", "Cosines and sines of random combinations of the coordinates, which together act"
                                + " as a kernel: smooth nonlinear motion."),
                        new Option("landmarks", "Kernel at landmarks", "Kernel functions at states chosen in a pass before: the kernel step map"
                                + " of the Operator Fitter.")), "linear"),
                new Setting.Choice(new Common(CORRECTION, "Noise correction", group, "Noise makes least squares report too much damping; see the"
                        + " Operator Fitter. Needs a ridge of 0.").when(FUNCTIONS, "linear"), List.of(
                        new Option("none", "None", "Least squares."),
                        new Option("total-least-squares", "Total least squares", "Noise in the earlier and in the later state alike is"
                                + " projected out."),
                        new Option("forward-backward", "Forward and backward", "The mean of the step forward and the inverted step"
                                + " backward.")), "none"),
                new Setting.Whole(new Common("degree", "Degree", group, "Largest total degree; with N coordinates and degree d there are (N+d)!/(N! d!)"
                        + " functions.").when(FUNCTIONS, "monomials"), "", 1, 20, OptionalLong.of(2)),
                new Setting.Whole(new Common("waves", "Waves", group, "Number of random combinations; each gives a cosine and a sine. More come nearer"
                        + " to the kernel, with an error that falls with the root of their number.").when(FUNCTIONS, "random-waves"), "", 1, 2500,
                        OptionalLong.of(100)),
                new Setting.Whole(new Common("landmarks", "Landmarks", group, "Most states that carry a function each.").when(FUNCTIONS,
                        "landmarks"), "states", 1, 2000, OptionalLong.of(200)),
                new Setting.Choice(new Common(KERNEL, "Kernel", group, "The kernel that waves or landmarks stand for.").when(FUNCTIONS, WITH_KERNEL),
                        List.of(new Option("gaussian", "Gaussian", "exp(-|x-y|²/(2 scale²))."),
                                new Option("matern52", "Matérn 5/2", "Twice differentiable."),
                                new Option("matern32", "Matérn 3/2", "Once differentiable."),
                                new Option("laplacian", "Laplacian", "exp(-|x-y|/scale).")), "gaussian"),
                new Setting.Number(new Common(SCALE, "Scale", group, "Length over which the kernel falls, in the unit of the prepared states. Empty"
                        + " takes the median distance between states of the first rows.").when(FUNCTIONS, WITH_KERNEL), "", 0, true, 1e300,
                        OptionalDouble.empty()),
                new Setting.Whole(new Common("stride", "Sampling steps", group, "Sampling steps from a state to the one it is paired with."), "steps",
                        1, 10_000, OptionalLong.of(1)));
    }

    private static List<Setting> holdoutSettings() {
        String group = "Holdout";
        return List.of(
                new Setting.Choice(new Common(HOLDOUT, "Keep away", group, "What the fit must not see, so that modes and forecasts are judged on it."
                        + " Shares are drawn by a hash of the run's name and the seed, so they are kept only about, and do not change when"
                        + " other rows are added."), List.of(
                        new Option("stretches", "Share of stretches", "Stretches of runs; right for a single long run."),
                        new Option("run-share", "Share of runs", "Whole runs; right for many runs."),
                        new Option("runs", "Named runs", "Whole runs, by name."),
                        new Option("none", "Nothing", "Everything trains the fit.")), "stretches"),
                new Setting.Number(new Common("holdout-share", "Share that judges", group, "Share kept away to judge.").when(HOLDOUT, "stretches",
                        "run-share"), "", 0, false, 0.8, OptionalDouble.of(0.2)),
                new Setting.Number(new Common("calibration-share", "Share that calibrates", group, "Share kept away for the width of forecast bands.")
                        .when(HOLDOUT, "stretches", "run-share"), "", 0, false, 0.15, OptionalDouble.of(0.1)),
                new Setting.Texts(new Common("holdout-runs", "Runs that judge", group, "Names of the runs, one a line.").when(HOLDOUT, "runs"),
                        List.of()),
                new Setting.Texts(new Common("calibration-runs", "Runs that calibrate", group, "Names of the runs, one a line, for the width of"
                        + " forecast bands.").when(HOLDOUT, "runs"), List.of()));
    }

    private static List<Setting> keptSettings() {
        String group = "Kept in memory";
        return List.of(
                new Setting.Whole(new Common(STRETCH, "Stretch", group, "Samples of a stretch. It should hold several periods of the slowest mode, and"
                        + " the time over which forecasts are wanted."), "samples", 2, 1_000_000, OptionalLong.of(2000)),
                new Setting.Whole(new Common(KEPT, "Samples kept", group, "Most samples kept of what trains, and as many of each part that is kept"
                        + " away, for the steps that look at the recording: sizes of modes, intervals, verdicts, forecasts. Memory: 8 bytes a sample"
                        + " and channel."), "samples", 100, 10_000_000, OptionalLong.of(40_000)),
                new Setting.Whole(new Common("seed", "Seed", group, "Of the draws of stretches and random waves; another seed keeps others."), "", 0,
                        Integer.MAX_VALUE, OptionalLong.of(1)));
    }

    /** Returns what is wrong whatever is connected. */
    static List<SettingProblem> problems(Settings settings) {
        List<SettingProblem> problems = new ArrayList<>();
        if (settings.whole(STRETCH) > settings.whole(KEPT)) {
            problems.add(new SettingProblem(KEPT, settings.whole(KEPT) + " samples to be kept, in stretches of " + settings.whole(STRETCH),
                    "keep at least one stretch"));
        }
        int reach = (settings.whole("delay-depth") - 1) * settings.whole("delay-spacing") + settings.whole("stride");
        if (settings.whole(STRETCH) <= reach) {
            problems.add(new SettingProblem(STRETCH, "stretches of " + settings.whole(STRETCH) + " samples, while a pair of states needs "
                    + (reach + 1), "choose longer stretches or a smaller delay depth"));
        }
        if (settings.text(FUNCTIONS).equals("linear") && !settings.text(CORRECTION).equals("none") && settings.number(FitSettings.RIDGE) > 0) {
            problems.add(new SettingProblem(FitSettings.RIDGE, "a ridge beside the noise correction " + settings.text(CORRECTION)
                    + ", which it would undo", "set the ridge to 0, or the noise correction to none"));
        }
        return problems;
    }

    /** Returns units by channel. */
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

    /** Returns whether the kernel's scale is to be taken from the first rows. */
    static boolean needsScale(Settings settings) {
        return List.of(WITH_KERNEL).contains(settings.text(FUNCTIONS)) && settings.findNumber(SCALE).isEmpty();
    }

    /**
     * Returns what the engine is to do.
     *
     * @param scale of the kernel, read where the settings give none
     */
    static StreamPlan plan(Settings settings, List<Channel> channels, TimeAxis axis, double scale) {
        int stretch = settings.whole(STRETCH);
        int kept = settings.whole(KEPT);
        return new StreamPlan(channels, axis, settings.findNumber("step"), settings.number("gap-factor"),
                option(GapPolicy.class, settings, "gap-policy"), option(MissingPolicy.class, settings, "missing"),
                settings.text("detrend").equals("mean"), option(Scaling.class, settings, "scaling"),
                new DelayEmbedding(settings.whole("delay-depth"), settings.whole("delay-spacing")), settings.whole("stride"),
                features(settings, settings.findNumber(SCALE).orElse(scale)),
                new Keeping(settings.whole("seed"), apart(settings), stretch, kept, kept));
    }

    private static Features features(Settings settings, double scale) {
        KernelSpec kernel = new KernelSpec(settings.text(KERNEL), Map.of("scale", scale));
        return switch (settings.text(FUNCTIONS)) {
            case "monomials" -> new Features.Monomials(settings.whole("degree"));
            case "random-waves" -> new Features.RandomFourier(kernel, settings.whole("waves"), settings.whole("seed"));
            case "landmarks" -> new Features.Landmarks(kernel, settings.whole("landmarks"));
            default -> new Features.Coordinates(option(NoiseCorrection.class, settings, CORRECTION));
        };
    }

    private static Apart apart(Settings settings) {
        String kept = settings.text(HOLDOUT);
        return switch (kept) {
            case "none" -> new Apart.None();
            case "runs" -> new Apart.Runs(new TreeSet<>(settings.texts("holdout-runs")), new TreeSet<>(settings.texts("calibration-runs")));
            default -> new Apart.Shares(settings.number("holdout-share"), settings.number("calibration-share"), kept.equals("run-share"));
        };
    }

    private static <E extends Enum<E>> E option(Class<E> type, Settings settings, String key) {
        return Enum.valueOf(type, settings.text(key).replace('-', '_').toUpperCase(Locale.ROOT));
    }
}
