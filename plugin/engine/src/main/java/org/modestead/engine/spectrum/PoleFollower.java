package org.modestead.engine.spectrum;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.modestead.engine.linalg.Complex;

/** Follows poles from order to order; see {@link Stabilisation}. Used by one thread, once. */
final class PoleFollower {

    private static final double TOO_FAR = 1.2;
    private static final double RESOLVED = 0.1;

    private final StabilityLimits limits;
    private final double longest;
    private final List<Pole> poles = new ArrayList<>();
    private final List<List<Pole>> chains = new ArrayList<>();
    private List<Pole> before = List.of();
    private List<List<Pole>> open = List.of();

    /** @param longest duration of the longest run */
    PoleFollower(StabilityLimits limits, double longest) {
        this.limits = limits;
        this.longest = longest;
    }

    /** Holds the poles of the next order against those of the one before. */
    void add(List<Pole> found) {
        int[] matched = match(found);
        List<Pole> judged = new ArrayList<>();
        List<List<Pole>> continued = new ArrayList<>();
        for (int i = 0; i < found.size(); i++) {
            Pole pole = matched[i] < 0 ? found.get(i) : against(found.get(i), before.get(matched[i]));
            List<Pole> chain = pole.stable() ? open.get(matched[i]) : new ArrayList<>();
            if (chain.isEmpty()) {
                chains.add(chain);
            }
            chain.add(pole);
            judged.add(pole);
            continued.add(chain);
        }
        poles.addAll(judged);
        before = judged;
        open = continued;
    }

    List<Pole> poles() {
        return poles;
    }

    private int[] match(List<Pole> now) {
        if (before.isEmpty()) {
            int[] none = new int[now.size()];
            Arrays.fill(none, -1);
            return none;
        }
        double[][] cost = new double[now.size()][before.size()];
        for (int i = 0; i < now.size(); i++) {
            for (int j = 0; j < before.size(); j++) {
                cost[i][j] = Math.min(1, change(now.get(i).rate(), before.get(j).rate()))
                        + 1 - ModalAssurance.orNone(now.get(i).shape(), before.get(j).shape());
            }
        }
        return Matching.of(cost, TOO_FAR);
    }

    private static double change(Complex a, Complex b) {
        double size = Math.max(a.abs(), b.abs());
        return size == 0 ? 0 : a.minus(b).abs() / size;
    }

    private Pole against(Pole now, Pole before) {
        boolean frequency = sameFrequency(now, before, limits.frequency());
        boolean damping = sameDamping(now, before, limits.damping());
        boolean shape = ModalAssurance.orNone(now.shape(), before.shape()) >= limits.assurance();
        return new Pole(now.order(), now.rate(), now.shape(), frequency, damping, shape, frequency && damping && shape
                ? before.stableOrders() + 1 : 0);
    }

    private static boolean sameFrequency(Pole now, Pole before, double limit) {
        return Math.abs(now.frequency() - before.frequency()) <= limit * Math.max(now.frequency(), before.frequency());
    }

    private boolean sameDamping(Pole now, Pole before, double limit) {
        if (now.rate().im() == 0 || before.rate().im() == 0) {
            double size = Math.max(RESOLVED / longest, Math.max(Math.abs(now.rate().re()), Math.abs(before.rate().re())));
            return now.rate().im() == before.rate().im() && Math.abs(now.rate().re() - before.rate().re()) <= limit * size;
        }
        double a = now.dampingRatio().orElseThrow();
        double b = before.dampingRatio().orElseThrow();
        double floor = RESOLVED / (longest * Math.min(now.rate().abs(), before.rate().abs()));
        return Math.abs(a - b) <= limit * Math.max(floor, Math.max(Math.abs(a), Math.abs(b)));
    }

    /** Returns chains of at least two poles, joined where a later one takes up an earlier one within the limits. */
    List<PoleLine> lines() {
        List<List<Pole>> lines = new ArrayList<>();
        for (List<Pole> chain : chains) {
            if (chain.size() < 2) {
                continue;
            }
            Pole first = chain.get(0);
            lines.stream().filter(line -> takesUp(first, line.get(line.size() - 1))).findFirst()
                    .ifPresentOrElse(line -> line.addAll(chain), () -> lines.add(new ArrayList<>(chain)));
        }
        return lines.stream().map(PoleLine::new).sorted(PoleLine.byFrequency()).toList();
    }

    private boolean takesUp(Pole first, Pole last) {
        return first.order() > last.order() && against(first, last).stable();
    }
}
