package org.modestead.engine.forecast;

import java.util.List;
import java.util.stream.DoubleStream;
import org.modestead.engine.forecast.Backtest.Errors;

/**
 * Half widths of split-conformal bands, per lead time and channel, in prepared units.
 *
 * <p>Each lead time and channel has its own threshold, from the absolute errors of all calibration origins that reach
 * that lead. Where these are fewer than 30, the errors at neighbouring leads join, by and by up to a quarter of the
 * lead on either side (one step at least). Where even they cannot carry the coverage asked for, or no calibration
 * origin reaches the lead, there is no band.
 *
 * @param halfWidths leads x n; NaN where there is no band
 */
record Bands(double[][] halfWidths) {

    private static final int ENOUGH = 30;

    /**
     * Calibrates.
     *
     * @param calibration errors on data the fit never saw, possibly none
     * @param leads longest lead time in steps
     * @param channels n
     * @param coverage in (0, 1)
     */
    static Bands of(List<Errors> calibration, int leads, int channels, double coverage) {
        int[] cumulative = cumulative(calibration, leads);
        double[][] halfWidths = new double[leads][channels];
        for (int lead = 1; lead <= leads; lead++) {
            int reach = window(cumulative, lead);
            for (int c = 0; c < channels; c++) {
                double width = SplitConformal.threshold(scores(calibration, lead, reach, c), coverage);
                halfWidths[lead - 1][c] = Double.isFinite(width) ? width : Double.NaN;
            }
        }
        return new Bands(halfWidths);
    }

    // Entry l: number of errors known at leads 1..l, from any origin.
    private static int[] cumulative(List<Errors> calibration, int leads) {
        int[] out = new int[leads + 1];
        for (int lead = 1; lead <= leads; lead++) {
            int reached = lead;
            out[lead] = out[lead - 1] + (int) calibration.stream().filter(e -> e.leads() >= reached).count();
        }
        return out;
    }

    // A lead that no origin reaches may not widen its window: shorter leads alone would promise too narrow a band.
    private static int window(int[] cumulative, int lead) {
        boolean reached = cumulative[lead] > cumulative[lead - 1];
        int most = reached ? Math.max(1, lead / 4) : 0;
        int reach = 0;
        while (reach < most && count(cumulative, lead, reach) < ENOUGH) {
            reach++;
        }
        return reach;
    }

    private static int count(int[] cumulative, int lead, int reach) {
        return cumulative[Math.min(cumulative.length - 1, lead + reach)] - cumulative[Math.max(0, lead - reach - 1)];
    }

    private static double[] scores(List<Errors> calibration, int lead, int reach, int channel) {
        return calibration.stream().flatMapToDouble(e -> scores(e, lead, reach, channel)).toArray();
    }

    private static DoubleStream scores(Errors errors, int lead, int reach, int channel) {
        DoubleStream.Builder out = DoubleStream.builder();
        for (int l = Math.max(1, lead - reach); l <= Math.min(errors.leads(), lead + reach); l++) {
            out.add(Math.abs(errors.values().get(l - 1, channel)));
        }
        return out.build();
    }

    /** Returns the half width at a lead time (from 1), NaN where there is no band. */
    double halfWidth(int lead, int channel) {
        return halfWidths[lead - 1][channel];
    }

    /** Returns up to which lead time every channel has a band, 0 for none. */
    int reach() {
        int lead = 0;
        while (lead < halfWidths.length && DoubleStream.of(halfWidths[lead]).noneMatch(Double::isNaN)) {
            lead++;
        }
        return lead;
    }
}
