package org.modestead.release;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.Stream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;

/**
 * What a person downloads, opened: the entries of all its jars, and of the jars inside those, by name.
 *
 * @param name as the table of dependencies calls it
 * @param entries texts, classes and lists of parts with their bytes; of all else only the names
 */
record Shipment(String name, Map<String, byte[]> entries) {

    private static final String PARTS = "META-INF/sbom/";

    Shipment {
        entries = Collections.unmodifiableMap(new TreeMap<>(entries));
    }

    /** Opens the runnable jar. */
    static Shipment jar() {
        return of("jar", List.of(Path.of(System.getProperty("runnable.jar"))));
    }

    /** Opens the job for Apache Spark. */
    static Shipment spark() {
        return of("spark", List.of(Path.of(System.getProperty("spark.jar"))));
    }

    /** Opens the bundles of the update site. */
    static Shipment site() {
        try (Stream<Path> jars = Files.list(Path.of(System.getProperty("site.plugins")))) {
            return of("site", jars.sorted().toList());
        } catch (IOException unreadable) {
            throw new UncheckedIOException(unreadable);
        }
    }

    static List<Shipment> all() {
        return List.of(jar(), site(), spark());
    }

    private static Shipment of(String name, List<Path> jars) {
        Map<String, byte[]> entries = new TreeMap<>();
        for (Path jar : jars) {
            try (InputStream stream = Files.newInputStream(jar)) {
                take(stream, entries);
            } catch (IOException unreadable) {
                throw new UncheckedIOException(jar.toString(), unreadable);
            }
        }
        return new Shipment(name, entries);
    }

    private static void take(InputStream jar, Map<String, byte[]> entries) throws IOException {
        ZipInputStream zip = new ZipInputStream(jar);
        for (ZipEntry entry = zip.getNextEntry(); entry != null; entry = zip.getNextEntry()) {
            if (entry.getName().endsWith(".jar")) {
                take(new ByteArrayInputStream(zip.readAllBytes()), entries);
            } else if (!entry.isDirectory()) {
                // Native libraries and data are large and not looked into.
                entries.put(entry.getName(), entry.getName().matches(".*([.]txt|[.]json|/LICENSE|pom[.]properties)") ? zip.readAllBytes() : new byte[0]);
            }
        }
    }

    Optional<String> text(String entry) {
        return Optional.ofNullable(entries.get(entry)).map(bytes -> new String(bytes, StandardCharsets.UTF_8));
    }

    /** Returns the names of its classes, those for one version of Java under their plain name. */
    List<String> classes() {
        return entries.keySet().stream().filter(name -> name.endsWith(".class")).map(name -> name.replaceFirst("^META-INF/versions/\\d+/", ""))
                .filter(name -> !name.equals("module-info.class")).distinct().toList();
    }

    /** Returns its lists of parts by the name of the module that they are of. */
    Map<String, PartsList> partsLists() {
        Map<String, PartsList> lists = new TreeMap<>();
        entries.keySet().stream().filter(name -> name.startsWith(PARTS) && name.endsWith(".json"))
                .forEach(name -> lists.put(name.substring(PARTS.length()).replace(".cdx.json", ""), PartsList.read(text(name).orElseThrow())));
        return lists;
    }
}
