package org.modestead.host.table;

import java.io.IOException;
import java.nio.file.Path;
import java.sql.SQLException;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import org.modestead.nodes.files.InOneStep;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/** Tables kept in files: what is read back has the same columns, cells and order. */
public final class KeptTable {

    private KeptTable() {}

    /** Returns whether a table makes its rows anew from files or a query, so that it costs nothing to keep and to make again. */
    public static boolean isMadeAnew(Table table) {
        return table instanceof DuckDbTable || table instanceof NpyTable;
    }

    /**
     * Writes a table, whole or not at all.
     *
     * @param file Parquet, absolute
     * @throws IOException if it cannot be written
     */
    public static void write(Table table, Path file) throws IOException {
        Recipe recipe = Recipe.of(table);
        InOneStep.make(file, part -> {
            try (Database database = Database.open(Database.USUAL_MEGABYTES)) {
                recipe.prepare(database, List.of(part));
                database.execute("COPY (" + recipe.select() + ") TO " + Sql.text(part.toString()) + " (FORMAT parquet)");
            } catch (SQLException failure) {
                throw new IOException(DuckDbMessage.of(failure).brief(), failure);
            }
        });
    }

    /**
     * Opens a table that {@link #write} wrote.
     *
     * @param schema it had
     * @param origin it had, for messages
     */
    public static Table read(Path file, TableSchema schema, String origin) {
        String columns = schema.columns().stream().map(column -> "CAST(" + Sql.name(column.name()) + " AS " + SqlTypes.sqlType(column.type()) + ") AS "
                + Sql.name(column.name())).collect(Collectors.joining(", "));
        Recipe recipe = Recipe.file("SELECT " + columns + " FROM read_parquet(" + Sql.text(file.toString()) + ")", file);
        SourceLimits limits = new SourceLimits(Database.USUAL_MEGABYTES, true);
        return new DuckDbTable(recipe, schema, origin, limits.megabytes(), true, new KeptExplainer(file, origin, limits));
    }

    private record KeptExplainer(Path file, String origin, SourceLimits limits) implements Explainer {
        @Override
        public Optional<TableFault> claim(DuckDbMessage message) {
            return message.text().contains(file.toString()) ? Optional.of(explain(message)) : Optional.empty();
        }

        @Override
        public TableFault explain(DuckDbMessage message) {
            return limits.explain(origin, message).orElseGet(() -> new TableFault(origin, message.brief(), "run the step again"));
        }
    }
}
