package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.forecast.Backtest.Errors;

/** A forecast as the distribution of its errors in calibration. */
class ErrorDistributionTest {

    /** Error lead · (origin - 5) from origins 1 to count; origins of odd number reach one lead only. */
    private static List<Errors> errors(int count) {
        return IntStream.rangeClosed(1, count).mapToObj(origin -> {
            int leads = origin % 2 == 1 ? 1 : 2;
            return new Errors(0, origin, new DMatrixRMaj(leads, 1, true,
                    IntStream.rangeClosed(1, leads).mapToDouble(lead -> lead * (origin - 5)).toArray()));
        }).toList();
    }

    @Test
    void eachLeadHasTheErrorsThatWereMadeAtIt() {
        ErrorDistribution distribution = ErrorDistribution.of(errors(20), 2, 1);
        double[] first = IntStream.rangeClosed(-4, 15).asDoubleStream().toArray();
        double[] second = IntStream.rangeClosed(1, 10).mapToDouble(half -> 2 * (2 * half - 5)).toArray();
        assertEquals(Scores.crps(first, 3.5), distribution.score(1, 0, 3.5));
        assertEquals(Scores.crps(second, -1), distribution.score(2, 0, -1));
    }

    @Test
    void aHandfulOfErrorsIsNoDistribution() {
        ErrorDistribution distribution = ErrorDistribution.of(errors(19), 3, 1);
        assertTrue(Double.isNaN(distribution.score(2, 0, 1)), "nine origins reach the second lead");
        assertTrue(Double.isNaN(distribution.score(3, 0, 1)), "none reaches the third");
        assertTrue(Double.isFinite(distribution.score(1, 0, 1)));
    }
}
