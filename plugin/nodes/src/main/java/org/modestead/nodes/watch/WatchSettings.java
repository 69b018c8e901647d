package org.modestead.nodes.watch;

import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import org.modestead.engine.spectrum.ComparisonLimits;
import org.modestead.engine.spread.SpreadPlan;
import org.modestead.engine.watch.WatchPlan;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;

/** Settings of the Mode Watch. */
final class WatchSettings {

    private static final String WINDOW = "window";
    private static final String MODES = "watched-modes";
    private static final String SHARE = "least-share";
    private static final String CHANGE = "largest-change";
    private static final String ASSURANCE = "least-assurance";
    private static final String EVERY = "false-alarm-every";
    private static final String MATTERS = "frequency-change-that-matters";
    private static final String SAME_SHAPE = "same-shape";
    private static final String WEIGHT = "newest-weight";
    private static final String REPLICATES = "replicates";
    private static final String OWN = "window-replicates";
    private static final String SEED = "seed";
    private static final String ANY = "any-verdict";
    private static final double LARGEST = 1e12;
    private static final int FEWEST = 20;
    private static final WatchPlan DEFAULT = WatchPlan.DEFAULT;

    private WatchSettings() {}

    static List<Setting> all() {
        return List.of(
                new Setting.Number(new Common(WINDOW, "Window", "Watched", "Recorded time that is fitted together. Not set: 30 cycles of the"
                        + " slowest watched mode, less where the model's recordings hold fewer than 20 such windows, but at least 10 cycles."
                        + " Longer windows find smaller changes, but later."), "time", 0, true, LARGEST, OptionalDouble.empty()),
                new Setting.Choice(new Common(MODES, "Modes watched", "Watched", "Which oscillating modes are watched."), List.of(
                        new Option("existing", "Those that exist", "Modes that stand or settle by the verdict of the model."),
                        new Option(ANY, "Whatever the verdict", "Also modes that drift, are absent or undecided: their figures may wander by"
                                + " themselves.")), "existing"),
                new Setting.Number(new Common(SHARE, "Least energy share", "Watched", "Share of the signal from which on a mode is watched. Weak"
                        + " modes are found in some windows only."), "", 0, false, 1, OptionalDouble.of(DEFAULT.leastShare())),
                new Setting.Number(new Common(CHANGE, "Largest change of frequency", "Watched", "Relative change up to which a mode of a window"
                        + " may be the stored one; beyond it the mode counts as missing."), "", 0, true, 1,
                        OptionalDouble.of(DEFAULT.limits().change())),
                new Setting.Number(new Common(ASSURANCE, "Least likeness of shape", "Watched", "Modal assurance from which on a mode of a window"
                        + " may be the stored one; below it the mode counts as missing."), "", 0, false, 1,
                        OptionalDouble.of(DEFAULT.limits().assurance())),
                new Setting.Number(new Common(EVERY, "Windows between false alarms", "Alarms", "How many windows pass on the mean until one"
                        + " alarm is false, over all modes and figures together. Raise it for fewer false alarms; changes are then found"
                        + " later."), "windows", 10, false, 1e7, OptionalDouble.of(DEFAULT.falseAlarmEvery())),
                new Setting.Number(new Common(MATTERS, "Change of frequency that matters", "Alarms", "Relative change from which on a frequency"
                        + " alarms, however certain smaller ones are. 0: any change that can be told."), "", 0, false, 0.99,
                        OptionalDouble.of(DEFAULT.worth().frequency())),
                new Setting.Number(new Common(SAME_SHAPE, "Shape that counts as the same", "Alarms", "Modal assurance down to which a shape"
                        + " raises no alarm, however certain the change is. 1: any change that can be told."), "", 0, true, 1,
                        OptionalDouble.of(DEFAULT.worth().assurance())),
                new Setting.Number(new Common(WEIGHT, "Weight of the newest window", "Alarms", "In the moving average that alarms. A small"
                        + " weight finds small lasting changes, a large one finds large changes sooner. 0.25 is common practice."), "", 0.05,
                        false, 0.5, OptionalDouble.of(DEFAULT.weight())),
                new Setting.Whole(new Common(REPLICATES, "Resampled fits of the model", "Spread", "How often the stored fit is repeated on"
                        + " resampled recordings, to tell how far its figures spread."), "fits", 20, 10_000,
                        OptionalLong.of(DEFAULT.baseline().replicates())),
                new Setting.Whole(new Common(OWN, "Resampled fits of a window", "Spread", "How often every window is fitted on resampled"
                        + " samples: a window that determines its modes badly, because little moved, then counts for less. 0 takes all"
                        + " windows as equally good and is faster; else at least 20."), "fits", 0, 1000,
                        OptionalLong.of(DEFAULT.windowReplicates())),
                new Setting.Whole(new Common(SEED, "Seed", "Spread", "Starts the random draws; the same seed gives the same result."), "",
                        0, Integer.MAX_VALUE, OptionalLong.of(DEFAULT.baseline().seed())));
    }

    static WatchPlan plan(Settings settings) {
        return new WatchPlan(settings.findNumber(WINDOW),
                settings.text(MODES).equals(ANY), settings.number(SHARE), new ComparisonLimits(settings.number(ASSURANCE),
                settings.number(CHANGE)), settings.number(WEIGHT), settings.number(EVERY), new WatchPlan.Worth(settings.number(MATTERS),
                settings.number(SAME_SHAPE)), new SpreadPlan(settings.whole(REPLICATES),
                SpreadPlan.DEFAULT.level(), settings.whole(SEED)), settings.whole(OWN));
    }

    /** Returns what is wrong with settings that each fit by themselves. */
    static List<SettingProblem> problems(Settings settings) {
        int own = settings.whole(OWN);
        return own > 0 && own < FEWEST ? List.of(new SettingProblem(OWN, own + " resampled fits of a window tell no spread",
                "give 0, or at least " + FEWEST)) : List.of();
    }
}
