package org.modestead.host.table;

import java.sql.SQLException;
import java.util.List;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/**
 * A table that is made anew each time it is opened: DuckDB reads the files or runs the query and hands the rows over
 * in chunks. Holds no rows and no connection, so it may be kept and shared at no cost.
 */
public final class DuckDbTable implements Table {

    private final Recipe recipe;
    private final TableSchema schema;
    private final String origin;
    private final int megabytes;
    private final boolean copied;
    private final Explainer explainer;

    /**
     * @param recipe how the rows come about
     * @param schema of the rows
     * @param origin for messages
     * @param megabytes memory limit of DuckDB
     * @param copied whether the rows belong into the result folder; false where they are an input file as it is
     * @param explainer turns DuckDB's refusal into a sentence
     */
    DuckDbTable(Recipe recipe, TableSchema schema, String origin, int megabytes, boolean copied,
            Explainer explainer) {
        this.recipe = recipe;
        this.schema = schema;
        this.origin = origin;
        this.megabytes = megabytes;
        this.copied = copied;
        this.explainer = explainer;
    }

    @Override
    public TableSchema schema() {
        return schema;
    }

    @Override
    public String origin() {
        return origin;
    }

    /** Returns whether the rows belong into the result folder; false where they are an input file as it is. */
    public boolean isCopied() {
        return copied;
    }

    Recipe recipe() {
        return recipe;
    }

    Explainer explainer() {
        return explainer;
    }

    /** Returns the memory limit of DuckDB. */
    int megabytes() {
        return megabytes;
    }

    @Override
    public RowCursor open() {
        Database database = null;
        RowCursor cursor = null;
        try {
            database = Database.open(megabytes);
            recipe.prepare(database, List.of());
            cursor = ChunkedCursor.reads(this) ? new ChunkedCursor(database, recipe.select(), this) : new DuckDbCursor(database, recipe.select(), this);
            return cursor;
        } catch (SQLException failure) {
            throw explainer.explain(failure);
        } finally {
            if (cursor == null && database != null) {
                database.close();
            }
        }
    }
}
