package org.modestead.host.table;

import java.nio.file.Path;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/** Reads JSON files: a list of objects, or one object a line. */
final class JsonSource {

    private JsonSource() {}

    /**
     * @param path absolute
     * @param shown the name as the person wrote it
     * @param missing texts that stand for a missing cell, besides null
     * @param limits what it may cost
     */
    static TextFile open(Path path, String shown, List<String> missing, SourceLimits limits) {
        List<String> names = names(path, shown, limits);
        String columns = names.stream().map(name -> Sql.text(name) + ": 'VARCHAR'")
                .collect(Collectors.joining(", ", "{", "}"));
        String read = "(SELECT " + names.stream().map(name -> "CASE WHEN " + Sql.name(name) + " NOT IN "
                + Sql.texts(withEmpty(missing)) + " THEN " + Sql.name(name) + " END AS " + Sql.name(name))
                .collect(Collectors.joining(", ")) + " FROM read_json(" + Sql.text(path.toString())
                + ", columns = " + columns + "))";
        return new TextFile(path, shown, read, names, Set.of(), new JsonPlaces());
    }

    private static List<String> names(Path path, String shown, SourceLimits limits) {
        String describe = "DESCRIBE SELECT * FROM read_json(" + Sql.text(path.toString()) + ", sample_size = -1)";
        try (Database database = Database.open(limits.megabytes());
                Statement statement = database.connection().createStatement();
                ResultSet columns = statement.executeQuery(describe)) {
            List<String> names = new ArrayList<>();
            while (columns.next()) {
                names.add(columns.getString("column_name"));
            }
            return names;
        } catch (SQLException failure) {
            DuckDbMessage message = DuckDbMessage.of(failure);
            throw limits.explain(shown, message).orElseGet(() -> new TableFault(shown, message.brief(),
                    "give a list of objects with one value a column, or one such object a line"));
        }
    }

    private static List<String> withEmpty(List<String> missing) {
        List<String> all = new ArrayList<>(missing);
        all.add("");
        return all;
    }

    /** A JSON file's rows have no lines of their own. */
    private record JsonPlaces() implements TextFile.Places {
        @Override
        public void requireEnd() {
            // an object that does not end is refused by the database
        }

        @Override
        public String row(long row) {
            return "row " + row;
        }

        @Override
        public Optional<TableFault> broken() {
            return Optional.empty();
        }
    }
}
