package org.modestead.nodes.words;

import java.util.Objects;

/**
 * The recording's time unit in words.
 *
 * @param symbol for example {@code s}, {@code d}, {@code year}; empty when unknown
 */
public record TimeUnit(String symbol) {

    /** Checks that the symbol is there. */
    public TimeUnit {
        Objects.requireNonNull(symbol);
    }

    /** Returns the unit, or {@code time units} when unknown. */
    public String name() {
        return symbol.isEmpty() ? "time units" : symbol;
    }

    /** Returns the unit of rates, for example {@code 1/s}. */
    public String rate() {
        return symbol.isEmpty() ? "1/time unit" : "1/" + symbol;
    }

    /** Returns the unit of frequencies: {@code Hz} for seconds, else for example {@code cycles/d}. */
    public String frequency() {
        if (symbol.equals("s")) {
            return "Hz";
        }
        return symbol.isEmpty() ? "cycles/time unit" : "cycles/" + symbol;
    }

    /** Returns a length of time with its unit. */
    public String span(double time) {
        return Digits.figure(time, name());
    }

    /** Returns a length of time that was set, such as a step, with its unit and without zeros that say nothing. */
    public String exactly(double time) {
        return Digits.cell(time) + " " + name();
    }
}
