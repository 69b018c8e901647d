package org.modestead.knime.describe;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingText;

/** What the description says of one setting: its help, what it accepts, its default, its options and when it is shown. */
final class OptionText {

    private OptionText() {}

    static String of(NodeDeclaration declaration, Setting setting) {
        return Markup.text(setting.common().help()) + choices(setting) + facts(declaration, setting).stream()
                .map(fact -> " " + Markup.text(fact)).collect(Collectors.joining());
    }

    private static String choices(Setting setting) {
        return setting instanceof Setting.Choice choice ? Markup.points(choice.options().stream()
                .map(option -> Markup.bold(option.label()) + ": " + Markup.text(option.help())).toList()) : "";
    }

    private static List<String> facts(NodeDeclaration declaration, Setting setting) {
        List<String> facts = new ArrayList<>();
        String range = setting instanceof Setting.Choice ? "" : SettingText.range(setting);
        if (!range.isEmpty()) {
            facts.add("Accepts " + range + ".");
        }
        String initial = initial(setting);
        facts.add(initial.isEmpty() ? SettingText.isRequired(setting) ? "Must be set." : "Not set at first." : "Default: " + initial + ".");
        setting.common().visibleWhen().ifPresent(condition -> facts.add(shown(declaration, condition)));
        return facts;
    }

    private static String initial(Setting setting) {
        if (setting instanceof Setting.Choice choice) {
            return label(choice, choice.initial());
        }
        return setting instanceof Setting.Flag flag ? flag.initial() ? "on" : "off" : SettingText.initial(setting);
    }

    private static String shown(NodeDeclaration declaration, Setting.Condition condition) {
        Setting other = declaration.settings().stream().filter(setting -> setting.key().equals(condition.key())).findFirst()
                .orElseThrow();
        String values = other instanceof Setting.Choice choice
                ? choice.options().stream().map(Setting.Option::id).filter(condition.values()::contains)
                        .map(id -> label(choice, id)).collect(Collectors.joining(" or "))
                : condition.values().contains("true") ? "on" : "off";
        return "Takes part when \"" + other.common().label() + "\" is " + values + ".";
    }

    private static String label(Setting.Choice choice, String id) {
        return choice.options().stream().filter(option -> option.id().equals(id)).map(Setting.Option::label).findFirst().orElse(id);
    }
}
