package org.modestead.engine.moments;

import java.util.List;
import java.util.Objects;
import java.util.OptionalDouble;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.GapPolicy;
import org.modestead.engine.recording.MissingPolicy;
import org.modestead.engine.recording.Scaling;
import org.modestead.engine.recording.TimeAxis;

/**
 * What is asked of a fit in one pass. Recorded times are kept and must be even between gaps: rows are not resampled, and nothing is
 * interpolated, since that needs what comes later.
 *
 * @param channels the n channels, at least one
 * @param time how times were written
 * @param step usual time from row to row, positive; empty = the median over the first rows
 * @param gapFactor a step is a gap when it is longer than this many usual ones, above 1
 * @param gaps split or refuse
 * @param missing split or refuse
 * @param centred whether the mean of every channel is taken off
 * @param scaling what every channel is divided by
 * @param delay delay coordinates
 * @param stride sampling steps per application of the operator, at least 1
 * @param features functions of the state
 * @param keeping what is kept of the recording
 */
public record StreamPlan(
        List<Channel> channels,
        TimeAxis time,
        OptionalDouble step,
        double gapFactor,
        GapPolicy gaps,
        MissingPolicy missing,
        boolean centred,
        Scaling scaling,
        DelayEmbedding delay,
        int stride,
        Features features,
        Keeping keeping) {

    /** Checks what can be checked. */
    public StreamPlan {
        channels = List.copyOf(channels);
        Objects.requireNonNull(time);
        Objects.requireNonNull(step);
        Objects.requireNonNull(scaling);
        Objects.requireNonNull(delay);
        Objects.requireNonNull(features);
        Objects.requireNonNull(keeping);
        if (channels.isEmpty()) {
            throw new RecordingFault("recording", "it has no channel", "name at least one column as a channel");
        }
        if (step.isPresent() && !(step.getAsDouble() > 0 && Double.isFinite(step.getAsDouble()))) {
            throw new IllegalArgumentException("a step of " + step.getAsDouble());
        }
        if (!(gapFactor > 1) || stride < 1) {
            throw new IllegalArgumentException("gap factor " + gapFactor + ", stride " + stride);
        }
        if (gaps == GapPolicy.INTERPOLATE || missing == MissingPolicy.INTERPOLATE) {
            throw new RecordingFault("recording", "interpolation was asked for, which needs the rows that follow",
                    "split or refuse, or fit in memory");
        }
    }

    /** Returns the number of state components N. */
    public int stateSize() {
        return channels.size() * delay.depth();
    }

    /** Returns the samples that two states need. */
    int samplesNeeded() {
        return delay.reach() + 2;
    }

    /** Returns the samples before the newest one of a later state that its pair reaches back. */
    public int pairReach() {
        return delay.reach() + stride;
    }

    /** Returns how many steps beyond its borders a slice of a run must know the rows, so that pairs, gaps and the length of pieces are as in the run. */
    public long sliceReach() {
        return Math.max(pairReach() + 2L, (long) Math.ceil(gapFactor) + 1);
    }

    /** Returns whether a pass over all rows must come before the one that sums. */
    public boolean needsSurvey() {
        return features.needsSurvey(centred || scaling != Scaling.NONE);
    }
}
