package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.forecast.Backtest.Errors;

/**
 * A forecast as a distribution: its value less each error that was made at the same lead time in calibration, all equally
 * likely. It judges a method as a whole, where a band shows two quantiles only.
 *
 * @param errors per lead time and channel the errors of calibration, prepared units
 */
record ErrorDistribution(List<List<EqualChances>> errors) {

    /** Fewer errors are no distribution: their steps would be seen more than its shape. */
    private static final int FEWEST = 10;

    /**
     * @param calibration errors on data the fit never saw, possibly none
     * @param leads longest lead time in steps
     * @param channels n
     */
    static ErrorDistribution of(List<Errors> calibration, int leads, int channels) {
        List<List<EqualChances>> out = new ArrayList<>();
        for (int lead = 1; lead <= leads; lead++) {
            List<EqualChances> at = new ArrayList<>();
            for (int c = 0; c < channels; c++) {
                at.add(EqualChances.of(errors(calibration, lead, c)));
            }
            out.add(List.copyOf(at));
        }
        return new ErrorDistribution(List.copyOf(out));
    }

    private static double[] errors(List<Errors> calibration, int lead, int channel) {
        return calibration.stream().filter(e -> e.leads() >= lead).mapToDouble(e -> e.values().get(lead - 1, channel)).toArray();
    }

    /**
     * Returns the continuous ranked probability score of an error made at a lead time (from 1), prepared units: that of the
     * forecast's distribution at what was observed, mirrored. NaN where calibration reaches the lead too seldom.
     */
    double score(int lead, int channel, double error) {
        EqualChances made = errors.get(lead - 1).get(channel);
        return made.count() < FEWEST ? Double.NaN : made.crps(error);
    }
}
