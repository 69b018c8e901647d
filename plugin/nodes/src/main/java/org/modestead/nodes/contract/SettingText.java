package org.modestead.nodes.contract;

import java.math.BigDecimal;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import org.modestead.nodes.table.CellType;

/**
 * Says in words what a setting accepts and what it is at first; used by messages, the reference page and dialogs, so
 * that they cannot disagree.
 */
public final class SettingText {

    private SettingText() {}

    /** Returns the kind, for example {@code whole number} or {@code list of columns}. */
    public static String kind(Setting setting) {
        if (setting instanceof Setting.Number) {
            return "number";
        } else if (setting instanceof Setting.Whole) {
            return "whole number";
        } else if (setting instanceof Setting.Choice) {
            return "choice";
        } else if (setting instanceof Setting.Text) {
            return "text";
        } else if (setting instanceof Setting.Flag) {
            return "true or false";
        } else if (setting instanceof Setting.File) {
            return "file";
        } else if (setting instanceof Setting.OneColumn) {
            return "column";
        } else if (setting instanceof Setting.Columns) {
            return "list of columns";
        }
        return setting instanceof Setting.Texts ? "list of texts" : "list of numbers";
    }

    /** Returns the unit, empty when there is none; {@code time} means the recording's time unit. */
    public static String unit(Setting setting) {
        if (setting instanceof Setting.Number number) {
            return number.unit();
        } else if (setting instanceof Setting.Whole whole) {
            return whole.unit();
        }
        return setting instanceof Setting.Numbers numbers ? numbers.unit() : "";
    }

    /** Returns what is allowed beyond the kind, for example {@code above 0 and at most 1}; empty when that is all. */
    public static String range(Setting setting) {
        if (setting instanceof Setting.Number number) {
            return range(number.min(), number.minExclusive(), number.max(), unitWord(number.unit()));
        } else if (setting instanceof Setting.Whole whole) {
            return range(whole, unitWord(whole.unit()));
        } else if (setting instanceof Setting.Choice choice) {
            return "one of " + choice.options().stream().map(Setting.Option::id).collect(Collectors.joining(", "));
        } else if (setting instanceof Setting.OneColumn column) {
            return "a column of type " + types(column.types());
        } else if (setting instanceof Setting.Columns columns) {
            return count(columns) + " of type " + types(columns.types());
        } else if (setting instanceof Setting.Numbers numbers) {
            return joined("each", range(numbers.min(), false, numbers.max(), unitWord(numbers.unit())));
        }
        return setting instanceof Setting.File file && !file.extensions().isEmpty()
                ? "a name ending in " + file.extensions().stream().map(end -> "."
                        + end).collect(Collectors.joining(", ")) : "";
    }

    /** Returns the default as text, empty when the setting is not set at first. */
    public static String initial(Setting setting) {
        if (setting instanceof Setting.Number number) {
            return number.initial().isPresent() ? plain(number.initial().getAsDouble()) : "";
        } else if (setting instanceof Setting.Whole whole) {
            return whole.initial().isPresent() ? Long.toString(whole.initial().getAsLong()) : "";
        } else if (setting instanceof Setting.Choice choice) {
            return choice.initial();
        } else if (setting instanceof Setting.Text text) {
            return text.initial();
        } else if (setting instanceof Setting.Flag flag) {
            return Boolean.toString(flag.initial());
        } else if (setting instanceof Setting.Texts texts) {
            return String.join(", ", texts.initial());
        }
        return setting instanceof Setting.Numbers numbers ? plain(numbers.initial()) : "";
    }

    /** Returns whether a host must insist on a value (while the setting is visible). */
    public static boolean isRequired(Setting setting) {
        if (setting instanceof Setting.Text text) {
            return text.required();
        } else if (setting instanceof Setting.File file) {
            return file.required();
        } else if (setting instanceof Setting.OneColumn column) {
            return column.required();
        }
        return setting instanceof Setting.Columns columns && columns.minimum() > 0;
    }

    /** Returns the titles of column types in the order of {@link CellType}, joined by "or". */
    public static String types(Set<CellType> types) {
        List<String> titles = List.of(CellType.values()).stream().filter(types::contains).map(CellType::title).toList();
        int last = titles.size() - 1;
        return last < 1 ? String.join("", titles) : String.join(", ", titles.subList(0, last)) + " or "
                + titles.get(last);
    }

    /** Writes a number without exponent or trailing zeros, as a person would type it, where that is short. */
    public static String plain(double value) {
        if (Double.isNaN(value) || Double.isInfinite(value)) {
            return Double.toString(value);
        }
        double size = Math.abs(value);
        boolean longWritten = size != 0 && (size < 1e-6 || size >= 1e15);
        return longWritten ? Double.toString(value).replace(".0E", "e").replace('E', 'e')
                : new BigDecimal(Double.toString(value)).stripTrailingZeros().toPlainString();
    }

    private static String plain(List<Double> values) {
        return values.stream().map(SettingText::plain).collect(Collectors.joining(", "));
    }

    private static String range(double min, boolean minExclusive, double max, String unit) {
        boolean hasMin = min > -Double.MAX_VALUE;
        boolean hasMax = max < Double.MAX_VALUE;
        String low = (minExclusive ? "above " : "at least ") + plain(min);
        String high = "at most " + plain(max);
        return bounds(hasMin, low, hasMax, high, unit);
    }

    private static String range(Setting.Whole whole, String unit) {
        boolean hasMin = whole.min() > Integer.MIN_VALUE;
        boolean hasMax = whole.max() < Integer.MAX_VALUE;
        return bounds(hasMin, "at least " + whole.min(), hasMax, "at most " + whole.max(), unit);
    }

    private static String bounds(boolean hasMin, String low, boolean hasMax, String high, String unit) {
        if (!hasMin && !hasMax) {
            return "";
        }
        String text = hasMin && hasMax ? low + " and " + high : hasMin ? low : high;
        return text + unit;
    }

    private static String joined(String word, String rest) {
        return rest.isEmpty() ? "" : word + " " + rest;
    }

    private static String unitWord(String unit) {
        return unit.isEmpty() ? "" : unit.equals("time") ? " time units" : " " + unit;
    }

    private static String count(Setting.Columns columns) {
        String fewest = columns.minimum() == 0 ? "any number of columns" : "at least " + columns.minimum() + " columns";
        if (columns.maximum().isEmpty()) {
            return fewest;
        }
        return columns.minimum() == 0 ? "at most " + columns.maximum().getAsInt() + " columns"
                : columns.minimum() + " to " + columns.maximum().getAsInt() + " columns";
    }
}
