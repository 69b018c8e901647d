package org.modestead.engine.operator;

import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.KernelSections;
import org.modestead.engine.basis.LandmarkFeatures;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.recording.Snapshots;

/**
 * The step map in a kernel's space: {@code G_ij = K(x_i, x_j)}, {@code M_ij = K(y_i, x_j)}, {@code N_ij = K(y_i, y_j)},
 * because {@code A* K(., x_i) = K(., y_i)}; the state component k against section i is {@code x_ik}.
 *
 * <p>Williams, Rowley and Kevrekidis, J. Comput. Dyn. 2:247, 2015. Up to {@value #DIRECT} pairs the arrays are formed;
 * beyond that they are held by landmark features, O(m r) memory.
 *
 * @param space the kernel
 * @param landmarks most landmarks for many pairs, at least 1
 * @param stride sampling steps per application of the operator, at least 1
 */
public record KernelStepEstimator(Kernel space, int landmarks, int stride) implements Estimator {

    /** Up to this many pairs the arrays are formed entry by entry. */
    static final int DIRECT = 400;

    /** One sampling step. */
    public KernelStepEstimator(Kernel space, int landmarks) {
        this(space, landmarks, 1);
    }

    @Override
    public String id() {
        return "kernel-step";
    }

    @Override
    public String describe() {
        return "step map in the space of the kernel " + space.spec().label();
    }

    @Override
    public Optional<KernelSpec> kernel() {
        return Optional.of(space.spec());
    }

    @Override
    public Compression compress(Snapshots snapshots, Progress progress) {
        StatePairs pairs = StatePairs.of(snapshots, Snapshots.Part.TRAINING, stride);
        Evolution evolution = new Evolution.StepMap(pairs.step());
        RowWeights weights = pairs.weights();
        if (pairs.count() <= DIRECT) {
            return weights.functions(new GramCompression(new KernelSections(space, pairs.now()), space.matrix(pairs.now(), pairs.now()),
                    space.matrix(pairs.next(), pairs.now()), space.matrix(pairs.next(), pairs.next()), pairs.now(), InnerProduct.SPACE,
                    evolution));
        }
        LandmarkFeatures features = LandmarkFeatures.choose(space, pairs.now(), landmarks, progress);
        return new FactoredCompression(features, weights.rows(features.evaluate(pairs.now())),
                weights.rows(features.evaluate(pairs.next())), weights.rows(pairs.now()),
                InnerProduct.SPACE, evolution);
    }

    @Override
    public Optional<Estimator> otherStep(Snapshots snapshots) {
        return StatePairs.exist(snapshots, 2 * stride) ? Optional.of(new KernelStepEstimator(space, landmarks, 2 * stride))
                : Optional.empty();
    }

    @Override
    public Stream<ObservedRun> observed(Snapshots snapshots, OrthonormalCompression functions) {
        return StatePairs.perRun(snapshots, Snapshots.Part.TRAINING, stride).map(pairs -> ObservedRun.of(pairs, functions));
    }
}
