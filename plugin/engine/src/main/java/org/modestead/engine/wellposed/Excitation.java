package org.modestead.engine.wellposed;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.ejml.data.ZMatrixRMaj;
import org.modestead.engine.linalg.ComplexMatrices;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.StateRun;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;

/**
 * How strongly runs excite the eigenfunctions of a spectrum: the root mean square of |φ| over their states.
 *
 * @param parts one a run
 */
record Excitation(Map<Run, Part> parts) {

    /** What hardly shows in the runs that fit cannot be fitted, however well noise alone seems to excite it. */
    private static final double FITTED = 0.25;

    /**
     * @param squares length r, sum of |φ|² over the states
     * @param states their number
     */
    private record Part(double[] squares, int states) {}

    /** Of the training runs and those held out. */
    static Excitation of(FittedOperator operator, Spectrum spectrum) {
        Snapshots snapshots = operator.snapshots();
        OrthonormalCompression chosen = operator.chosen();
        Map<Run, Part> parts = new LinkedHashMap<>();
        Stream.concat(snapshots.training().stream(), snapshots.holdout().stream()).filter(run -> run.samples() > snapshots.delay().reach()).forEach(run -> {
            StateRun states = snapshots.embed(run);
            ZMatrixRMaj values = ComplexMatrices.product(chosen.evaluate(chosen.arguments(states)), spectrum.vectors());
            double[] squares = new double[values.numCols];
            for (int j = 0; j < squares.length; j++) {
                squares[j] = Math.pow(SquaredSize.of(values, j).norm(), 2);
            }
            parts.put(run, new Part(squares, values.numRows));
        });
        return new Excitation(parts);
    }

    /** Whether a split can tell of a mode: the runs that fit excite it at least a quarter as much as those that judge, and these a twentieth as much as they. */
    boolean told(Snapshots split, Mode mode) {
        double fits = size(split.training(), mode);
        double judges = size(split.holdout(), mode);
        return judges >= Rung.EXCITED * fits && fits >= FITTED * judges;
    }

    private double size(List<Run> runs, Mode mode) {
        double squares = 0;
        long states = 0;
        for (Run run : runs) {
            Part part = parts.get(run);
            if (part != null) {
                squares += part.squares()[mode.indices().get(0)];
                states += part.states();
            }
        }
        return Math.sqrt(squares / Math.max(1, states));
    }
}
