package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.SpaceFacts;
import org.modestead.engine.operator.InnerProduct;

/**
 * Whether the state's coordinates belong to the kernel's space. Where they do not (Gaussian, Laplacian, Matérn: no polynomial
 * and no constant), no finite sum of eigenfunctions of the space can be the signal, and its weights are those of an imitation on the
 * sampled region.
 *
 * <p>On a set that the motion never leaves they may still belong to the space restricted to it (on a circle they do); then the norm of the projected
 * signal comes to rest, see {@link RestingSignal}, and the modes are those of the restricted space. Otherwise the norm of a single mode may
 * come to rest, and the mode may settle, but orthogonality in the norm of the space is no evidence. Where it keeps rising, or
 * cannot be followed, the weights are no more than a projection's.
 */
public final class SignalInSpace implements Check {

    /** Id of the finding about single modes. */
    static final String LIKENESS = "likeness-at-rest";

    @Override
    public String id() {
        return "signal-in-space";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        if (evidence.operator().functions().innerProduct() != InnerProduct.SPACE || evidence.operator().kernel().isEmpty()) {
            return List.of();
        }
        SpaceFacts facts = KernelFamilies.create(evidence.operator().kernel().get()).space();
        List<Finding> findings = new ArrayList<>();
        Optional<RestingSignal> rest = facts.holdsCoordinates() ? Optional.empty() : RestingSignal.of(evidence.operator().compression(), rank -> held(evidence, rank));
        boolean holds = facts.holdsCoordinates() || rest.isPresent();
        findings.add(new Finding(0, id(), holds ? 1 : 0, 1, holds, sentence(facts, rest)));
        if (!holds) {
            evidence.spectrum().modes().forEach(mode -> findings.add(likeness(mode.number(), evidence)));
        }
        return findings;
    }

    private static String sentence(SpaceFacts facts, Optional<RestingSignal> rest) {
        if (facts.holdsCoordinates()) {
            return "The space of the kernel holds the signal.";
        }
        return rest.map(r -> "The space of the kernel holds the signal on the set that was visited, where its norm rests from rank " + r.from() + " to "
                + r.to() + ", though not beyond.").orElse("The space of the kernel does not hold the signal itself, only likenesses of it on the sampled region.");
    }

    /** Share of the signal that the lowest rung from a rank on holds; 0 above the ladder. */
    private static double held(Evidence evidence, int rank) {
        return IntStream.range(0, evidence.rungs().size()).filter(k -> evidence.rungs().get(k) >= rank).mapToDouble(k -> evidence.captured().get(k))
                .findFirst().orElse(0);
    }

    private static Finding likeness(int mode, Evidence evidence) {
        List<LadderRow> rows = evidence.clearNormsOf(mode);
        boolean atRest = rows.size() >= Settling.LEAST_RUNGS
                && !NormTrend.of(rows.stream().map(LadderRow::normRatio).toList(), evidence.settings().normGrowthThreshold()).rising();
        return new Finding(mode, LIKENESS, atRest ? 1 : 0, 1, atRest, atRest
                ? "The norm of its likeness in the space comes to rest: on the set that was visited it may belong to the space."
                : "The norm of its likeness in the space has not come to rest: its weights are those of a projection.");
    }
}
