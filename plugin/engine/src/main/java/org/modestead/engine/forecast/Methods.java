package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.spectrum.Spectrum;

/** The methods that are held against each other: both routes of the operator and the naive ones. */
final class Methods {

    private Methods() {}

    /**
     * @param task for step, season and preparation
     * @param operator that both routes use
     * @param spectrum of it
     * @param first the route that is judged, which comes first
     */
    static List<ForecastRoute> of(ForecastTask task, FittedOperator operator, Spectrum spectrum, Route first) {
        ForecastRoute modal = new ModalRoute(operator, spectrum, task.step());
        ForecastRoute projection = new ProjectionRoute(operator, task.step());
        boolean modes = first == Route.MODAL;
        List<ForecastRoute> out = new ArrayList<>(List.of(modes ? modal : projection, modes ? projection : modal));
        Preparation preparation = task.snapshots().preparation();
        out.add(new Persistence(preparation, task.step()));
        task.season().ifPresent(season -> out.add(new SeasonalNaive(preparation, task.step(), season)));
        out.add(new Drift(preparation, task.step()));
        out.add(new RunMean(preparation, task.step()));
        return out;
    }
}
