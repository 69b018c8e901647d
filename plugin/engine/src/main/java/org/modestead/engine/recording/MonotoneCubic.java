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
 * differences on both sides agree that there is a smooth top: by at most a fifth of the range for white noise at even
 * times. Error O(h^4) on smooth data away from turning points, O(h^3) at them; exact for straight lines and parabolas.
 * Two samples give a straight line.
 *
 * <p>Source: H. T. Huynh, "Accurate monotone cubic interpolation", SIAM J. Numer. Anal. 30 (1993), 57-100.
 */
final class MonotoneCubic {
    private static final int ROUNDING_ULPS = 4;

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
     * Evaluates at rising target times and writes row k of the result for target k; a target that equals a sample time
     * up to rounding gets that sample unchanged.
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
            int same = sampleAt(interval, target);
            if (same >= 0) {
                System.arraycopy(values, same * columns, out.data, k * columns, columns);
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

    /** Returns the sample of an interval whose time equals the target up to rounding, or -1. */
    private int sampleAt(int interval, double target) {
        double rounding = ROUNDING_ULPS * Math.ulp(target);
        if (target - times[interval] <= rounding) {
            return interval;
        }
        return interval + 1 < to && times[interval + 1] - target <= rounding ? interval + 1 : -1;
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
        double beforeThat = hasLeft ? times[row - 1] - times[row - 2] : before;
        double afterThat = hasRight ? times[row + 2] - times[row + 1] : after;
        // reciprocals once a row: divisions would take most of the time
        double perBefore = 1 / before;
        double perAfter = 1 / after;
        double perBeforeThat = 1 / beforeThat;
        double perAfterThat = 1 / afterThat;
        double perBoth = 1 / (before + after);
        double perBothLeft = 1 / (beforeThat + before);
        double perBothRight = 1 / (after + afterThat);
        double twistLeft = twistWeight(hasLeft, hasRight) * before * after / (beforeThat + before + after);
        double twistRight = twistWeight(hasRight, hasLeft) * before * after / (before + after + afterThat);
        int y = row * columns;
        int leftmost = hasLeft ? 2 * columns : columns;
        int rightmost = hasRight ? 2 * columns : columns;
        for (int c = 0; c < columns; c++, y++) {
            double fall = (values[y] - values[y - columns]) * perBefore;
            double rise = (values[y + columns] - values[y]) * perAfter;
            double bend = (rise - fall) * perBoth;
            double farLeft = (values[y - columns] - values[y - leftmost]) * perBeforeThat;
            double farRight = (values[y + rightmost] - values[y + columns]) * perAfterThat;
            double bendLeft = hasLeft ? (fall - farLeft) * perBothLeft : bend;
            double bendRight = hasRight ? (farRight - rise) * perBothRight : bend;
            double cubic = fall + bend * before - (bend - bendLeft) * twistLeft - (bendRight - bend) * twistRight;
            double turn = minmod(fall + minmod(bendLeft, bend) * before, rise - minmod(bend, bendRight) * after);
            slope[c] = limited(cubic, minmod(fall, rise), turn);
        }
    }

    /** Each of two cubics counts half, a single one wholly, none not at all. */
    private static double twistWeight(boolean present, boolean other) {
        return present ? other ? 0.5 : 1 : 0;
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
        return minmod(slope, Math.copySign(bound, turn));
    }

    /** The smaller of two numbers of one sign, 0 for two signs; without branches, which noise makes slow. */
    private static double minmod(double a, double b) {
        return (Math.copySign(0.5, a) + Math.copySign(0.5, b)) * Math.min(Math.abs(a), Math.abs(b));
    }
}
