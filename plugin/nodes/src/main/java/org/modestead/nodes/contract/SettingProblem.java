package org.modestead.nodes.contract;

/**
 * One thing wrong with a setting.
 *
 * @param key of the setting
 * @param seen what was found, with the value
 * @param wanted what would be right, as an instruction
 */
public record SettingProblem(String key, String seen, String wanted) {}
