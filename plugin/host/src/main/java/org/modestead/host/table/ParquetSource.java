package org.modestead.host.table;

import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.SQLException;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads Parquet files, whose columns carry their types: one, or all of a folder in the order of their names, as other programs write tables. */
final class ParquetSource {

    private ParquetSource() {}

    /**
     * Returns whether this is a folder of which some file is Parquet.
     *
     * @param path absolute
     */
    static boolean isFolder(Path path) {
        return Files.isDirectory(path) && !within(path, path.toString()).isEmpty();
    }

    private static List<Path> within(Path folder, String shown) {
        return FolderFiles.of(folder, shown, "parquet");
    }

    /**
     * @param path absolute, a file or a folder of them
     * @param shown the name as the person wrote it
     * @param limits what it may cost
     */
    static DuckDbTable open(Path path, String shown, SourceLimits limits) {
        List<Path> files = Files.isDirectory(path) ? within(path, shown) : List.of(path);
        String rows = "SELECT * FROM read_parquet(" + Sql.texts(files.stream().map(Path::toString).toList()) + ")";
        try (Database database = Database.open(limits.megabytes())) {
            SelectShape shape = SelectShape.of(database, rows, shown);
            if (database.one("SELECT count(*) FROM (" + rows + ")", row -> row.getLong(1)) == 0) {
                throw new TableFault(shown, "the table has " + shape.schema().columns().size() + " columns but no row",
                        "give a table with at least one row");
            }
            return new DuckDbTable(new Recipe(shape.select(), files, Map.of()), shape.schema(), shown, limits.megabytes(),
                    limits.copied(),
                    new ParquetExplainer(path, shown, limits));
        } catch (SQLException failure) {
            throw new ParquetExplainer(path, shown, limits).explain(failure);
        }
    }

    private record ParquetExplainer(Path path, String shown, SourceLimits limits) implements Explainer {

        @Override
        public Optional<TableFault> claim(DuckDbMessage message) {
            return message.text().contains(path.toString()) ? Optional.of(explain(message)) : Optional.empty();
        }

        @Override
        public TableFault explain(DuckDbMessage message) {
            return limits.explain(shown, message)
                    .orElseGet(() -> new TableFault(shown, message.brief(), "give a complete Parquet file"));
        }
    }
}
