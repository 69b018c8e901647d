package org.modestead.engine.spectrum;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Preparation;

/** The shape of a mode: its joint weights by channel and delay, in recorded units. */
public final class ModeShapes {

    private ModeShapes() {}

    /**
     * One component of a shape.
     *
     * @param channel measured quantity
     * @param channelIndex 0-based
     * @param delay 0 for the newest sample, then 1, 2, ... delay spacings earlier
     * @param magnitude in the channel's unit, at least 0, per unit of the eigenfunction
     * @param phase in radians in (-π, π], relative to the largest component of the newest sample
     */
    public record Entry(Channel channel, int channelIndex, int delay, double magnitude, double phase) {}

    /**
     * @param spectrum the mode's
     * @param mode one of it
     * @param preparation of the snapshots, for the channels' scales
     * @return one entry a state component, delay by delay
     */
    public static List<Entry> of(Spectrum spectrum, Mode mode, Preparation preparation) {
        int n = spectrum.channels().size();
        double reference = reference(mode, preparation, n);
        List<Entry> entries = new ArrayList<>();
        for (int component = 0; component < mode.weights().size(); component++) {
            int channel = component % n;
            Complex weight = mode.weights().get(component).times(preparation.scale()[channel]);
            entries.add(new Entry(spectrum.channels().get(channel), channel, component / n, weight.abs(), turned(weight.arg() - reference)));
        }
        return entries;
    }

    private static double reference(Mode mode, Preparation preparation, int n) {
        int largest = 0;
        for (int k = 1; k < n; k++) {
            boolean larger = mode.weights().get(k).abs() * preparation.scale()[k]
                    > mode.weights().get(largest).abs() * preparation.scale()[largest] * (1 + 1e-9);
            largest = larger ? k : largest;
        }
        return mode.weights().get(largest).arg();
    }

    private static double turned(double phase) {
        double wrapped = Math.IEEEremainder(phase, 2 * Math.PI);
        return wrapped <= -Math.PI ? wrapped + 2 * Math.PI : wrapped;
    }
}
