package org.modestead.nodes.words;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Locale;
import org.junit.jupiter.api.Test;

class DigitsTest {

    @Test
    void figuresHaveThreeDigitsAndSharesTwo() {
        assertEquals("1.52 Hz", Digits.frequency(1.5199, "Hz"));
        assertEquals("1.8 %", Digits.percent(0.0180));
        assertEquals("−0.0430", Digits.figure(-0.043));
        assertEquals("1230", Digits.figure(1234));
        assertEquals("12.3 bar", Digits.figure(12.34, "bar"));
        assertEquals("12.3", Digits.figure(12.34, ""));
    }

    @Test
    void cellsDropZerosThatSayNothing() {
        assertEquals("0.05", Digits.cell(0.05));
        assertEquals("1200", Digits.cell(1200));
        assertEquals("3", Digits.cell(3));
        assertEquals("1.2346", Digits.cell(1.23456789));
    }

    @Test
    void veryLargeAndVerySmallNumbersArePowersOfTen() {
        assertEquals("2.10 × 10⁻⁷", Digits.figure(2.1e-7));
        assertEquals("−1.50 × 10¹²", Digits.figure(-1.5e12));
    }

    @Test
    void sentencesHavePowersOfTenAsPeopleWriteThemAndNamesStay() {
        assertEquals("its rate differs by 7.71 × 10⁻⁷, or \u22121.2 × 10⁶.", Digits.prose("its rate differs by 7.71e-07, or -1.2e+06."));
        assertEquals("run 2e5b and sensor_1e3 of v1.2e4", Digits.prose("run 2e5b and sensor_1e3 of v1.2e4"), "parts of names");
        assertEquals("7e3", Digits.prose("7e3"), "a name of its own");
    }

    @Test
    void roundingUpToAPowerOfTenKeepsTheNumberOfDigits() {
        assertEquals("10.0", Digits.figure(9.996));
        assertEquals("0.00100", Digits.figure(0.00099999));
        assertEquals("1.00 × 10⁵", Digits.figure(99999));
    }

    @Test
    void whatIsNotKnownOrUnboundedIsSaidSo() {
        assertEquals("–", Digits.figure(Double.NaN));
        assertEquals("–", Digits.percent(Double.NaN));
        assertEquals("∞", Digits.figure(Double.POSITIVE_INFINITY));
        assertEquals("−∞", Digits.figure(Double.NEGATIVE_INFINITY));
        assertEquals("0", Digits.figure(-0.0));
    }

    @Test
    void theMachinesLocaleDoesNotMatter() {
        Locale before = Locale.getDefault();
        try {
            Locale.setDefault(Locale.GERMANY);
            assertEquals("1.52", Digits.figure(1.52));
        } finally {
            Locale.setDefault(before);
        }
    }
}
