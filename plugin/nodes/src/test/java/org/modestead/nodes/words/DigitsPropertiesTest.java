package org.modestead.nodes.words;

import static org.junit.jupiter.api.Assertions.assertTrue;

import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;

class DigitsPropertiesTest {

    @Property(seed = "20261201")
    void plainTextReadsBackWithinHalfAUnitOfTheLastDigit(@ForAll @DoubleRange(min = -3, max = 4.9) double exponent,
            @ForAll @IntRange(min = 1, max = 9) int digits) {
        double value = Math.pow(10, exponent);
        String text = Digits.significant(value, digits);
        double read = text.contains("×") ? Double.parseDouble(text.substring(0, text.indexOf(' '))) * 1e5
                : Double.parseDouble(text);
        // Half a unit of the last of d significant digits is at most 5 * 10^-d of the value.
        assertTrue(Math.abs(read - value) <= 5 * Math.pow(10, -digits) * value * (1 + 1e-12), text + " for " + value);
    }
}
