package org.modestead.nodes.words;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.regex.Pattern;

/**
 * Writes numbers for people: as many significant digits as the purpose bears, the same in every locale.
 *
 * <p>Rounding is half-even on the exact binary value. Plain decimals from 0.001 to below 100000, powers of ten
 * outside. NaN is written {@code –} (not known), infinities {@code ∞}; the minus sign is U+2212.
 */
public final class Digits {
    private static final String UNKNOWN = "–";
    private static final String MINUS = "\u2212";
    private static final int SMALLEST_PLAIN = -3;
    private static final int LARGEST_PLAIN = 4;
    private static final int FREQUENCY = 3;
    /** Digits of a share in per cent. */
    static final int RATIO = 2;
    /** Digits of most figures in running text. */
    static final int FIGURE = 3;
    private static final int CELL = 5;

    /** A number as a program writes it: not part of a name, and with a power of ten. */
    private static final Pattern PROGRAM = Pattern.compile("(?<![\\w.])([-\u2212]?)(\\d+(?:\\.\\d+)?)[eE]([+-]?\\d+)(?![\\w.]*\\w)");

    private Digits() {}

    /** Returns a sentence with its powers of ten as people write them: {@code 7.71e-07} becomes {@code 7.71 × 10⁻⁷}; a text without a blank is a name and stays. */
    public static String prose(String sentence) {
        return sentence.indexOf(' ') < 0 ? sentence : PROGRAM.matcher(sentence).replaceAll(number ->
                (number.group(1).isEmpty() ? "" : MINUS) + number.group(2) + " × 10" + raised(Integer.parseInt(number.group(3))));
    }

    /** A frequency, rate, period or amplitude in running text: three digits. */
    public static String figure(double value) {
        return significant(value, FIGURE);
    }

    /** A figure with its unit, the unit left out when empty. */
    public static String figure(double value, String unit) {
        return unit.isEmpty() || Double.isNaN(value) ? figure(value) : figure(value) + " " + unit;
    }

    /** A frequency with its unit: three digits. */
    public static String frequency(double value, String unit) {
        return significant(value, FREQUENCY) + " " + unit;
    }

    /** A share, damping ratio or relative error as per cent: two digits, {@code 0.018} gives {@code 1.8 %}. */
    public static String percent(double share) {
        return Double.isNaN(share) ? UNKNOWN : significant(100 * share, RATIO) + " %";
    }

    /** A number in a table: five digits, trailing zeros dropped. */
    public static String cell(double value) {
        String text = significant(value, CELL);
        return text.indexOf('.') < 0 || text.indexOf('×') >= 0 ? text : text.replaceAll("0+$", "").replaceAll("\\.$", "");
    }

    /**
     * Writes a number with a stated number of significant digits.
     *
     * @param value any
     * @param digits at least 1
     * @return for example {@code 1.52}, {@code −0.0430}, {@code 2.1 × 10⁻⁷}
     */
    public static String significant(double value, int digits) {
        if (Double.isNaN(value)) {
            return UNKNOWN;
        }
        if (Double.isInfinite(value)) {
            return value < 0 ? MINUS + "∞" : "∞";
        }
        if (value == 0) {
            return "0";
        }
        BigDecimal rounded = new BigDecimal(value).abs().round(new MathContext(digits, RoundingMode.HALF_EVEN));
        return (value < 0 ? MINUS : "") + magnitude(rounded, digits);
    }

    private static String magnitude(BigDecimal rounded, int digits) {
        int exponent = rounded.precision() - rounded.scale() - 1;
        if (exponent < SMALLEST_PLAIN || exponent > LARGEST_PLAIN) {
            return rounded.movePointLeft(exponent).setScale(digits - 1, RoundingMode.UNNECESSARY).toPlainString() + " × 10"
                    + raised(exponent);
        }
        return rounded.setScale(Math.max(0, digits - 1 - exponent), RoundingMode.UNNECESSARY).toPlainString();
    }

    private static String raised(int exponent) {
        StringBuilder text = new StringBuilder();
        for (char digit : Integer.toString(exponent).toCharArray()) {
            text.append(digit == '-' ? '⁻' : "⁰¹²³⁴⁵⁶⁷⁸⁹".charAt(digit - '0'));
        }
        return text.toString();
    }
}
