package org.modestead.engine.operator;

import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.basis.InputTerms;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.recording.Snapshots;

/**
 * Linear least squares in delay coordinates: the basis functions are the state components, the inner product the average
 * over the data. With {@code X = U S Wᵀ} (m x N) the compression is {@code Uᵀ Y W S⁻¹}.
 *
 * <p>Schmid, J. Fluid Mech. 656:5, 2010; delay coordinates. Noise in X biases the eigenvalues towards
 * zero, that is towards more damping, unless it is corrected.
 *
 * @param stride sampling steps per application of the operator, at least 1
 * @param correction of that bias
 * @param inputs what is made of known inputs, see {@link InputEffect}
 */
public record LinearEstimator(int stride, NoiseCorrection correction, InputUse inputs) implements Estimator {

    /** One sampling step, least squares, inputs held. */
    public LinearEstimator() {
        this(NoiseCorrection.NONE);
    }

    /** One sampling step, inputs held. */
    public LinearEstimator(NoiseCorrection correction) {
        this(1, correction, InputUse.HELD);
    }

    @Override
    public String id() {
        return "linear";
    }

    @Override
    public String describe() {
        return "linear " + correction.words() + " in delay coordinates";
    }

    @Override
    public Optional<KernelSpec> kernel() {
        return Optional.empty();
    }

    @Override
    public Compression compress(Snapshots snapshots, Progress progress) {
        if (correction == NoiseCorrection.NONE && (inputs == InputUse.LEFT_IN || snapshots.inputs().isEmpty())) {
            Optional<StatesCompression> states = StatesCompression.of(snapshots, stride);
            if (states.isPresent()) {
                return states.get();
            }
        }
        StatePairs pairs = StatePairs.of(snapshots, Snapshots.Part.TRAINING, stride);
        return StepRegression.of(pairs, new Coordinates(snapshots.stateSize()), inputs, InputTerms::new, correction);
    }

    @Override
    public Optional<Estimator> otherStep(Snapshots snapshots) {
        return StatePairs.exist(snapshots, 2 * stride) ? Optional.of(new LinearEstimator(2 * stride, correction, inputs))
                : Optional.empty();
    }

    @Override
    public Stream<ObservedRun> observed(Snapshots snapshots, OrthonormalCompression functions) {
        return StatePairs.perRun(snapshots, Snapshots.Part.TRAINING, stride)
                .map(pairs -> ObservedRun.of(pairs, new Coordinates(snapshots.stateSize()), functions));
    }
}
