package org.modestead.engine.operator;

import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.recording.Snapshots;

/**
 * An estimator whose operator is corrected at every rank for what noise adds to its moments, see {@link NoiseMoments}.
 *
 * @param plain the estimator without it
 */
public record ExtrapolatedEstimator(Estimator plain) implements Estimator {

    @Override
    public String id() {
        return plain.id();
    }

    @Override
    public String describe() {
        return plain.describe() + ", extrapolated to no noise";
    }

    @Override
    public Optional<KernelSpec> kernel() {
        return plain.kernel();
    }

    @Override
    public Compression compress(Snapshots snapshots, Progress progress) {
        return new CorrectedCompression(plain.compress(snapshots, progress), whitened -> {
            if (whitened.inputs().isPresent()) {
                throw new FitFault("noise correction", "inputs are separated, and the extrapolation to no noise does not reckon with them",
                        "choose total least squares, or fit without noise correction");
            }
            return whitened.corrected(NoisyStep.of(whitened.action(), NoiseMoments.of(plain, snapshots, whitened, progress)));
        });
    }

    @Override
    public Optional<Estimator> otherStep(Snapshots snapshots) {
        return plain.otherStep(snapshots).map(ExtrapolatedEstimator::new);
    }

    @Override
    public Stream<ObservedRun> observed(Snapshots snapshots, OrthonormalCompression functions) {
        return plain.observed(snapshots, functions);
    }
}
