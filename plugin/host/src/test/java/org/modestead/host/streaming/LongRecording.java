package org.modestead.host.streaming;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.sql.Statement;

/**
 * Recordings of any length as a folder of Parquet files, made by the database in constant memory: two damped oscillations that start anew every
 * thousand rows, seen by four channels, in runs. Frequencies 0.5 and 1.3 cycles a second at damping rates 0.05 and 0.12, rows every 0.05 s.
 */
final class LongRecording {

    private static final String SIGNAL = """
            SELECT run, time, a + 0.3 * c AS level, b - 0.5 * d AS flow, 0.2 * a + c AS pressure, d + 0.1 * b AS speed FROM (
              SELECT run, time, exp(-0.05 * s) * cos(pi() * s) AS a, exp(-0.05 * s) * sin(pi() * s) AS b,
                     exp(-0.12 * s) * cos(2.6 * pi() * s + p) AS c, exp(-0.12 * s) * sin(2.6 * pi() * s + p) AS d FROM (
                SELECT 'run ' || lpad((i // %1$d)::VARCHAR, 4, '0') AS run, (i %% %1$d) * 0.05 + (i %% %1$d) // 1000 * 7 AS time,
                       (i %% %1$d %% 1000) * 0.05 AS s, (i // 1000 %% 7) AS p FROM range(%2$d, %3$d) AS rows(i)))""";

    private LongRecording() {}

    /**
     * @param folder to be made
     * @param rows in all
     * @param runRows rows of a run
     */
    static void write(Path folder, long rows, long runRows) throws IOException, SQLException {
        Files.createDirectories(folder);
        long file = 2_000_000;
        try (Connection database = DriverManager.getConnection("jdbc:duckdb:"); Statement statement = database.createStatement()) {
            statement.execute("SET threads = 1; SET preserve_insertion_order = true");
            for (long from = 0; from < rows; from += file) {
                String signal = String.format(SIGNAL, runRows, from, Math.min(rows, from + file));
                statement.execute("COPY (" + signal + ") TO '" + folder.resolve(String.format("part-%05d.parquet", from / file)) + "' (FORMAT PARQUET)");
            }
        }
    }
}
