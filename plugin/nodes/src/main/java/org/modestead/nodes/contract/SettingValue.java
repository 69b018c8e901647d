package org.modestead.nodes.contract;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** Checks one value against one setting; the part of {@link SettingsReader} that knows the kinds. */
final class SettingValue {

    private static final int LONGEST_QUOTE = 60;

    private SettingValue() {}

    /** A value that fits, or what is wrong with it. */
    record Checked(Optional<Object> value, List<SettingProblem> problems) {

        static Checked good(Object value) {
            return new Checked(Optional.of(value), List.of());
        }

        static Checked bad(Setting setting, String seen, String wanted) {
            return new Checked(Optional.empty(), List.of(new SettingProblem(setting.key(), seen, wanted)));
        }
    }

    static Optional<Object> initial(Setting setting) {
        if (setting instanceof Setting.Number number) {
            return number.initial().isPresent() ? Optional.of(number.initial().getAsDouble()) : Optional.empty();
        } else if (setting instanceof Setting.Whole whole) {
            return whole.initial().isPresent() ? Optional.of(whole.initial().getAsLong()) : Optional.empty();
        } else if (setting instanceof Setting.Choice choice) {
            return Optional.of(choice.initial());
        } else if (setting instanceof Setting.Flag flag) {
            return Optional.of(flag.initial());
        } else if (setting instanceof Setting.Text text) {
            return Optional.of(text.initial());
        } else if (setting instanceof Setting.Texts texts) {
            return Optional.of(List.copyOf(texts.initial()));
        } else if (setting instanceof Setting.Numbers numbers) {
            return Optional.of(List.copyOf(numbers.initial()));
        }
        return setting instanceof Setting.Columns ? Optional.of(List.of()) : Optional.empty();
    }

    static Checked check(Setting setting, Object given) {
        if (setting instanceof Setting.Number number) {
            return number(number, given);
        } else if (setting instanceof Setting.Whole whole) {
            return whole(whole, given);
        } else if (setting instanceof Setting.Choice choice) {
            return choice(choice, given);
        } else if (setting instanceof Setting.Flag) {
            return given instanceof Boolean ? Checked.good(given) : wrongKind(setting, given, "true or false, without"
                    + " quotes");
        } else if (setting instanceof Setting.Columns columns) {
            return columns(columns, given);
        } else if (setting instanceof Setting.Texts) {
            return texts(setting, given, "a list of texts, for example [\"a\", \"b\"]");
        } else if (setting instanceof Setting.Numbers numbers) {
            return numbers(numbers, given);
        }
        return text(setting, given);
    }

    static Optional<Object> fromText(Setting setting, String text) {
        boolean list = setting instanceof Setting.Columns || setting instanceof Setting.Texts;
        if (list) {
            return Optional.of(split(text));
        } else if (setting instanceof Setting.Numbers) {
            return Optional.of(split(text).stream().map(SettingValue::numberOrText).toList());
        } else if (text.isBlank() && !(setting instanceof Setting.Text)) {
            return Optional.empty();
        } else if (setting instanceof Setting.Number || setting instanceof Setting.Whole) {
            return Optional.of(numberOrText(text.strip()));
        } else if (setting instanceof Setting.Flag) {
            return Optional.of(flagOrText(text.strip()));
        }
        return Optional.of(text);
    }

    /** Says what was found, with its JSON kind. */
    static String seen(Object given) {
        if (given instanceof String text) {
            return "the text \"" + shortened(text) + "\"";
        } else if (given instanceof Boolean flag) {
            return flag.toString();
        } else if (given instanceof List<?> list) {
            return "a list of " + list.size() + (list.size() == 1 ? " entry" : " entries");
        } else if (given instanceof Map) {
            return "an object";
        }
        return given instanceof Number number ? "the number " + written(number) : "nothing";
    }

    private static Checked number(Setting.Number setting, Object given) {
        Optional<BigDecimal> exact = exact(given);
        if (exact.isEmpty()) {
            return wrongKind(setting, given, withRange("a number", setting));
        }
        double value = exact.get().doubleValue();
        boolean low = value < setting.min() || setting.minExclusive() && value == setting.min();
        return low || value > setting.max() || Double.isInfinite(value)
                ? Checked.bad(setting, seen(given), "use " + withRange("a number", setting)) : Checked.good(value);
    }

    private static Checked whole(Setting.Whole setting, Object given) {
        Optional<BigInteger> exact = exact(given).filter(SettingValue::isWhole).map(BigDecimal::toBigInteger);
        if (exact.isEmpty()) {
            return wrongKind(setting, given, withRange("a whole number", setting));
        }
        boolean inside = exact.get().bitLength() < Long.SIZE && exact.get().longValue() >= setting.min()
                && exact.get().longValue() <= setting.max();
        return inside ? Checked.good(exact.get().longValue())
                : Checked.bad(setting, seen(given), "use " + withRange("a whole number", setting));
    }

    private static Checked choice(Setting.Choice setting, Object given) {
        List<String> options = setting.options().stream().map(Setting.Option::id).toList();
        String wanted = "one of " + String.join(", ", options);
        if (!(given instanceof String text)) {
            return wrongKind(setting, given, wanted);
        }
        return options.contains(text) ? Checked.good(text)
                : Checked.bad(setting, seen(given) + NearestName.hint(text, options), "use " + wanted);
    }

    private static Checked text(Setting setting, Object given) {
        String kind = SettingText.kind(setting);
        if (!(given instanceof String text)) {
            return wrongKind(setting, given, "a " + (kind.equals("column") ? "column name in quotes" : kind
                    + " in quotes"));
        }
        return text.isBlank() && SettingText.isRequired(setting)
                ? Checked.bad(setting, "an empty text", "give a " + kind) : Checked.good(text);
    }

    private static Checked columns(Setting.Columns setting, Object given) {
        Checked list = texts(setting, given, "a list of column names, for example [\"a\", \"b\"]");
        if (list.value().isEmpty()) {
            return list;
        }
        List<String> names = textList(given);
        List<SettingProblem> problems = new ArrayList<>();
        duplicates(names).forEach(name -> problems.add(new SettingProblem(setting.key(), "the column " + name
                + " more than once", "name each column once")));
        if (names.size() < setting.minimum()) {
            problems.add(count(setting, names.size(), "at least " + setting.minimum()));
        }
        if (setting.maximum().isPresent() && names.size() > setting.maximum().getAsInt()) {
            problems.add(count(setting, names.size(), "at most " + setting.maximum().getAsInt()));
        }
        return problems.isEmpty() ? list : new Checked(Optional.empty(), problems);
    }

    private static Checked texts(Setting setting, Object given, String wanted) {
        if (!(given instanceof List<?> list)) {
            return wrongKind(setting, given, wanted);
        }
        List<SettingProblem> problems = new ArrayList<>();
        for (int i = 0; i < list.size(); i++) {
            if (!(list.get(i) instanceof String text) || text.isBlank()) {
                problems.add(new SettingProblem(setting.key(), "entry " + (i + 1) + " is " + entry(list.get(i)), "use "
                        + wanted));
            }
        }
        return problems.isEmpty() ? Checked.good(textList(given)) : new Checked(Optional.empty(), problems);
    }

    private static Checked numbers(Setting.Numbers setting, Object given) {
        String wanted = "a list of numbers" + (SettingText.range(setting).isEmpty() ? "" : ", "
                + SettingText.range(setting));
        if (!(given instanceof List<?> list)) {
            return wrongKind(setting, given, wanted);
        }
        List<SettingProblem> problems = new ArrayList<>();
        List<Double> values = new ArrayList<>();
        for (int i = 0; i < list.size(); i++) {
            Optional<Double> value = exact(list.get(i)).map(BigDecimal::doubleValue)
                    .filter(number -> number >= setting.min() && number <= setting.max() && !number.isInfinite());
            if (value.isPresent()) {
                values.add(value.get());
            } else {
                problems.add(new SettingProblem(setting.key(), "entry " + (i + 1) + " is " + entry(list.get(i)), "use "
                        + wanted));
            }
        }
        return problems.isEmpty() ? Checked.good(List.copyOf(values)) : new Checked(Optional.empty(), problems);
    }

    private static Checked wrongKind(Setting setting, Object given, String wanted) {
        return Checked.bad(setting, seen(given), "use " + wanted);
    }

    private static SettingProblem count(Setting.Columns setting, int seen, String wanted) {
        return new SettingProblem(setting.key(), seen + (seen == 1 ? " column" : " columns"), "choose " + wanted);
    }

    private static String withRange(String kind, Setting setting) {
        String range = SettingText.range(setting);
        return range.isEmpty() ? kind : kind + " " + range;
    }

    private static String entry(Object value) {
        return value instanceof String text && text.isBlank() ? "an empty text" : seen(value);
    }

    private static List<String> textList(Object given) {
        return ((List<?>) given).stream().map(String.class::cast).toList();
    }

    private static Set<String> duplicates(List<String> names) {
        Set<String> once = new HashSet<>();
        return names.stream().filter(name -> !once.add(name)).collect(Collectors.toCollection(java.util.LinkedHashSet::new));
    }

    private static Optional<BigDecimal> exact(Object given) {
        boolean finite = given instanceof Number number
                && (!(number instanceof Double || number instanceof Float) || Double.isFinite(number.doubleValue()));
        return finite ? Optional.of(new BigDecimal(given.toString())) : Optional.empty();
    }

    private static boolean isWhole(BigDecimal value) {
        return value.signum() == 0 || value.stripTrailingZeros().scale() <= 0;
    }

    private static String written(Number number) {
        return number instanceof Double || number instanceof Float ? SettingText.plain(number.doubleValue())
                : number.toString();
    }

    private static List<String> split(String text) {
        String separator = text.contains("\n") ? "\n" : ",";
        return Stream.of(text.split(separator)).map(String::strip).filter(part -> !part.isEmpty()).toList();
    }

    private static Object numberOrText(String text) {
        try {
            return new BigDecimal(text);
        } catch (NumberFormatException notANumber) {
            return text;
        }
    }

    private static Object flagOrText(String text) {
        return text.equals("true") || text.equals("false") ? Boolean.valueOf(text) : text;
    }

    private static String shortened(String text) {
        return text.length() <= LONGEST_QUOTE ? text : text.substring(0, LONGEST_QUOTE) + "...";
    }
}
