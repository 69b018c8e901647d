package org.modestead.engine.forecast;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** How figures are written in sentences. */
class SummaryTest {

    @ParameterizedTest
    @CsvSource({"24, 24", "0.01, 0.01", "1234567, 1234600", "0.000123456, 0.00012346", "-2.50, -2.5", "0, 0", "1e-30, 1E-30",
        "NaN, NaN"})
    void figuresHaveFiveDigitsAndNoTrailingZeros(double value, String text) {
        assertEquals(text, Summary.figure(value));
    }

    @ParameterizedTest
    @CsvSource({"0.9, 90 %", "0.29, 29 %", "0.9975, 99.75 %"})
    void sharesAreWrittenInPercent(double share, String text) {
        assertEquals(text, Summary.percent(share));
    }
}
