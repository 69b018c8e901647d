package org.modestead.host.table;

import java.sql.SQLException;
import java.util.List;
import java.util.Optional;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.RowCursor;

/** Steps through a DuckDB result that is read ahead in chunks, several times as fast as cell by cell. Not for use by several threads. */
final class ChunkedCursor implements RowCursor {

    private final Database database;
    private final DuckDbTable table;
    private final String select;
    private final ChunkFeed feed;
    private ChunkFeed.Rows rows = new ChunkFeed.Rows(0, List.of());
    private int at = -1;
    private boolean over;
    private long row;

    ChunkedCursor(Database database, String select, DuckDbTable table) throws SQLException {
        this.database = database;
        this.table = table;
        this.select = select;
        this.feed = ChunkFeed.start(database, select, types(table));
    }

    /** Returns whether all columns of a table can be read so. */
    static boolean reads(DuckDbTable table) {
        return ChunkCells.TYPES.containsAll(types(table));
    }

    private static List<CellType> types(DuckDbTable table) {
        return table.schema().columns().stream().map(Column::type).toList();
    }

    @Override
    public boolean next() {
        at++;
        if (at < rows.count()) {
            row++;
            return true;
        }
        return !over && isMore();
    }

    private boolean isMore() {
        ChunkFeed.Piece piece = feed.next();
        if (piece instanceof ChunkFeed.Rows more) {
            rows = more;
            at = 0;
            row++;
            return true;
        }
        over = true;
        if (piece instanceof ChunkFeed.Broken) {
            throw CompleteRows.reason(database, select, table, row);
        } else if (piece instanceof ChunkFeed.Defect defect) {
            throw defect(defect.cause());
        }
        return false;
    }

    private static IllegalStateException defect(Throwable cause) {
        if (cause instanceof Error error) {
            throw error; // such as a lack of memory, which the host explains
        }
        return new IllegalStateException("a table could not be read ahead", cause);
    }

    @Override
    public long row() {
        return row;
    }

    @Override
    public boolean isMissing(int column) {
        return rows.columns().get(column) instanceof ChunkCells.Numbers numbers ? Double.isNaN(numbers.number(at)) : cell(column).isEmpty();
    }

    @Override
    public double number(int column) {
        return rows.columns().get(column).number(at);
    }

    @Override
    public Optional<Object> cell(int column) {
        return rows.columns().get(column).cell(at);
    }

    @Override
    public void close() {
        try {
            feed.close();
        } catch (SQLException closing) {
            throw table.explainer().explain(closing);
        } finally {
            database.close();
        }
    }
}
