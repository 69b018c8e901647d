package org.modestead.nodes.contract;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/**
 * Checks stored settings against a declaration and completes them with defaults. Everything wrong is told at once.
 *
 * <p>Stored values are what a JSON reader gives: {@link Number}, {@link String}, {@link Boolean}, {@link List},
 * {@link Map} or null. Null counts as not set. A whole number may be written 3.0; a number written as text is wrong
 * (use {@link #fromText} for values typed on a command line). The key {@value #VERSION} is reserved: it holds the
 * {@link NodeDeclaration#settingsVersion()} under which the settings were stored.
 *
 * <p>Settings that are not shown ({@link Visibility}) are checked and kept as well, so that switching an option back
 * loses nothing; only the demand for a value is dropped.
 */
public final class SettingsReader {

    /** Reserved key of the settings version. */
    public static final String VERSION = "version";

    private SettingsReader() {}

    /** What reading gives. */
    public sealed interface Reading {

        /** Returns the settings, empty when something is wrong. */
        Optional<Settings> settings();

        /** Returns everything wrong, in the order of the declaration; empty when all is well. */
        List<SettingProblem> problems();
    }

    /** Settings that fit the declaration. */
    public record Accepted(Settings accepted) implements Reading {
        @Override
        public Optional<Settings> settings() {
            return Optional.of(accepted);
        }

        @Override
        public List<SettingProblem> problems() {
            return List.of();
        }
    }

    /** Settings that do not fit. */
    public record Refused(List<SettingProblem> problems) implements Reading {

        /** Takes an immutable copy. */
        public Refused {
            problems = List.copyOf(problems);
        }

        @Override
        public Optional<Settings> settings() {
            return Optional.empty();
        }
    }

    /**
     * Reads the settings of a step: takes the version from the reserved key, upgrades older ones through the node and
     * checks them.
     *
     * @param node whose settings they are
     * @param stored by key; not modified
     */
    public static Reading read(Node node, Map<String, Object> stored) {
        NodeDeclaration declaration = node.declaration();
        Object version = stored.get(VERSION);
        if (version == null) {
            return read(declaration, stored, declaration.settingsVersion());
        }
        if (!(version instanceof Integer number) || number < 1) {
            return new Refused(List.of(new SettingProblem(VERSION, SettingValue.seen(version),
                    "write the whole number under which the settings were stored, at most "
                            + declaration.settingsVersion())));
        }
        boolean older = number < declaration.settingsVersion();
        return older ? read(declaration, node.upgrade(Map.copyOf(withoutNulls(stored)), number),
                declaration.settingsVersion())
                : read(declaration, stored, number);
    }

    /**
     * Checks settings of a known version.
     *
     * @param declaration of the node
     * @param raw by key, already upgraded; not modified
     * @param version under which they were stored
     */
    public static Reading read(NodeDeclaration declaration, Map<String, Object> raw, int version) {
        if (version > declaration.settingsVersion()) {
            return new Refused(List.of(new SettingProblem(VERSION, "settings of version " + version,
                    "use a newer release: this one knows settings of " + declaration.id() + " up to version "
                            + declaration.settingsVersion())));
        }
        List<SettingProblem> problems = new ArrayList<>(unknownKeys(declaration, raw));
        Map<String, Object> values = new HashMap<>();
        for (Setting setting : declaration.settings()) {
            Object given = raw.get(setting.key());
            if (given == null) {
                SettingValue.initial(setting).ifPresent(value -> values.put(setting.key(), value));
            } else {
                SettingValue.Checked checked = SettingValue.check(setting, given);
                checked.value().ifPresent(value -> values.put(setting.key(), value));
                problems.addAll(checked.problems());
            }
        }
        problems.addAll(missing(declaration, raw, values));
        return problems.isEmpty() ? new Accepted(new Settings(values)) : new Refused(problems);
    }

    /**
     * Turns a text typed by a person, such as the value of {@code --set step.key=value}, into a value for
     * {@link #read}. A text that does not look like the setting's kind is returned as it is, so that reading tells what
     * is wrong with it. Lists are separated by line ends, or by commas where there is no line end.
     *
     * @return empty when the text is empty and the setting is not a text: not set
     */
    public static Optional<Object> fromText(Setting setting, String text) {
        return SettingValue.fromText(setting, text);
    }

    private static List<SettingProblem> unknownKeys(NodeDeclaration declaration, Map<String, Object> raw) {
        List<String> known = declaration.settings().stream().map(Setting::key).toList();
        return new TreeMap<>(raw).keySet().stream()
                .filter(key -> !key.equals(VERSION) && !known.contains(key))
                .map(key -> new SettingProblem(key, "no setting of that name in " + declaration.id()
                        + NearestName.hint(key, known), "use one of " + String.join(", ", known)))
                .toList();
    }

    private static List<SettingProblem> missing(NodeDeclaration declaration, Map<String, Object> raw,
            Map<String, Object> values) {
        return declaration.settings().stream()
                .filter(setting -> SettingText.isRequired(setting) && raw.get(setting.key()) == null && !hasDefault(setting))
                .filter(setting -> Visibility.isShown(declaration, values, setting))
                .map(setting -> new SettingProblem(setting.key(), "no value", "give a " + SettingText.kind(setting)
                        + " for \"" + setting.common().label() + "\""
                        + (SettingText.range(setting).isEmpty() ? "" : ", " + SettingText.range(setting))))
                .toList();
    }

    private static boolean hasDefault(Setting setting) {
        return !SettingText.initial(setting).isBlank();
    }

    private static Map<String, Object> withoutNulls(Map<String, Object> stored) {
        Map<String, Object> kept = new HashMap<>(stored);
        kept.values().removeIf(java.util.Objects::isNull);
        return kept;
    }
}
