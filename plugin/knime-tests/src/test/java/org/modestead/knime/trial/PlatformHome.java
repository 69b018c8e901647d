package org.modestead.knime.trial;

import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.jar.JarFile;
import java.util.jar.Manifest;
import java.util.stream.Stream;

/**
 * A folder with the platform's bundles: jars and unpacked ones, directly in it or in its {@code plugins}.
 *
 * @param bundles in order of their names
 */
record PlatformHome(List<Place> bundles) {

    private static final String FRAMEWORK = "org.eclipse.osgi";

    /**
     * One bundle.
     *
     * @param name its symbolic name
     * @param path jar or folder
     */
    record Place(String name, Path path) {}

    /** Returns the home that was given, or skips the test with a sentence. */
    static PlatformHome givenOrSkipped() throws IOException {
        String folder = System.getProperty("platform.home", "");
        assumeTrue(!folder.isBlank(),
                "Skipped, there is no platform here: give -Dplatform.home=<folder with the platform's bundles> to run this.");
        return of(Path.of(folder));
    }

    static PlatformHome of(Path folder) throws IOException {
        Path plugins = Files.isDirectory(folder.resolve("plugins")) ? folder.resolve("plugins") : folder;
        List<Place> found = new ArrayList<>();
        try (Stream<Path> entries = Files.list(plugins)) {
            for (Path entry : entries.sorted().toList()) {
                symbolicName(entry).ifPresent(name -> found.add(new Place(name, entry)));
            }
        }
        return new PlatformHome(List.copyOf(found));
    }

    /** Returns the OSGi framework's jar, with which everything is started. */
    Path framework() {
        return bundle(FRAMEWORK);
    }

    /** Returns all bundles but the framework. */
    List<Path> installed() {
        return bundles.stream().filter(place -> !place.name().equals(FRAMEWORK)).map(Place::path).toList();
    }

    Path bundle(String name) {
        return bundles.stream().filter(place -> place.name().equals(name)).map(Place::path).findFirst()
                .orElseThrow(() -> new IllegalStateException("platform.home holds no bundle " + name));
    }

    static Optional<String> symbolicName(Path bundle) throws IOException {
        Optional<Manifest> manifest = Optional.empty();
        Path unpacked = bundle.resolve("META-INF").resolve("MANIFEST.MF");
        if (Files.isDirectory(bundle) && Files.isRegularFile(unpacked)) {
            try (InputStream in = Files.newInputStream(unpacked)) {
                manifest = Optional.of(new Manifest(in));
            }
        } else if (bundle.toString().endsWith(".jar")) {
            try (JarFile jar = new JarFile(bundle.toFile())) {
                manifest = Optional.ofNullable(jar.getManifest());
            }
        }
        return manifest.map(read -> read.getMainAttributes().getValue("Bundle-SymbolicName"))
                .map(name -> name.split(";")[0].strip());
    }
}
