package org.modestead.engine.moments;

import java.util.Arrays;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Scaling;

/** Offsets and scales from the moments of the channels, by the definitions of the snapshots in memory. */
final class StreamPreparation {

    /** A spread below this share of the largest value is rounding: some hundred units in the last place. */
    private static final double ROUNDING = 1e-13;

    private StreamPreparation() {}

    /** @throws RecordingFault if a channel that is to be scaled does not vary beyond rounding */
    static Preparation of(StreamPlan plan, ChannelMoments channels) {
        int n = plan.channels().size();
        double[] scale = new double[n];
        Arrays.fill(scale, 1);
        for (int c = 0; c < n && plan.scaling() != Scaling.NONE; c++) {
            scale[c] = scale(plan, channels, c);
        }
        return new Preparation(0, plan.centred() ? channels.mean().clone() : new double[n], new double[n], scale);
    }

    private static double scale(StreamPlan plan, ChannelMoments channels, int c) {
        Channel own = plan.channels().get(c);
        double sum = 0;
        double size = 0;
        int members = 0;
        for (int other = 0; other < plan.channels().size(); other++) {
            String unit = plan.channels().get(other).unit();
            if (other == c || plan.scaling() == Scaling.UNIT_GROUP && !own.unit().isEmpty() && own.unit().equals(unit)) {
                sum += channels.variance(other);
                size = Math.max(size, channels.largest(other));
                members++;
            }
        }
        double scale = Math.sqrt(sum / members);
        if (!(scale > ROUNDING * size)) {
            throw new RecordingFault("channel " + own.name(), "its training samples do not vary beyond rounding (standard deviation " + scale
                    + ")", "leave the channel out or choose another scaling");
        }
        return scale;
    }
}
