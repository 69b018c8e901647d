package org.modestead.engine.moments;

import java.util.Comparator;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.recording.Snapshots.Part;

/**
 * An uninterrupted stretch of a run as recorded.
 *
 * @param draw by which it is kept or not
 * @param part that it belongs to
 * @param run name
 * @param times rising
 * @param values as recorded, one row a time
 */
public record KeptStretch(long draw, Part part, String run, double[] times, DMatrixRMaj values) {

    /** By draw; pieces of one stretch by time. */
    static final Comparator<KeptStretch> BY_DRAW = ((Comparator<KeptStretch>) (a, b) -> Long.compareUnsigned(a.draw, b.draw))
            .thenComparing(KeptStretch::run).thenComparing(KeptStretch::start);

    /** By run and time. */
    static final Comparator<KeptStretch> IN_ORDER = Comparator.comparing(KeptStretch::run).thenComparing(KeptStretch::start);

    double start() {
        return times[0];
    }

    /** Returns the number of samples. */
    public int samples() {
        return times.length;
    }
}
