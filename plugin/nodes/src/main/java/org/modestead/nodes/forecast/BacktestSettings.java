package org.modestead.nodes.forecast;

import java.util.List;
import java.util.OptionalLong;
import org.modestead.engine.forecast.BacktestPlan;
import org.modestead.engine.forecast.Origin;
import org.modestead.engine.forecast.Refit;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.contract.Settings;

/** Settings of the Backtest, and what they mean for the engine. */
final class BacktestSettings {

    private static final String ORIGINS = "origins";
    private static final String REFIT = "refit";
    private static final int MOST_ORIGINS = 1000;

    private BacktestSettings() {}

    /** Returns the settings in dialog order. */
    static List<Setting> declared() {
        return List.of(
                new Setting.Whole(new Common(ORIGINS, "Origins", "Origins", "From how many starts to forecast, evenly"
                        + " spaced over the part of the holdout from which the whole horizon is observed; fewer where"
                        + " that part is shorter."), "", 1, MOST_ORIGINS,
                        OptionalLong.of(BacktestPlan.DEFAULT.origins())),
                new Setting.Choice(new Common(REFIT, "Refit", "Origins", "When the operator is fitted."), List.of(
                        new Option("every-origin", "Before every origin", "Anew by the same estimator, rank and ridge,"
                                + " to the training part and the run up to the origin: how well this way of fitting"
                                + " does in use. Takes one fit an origin."),
                        new Option("never", "Never", "The operator stays as it was fitted: how well it ages.")),
                        "every-origin"),
                ForecastSettings.route(),
                ForecastSettings.horizon("a quarter of the longest time that the holdout can be forecast over"),
                ForecastSettings.coverage(), ForecastSettings.season(), ForecastSettings.scoreHorizons());
    }

    /** Returns what the engine is to do. */
    static BacktestPlan plan(Settings settings) {
        Refit refit = settings.text(REFIT).equals("never") ? Refit.NEVER : Refit.EVERY_ORIGIN;
        return new BacktestPlan(ForecastSettings.plan(settings, Origin.RECORDING_END), settings.whole(ORIGINS), refit);
    }
}
