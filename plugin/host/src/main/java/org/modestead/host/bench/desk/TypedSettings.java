package org.modestead.host.bench.desk;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.nodes.contract.NearestName;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingsReader;

/** Turns what was typed in a dialog into settings as a workflow file holds them. */
public final class TypedSettings {

    private TypedSettings() {}

    /**
     * Returns the settings to be stored: those of an older version are brought forward, then what was typed takes their place. A
     * text that does not look like the setting's kind is kept as it is, so that the check tells what is wrong with it.
     *
     * @param node whose settings they are
     * @param before stored so far
     * @param typed by key: texts, true or false, lists; empty texts and nulls mean not set
     * @throws EditFault if the node has no setting of a key
     */
    public static Map<String, Object> stored(Node node, Map<String, Object> before, Map<String, Object> typed) {
        NodeDeclaration declaration = node.declaration();
        Map<String, Object> stored = new LinkedHashMap<>(current(node, before));
        typed.forEach((key, value) -> {
            Optional<Object> written = written(setting(declaration, key), value);
            written.ifPresentOrElse(given -> stored.put(key, given), () -> stored.remove(key));
        });
        return stored;
    }

    /** Returns stored settings in today's version. */
    public static Map<String, Object> current(Node node, Map<String, Object> stored) {
        Map<String, Object> known = new LinkedHashMap<>(stored);
        known.values().removeIf(java.util.Objects::isNull);
        Object version = known.get(SettingsReader.VERSION);
        int today = node.declaration().settingsVersion();
        if (version instanceof Integer number && number >= 1 && number <= today) {
            known.remove(SettingsReader.VERSION);
            return number < today ? node.upgrade(Map.copyOf(known), number) : known;
        }
        return known;
    }

    private static Setting setting(NodeDeclaration declaration, String key) {
        List<String> keys = declaration.settings().stream().map(Setting::key).toList();
        return declaration.settings().stream().filter(found -> found.key().equals(key)).findFirst()
                .orElseThrow(() -> new EditFault("setting " + key, "no setting of that name in " + declaration.id()
                        + NearestName.hint(key, keys), "use one of " + String.join(", ", keys)));
    }

    private static Optional<Object> written(Setting setting, Object typed) {
        if (typed == null || typed instanceof List<?> list && list.isEmpty()) {
            boolean emptyCounts = typed != null && hasDefault(setting);
            return emptyCounts ? Optional.of(List.of()) : Optional.empty();
        }
        if (!(typed instanceof String text)) {
            return Optional.of(typed);
        }
        return text.isEmpty() && !(setting instanceof Setting.Text) ? Optional.empty() : SettingsReader.fromText(setting, text);
    }

    /** An empty list in place of a default that is not empty is a choice of its own. */
    private static boolean hasDefault(Setting setting) {
        return setting instanceof Setting.Texts texts && !texts.initial().isEmpty()
                || setting instanceof Setting.Numbers numbers && !numbers.initial().isEmpty();
    }
}
