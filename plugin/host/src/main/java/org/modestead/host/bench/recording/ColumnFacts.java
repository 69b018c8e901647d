package org.modestead.host.bench.recording;

import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.words.NameWithUnit;

/**
 * What was seen in a column of a table.
 *
 * @param column name and type
 * @param cells cells that are there
 * @param missing cells that are not
 * @param low smallest number, or time as a number; NaN without one
 * @param high largest
 * @param rises rows whose value is above the one before
 * @param falls rows whose value is below the one before
 * @param changes rows whose value differs from the one before
 * @param distinct different values, counted up to a limit
 * @param whole whether it holds numbers and all of them are whole, however they are written: 1, 1.0, 1e0
 */
public record ColumnFacts(Column column, long cells, long missing, double low, double high, long rises, long falls, long changes, int distinct, boolean whole) {

    /** Different values are counted up to here. */
    static final int MOST_DISTINCT = 20_000;

    private static final Pattern PARENTHESES = Pattern.compile("(.*\\S)\\s*\\(([^()]*)\\)\\s*");

    /** Returns the name without a unit behind it. */
    String title() {
        return named().name();
    }

    /** Returns the unit that stands behind the name in brackets or parentheses; empty without one. */
    String unit() {
        return named().unit().orElse("");
    }

    /** Returns whether the unit stands in brackets, where it needs no setting. */
    boolean isBracketed() {
        return NameWithUnit.of(column.name()).unit().isPresent();
    }

    private NameWithUnit named() {
        NameWithUnit named = NameWithUnit.of(column.name());
        Matcher match = PARENTHESES.matcher(column.name());
        return named.unit().isPresent() || !match.matches() ? named : new NameWithUnit(match.group(1), Optional.of(match.group(2).strip()));
    }

    /** Returns whether all cells are the same. */
    boolean isConstant() {
        return distinct < 2;
    }
}
