package org.modestead.nodes.judge;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import org.modestead.engine.spread.SpreadPlan;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Settings;

/** Settings of the Spectrum Extractor that say whether and how intervals are computed. */
final class IntervalSettings {

    private static final String INTERVALS = "intervals";
    private static final String LEVEL = "interval-level";
    private static final String REPLICATES = "replicates";
    private static final String SEED = "seed";
    private static final String AUTOMATIC = "automatic";
    private static final String ALWAYS = "always";
    private static final String NONE = "none";
    private static final String GROUP = "Intervals";
    private static final long FEWEST = 20;
    private static final long MOST = 100_000;
    private static final SpreadPlan DEFAULT = SpreadPlan.DEFAULT;

    /** Up to this rank intervals take seconds. */
    static final int QUICK_RANK = 80;

    private IntervalSettings() {}

    static List<Setting> declared() {
        return List.of(
                new Setting.Choice(new Common(INTERVALS, "Intervals", GROUP, "Whether the fit is repeated with resampled runs, or"
                        + " blocks where runs are few, to tell how far every figure may be off."), List.of(
                        new Setting.Option(AUTOMATIC, "Automatic", "Up to rank " + QUICK_RANK + ", where it takes seconds."),
                        new Setting.Option(ALWAYS, "Always", "At any rank; the time grows with the cube of the rank."),
                        new Setting.Option(NONE, "None", "The columns of the intervals stay empty.")), AUTOMATIC),
                new Setting.Number(shown(LEVEL, "Level", "Share of recordings of this kind whose interval should hold the true"
                        + " figure."), "", 0.5, false, 0.999, OptionalDouble.of(DEFAULT.level())),
                new Setting.Whole(shown(REPLICATES, "Replicates", "How often the fit is repeated. More of them steady the"
                        + " ends of the intervals."), "fits", FEWEST, MOST, OptionalLong.of(DEFAULT.replicates())),
                new Setting.Whole(shown(SEED, "Seed", "Of the draws; the same seed gives the same intervals."), "", 0,
                        Integer.MAX_VALUE, OptionalLong.of(DEFAULT.seed())));
    }

    private static Common shown(String key, String label, String help) {
        return new Common(key, label, GROUP, help).when(INTERVALS, AUTOMATIC, ALWAYS);
    }

    /**
     * Returns how intervals are to be computed; empty for none.
     *
     * @param rank of the fit
     */
    static Optional<SpreadPlan> read(Settings settings, int rank) {
        String wanted = settings.text(INTERVALS);
        boolean computed = wanted.equals(ALWAYS) || wanted.equals(AUTOMATIC) && rank <= QUICK_RANK;
        return computed ? Optional.of(new SpreadPlan(settings.whole(REPLICATES), settings.number(LEVEL), settings.whole(SEED)))
                : Optional.empty();
    }

    /** Returns whether only the rank keeps intervals from being computed. */
    static boolean tooCostly(Settings settings, int rank) {
        return settings.text(INTERVALS).equals(AUTOMATIC) && rank > QUICK_RANK;
    }
}
