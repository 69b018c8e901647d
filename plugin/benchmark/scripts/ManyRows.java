import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.sql.Statement;

/** Writes an invented recording of two rhythms as Parquet: file, number of rows. Runs as a source file with the project's jar beside it. */
final class ManyRows {

    private ManyRows() {}

    public static void main(String[] arguments) throws SQLException {
        String slow = "2 * pi() * 0.31 * 0.02 * i";
        String fast = "2 * pi() * 0.97 * 0.02 * i";
        String select = "SELECT i * 0.02 AS time, cos(" + slow + ") + 0.3 * sin(" + fast + ") AS level, sin(" + slow + ") AS flow, cos(" + fast
                + ") AS valve, 0.5 * cos(" + slow + ") - sin(" + fast + ") AS shaft FROM range(" + Long.parseLong(arguments[1]) + ") AS t(i)";
        try (Connection database = DriverManager.getConnection("jdbc:duckdb:"); Statement statement = database.createStatement()) {
            statement.execute("SET memory_limit = '2GB'");
            statement.execute("COPY (" + select + ") TO '" + arguments[0].replace("'", "''") + "' (FORMAT parquet, COMPRESSION snappy)");
        }
    }
}
