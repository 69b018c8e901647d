package org.modestead.host.table;

import java.io.IOException;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.List;
import java.util.Properties;
import org.modestead.host.output.WholeFolder;

/**
 * A private DuckDB database in memory, for one reading or writing of a table. Results are streamed; what does not fit
 * into the memory limit goes to a temporary folder, which is removed on closing.
 */
final class Database implements AutoCloseable {

    /** Least memory with which DuckDB still reads wide CSV files. */
    static final int LEAST_MEGABYTES = 128;

    /** Memory that is enough for files of any length, because they are streamed. */
    static final int USUAL_MEGABYTES = 512;

    /** More than any machine has; a limit only against slips. */
    static final long MOST_MEGABYTES = 1 << 20;

    private final Connection connection;
    private final Path spill;

    private Database(Connection connection, Path spill) {
        this.connection = connection;
        this.spill = spill;
    }

    /**
     * Opens an empty database.
     *
     * <p>One thread: with more, DuckDB does not promise the order of the rows of a query nor the last digits of a sum.
     *
     * @param megabytes memory limit
     * @throws SQLException if DuckDB cannot start
     */
    static Database open(int megabytes) throws SQLException {
        Path spill;
        try {
            spill = SpillFolder.make();
        } catch (IOException noRoom) {
            throw new SQLException("no temporary folder can be made (" + noRoom.getMessage() + ")", noRoom);
        }
        Properties settings = new Properties();
        settings.setProperty("jdbc_stream_results", "true");
        settings.setProperty("memory_limit", megabytes + "MB");
        settings.setProperty("threads", "1");
        settings.setProperty("temp_directory", spill.toString());
        settings.setProperty("autoinstall_known_extensions", "false");
        settings.setProperty("autoload_known_extensions", "false");
        Connection connection;
        try {
            connection = DriverManager.getConnection("jdbc:duckdb:", settings);
        } catch (SQLException refused) {
            remove(spill);
            throw refused;
        }
        Database database = new Database(connection, spill);
        database.execute("SET TimeZone = 'UTC'");
        return database;
    }

    Connection connection() {
        return connection;
    }

    /** Runs a statement without result. */
    void execute(String sql) throws SQLException {
        try (Statement statement = connection.createStatement()) {
            InterruptWatch.during(statement, () -> statement.execute(sql));
        }
    }

    /** Runs a query that gives one row and hands it over. */
    <T> T one(String sql, RowReader<T> reader) throws SQLException {
        try (Statement statement = connection.createStatement()) {
            return InterruptWatch.during(statement, () -> {
                try (ResultSet row = statement.executeQuery(sql)) {
                    if (!row.next()) {
                        throw new SQLException("no row from " + sql);
                    }
                    return reader.read(row);
                }
            });
        }
    }

    /** Reads the current row of a result. */
    interface RowReader<T> {
        T read(ResultSet row) throws SQLException;
    }

    /**
     * Forbids all further access to files but those given, for good: from here on the database may run a query that
     * somebody else wrote.
     */
    void confine(List<Path> files) throws SQLException {
        execute("SET allowed_paths = " + Sql.texts(files.stream().map(Path::toString).toList()));
        execute("SET enable_external_access = false");
        execute("SET lock_configuration = true");
    }

    @Override
    public void close() {
        try {
            connection.close();
        } catch (SQLException closing) {
            throw new IllegalStateException("the database did not close: " + closing.getMessage(), closing);
        } finally {
            remove(spill);
        }
    }

    private static void remove(Path folder) {
        try {
            WholeFolder.remove(folder);
        } catch (IOException left) {
            // A temporary folder that cannot be removed harms nobody's result; the system clears it.
            folder.toFile().deleteOnExit();
        }
    }
}
