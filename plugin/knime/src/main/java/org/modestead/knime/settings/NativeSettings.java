package org.modestead.knime.settings;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.DoubleStream;
import org.knime.core.node.NodeSettingsRO;
import org.knime.core.node.NodeSettingsWO;
import org.modestead.knime.columns.ColumnRules;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingsReader;

/**
 * Writes the raw values of a node's settings under native keys and reads them back.
 *
 * <p>One key a setting, typed, because a flow variable replaces a key of its own type only: numbers are doubles, whole numbers
 * longs, flags booleans, lists arrays, all else texts. What is not set is written too, so that a variable can be put there:
 * {@code NaN} for a number, {@link Long#MIN_VALUE} for a whole number, an empty text for a column or a file. A list of no numbers is
 * written as one {@code NaN}: the platform cannot tell the type of an empty list, and would round a variable's numbers there to the
 * narrowest. Raw values are what {@link SettingsReader} reads.
 */
public final class NativeSettings {

    /** Key of the settings version; the platform shows keys that end so in no list of variables. */
    static final String VERSION = "version_Internals";

    private static final long NOT_SET = Long.MIN_VALUE;
    private static final List<Double> NO_NUMBERS = List.of(Double.NaN);

    private NativeSettings() {}

    /**
     * Writes all settings of a node in today's version.
     *
     * @param declaration of the node
     * @param raw by key; absent means the default, or not set where there is none; a value of the wrong kind is written as what it is
     * @param into written to
     */
    public static void write(NodeDeclaration declaration, Map<String, Object> raw, NodeSettingsWO into) {
        into.addInt(VERSION, declaration.settingsVersion());
        for (Setting setting : declaration.settings()) {
            write(setting, Optional.ofNullable(raw.get(setting.key())), into);
            if (setting instanceof Setting.Columns columns) {
                String key = ColumnRules.key(columns);
                into.addString(key, raw.get(key) instanceof String rule ? rule : "");
            }
        }
    }

    /**
     * Reads what is stored, of whatever version and however wrong; never fails.
     *
     * @param declaration of the node
     * @param from read from
     * @return raw values by key, absent where nothing is stored or nothing is set; {@link SettingsReader#VERSION} when settings of
     *     an older or newer version are stored, with all keys these had
     */
    public static Map<String, Object> read(NodeDeclaration declaration, NodeSettingsRO from) {
        Map<String, Object> raw = new LinkedHashMap<>();
        int version = from.getInt(VERSION, declaration.settingsVersion());
        if (version != declaration.settingsVersion()) {
            raw.put(SettingsReader.VERSION, version);
            from.keySet().stream().filter(key -> !key.equals(VERSION))
                    .forEach(key -> StoredValue.any(from, key).ifPresent(value -> raw.put(key, value)));
        }
        for (Setting setting : declaration.settings()) {
            read(setting, from).ifPresent(value -> raw.put(setting.key(), value));
            if (setting instanceof Setting.Columns columns) {
                String key = ColumnRules.key(columns);
                StoredValue.text(from, key).filter(rule -> !rule.isEmpty()).ifPresent(rule -> raw.put(key, rule));
            }
        }
        return raw;
    }

    private static Optional<Object> read(Setting setting, NodeSettingsRO from) {
        String key = setting.key();
        if (!from.containsKey(key)) {
            return Optional.empty();
        } else if (setting instanceof Setting.Number) {
            return typed(StoredValue.number(from, key), from, key).filter(value -> !Double.valueOf(Double.NaN).equals(value));
        } else if (setting instanceof Setting.Whole) {
            return typed(StoredValue.whole(from, key), from, key).filter(value -> !Long.valueOf(NOT_SET).equals(value));
        } else if (setting instanceof Setting.Flag) {
            return typed(StoredValue.flag(from, key), from, key);
        } else if (setting instanceof Setting.Numbers) {
            return typed(StoredValue.numbers(from, key).map(list -> list.equals(NO_NUMBERS) ? List.of() : list), from, key);
        } else if (setting instanceof Setting.Columns || setting instanceof Setting.Texts) {
            return typed(StoredValue.texts(from, key), from, key);
        }
        boolean emptyIsUnset = setting instanceof Setting.OneColumn || setting instanceof Setting.File;
        return typed(StoredValue.text(from, key), from, key).filter(value -> !(emptyIsUnset && "".equals(value)));
    }

    private static Optional<Object> typed(Optional<?> value, NodeSettingsRO from, String key) {
        return value.isPresent() ? value.map(Object.class::cast) : StoredValue.any(from, key);
    }

    private static void write(Setting setting, Optional<Object> raw, NodeSettingsWO into) {
        String key = setting.key();
        if (raw.isPresent() && !fits(setting, raw.get())) {
            writeAsItIs(key, raw.get(), into);
        } else if (setting instanceof Setting.Number number) {
            into.addDouble(key, raw.map(value -> ((Number) value).doubleValue()).orElse(number.initial().orElse(Double.NaN)));
        } else if (setting instanceof Setting.Whole whole) {
            into.addLong(key, raw.map(value -> ((Number) value).longValue()).orElse(whole.initial().orElse(NOT_SET)));
        } else if (setting instanceof Setting.Flag flag) {
            into.addBoolean(key, raw.map(Boolean.class::cast).orElse(flag.initial()));
        } else if (setting instanceof Setting.Numbers numbers) {
            List<?> list = raw.<List<?>>map(value -> (List<?>) value).orElse(numbers.initial());
            into.addDoubleArray(key, numbers(list.isEmpty() ? NO_NUMBERS : list));
        } else if (setting instanceof Setting.Columns) {
            into.addStringArray(key, texts(raw.<List<?>>map(value -> (List<?>) value).orElse(List.of())));
        } else if (setting instanceof Setting.Texts texts) {
            into.addStringArray(key, texts(raw.<List<?>>map(value -> (List<?>) value).orElse(texts.initial())));
        } else {
            into.addString(key, raw.map(String.class::cast).orElse(initialText(setting)));
        }
    }

    private static boolean fits(Setting setting, Object value) {
        if (setting instanceof Setting.Number) {
            return value instanceof Number;
        } else if (setting instanceof Setting.Whole) {
            return value instanceof Long || value instanceof Integer;
        } else if (setting instanceof Setting.Flag) {
            return value instanceof Boolean;
        } else if (setting instanceof Setting.Numbers) {
            return value instanceof List<?> list && list.stream().allMatch(Number.class::isInstance);
        } else if (setting instanceof Setting.Columns || setting instanceof Setting.Texts) {
            return value instanceof List<?> list && list.stream().allMatch(String.class::isInstance);
        }
        return value instanceof String;
    }

    private static void writeAsItIs(String key, Object value, NodeSettingsWO into) {
        if (value instanceof Boolean flag) {
            into.addBoolean(key, flag);
        } else if (value instanceof Number number) {
            into.addDouble(key, number.doubleValue());
        } else if (value instanceof List<?> list) {
            into.addStringArray(key, texts(list));
        } else {
            into.addString(key, value.toString());
        }
    }

    private static String initialText(Setting setting) {
        if (setting instanceof Setting.Choice choice) {
            return choice.initial();
        }
        return setting instanceof Setting.Text text ? text.initial() : "";
    }

    private static double[] numbers(List<?> values) {
        return values.stream().flatMapToDouble(value -> DoubleStream.of(((Number) value).doubleValue())).toArray();
    }

    private static String[] texts(List<?> values) {
        return values.stream().map(Object::toString).toArray(String[]::new);
    }
}
