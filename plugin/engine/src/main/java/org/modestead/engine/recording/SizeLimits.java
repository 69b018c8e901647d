package org.modestead.engine.recording;

import java.util.List;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.RecordingFault;

/**
 * Between which sizes times and values of a recording may lie: 1e-100 to 1e100, or 0. Sums of products of squares leave the range of
 * double precision (2.2e-308 to 1.8e308) beyond. Such numbers are marks for what is missing, or units gone wrong.
 */
public final class SizeLimits {

    private static final double LARGEST = 1e100;
    private static final double SMALLEST = 1e-100;

    private SizeLimits() {}

    /** Returns whether a number is known and not too large. */
    public static boolean holds(double value) {
        return Math.abs(value) <= LARGEST;
    }

    /**
     * Returns the refusal of a value that is too large.
     *
     * @param where its place
     * @param value beyond the limit
     */
    public static RecordingFault tooLarge(String where, double value) {
        return Double.isInfinite(value) ? new RecordingFault(where, "the value is " + value, "replace it by a finite number or leave the cell empty")
                : new RecordingFault(where, "the value is " + Wording.number(value), "leave the cell empty if such a number marks what is missing,"
                        + " or take a larger unit, so that values do not pass " + LARGEST);
    }

    /** Returns what is wrong with a time, beside that of the sample before. */
    static Optional<RecordingFault> ofTime(String where, double time, double step) {
        if (!holds(time)) {
            return Optional.of(new RecordingFault(where, "the time is " + Wording.number(time), "count times from a nearer origin or in a larger"
                    + " unit, so that they do not pass " + LARGEST));
        }
        return step >= SMALLEST ? Optional.empty() : Optional.of(new RecordingFault(where, "the time is " + Wording.number(step)
                + " after the one before", "count times in a smaller unit, so that steps reach " + SMALLEST));
    }

    /** Returns the refusal of a channel or an input of numbers that are all too small; 0 throughout is none. */
    static Optional<RecordingFault> ofColumn(Recording recording, int column, boolean input) {
        double largest = 0;
        for (Run run : recording.runs()) {
            DMatrixRMaj values = input ? run.inputs() : run.values();
            for (int i = 0; i < run.samples() && largest < SMALLEST; i++) {
                largest = Math.max(largest, size(values.get(i, column)));
            }
        }
        String name = input ? "input " + recording.inputs().get(column).name() : "channel " + recording.channels().get(column).name();
        return largest == 0 || largest >= SMALLEST ? Optional.empty() : Optional.of(new RecordingFault(name, "its largest value is "
                + Wording.number(largest), "take a smaller unit, so that values reach " + SMALLEST));
    }

    /**
     * Refuses samples, most likely kept away from the fit, that are too large for the scales of the training samples.
     *
     * @param run its name
     * @param prepared samples x channels
     */
    static void requirePrepared(String run, DMatrixRMaj prepared, List<Channel> channels) {
        for (int k = 0; k < prepared.getNumElements(); k++) {
            if (!holds(prepared.data[k])) {
                int c = k % prepared.numCols;
                throw new RecordingFault("run " + run + ", channel " + channels.get(c).name(), "a value is " + Wording.number(prepared.data[k])
                        + " times the scale of the training samples", "leave the run out, choose other training runs, or no scaling");
            }
        }
    }

    private static double size(double value) {
        return Double.isNaN(value) ? 0 : Math.abs(value);
    }
}
