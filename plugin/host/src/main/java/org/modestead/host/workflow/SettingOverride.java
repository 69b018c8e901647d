package org.modestead.host.workflow;

import java.util.Optional;

/**
 * A setting given on the command line, in place of the one in the file.
 *
 * @param step id of the step
 * @param key of the setting
 * @param text the value as typed
 */
public record SettingOverride(String step, String key, String text) {

    /**
     * Reads {@code step.key=value}.
     *
     * @return empty when it is not of that form
     */
    public static Optional<SettingOverride> parse(String typed) {
        int equals = typed.indexOf('=');
        int dot = typed.indexOf('.');
        boolean sound = dot > 0 && equals > dot + 1;
        return sound ? Optional.of(new SettingOverride(typed.substring(0, dot).strip(), typed.substring(dot + 1, equals)
                .strip(),
                typed.substring(equals + 1))) : Optional.empty();
    }
}
