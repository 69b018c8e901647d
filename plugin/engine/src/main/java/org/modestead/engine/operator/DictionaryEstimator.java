package org.modestead.engine.operator;

import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Dictionary;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.recording.Snapshots;

/**
 * The step map on an explicit dictionary: {@code G = Σ w ψ(x)* ψ(x)}, {@code M = Σ w ψ(x)* ψ(y)},
 * {@code N = Σ w ψ(y)* ψ(y)} with equal weights {@code w = 1/m}.
 *
 * <p>Williams, Kevrekidis and Rowley, J. Nonlinear Sci. 25:1307, 2015; N as in Colbrook and Townsend, Comm. Pure Appl.
 * Math. 77:221, 2024.
 *
 * @param dictionary the functions
 * @param stride sampling steps per application of the operator, at least 1
 * @param inputs what is made of known inputs, see {@link InputEffect}
 */
public record DictionaryEstimator(Dictionary dictionary, int stride, InputUse inputs) implements Estimator {

    /** One sampling step, inputs held. */
    public DictionaryEstimator(Dictionary dictionary) {
        this(dictionary, 1, InputUse.HELD);
    }

    @Override
    public String id() {
        return "dictionary";
    }

    @Override
    public String describe() {
        return "step map on " + dictionary.describe();
    }

    @Override
    public Optional<KernelSpec> kernel() {
        return Optional.empty();
    }

    @Override
    public Compression compress(Snapshots snapshots, Progress progress) {
        FunctionBasis basis = dictionary.on(snapshots.stateSize());
        StatePairs pairs = StatePairs.of(snapshots, Snapshots.Part.TRAINING, stride);
        return StepRegression.of(pairs, basis, inputs, dictionary::inputTerms, NoiseCorrection.NONE);
    }

    @Override
    public Optional<Estimator> otherStep(Snapshots snapshots) {
        return StatePairs.exist(snapshots, 2 * stride) ? Optional.of(new DictionaryEstimator(dictionary, 2 * stride, inputs)) : Optional.empty();
    }

    @Override
    public Stream<ObservedRun> observed(Snapshots snapshots, OrthonormalCompression functions) {
        FunctionBasis basis = dictionary.on(snapshots.stateSize());
        return StatePairs.perRun(snapshots, Snapshots.Part.TRAINING, stride)
                .map(pairs -> ObservedRun.of(pairs, basis, functions));
    }
}
