package org.modestead.host.run;

import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.SQLException;
import java.util.Map;
import java.util.TreeMap;
import org.ejml.EjmlVersion;
import org.modestead.engine.linalg.LinearAlgebra;

/** What computed a result, for the record. */
public final class Versions {

    private static final String UNPACKED = "development";

    private Versions() {}

    /** Returns the release, or {@code development} when not started from a release's jar. */
    public static String modestead() {
        String version = Versions.class.getPackage().getImplementationVersion();
        return version == null ? UNPACKED : version;
    }

    /** Returns the libraries that have done the linear algebra so far, with their versions. */
    static String linearAlgebra() {
        return LinearAlgebra.installed().name();
    }

    static Map<String, String> all() {
        Map<String, String> all = new TreeMap<>();
        all.put("modestead", modestead());
        all.put("java", System.getProperty("java.version") + " (" + System.getProperty("java.vendor") + ")");
        all.put("system", System.getProperty("os.name") + " " + System.getProperty("os.arch"));
        all.put("ejml", EjmlVersion.VERSION);
        all.put("duckdb", duckDb());
        return all;
    }

    private static String duckDb() {
        try (Connection connection = DriverManager.getConnection("jdbc:duckdb:")) {
            return connection.getMetaData().getDatabaseProductVersion();
        } catch (SQLException absent) {
            return "not available (" + absent.getMessage() + ")";
        }
    }
}
