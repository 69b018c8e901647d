package org.modestead.engine.moments;

import java.util.Arrays;
import java.util.EnumMap;
import java.util.Map;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.recording.Snapshots.Part;

/** Collects the stretches that are kept, for one thread: only one is open at a time. */
final class StretchSampler {

    private static final long OTHER_DRAW = 0x5851f42d4c957f2dL;

    private final StreamPlan plan;
    private final int channels;
    private final Map<Part, KeptStretches> kept = new EnumMap<>(Part.class);
    private double[] times = new double[64];
    private double[] values;
    private int size;
    private String run = "";
    private long number = -1;
    private long draw;
    private Part part = Part.TRAINING;
    private boolean wanted;

    StretchSampler(StreamPlan plan) {
        this.plan = plan;
        this.channels = plan.channels().size();
        this.values = new double[64 * channels];
        for (Part each : Part.values()) {
            kept.put(each, KeptStretches.none(each, each == Part.TRAINING ? plan.keeping().training() : plan.keeping().judging()));
        }
    }

    /** Takes the next sample of a run; {@code ofNumber} is its stretch there. */
    void add(String ofRun, long ofNumber, Part ofPart, double time, double[] row) {
        if (size == 0 || ofNumber != number || ofPart != part || !ofRun.equals(run)) {
            close();
            run = ofRun;
            number = ofNumber;
            part = ofPart;
            draw = SeededDraw.of(plan.keeping().seed() + OTHER_DRAW, run, number);
            wanted = kept.get(part).wants(draw);
        }
        if (wanted) {
            grow();
            times[size] = time;
            System.arraycopy(row, 0, values, size * channels, channels);
        }
        size++;
    }

    private void grow() {
        if (size == times.length) {
            times = Arrays.copyOf(times, 2 * size);
            values = Arrays.copyOf(values, 2 * size * channels);
        }
    }

    /** Ends the open stretch. */
    void close() {
        if (size >= plan.samplesNeeded() && wanted) {
            kept.put(part, kept.get(part).with(new KeptStretch(draw, part, run, Arrays.copyOf(times, size),
                    DMatrixRMaj.wrap(size, channels, Arrays.copyOf(values, size * channels)))));
        } else {
            kept.put(part, kept.get(part).passed(size));
        }
        size = 0;
    }

    KeptStretches of(Part each) {
        return kept.get(each);
    }
}
