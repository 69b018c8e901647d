package org.modestead.nodes.data;

import java.util.List;

/**
 * A one-dimensional flow {@code x' = f(x)} whose solution is known in closed form.
 *
 * <p>In the space of the exponential kernel only affine flows have eigenfunctions, {@code (x + b/a)^n} with rate
 * {@code n a}; the others are here because they have none.
 */
sealed interface Flow {

    /** Returns x(t) for x(0) = {@code start}; infinite or beyond its pole where the solution has ended. */
    double at(double start, double time);

    /** Returns the time at which the solution through {@code start} escapes to infinity; infinite when it never does. */
    default double escapeTime(double start) {
        return Double.POSITIVE_INFINITY;
    }

    /** Returns the modes of the state in the exponential kernel's space, besides the constant; none where it has none. */
    default List<TrueMode> truth() {
        return List.of();
    }

    /** x' = a x + b. */
    record Affine(double a, double b) implements Flow {
        @Override
        public double at(double start, double time) {
            if (a == 0) {
                return start + b * time;
            }
            // expm1 keeps small rates exact
            return start * StrictMath.exp(a * time) + b / a * StrictMath.expm1(a * time);
        }

        @Override
        public List<TrueMode> truth() {
            return a == 0 ? List.of() : List.of(new TrueMode("state", 0, a));
        }
    }

    /** x' = x². */
    record Square() implements Flow {
        @Override
        public double at(double start, double time) {
            return start / (1 - start * time);
        }

        @Override
        public double escapeTime(double start) {
            return start > 0 ? 1 / start : Double.POSITIVE_INFINITY;
        }
    }

    /** x' = -x³. */
    record MinusCube() implements Flow {
        @Override
        public double at(double start, double time) {
            return start / StrictMath.sqrt(1 + 2 * start * start * time);
        }
    }

    /** x' = x - x². */
    record Logistic() implements Flow {
        @Override
        public double at(double start, double time) {
            return start * StrictMath.exp(time) / (1 + start * StrictMath.expm1(time));
        }

        @Override
        public double escapeTime(double start) {
            return start < 0 ? StrictMath.log1p(-1 / start) : Double.POSITIVE_INFINITY;
        }
    }
}
