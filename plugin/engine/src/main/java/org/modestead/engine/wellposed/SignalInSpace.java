package org.modestead.engine.wellposed;

import java.util.List;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.SpaceFacts;
import org.modestead.engine.operator.InnerProduct;

/**
 * Whether the state's coordinates belong to the kernel's space. Where they do not (Gaussian, Laplacian, Matérn: no polynomial
 * and no constant), the weights of the signal are those of an imitation on the sampled region, so that orthogonality in
 * the norm of the space is no evidence: such modes may settle, but they do not stand.
 */
public final class SignalInSpace implements Check {

    @Override
    public String id() {
        return "signal-in-space";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        if (evidence.operator().compression().innerProduct() != InnerProduct.SPACE || evidence.operator().kernel().isEmpty()) {
            return List.of();
        }
        SpaceFacts facts = KernelFamilies.create(evidence.operator().kernel().get()).space();
        boolean holds = facts.holdsCoordinates();
        return List.of(new Finding(0, id(), holds ? 1 : 0, 1, holds, holds ? "The space of the kernel holds the signal."
                : "The space of the kernel does not hold the signal itself, only likenesses of it on the sampled region."));
    }
}
