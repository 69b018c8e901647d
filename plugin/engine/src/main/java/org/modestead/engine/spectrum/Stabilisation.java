package org.modestead.engine.spectrum;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;
import org.modestead.engine.FitFault;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OrthonormalCompression;

/**
 * The poles of an operator over the model order. A pole of the system is found again at the next order, one that fits noise
 * moves. Orders are nested ranks of one compression, so nothing is fitted again.
 *
 * <p>Poles of neighbouring orders are matched by optimal assignment on {@code |λ - λ'|/max(|λ|, |λ'|) + 1 - MAC}, then each
 * of frequency, damping ratio and shape is held against its limit. A damping ratio too small to change the signal by a tenth over the
 * longest run counts as that small: relative changes of nothing say nothing.
 *
 * @param poles by rising order, then frequency
 * @param lines poles that belong together, by frequency
 * @param orders rising
 */
public record Stabilisation(List<Pole> poles, List<PoleLine> lines, List<Integer> orders) {

    /** Takes immutable copies. */
    public Stabilisation {
        poles = List.copyOf(poles);
        lines = List.copyOf(lines);
        orders = List.copyOf(orders);
    }

    /**
     * @param lowest first order, at least 1
     * @param highest last order, 0 = three times the fitted rank and at least 30, as far as the data hold
     * @param every distance between orders, at least 1; two, because oscillations come in pairs
     */
    public record Orders(int lowest, int highest, int every) {

        private static final int LEAST = 30;
        private static final int TIMES = 3;

        /** Checks the ranges. */
        public Orders {
            if (lowest < 1 || highest < 0 || every < 1) {
                throw new IllegalArgumentException("orders " + lowest + " to " + highest + " by " + every);
            }
        }

        private List<Integer> of(FittedOperator operator) {
            int most = operator.functions().rank();
            int to = highest == 0 ? Math.min(most, Math.max(LEAST, TIMES * operator.rank())) : highest;
            if (to > most || lowest + every > to) {
                throw new FitFault("model orders", "orders " + lowest + " to " + to + " by " + every + " were asked for, and the data hold orders"
                        + " up to " + most, "let at least two orders lie between 1 and " + most);
            }
            return IntStream.iterate(lowest, order -> order <= to, order -> order + every).boxed().toList();
        }
    }

    /**
     * Solves the eigenproblem at every order and follows the poles.
     *
     * @param operator fitted
     * @param orders which
     * @param limits what counts as the same
     * @param progress polled once an order
     * @throws FitFault if fewer than two orders fit the data
     */
    public static Stabilisation of(FittedOperator operator, Orders orders, StabilityLimits limits, Progress progress) {
        List<Integer> asked = orders.of(operator);
        int channels = operator.snapshots().channels().size();
        double longest = TrainingSample.of(operator).longest();
        PoleFollower follower = new PoleFollower(limits, longest);
        for (int order : asked) {
            progress.checkCancelled();
            progress.report((double) asked.indexOf(order) / asked.size(), "order " + order);
            follower.add(found(operator.functions().leading(order), channels));
        }
        return new Stabilisation(follower.poles(), follower.lines(), asked);
    }

    private static List<Pole> found(OrthonormalCompression compression, int channels) {
        ModalExpansion expansion = ModalExpansion.of(compression);
        List<Pole> poles = new ArrayList<>();
        for (int j = 0; j < expansion.rank(); j++) {
            Complex rate = expansion.rates().get(j);
            boolean half = expansion.eigenvalues().get(j).im() < 0;
            if (half || Double.isInfinite(rate.re())) {
                continue;
            }
            int column = j;
            List<Complex> shape = IntStream.range(0, channels).mapToObj(k -> ComplexMatrices.entry(expansion.joint(), column, k)).toList();
            poles.add(new Pole(compression.rank(), rate, shape, false, false, false, 0));
        }
        poles.sort(Comparator.comparingDouble(Pole::frequency).thenComparingDouble(pole -> pole.rate().re()));
        return poles;
    }
}
