package org.modestead.release;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.StringReader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Properties;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;

/** The lists of parts (SBOM) that lie in what is shipped are in the format they say and leave nothing out. */
class PartsListIT {

    private static final Pattern LISTED = Pattern.compile("^\\s*([^:\\s]+):([^:]+):[^:]+:(?:[^:]+:)?([^:]+):(?:compile|runtime)\\b.*");

    private static final Shipment JAR = Shipment.jar();

    @Test
    void eachDownloadHoldsTheListOfItsParts() {
        Shipment site = Shipment.site();
        Shipment spark = Shipment.spark();
        assertTrue(JAR.partsLists().keySet().contains("org.modestead.host"));
        assertTrue(spark.partsLists().keySet().contains("org.modestead.spark"));
        assertEquals(Set.of("org.modestead.knime", "org.modestead.accelerator"), site.partsLists().keySet());
        for (Shipment shipment : List.of(JAR, site, spark)) {
            shipment.partsLists().forEach((module, list) -> {
                assertEquals("1.6", list.version(), module);
                assertEquals(module, list.subject());
                assertTrue(list.parts().size() > 1, module);
                list.parts().forEach((name, part) -> {
                    assertTrue(part.purl().startsWith("pkg:maven/" + name.replace(':', '/') + "@" + part.version()), name + " is told as " + part.purl());
                    assertTrue(!part.licences().isEmpty(), module + " tells no licence of " + name);
                });
            });
        }
    }

    /** Maven's own list of what the runnable jar needs at run time, against the list of parts. */
    @Test
    void everyLibraryThatTheRunnableJarRunsOnIsInItsList() throws IOException {
        Map<String, String> runtime = new TreeMap<>();
        for (String line : Files.readAllLines(Path.of(System.getProperty("runtime.libraries")))) {
            Matcher matcher = LISTED.matcher(line);
            if (matcher.matches() && !matcher.group(1).equals("org.modestead")) {
                runtime.put(matcher.group(1) + ":" + matcher.group(2), matcher.group(3));
            }
        }
        assertTrue(runtime.size() > 15, runtime.toString());
        Map<String, PartsList.Part> parts = JAR.partsLists().get("org.modestead.host").parts();
        Set<String> missing = new TreeSet<>();
        runtime.forEach((name, version) -> {
            if (!parts.containsKey(name) || !parts.get(name).version().equals(version)) {
                missing.add(name + " " + version);
            }
        });
        assertEquals(Set.of(), missing);
    }

    /** What a library says of itself inside the jar: the copied classes of the accelerator's libraries say it too, which are no dependency of the jar. */
    @Test
    void everyLibraryThatNamesItselfInTheRunnableJarIsInItsList() throws IOException {
        Map<String, PartsList.Part> parts = JAR.partsLists().get("org.modestead.host").parts();
        List<String> files = JAR.entries().keySet().stream().filter(name -> name.matches("META-INF/maven/.*/pom[.]properties")).toList();
        Set<String> named = new TreeSet<>();
        for (String file : files) {
            Properties properties = new Properties();
            properties.load(new StringReader(JAR.text(file).orElseThrow()));
            String name = properties.getProperty("groupId") + ":" + properties.getProperty("artifactId");
            if (!name.startsWith("org.modestead:")) {
                named.add(name);
                assertTrue(parts.containsKey(name), name);
                assertEquals(properties.getProperty("version"), parts.get(name).version(), name);
            }
        }
        assertTrue(named.containsAll(List.of("org.bytedeco:openblas", "org.bytedeco:javacpp")), named.toString());
    }
}
