package org.modestead.nodes.contract;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.words.Sentence;

/** Checks column settings against the columns that arrive. */
public final class ColumnChecks {

    private static final int MOST_LISTED = 12;

    private ColumnChecks() {}

    /**
     * Returns what is wrong with the column settings that are shown: a column that is not there or has a type that
     * does not fit.
     *
     * @param declaration of the node
     * @param settings read against it
     * @param inputs schemas of connected input tables, by port id, where known; settings of other ports are skipped
     * @return all problems, empty when all is well
     */
    public static List<SettingProblem> check(NodeDeclaration declaration, Settings settings,
            Map<String, TableSchema> inputs) {
        List<SettingProblem> problems = new ArrayList<>();
        for (Setting setting : Visibility.shown(declaration, settings)) {
            if (setting instanceof Setting.OneColumn one && inputs.containsKey(one.port())) {
                String name = settings.text(one.key());
                if (!name.isEmpty()) {
                    problem(one.key(), name, one.types(), columns(inputs.get(one.port()))).ifPresent(problems::add);
                }
            } else if (setting instanceof Setting.Columns several && inputs.containsKey(several.port())) {
                Map<String, CellType> columns = columns(inputs.get(several.port()));
                for (String name : settings.texts(several.key())) {
                    problem(several.key(), name, several.types(), columns).ifPresent(problems::add);
                }
            }
        }
        return problems;
    }

    /** Looked up by name, for a table may have thousands of columns and a setting name most of them. */
    private static Map<String, CellType> columns(TableSchema schema) {
        Map<String, CellType> columns = new LinkedHashMap<>();
        schema.columns().forEach(column -> columns.putIfAbsent(column.name(), column.type()));
        return columns;
    }

    private static Optional<SettingProblem> problem(String key, String name, Set<CellType> types, Map<String, CellType> columns) {
        CellType type = columns.get(name);
        if (type == null) {
            return Optional.of(new SettingProblem(key, "the input has no column " + name + NearestName.hint(name, columns.keySet()),
                    wanted(types, fitting(types, columns))));
        }
        return types.contains(type) ? Optional.empty()
                : Optional.of(new SettingProblem(key, "the column " + name + " holds " + type.title(), wanted(types, fitting(types, columns))));
    }

    private static List<String> fitting(Set<CellType> types, Map<String, CellType> columns) {
        return columns.entrySet().stream().filter(column -> types.contains(column.getValue())).map(Map.Entry::getKey).toList();
    }

    private static String wanted(Set<CellType> types, List<String> fitting) {
        if (fitting.isEmpty()) {
            return "connect a table with a column of type " + SettingText.types(types);
        }
        return "choose a column of type " + SettingText.types(types) + ": " + Sentence.listed(fitting, MOST_LISTED);
    }
}
