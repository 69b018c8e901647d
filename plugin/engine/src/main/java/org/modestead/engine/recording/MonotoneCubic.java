package org.modestead.engine.recording;

import org.ejml.data.DMatrixRMaj;

/**
 * Piecewise cubic interpolation of several columns that share their sample times.
 *
 * <p>Between two samples the curve is the cubic Hermite polynomial of the two values and slopes. A slope is the mean of
 * the slopes of the two cubics through the neighbouring four samples, limited by
 * <pre>    s = minmod(S-, S+)                         secants left and right
 *    t = minmod(S- + d- h-, S+ - d+ h+)          d±: minmod of neighbouring second divided differences
 *    slope = minmod(slope, sign(t) max(3|s|, 1.5|t|))</pre>
 *
 * <p>Why this one: a plain spline swings at every step of a valve or a set point, and a strictly monotone cubic cuts the
 * top off every oscillation, which the fit would report as damping. This limiter does neither: where samples rise or
 * fall the curve does too (away from the first and last two intervals), and it passes a sample only where the second
 * differences on both sides agree that there is a smooth top. Error O(h^4) on smooth data away from turning points,
 * O(h^3) at them; exact for straight lines and parabolas. Two samples give a straight line.
 *
 * <p>Source: H. T. Huynh, "Accurate monotone cubic interpolation", SIAM J. Numer. Anal. 30 (1993), 57-100.
 */
final class MonotoneCubic {
    private final double[] times;
    private final double[] values;
    private final int columns;
    private final int from;
    private final int to;

    /**
     * @param times strictly rising
     * @param values one row a time, all finite in the rows used
     * @param from first row used
     * @param to one past the last row used, at least {@code from + 1}
     */
    MonotoneCubic(double[] times, DMatrixRMaj values, int from, int to) {
        this.times = times;
        this.values = values.data;
        this.columns = values.numCols;
        this.from = from;
        this.to = to;
    }

    /**
     * Evaluates at rising target times and writes row k of the result for target k; a target equal to a sample time
     * gets that sample unchanged.
     *
     * @param targets in [times[from], times[to-1]] for the range used
     * @param first first target
     * @param last one past the last target
     * @param out receives rows first..last-1
     * @return number of targets that are no sample times
     */
    int evaluate(double[] targets, int first, int last, DMatrixRMaj out) {
        int between = 0;
        int interval = from;
        int known = -1;
        double[] left = new double[columns];
        double[] right = new double[columns];
        for (int k = first; k < last; k++) {
            double target = targets[k];
            while (interval + 1 < to && times[interval + 1] <= target) {
                interval++;
            }
            if (target == times[interval]) {
                System.arraycopy(values, interval * columns, out.data, k * columns, columns);
                continue;
            }
            between++;
            int start = Math.min(interval, to - 2);
            if (known == start - 1 && known >= from) {
                double[] swap = left;
                left = right;
                right = swap;
                slopes(start + 1, right);
            } else if (known != start) {
                slopes(start, left);
                slopes(start + 1, right);
            }
            known = start;
            hermite(start, target, left, right, out.data, k * columns);
        }
        return between;
    }

    private void hermite(int row, double target, double[] left, double[] right, double[] out, int at) {
        double h = times[row + 1] - times[row];
        double s = (target - times[row]) / h;
        double rise = s * s * (3 - 2 * s);
        double leave = h * s * (1 - s) * (1 - s);
        double arrive = h * s * s * (s - 1);
        int y = row * columns;
        for (int c = 0; c < columns; c++) {
            double start = values[y + c];
            out[at + c] = start + (values[y + columns + c] - start) * rise + left[c] * leave + right[c] * arrive;
        }
    }

    private void slopes(int row, double[] slope) {
        if (to - from == 2) {
            secant(from, slope);
        } else if (row == from) {
            endSlopes(row, 1, slope);
        } else if (row == to - 1) {
            endSlopes(row, -1, slope);
        } else {
            innerSlopes(row, slope);
        }
    }

    private void secant(int row, double[] slope) {
        double h = times[row + 1] - times[row];
        for (int c = 0; c < columns; c++) {
            slope[c] = (values[(row + 1) * columns + c] - values[row * columns + c]) / h;
        }
    }

    private void innerSlopes(int row, double[] slope) {
        boolean hasLeft = row - 1 > from;
        boolean hasRight = row + 2 < to;
        double before = times[row] - times[row - 1];
        double after = times[row + 1] - times[row];
        double beforeThat = hasLeft ? times[row - 1] - times[row - 2] : 1;
        double afterThat = hasRight ? times[row + 2] - times[row + 1] : 1;
        int y = row * columns;
        for (int c = 0; c < columns; c++, y++) {
            double fall = (values[y] - values[y - columns]) / before;
            double rise = (values[y + columns] - values[y]) / after;
            double bend = (rise - fall) / (before + after);
            double bendLeft = bend;
            double bendRight = bend;
            double twist = 0;
            if (hasLeft) {
                double secant = (values[y - columns] - values[y - 2 * columns]) / beforeThat;
                bendLeft = (fall - secant) / (beforeThat + before);
                twist = (bend - bendLeft) / (beforeThat + before + after);
            }
            if (hasRight) {
                double secant = (values[y + 2 * columns] - values[y + columns]) / afterThat;
                bendRight = (secant - rise) / (after + afterThat);
                double twistRight = (bendRight - bend) / (before + after + afterThat);
                twist = hasLeft ? (twist + twistRight) / 2 : twistRight;
            }
            double cubic = fall + bend * before - twist * before * after;
            double turn = minmod(fall + minmod(bendLeft, bend) * before, rise - minmod(bend, bendRight) * after);
            slope[c] = limited(cubic, minmod(fall, rise), turn);
        }
    }

    /** The slope at the first or last sample, from the samples {@code row, row + inward, ...}. */
    private void endSlopes(int row, int inward, double[] slope) {
        boolean hasFourth = to - from > 3;
        double toSecond = times[row + inward] - times[row];
        double secondToThird = times[row + 2 * inward] - times[row + inward];
        double toThird = toSecond + secondToThird;
        double thirdToFourth = hasFourth ? times[row + 3 * inward] - times[row + 2 * inward] : 1;
        int stride = inward * columns;
        int y = row * columns;
        for (int c = 0; c < columns; c++, y++) {
            double first = (values[y + stride] - values[y]) / toSecond;
            double second = (values[y + 2 * stride] - values[y + stride]) / secondToThird;
            double bend = (second - first) / toThird;
            double bendNext = bend;
            double twist = 0;
            if (hasFourth) {
                double third = (values[y + 3 * stride] - values[y + 2 * stride]) / thirdToFourth;
                bendNext = (third - second) / (secondToThird + thirdToFourth);
                twist = (bendNext - bend) / (toThird + thirdToFourth);
            }
            double cubic = first - bend * toSecond + twist * toSecond * toThird;
            slope[c] = limited(cubic, first, first - minmod(bend, bendNext) * toSecond);
        }
    }

    private static double limited(double slope, double secant, double turn) {
        double bound = Math.max(3 * Math.abs(secant), 1.5 * Math.abs(turn));
        return minmod(slope, Math.signum(turn) * bound);
    }

    private static double minmod(double a, double b) {
        if (a > 0 && b > 0) {
            return Math.min(a, b);
        }
        return a < 0 && b < 0 ? Math.max(a, b) : 0;
    }
}
