package org.modestead.engine.spread;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.spectrum.Matching;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.spectrum.TrainingSample;

/**
 * The fitted modes, ready to be found again in replicates: optimal assignment on the distance of rates,
 * {@code |λ - λ'| / max(|λ|, |λ'|, 0.1/T)} but at most 1, plus the distance of unit eigenfunctions over the data,
 * {@code √(1 - |<φ, φ'>|²)}, which must be at most {@code √½}: at least half of what the function carries is the same. A conjugate
 * pair is one candidate, so it stays together.
 *
 * @param rates of the modes, imaginary part at least 0
 * @param functions R' x modes, unit eigenfunctions in the functions p
 * @param starts first states of the runs in the functions p, runs x R'
 * @param longest duration T of the longest run
 * @param stretch factor by which replicates deviate too little
 */
record Followed(List<Complex> rates, ZMatrixRMaj functions, DMatrixRMaj starts, double longest, double stretch) {

    private static final double HALF = Math.sqrt(0.5);
    private static final double NEVER = 4;
    private static final double RESOLVED = 0.1;

    /**
     * What a mode came out as in one replicate.
     *
     * @param rate λ, imaginary part at least 0
     * @param amplitude as that of a {@link Mode}, at the first states of the recorded runs
     */
    record Found(Complex rate, double amplitude) {
        double dampingRatio() {
            return rate.abs() == 0 ? 0 : -rate.re() / rate.abs();
        }
    }

    /**
     * @param operator fitted
     * @param spectrum of it
     * @param modes of the spectrum that are followed
     * @param frame of the replicates
     * @param stretch of the replicates
     */
    static Followed of(FittedOperator operator, Spectrum spectrum, List<Mode> modes, Frame frame, double stretch) {
        TrainingSample sample = TrainingSample.of(operator);
        boolean divided = operator.functions().innerProduct() == InnerProduct.SPACE;
        DMatrixRMaj starts = frame.functions().evaluate(sample.starts());
        if (divided) {
            CommonOps_DDRM.divideCols(starts, frame.scale());
        }
        ZMatrixRMaj functions = new ZMatrixRMaj(frame.width(), modes.size());
        for (int m = 0; m < modes.size(); m++) {
            int j = modes.get(m).indices().get(0);
            for (int i = 0; i < spectrum.rank(); i++) {
                double factor = divided ? frame.scale()[i] : 1;
                functions.set(i, m, spectrum.vectors().getReal(i, j) * factor, spectrum.vectors().getImag(i, j) * factor);
            }
            Refit.normalise(functions, m);
        }
        return new Followed(modes.stream().map(Mode::rate).toList(), functions, starts, sample.longest(), stretch);
    }

    /** Returns what each mode came out as, empty for a mode that was not found. */
    List<Optional<Found>> in(Refit refit) {
        int[] upper = IntStream.range(0, refit.rates().size())
                .filter(j -> refit.rates().get(j).im() >= 0 && Double.isFinite(refit.rates().get(j).re())).toArray();
        double[][] cost = new double[rates.size()][upper.length];
        for (int m = 0; m < cost.length; m++) {
            for (int c = 0; c < upper.length; c++) {
                cost[m][c] = cost(m, refit, upper[c]);
            }
        }
        int[] matched = Matching.of(cost, 1 + HALF);
        List<Optional<Found>> out = new ArrayList<>();
        for (int j : matched) {
            out.add(j < 0 ? Optional.empty() : Optional.of(found(refit, upper[j])));
        }
        return out;
    }

    private double cost(int m, Refit refit, int j) {
        double overlap = Math.min(1, Refit.overlap(functions, m, refit.functions(), j));
        double turned = stretch * Math.sqrt((1 - overlap) * (1 + overlap));
        return turned > HALF ? NEVER : turned + distance(rates.get(m), refit.rates().get(j));
    }

    private double distance(Complex a, Complex b) {
        return Math.min(1, stretch * a.minus(b).abs() / Math.max(Math.max(a.abs(), b.abs()), RESOLVED / longest));
    }

    private Found found(Refit refit, int j) {
        Complex rate = refit.rates().get(j);
        int channels = refit.weights().numCols / 2;
        double weights = 0;
        for (int c = channels; c < 2 * channels; c++) {
            weights += Math.pow(Math.hypot(refit.weights().getReal(j, c), refit.weights().getImag(j, c)), 2);
        }
        double squares = 0;
        for (int i = 0; i < starts.numRows; i++) {
            squares += Math.pow(at(refit, j, i).abs(), 2);
        }
        int peak = rate.im() != 0 ? 2 : 1;
        return new Found(rate, peak * Math.sqrt(weights * squares / starts.numRows));
    }

    private Complex at(Refit refit, int j, int start) {
        double re = 0;
        double im = 0;
        for (int k = 0; k < starts.numCols; k++) {
            re += starts.get(start, k) * refit.functions().getReal(k, j);
            im += starts.get(start, k) * refit.functions().getImag(k, j);
        }
        return new Complex(re, im);
    }
}
