package org.modestead.nodes.judge;

import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import org.modestead.engine.wellposed.JudgeSettings;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;

/** Settings of the Well-posedness Checker: its extent, the ends of the ladder, every threshold, the replays and the splits, with the engine's defaults. */
final class JudgeNodeSettings {

    private static final String EXTENT = "extent";
    private static final String RESIDUALS = "residuals";
    private static final String LADDER_FROM = "ladder-from";
    private static final String LADDER_TO = "ladder-to";
    private static final String SHARE = "share-threshold";
    private static final String RESIDUAL = "residual-threshold";
    private static final String SETTLE = "settle-threshold";
    private static final String NORM_GROWTH = "norm-growth-threshold";
    private static final String OVERLAP = "overlap-threshold";
    private static final String GAP = "gap-threshold";
    private static final String CAPTURE = "capture-threshold";
    private static final String STEP = "step-threshold";
    private static final String COMPLETENESS = "completeness-threshold";
    private static final String REPLAYS = "replays";
    private static final String SPLITS = "splits";
    private static final String LADDER = "Ladder";
    private static final String NOISE = "Noise";
    private static final String RUNS = "Runs held out";
    private static final long MOST_REPLAYS = 1000;
    private static final long MOST_SPLITS = 100;
    private static final String THRESHOLDS = "Thresholds";
    private static final long LARGEST_RANK = 10_000;
    private static final double LARGEST = 1e12;
    private static final JudgeSettings DEFAULT = JudgeSettings.DEFAULT;

    private JudgeNodeSettings() {}

    /** Returns the settings in dialog order. */
    static List<Setting> declared() {
        return List.of(
                new Setting.Choice(new Common(EXTENT, "Extent", "Extent", "How much is looked into."), List.of(
                        new Setting.Option("verdict", "Whole verdict", "All checks, over the whole ladder."),
                        new Setting.Option(RESIDUALS, "Residuals only", "Only how far each mode misses its own law on data the fit never saw, at the"
                                + " fitted rank and noise included. A quick look: every mode stays undecided, and the ladder is empty.")), "verdict"),
                rank(LADDER_FROM, "Lowest rank", "Rank of the lowest rung; 0 takes 2.",
                        DEFAULT.ladderFrom()),
                rank(LADDER_TO, "Highest rank", "Rank of the highest rung; 0 takes three times the fitted rank,"
                        + " at least ten more, as far as rounding allows. Rungs that noise spoils are told by the check itself and do not count.", DEFAULT.ladderTo()),
                share(SHARE, "Share that counts", "Share of the signal from which a mode enters the overall verdict.",
                        DEFAULT.shareThreshold()),
                share(RESIDUAL, "Largest residual", "Largest relative amount by which an eigenfunction may miss its own"
                        + " law on data the fit never saw, once the noise that is found in the data has been taken off.", DEFAULT.residualThreshold()),
                share(SETTLE, "Largest change on the ladder", "Largest relative difference of a rate or weight between"
                        + " the last rungs that tell of a mode, for one that has settled, and the most that noise may change it for one that stands.", DEFAULT.settleThreshold()),
                above(NORM_GROWTH, "Largest growth of the norm", "Largest factor by which the norm of an eigenfunction"
                        + " in the space may grow from the first third of the ladder to the last; beyond it the function only imitates an"
                        + " eigenfunction on the sampled region.", DEFAULT.normGrowthThreshold()),
                share(OVERLAP, "Largest overlap", "Largest overlap of unit eigenfunctions, 0 for orthogonal ones and 1"
                        + " for equal ones, for a mode that stands on its own.", DEFAULT.overlapThreshold()),
                share(GAP, "Largest joint-solo gap", "Largest relative difference between a mode's weight fitted"
                        + " jointly with all others and its weight alone, for a mode that stands on its own.",
                        DEFAULT.gapThreshold()),
                share(CAPTURE, "Smallest captured share", "Smallest share of the signal that the eigenfunctions"
                        + " together must hold.",
                        DEFAULT.captureThreshold()),
                share(STEP, "Largest change with the step", "Largest relative difference between rates from one step,"
                        + " or piece length, and from another; more speaks of a step too coarse.",
                        DEFAULT.stepThreshold()),
                share(COMPLETENESS, "Fit of an escape", "Goodness of fit with which 1/size must head linearly to zero"
                        + " before a run counts as escaping in finite time.", DEFAULT.completenessThreshold()),
                new Setting.Whole(new Common(REPLAYS, "Replays", NOISE, "A finding against a mode does not count when noise makes as much of"
                        + " it in one of so many replays of the recording, in which the mode exists by construction. Only for recordings"
                        + " that the Snapshot Builder has smoothed, since the noise is known there; 0 asks no replay. Each takes about as"
                        + " long as the check itself."), "", 0, MOST_REPLAYS, OptionalLong.of(DEFAULT.replays())),
                new Setting.Whole(new Common(SPLITS, "Splits", RUNS, "Where fewer than four runs were held out, in recordings of up to two million numbers, fit and check are repeated"
                        + " with others held out in their place, and each mode takes the grade that most of so many splits give it; 1 leaves it at the split"
                        + " of the Snapshot Builder. Each takes about as long as the check itself."), "", 1, MOST_SPLITS, OptionalLong.of(DEFAULT.splits())));
    }

    private static Setting rank(String key, String label, String help, int initial) {
        return new Setting.Whole(new Common(key, label, LADDER, help), "", 0, LARGEST_RANK,
                OptionalLong.of(initial));
    }

    private static Setting share(String key, String label, String help, double initial) {
        return new Setting.Number(new Common(key, label, THRESHOLDS, help), "", 0, true, 1, OptionalDouble.of(initial));
    }

    private static Setting above(String key, String label, String help, double initial) {
        return new Setting.Number(new Common(key, label, THRESHOLDS, help), "", 1, true, LARGEST,
                OptionalDouble.of(initial));
    }

    /** Returns what is wrong between settings. */
    static List<SettingProblem> problems(Settings settings) {
        int from = settings.whole(LADDER_FROM);
        int to = settings.whole(LADDER_TO);
        return from > 0 && to > 0 && from >= to ? List.of(new SettingProblem(LADDER_TO, "the highest rank " + to
                + " is not above the lowest rank " + from, "give a highest rank above the lowest one, or 0")) : List.of();
    }

    /** Returns whether residuals are all that is asked for. */
    static boolean residualsOnly(Settings settings) {
        return settings.text(EXTENT).equals(RESIDUALS);
    }

    /** Returns what the engine is to judge by. */
    static JudgeSettings read(Settings settings) {
        return new JudgeSettings(settings.whole(LADDER_FROM), settings.whole(LADDER_TO), settings.number(SHARE),
                settings.number(RESIDUAL), settings.number(SETTLE), settings.number(NORM_GROWTH),
                        settings.number(OVERLAP),
                settings.number(GAP), settings.number(CAPTURE), settings.number(STEP), settings.number(COMPLETENESS),
                settings.whole(REPLAYS), settings.whole(SPLITS));
    }
}
