package org.modestead.nodes.forecast;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.forecast.BacktestResult;
import org.modestead.engine.forecast.RollingOrigin;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.contract.Expected;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.figure.ScoreFigures;
import org.modestead.nodes.words.TimeUnit;

/** Forecasts the holdout from later and later origins and scores the operator against naive methods. */
public final class BacktestNode implements Node {

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("backtest", "Backtest", NodeDeclaration.Stage.FORECAST,
                "Forecasts the holdout from later and later origins, refitted before each, and scores against naive"
                        + " methods.",
                description(), List.of(
                        "Tashman, Out-of-sample tests of forecasting accuracy, International Journal of Forecasting"
                                + " 16:437, 2000",
                        "Hyndman and Koehler, Another look at measures of forecast accuracy, International Journal of"
                                + " Forecasting 22:679, 2006",
                        "Gneiting and Raftery, Strictly proper scoring rules, prediction, and estimation, Journal of"
                                + " the American Statistical Association 102:359, 2007"),
                List.of("rolling origin", "accuracy", "baseline", "persistence", "seasonal naive", "drift", "coverage",
                        "refit"),
                List.of(Port.of("snapshots", PortType.SNAPSHOTS, "Snapshots", "The snapshots that were fitted, or new ones"
                                + " from a Model Applier, with a holdout."),
                        Port.of("operator", PortType.OPERATOR, "Operator", "The fitted operator; its estimator, rank and"
                                + " ridge are used again."),
                        Port.optional("verdict", PortType.VERDICT, "Verdict", "Decides between modes and projection.")),
                List.of(Port.table("scores", "Scores", "Errors, coverage and interval score by method and horizon, naive"
                                + " methods included.", ForecastTables.SCORES),
                        Port.of("errors", PortType.TABLE, "Errors", "Forecast minus observed by method, run, origin,"
                                + " horizon and channel, in recorded units.")),
                BacktestSettings.declared(), 1);
    }

    private static String description() {
        return """
                A forecast that was good once may have been lucky. The backtest forecasts the holdout from many origins, \
                each time knowing only what came before it: the training part and the same run up to the origin. Every \
                method starts from the same origins, so that their errors can be compared.

                Naive methods: persistence (as it is), the seasonal naive method (as one season ago), drift (the line \
                through the first and last known sample) and mean (as on average so far). An operator that does not beat \
                them must not be used to forecast. Errors are root mean square (rmse), mean absolute (mae) and scaled by \
                the naive error in training (mase), over all lead times up to the horizon.

                Bands are split-conformal, calibrated on the calibration part, else on the first half of the holdout, with \
                the operator as it was fitted. Coverage should come near the share asked for; the interval score adds up \
                width and fines for misses, smaller is better. Where calibration has ten origins or more, the summary also \
                takes each method as a distribution, its value with its errors of calibration around it, and gives the mean \
                continuous ranked probability score (CRPS): in the unit of the errors, smaller is better. Where everything \
                observed is positive and nothing near zero, it tells the errors in percent as well. Successive times are not \
                independent, so with few origins all of these scatter.

                Left to itself the node judges the modes where the verdict lets them stand, the projection otherwise; \
                both are scored. Where decisions on pressure, structures or grids hang on a forecast, keep the usual safety \
                margins; local codes and licensed practice come first. Cost: one fit an origin.""";
    }

    @Override
    public Expected expect(Expected inputs, Settings settings, RunContext context) {
        Optional<TimeAxis> time = Optional.ofNullable(inputs.values().get("snapshots")).flatMap(Outlook::time);
        return new Expected(time.map(axis -> Map.of("errors", ForecastTables.errorColumns(axis))).orElse(Map.of()), Map.of());
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Snapshots snapshots = inputs.get("snapshots", Snapshots.class);
        BacktestResult result = RollingOrigin.run(snapshots, inputs.get("operator", FittedOperator.class),
                inputs.find("verdict", Verdict.class), BacktestSettings.plan(settings), context.progress());
        return new NodeResult(Map.of("scores", ForecastTables.scores(result.scores()), "errors",
                ForecastTables.errors(result, snapshots, context.progress())), List.of(ScoreFigures.figure(result.scores(), new TimeUnit(snapshots.time().unit()))),
                result.summary(), result.doubts());
    }
}
