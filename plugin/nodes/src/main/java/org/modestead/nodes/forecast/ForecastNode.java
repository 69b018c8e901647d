package org.modestead.nodes.forecast;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.forecast.ForecastResult;
import org.modestead.engine.forecast.Forecaster;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.spectrum.Spectrum;
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
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.figure.ForecastFigures;
import org.modestead.nodes.figure.ScoreFigures;
import org.modestead.nodes.words.TimeUnit;

/** Rebuilds what was recorded, forecasts with bands, and scores the forecast against naive methods. */
public final class ForecastNode implements Node {

    private static final int MOST_CHANNELS_DRAWN = 6;

    @Override
    public NodeDeclaration declaration() {
        return new NodeDeclaration("forecast", "Reconstruction and Forecast", NodeDeclaration.Stage.FORECAST,
                "Rebuilds the recording, forecasts it with bands, and scores the forecast against naive methods.",
                description(), List.of(
                        "Hyndman and Koehler, Another look at measures of forecast accuracy, International Journal of"
                                + " Forecasting 22:679, 2006",
                        "Vovk, Gammerman and Shafer, Algorithmic Learning in a Random World, Springer, 2005",
                        "Gneiting and Raftery, Strictly proper scoring rules, prediction, and estimation, Journal of"
                                + " the American Statistical Association 102:359, 2007"),
                List.of("prediction", "forecast", "reconstruction", "interval", "conformal", "backtest", "baseline",
                        "persistence"),
                List.of(Port.of("snapshots", PortType.SNAPSHOTS, "Snapshots", "The snapshots that were fitted, or new ones from a Model Applier."),
                        Port.of("operator", PortType.OPERATOR, "Operator", "The fitted operator."),
                        Port.of("spectrum", PortType.SPECTRUM, "Spectrum", "Its modes."),
                        Port.optional("verdict", PortType.VERDICT, "Verdict", "Decides between modes and projection;"
                                + " without it the projection is used unless the route is set.")),
                List.of(Port.of("forecast", PortType.TABLE, "Forecast", "Forecast values with bands by run, time and"
                        + " channel, in recorded units."),
                        Port.of("reconstruction", PortType.TABLE, "Reconstruction", "Observed and rebuilt values by"
                                + " run, time and channel, in recorded units."),
                        Port.table("scores", "Scores", "Errors and coverage on the holdout by method and horizon, naive"
                                + " methods included.", ForecastTables.SCORES)),
                ForecastSettings.declared(), 1);
    }

    private static String description() {
        return """
                By modes, a state is split into its modes, and each is carried forward at its own rate: right where the \
                modes stand. By projection, the compressed operator is applied step after step, without modes: a forecast \
                may be good although no mode exists. Left to itself the node goes by the verdict.

                Bands are split-conformal: as wide as the errors on the calibration part were, horizon by horizon; \
                without one, on the first half of the holdout, which then is not scored. They hold their share of \
                observations if errors stay as they were; a changed plant breaks them, and successive times are not \
                independent. Beyond the leads that calibration reaches, the band of a step map goes on: what one step leaves \
                over piles up by the operator, and fits to resampled runs differ more and more. It is then as good as the \
                operator, and a doubt says from where on.

                Scores come from the holdout, from many starts. Errors are root mean square (rmse), mean absolute (mae) \
                and scaled by the one-step naive error in training (mase, below 1 is better than naive). Compare with \
                the naive methods in the same table (persistence, the same season last time, drift, the mean so far): a \
                model that does not beat them must not be used. Errors are in recorded units where all channels share \
                one, in prepared units otherwise.

                Where decisions on pressure, structures or grids hang on a forecast, keep the usual safety margins; local \
                codes and licensed practice come first. Cost: starts times horizon times the square of the rank.""";
    }

    @Override
    public Expected expect(Expected inputs, Settings settings, RunContext context) {
        Optional<TimeAxis> time = Optional.ofNullable(inputs.values().get("snapshots")).flatMap(Outlook::time);
        return new Expected(time.map(axis -> Map.of("forecast", ForecastTables.forecastColumns(axis), "reconstruction",
                ForecastTables.reconstructionColumns(axis))).orElse(Map.of()), Map.of());
    }

    @Override
    public NodeResult run(NodeInputs inputs, Settings settings, RunContext context) {
        Snapshots snapshots = inputs.get("snapshots", Snapshots.class);
        ForecastResult result = Forecaster.run(snapshots, inputs.get("operator", FittedOperator.class),
                inputs.get("spectrum", Spectrum.class), inputs.find("verdict", Verdict.class),
                        ForecastSettings.plan(settings),
                context.progress());
        List<Figure> figures = new ArrayList<>(ForecastFigures.figures(snapshots, result, MOST_CHANNELS_DRAWN));
        if (!result.scores().isEmpty()) {
            figures.add(ScoreFigures.figure(result.scores(), new TimeUnit(snapshots.time().unit())));
        }
        return new NodeResult(Map.of("forecast", ForecastTables.forecast(result, snapshots, context.progress()), "reconstruction",
                ForecastTables.reconstruction(result, snapshots, context.progress()), "scores", ForecastTables.scores(result.scores())),
                figures, result.summary(), result.doubts());
    }
}
