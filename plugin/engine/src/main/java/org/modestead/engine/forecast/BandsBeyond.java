package org.modestead.engine.forecast;

import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Progress;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.spread.ForecastSpread;
import org.modestead.engine.spread.SpreadPlan;

/**
 * Bands beyond the lead H up to which errors could be calibrated. There the calibrated half width goes on with what noise piles
 * up by the operator, and with the spread of forecasts that another recording would have brought, of which the calibrated errors
 * hold what shows at H already:
 *
 * <pre>    w(h)² = (w(H) s(h)/s(H))² + max(0, f(h)² - f(H)²),    h &gt; H</pre>
 *
 * <p>with s and f as in {@link ForecastSpread}. Up to H errors on data the fit never saw contain both, and nothing is added. Unlike the
 * calibrated band this one rests on the operator: where that is wrong, the band is too.
 *
 * @param calibrated bands
 * @param spread of forecasts
 * @param noise s, leads x n
 */
record BandsBeyond(Bands calibrated, ForecastSpread spread, DMatrixRMaj noise) {

    private static final int REPLICATES = 200;
    private static final long SEED = 1;

    /**
     * @param task with a horizon beyond the bands, or not
     * @param operator behind the forecast
     * @param bands calibrated
     * @return empty where the bands reach the horizon or there are none, and where {@link ForecastSpread} cannot be told
     */
    static Optional<BandsBeyond> of(ForecastTask task, FittedOperator operator, Bands bands, Progress progress) {
        if (bands.reach() == 0 || bands.reach() >= task.steps()) {
            return Optional.empty();
        }
        SpreadPlan plan = new SpreadPlan(REPLICATES, task.plan().coverage(), SEED);
        return ForecastSpread.of(operator, plan, progress).map(spread -> new BandsBeyond(bands, spread, spread.noise(task.steps())));
    }

    /**
     * Returns the half widths of a forecast from a state, calibrated ones and those beyond.
     *
     * @param state 1 x N
     * @param steps longest lead
     * @return steps x n, prepared units; NaN where there is no band
     */
    DMatrixRMaj halfWidths(DMatrixRMaj state, int steps) {
        int reach = calibrated.reach();
        DMatrixRMaj fit = spread.fit(state, steps);
        DMatrixRMaj out = new DMatrixRMaj(steps, fit.numCols);
        for (int c = 0; c < fit.numCols; c++) {
            for (int lead = 1; lead <= steps; lead++) {
                double half = lead <= reach ? calibrated.halfWidth(lead, c) : beyond(lead, reach, c, fit);
                out.set(lead - 1, c, Double.isFinite(half) ? half : Double.NaN);
            }
        }
        return out;
    }

    private double beyond(int lead, int reach, int channel, DMatrixRMaj fit) {
        double before = noise.get(reach - 1, channel);
        double growth = before > 0 ? noise.get(lead - 1, channel) / before : 1;
        double more = Math.pow(fit.get(lead - 1, channel), 2) - Math.pow(fit.get(reach - 1, channel), 2);
        return Math.hypot(calibrated.halfWidth(reach, channel) * growth, Math.sqrt(Math.max(0, more)));
    }
}
