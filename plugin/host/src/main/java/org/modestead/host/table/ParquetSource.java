package org.modestead.host.table;

import java.nio.file.Path;
import java.sql.SQLException;
import java.util.Optional;

/** Reads Parquet files, whose columns carry their types. */
final class ParquetSource {

    private ParquetSource() {}

    /**
     * @param path absolute
     * @param shown the name as the person wrote it
     * @param limits what it may cost
     */
    static DuckDbTable open(Path path, String shown, SourceLimits limits) {
        String rows = "SELECT * FROM read_parquet(" + Sql.text(path.toString()) + ")";
        try (Database database = Database.open(limits.megabytes())) {
            SelectShape shape = SelectShape.of(database, rows, shown);
            if (database.one("SELECT count(*) FROM (" + rows + ")", row -> row.getLong(1)) == 0) {
                throw new TableFault(shown, "the table has " + shape.schema().columns().size() + " columns but no row",
                        "give a table with at least one row");
            }
            return new DuckDbTable(Recipe.file(shape.select(), path), shape.schema(), shown, limits.megabytes(),
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
