package org.modestead.host.table;

import java.sql.SQLException;
import java.util.List;
import java.util.concurrent.ArrayBlockingQueue;
import java.util.concurrent.BlockingQueue;
import org.duckdb.DuckDBChunkedResult;
import org.duckdb.DuckDBDataChunkReader;
import org.duckdb.DuckDBPreparedStatement;
import org.modestead.engine.Cancelled;
import org.modestead.nodes.table.CellType;

/** Reads the rows of a SELECT ahead, on a thread of its own, while another one uses those read before. */
final class ChunkFeed {

    private static final int AHEAD = 2;
    private static final long MILLIS_BETWEEN_TRIES = 20;

    private final DuckDBPreparedStatement statement;
    private final List<CellType> types;
    private final BlockingQueue<Piece> pieces = new ArrayBlockingQueue<>(AHEAD);
    private final Thread thread = new Thread(this::read, "table-reader");
    private volatile boolean stopped;

    /** What the reading thread hands over. */
    sealed interface Piece {}

    /** Some rows. */
    record Rows(int count, List<ChunkCells> columns) implements Piece {}

    /** All rows were handed over. */
    record Complete() implements Piece {}

    /** The rows ended too early, see {@link CompleteRows}. */
    record Broken() implements Piece {}

    /** The reading thread failed by itself. */
    record Defect(Throwable cause) implements Piece {}

    private ChunkFeed(DuckDBPreparedStatement statement, List<CellType> types) {
        this.statement = statement;
        this.types = types;
    }

    /**
     * Begins to read.
     *
     * @param types of the columns of the SELECT
     */
    static ChunkFeed start(Database database, String select, List<CellType> types) throws SQLException {
        String marked = CompleteRows.marked(select, types.size());
        ChunkFeed feed = new ChunkFeed(database.connection().prepareStatement(marked).unwrap(DuckDBPreparedStatement.class), types);
        feed.thread.setDaemon(true);
        feed.thread.start();
        return feed;
    }

    /**
     * Waits for what comes next; not to be asked again after the end.
     *
     * @throws Cancelled if the waiting thread is interrupted
     */
    Piece next() {
        try {
            return pieces.take();
        } catch (InterruptedException stop) {
            Thread.currentThread().interrupt();
            throw new Cancelled("interrupted");
        }
    }

    private void read() {
        try {
            pieces.put(end());
        } catch (InterruptedException closed) {
            Thread.currentThread().interrupt();
        }
    }

    /** Reads all rows; whatever happens, whoever waits for them is told. */
    private Piece end() throws InterruptedException {
        try {
            return readAll() ? new Complete() : new Broken();
        } catch (RuntimeException | Error defect) {
            return new Defect(defect);
        }
    }

    /** Returns whether the last row came. */
    private boolean readAll() throws InterruptedException {
        try (DuckDBChunkedResult result = statement.query()) {
            boolean last = false;
            while (!stopped && !last && result.nextChunk()) {
                DuckDBDataChunkReader chunk = result.chunk();
                int count = (int) chunk.rowCount();
                last = count > 0 && chunk.vector(types.size()).getBoolean(count - 1L);
                int rows = last ? count - 1 : count;
                if (rows > 0) {
                    pieces.put(new Rows(rows, columns(chunk, rows)));
                }
            }
            return last;
        } catch (SQLException broken) {
            return false; // the reason is found by whoever uses the rows
        }
    }

    private List<ChunkCells> columns(DuckDBDataChunkReader chunk, int rows) {
        ChunkCells[] columns = new ChunkCells[types.size()];
        for (int j = 0; j < columns.length; j++) {
            columns[j] = ChunkCells.of(chunk.vector(j), types.get(j), rows);
        }
        return List.of(columns);
    }

    /** Stops reading and waits until DuckDB does nothing more for it. */
    void close() throws SQLException {
        stopped = true;
        boolean interrupted = Thread.interrupted();
        while (thread.isAlive()) {
            cancel();
            thread.interrupt();
            try {
                thread.join(MILLIS_BETWEEN_TRIES);
            } catch (InterruptedException again) {
                interrupted = true;
            }
        }
        if (interrupted) {
            Thread.currentThread().interrupt();
        }
        statement.close();
    }

    private void cancel() {
        try {
            statement.cancel();
        } catch (SQLException ended) {
            // A statement that cannot be stopped any more has ended.
        }
    }
}
