package org.modestead.engine.operator;

import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.recording.Snapshots;

/**
 * An estimator whose operator is given a structure at every rank, see {@link ImposedStructure}.
 *
 * @param free the estimator without it
 * @param structure imposed
 */
public record StructuredEstimator(Estimator free, Structure structure) implements Estimator {

    @Override
    public String id() {
        return free.id();
    }

    @Override
    public String describe() {
        return free.describe() + ", made " + structure.words();
    }

    @Override
    public Optional<KernelSpec> kernel() {
        return free.kernel();
    }

    @Override
    public Compression compress(Snapshots snapshots, Progress progress) {
        return new CorrectedCompression(free.compress(snapshots, progress), whitened -> whitened.constrained(structure));
    }

    @Override
    public Optional<Estimator> otherStep(Snapshots snapshots) {
        return free.otherStep(snapshots).map(other -> new StructuredEstimator(other, structure));
    }

    @Override
    public Stream<ObservedRun> observed(Snapshots snapshots, OrthonormalCompression functions) {
        return free.observed(snapshots, functions);
    }

    /** Returns the fault of a structure that an operator cannot have. */
    static FitFault refused(Structure structure, Evolution evolution) {
        String kind = evolution instanceof Evolution.StepMap ? "a step map"
                : evolution.equals(new Evolution.Generator(1)) ? "a generator" : "a scaled generator";
        return new FitFault("structure", kind + " to be made " + structure.words(), structure == Structure.SKEW
                ? "choose unitary for a step map, or fit the plain generator"
                : "choose skew-adjoint for a generator, or fit a step map");
    }
}
