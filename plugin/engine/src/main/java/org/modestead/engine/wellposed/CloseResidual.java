package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;

/**
 * Whether the residual of a mode, the noise taken off, is so small that no imitation reaches it on runs of ordinary length. The residual of
 * {@link HoldoutResidual} leaves room for motion that is only nearly of one rate; a mode that stands must do better.
 *
 * <p>What is taken off for noise is known only roughly, to a quarter of its square say. So a rung on which more than half of the square was taken
 * off does not speak for itself: then two rungs must say so, with a quarter put back. Where the space is finite and has been seen whole, the rung
 * that holds all of it speaks.
 */
public final class CloseResidual implements Check {

    private static final double DOUBTFUL = 0.25;

    @Override
    public String id() {
        return "close-residual";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        return evidence.spectrum().modes().stream().map(mode -> finding(mode.number(), evidence)).toList();
    }

    private Finding finding(int mode, Evidence evidence) {
        double value = Closure.missed(mode, evidence).orElseGet(() -> onTheLadder(evidence.tellingRungsOf(mode)));
        return new Finding(mode, id(), value, Evidence.GOOD, value <= Evidence.GOOD, Double.isNaN(value)
                ? "On no rung that tells of it do the runs excite it enough to see how well it keeps its own rule of motion."
                : String.format(Locale.ROOT, "At best it misses its own rule of motion by %.3g of its size once the noise is taken off.", value));
    }

    private static double onTheLadder(List<LadderRow> telling) {
        List<LadderRow> judged = telling.stream().filter(row -> !Double.isNaN(row.residual())).toList();
        double[] bounds = judged.stream().mapToDouble(row -> Math.sqrt(row.residual() * row.residual() + DOUBTFUL * row.takenOff())).sorted().toArray();
        double alone = judged.stream().filter(row -> row.residual() * row.residual() >= row.takenOff()).mapToDouble(LadderRow::residual).min().orElse(Double.NaN);
        double agreed = bounds.length == 0 ? Double.NaN : bounds[Math.min(1, bounds.length - 1)];
        return Double.isNaN(alone) ? agreed : Math.min(alone, agreed);
    }
}
