package org.modestead.nodes.render;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.math.BigDecimal;
import java.math.RoundingMode;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class HundredthsTest {

    @ParameterizedTest
    @CsvSource({"1.005,1", "1.015,1.02", "1.025,1.02", "1.0250001,1.03", "-0.004,0", "-0.006,-0.01", "0.995,1", "12.10,12.1", "3.0,3", "7.5,7.5",
        "0.05,0.05", "-99.999,-100", "1.5E-7,0", "2.5e3,2500", "123456789012345678.125,123456789012345678.12", "1.25E2,125"})
    void halvesGoToTheEvenNeighbourAndZerosAtTheEndAreLeftOut(String number, String expected) {
        assertEquals(expected, Hundredths.of(number));
    }

    @Property(tries = 2000, seed = "20261201")
    void everyNumberIsRoundedAsInExactArithmetic(@ForAll @IntRange(min = -2_000_000_000, max = 2_000_000_000) int digits,
            @ForAll @IntRange(min = 1, max = 8) int places) {
        String number = BigDecimal.valueOf(digits, places).toPlainString();
        BigDecimal exact = new BigDecimal(number).setScale(2, RoundingMode.HALF_EVEN);
        assertEquals(exact.signum() == 0 ? "0" : exact.stripTrailingZeros().toPlainString(), Hundredths.of(number));
    }

    /** Near halves too: one number in ten lies within a few last places of one. */
    @Property(tries = 2000, seed = "20261201")
    void aBinaryNumberIsRoundedAsItsShortestDigits(@ForAll @IntRange(min = -2_000_000_000, max = 2_000_000_000) int thousandths,
            @ForAll @IntRange(min = -2, max = 2) int away) {
        double number = thousandths / 1000.0 + away * Math.ulp(thousandths / 1000.0);
        assertEquals(Hundredths.of(Double.toString(number)), Hundredths.of(number));
    }
}
