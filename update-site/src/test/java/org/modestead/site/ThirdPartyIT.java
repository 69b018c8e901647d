package org.modestead.site;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.stream.Stream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import org.junit.jupiter.api.Test;

/** Every library in the site, bundles and jars inside bundles, is listed in the nodes' or the accelerator's bundle with its licence, and the licence's text is there. */
class ThirdPartyIT {

    private static final Path PLUGINS = Path.of(System.getProperty("site.repository"), "plugins");
    private static final String FOLDER = "META-INF/third-party/";

    /** Returns the content of all bundles whose names begin so, by name; jars inside them are opened, too. */
    private static Map<String, byte[]> content(boolean ours) throws IOException {
        Map<String, byte[]> content = new TreeMap<>();
        try (Stream<Path> jars = Files.list(PLUGINS)) {
            for (Path jar : jars.filter(file -> file.getFileName().toString().startsWith("org.modestead.") == ours).sorted().toList()) {
                take(Files.readAllBytes(jar), content);
            }
        }
        return content;
    }

    private static void take(byte[] jar, Map<String, byte[]> content) throws IOException {
        try (ZipInputStream zip = new ZipInputStream(new ByteArrayInputStream(jar))) {
            for (ZipEntry entry = zip.getNextEntry(); entry != null; entry = zip.getNextEntry()) {
                // Native libraries are of the library whose classes lie beside them, and large.
                byte[] bytes = entry.getName().matches(".*[.](class|txt|jar)") ? zip.readAllBytes() : new byte[0];
                content.put(entry.getName(), bytes);
                if (entry.getName().endsWith(".jar")) {
                    take(bytes, content);
                }
            }
        }
    }

    @Test
    void everyLibraryIsListedWithALicenceWhoseTextIsThere() throws IOException {
        Map<String, byte[]> ours = content(true);
        Map<String, List<String>> listed = new LinkedHashMap<>();
        for (String line : Stream.of("nodes", "accelerator").map(part -> new String(ours.get(FOLDER + part + "-libraries.txt"), StandardCharsets.UTF_8))
                .flatMap(text -> text.lines().skip(2)).toList()) {
            String[] cells = line.split("\\s*[|]\\s*");
            Stream.of(cells[3].split(",\\s*")).forEach(prefix -> listed.put(prefix, List.of(cells[2].split(",\\s*"))));
        }
        Set<String> unused = new TreeSet<>(listed.keySet());
        Set<String> unlisted = new TreeSet<>();
        Stream.concat(content(false).keySet().stream(), ours.keySet().stream()).map(name -> name.replaceFirst("^META-INF/versions/\\d+/", ""))
                .filter(name -> name.endsWith(".class") && !name.startsWith("org/modestead/") && !name.equals("module-info.class")).forEach(name -> {
                    List<String> prefixes = listed.keySet().stream().filter(name::startsWith).toList();
                    unused.removeAll(prefixes);
                    if (prefixes.isEmpty()) {
                        unlisted.add(name);
                    }
                });
        assertEquals(List.of(), unlisted.stream().limit(10).toList(), "classes of libraries that are not listed");
        assertEquals(Set.of(), unused, "listed, but not in the site");
        listed.values().stream().flatMap(List::stream).forEach(file -> {
            byte[] text = ours.get(FOLDER + "licences/" + file);
            assertTrue(text != null && text.length > 1000, "no text of " + file);
        });
    }
}
