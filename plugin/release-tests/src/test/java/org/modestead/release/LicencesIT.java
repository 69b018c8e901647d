package org.modestead.release;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Every library in the runnable jar, in the site's bundles and in the job for Spark is listed there with its licence, and the licence's text lies beside. */
class LicencesIT {

    private static final String FOLDER = "META-INF/third-party/";
    private static final String WEBJARS = "META-INF/resources/webjars/";

    private static final List<Shipment> SHIPMENTS = Shipment.all();

    static List<Shipment> shipments() {
        return SHIPMENTS;
    }

    /** Returns the files of licences by the prefix of the packages that are listed. */
    private static Map<String, List<String>> listed(Shipment shipment) {
        Map<String, List<String>> listed = new LinkedHashMap<>();
        shipment.entries().keySet().stream().filter(name -> name.matches(FOLDER + "[a-z]+-libraries[.]txt"))
                .flatMap(list -> shipment.text(list).orElseThrow().lines().skip(2)).forEach(line -> {
                    String[] cells = line.split("\\s*[|]\\s*");
                    assertEquals(4, cells.length, line);
                    Stream.of(cells[3].split(",\\s*")).forEach(prefix -> listed.put(prefix, List.of(cells[2].split(",\\s*"))));
                });
        return listed;
    }

    @ParameterizedTest(name = "{index}")
    @MethodSource("shipments")
    void everyClassIsOursOrOfAListedLibraryAndEveryListedLibraryIsThere(Shipment shipment) {
        Map<String, List<String>> listed = listed(shipment);
        Set<String> unused = new TreeSet<>(listed.keySet());
        List<String> unlisted = new ArrayList<>();
        for (String type : shipment.classes()) {
            if (!type.startsWith("org/modestead/")) {
                List<String> prefixes = listed.keySet().stream().filter(type::startsWith).toList();
                unused.removeAll(prefixes);
                if (prefixes.isEmpty()) {
                    unlisted.add(type);
                }
            }
        }
        assertEquals(List.of(), unlisted.stream().limit(10).toList(), "classes of libraries that are not listed in the " + shipment.name());
        assertEquals(Set.of(), unused, "listed, but not in the " + shipment.name());
    }

    @ParameterizedTest(name = "{index}")
    @MethodSource("shipments")
    void theTextOfEveryLicenceIsThere(Shipment shipment) {
        listed(shipment).values().stream().flatMap(List::stream).distinct().forEach(file -> {
            String text = shipment.text(FOLDER + "licences/" + file).orElse("");
            assertTrue(text.length() > 1000 && text.matches("(?s).*(Licen[sc]e|LICENSE|Permission is hereby granted|Redistribution and use).*"),
                    file + " in the " + shipment.name());
        });
        assertTrue(shipment.text("META-INF/LICENSE").orElse("").contains("Apache License"), "our own in the " + shipment.name());
    }

    /** What the bench's page loads brings its licence along. */
    @Test
    void everyLibraryOfThePageHasItsLicenceBesideIt() {
        Set<String> names = SHIPMENTS.get(0).entries().keySet();
        Set<String> folders = new TreeSet<>();
        names.stream().filter(name -> name.startsWith(WEBJARS))
                .forEach(name -> folders.add(name.substring(0, name.indexOf('/', name.indexOf('/', WEBJARS.length()) + 1) + 1)));
        assertEquals(2, folders.size(), folders.toString());
        folders.forEach(folder -> assertTrue(names.contains(folder + "LICENSE"), folder));
    }

    /** The fast linear algebra library of every platform is there, and of the released files only those that are loaded. */
    @Test
    void theNativeLibrariesOfEveryPlatformAreThere() {
        Set<String> found = new TreeSet<>();
        SHIPMENTS.get(0).entries().keySet().stream().filter(name -> name.startsWith("org/bytedeco/") && !name.endsWith(".class") && !name.endsWith(".properties"))
                .forEach(name -> found.add(name.replaceFirst("^org/bytedeco/", "").replaceFirst("[.](so|dylib|dll)[.0-9]*$|([.][0-9.]+)?[.]dylib$", "")));
        for (String platform : List.of("linux-arm64", "linux-x86_64", "macosx-arm64", "macosx-x86_64", "windows-x86_64")) {
            assertTrue(found.contains("openblas/" + platform + "/libopenblas"), platform + " of " + found);
            assertTrue(found.stream().anyMatch(name -> name.matches("openblas/" + platform + "/(lib)?jniopenblas")), platform + " of " + found);
            assertTrue(found.stream().anyMatch(name -> name.matches("javacpp/" + platform + "/(lib)?jnijavacpp")), platform + " of " + found);
        }
        assertTrue(found.stream().noneMatch(name -> name.matches(".*(_full|_nolapack|[.]obj|[.]lib|[.]h)$")), found.toString());
    }
}
