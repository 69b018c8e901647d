package org.modestead.host.run;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Map;
import java.util.Properties;
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

    /** As built with: asking the database itself would load its native library into runs that need none. */
    private static String duckDb() {
        Properties libraries = new Properties();
        try (InputStream in = Versions.class.getResourceAsStream("libraries.properties")) {
            libraries.load(in);
        } catch (IOException unreadable) {
            throw new UncheckedIOException(unreadable);
        }
        return "v" + libraries.getProperty("duckdb");
    }
}
