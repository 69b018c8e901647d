package org.modestead.engine.forecast;

import org.hipparchus.analysis.integration.gauss.GaussIntegrator;
import org.hipparchus.analysis.integration.gauss.GaussIntegratorFactory;
import org.hipparchus.distribution.continuous.NormalDistribution;

/**
 * The continuous ranked probability score of N(0, 1), from pinball scores of its quantiles: {@code 2 ∫ pinball(Φ(z), z, y)
 * φ(z) dz}. On either side of y the integrand is smooth; beyond 12 deviations it is below 1e-30.
 */
public final class NormalCrps {

    private static final double REACH = 12;
    private static final NormalDistribution NORMAL = new NormalDistribution();
    private static final GaussIntegratorFactory RULES = new GaussIntegratorFactory();

    private NormalCrps() {}

    public static double of(double observed) {
        return 2 * (integral(-REACH, observed, observed) + integral(observed, REACH, observed));
    }

    private static double integral(double low, double high, double observed) {
        GaussIntegrator rule = RULES.legendre(100, low, high);
        return rule.integrate(z -> Scores.pinball(NORMAL.cumulativeProbability(z), z, observed) * NORMAL.density(z));
    }
}
