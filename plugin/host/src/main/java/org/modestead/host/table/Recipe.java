package org.modestead.host.table;

import java.nio.file.Path;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.UUID;
import java.util.stream.Collectors;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.Table;

/**
 * How rows come about in an empty database: a SELECT and what it reads. A recipe may be used in a larger one, because
 * it is a single expression.
 *
 * @param select SQL whose columns have the types of {@link SqlTypes#sqlType}
 * @param files absolute paths that the SQL reads
 * @param loaded tables not held in files, to be copied in under these names before the SQL runs
 */
record Recipe(String select, List<Path> files, Map<String, Table> loaded) {

    Recipe {
        files = List.copyOf(files);
        loaded = Map.copyOf(loaded);
    }

    static Recipe file(String select, Path file) {
        return new Recipe(select, List.of(file), Map.of());
    }

    /** Returns the recipe of any table: its own, or one that copies it in. */
    static Recipe of(Table table) {
        if (table instanceof DuckDbTable stored) {
            return stored.recipe();
        }
        String name = "loaded-" + UUID.randomUUID();
        String columns = table.schema().columns().stream().map(Column::name).map(Sql::name)
                .collect(Collectors.joining(", "));
        return new Recipe("SELECT " + columns + " FROM " + Sql.name(name), List.of(), Map.of(name, table));
    }

    /**
     * Copies in what the SQL reads besides files, and closes the database to all files but those that the SQL reads and
     * the given ones.
     */
    void prepare(Database database, List<Path> written) throws SQLException {
        for (Map.Entry<String, Table> entry : new TreeMap<>(loaded).entrySet()) {
            TableLoader.load(database, entry.getKey(), entry.getValue());
        }
        List<Path> open = new ArrayList<>(files);
        open.addAll(written);
        database.confine(open);
    }

    /** Returns a recipe for another SELECT that reads what this and the other recipes read. */
    static Recipe over(String select, List<Recipe> read) {
        List<Path> files = new ArrayList<>();
        Map<String, Table> loaded = new TreeMap<>();
        for (Recipe one : read) {
            files.addAll(one.files());
            loaded.putAll(one.loaded());
        }
        return new Recipe(select, files.stream().distinct().toList(), loaded);
    }
}
