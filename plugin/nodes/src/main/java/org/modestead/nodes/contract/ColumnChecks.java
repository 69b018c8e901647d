package org.modestead.nodes.contract;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.TableSchema;

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
                    problem(one.key(), name, one.types(), inputs.get(one.port())).ifPresent(problems::add);
                }
            } else if (setting instanceof Setting.Columns several && inputs.containsKey(several.port())) {
                for (String name : settings.texts(several.key())) {
                    problem(several.key(), name, several.types(), inputs.get(several.port())).ifPresent(problems::add);
                }
            }
        }
        return problems;
    }

    private static Optional<SettingProblem> problem(String key, String name, Set<CellType> types, TableSchema schema) {
        OptionalInt index = schema.indexOf(name);
        List<String> fitting = schema.columns().stream()
                .filter(column -> types.contains(column.type())).map(Column::name).toList();
        if (index.isEmpty()) {
            return Optional.of(new SettingProblem(key, "the input has no column " + name
                    + NearestName.hint(name, schema.names()), wanted(types, fitting)));
        }
        CellType type = schema.columns().get(index.getAsInt()).type();
        return types.contains(type) ? Optional.empty()
                : Optional.of(new SettingProblem(key, "the column " + name + " holds " + type.title(), wanted(types,
                        fitting)));
    }

    private static String wanted(Set<CellType> types, List<String> fitting) {
        if (fitting.isEmpty()) {
            return "connect a table with a column of type " + SettingText.types(types);
        }
        String more = fitting.size() > MOST_LISTED ? " and " + (fitting.size() - MOST_LISTED) + " more" : "";
        return "choose a column of type " + SettingText.types(types) + ": "
                + String.join(", ", fitting.subList(0, Math.min(MOST_LISTED, fitting.size()))) + more;
    }
}
