package org.modestead.nodes.contract;

import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Tells which settings take part, given the values of the ones they depend on. */
public final class Visibility {

    private Visibility() {}

    /**
     * Returns whether a setting is shown and so takes part: its condition holds, and the setting that the condition
     * reads is itself shown. A setting that is not shown keeps its stored value but has no effect.
     *
     * @param declaration of the node
     * @param values by key, as in {@link Settings#values()}; an absent key counts as its default
     * @param setting one of the declaration's
     */
    public static boolean isShown(NodeDeclaration declaration, Map<String, Object> values, Setting setting) {
        Optional<Setting.Condition> condition = setting.common().visibleWhen();
        if (condition.isEmpty()) {
            return true;
        }
        Optional<Setting> other = find(declaration, condition.get().key());
        return other.isPresent() && isShown(declaration, values, other.get())
                && condition.get().values().contains(value(other.get(), values));
    }

    /** Returns the settings that are shown, in dialog order. */
    public static List<Setting> shown(NodeDeclaration declaration, Settings settings) {
        return declaration.settings().stream().filter(setting -> isShown(declaration, settings.values(), setting)).toList();
    }

    private static Optional<Setting> find(NodeDeclaration declaration, String key) {
        return declaration.settings().stream().filter(setting -> setting.key().equals(key)).findFirst();
    }

    private static String value(Setting setting, Map<String, Object> values) {
        Object found = values.get(setting.key());
        return found == null ? SettingText.initial(setting) : found.toString();
    }
}
