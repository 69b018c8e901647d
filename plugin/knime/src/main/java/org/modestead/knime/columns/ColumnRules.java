package org.modestead.knime.columns;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

/**
 * Turns lists of columns that are given by rule into lists of names, before the settings are read as usual.
 *
 * <p>The rule of a setting is stored beside it under its key with {@value #SUFFIX} at the end. A rule never takes a column that
 * another setting of the node names for the same table: "every number" does not take the time column.
 */
public final class ColumnRules {

    /** End of the key under which the rule of a list of columns is stored. */
    public static final String SUFFIX = "-by";

    private ColumnRules() {}

    /**
     * Settings without rules.
     *
     * @param values raw values by key; a rule over a table that is not known yet leaves the names that were stored last
     * @param problems rules that cannot be read or that no column fits, empty when all is well
     */
    public record Resolved(Map<String, Object> values, List<SettingProblem> problems) {

        /** Takes immutable copies. */
        public Resolved {
            values = Map.copyOf(values);
            problems = List.copyOf(problems);
        }
    }

    /** Returns the key under which the rule of a list of columns is stored. */
    public static String key(Setting.Columns setting) {
        return setting.key() + SUFFIX;
    }

    /** Returns the keys of all settings of a node, and of the rules of its lists of columns. */
    public static Set<String> keys(NodeDeclaration declaration) {
        Set<String> keys = new LinkedHashSet<>();
        for (Setting setting : declaration.settings()) {
            keys.add(setting.key());
            if (setting instanceof Setting.Columns columns) {
                keys.add(key(columns));
            }
        }
        return keys;
    }

    /**
     * Resolves every rule.
     *
     * @param declaration of the node
     * @param raw values by key, with rules; not modified
     * @param inputs schemas of connected input tables, by port id, where known
     */
    public static Resolved resolved(NodeDeclaration declaration, Map<String, Object> raw, Map<String, TableSchema> inputs) {
        Map<String, Object> values = new HashMap<>(raw);
        values.values().removeIf(Objects::isNull);
        List<SettingProblem> problems = new ArrayList<>();
        for (Setting setting : declaration.settings()) {
            if (setting instanceof Setting.Columns columns) {
                Object stored = values.remove(key(columns));
                try {
                    ColumnRule rule = ColumnRule.parse(setting.key(), stored == null ? "" : stored.toString());
                    Optional<TableSchema> schema = Optional.ofNullable(inputs.get(columns.port()));
                    if (!(rule instanceof ColumnRule.Named) && schema.isPresent()) {
                        List<String> names = names(declaration, raw, columns, rule, schema.get());
                        values.put(setting.key(), names);
                        if (names.isEmpty()) {
                            problems.add(new SettingProblem(setting.key(), "no column fits the rule " + rule.text(),
                                    "change the rule or name the columns"));
                        }
                    }
                } catch (SettingFault fault) {
                    problems.add(new SettingProblem(setting.key(), fault.seen(), fault.wanted()));
                }
            }
        }
        return new Resolved(values, problems);
    }

    /**
     * Returns the columns that a rule takes, in the order of the table.
     *
     * @param declaration of the node
     * @param raw values by key: what they name has another part already
     * @param setting whose rule it is
     * @param rule not {@link ColumnRule.Named}
     * @param schema of the setting's table
     */
    public static List<String> names(NodeDeclaration declaration, Map<String, Object> raw, Setting.Columns setting, ColumnRule rule,
            TableSchema schema) {
        Set<String> taken = named(declaration, raw, setting);
        return schema.columns().stream().filter(column -> setting.types().contains(column.type()) && rule.takes(column))
                .map(Column::name).filter(name -> !taken.contains(name)).toList();
    }

    private static Set<String> named(NodeDeclaration declaration, Map<String, Object> raw, Setting.Columns asking) {
        Set<String> names = new LinkedHashSet<>();
        for (Setting other : declaration.settings()) {
            Object value = raw.get(other.key());
            if (other instanceof Setting.OneColumn one && one.port().equals(asking.port()) && value instanceof String name) {
                names.add(name);
            } else if (other instanceof Setting.Columns several && !several.equals(asking) && several.port().equals(asking.port())
                    && value instanceof List<?> list && raw.getOrDefault(key(several), "").toString().isBlank()) {
                list.forEach(name -> names.add(String.valueOf(name)));
            }
        }
        return names;
    }
}
