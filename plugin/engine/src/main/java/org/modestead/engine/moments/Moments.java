package org.modestead.engine.moments;

import java.util.Objects;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * All that a pass over rows leaves: sums over snapshot pairs, moments of the channels, counts, and a sample of stretches. Immutable; passes over
 * different rows of one plan and one pilot merge in any order and grouping, to the bounds told in {@link CompensatedSums} and, for the channels, to
 * rounding. A block of b pairs is summed up in plain arithmetic before, whose error is at most {@code b u Σ |f_i f_j|} over the block.
 *
 * @param plan what was asked
 * @param pilot by which pairs were summed up; empty for a survey
 * @param counts of rows
 * @param channels of samples that train
 * @param steps even steps
 * @param pairs sums over pairs, without any for a survey
 * @param training kept of what trains
 * @param calibration kept of what calibrates
 * @param holdout kept of what judges
 */
public record Moments(
        StreamPlan plan,
        Optional<Pilot> pilot,
        RowCounts counts,
        ChannelMoments channels,
        StepMoments steps,
        PairMoments pairs,
        KeptStretches training,
        KeptStretches calibration,
        KeptStretches holdout) {

    /** Checks that all is there. */
    public Moments {
        Objects.requireNonNull(plan);
        Objects.requireNonNull(pilot);
    }

    /** Returns what both passes leave together. The other's plan and pilot must be the same. */
    public Moments plus(Moments other) {
        return new Moments(plan, pilot, counts.plus(other.counts), channels.plus(other.channels), steps.plus(other.steps),
                pairs.plus(other.pairs), training.plus(other.training), calibration.plus(other.calibration), holdout.plus(other.holdout));
    }

    /** Returns every stretch that was kept. */
    Stream<KeptStretch> stretches() {
        return Stream.of(training, calibration, holdout).flatMap(part -> part.kept().stream());
    }
}
