package org.modestead.engine.recording;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.OptionalDouble;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;

/**
 * What a fit reads: runs after gap policy, resampling, detrending and scaling, split into the parts that fit,
 * calibrate and judge. Delay embedding is applied on demand by {@link #states(Part)}.
 *
 * @param channels the n channels kept
 * @param inputs the q inputs kept
 * @param time time axis of the recording
 * @param training prepared runs that a fit may see, at least one
 * @param calibration prepared runs kept for the width of forecast bands, possibly none
 * @param holdout prepared runs that only judge, possibly none; a tail carries its history as {@link Run#leadIn()}
 * @param step uniform time step of every run, empty when uneven times were kept
 * @param delay delay coordinates; depth 1 when {@code step} is empty
 * @param preparation how recorded values became prepared ones
 * @param smoothing what smoothing did to the prepared values
 * @param facts what was done to the data, for the summary and the report
 * @param doubts what a reader of the results must know
 */
public record Snapshots(
        List<Channel> channels,
        List<Channel> inputs,
        TimeAxis time,
        List<Run> training,
        List<Run> calibration,
        List<Run> holdout,
        OptionalDouble step,
        DelayEmbedding delay,
        Preparation preparation,
        Smoothing smoothing,
        List<Fact> facts,
        List<Doubt> doubts) {

    /** Which runs are meant. */
    public enum Part {
        /** Runs that a fit may see. */
        TRAINING,
        /** Runs kept for the width of forecast bands. */
        CALIBRATION,
        /** Runs that only judge. */
        HOLDOUT
    }

    /**
     * One line about what was done to the data.
     *
     * @param item what, for example {@code missing cells}
     * @param value how much, for example {@code 17 of 24000, interpolated}
     */
    public record Fact(String item, String value) {}

    /** Takes immutable copies and checks what can be checked. */
    public Snapshots {
        channels = List.copyOf(channels);
        inputs = List.copyOf(inputs);
        Objects.requireNonNull(time);
        training = List.copyOf(training);
        calibration = List.copyOf(calibration);
        holdout = List.copyOf(holdout);
        Objects.requireNonNull(step);
        Objects.requireNonNull(delay);
        Objects.requireNonNull(preparation);
        Objects.requireNonNull(smoothing);
        facts = List.copyOf(facts);
        doubts = List.copyOf(doubts);
        if (step.isEmpty() && delay.depth() > 1) {
            throw new IllegalArgumentException("delay coordinates need a uniform step");
        }
    }

    /** Snapshots that were not smoothed. */
    public Snapshots(List<Channel> channels, List<Channel> inputs, TimeAxis time, List<Run> training, List<Run> calibration, List<Run> holdout,
            OptionalDouble step, DelayEmbedding delay, Preparation preparation, List<Fact> facts, List<Doubt> doubts) {
        this(channels, inputs, time, training, calibration, holdout, step, delay, preparation, Smoothing.none(channels.size()), facts, doubts);
    }

    /** Returns the same snapshots with runs that were smoothed. */
    Snapshots with(Smoothing applied, List<Run> fits, List<Run> calibrates, List<Run> judges) {
        return new Snapshots(channels, inputs, time, fits, calibrates, judges, step, delay, preparation, applied, facts, doubts);
    }

    /**
     * Returns the same snapshots with other runs that fit and judge, and none that calibrate.
     *
     * @param fits as prepared
     * @param judges as prepared
     * @param was what smoothing did to them
     */
    public Snapshots replaced(List<Run> fits, List<Run> judges, Smoothing was) {
        return with(was, fits, List.of(), judges);
    }

    /** Returns the runs of one part, prepared but not embedded. */
    public List<Run> runs(Part part) {
        return switch (part) {
            case TRAINING -> training;
            case CALIBRATION -> calibration;
            case HOLDOUT -> holdout;
        };
    }

    /** Returns the number of state components N = channels * delay depth. */
    public int stateSize() {
        return channels.size() * delay.depth();
    }

    /**
     * Returns the delay-embedded states of one part, one entry a run that is long enough for at least one state;
     * training runs of weight 0 take no part.
     *
     * @param part which runs
     * @return possibly empty, never null
     */
    public List<StateRun> states(Part part) {
        List<StateRun> embedded = new ArrayList<>();
        for (Run run : runs(part)) {
            boolean counts = part != Part.TRAINING || run.weight() > 0;
            if (counts && run.samples() > delay.reach()) {
                embedded.add(embed(run));
            }
        }
        return embedded;
    }

    /**
     * Embeds one prepared run. States of delay depth 1 are the run's samples themselves, which are not copied.
     *
     * @param run prepared, longer than the reach of the delays
     * @return samples - reach states
     */
    public StateRun embed(Run run) {
        int reach = delay.reach();
        int count = run.samples() - reach;
        int n = channels.size();
        if (delay.depth() == 1 && reach == 0) {
            return new StateRun(run.id(), run.times(), run.values(), run.inputs(), run.weight());
        }
        double[] times = new double[count];
        System.arraycopy(run.times(), reach, times, 0, count);
        DMatrixRMaj states = new DMatrixRMaj(count, stateSize());
        DMatrixRMaj known = new DMatrixRMaj(count, inputs.size() * (reach + 1));
        for (int k = 0; k < count; k++) {
            for (int d = 0; d < delay.depth(); d++) {
                int sample = k + reach - d * delay.spacing();
                System.arraycopy(run.values().data, sample * n, states.data, k * states.numCols + d * n, n);
            }
            for (int back = 0; back <= reach; back++) {
                System.arraycopy(run.inputs().data, (k + reach - back) * inputs.size(), known.data, k * known.numCols + back * inputs.size(),
                        inputs.size());
            }
        }
        return new StateRun(run.id(), times, states, known, run.weight());
    }
}
