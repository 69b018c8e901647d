package org.modestead.host.table;

import java.sql.SQLException;
import java.util.List;
import java.util.stream.Collectors;
import org.modestead.engine.Cancelled;
import org.modestead.nodes.table.Table;

/** The rows of a query, made once and thrown away: what cannot be computed in one of them is found before anybody needs it. */
public final class AllRows {

    private AllRows() {}

    /**
     * Makes all rows where a query makes them; other tables are files as they are, or were computed.
     *
     * @throws TableFault if a row cannot be made
     * @throws Cancelled if the thread is interrupted
     */
    public static void demand(Table table) {
        if (!(table instanceof DuckDbTable stored) || !stored.isCopied()) {
            return;
        }
        // a digest needs every cell; DuckDB would count cells without computing them where none can be missing
        String cells = table.schema().names().stream().map(Sql::name).collect(Collectors.joining(", "));
        try (Database database = Database.open(stored.megabytes())) {
            stored.recipe().prepare(database, List.of());
            database.one("SELECT bit_xor(hash(" + cells + ")) FROM (" + stored.recipe().select() + ")", digest -> digest.getObject(1) != null);
        } catch (SQLException failure) {
            Cancelled.ifInterrupted();
            throw stored.explainer().explain(failure);
        }
    }
}
