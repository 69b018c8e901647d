package org.modestead.nodes.render;

import java.math.BigDecimal;
import java.math.RoundingMode;

/** Decimal numbers as text, rounded to hundredths, half to even: a drawing holds ten thousands of them. */
final class Hundredths {

    private static final int PLACES = 2;
    /** Digits that a long holds with room for the two places. */
    private static final int MOST_DIGITS = 15;

    /** What rounding of the product may move it by, many times over; nearer to a half than this the digits decide. */
    private static final double NEAR = 1e-6;
    /** Below this the product with a hundred is nearer to the exact one than {@link #NEAR}. */
    private static final double LARGE = 1e7;

    private Hundredths() {}

    /** Rounds a number as its shortest decimal digits would be; what is not finite is named as Java does. */
    static String of(double number) {
        double scaled = 100 * Math.abs(number);
        if (Math.abs(number) < LARGE && Math.abs(scaled - Math.floor(scaled) - 0.5) > NEAR) {
            long hundredths = Math.round(scaled);
            return text(number < 0 && hundredths != 0 ? "-" : "", hundredths);
        }
        return Double.isFinite(number) ? of(Double.toString(number)) : Double.toString(number);
    }

    /** @param number digits, a point and digits, perhaps signed, perhaps with an exponent */
    static String of(String number) {
        int point = number.indexOf('.');
        boolean plain = number.indexOf('e') < 0 && number.indexOf('E') < 0 && point <= MOST_DIGITS;
        return plain ? of(number, point) : exactly(number);
    }

    private static String exactly(String text) {
        BigDecimal number = new BigDecimal(text).setScale(PLACES, RoundingMode.HALF_EVEN);
        return number.signum() == 0 ? "0" : number.stripTrailingZeros().toPlainString();
    }

    private static String of(String number, int point) {
        boolean negative = number.charAt(0) == '-';
        long value = 0;
        for (int i = negative ? 1 : 0; i < point; i++) {
            value = 10 * value + number.charAt(i) - '0';
        }
        for (int i = point + 1; i <= point + PLACES; i++) {
            value = 10 * value + (i < number.length() ? number.charAt(i) - '0' : 0);
        }
        value += up(number, point + PLACES + 1, value) ? 1 : 0;
        return text(negative && value != 0 ? "-" : "", value);
    }

    private static String text(String sign, long value) {
        long hundredths = value % 100;
        if (hundredths == 0) {
            return sign + value / 100;
        }
        return sign + value / 100 + (hundredths % 10 == 0 ? "." + hundredths / 10 : hundredths < 10 ? ".0" + hundredths : "." + hundredths);
    }

    /** Whether the digits that are dropped round the value up. */
    private static boolean up(String number, int from, long value) {
        if (from >= number.length() || number.charAt(from) < '5') {
            return false;
        }
        for (int i = from; i < number.length(); i++) {
            if (number.charAt(i) != (i == from ? '5' : '0')) {
                return true;
            }
        }
        return value % 2 == 1;
    }
}
