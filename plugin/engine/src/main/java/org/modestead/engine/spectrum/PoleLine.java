package org.modestead.engine.spectrum;

import java.util.Comparator;
import java.util.List;
import java.util.function.ToDoubleFunction;

/**
 * Poles of several orders that belong together: each stable against the one before, or taking up where an earlier line broke off.
 *
 * @param poles by rising order, at least one
 */
public record PoleLine(List<Pole> poles) {

    /** Takes an immutable copy. */
    public PoleLine {
        poles = List.copyOf(poles);
    }

    /** Returns the middle value of a quantity over the poles (the lower of two). */
    public double median(ToDoubleFunction<Pole> quantity) {
        double[] sorted = poles.stream().mapToDouble(quantity).sorted().toArray();
        return sorted[(sorted.length - 1) / 2];
    }

    /** Returns the largest less the smallest value of a quantity. */
    public double spread(ToDoubleFunction<Pole> quantity) {
        double[] sorted = poles.stream().mapToDouble(quantity).sorted().toArray();
        return sorted[sorted.length - 1] - sorted[0];
    }

    /** Returns the pole of the highest order. */
    public Pole last() {
        return poles.get(poles.size() - 1);
    }

    /** Orders lines by frequency, then by growth rate. */
    static Comparator<PoleLine> byFrequency() {
        return Comparator.<PoleLine>comparingDouble(line -> line.median(Pole::frequency))
                .thenComparingDouble(line -> line.median(pole -> pole.rate().re()));
    }
}
