package org.modestead.host.cli;

import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingText;

/** What a setting accepts and what it is at first, in one line. */
final class SettingSummary {

    private SettingSummary() {}

    /** Returns kind, range, unit and default; options of a choice are told elsewhere. */
    static String of(Setting setting) {
        String initial = SettingText.initial(setting);
        String standing = SettingText.isRequired(setting) && initial.isEmpty() ? "required"
                : initial.isEmpty() ? "not set by default" : "default " + initial;
        String range = setting instanceof Setting.Choice ? "" : SettingText.range(setting);
        String unit = SettingText.unit(setting);
        return Stream.of(SettingText.kind(setting), range, range.contains(unit) || unit.isEmpty() ? "" : "in " + unit,
                standing)
                .filter(part -> !part.isEmpty()).collect(Collectors.joining(", ")) + ".";
    }
}
