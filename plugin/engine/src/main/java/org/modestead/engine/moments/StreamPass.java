package org.modestead.engine.moments;

import java.util.Optional;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.recording.GapPolicy;
import org.modestead.engine.recording.MissingPolicy;
import org.modestead.engine.recording.SizeLimits;
import org.modestead.engine.recording.Snapshots.Part;

/**
 * Reads the rows of one recording, or of some of its runs or slices of runs, in the order of run and time, and leaves their {@link Moments}.
 * Memory does not grow with the rows. For one thread.
 *
 * <p>Runs are cut where the fit in memory cuts them: at steps longer than the gap factor times the usual one, at rows with a missing cell, and
 * where a part that is kept away begins or ends; pieces with too few samples for two states are left out. All other
 * steps must be even, to 1e-6 of the step and four units in the last place of the time.
 */
public final class StreamPass {

    /** Samples that are summed up at once; a fixed number, so that sums do not depend on how rows arrive. */
    static final int BLOCK = 1024;

    private static final double RELATIVE_TOLERANCE = 1e-6;
    private static final int ROUNDING_ULPS = 4;

    private final StreamPlan plan;
    private final Optional<Pilot> pilot;
    private final double step;
    private final Optional<PairSums> pairs;
    private final StretchSampler sampler;
    private final Piece piece;
    private final CompensatedSums.Running excess = new CompensatedSums.Running(CompensatedSums.zero(1, 1));
    private ChannelMoments channels;
    private String run = "";
    private double start;
    private double last = Double.NaN;
    private boolean afterGap;
    private long stretch = -1;
    private Part part = Part.TRAINING;
    private long rows;
    private long runs;
    private long gaps;
    private long missing;
    private long scattered;
    private long training;
    private long steps;

    private StreamPass(StreamPlan plan, double step, Optional<Pilot> pilot) {
        this.plan = plan;
        this.pilot = pilot;
        this.step = step;
        this.pairs = pilot.map(known -> new PairSums(plan, known));
        this.sampler = new StretchSampler(plan);
        this.piece = new Piece(plan.channels().size(), plan.pairReach(), Math.max(BLOCK, plan.samplesNeeded()));
        this.channels = ChannelMoments.none(plan.channels().size());
    }

    /** A pass that sums up snapshot pairs. */
    public static StreamPass summing(StreamPlan plan, Pilot pilot) {
        return new StreamPass(plan, pilot.step(), Optional.of(pilot));
    }

    /**
     * A pass that learns what a pilot needs.
     *
     * @param step usual time from row to row, positive
     */
    public static StreamPass survey(StreamPlan plan, double step) {
        return new StreamPass(plan, step, Optional.empty());
    }

    /**
     * Begins a run, or a slice of one.
     *
     * @param name of the run, not that of one before
     * @param first time of the run's first row, from which stretches are counted
     * @param whole whether the run begins here; false for later slices of it, whose first row then follows a gap unless it is borrowed: rows
     *     are to be borrowed as far as {@link StreamPlan#sliceReach} says
     */
    public void begin(String name, double first, boolean whole) {
        end();
        run = name;
        start = first;
        last = Double.NaN;
        afterGap = !whole;
        stretch = -1;
        runs += whole ? 1 : 0;
    }

    /**
     * Takes the next row of the run.
     *
     * @param time later than that of the row before
     * @param values one a channel, NaN where missing; not kept
     * @param own whether it is counted here; false for rows that a neighbouring slice counts, before or after all own ones
     * @throws RecordingFault if times do not rise or are not even, if a value is infinite, or if a gap or a missing cell is refused
     */
    public void row(double time, double[] values, boolean own) {
        rows += own ? 1 : 0;
        long index = checkTime(time, own);
        boolean complete = isComplete(time, values, own);
        long number = index / plan.keeping().stretch();
        if (number != stretch) {
            stretch = number;
            enter(plan.keeping().apart().of(plan.keeping().seed(), run, stretch));
        }
        if (complete) {
            take(time, values, own);
        }
        last = time;
    }

    private void enter(Part next) {
        if (next != part) {
            closePiece();
            part = next;
        }
    }

    private void take(double time, double[] values, boolean own) {
        if (own) {
            sampler.add(run, stretch, part, time, values);
        }
        if (part == Part.TRAINING) {
            if (piece.isFull()) {
                count();
                piece.carry();
            }
            piece.add(time, values, own);
        }
    }

    /** Returns the number of the row in its run, as its time tells it. */
    private long checkTime(double time, boolean own) {
        if (!Double.isFinite(time)) {
            throw new RecordingFault("run " + run, "the time " + time, "give every row a finite time or leave the row out");
        }
        if (!Double.isNaN(last)) {
            checkStep(time, time - last, own);
        } else if (afterGap && own) {
            gap(time, plan.sliceReach() * step);
            gaps++;
        }
        return Math.max(0, Math.round((time - start) / step));
    }

    private void checkStep(double time, double taken, boolean own) {
        double tolerance = RELATIVE_TOLERANCE * step + ROUNDING_ULPS * Math.ulp(Math.max(Math.abs(time), Math.abs(last)));
        if (!(taken > 0)) {
            throw new RecordingFault("run " + run, "the time " + plan.time().format(time) + " after " + plan.time().format(last),
                    "put the rows in order of run and time, one row a time");
        } else if (taken > plan.gapFactor() * step + tolerance) {
            gap(time, taken);
            gaps += own ? 1 : 0;
        } else if (Math.abs(taken - step) > tolerance) {
            throw new RecordingFault("run " + run, "a step of " + taken + " before " + plan.time().format(time) + ", the usual one is " + step,
                    "resample the recording to an even step before, or fit in memory");
        } else if (own) {
            excess.add(0, taken - step);
            steps++;
        }
    }

    private void gap(double time, double taken) {
        if (plan.gaps() == GapPolicy.REFUSE) {
            throw new RecordingFault("run " + run, "a gap of " + taken + " before " + plan.time().format(time) + ", the usual step is " + step,
                    "have gaps split, or raise the gap factor");
        }
        closePiece();
    }

    private boolean isComplete(double time, double[] values, boolean own) {
        for (int c = 0; c < plan.channels().size(); c++) {
            if (!SizeLimits.holds(values[c]) && !Double.isNaN(values[c])) {
                throw SizeLimits.tooLarge("run " + run + ", time " + plan.time().format(time) + ", channel " + plan.channels().get(c).name(), values[c]);
            }
            if (Double.isNaN(values[c])) {
                if (plan.missing() == MissingPolicy.REFUSE) {
                    throw new RecordingFault("run " + run + ", time " + plan.time().format(time) + ", channel "
                            + plan.channels().get(c).name(), "the cell has no number", "fill the cells, or have runs split there");
                }
                missing += own ? 1 : 0;
                closePiece();
                return false;
            }
        }
        return true;
    }

    /** Ends the piece: nothing is paired across. */
    private void closePiece() {
        count();
        piece.clear();
        sampler.close();
    }

    private void count() {
        int from = piece.firstNew();
        int to = piece.endNew();
        if (from >= to) {
            return;
        }
        if (!piece.isLongEnough(plan.samplesNeeded())) {
            scattered += to - from;
            return;
        }
        training += to - from;
        channels = channels.plus(ChannelMoments.of(piece.values(), plan.channels().size(), from, to));
        int first = Math.max(0, from - plan.pairReach());
        int end = to - plan.pairReach();
        pairs.ifPresent(sums -> sums.add(piece.times(), piece.values(), first, end));
    }

    private void end() {
        closePiece();
    }

    /** Returns what all rows so far leave; the pass is over. */
    public Moments finish() {
        end();
        PairMoments summed = pairs.map(PairSums::total).orElseGet(() -> PairMoments.none(0, 0));
        return new Moments(plan, pilot, new RowCounts(rows, runs, gaps, missing, scattered, training), channels,
                new StepMoments(step, steps, excess.total()), summed, sampler.of(Part.TRAINING), sampler.of(Part.CALIBRATION),
                sampler.of(Part.HOLDOUT));
    }
}
