package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import org.hipparchus.analysis.integration.gauss.GaussIntegratorFactory;
import org.hipparchus.distribution.continuous.BetaDistribution;
import org.hipparchus.distribution.continuous.NormalDistribution;
import org.hipparchus.distribution.discrete.BinomialDistribution;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Scores and conformal thresholds against CHECKS section 5. */
class ScoresTest {

    private static final double ROUNDING = 1e-14;

    @Test
    void pointScoresOfTheWorkedExample() {
        // CHECKS C5.1; errors of actual (3,5,4,6), forecast (2,5,6,5)
        double[] errors = {-1, 0, 2, -1};
        assertEquals(1.22474487139159, Scores.rmse(errors), ROUNDING);
        assertEquals(1, Scores.mae(errors), ROUNDING);
        assertEquals(0, Scores.mean(Arrays.stream(errors)), ROUNDING, "no bias");
        double[] observed = {3, 5, 4, 6};
        assertEquals(25, Scores.percent(errors, observed), 1e-13);
        assertEquals(24.5454545454545, Scores.symmetricPercent(errors, observed), 5e-14);
        double scale = Scores.naiveScale(List.of(new double[] {1, 3, 2, 4, 3}), 1);
        assertEquals(1.5, scale, ROUNDING);
        assertEquals(0.666666666666667, Scores.mae(errors) / scale, 1e-15);
    }

    @Test
    void naiveScaleDoesNotStepFromOneRunToTheNext() {
        assertEquals(1, Scores.naiveScale(List.of(new double[] {0, 1}, new double[] {100, 101, 102}), 1), ROUNDING);
        assertTrue(Double.isNaN(Scores.naiveScale(List.of(new double[] {0, 1}), 2)));
    }

    @ParameterizedTest
    @CsvSource({"7, 24", "4, 4", "1, 24"})
    void intervalScoreOfTheWorkedExample(double observed, double score) {
        // CHECKS C5.2: alpha 0.1, interval [2, 6]
        assertEquals(score, Scores.interval(2, 6, observed, 0.1), 1e-13);
    }

    @Test
    void expectedIntervalScoreOfTheTrueNormalInterval() {
        // CHECKS C5.2: 4.67560558440283 for 95 %, by the midpoint rule over the quantiles of the normal distribution.
        NormalDistribution normal = new NormalDistribution();
        double z = normal.inverseCumulativeProbability(0.975);
        int n = 200_000;
        double sum = 0;
        for (int k = 0; k < n; k++) {
            sum += Scores.interval(-z, z, normal.inverseCumulativeProbability((k + 0.5) / n), 0.05);
        }
        // The midpoint rule loses about 1/n of the unbounded tails, times 2/alpha.
        assertEquals(4.67560558440283, sum / n, 2e-4);
    }

    @ParameterizedTest
    @CsvSource({"3, 0.9", "1, 0.1"})
    void pinballScoreOfTheWorkedExample(double observed, double score) {
        // CHECKS C5.2: level 0.9, quantile 2
        assertEquals(score, Scores.pinball(0.9, 2, observed), 1e-15);
    }

    @ParameterizedTest
    @CsvSource({"7", "4", "1", "2", "6"})
    void intervalScoreIsThatOfItsTwoQuantiles(double observed) {
        double alpha = 0.1;
        double both = Scores.pinball(alpha / 2, 2, observed) + Scores.pinball(1 - alpha / 2, 6, observed);
        assertEquals(Scores.interval(2, 6, observed, alpha), 2 / alpha * both, 1e-13);
    }

    @ParameterizedTest
    @CsvSource({"0, 0.233694977255109", "1, 0.602441357627616", "2, 1.45279182168590"})
    void rankedProbabilityScoreOfANormalDistribution(double observed, double score) {
        // CHECKS C5.3, digits printed; by quadrature over quantiles, and from a thousand quantiles as equally likely values
        assertEquals(score, NormalCrps.of(observed), 1e-13);
        NormalDistribution normal = new NormalDistribution();
        double[] quantiles = IntStream.range(0, 1000).mapToDouble(i -> normal.inverseCumulativeProbability((i + 0.5) / 1000))
                .toArray();
        // steps of 1/1000 in the distribution function: their squares add up to 1/(12 n²) of a width of about 6
        assertEquals(score, Scores.crps(quantiles, observed), 1e-5);
    }

    @Test
    void meanRankedProbabilityScoreOfACalibratedNormalForecast() {
        // CHECKS C5.3: 1/√π; the score grows like |y| only, so the rule reaches rounding
        NormalDistribution normal = new NormalDistribution();
        double mean = new GaussIntegratorFactory().legendre(100, -12, 12)
                .integrate(y -> NormalCrps.of(y) * normal.density(y));
        assertEquals(0.564189583547756, mean, 1e-12);
    }

    @Test
    void rankedProbabilityScoreIsTheAreaBetweenTheDistributionFunctions() {
        // F is 0, 1/3, 2/3, 1 between the values 1, 2, 4; against a step at 3: (1/3)² + (2/3)² · 1 + (1/3)² · 1
        assertEquals(1 / 9.0 + 4 / 9.0 + 1 / 9.0, Scores.crps(new double[] {1, 2, 4}, 3), 1e-15);
        assertEquals(2.5, Scores.crps(new double[] {1}, 3.5), 1e-15, "of one value the absolute error");
    }

    @Test
    void rankedProbabilityScoreIsDistanceLessHalfTheSpread() {
        // an independent form: mean |x - y| - mean |x - x'|/2
        Random random = new Random(3);
        double[] values = random.doubles(25, -2, 5).sorted().toArray();
        for (double observed : new double[] {-3, 0.4, 2, 9}) {
            double distance = Arrays.stream(values).map(x -> Math.abs(x - observed)).average().orElseThrow();
            double spread = Arrays.stream(values).flatMap(x -> Arrays.stream(values).map(other -> Math.abs(x - other)))
                    .average().orElseThrow();
            assertEquals(distance - spread / 2, Scores.crps(values, observed), ROUNDING);
        }
    }

    @ParameterizedTest
    @CsvSource({"9, 0.1, 9", "19, 0.1, 18", "99, 0.05, 95", "38, 0.05, 38", "100, 0.1, 91", "99, 0.1, 90", "8, 0.1, 9"})
    void conformalRank(int n, double alpha, int rank) {
        // CHECKS C5.4 (8 scores are too few for 90 %: rank beyond n)
        assertEquals(rank, SplitConformal.rank(n, 1 - alpha));
    }

    @Test
    void wholeRanksAreNotLiftedByRounding() {
        // 100 * 0.55 is 55.00000000000001 in double precision; the rank is 55.
        assertEquals(55, SplitConformal.rank(99, 0.55));
    }

    @ParameterizedTest
    @CsvSource({"0.2, 1.5", "0.1, 2.0", "0.05, Infinity"})
    void conformalThresholdOfTheWorkedExample(double alpha, double threshold) {
        // CHECKS C5.4
        double[] scores = {.3, 1.1, .2, .7, .9, 2.0, .4, 1.5, .6};
        assertEquals(threshold, SplitConformal.threshold(scores, 1 - alpha));
    }

    @Test
    void conditionalCoverageIsBetaDistributed() {
        // CHECKS C5.4: n = 99, k = 90, 5-95 % range .8467-.9442; for uniform scores the coverage is the threshold.
        Random random = new Random(20261201);
        int trials = 4000;
        double[] thresholds = new double[trials];
        for (int t = 0; t < trials; t++) {
            thresholds[t] = SplitConformal.threshold(random.doubles(99).toArray(), 0.9);
        }
        Arrays.sort(thresholds);
        BetaDistribution beta = new BetaDistribution(90, 10);
        assertEquals(0.8467, beta.inverseCumulativeProbability(0.05), 5e-5);
        assertEquals(0.9442, beta.inverseCumulativeProbability(0.95), 5e-5);
        // Sampling error of a 5 % quantile from 4000 trials: sqrt(.05 * .95 / 4000) / density(1.8) = 0.002, four times.
        assertEquals(0.8467, thresholds[trials / 20], 0.008);
        assertEquals(0.9442, thresholds[trials - trials / 20], 0.008);
    }

    @Test
    void exchangeableErrorsAreCoveredWithinBinomialLimits() {
        // CHECKS C5.5: 84 to 95 of 100 intervals at 90 %. 19 scores give exactly 18/20; each trial draws its own.
        BinomialDistribution binomial = new BinomialDistribution(100, 0.9);
        assertEquals(84, binomial.inverseCumulativeProbability(0.025));
        assertEquals(95, binomial.inverseCumulativeProbability(0.975));
        Random random = new Random(7);
        int covered = 0;
        for (int t = 0; t < 100; t++) {
            double threshold = SplitConformal.threshold(random.doubles(19).map(u -> -Math.log(u)).toArray(), 0.9);
            covered += -Math.log(random.nextDouble()) <= threshold ? 1 : 0;
        }
        assertTrue(covered >= 84 && covered <= 95, covered + " of 100");
    }
}
