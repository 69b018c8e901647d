package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.ZMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.CommonOps_ZDRM;
import org.hipparchus.linear.Array2DRowRealMatrix;
import org.hipparchus.linear.EigenDecompositionNonSymmetric;
import org.hipparchus.linear.FieldVector;
import org.modestead.engine.Progress;
import org.modestead.engine.basis.Coordinates;
import org.modestead.engine.basis.FunctionBasis;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.operator.Compression;
import org.modestead.engine.operator.Estimator;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.InnerProduct;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.operator.RankRule;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Grade;
import org.modestead.engine.wellposed.ModeVerdict;
import org.modestead.engine.wellposed.Verdict;

/**
 * Operators written down by hand, with eigenvectors from a second library, so that forecasts are tested apart from fits.
 *
 * @param operator with functions taken as orthonormal
 * @param spectrum of it
 */
record Fixture(FittedOperator operator, Spectrum spectrum) {

    /** Stands where a fitted operator names its estimator; nothing here fits. */
    private static final class ByHand implements Estimator {
        @Override
        public String id() {
            return "by-hand";
        }

        @Override
        public String describe() {
            return "written down by hand";
        }

        @Override
        public Optional<KernelSpec> kernel() {
            return Optional.empty();
        }

        @Override
        public Compression compress(Snapshots snapshots, Progress progress) {
            throw new UnsupportedOperationException("nothing is fitted here");
        }

        @Override
        public Optional<Estimator> otherStep(Snapshots snapshots) {
            return Optional.empty();
        }
    }

    /** The flow or map {@code x -> A x} of the state, seen through its coordinates: {@code action = Aᵀ}. */
    static Fixture linear(Snapshots snapshots, Evolution evolution, double[][] a) {
        int n = a.length;
        return of(snapshots, evolution, new Coordinates(n), transposed(a), CommonOps_DDRM.identity(n));
    }

    /** Any functions that an operator maps among themselves. */
    static Fixture of(Snapshots snapshots, Evolution evolution, FunctionBasis basis, DMatrixRMaj action,
            DMatrixRMaj observable) {
        int r = basis.size();
        double[] singular = new double[r];
        Arrays.fill(singular, 1);
        OrthonormalCompression compression = new OrthonormalCompression(basis, CommonOps_DDRM.identity(r), action,
                CommonOps_DDRM.identity(r), observable, singular, 1, InnerProduct.DATA, evolution);
        FittedOperator operator = new FittedOperator(compression, r, new RankRule.Fixed(r), "by hand", 0, new ByHand(), "by hand", Optional.empty(),
                snapshots, List.of());
        return new Fixture(operator, spectrum(snapshots, evolution, action, observable));
    }

    private static Spectrum spectrum(Snapshots snapshots, Evolution evolution, DMatrixRMaj action, DMatrixRMaj observable) {
        int r = action.numRows;
        double[][] rows = new double[r][r];
        for (int i = 0; i < r; i++) {
            System.arraycopy(action.data, i * r, rows[i], 0, r);
        }
        EigenDecompositionNonSymmetric eigen = new EigenDecompositionNonSymmetric(new Array2DRowRealMatrix(rows));
        List<Complex> values = new ArrayList<>();
        ZMatrixRMaj vectors = new ZMatrixRMaj(r, r);
        for (int j = 0; j < r; j++) {
            values.add(new Complex(eigen.getEigenvalue(j).getReal(), eigen.getEigenvalue(j).getImaginary()));
            FieldVector<org.hipparchus.complex.Complex> vector = eigen.getEigenvector(j);
            for (int i = 0; i < r; i++) {
                vectors.set(i, j, vector.getEntry(i).getReal(), vector.getEntry(i).getImaginary());
            }
        }
        ZMatrixRMaj right = new ZMatrixRMaj(r, observable.numCols);
        for (int k = 0; k < observable.data.length; k++) {
            right.data[2 * k] = observable.data[k];
        }
        ZMatrixRMaj joint = new ZMatrixRMaj(r, observable.numCols);
        CommonOps_ZDRM.solve(vectors, right, joint);
        List<Complex> rates = values.stream().map(evolution::rate).toList();
        return new Spectrum(values, rates, vectors, joint, joint, modes(rates), snapshots.channels(), snapshots.delay(),
                snapshots.preparation(), "s", List.of());
    }

    private static List<Mode> modes(List<Complex> rates) {
        List<Mode> out = new ArrayList<>();
        for (int j = 0; j < rates.size(); j++) {
            if (rates.get(j).im() >= 0) {
                out.add(new Mode(out.size() + 1, List.of(j), rates.get(j), 1, 0, 0, List.of(), false, 0));
            }
        }
        return out;
    }

    private static DMatrixRMaj transposed(double[][] a) {
        DMatrixRMaj out = new DMatrixRMaj(a);
        CommonOps_DDRM.transpose(out);
        return out;
    }

    ForecastResult run(ForecastPlan plan) {
        return Forecaster.run(operator.snapshots(), operator, spectrum, Optional.empty(), plan, Progress.NONE);
    }

    ForecastResult run(ForecastPlan plan, Grade grade) {
        return Forecaster.run(operator.snapshots(), operator, spectrum, Optional.of(verdict(grade)), plan, Progress.NONE);
    }

    static Verdict verdict(Grade grade) {
        return new Verdict(new ModeVerdict(0, grade, List.of(), true, ""), List.of(), List.of(), List.of(), List.of());
    }

    /** Snapshots as a few words: channels c0, c1, ... of the given units, no delays, nothing prepared. */
    static Snapshots snapshots(List<String> units, List<Run> training, List<Run> calibration, List<Run> holdout,
            OptionalDouble step) {
        Preparation asRecorded = Preparation.identity(units.size());
        return snapshots(units, training, calibration, holdout, step, DelayEmbedding.NONE, asRecorded);
    }

    static Snapshots snapshots(List<String> units, List<Run> training, List<Run> calibration, List<Run> holdout,
            OptionalDouble step, DelayEmbedding delay, Preparation preparation) {
        List<Channel> channels = new ArrayList<>();
        for (String unit : units) {
            channels.add(new Channel("c" + channels.size(), unit));
        }
        TimeAxis seconds = new TimeAxis(TimeAxis.Kind.NUMBER, "s");
        return new Snapshots(channels, List.of(), seconds, training, calibration, holdout, step, delay, preparation,
                List.of(), List.of());
    }

    /** Samples [from, to) of a signal sampled from time 0; the first {@code leadIn} of them are history. */
    static Run run(String id, int from, int to, int leadIn, double step, Signal... signals) {
        double[] times = new double[to - from];
        DMatrixRMaj values = new DMatrixRMaj(times.length, signals.length);
        for (int k = 0; k < times.length; k++) {
            times[k] = (from + k) * step;
            for (int c = 0; c < signals.length; c++) {
                values.set(k, c, signals[c].at(times[k]));
            }
        }
        return new Run(id, times, values, new DMatrixRMaj(times.length, 0), leadIn);
    }

    /** One channel over time. */
    interface Signal {
        double at(double time);
    }
}
