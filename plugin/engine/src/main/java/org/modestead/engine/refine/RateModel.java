package org.modestead.engine.refine;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.linalg.Matrices;

/**
 * A sum of exponentials: each channel of each run is {@code y(t) = Φ(t) T ξ}, with one column of Φ a function of the terms,
 * the ties T shared by all, and weights ξ for every run and channel.
 *
 * @param terms at least one
 * @param ties f x q matrix T for f functions and q weights a channel; empty leaves every function its own weight
 */
public record RateModel(List<RateTerm> terms, Optional<DMatrixRMaj> ties) {

    private static final double LARGEST_EXPONENT = 300;

    /** Takes immutable copies and checks the size of the ties. */
    public RateModel {
        terms = List.copyOf(terms);
        ties = ties.map(DMatrixRMaj::copy);
        int functions = functions(terms);
        if (functions == 0 || ties.isPresent() && (ties.get().numRows != functions || ties.get().numCols < 1)) {
            throw new IllegalArgumentException(functions + " functions, ties "
                    + ties.map(t -> t.numRows + " x " + t.numCols).orElse("absent"));
        }
    }

    /** Every function with a weight of its own. */
    public RateModel(List<RateTerm> terms) {
        this(terms, Optional.empty());
    }

    /**
     * Returns terms whose sum is zero at time 0, as that of a motion that starts from rest there.
     *
     * @param terms at least two functions
     */
    public static RateModel fromZero(List<RateTerm> terms) {
        List<Boolean> counts = new ArrayList<>();
        for (RateTerm term : terms) {
            counts.add(true);
            if (term.functions() == 2) {
                counts.add(false);
            }
        }
        DMatrixRMaj ties = new DMatrixRMaj(counts.size(), counts.size() - 1);
        for (int f = 1; f < counts.size(); f++) {
            ties.set(f, f - 1, 1);
            ties.set(0, f - 1, counts.get(f) ? -1 : 0);
        }
        return new RateModel(terms, Optional.of(ties));
    }

    /** Returns the number of weights a channel, q. */
    public int weights() {
        return ties.map(t -> t.numCols).orElse(functions(terms));
    }

    /** Returns the free parameters with their start values, in the order of the terms, growth before angular frequency. */
    List<FreeRate> free() {
        List<FreeRate> free = new ArrayList<>();
        int column = 0;
        for (int i = 0; i < terms.size(); i++) {
            if (terms.get(i) instanceof RateTerm.Real real && real.free()) {
                free.add(new FreeRate(i, column, FreeRate.Part.GROWTH, real.growth()));
            }
            if (terms.get(i) instanceof RateTerm.Pair pair && pair.growthFree()) {
                free.add(new FreeRate(i, column, FreeRate.Part.GROWTH, pair.growth()));
            }
            if (terms.get(i) instanceof RateTerm.Pair pair && pair.angularFree()) {
                free.add(new FreeRate(i, column, FreeRate.Part.ANGULAR, pair.angular()));
            }
            column += terms.get(i).functions();
        }
        return free;
    }

    /** Returns the same model at other values of its free parameters. */
    RateModel at(double[] values) {
        List<RateTerm> moved = new ArrayList<>();
        int k = 0;
        for (RateTerm term : terms) {
            if (term instanceof RateTerm.Real real) {
                moved.add(real.free() ? new RateTerm.Real(values[k++], true) : real);
            } else if (term instanceof RateTerm.Pair pair) {
                double growth = pair.growthFree() ? values[k++] : pair.growth();
                double angular = pair.angularFree() ? values[k++] : pair.angular();
                moved.add(new RateTerm.Pair(growth, angular, pair.growthFree(), pair.angularFree()));
            }
        }
        return new RateModel(moved, ties);
    }

    /** Returns whether every function is largest, between two times, at a size that numbers can hold; it may fade to 0. */
    boolean representable(double earliest, double latest) {
        return terms.stream().mapToDouble(RateTerm::growth).allMatch(growth -> Double.isFinite(growth)
                && Math.abs(Math.max(growth * earliest, growth * latest)) < LARGEST_EXPONENT);
    }

    /** Returns Φ T at the times, n x q. */
    DMatrixRMaj values(double[] times) {
        DMatrixRMaj functions = new DMatrixRMaj(times.length, functions(terms));
        int column = 0;
        for (RateTerm term : terms) {
            for (int i = 0; i < times.length; i++) {
                if (term instanceof RateTerm.Real real) {
                    functions.set(i, column, Math.exp(real.growth() * times[i]));
                } else if (term instanceof RateTerm.Pair pair) {
                    double size = Math.exp(pair.growth() * times[i]);
                    functions.set(i, column, size * Math.cos(pair.angular() * times[i]));
                    functions.set(i, column + 1, size * Math.sin(pair.angular() * times[i]));
                }
            }
            column += term.functions();
        }
        return tied(functions);
    }

    /**
     * Returns the derivative of Φ T with respect to a free parameter, n x q: {@code t Φ} for a growth, the functions turned
     * by a quarter for an angular frequency.
     */
    DMatrixRMaj derivative(double[] times, FreeRate by) {
        DMatrixRMaj functions = new DMatrixRMaj(times.length, functions(terms));
        RateTerm term = terms.get(by.term());
        for (int i = 0; i < times.length; i++) {
            double t = times[i];
            if (term instanceof RateTerm.Real real) {
                functions.set(i, by.column(), t * Math.exp(real.growth() * t));
            } else if (term instanceof RateTerm.Pair pair) {
                double size = t * Math.exp(pair.growth() * t);
                double cosine = size * Math.cos(pair.angular() * t);
                double sine = size * Math.sin(pair.angular() * t);
                boolean growth = by.part() == FreeRate.Part.GROWTH;
                functions.set(i, by.column(), growth ? cosine : -sine);
                functions.set(i, by.column() + 1, growth ? sine : cosine);
            }
        }
        return tied(functions);
    }

    private DMatrixRMaj tied(DMatrixRMaj functions) {
        return ties.map(t -> Matrices.product(functions, t)).orElse(functions);
    }

    private static int functions(List<RateTerm> terms) {
        return terms.stream().mapToInt(RateTerm::functions).sum();
    }
}
