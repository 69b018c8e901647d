package org.modestead.engine.wellposed;

import java.util.ArrayList;
import java.util.List;
import org.modestead.engine.spectrum.Matching;

/**
 * What noise of the data's own size does to a mode on one rung: how it differs when the operator is fitted to the same training runs
 * with as much noise again. A difference between rungs that is not larger says nothing about the mode.
 *
 * @param rate relative change of the rate; 1 where the mode is not found again
 * @param weight relative change of its weight; 1 where the mode is not found again
 * @param norm factor by which its norm ratio changes, at least 1; infinite where the mode is not found again
 */
public record NoiseEffect(double rate, double weight, double norm) {

    /** Nothing is known to disturb. */
    public static final NoiseEffect NONE = new NoiseEffect(0, 0, 1);

    private static final NoiseEffect LOST = new NoiseEffect(1, 1, Double.POSITIVE_INFINITY);

    private static final double TOO_FAR = 1.5;

    /** Relative change of a rate that is none but rounding. */
    private static final double IDENTICAL = 1e-9;

    /**
     * @param rung as fitted
     * @param noisier the same rank fitted to noisier runs, several times
     * @param longest duration of the longest run
     * @return one a part of the rung, the worst of the noisier fits
     */
    static List<NoiseEffect> of(Rung rung, List<Rung> noisier, double longest) {
        List<NoiseEffect> out = new ArrayList<>(java.util.Collections.nCopies(rung.parts().size(), noisier.isEmpty() ? LOST : NONE));
        for (Rung other : noisier) {
            int[] matched = matched(rung, other, longest);
            for (int p = 0; p < matched.length; p++) {
                NoiseEffect one = matched[p] < 0 ? lost(rung.parts().get(p), other, longest) : between(rung.parts().get(p), other.parts().get(matched[p]), longest);
                out.set(p, out.get(p).worse(one));
            }
        }
        return out;
    }

    private static int[] matched(Rung rung, Rung noisier, double longest) {
        double[][] cost = new double[rung.parts().size()][noisier.parts().size()];
        for (int i = 0; i < cost.length; i++) {
            for (int j = 0; j < cost[i].length; j++) {
                cost[i][j] = Math.min(1, Ladder.relativeChange(rung.parts().get(i).rate(), noisier.parts().get(j).rate(), longest))
                        + weight(rung.parts().get(i), noisier.parts().get(j));
            }
        }
        return Matching.of(cost, TOO_FAR);
    }

    private static NoiseEffect between(Rung.Part a, Rung.Part b, double longest) {
        return new NoiseEffect(Ladder.relativeChange(a.rate(), b.rate(), longest), weight(a, b), factor(a.normRatio(), b.normRatio()));
    }

    /** Functions that share a rate may be other ones among themselves in the noisier fit: their rate is not lost with them. */
    private static NoiseEffect lost(Rung.Part part, Rung noisier, double longest) {
        return noisier.parts().stream().filter(other -> !other.constant()).mapToDouble(other -> Ladder.relativeChange(part.rate(), other.rate(), longest))
                .filter(change -> change < IDENTICAL).min().stream().mapToObj(change -> new NoiseEffect(change, 1, Double.POSITIVE_INFINITY)).findFirst()
                .orElse(LOST);
    }

    private NoiseEffect worse(NoiseEffect other) {
        return new NoiseEffect(Math.max(rate, other.rate), Math.max(weight, other.weight), Math.max(norm, other.norm));
    }

    static double weight(Rung.Part a, Rung.Part b) {
        return relativeDifference(a.weight(), b.weight());
    }

    /** Returns the difference of two sizes over the larger; 0 where both vanish. */
    static double relativeDifference(double a, double b) {
        double size = Math.max(a, b);
        return size == 0 ? 0 : Math.abs(a - b) / size;
    }

    /** Returns the larger of the changes of rate and weight. */
    public double change() {
        return Math.max(rate, weight);
    }

    /** Returns the overlap that noise alone may show: a part of size b beside a function of size 1 lengthens it to √(1 + b²). */
    double blur() {
        return norm <= 1 ? 0 : Math.sqrt(1 - 1 / (norm * norm));
    }

    /** Returns the larger over the smaller of two positive figures. */
    static double factor(double a, double b) {
        return Math.max(a / b, b / a);
    }
}
