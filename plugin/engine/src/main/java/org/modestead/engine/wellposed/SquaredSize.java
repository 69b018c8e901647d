package org.modestead.engine.wellposed;

import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.Complex;

/**
 * Sum of the squared absolute values of complex numbers, measured in units of their largest part so that no square overflows or vanishes.
 *
 * @param unit largest part of any of them
 * @param squares sum in units of unit²; 1 where the unit is 0 or not finite and says all
 */
record SquaredSize(double unit, double squares) {

    /** Of the entries of a column. */
    static SquaredSize of(ZMatrixRMaj values, int column) {
        return of(values.data, 2 * column, 2 * values.numCols);
    }

    /** Of the entries of a vector. */
    static SquaredSize of(Complex[] values) {
        double[] parts = new double[2 * values.length];
        for (int i = 0; i < values.length; i++) {
            parts[2 * i] = values[i].re();
            parts[2 * i + 1] = values[i].im();
        }
        return of(parts, 0, 2);
    }

    private static SquaredSize of(double[] parts, int from, int stride) {
        double unit = 0;
        for (int at = from; at < parts.length; at += stride) {
            unit = Math.max(unit, Math.max(Math.abs(parts[at]), Math.abs(parts[at + 1])));
        }
        if (!(unit > 0) || Double.isInfinite(unit)) {
            return new SquaredSize(unit, 1);
        }
        double squares = 0;
        for (int at = from; at < parts.length; at += stride) {
            double re = parts[at] / unit;
            double im = parts[at + 1] / unit;
            squares += re * re + im * im;
        }
        return new SquaredSize(unit, squares);
    }

    /** Returns the Euclidean norm. */
    double norm() {
        return unit * Math.sqrt(squares);
    }

    /** Returns the root mean square of so many. */
    double rootMean(int count) {
        return !(unit > 0) || Double.isInfinite(unit) ? unit : unit * Math.sqrt(squares / count);
    }
}
