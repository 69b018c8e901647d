package org.modestead.engine.operator;

import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.recording.Snapshots;

/** Fills the compression of an operator from the training part of snapshots. Immutable. */
public interface Estimator {

    /** Returns the stable id: {@code linear}, {@code dictionary}, {@code kernel-step}, {@code generator}, {@code scaled-generator}. */
    String id();

    /** Returns what is fitted, in words, for the report. */
    String describe();

    /** Returns the kernel, when one is used. */
    Optional<KernelSpec> kernel();

    /**
     * Fills the four arrays.
     *
     * @param snapshots only the training part is read
     * @param progress polled for cancel
     * @return never null
     * @throws org.modestead.engine.FitFault if the snapshots do not fit the estimator
     */
    Compression compress(Snapshots snapshots, Progress progress);

    /**
     * Returns the estimator whose time step, or segment length, is twice (or half, where twice is impossible) as long:
     * its spectrum must agree with this one's.
     *
     * @param snapshots that will be fitted
     * @return empty when the snapshots are too short for either
     */
    Optional<Estimator> otherStep(Snapshots snapshots);

    /**
     * Returns what every training run tells of the action on given functions, so that runs can be weighted anew.
     *
     * @param snapshots only the training part is read
     * @param functions q, from a compression that this estimator filled
     * @return one entry a run with at least one observation, evaluated as the stream is drawn; empty where the estimator
     *     offers none
     */
    default Stream<ObservedRun> observed(Snapshots snapshots, OrthonormalCompression functions) {
        return Stream.empty();
    }
}
