package org.modestead.engine.battery;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.stream.DoubleStream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;

/**
 * The verdict on systems whose truth is known. The quick part, one seed, keeps what holds; {@code -Dbattery=full}
 * judges everything and prints the confusion tables.
 */
class BatteryTest {

    private static final int RUNS = 20;

    /** Right without noise: each must stay so. */
    private static final String RIGHT = """
            rotation 2d / exponential
            rotation 2d / polynomial
            rotation 2d / delays-6
            rotation 2d / monomials-2
            rotation 2d / gaussian
            two decays 2d / exponential
            two decays 2d / delays-6
            two decays 2d / monomials-2
            two decays 2d / gaussian
            sheared decays 2d / delays-6
            sheared decays 2d / monomials-2
            sheared decays 2d / gaussian
            rotation and decay 3d / linear-kernel-step
            rotation and decay 3d / delays-4
            pushed rotation 3d / linear-kernel-step
            pushed rotation 3d / delays-4
            three rotations 6d / linear-kernel-step
            three rotations 6d / delays-4
            coupled rotations 6d / delays-4
            x'=x / exponential
            x'=x / polynomial
            x'=x / monomials-4
            x'=x / gaussian
            x'=x / delays-6
            x'=-x / exponential
            x'=-x / polynomial
            x'=-x / monomials-4
            x'=-x / gaussian
            x'=-x / delays-6
            x'=x+1/2 / exponential
            x'=x+1/2 / polynomial
            x'=x+1/2 / monomials-4
            x'=1 / exponential
            x'=1 / monomials-4
            x'=1 / delays-6
            x'=1 / gaussian
            x'=x^2 / monomials-5
            x'=-x^3 / exponential
            x'=-x^3 / monomials-5
            x'=x-x^2 / exponential
            x'=x-x^2 / monomials-5
            slow manifold / monomials-2
            slow manifold / delays-6
            Hopf on the cycle / delays-6
            Hopf on the cycle / exponential
            Hopf off the cycle / monomials-3
            van der Pol on the cycle / delays-20
            van der Pol off the cycle / exponential-step
            pendulum, amplitudes 0.5 to 2.5 / delays-12
            pendulum, amplitudes 0.5 to 2.5 / monomials-3
            pendulum, amplitudes 0.5 to 2.5 / gaussian-step
            damped pendulum, amplitudes 0.5 to 2.5 / exponential-step
            pendulum, small / delays-6
            damped pendulum, small / delays-6
            Lotka-Volterra ensemble / delays-12
            Lotka-Volterra ensemble / monomials-3
            Lotka-Volterra orbit / delays-12
            circle rotation / delays-4
            circle rotation / exponential-step
            heat equation / linear-kernel-step
            heat equation / delays-3
            advection equation / linear-kernel-step
            advection equation / delays-2
            coherent state / delays-20
            ramps / delays-4
            critically damped / delays-4
            two decays, one channel / delays-8
            chaotic logistic map / monomials-6
            chaotic logistic map / delays-8
            chaotic logistic map / gaussian-step
            Lorenz / delays-10
            Lorenz / monomials-3
            Lorenz / gaussian-step
            white noise / delays-6
            white noise / monomials-3
            random walk / delays-8
            random walk / monomials-3
            Ornstein-Uhlenbeck / delays-6
            Ornstein-Uhlenbeck / monomials-3
            level shift / delays-8
            """;

    private static List<Trial.Outcome> quick;

    @BeforeAll
    static void judge() {
        quick = Battery.cases().stream().flatMap(known -> DoubleStream.of(0, 0.05).mapToObj(noise ->
                new Trial(known, noise, RUNS, 1).judge())).toList();
    }

    @Test
    void theBatteryHoldsSixtyCasesAndNoneTwice() {
        List<String> ids = Battery.cases().stream().map(Case::id).toList();
        assertTrue(ids.size() >= 60, "cases: " + ids.size());
        assertEquals(ids.size(), ids.stream().distinct().count());
    }

    @Test
    void nothingStandsWhereThereIsNoMode() {
        assertEquals(List.of(), quick.stream().filter(Trial.Outcome::falseReport).toList());
    }

    @Test
    void whatIsRightWithoutNoiseStaysRight() {
        List<String> names = RIGHT.lines().map(String::strip).toList();
        List<Trial.Outcome> kept = quick.stream().filter(o -> o.trial().noise() == 0 && names.contains(o.trial().truth().id())).toList();
        assertEquals(names.size(), kept.size(), "every name must be a case");
        assertEquals(List.of(), kept.stream().filter(outcome -> !outcome.right()).toList());
    }

    @Test
    @EnabledIfSystemProperty(named = "battery", matches = "full")
    void theWholeBatteryIsPrinted() {
        System.out.println(BatteryMain.run(Integer.getInteger("battery.seeds", 2), false));
    }
}
