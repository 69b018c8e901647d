package org.modestead.engine.forecast;

import java.util.List;
import org.modestead.engine.forecast.Backtest.Errors;

/**
 * What the bands are calibrated on and which holdout origins may therefore judge them.
 *
 * <p>The calibration part where there is one, and every holdout origin judges. Else the first half of the holdout:
 * of its runs, or of the samples of a single run; then only origins in the second half judge. No sample serves both.
 *
 * @param calibration series to calibrate on, possibly none
 * @param firstSeries index of the first holdout series that judges
 * @param firstOrigin first origin in that series that judges
 * @param halved whether the holdout had to be cut in half
 * @param words what is calibrated on, for the summary; empty when nothing is
 */
record BandSource(List<Series> calibration, int firstSeries, int firstOrigin, boolean halved, String words) {

    /**
     * @param calibration series of the calibration part, possibly none
     * @param holdout series of the holdout part, possibly none
     * @param memory samples of history that the fitted operator needs
     */
    static BandSource of(List<Series> calibration, List<Series> holdout, int memory) {
        if (calibration.stream().anyMatch(series -> series.ahead(memory) > 0)) {
            return new BandSource(calibration, 0, 0, false, "the calibration part");
        }
        if (holdout.size() > 1) {
            int half = (holdout.size() + 1) / 2;
            return new BandSource(holdout.subList(0, half), half, 0, true, "the first half of the holdout runs");
        }
        if (holdout.size() == 1 && holdout.get(0).ahead(memory) > 1) {
            Series only = holdout.get(0);
            int middle = only.length() - only.ahead(memory) / 2;
            return new BandSource(List.of(only.before(middle)), 0, middle - 1, true, "the first half of the holdout");
        }
        return new BandSource(List.of(), 0, 0, false, "");
    }

    /** Returns whether an origin may judge the bands. */
    boolean judges(Errors errors) {
        return errors.series() > firstSeries || errors.series() == firstSeries && errors.origin() >= firstOrigin;
    }
}
