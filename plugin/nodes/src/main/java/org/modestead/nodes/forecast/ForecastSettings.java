package org.modestead.nodes.forecast;

import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import org.modestead.engine.forecast.ForecastPlan;
import org.modestead.engine.forecast.Origin;
import org.modestead.engine.forecast.Route;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.contract.Settings;

/** Settings of Reconstruction and Forecast, and what they mean for the engine. */
final class ForecastSettings {

    private static final String ROUTE = "route";
    private static final String ORIGIN = "origin";
    private static final String HORIZON = "horizon";
    private static final String COVERAGE = "coverage";
    private static final String SEASON = "season";
    private static final String SCORE_HORIZONS = "score-horizons";
    private static final double SMALLEST_TIME = 1e-12;
    private static final ForecastPlan DEFAULT = ForecastPlan.DEFAULT;

    private ForecastSettings() {}

    /** Returns the settings in dialog order. */
    static List<Setting> declared() {
        return List.of(
                route(),
                new Setting.Choice(new Common(ORIGIN, "Start", "Forecast", "Where the forecast table starts."), List.of(
                        new Option("recording-end", "End of the recording", "Into the future, from the last state of"
                                + " every run."),
                        new Option("before-holdout", "Before the holdout", "From the last state before the holdout, so"
                                + " that it can be held against what was observed.")), "recording-end"),
                horizon("the length of the longest holdout run, or a tenth of the longest run without one"),
                coverage(), season(), scoreHorizons());
    }

    /** Returns which way of carrying a state forward is asked for. */
    static Setting route() {
        return new Setting.Choice(new Common(ROUTE, "Route", "Forecast", "How a state is carried forward."), List.of(
                new Option("auto", "As the verdict allows", "By modes where the verdict lets them stand, by"
                        + " projection otherwise."),
                new Option("modal", "By modes", "Each mode grows, decays and turns at its own rate."),
                new Option("projection", "By projection", "The compressed operator, step after step, without"
                        + " modes.")), "auto");
    }

    /** Returns the horizon; {@code otherwise} says in words what an empty one takes. */
    static Setting horizon(String otherwise) {
        return new Setting.Number(new Common(HORIZON, "Horizon", "Forecast", "How far to forecast, rounded up to whole"
                + " steps. Empty takes " + otherwise + "."), "time", 0, true, Double.MAX_VALUE, DEFAULT.horizon());
    }

    /** Returns the coverage of the bands. */
    static Setting coverage() {
        return new Setting.Number(new Common(COVERAGE, "Coverage of the bands", "Bands", "Share of observations that"
                + " the bands should hold. A high share needs many calibration samples."), "", 0, true, 0.999,
                OptionalDouble.of(DEFAULT.coverage()));
    }

    /** Returns the season of the seasonal naive method. */
    static Setting season() {
        return new Setting.Whole(new Common(SEASON, "Season", "Scores", "Steps in one season of the seasonal naive"
                + " method against which the forecast is scored; 0 guesses it from the period of the strongest"
                + " mode, 1 leaves the method out."), "steps", 0, 1_000_000, OptionalLong.of(DEFAULT.season()));
    }

    /** Returns the horizons to score. */
    static Setting scoreHorizons() {
        return new Setting.Numbers(new Common(SCORE_HORIZONS, "Scored horizons", "Scores", "Horizons to score on the"
                + " holdout, rounded up to whole steps. Empty takes one step, a quarter, half and the whole of"
                + " the horizon."), "time", SMALLEST_TIME, Double.MAX_VALUE, DEFAULT.scoreHorizons());
    }

    /** Returns what the engine is to do. */
    static ForecastPlan plan(Settings settings) {
        Origin origin = settings.text(ORIGIN).equals("before-holdout") ? Origin.BEFORE_HOLDOUT : Origin.RECORDING_END;
        return plan(settings, origin);
    }

    /** Returns what the engine is to do from a given origin. */
    static ForecastPlan plan(Settings settings, Origin origin) {
        Route route = switch (settings.text(ROUTE)) {
            case "modal" -> Route.MODAL;
            case "projection" -> Route.PROJECTION;
            default -> Route.AUTO;
        };
        return new ForecastPlan(route, origin, settings.findNumber(HORIZON), settings.number(COVERAGE),
                settings.whole(SEASON),
                settings.numbers(SCORE_HORIZONS));
    }
}
