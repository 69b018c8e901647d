package org.modestead.nodes.figure;

import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;

/** One channel of a prepared run, back in the channel's unit. */
final class RecordedValues {
    private RecordedValues() {}

    static double[] of(Run run, int channel, Preparation preparation) {
        double[] values = new double[run.samples()];
        for (int i = 0; i < values.length; i++) {
            values[i] = preparation.restore(channel, run.times()[i], run.values().get(i, channel));
        }
        return values;
    }
}
