package org.modestead.engine.forecast;

import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;

/**
 * What turns an error in prepared units into one that may be pooled over channels.
 *
 * <p>With one channel, or channels of one known unit, errors go back to recorded units. Otherwise they stay in
 * prepared units: recorded error divided by the channel's scale, since metres and bars cannot be added.
 *
 * @param pooled per channel, factor from prepared to pooled error
 * @param scaled per channel, factor from prepared to scaled error (MASE): the channel's scale over its naive
 *     training error; NaN where that error is 0 or unknown
 * @param words the pooled unit, for the summary
 * @param mixed whether channels of different units are pooled although nothing scaled them
 */
record ErrorUnits(double[] pooled, double[] scaled, String words, boolean mixed) {

    /**
     * @param season m of the naive training error, at least 1
     */
    static ErrorUnits of(Snapshots snapshots, int season) {
        List<Channel> channels = snapshots.channels();
        double[] scale = snapshots.preparation().scale();
        String unit = channels.get(0).unit();
        boolean common = channels.size() == 1
                || !unit.isEmpty() && channels.stream().allMatch(channel -> channel.unit().equals(unit));
        double[] pooled = IntStream.range(0, scale.length).mapToDouble(c -> common ? scale[c] : 1).toArray();
        double[] scaled = IntStream.range(0, scale.length)
                .mapToDouble(c -> scale[c] / naive(snapshots, c, season)).toArray();
        boolean unscaled = IntStream.range(0, scale.length).allMatch(c -> scale[c] == 1);
        return new ErrorUnits(pooled, scaled, common ? recorded(unit) : "prepared units (each channel divided by its scale)",
                !common && unscaled);
    }

    private static String recorded(String unit) {
        return unit.isEmpty() ? "the recorded unit" : unit;
    }

    private static double naive(Snapshots snapshots, int channel, int season) {
        List<double[]> runs = snapshots.training().stream()
                .map(run -> recorded(run, channel, snapshots.preparation())).toList();
        double scale = Scores.naiveScale(runs, season);
        return scale > 0 ? scale : Double.NaN;
    }

    private static double[] recorded(Run run, int channel, Preparation preparation) {
        DMatrixRMaj values = run.values();
        return IntStream.range(0, run.samples())
                .mapToDouble(k -> preparation.restore(channel, run.times()[k], values.get(k, channel))).toArray();
    }
}
