package org.modestead.knime.dialog;

import java.math.BigDecimal;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.SettingText;

/** Everything the dialog says of a setting, in the words of its declaration. */
final class FieldWords {

    private FieldWords() {}

    /** Returns the label with the unit in brackets, for example {@code Time step [time units]}. */
    static String label(Setting setting) {
        String unit = SettingText.unit(setting).replaceFirst("^time$", "time units");
        return setting.common().label() + (unit.isEmpty() ? "" : " [" + unit + "]");
    }

    /** Returns what is allowed, beside the field; empty when there is nothing to say or the field itself offers what is allowed. */
    static String hint(Setting setting) {
        boolean typed = setting instanceof Setting.Number || setting instanceof Setting.Whole || setting instanceof Setting.Numbers
                || setting instanceof Setting.File;
        return typed ? SettingText.range(setting) : "";
    }

    /** Returns what a field shows in grey while the setting is not set. */
    static String placeholder(Setting setting) {
        String initial = initial(setting);
        return initial.isEmpty() ? "not set" : initial + " (default)";
    }

    /** Returns the default as a person reads it; empty when the setting is not set at first. */
    static String initial(Setting setting) {
        if (setting instanceof Setting.Choice choice) {
            return choice.options().stream().filter(option -> option.id().equals(choice.initial())).map(Setting.Option::label).findFirst()
                    .orElse(choice.initial());
        } else if (setting instanceof Setting.Flag flag) {
            return flag.initial() ? "yes" : "no";
        }
        return SettingText.initial(setting);
    }

    /** Returns help, range and default in a few sentences. */
    static String help(Setting setting) {
        String allowed = setting instanceof Setting.Choice || setting instanceof Setting.Flag ? "" : SettingText.range(setting);
        String initial = initial(setting).replace("\n", ", ");
        return setting.common().help() + (allowed.isEmpty() ? "" : " Allowed: " + allowed + ".")
                + (initial.isEmpty() ? "" : " Default: " + initial + ".");
    }

    /** Returns one sentence for each problem, what was seen and what would be right. */
    static String sentences(List<SettingProblem> problems) {
        return problems.stream().map(FieldWords::sentence).collect(Collectors.joining(" "));
    }

    /** Returns what was seen and what would be right. */
    static String sentence(SettingProblem problem) {
        String text = problem.seen() + "; " + problem.wanted() + ".";
        return text.substring(0, 1).toUpperCase(Locale.ROOT) + text.substring(1);
    }

    /**
     * Returns a raw value as it is typed; lists are separated as asked.
     *
     * @param value may be of the wrong kind
     */
    static String typed(Object value, String separator) {
        if (value instanceof List<?> list) {
            return list.stream().map(entry -> typed(entry, separator)).collect(Collectors.joining(separator));
        } else if (value instanceof Double || value instanceof Float) {
            return SettingText.plain(((Number) value).doubleValue());
        }
        return value instanceof BigDecimal exact ? exact.toString() : String.valueOf(value);
    }

    /** Returns whether a raw value, if any, is the default. */
    static boolean isDefault(Setting setting, Optional<Object> value) {
        return value.isEmpty() || value.get() instanceof List<?> == (setting instanceof Setting.Texts || setting instanceof Setting.Numbers
                || setting instanceof Setting.Columns) && typed(value.get(), ", ").equals(SettingText.initial(setting));
    }
}
