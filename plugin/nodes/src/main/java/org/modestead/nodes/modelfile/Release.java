package org.modestead.nodes.modelfile;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Properties;

/** The release that writes, as the build filled it in. */
final class Release {

    private static final String RESOURCE = "release.properties";

    private Release() {}

    static String name() {
        try (InputStream in = Release.class.getResourceAsStream(RESOURCE)) {
            Properties properties = new Properties();
            properties.load(in);
            return "Modestead " + properties.getProperty("version");
        } catch (IOException broken) {
            throw new UncheckedIOException("the bundle lacks " + RESOURCE, broken);
        }
    }
}
