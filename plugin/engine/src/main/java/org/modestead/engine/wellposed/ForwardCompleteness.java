package org.modestead.engine.wellposed;

import java.util.List;
import java.util.Locale;
import org.modestead.engine.Progress;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;

/**
 * Whether some run grows faster than exponentially, so that it would escape in finite time: {@code 1/‖x‖} heads linearly to
 * zero (as for x' = x²) and a straight line explains it better than an exponential does. A step map needs every state to
 * have an image one step later; a generator does not.
 */
public final class ForwardCompleteness implements Check {

    private static final int LEAST = 6;
    private static final double WITHIN_LENGTHS = 10;
    private static final double BETTER = 0.25;

    @Override
    public String id() {
        return "forward-completeness";
    }

    @Override
    public List<Finding> examine(Evidence evidence, Progress progress) {
        int escaping = 0;
        int judged = 0;
        for (Snapshots.Part part : Snapshots.Part.values()) {
            for (StateRun run : evidence.operator().snapshots().states(part)) {
                if (run.count() >= LEAST) {
                    judged++;
                    escaping += escapes(run, evidence.settings().completenessThreshold()) ? 1 : 0;
                }
            }
        }
        String sentence = escaping == 0 ? "No run grows faster than exponentially."
                : String.format(Locale.ROOT, "%d of %d runs grow faster than exponentially, heading for infinity in finite time: states near "
                        + "their ends have no image under a step map; use the generator and do not forecast far.", escaping, judged);
        return List.of(new Finding(0, id(), escaping, 0, escaping == 0, sentence));
    }

    private static boolean escapes(StateRun run, double threshold) {
        double[] reciprocal = new double[run.count()];
        double[] logarithm = new double[run.count()];
        for (int i = 0; i < run.count(); i++) {
            double norm = 0;
            for (int k = 0; k < run.states().numCols; k++) {
                norm = Math.hypot(norm, run.states().get(i, k));
            }
            if (norm == 0) {
                return false;
            }
            reciprocal[i] = 1 / norm;
            logarithm[i] = Math.log(norm);
        }
        Line line = Line.through(run.times(), reciprocal);
        Line exponential = Line.through(run.times(), logarithm);
        if (line.slope() >= 0 || line.explained() < threshold) {
            return false;
        }
        double last = run.times()[run.count() - 1];
        double length = last - run.times()[0];
        double escape = run.times()[0] - line.at(run.times()[0]) / line.slope();
        double missedByLine = line.misfit(run.times(), reciprocal, false);
        double missedByExponential = exponential.misfit(run.times(), reciprocal, true);
        return escape < last + WITHIN_LENGTHS * length && missedByLine < BETTER * missedByExponential;
    }

    /** A least-squares line {@code value + slope (t - mean)}. */
    private record Line(double mean, double value, double slope, double explained) {

        static Line through(double[] t, double[] y) {
            double meanT = 0;
            double meanY = 0;
            for (int i = 0; i < t.length; i++) {
                meanT += t[i] / t.length;
                meanY += y[i] / t.length;
            }
            double tt = 0;
            double ty = 0;
            double yy = 0;
            for (int i = 0; i < t.length; i++) {
                tt += (t[i] - meanT) * (t[i] - meanT);
                ty += (t[i] - meanT) * (y[i] - meanY);
                yy += (y[i] - meanY) * (y[i] - meanY);
            }
            return new Line(meanT, meanY, ty / tt, yy == 0 ? 1 : ty * ty / (tt * yy));
        }

        double at(double time) {
            return value + slope * (time - mean);
        }

        /** Sum of squared misses of the reciprocal norm, by the line itself or by e^-line. */
        double misfit(double[] t, double[] reciprocal, boolean exponential) {
            double sum = 0;
            for (int i = 0; i < t.length; i++) {
                double model = exponential ? Math.exp(-at(t[i])) : at(t[i]);
                sum += (reciprocal[i] - model) * (reciprocal[i] - model);
            }
            return sum;
        }
    }
}
