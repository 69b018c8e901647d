package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import org.modestead.engine.Progress;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.OrthonormalCompression;

/**
 * How much of the signal the span holds: the share of its variance on the judging runs, over the ladder, and in a kernel's
 * space that holds the coordinates also {@code ‖P g‖²/‖g‖²} there. Weights may settle on a span that never reaches the
 * signal, and a residual may vanish while no weight settles: a verdict needs both.
 */
public final class CapturedShare implements Check {

    @Override
    public String id() {
        return "captured-share";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        int at = evidence.rungs().indexOf(evidence.operator().rank());
        double share = evidence.captured().get(at);
        double last = evidence.captured().get(evidence.captured().size() - 1);
        double threshold = evidence.settings().captureThreshold();
        List<Finding> findings = new ArrayList<>();
        findings.add(new Finding(0, id(), share, threshold, share >= threshold, String.format(Locale.ROOT,
                "At rank %d the eigenfunctions hold %.4g of the signal's variance on %s; at the top of the ladder %.4g.",
                evidence.operator().rank(), share, evidence.heldOut() ? "runs held out" : "the training runs", last)));
        inSpace(evidence).ifPresent(inSpace -> findings.add(new Finding(0, "captured-share-in-space", inSpace, Double.NaN, true,
                String.format(Locale.ROOT, "In the norm of the space they hold %.6g of the state's components.", inSpace))));
        return findings;
    }

    private static OptionalDouble inSpace(Evidence evidence) {
        OrthonormalCompression chosen = evidence.operator().chosen();
        if (chosen.innerProduct() != InnerProduct.SPACE || evidence.operator().kernel().isEmpty()) {
            return OptionalDouble.empty();
        }
        OptionalDouble norm = KernelFamilies.create(evidence.operator().kernel().get()).space().coordinateNormSquared();
        if (norm.isEmpty()) {
            return OptionalDouble.empty();
        }
        double held = 0;
        for (int i = 0; i < chosen.observable().getNumElements(); i++) {
            held += chosen.observable().data[i] * chosen.observable().data[i];
        }
        return OptionalDouble.of(held / (norm.getAsDouble() * chosen.observable().numCols));
    }
}
